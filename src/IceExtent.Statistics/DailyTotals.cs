using System.Runtime.CompilerServices;
using IceExtent.Retrieval;

namespace IceExtent.Statistics;

/// <summary>The sums of one day over one region. Unit: m².</summary>
/// <param name="Extent">Area of cells at or above the ice limit, and of the polar gap unless the rule leaves it out.</param>
/// <param name="IceArea">Concentration times area over cells at or above the ice limit; of the gap only what was filled.</param>
/// <param name="MarginalZone">Area of cells from the ice limit to below the pack limit.</param>
/// <param name="Pack">Area of cells at or above the pack limit; of the gap only what was filled.</param>
/// <param name="Ocean">Area of all cells of the region, the gap included.</param>
/// <param name="Observed">Area of cells with a retrieved concentration.</param>
/// <param name="Filled">Area of cells outside the gap whose concentration was filled in.</param>
/// <param name="PolarGap">Area of cells in the gap, filled or not.</param>
public readonly record struct DailyTotals(
    double Extent, double IceArea, double MarginalZone, double Pack, double Ocean, double Observed, double Filled, double PolarGap)
{
    private const CellConditions Unplain = CellConditions.PolarGap | CellConditions.FilledFromNeighbours | CellConditions.FilledFromDays;

    /// <summary>The share of the ocean outside the polar gap that was observed; 0 where there is no such ocean.</summary>
    public double ObservedShare => ShareOfSeen(Observed);

    /// <summary>The share of the ocean outside the polar gap that was filled in; 0 where there is no such ocean.</summary>
    public double FilledShare => ShareOfSeen(Filled);

    /// <summary>Sums one day.</summary>
    /// <param name="region">The cells and their areas.</param>
    /// <param name="totalFraction">Clipped concentrations. Unit: 1. Missing: NaN. Shape: one value a cell of the grid.</param>
    /// <param name="conditions">Tells the polar gap and what was filled. Shape as above.</param>
    /// <param name="rules">What counts as ice and as pack, and how the gap enters.</param>
    /// <returns>Sums in double precision, in the order of the region's cells, so equal on every machine.</returns>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    public static DailyTotals Sum(
        TotalsRegion region, ReadOnlySpan<float> totalFraction, ReadOnlySpan<CellConditions> conditions, TotalsRules rules)
    {
        ArgumentNullException.ThrowIfNull(region);
        ArgumentNullException.ThrowIfNull(rules);
        float iceLimit = (float)rules.IceFraction;
        float packLimit = (float)rules.PackFraction;
        ReadOnlySpan<int> cells = region.Cells;
        ReadOnlySpan<double> areas = region.AreasSquareMeters;
        double ice = 0, iceArea = 0, pack = 0, ocean = 0, observed = 0, filled = 0, gap = 0, open = 0;
        for (int index = 0; index < cells.Length; index++)
        {
            int cell = cells[index];
            double area = areas[index];
            float fraction = totalFraction[cell];
            ocean += area;
            if ((conditions[cell] & Unplain) == 0)
            {
                observed += float.IsNaN(fraction) ? 0.0 : area;
            }
            else if ((conditions[cell] & CellConditions.PolarGap) == 0)
            {
                filled += area;
            }
            else
            {
                gap += area;
                if ((conditions[cell] & CellConditions.FilledPolarGap) == 0)
                {
                    open += area;
                    continue;
                }
            }

            if (fraction >= iceLimit)
            {
                ice += area;
                iceArea += fraction * area;
                pack += fraction >= packLimit ? area : 0.0;
            }
        }

        double assumed = rules.PolarGap == PolarGapRule.LeaveOut ? 0.0 : open;
        return new(ice + assumed, iceArea, ice - pack, pack, ocean, observed, filled, gap);
    }

    private double ShareOfSeen(double area) => Ocean > PolarGap ? area / (Ocean - PolarGap) : 0.0;
}
