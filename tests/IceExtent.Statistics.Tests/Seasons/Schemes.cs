using IceExtent.Statistics.Seasons;

namespace IceExtent.Statistics.Tests.Seasons;

/// <summary>Small schemes for worked examples: no smoothing and no bridging unless a test asks for them.</summary>
internal static class Schemes
{
    /// <summary>From 1 March, parted by the day of least ice in June to October.</summary>
    public static SeasonScheme North { get; } = new()
    {
        Name = "north",
        Source = "worked",
        YearStart = new(3, 1),
        Begins = YearBeginning.Ice,
        LowestIn = new(new(6, 1), new(10, 31)),
        MeltingHalf = new(new(3, 1), new(10, 31)),
        FreezingHalf = new(new(6, 1), new(2, 28)),
        Opening = new(0.80, 1, CrossingPick.Last, FallDay.LastWith),
        Retreat = new(0.15, 1, CrossingPick.Last, FallDay.FirstWithout),
        Advance = new(0.15, 1),
        Closing = new(0.80, 1),
        OwnLevels = null,
        Smoothing = SeasonSmoothing.None,
        SmoothingDays = 1,
        BridgedDays = 0,
        LimitDeviations = 2.0,
        HiddenByMelt = 0.0,
    };

    /// <summary>From 15 February, advance in the first part and retreat in the last: no parting day.</summary>
    public static SeasonScheme South { get; } = North with
    {
        Name = "south",
        YearStart = new(2, 15),
        Begins = YearBeginning.Water,
        LowestIn = null,
        MeltingHalf = new(new(2, 15), new(2, 14)),
        FreezingHalf = new(new(2, 15), new(2, 14)),
        Retreat = new(0.15, 1, CrossingPick.Last, FallDay.LastWith),
        Advance = new(0.15, 5),
        Closing = new(0.80, 5),
    };

    /// <summary>First crossings only.</summary>
    public static SeasonScheme First { get; } = North with
    {
        Name = "first",
        Opening = new(0.80, 1, CrossingPick.First, FallDay.FirstWithout),
        Retreat = new(0.15, 1, CrossingPick.First, FallDay.FirstWithout),
    };

    /// <summary>The span of the ice year that begins in 2003, inside a long record.</summary>
    public static IceYearSpan SpanOf(SeasonScheme scheme, int year = 2003, int recordFirst = -1_000, int recordLast = 1_000) =>
        new(scheme.YearStart.Beginning(year), scheme.LeadDays, scheme.TailDays, recordFirst, recordLast);
}
