using IceExtent.Grids;
using IceExtent.Statistics.Overlaps;

namespace IceExtent.Statistics.Tests.Overlaps;

/// <summary>Totals of two sensors over common cells, and one offset out of two surfaces.</summary>
public sealed class SensorTotalsTests
{
    private static readonly ChannelOffset Water = new()
    {
        Pair = new(1, "one", 2, "two"),
        Channel = "19v",
        Surface = "open-water",
        OffsetKelvins = 1.0,
        StandardErrorKelvins = 0.06,
        Days = 20,
        EffectiveDays = 12.5,
        CellsPerDay = 1_000.0,
        Limits = MeanLimits.Given,
    };

    /// <summary>
    /// Origin: worked, cells of 625 km². Both see cells 0 to 2. First: 1, 0.15 and 0.1 give an extent of 2 cells and an area of
    /// 1.15; second: 0.5, 0.1 and 0.9 give 2 and 1.4. Cells 3 and 4 count for neither.
    /// </summary>
    [Fact]
    public void Sum_WorkedCells_CountsWhatBothSaw()
    {
        Grid grid = SmallGrid.EqualArea(1, 5);
        TotalsRegion region = TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid));

        CommonTotals totals = CommonTotals.Sum(region, [1f, 0.15f, 0.1f, float.NaN, 1f], [0.5f, 0.1f, 0.9f, 1f, float.NaN], 0.15);

        double cell = totals.Common / 3.0;
        Assert.Equal(625e6, cell, 1.0);
        Assert.Equal((2.0, 2.0), (totals.FirstExtent / cell, totals.SecondExtent / cell));
        Assert.Equal(1.15, totals.FirstIceArea / cell, 1e-6);
        Assert.Equal(1.40, totals.SecondIceArea / cell, 1e-6);
    }

    /// <summary>Origin: worked. Mean of 1.0 and 1.02; ½√(0.06² + 0.08²) = 0.05 is more than half the distance, 0.01.</summary>
    [Fact]
    public void Pooled_SurfacesThatAgree_HasTheErrorOfAMean()
    {
        ChannelOffset pooled = ChannelOffset.Pooled(
            Water, Water with { Surface = "closed-ice", OffsetKelvins = 1.02, StandardErrorKelvins = 0.08, Days = 18, EffectiveDays = 9.0, CellsPerDay = 500.0 });

        Assert.Equal(1.01, pooled.OffsetKelvins, 1e-12);
        Assert.Equal(0.05, pooled.StandardErrorKelvins!.Value, 1e-12);
        Assert.Equal(("both", 18, 9.0, 1_500.0), (pooled.Surface, pooled.Days, pooled.EffectiveDays, pooled.CellsPerDay));
    }

    /// <summary>Origin: worked. Offsets of 1 and 2 K are one number of 1.5 K that is wrong by 0.5 K over either surface.</summary>
    [Fact]
    public void Pooled_SurfacesThatDiffer_HasHalfTheirDistance() =>
        Assert.Equal(0.5, ChannelOffset.Pooled(Water, Water with { OffsetKelvins = 2.0 }).StandardErrorKelvins);

    [Fact]
    public void Pooled_OneWithoutError_HasNoneAndSaysWhy()
    {
        ChannelOffset pooled = ChannelOffset.Pooled(Water, Water with { StandardErrorKelvins = null, EffectiveDays = 1.5, Limits = MeanLimits.FewEffectiveDays });

        Assert.Null(pooled.StandardErrorKelvins);
        Assert.Equal(MeanLimits.FewEffectiveDays, pooled.Limits);
    }

    [Fact]
    public void Pooled_OneSurfaceAlone_StandsForBoth() => Assert.Equal(Water with { Surface = "both" }, ChannelOffset.Pooled(Water, null));
}
