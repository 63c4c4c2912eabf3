namespace IceExtent.Statistics.Seasons;

/// <summary>How a region's dates follow from its ice area and from its cells.</summary>
/// <param name="WinterMonth">The month of most ice, 1 to 12.</param>
/// <param name="SummerMonth">The month of least ice, 1 to 12.</param>
/// <param name="LeastMonthDays">A month of a year counts with so many days.</param>
/// <param name="FirstYear">The first calendar year of the reference, or null for the record's.</param>
/// <param name="LastYear">The last, or null for the record's.</param>
/// <param name="LeastDatedShare">A median date needs cells with a date on so much of the area that had ice. Unit: 1.</param>
public sealed record RegionSeasonRules(int WinterMonth, int SummerMonth, int LeastMonthDays, int? FirstYear, int? LastYear, double LeastDatedShare);
