namespace IceExtent.Statistics;

/// <summary>How two methods' concentrations differ over the cells that both see and that either calls ice.</summary>
/// <param name="Cells">The number of such cells.</param>
/// <param name="MeanFraction">Mean difference, NaN without a cell. Unit: 1.</param>
/// <param name="RootMeanSquareFraction">Root mean square difference, NaN without a cell. Unit: 1.</param>
public readonly record struct PlaneDifference(int Cells, double MeanFraction, double RootMeanSquareFraction)
{
    /// <summary>Compares two planes.</summary>
    /// <param name="fraction">Concentrations of one method; NaN is missing.</param>
    /// <param name="reference">Concentrations of the other; as long.</param>
    /// <param name="iceFraction">From here on a cell is ice. Unit: 1.</param>
    /// <exception cref="ArgumentException">The planes differ in length.</exception>
    public static PlaneDifference Of(ReadOnlySpan<float> fraction, ReadOnlySpan<float> reference, double iceFraction)
    {
        if (fraction.Length != reference.Length)
        {
            throw new ArgumentException("Both planes must have the same number of cells.", nameof(reference));
        }

        float limit = (float)iceFraction;
        (int cells, double sum, double squares) = (0, 0.0, 0.0);
        for (int cell = 0; cell < fraction.Length; cell++)
        {
            double difference = (double)fraction[cell] - reference[cell];
            if (!double.IsNaN(difference) && (fraction[cell] >= limit || reference[cell] >= limit))
            {
                cells++;
                sum += difference;
                squares += difference * difference;
            }
        }

        return new(cells, sum / cells, Math.Sqrt(squares / cells));
    }
}
