using CsCheck;
using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Statistics.Tests;

/// <summary>Sums of one day. Cells are 625 km² each, so every figure can be checked by hand.</summary>
public sealed class DailyTotalsTests
{
    private const double Cell = 625e6;
    private static readonly TotalsRules Rules = new(0.15, 0.80);

    /// <summary>
    /// Origin: worked. Eight cells: land, gap, missing, 0.149, 0.15, 0.79, 0.8, 1. Ice: 0.15, 0.79, 0.8 and 1 (4 cells)
    /// and the gap; area 0.15 + 0.79 + 0.8 + 1 = 2.74 cells; marginal zone 2 cells; pack 2 cells; ocean 7 cells with the
    /// gap; observed 5 of the 6 outside the gap.
    /// </summary>
    [Fact]
    public void Sum_WorkedCells_FollowsTheDefinitions()
    {
        Grid grid = SmallGrid.EqualArea(2, 4);
        float[] total = [float.NaN, float.NaN, float.NaN, 0.149f, 0.15f, 0.79f, 0.8f, 1f];
        CellConditions[] conditions = [CellConditions.Land, CellConditions.PolarGap, CellConditions.NoObservation, 0, 0, 0, 0, 0];
        bool[] ocean = [false, true, true, true, true, true, true, true];

        DailyTotals sums = DailyTotals.Sum(TotalsRegion.Hemisphere(grid, ocean), total, conditions, Rules);

        Assert.Equal(5 * Cell, sums.Extent, 1e-3);
        Assert.Equal(2.74 * Cell, sums.IceArea, 1e2); // 0.15f and 0.79f are not exactly 0.15 and 0.79.
        Assert.Equal(2 * Cell, sums.MarginalZone, 1e-3);
        Assert.Equal(2 * Cell, sums.Pack, 1e-3);
        Assert.Equal(7 * Cell, sums.Ocean, 1e-3);
        Assert.Equal(Cell, sums.PolarGap, 1e-3);
        Assert.Equal(5.0 / 6.0, sums.ObservedShare, 1e-12);
    }

    /// <summary>
    /// Origin: worked. Six cells: open gap, gap filled with 0.5, gap filled with 0.1, filled from neighbours 0.9, observed
    /// 0.4, missing. Ice: 0.5, 0.9, 0.4 (3 cells, area 1.8; pack 1), and the open gap only where the rule counts it.
    /// Outside the gap lie 3 cells: one observed, one filled.
    /// </summary>
    [Theory]
    [InlineData(PolarGapRule.CountAsIce, 4)]
    [InlineData(PolarGapRule.LeaveOut, 3)]
    [InlineData(PolarGapRule.Laplace, 4)]
    public void Sum_FilledCells_CountLikeOthersAndAreTold(PolarGapRule rule, int iceCells)
    {
        Grid grid = SmallGrid.EqualArea(2, 3);
        const CellConditions FilledGap = CellConditions.PolarGap | CellConditions.FilledPolarGap;
        float[] total = [float.NaN, 0.5f, 0.1f, 0.9f, 0.4f, float.NaN];
        CellConditions[] conditions =
            [CellConditions.PolarGap, FilledGap, FilledGap, CellConditions.NoObservation | CellConditions.FilledFromNeighbours, 0, CellConditions.NoObservation];

        DailyTotals sums = DailyTotals.Sum(TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid)), total, conditions, Rules with { PolarGap = rule });

        Assert.Equal(iceCells * Cell, sums.Extent, 1e-3);
        Assert.Equal(1.8 * Cell, sums.IceArea, 1e2);
        Assert.Equal(2 * Cell, sums.MarginalZone, 1e-3);
        Assert.Equal(Cell, sums.Pack, 1e-3);
        Assert.Equal(3 * Cell, sums.PolarGap, 1e-3);
        Assert.Equal(1.0 / 3.0, sums.ObservedShare, 1e-12);
        Assert.Equal(1.0 / 3.0, sums.FilledShare, 1e-12);
    }

    /// <summary>Filling the gap takes nothing from any total that leaves it out, and gives no more extent than counting all of it.</summary>
    [Fact]
    public void Sum_FilledGap_LiesBetweenTheOtherRules() =>
        Gen.Select(Gen.Double[0, 1].Array[100], Gen.Int[0, 9].Array[100]).Sample((values, draws) =>
        {
            Grid grid = SmallGrid.EqualArea(10, 10);
            bool[] ocean = [.. draws.Select(draw => draw > 0)];
            CellMask mask = new(grid, ocean, 89.4);
            ConcentrationPlanes planes = new(100);
            for (int cell = 0; cell < 100; cell++)
            {
                bool seen = mask.Conditions[cell] == CellConditions.None && draws[cell] > 1;
                planes.Total[cell] = seen ? (float)values[cell] : float.NaN;
                planes.StandardError[cell] = seen ? 0.05f : float.NaN;
                planes.Conditions[cell] = mask.Conditions[cell] == CellConditions.None && !seen ? CellConditions.NoObservation : mask.Conditions[cell];
            }

            TotalsRegion region = TotalsRegion.Hemisphere(grid, ocean);
            DailyTotals without = Of(PolarGapRule.LeaveOut);
            DailyTotals counted = Of(PolarGapRule.CountAsIce);
            new PolarGapFilling(new PolarGapSystem(grid, mask), 0.3).Fill(planes);
            DailyTotals filled = Of(PolarGapRule.Laplace);
            return filled.Extent >= without.Extent && filled.IceArea >= without.IceArea && filled.Pack >= without.Pack
                && filled.Extent <= counted.Extent + 1e-3
                && filled.PolarGap == without.PolarGap && filled.ObservedShare == without.ObservedShare && filled.FilledShare == 0.0;

            DailyTotals Of(PolarGapRule rule) => DailyTotals.Sum(region, planes.Total, planes.Conditions, Rules with { PolarGap = rule });
        });

    [Fact]
    public void Sum_NothingObserved_IsOnlyTheGap()
    {
        Grid grid = SmallGrid.EqualArea(1, 2);
        CellConditions[] conditions = [CellConditions.PolarGap, CellConditions.NoObservation];

        DailyTotals sums = DailyTotals.Sum(
            TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid)), [float.NaN, float.NaN], conditions, Rules);

        Assert.Equal(Cell, sums.Extent, 1e-3);
        Assert.Equal(0.0, sums.IceArea);
        Assert.Equal(0.0, sums.ObservedShare);
    }

    /// <summary>A higher limit never gives more extent, and marginal zone and pack make up the extent outside the gap.</summary>
    [Fact]
    public void Sum_AnyDay_KeepsItsParts() =>
        Gen.Select(Gen.Single[0, 1].Array[24], Gen.Double[0.05, 0.4]).Sample((fractions, limit) =>
        {
            Grid grid = SmallGrid.EqualArea(4, 6);
            TotalsRegion region = TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid));
            CellConditions[] conditions = new CellConditions[24];
            DailyTotals low = DailyTotals.Sum(region, fractions, conditions, new(limit, 0.8));
            DailyTotals high = DailyTotals.Sum(region, fractions, conditions, new(limit + 0.1, 0.8));
            return high.Extent <= low.Extent
                && Math.Abs(low.MarginalZone + low.Pack - low.Extent) < 1e-3
                && low.IceArea <= low.Extent
                && low.Pack * 0.8 <= low.IceArea + 1e-3;
        });
}
