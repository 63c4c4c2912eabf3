namespace IceExtent.Statistics.Seasons;

/// <summary>The levels of the four dates of one series. Unit: that of the series.</summary>
/// <param name="Opening">Opening.</param>
/// <param name="Retreat">Retreat.</param>
/// <param name="Advance">Advance.</param>
/// <param name="Closing">Closing.</param>
internal readonly record struct SeasonLevels(float Opening, float Retreat, float Advance, float Closing);

/// <summary>Makes levels of a series' own winter and summer: [JohnsonEicken2016].</summary>
/// <remarks>
/// The thresholds of that source are values from memory. Departures: opening is not sought below the level of retreat, nor closing
/// below that of advance, so that dates keep their order.
/// </remarks>
internal sealed class OwnLevels(OwnLevelRules rules, SeasonScheme scheme, IceYearSpan span)
{
    private readonly SeasonWindow winter = SeasonWindow.LastBefore(rules.Winter, span.Year, SeasonWindow.Of(rules.Summer, span.Year).First);
    private readonly SeasonWindow summer = SeasonWindow.Of(rules.Summer, span.Year);

    /// <summary>What the opening's level lacks, or null where it is known.</summary>
    public SeasonDateState? WinterLacks { get; private set; }

    /// <summary>What the other levels lack, or null where they are known.</summary>
    public SeasonDateState? SummerLacks { get; private set; }

    /// <summary>Makes the levels of one series.</summary>
    /// <param name="series">Unit: 1. Missing: NaN. Shape: one value a day of the span.</param>
    public SeasonLevels Of(ReadOnlySpan<float> series)
    {
        (int winterDays, double winterMean, double winterDeviation) = MomentsOf(series, winter);
        (int summerDays, double summerMean, double summerDeviation) = MomentsOf(series, summer);
        WinterLacks = winterDays >= rules.LeastDays ? null
            : span.RecordFirst > winter.First ? SeasonDateState.BeforeRecord : SeasonDateState.HiddenByGap;
        SummerLacks = span.RecordLast < summer.Last ? SeasonDateState.NotYetReached
            : summerDays >= rules.LeastDays ? summerMean > rules.HighestSummer ? SeasonDateState.NeverReached : null
            : span.RecordFirst > summer.First ? SeasonDateState.BeforeRecord : SeasonDateState.HiddenByGap;
        double own = SummerLacks is null ? summerMean + (rules.SummerDeviations * summerDeviation) : 0.0;
        double retreat = Math.Max(scheme.Retreat.Level, own), advance = Math.Max(scheme.Advance.Level, own);
        return new(
            (float)Math.Max(winterMean - (rules.WinterDeviations * winterDeviation), retreat),
            (float)retreat,
            (float)advance,
            (float)Math.Max(winterMean - rules.ClosingBelowWinter, advance));
    }

    private (int Days, double Mean, double Deviation) MomentsOf(ReadOnlySpan<float> series, SeasonWindow window)
    {
        int first = Math.Max(span.Lead + window.First, 0), last = Math.Min(span.Lead + window.Last, series.Length - 1);
        int days = 0;
        double sum = 0.0, squares = 0.0;
        for (int day = first; day <= last; day++)
        {
            if (!float.IsNaN(series[day]))
            {
                (days, sum) = (days + 1, sum + series[day]);
            }
        }

        double mean = sum / Math.Max(days, 1);
        for (int day = first; day <= last; day++)
        {
            squares += float.IsNaN(series[day]) ? 0.0 : (series[day] - mean) * (series[day] - mean);
        }

        return (days, mean, days > 1 ? Math.Sqrt(squares / (days - 1)) : 0.0);
    }
}
