namespace IceExtent.Statistics.Seasons;

/// <summary>The dates that one series of concentration has in one ice year, and what was counted. Unit: days.</summary>
/// <param name="Opening">The end of closed ice.</param>
/// <param name="Retreat">The end of ice.</param>
/// <param name="Advance">The beginning of ice.</param>
/// <param name="Closing">The beginning of closed ice.</param>
/// <param name="KnownDays">Days of the year with a value, bridged ones among them.</param>
/// <param name="OpenWaterDays">Those of them below the level of retreat.</param>
public readonly record struct IceDates(
    SeasonDate Opening, SeasonDate Retreat, SeasonDate Advance, SeasonDate Closing, int KnownDays, int OpenWaterDays)
{
    /// <summary>From opening to retreat, or null.</summary>
    public int? LossOfIceDays => Retreat.Day - Opening.Day;

    /// <summary>From advance to closing, or null.</summary>
    public int? GainOfIceDays => Closing.Day - Advance.Day;

    /// <summary>The inner ice-free period: from retreat to advance in years that begin with ice, the rest of the year in others; or null.</summary>
    /// <param name="year">The year.</param>
    /// <param name="begins">What it begins with.</param>
    public int? InnerIceFreeDays(IceYear year, YearBeginning begins) =>
        Advance.Day - Retreat.Day + (begins == YearBeginning.Ice ? 0 : year.Length);

    /// <summary>The outer ice-free period: from opening to closing in years that begin with ice, the rest of the year in others; or null.</summary>
    /// <param name="year">The year.</param>
    /// <param name="begins">What it begins with.</param>
    public int? OuterIceFreeDays(IceYear year, YearBeginning begins) =>
        Closing.Day - Opening.Day + (begins == YearBeginning.Ice ? 0 : year.Length);

    /// <summary>Half the width of the limits of the inner ice-free period, or null: both ends erring apart from each other.</summary>
    public double? InnerIceFreeSpreadDays => SpreadOf(Retreat, Advance);

    /// <summary>Half the width of the limits of the outer ice-free period, or null.</summary>
    public double? OuterIceFreeSpreadDays => SpreadOf(Opening, Closing);

    private static double? SpreadOf(SeasonDate from, SeasonDate to) =>
        from.Day is null || to.Day is null ? null : double.Hypot(from.SpreadDays!.Value, to.SpreadDays!.Value);
}
