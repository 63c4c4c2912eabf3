namespace IceExtent.Statistics.Seasons;

/// <summary>The four dates of the indicator method in one cell and ice year.</summary>
/// <param name="EarlyMelt">The first day that looks like melt.</param>
/// <param name="ContinuousMelt">The first day of melt that lasts: melt onset.</param>
/// <param name="EarlyFreeze">The first frozen day after the last stretch of lasting melt or open water.</param>
/// <param name="ContinuousFreeze">The first day from which the cell stays frozen: freeze-up.</param>
public readonly record struct MeltDates(SeasonDate EarlyMelt, SeasonDate ContinuousMelt, SeasonDate EarlyFreeze, SeasonDate ContinuousFreeze);
