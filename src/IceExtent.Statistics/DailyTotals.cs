using System.Runtime.CompilerServices;
using IceExtent.Retrieval;

namespace IceExtent.Statistics;

/// <summary>The sums of one day over one region. Unit: m².</summary>
/// <param name="Extent">Area of cells at or above the ice limit, and of the polar gap.</param>
/// <param name="IceArea">Concentration times area over cells at or above the ice limit, the gap left out.</param>
/// <param name="MarginalZone">Area of cells from the ice limit to below the pack limit.</param>
/// <param name="Pack">Area of cells at or above the pack limit, the gap left out.</param>
/// <param name="Ocean">Area of all cells of the region, the gap included.</param>
/// <param name="Observed">Area of cells with a concentration.</param>
/// <param name="PolarGap">Area of cells in the gap.</param>
public readonly record struct DailyTotals(
    double Extent, double IceArea, double MarginalZone, double Pack, double Ocean, double Observed, double PolarGap)
{
    /// <summary>The share of the ocean outside the polar gap that has a concentration; 0 where there is no such ocean.</summary>
    public double ObservedShare => Ocean > PolarGap ? Observed / (Ocean - PolarGap) : 0.0;

    /// <summary>Sums one day.</summary>
    /// <param name="region">The cells and their areas.</param>
    /// <param name="totalFraction">Clipped concentrations. Unit: 1. Missing: NaN. Shape: one value a cell of the grid.</param>
    /// <param name="conditions">Tells the polar gap. Shape as above.</param>
    /// <param name="rules">What counts as ice and as pack.</param>
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
        double ice = 0, iceArea = 0, pack = 0, ocean = 0, observed = 0, gap = 0;
        for (int index = 0; index < cells.Length; index++)
        {
            int cell = cells[index];
            double area = areas[index];
            float fraction = totalFraction[cell];
            ocean += area;
            if ((conditions[cell] & CellConditions.PolarGap) != 0)
            {
                gap += area;
                continue;
            }

            observed += float.IsNaN(fraction) ? 0.0 : area;
            if (fraction >= iceLimit)
            {
                ice += area;
                iceArea += fraction * area;
                pack += fraction >= packLimit ? area : 0.0;
            }
        }

        return new(ice + gap, iceArea, ice - pack, pack, ocean, observed, gap);
    }
}
