namespace IceExtent.Statistics;

/// <summary>Collects the part of cells' errors that neighbours share inside one footprint and nowhere else.</summary>
/// <remarks>
/// A footprint is a square of cells. Inside it the local errors of all cells are one and the same, between two of them they are independent.
/// With weights w and λ the share of the error that is alike far away too, a square adds (Σw)² − (Σwλ)² to the variance: what the far
/// part, which counts wλ, has not counted. Own choice; exact where λ is even inside a square. Not shared between threads.
/// </remarks>
internal sealed class LocalErrors
{
    private readonly CellSquares footprints;
    private readonly (double All, double Far)[] sums;
    private readonly bool[] touched;
    private readonly List<int> squares = [];

    /// <summary>Makes room.</summary>
    public LocalErrors(CellSquares footprints)
    {
        this.footprints = footprints;
        sums = new (double, double)[footprints.Count];
        touched = new bool[sums.Length];
    }

    /// <summary>Adds one cell.</summary>
    /// <param name="cell">The cell.</param>
    /// <param name="weight">Its area times its standard error, in m².</param>
    /// <param name="shared">λ.</param>
    public void Add(int cell, double weight, double shared)
    {
        int square = footprints.OfCell[cell];
        if (!touched[square])
        {
            touched[square] = true;
            squares.Add(square);
        }

        sums[square] = (sums[square].All + weight, sums[square].Far + (weight * shared));
    }

    /// <summary>The variance that all cells added, in m⁴; forgets the cells.</summary>
    public double TakeVariance()
    {
        double variance = 0.0;
        foreach (int square in squares)
        {
            (double all, double far) = sums[square];
            variance += (all * all) - (far * far);
            (sums[square], touched[square]) = (default, false);
        }

        squares.Clear();
        return variance;
    }
}
