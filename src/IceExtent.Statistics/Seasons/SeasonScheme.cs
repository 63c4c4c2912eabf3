namespace IceExtent.Statistics.Seasons;

/// <summary>What an ice year begins with.</summary>
public enum YearBeginning
{
    /// <summary>Ice: opening and retreat come before advance and closing.</summary>
    Ice,

    /// <summary>Open water: advance and closing come before opening and retreat.</summary>
    Water,
}

/// <summary>Which of several crossings is meant where ice comes and goes.</summary>
public enum CrossingPick
{
    /// <summary>The first of the window.</summary>
    First,

    /// <summary>The last of the window.</summary>
    Last,
}

/// <summary>How a daily series is smoothed before dates are sought.</summary>
public enum SeasonSmoothing
{
    /// <summary>Not at all.</summary>
    None,

    /// <summary>Running mean.</summary>
    Mean,

    /// <summary>Running median.</summary>
    Median,
}

/// <summary>How a day is named on which ice falls below a level.</summary>
public enum FallDay
{
    /// <summary>By the last day at or above the level.</summary>
    LastWith,

    /// <summary>By the first day below it.</summary>
    FirstWithout,
}

/// <summary>When a date of the melting half of a year is reached.</summary>
/// <param name="Level">Concentration. Unit: 1.</param>
/// <param name="Persistence">
/// The days in a row that count. For <see cref="CrossingPick.Last"/>: ice at or above the level for fewer days does not count as ice
/// that came back. For <see cref="CrossingPick.First"/>: it must stay below the level for so many days.
/// </param>
/// <param name="Pick">Which crossing.</param>
/// <param name="Named">Which day it is.</param>
public sealed record FallRule(double Level, int Persistence, CrossingPick Pick, FallDay Named);

/// <summary>When a date of the freezing half of a year is reached: the first day of the first run at or above a level.</summary>
/// <param name="Level">Concentration. Unit: 1.</param>
/// <param name="Persistence">The days in a row that it must hold.</param>
public sealed record RiseRule(double Level, int Persistence);

/// <summary>Levels that follow from a series' own winter and summer: [JohnsonEicken2016].</summary>
/// <param name="Winter">Days of the winter before the melting half.</param>
/// <param name="Summer">Days of the summer.</param>
/// <param name="WinterDeviations">Opening: so many standard deviations below the winter's mean.</param>
/// <param name="SummerDeviations">Retreat and advance: so many standard deviations above the summer's mean, and not below the scheme's own level.</param>
/// <param name="ClosingBelowWinter">Closing: so much below the winter's mean. Unit: 1.</param>
/// <param name="HighestSummer">No date where the summer's mean lies above. Unit: 1.</param>
/// <param name="LeastDays">No date with fewer known days in either.</param>
public sealed record OwnLevelRules(
    CalendarWindow Winter,
    CalendarWindow Summer,
    double WinterDeviations,
    double SummerDeviations,
    double ClosingBelowWinter,
    double HighestSummer,
    int LeastDays);

/// <summary>How dates are read off a year of daily concentration.</summary>
public sealed record SeasonScheme
{
    /// <summary>The name of the preset it comes from.</summary>
    public required string Name { get; init; }

    /// <summary>Where it is published.</summary>
    public required string Source { get; init; }

    /// <summary>The first day of its ice years.</summary>
    public required IceYearStart YearStart { get; init; }

    /// <summary>What its years begin with.</summary>
    public required YearBeginning Begins { get; init; }

    /// <summary>
    /// Where the day of the lowest concentration parts the year: it is sought in this window, ends the window of the melting
    /// half and begins that of the freezing half. Null where the windows stand by themselves.
    /// </summary>
    public required CalendarWindow? LowestIn { get; init; }

    /// <summary>Where opening and retreat are sought.</summary>
    public required CalendarWindow MeltingHalf { get; init; }

    /// <summary>Where advance and closing are sought.</summary>
    public required CalendarWindow FreezingHalf { get; init; }

    /// <summary>The end of closed ice.</summary>
    public required FallRule Opening { get; init; }

    /// <summary>The end of ice.</summary>
    public required FallRule Retreat { get; init; }

    /// <summary>The beginning of ice.</summary>
    public required RiseRule Advance { get; init; }

    /// <summary>The beginning of closed ice.</summary>
    public required RiseRule Closing { get; init; }

    /// <summary>Own levels in place of those of the four rules, or null.</summary>
    public required OwnLevelRules? OwnLevels { get; init; }

    /// <summary>How the series is smoothed.</summary>
    public required SeasonSmoothing Smoothing { get; init; }

    /// <summary>Over how many days: odd; the day itself is in the middle.</summary>
    public required int SmoothingDays { get; init; }

    /// <summary>Gaps of at most so many days are bridged by a straight line; longer ones hide what lies in them.</summary>
    public required int BridgedDays { get; init; }

    /// <summary>The limits of a date are those of the series so many standard errors lower and higher.</summary>
    public required double LimitDeviations { get; init; }

    /// <summary>
    /// How much of melting ice may look like open water: the last day that a date of the melting half may have been is that of a
    /// series with so much more ice. Unit: 1.
    /// </summary>
    public required double HiddenByMelt { get; init; }

    /// <summary>How many days before an ice year its dates depend on.</summary>
    public int LeadDays => OwnLevels is null ? AroundDays : OwnWinterDays + AroundDays;

    /// <summary>How many days after an ice year its dates depend on.</summary>
    public int TailDays => AroundDays + Math.Max(
        Math.Max(Opening.Persistence, Retreat.Persistence), Math.Max(Advance.Persistence, Closing.Persistence));

    private int AroundDays => (SmoothingDays / 2) + BridgedDays + 1;

    // From the first day of the winter before a year to the year's first day; one more for a leap day.
    private int OwnWinterDays
    {
        get
        {
            const int AnyYear = 2003;
            IceYear year = YearStart.Beginning(AnyYear);
            return Math.Max(0, 1 - SeasonWindow.LastBefore(OwnLevels!.Winter, year, SeasonWindow.Of(OwnLevels.Summer, year).First).First);
        }
    }
}
