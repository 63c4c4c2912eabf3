namespace IceExtent.Statistics;

/// <summary>Collects cells whose errors are alike inside one square and nowhere else, for the variance of the area that counts as ice.</summary>
/// <remarks>
/// Inside a square of cells the errors, each over its own standard error, are one and the same, between two of them they are independent. Own
/// choice. So of two cells of a square that count with probabilities p ≤ q both do with p: the covariance is p − p·q, exactly, where the
/// tetrachoric series converges slowly. Not shared between threads.
/// </remarks>
internal sealed class LocalCounts
{
    private readonly CellSquares cellSquares;
    private readonly int cellsPerSquare;
    private readonly int[] counts;
    private readonly double[] probabilities; // A square's cells follow each other.
    private readonly double[] areas;
    private readonly List<int> squares = [];

    /// <summary>Makes room.</summary>
    public LocalCounts(CellSquares cellSquares)
    {
        this.cellSquares = cellSquares;
        cellsPerSquare = cellSquares.Side * cellSquares.Side;
        counts = new int[cellSquares.Count];
        probabilities = new double[counts.Length * cellsPerSquare];
        areas = new double[probabilities.Length];
    }

    /// <summary>Adds one cell, once a day.</summary>
    /// <param name="cell">The cell.</param>
    /// <param name="area">In m².</param>
    /// <param name="probability">That it counts as ice. Range: 0 to 1.</param>
    public void Add(int cell, double area, double probability)
    {
        int square = cellSquares.OfCell[cell];
        int at = counts[square]++;
        if (at == 0)
        {
            squares.Add(square);
        }

        (probabilities[(square * cellsPerSquare) + at], areas[(square * cellsPerSquare) + at]) = (probability, area);
    }

    /// <summary>The variance that all cells added, in m⁴; forgets the cells.</summary>
    public double TakeVariance()
    {
        double variance = 0.0;
        foreach (int square in squares)
        {
            variance += VarianceOf(probabilities.AsSpan(square * cellsPerSquare, counts[square]), areas.AsSpan(square * cellsPerSquare, counts[square]));
            counts[square] = 0;
        }

        squares.Clear();
        return variance;
    }

    private static double VarianceOf(Span<double> probabilities, Span<double> areas)
    {
        if (probabilities.ContainsAnyExcept(probabilities[0]))
        {
            probabilities.Sort(areas);
        }

        // From the likeliest down: with each cell before it a cell counts together as often as it counts at all.
        (double variance, double likelier, double mean) = (0.0, 0.0, 0.0);
        for (int at = probabilities.Length - 1; at >= 0; at--)
        {
            double expected = areas[at] * probabilities[at];
            variance += expected * (areas[at] + (2.0 * likelier));
            likelier += areas[at];
            mean += expected;
        }

        return Math.Max(0.0, variance - (mean * mean));
    }
}
