namespace IceExtent.Statistics.Seasons;

/// <summary>Some days in a row; both ends count.</summary>
/// <param name="First">Days from the first day of the ice year; below 0 before it.</param>
/// <param name="Last">The same; not before <paramref name="First"/>.</param>
public readonly record struct DayRange(int First, int Last);
