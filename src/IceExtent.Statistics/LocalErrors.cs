namespace IceExtent.Statistics;

/// <summary>Collects the part of cells' errors that neighbours share inside one footprint and nowhere else.</summary>
/// <remarks>
/// A footprint is a square of cells. Inside it the local errors of all cells are one and the same, between two of them they are independent.
/// With weights w and λ the share of error that is alike far away too, a square adds (Σw)² − (Σwλᵏ)² to the variance of term k:
/// what the far part, which counts λᵏ, has not counted. Own choice; exact where λ is even inside a square. Not shared between threads.
/// </remarks>
internal sealed class LocalErrors
{
    private const int SumsPerSquare = 2 * (ErrorCorrelation.MostPowers + 1); // All and far, for area and for each term of extent.

    private readonly int columns;
    private readonly int side;
    private readonly int squareColumns;
    private readonly double[] sums;
    private readonly bool[] touched;
    private readonly List<int> squares = [];

    /// <summary>Makes room.</summary>
    public LocalErrors(int columns, int rows, int cellsPerFootprint)
    {
        (this.columns, side) = (columns, cellsPerFootprint);
        squareColumns = ((columns - 1) / side) + 1;
        int count = squareColumns * (((rows - 1) / side) + 1);
        sums = new double[count * SumsPerSquare];
        touched = new bool[count];
    }

    /// <summary>Adds one cell.</summary>
    /// <param name="cell">The cell.</param>
    /// <param name="area">Its area, in m².</param>
    /// <param name="iceError">Its standard error where it counts as ice, else 0.</param>
    /// <param name="terms">Its terms of extent, or none where its side of the limit is certain.</param>
    /// <param name="shared">λ.</param>
    public void Add(int cell, double area, double iceError, ReadOnlySpan<double> terms, double shared)
    {
        int square = (cell / columns / side * squareColumns) + (cell % columns / side);
        if (!touched[square])
        {
            touched[square] = true;
            squares.Add(square);
        }

        Span<double> own = sums.AsSpan(square * SumsPerSquare, SumsPerSquare);
        own[0] += area * iceError;
        own[1] += area * iceError * shared;
        double power = shared;
        for (int term = 0; term < terms.Length; term++)
        {
            own[2 + (2 * term)] += area * terms[term];
            own[3 + (2 * term)] += area * terms[term] * power;
            power *= shared;
        }
    }

    /// <summary>The variances that all cells added, in m⁴; forgets the cells.</summary>
    public (double Extent, double Area) TakeVariances()
    {
        double extent = 0.0;
        double area = 0.0;
        foreach (int square in squares)
        {
            Span<double> own = sums.AsSpan(square * SumsPerSquare, SumsPerSquare);
            area += (own[0] * own[0]) - (own[1] * own[1]);
            for (int sum = 2; sum < SumsPerSquare; sum += 2)
            {
                extent += (own[sum] * own[sum]) - (own[sum + 1] * own[sum + 1]);
            }

            own.Clear();
            touched[square] = false;
        }

        squares.Clear();
        return (extent, area);
    }
}
