namespace IceExtent.Statistics;

/// <summary>How two methods' concentrations differ over the cells that both see and that either calls ice.</summary>
/// <param name="Cells">The number of such cells.</param>
/// <param name="MeanFraction">Mean difference, NaN without a cell. Unit: 1.</param>
/// <param name="RootMeanSquareFraction">Root mean square difference, NaN without a cell. Unit: 1.</param>
public readonly record struct PlaneDifference(int Cells, double MeanFraction, double RootMeanSquareFraction)
{
    /// <summary>Compares two planes over some cells.</summary>
    /// <param name="fraction">Concentrations of one method; NaN is missing.</param>
    /// <param name="reference">Concentrations of the other; as long.</param>
    /// <param name="iceFraction">From here on a cell is ice. Unit: 1.</param>
    /// <param name="cells">The cells, each counted once and wholly.</param>
    /// <exception cref="ArgumentException">The planes differ in length.</exception>
    public static PlaneDifference Of(ReadOnlySpan<float> fraction, ReadOnlySpan<float> reference, double iceFraction, ReadOnlySpan<int> cells)
    {
        if (fraction.Length != reference.Length)
        {
            throw new ArgumentException("Both planes must have the same number of cells.", nameof(reference));
        }

        float limit = (float)iceFraction;
        (int count, double sum, double squares) = (0, 0.0, 0.0);
        foreach (int cell in cells)
        {
            double difference = (double)fraction[cell] - reference[cell];
            if (!double.IsNaN(difference) && (fraction[cell] >= limit || reference[cell] >= limit))
            {
                count++;
                sum += difference;
                squares += difference * difference;
            }
        }

        return new(count, sum / count, Math.Sqrt(squares / count));
    }
}
