using MathNet.Numerics.Distributions;

namespace IceExtent.Statistics.Trends;

/// <summary>A straight line through yearly values, or why none can be told.</summary>
public abstract record LinearTrend
{
    private LinearTrend()
    {
    }

#pragma warning disable CA1034 // A closed set: only what is nested here can be one.
    /// <summary>A line with limits.</summary>
    /// <param name="SlopePerYear">Unit: that of the values, a year.</param>
    /// <param name="StandardErrorPerYear">Its standard error, for the effective number of values.</param>
    /// <param name="LowerPerYear">The lower 95 % limit.</param>
    /// <param name="UpperPerYear">The upper 95 % limit.</param>
    /// <param name="Years">How many values.</param>
    /// <param name="LagOne">Correlation of residuals from one year to the next.</param>
    /// <param name="EffectiveYears">How many values without such correlation would tell as much.</param>
    public sealed record Fitted(
        double SlopePerYear, double StandardErrorPerYear, double LowerPerYear, double UpperPerYear, int Years, double LagOne, double EffectiveYears) : LinearTrend;

    /// <summary>No line.</summary>
    /// <param name="Reason">Why not, in words.</param>
    public sealed record Untestable(string Reason) : LinearTrend;
#pragma warning restore CA1034

    /// <summary>Fits a line by ordinary least squares, with the standard error adjusted for correlation from year to year.</summary>
    /// <remarks>
    /// Source: [Santer2000]: effective sample size n (1 − r) / (1 + r), limits from Student's t with that size less 2. Departures: r below
    /// 0 counts as 0, so that the size never grows; r is taken over neighbouring years alone, so a missing year joins none.
    /// </remarks>
    /// <param name="years">Rising; gaps are allowed.</param>
    /// <param name="values">One a year; finite.</param>
    /// <param name="leastYears">With fewer values nothing is told; 3 or more.</param>
    /// <exception cref="ArgumentException">The lengths differ.</exception>
    public static LinearTrend Fit(IReadOnlyList<int> years, IReadOnlyList<double> values, int leastYears)
    {
        ArgumentNullException.ThrowIfNull(years);
        ArgumentNullException.ThrowIfNull(values);
        ArgumentOutOfRangeException.ThrowIfLessThan(leastYears, 3);
        if (years.Count != values.Count)
        {
            throw new ArgumentException($"There are {years.Count} years and {values.Count} values.", nameof(values));
        }

        int count = years.Count;
        if (count < leastYears)
        {
            return new Untestable(FormattableString.Invariant($"{count} {(count == 1 ? "year" : "years")} with a value, {leastYears} are needed"));
        }

        double meanYear = years.Average(year => (double)year), meanValue = values.Average();
        double squares = 0.0, products = 0.0;
        for (int at = 0; at < count; at++)
        {
            squares += (years[at] - meanYear) * (years[at] - meanYear);
            products += (years[at] - meanYear) * (values[at] - meanValue);
        }

        double slope = products / squares;
        double[] residuals = [.. years.Zip(values, (year, value) => value - meanValue - (slope * (year - meanYear)))];
        double lagOne = LagOneOf(years, residuals);
        double effective = count * (1.0 - Math.Max(lagOne, 0.0)) / (1.0 + Math.Max(lagOne, 0.0));
        if (effective <= 3.0)
        {
            return new Untestable(FormattableString.Invariant($"the years are too alike: {count} tell as much as {effective:F1} independent ones"));
        }

        double error = Math.Sqrt(residuals.Sum(residual => residual * residual) / (effective - 2.0) / squares);
        double reach = error * StudentT.InvCDF(0.0, 1.0, effective - 2.0, 0.975);
        return new Fitted(slope, error, slope - reach, slope + reach, count, lagOne, effective);
    }

    private static double LagOneOf(IReadOnlyList<int> years, double[] residuals)
    {
        double products = 0.0, squares = residuals.Sum(residual => residual * residual);
        for (int at = 1; at < residuals.Length; at++)
        {
            products += years[at] == years[at - 1] + 1 ? residuals[at] * residuals[at - 1] : 0.0;
        }

        return squares > 0.0 ? products / squares : 0.0;
    }
}
