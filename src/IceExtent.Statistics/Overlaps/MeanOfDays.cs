using MathNet.Numerics.Distributions;

namespace IceExtent.Statistics.Overlaps;

/// <summary>Whether a mean has confidence limits, and if not, why.</summary>
public enum MeanLimits
{
    /// <summary>It has.</summary>
    Given,

    /// <summary>One day has no scatter.</summary>
    OneDay,

    /// <summary>Two or three days cannot tell how alike neighbouring days are.</summary>
    FewDays,

    /// <summary>The days are so alike that they count for two or fewer.</summary>
    FewEffectiveDays,
}

/// <summary>The mean of a daily quantity whose neighbouring days are alike, with how well it is known.</summary>
/// <param name="Days">The number of days, 1 or more.</param>
/// <param name="Mean">The mean, in the unit of the quantity.</param>
/// <param name="StandardDeviation">Scatter of single days about the mean; null for one day.</param>
/// <param name="Lag1Correlation">The correlation of neighbouring days that was used, 0 to 1; null below four days.</param>
/// <param name="EffectiveDays">How many independent days they are worth; null below four days.</param>
/// <param name="StandardError">Of the mean; null where there are no limits.</param>
/// <param name="Lower95">Lower 95 % limit; null where there are no limits.</param>
/// <param name="Upper95">Upper 95 % limit; null where there are no limits.</param>
/// <param name="Limits">Whether there are limits, and why not.</param>
/// <remarks>
/// Source: [Santer2000] for the effective number n(1 − r)/(1 + r), from memory (high), there for trends. With e the deviations
/// from the mean, s² = Σe²/(n (n_eff − 1)) is the mean's variance, and the limits are Student's t with n_eff − 1 degrees of freedom.
/// Departures: r is freed of its bias in short series, (n r + 1)/(n − 3) ([Kendall1954], from memory, medium); pairs are
/// successive days as far apart as most are, so that gaps, or a sensor that looks every other day, do no harm.
/// Accuracy: on autoregressive days the limits hold the true mean as often as they say, see <c>MeanOfDaysTests</c>.
/// </remarks>
public sealed record MeanOfDays(
    int Days,
    double Mean,
    double? StandardDeviation,
    double? Lag1Correlation,
    double? EffectiveDays,
    double? StandardError,
    double? Lower95,
    double? Upper95,
    MeanLimits Limits)
{
    private const int FewestForCorrelation = 4;
    private const double LeastEffectiveDays = 2.0;
    private const double UpperTail = 0.975; // Two-sided 95 %.

    /// <summary>Takes the mean of a series.</summary>
    /// <param name="days">Rising, none twice; there may be gaps.</param>
    /// <param name="values">One value a day, all finite.</param>
    /// <exception cref="ArgumentException">There is no day, or the lengths differ.</exception>
    public static MeanOfDays Of(ReadOnlySpan<DateOnly> days, ReadOnlySpan<double> values)
    {
        if (values.Length != days.Length || days.IsEmpty)
        {
            throw new ArgumentException("There must be one value a day and at least one day.", nameof(values));
        }

        int count = values.Length;
        double mean = Sum(values) / count;
        double squares = 0.0;
        foreach (double value in values)
        {
            squares += (value - mean) * (value - mean);
        }

        double? deviation = count == 1 ? null : Math.Sqrt(squares / (count - 1));
        if (count < FewestForCorrelation)
        {
            return new(count, mean, deviation, null, null, null, null, null, count == 1 ? MeanLimits.OneDay : MeanLimits.FewDays);
        }

        double correlation = Correlation(days, values, mean, squares);
        double effective = count * (1.0 - correlation) / (1.0 + correlation);
        if (effective <= LeastEffectiveDays)
        {
            return new(count, mean, deviation, correlation, effective, null, null, null, MeanLimits.FewEffectiveDays);
        }

        double error = Math.Sqrt(squares / (count * (effective - 1.0)));
        double reach = error * StudentT.InvCDF(0.0, 1.0, effective - 1.0, UpperTail);
        return new(count, mean, deviation, correlation, effective, error, mean - reach, mean + reach, MeanLimits.Given);
    }

    // Over pairs as far apart as successive days mostly are. A negative correlation counts as none.
    private static double Correlation(ReadOnlySpan<DateOnly> days, ReadOnlySpan<double> values, double mean, double squares)
    {
        if (squares == 0.0)
        {
            return 0.0;
        }

        int step = CommonStep(days);
        double products = 0.0;
        int pairs = 0;
        for (int day = 1; day < days.Length; day++)
        {
            if (days[day].DayNumber - days[day - 1].DayNumber == step)
            {
                products += (values[day] - mean) * (values[day - 1] - mean);
                pairs++;
            }
        }

        double raw = products / pairs / (squares / values.Length);
        return Math.Clamp(((values.Length * raw) + 1.0) / (values.Length - 3), 0.0, 1.0);
    }

    // Of two steps that are as frequent, the shorter one.
    private static int CommonStep(ReadOnlySpan<DateOnly> days)
    {
        SortedDictionary<int, int> counts = [];
        for (int day = 1; day < days.Length; day++)
        {
            int step = days[day].DayNumber - days[day - 1].DayNumber;
            counts[step] = counts.GetValueOrDefault(step) + 1;
        }

        return counts.MaxBy(pair => pair.Value).Key;
    }

    private static double Sum(ReadOnlySpan<double> values)
    {
        double sum = 0.0;
        foreach (double value in values)
        {
            sum += value;
        }

        return sum;
    }
}
