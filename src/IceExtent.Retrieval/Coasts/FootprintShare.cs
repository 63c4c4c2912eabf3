namespace IceExtent.Retrieval;

/// <summary>How much of what an antenna sees has a property, such as being land.</summary>
/// <remarks>
/// The antenna pattern is a Gaussian of the 3 dB width ([Maass2010]). The centres of a cell's measurements are taken to
/// lie anywhere in the cell, so the pattern is averaged over it; the property is taken as even within each cell.
/// Lengths are those of the map: its scale is not followed.
/// </remarks>
public static class FootprintShare
{
    private const double ReachDeviations = 3.0; // Beyond it lies 0.3 % of a Gaussian, on both sides together.
    private const int StepsPerCell = 256;

    private static readonly double DeviationsPerWidth = 2.0 * Math.Sqrt(2.0 * Math.Log(2.0)); // Of a Gaussian's full width at half its height.

    /// <summary>The weights along one axis, for the cell itself and the neighbours on one side. Their sum over both sides is 1.</summary>
    /// <param name="footprintMeters">The 3 dB width, above 0.</param>
    /// <param name="cellMeters">The side of a cell, above 0.</param>
    /// <returns>The weight of the neighbour at each distance in cells, from 0 up to the pattern's reach.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A length is not above 0.</exception>
    public static double[] Weights(double footprintMeters, double cellMeters)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(footprintMeters);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(cellMeters);
        double deviation = footprintMeters / cellMeters / DeviationsPerWidth;
        double[] weights = new double[(int)Math.Ceiling(ReachDeviations * deviation) + 1];
        double sum = 0.0;
        for (int distance = 0; distance < weights.Length; distance++)
        {
            weights[distance] = Between(distance, deviation);
            sum += distance == 0 ? weights[0] : 2.0 * weights[distance];
        }

        return Array.ConvertAll(weights, weight => weight / sum);
    }

    /// <summary>Averages a plane with the weights, along rows and then along columns.</summary>
    /// <param name="fraction">One value a cell, none missing. Shape: row-major.</param>
    /// <param name="columns">The number of columns; divides the number of cells.</param>
    /// <param name="weights">What <see cref="Weights"/> gave.</param>
    /// <returns>The averages. At the rim of the grid only cells inside it count.</returns>
    /// <exception cref="ArgumentException">The plane is not made of whole rows.</exception>
    public static float[] Of(ReadOnlySpan<float> fraction, int columns, ReadOnlySpan<double> weights)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(columns, 1);
        if (fraction.Length % columns != 0)
        {
            throw new ArgumentException($"{fraction.Length} cells do not make rows of {columns}.", nameof(fraction));
        }

        int rows = fraction.Length / columns;
        float[] along = new float[fraction.Length];
        float[] both = new float[fraction.Length];
        for (int cell = 0; cell < along.Length; cell++)
        {
            along[cell] = Average(fraction, cell, cell % columns, columns, 1, weights);
        }

        for (int cell = 0; cell < both.Length; cell++)
        {
            both[cell] = Average(along, cell, cell / columns, rows, columns, weights);
        }

        return both;
    }

    // The mean of the Gaussian over all pairs of a point of one cell and a point of another: their distances have the
    // density of a triangle. Midpoint sums of so smooth a function are exact to single precision.
    private static double Between(int distance, double deviation)
    {
        double sum = 0.0;
        for (int step = -StepsPerCell; step < StepsPerCell; step++)
        {
            double offset = (step + 0.5) / StepsPerCell;
            double deviations = (distance + offset) / deviation;
            sum += (1.0 - Math.Abs(offset)) * Math.Exp(-0.5 * deviations * deviations);
        }

        return sum;
    }

    private static float Average(ReadOnlySpan<float> plane, int cell, int place, int places, int stride, ReadOnlySpan<double> weights)
    {
        double sum = 0.0;
        double weightSum = 0.0;
        int reach = weights.Length - 1;
        for (int offset = Math.Max(-reach, -place); offset <= Math.Min(reach, places - 1 - place); offset++)
        {
            double weight = weights[Math.Abs(offset)];
            sum += weight * plane[cell + (offset * stride)];
            weightSum += weight;
        }

        return (float)(sum / weightSum);
    }
}
