using IceExtent.Grids;

namespace IceExtent.Retrieval.Tests.Tuning;

/// <summary>Which cells of an invented day are samples: 30 rows and 20 columns of 25 km, ice above row 15, land in the first two columns.</summary>
public sealed class SurfaceSamplingTests
{
    private const int Rows = 30;
    private const int Columns = 20;
    private static readonly Grid Map = SmallGrid.Of(Rows, Columns);
    private static readonly bool[] Ocean = [.. Enumerable.Range(0, Rows * Columns).Select(cell => cell % Columns > 1)];

    /// <summary>
    /// Origin: worked. Limits: 50 km (2 cells) from land, so columns 3 to 19 (17 of them); ice 2 cells or more from the first
    /// water row, 15, so rows 0 to 13: 14 · 17 = 238; water 2 to 10 cells from the last ice row, 14, so rows 16 to 24: 9 · 17 = 153.
    /// </summary>
    [Fact]
    public void Take_StraightEdge_TakesTheWorkedCells()
    {
        DaySamples samples = Take(cell => cell / Columns < 15 ? 1.0 : 0.0);

        Assert.Equal(238, samples.ClosedIce.Count);
        Assert.Equal(153, samples.OpenWater.Count);
        Assert.Equal(TiePointSets.F13North.OpenWater.V19Kelvins, samples.OpenWater.MeanKelvins(Channel.V19), 1e-3);
        Assert.Equal(TiePointSets.F13North.FirstYear.H19Kelvins, samples.ClosedIce.MeanKelvins(Channel.H19), 1e-3);
    }

    /// <summary>Origin: worked. A missing channel takes its cell out, a cell that melted to 90 % is not closed; both change only the counts.</summary>
    [Fact]
    public void Take_LooseAndMissingCells_AreNoSamples()
    {
        BrightnessPlanes observed = Observed(cell => cell == (5 * Columns) + 10 ? 0.9 : cell / Columns < 15 ? 1.0 : 0.0);
        observed.Kelvins(Channel.H37)[(3 * Columns) + 7] = float.NaN; // Not a channel of NASA Team: the cell stays ice.

        Assert.Equal(238 - 2, Take(observed).ClosedIce.Count);
    }

    /// <summary>Origin: worked. One water cell 60 K too warm in 37H is dropped: 153 − 1. Ice of both types, 5 % of it multiyear, stays: 238.</summary>
    [Fact]
    public void Take_Outlier_IsDroppedAndTheRarerIceTypeIsNot()
    {
        BrightnessPlanes observed = Observed(cell => cell / Columns < 15 ? 1.0 : 0.0, cell => cell % 20 == 5 ? 1.0 : 0.0);
        observed.Kelvins(Channel.H37)[(20 * Columns) + 10] += 60f;

        DaySamples samples = Take(observed);

        Assert.Equal(153 - 1, samples.OpenWater.Count);
        Assert.Equal(238, samples.ClosedIce.Count);
    }

    [Theory]
    [InlineData(0.0)] // No ice: nowhere is a belt outside its edge.
    [InlineData(1.0)] // No water.
    public void Take_NothingButOneSurface_GivesNoWaterBelt(double fraction)
    {
        DaySamples samples = Take(_ => fraction);

        Assert.Equal(0, samples.OpenWater.Count);
        Assert.Equal(fraction > 0.5 ? Rows * 17 : 0, samples.ClosedIce.Count);
    }

    [Fact]
    public void Take_EmptyDay_GivesNothing()
    {
        DaySamples samples = Take(_ => double.NaN);

        Assert.Equal((0L, 0L), (samples.OpenWater.Count, samples.ClosedIce.Count));
    }

    private static DaySamples Take(Func<int, double> fraction) => Take(Observed(fraction));

    private static DaySamples Take(BrightnessPlanes observed)
    {
        CellMask mask = new(Map, Ocean, null);
        DayRetrieval nasaTeam = new(new NasaTeam(TiePointSets.F13North), new(0.07, null), new(0.05, 0.05), mask);
        SurfaceSampling sampling = new(Map, Ocean, nasaTeam, PureDays.Own, PureDays.Channels, PureDays.Samples);
        return sampling.Take(observed, new CellConditions[Map.CellCount]);
    }

    private static BrightnessPlanes Observed(Func<int, double> ice, Func<int, double>? multiyearShare = null)
    {
        BrightnessPlanes observed = new(Map.CellCount, PureDays.Channels);
        foreach (Channel channel in PureDays.Channels)
        {
            for (int cell = 0; cell < Map.CellCount; cell++)
            {
                double multi = ice(cell) * (multiyearShare?.Invoke(cell) ?? 0.0);
                observed.Kelvins(channel)[cell] = (float)(
                    ((1 - ice(cell)) * PureDays.Kelvins(channel, points => points.OpenWater, surfaces => surfaces.OpenWater))
                    + ((ice(cell) - multi) * PureDays.Kelvins(channel, points => points.FirstYear, surfaces => surfaces.FirstYear))
                    + (multi * PureDays.Kelvins(channel, points => points.Multiyear, surfaces => surfaces.Multiyear)));
            }
        }

        return observed;
    }
}
