namespace IceExtent.Statistics.Seasons;

/// <summary>How melt onset and freeze-up are found in one hemisphere.</summary>
public sealed record MeltRules
{
    /// <summary>Sets the rules.</summary>
    /// <param name="calendar">Where in the year they are looked for.</param>
    /// <param name="leastIceFraction">A day with less ice tells of water and is not used, 0 to 1.</param>
    /// <param name="gapDays">A date in a gap of more days without a usable value is hidden, 0 or more.</param>
    /// <param name="horizontalRange">Limits of the horizontal-range method.</param>
    /// <param name="indicators">Rules of the indicator method.</param>
    /// <exception cref="ArgumentOutOfRangeException">A number is out of its range.</exception>
    public MeltRules(MeltCalendar calendar, double leastIceFraction, int gapDays, HorizontalRangeRules horizontalRange, MeltIndicatorRules indicators)
    {
        ArgumentNullException.ThrowIfNull(calendar);
        ArgumentNullException.ThrowIfNull(horizontalRange);
        ArgumentNullException.ThrowIfNull(indicators);
        ArgumentOutOfRangeException.ThrowIfNegative(leastIceFraction);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(leastIceFraction, 1.0);
        ArgumentOutOfRangeException.ThrowIfNegative(gapDays);
        (Calendar, LeastIceFraction, GapDays, HorizontalRange, Indicators) = (calendar, leastIceFraction, gapDays, horizontalRange, indicators);
    }

    /// <summary>Where in the year melt and freeze-up are looked for.</summary>
    public MeltCalendar Calendar { get; }

    /// <summary>A day with less ice tells of water and is not used. Unit: 1.</summary>
    public double LeastIceFraction { get; }

    /// <summary>A date in a gap of more days without a usable value is hidden.</summary>
    public int GapDays { get; }

    /// <summary>Limits of the horizontal-range method.</summary>
    public HorizontalRangeRules HorizontalRange { get; }

    /// <summary>Rules of the indicator method.</summary>
    public MeltIndicatorRules Indicators { get; }

    /// <summary>The days that a series should hold round the windows of an ice year, in days from its first day.</summary>
    /// <remarks>With fewer the dates still come out, from what is there.</remarks>
    public SeasonWindow Needed(MeltWindows windows)
    {
        int before = Math.Max(HorizontalRange.TestDays + HorizontalRange.LeadDays, Indicators.JumpDays);
        int after = Math.Max(HorizontalRange.TestDays, Indicators.PersistDays);
        return new(
            Math.Min(Math.Min(windows.Winter.First, windows.Melt.First) - before, windows.Freeze.First),
            Math.Max(Math.Max(windows.Freeze.Last, windows.NextWinter.Last), windows.Melt.Last + after));
    }
}
