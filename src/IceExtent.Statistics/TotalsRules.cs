namespace IceExtent.Statistics;

/// <summary>What counts as ice and as pack in totals, and how the polar gap enters them.</summary>
/// <param name="IceFraction">A cell counts for extent and area from this concentration on. Unit: 1; common value 0.15.</param>
/// <param name="PackFraction">A cell counts as pack from this concentration on. Unit: 1; common value 0.80.</param>
/// <param name="PolarGap">How the polar gap enters totals.</param>
public sealed record TotalsRules(double IceFraction, double PackFraction, PolarGapRule PolarGap = PolarGapRule.CountAsIce);
