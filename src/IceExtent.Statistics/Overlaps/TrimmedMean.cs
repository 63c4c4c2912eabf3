namespace IceExtent.Statistics.Overlaps;

/// <summary>A robust centre that is not held to steps of storage, as a median of packed temperatures would be.</summary>
public static class TrimmedMean
{
    /// <summary>The mean of what is left when a share of the values is cut off at each end.</summary>
    /// <param name="values">Finite, in any unit; sorted in place.</param>
    /// <param name="trimFraction">The share cut off at each end, 0 to below 0.5; a value may be cut in part.</param>
    /// <returns>In the unit of the values; NaN without a value.</returns>
    public static double Of(Span<float> values, double trimFraction)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(trimFraction);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(trimFraction, 0.5);
        values.Sort();
        double cut = trimFraction * values.Length;
        double end = values.Length - cut;
        double sum = 0.0;
        for (int index = (int)cut; index < values.Length && index < end; index++)
        {
            double weight = Math.Min(index + 1, end) - Math.Max(index, cut);
            sum += weight * values[index];
        }

        return sum / (end - cut);
    }
}
