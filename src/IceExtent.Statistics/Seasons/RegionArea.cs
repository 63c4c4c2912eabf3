namespace IceExtent.Statistics.Seasons;

/// <summary>When a region's ice area falls and rises through a level between its own winter and summer: [SternLaidre2016].</summary>
/// <remarks>Departure: smoothing, persistence, windows and gaps are those of the scheme that its cells have.</remarks>
public sealed class RegionArea
{
    private readonly DailyIce[] days;
    private readonly SeasonScheme scheme;

    /// <summary>Takes a region's record and finds its level.</summary>
    /// <param name="days">The known days in date order.</param>
    /// <param name="scheme">The scheme of its cells.</param>
    /// <param name="rules">The months and years of the level.</param>
    public RegionArea(IEnumerable<DailyIce> days, SeasonScheme scheme, RegionSeasonRules rules)
    {
        ArgumentNullException.ThrowIfNull(scheme);
        ArgumentNullException.ThrowIfNull(rules);
        this.days = [.. days];
        double? winter = MeanOf(rules.WinterMonth, rules), summer = MeanOf(rules.SummerMonth, rules);
        LevelSquareKilometers = 0.5 * (winter + summer);
        double level = LevelSquareKilometers ?? 0.0;
        this.scheme = scheme with
        {
            OwnLevels = null,
            Opening = scheme.Opening with { Level = level },
            Retreat = new(level, scheme.Retreat.Persistence, scheme.Retreat.Pick, FallDay.FirstWithout),
            Advance = scheme.Advance with { Level = level },
            Closing = scheme.Closing with { Level = level },
        };
    }

    /// <summary>Half way between the mean areas of the winter and the summer month, or null where the record has none of one.</summary>
    public double? LevelSquareKilometers { get; }

    /// <summary>The days on which the area falls and rises through the level, or null where there is no level.</summary>
    /// <param name="year">The ice year.</param>
    /// <param name="recordFirst">The record's first day.</param>
    /// <param name="recordLast">The record's last day.</param>
    public (SeasonDate? Fall, SeasonDate? Rise) In(IceYear year, DateOnly recordFirst, DateOnly recordLast)
    {
        if (LevelSquareKilometers is null)
        {
            return (null, null);
        }

        IceYearSpan span = IceYearSpan.Of(year, scheme, melt: null, recordFirst, recordLast);
        (float[] area, float[] error) = span.Lay(days.Select(day => (day.Date, day.AreaSquareKilometers, day.StandardErrorSquareKilometers)));
        IceDates dates = new SeasonFinder(scheme, span).Find(area, error);
        return (dates.Retreat, dates.Advance);
    }

    // The mean over years of the month's mean: a year counts as one, whatever days it lacks.
    private double? MeanOf(int month, RegionSeasonRules rules)
    {
        double[] years = [.. days
            .Where(day => day.Date.Month == month && (rules.FirstYear is not { } first || day.Date.Year >= first) && (rules.LastYear is not { } last || day.Date.Year <= last))
            .GroupBy(day => day.Date.Year)
            .Where(year => year.Count() >= rules.LeastMonthDays)
            .Select(year => year.Sum(day => day.AreaSquareKilometers) / year.Count())];
        return years.Length == 0 ? null : years.Sum() / years.Length;
    }
}

/// <summary>The ice of a region on one day.</summary>
/// <param name="Date">The day.</param>
/// <param name="AreaSquareKilometers">Its ice area.</param>
/// <param name="StandardErrorSquareKilometers">Its standard error.</param>
public readonly record struct DailyIce(DateOnly Date, double AreaSquareKilometers, double StandardErrorSquareKilometers);
