using CsCheck;
using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests.Observation;

public sealed class CoverageTests
{
    private static readonly SceneParameters North = Shipped.Scene("north").Clean();

    private static Scene Make(Func<CoverageParameters, CoverageParameters> change, Grid? grid = null, Sensor? sensor = null) =>
        TestWorld.Make(North with { Coverage = change(North.Coverage) }, grid: grid, sensor: sensor);

    private static double LostShare(Scene scene, DateOnly day) =>
        scene.Observed(day).Kelvins(Channel.V19).ToArray().Average(kelvins => float.IsNaN(kelvins) ? 1.0 : 0.0);

    // Law: 20,000 days. Missing days come up to three at a time, so the standard error is at most sqrt(3) that of a
    // coin: below 0.005.
    [Theory]
    [InlineData(0.0)]
    [InlineData(0.02)]
    [InlineData(0.2)]
    public void IsMissing_ManyDays_HasTheGivenShare(double share)
    {
        Scene scene = Make(coverage => coverage with { MissingDayShare = share });

        double found = Enumerable.Range(0, 20_000).Average(index => scene.IsMissing(new DateOnly(1990, 1, 1).AddDays(index)) ? 1.0 : 0.0);

        Assert.Equal(share, found, share == 0.0 ? 0.0 : 0.015);
    }

    [Fact]
    public void IsMissing_EveryOtherDay_LeavesEveryOtherDay()
    {
        Scene scene = Make(coverage => coverage with { DayStep = 2 });

        Assert.False(scene.IsMissing(new(1990, 1, 1)));
        Assert.True(scene.IsMissing(new(1990, 1, 2)));
        Assert.False(scene.IsMissing(new(1990, 1, 3)));
    }

    [Fact]
    public void IsMissing_OutageAndService_EndOnTheirDays()
    {
        Scene scene = Make(coverage => coverage with { Outages = [new() { FirstDay = new(2000, 2, 28), LastDay = new(2000, 3, 1) }] });

        Assert.False(scene.IsMissing(new(2000, 2, 27)));
        Assert.True(scene.IsMissing(new(2000, 2, 28)));
        Assert.True(scene.IsMissing(new(2000, 3, 1)));
        Assert.False(scene.IsMissing(new(2000, 3, 2)));
        Assert.True(scene.IsMissing(new(1989, 12, 31)));
    }

    [Fact]
    public void Observe_MissingDay_IsMissingEverywhere()
    {
        Scene scene = Make(coverage => coverage with { DayStep = 2 });

        Assert.Equal(1.0, LostShare(scene, new(1990, 1, 2)));
        Assert.Equal(0.0, LostShare(scene, new(1990, 1, 3)));
    }

    // Law: 2,304 cells on 40 days; the standard error of a share of 0.1 is 0.001.
    [Theory]
    [InlineData(0.01)]
    [InlineData(0.1)]
    public void Observe_SingleCells_AreLostAtTheGivenShare(double share)
    {
        Scene scene = Make(coverage => coverage with { LostCellShare = share });

        double found = Enumerable.Range(0, 40).Average(index => LostShare(scene, new DateOnly(2000, 1, 1).AddDays(index)));

        Assert.Equal(share, found, 0.005);
    }

    // Law: 400 days; the standard error of a share of 0.3 is 0.023.
    [Fact]
    public void Observe_LostPasses_ComeOnTheGivenShareOfDays()
    {
        Grid small = TestWorld.GridOf(Hemisphere.North, cells: 20, cellMeters: 100_000);
        Scene scene = Make(coverage => coverage with { LostPassDayShare = 0.3, LostPassKilometers = 2_000 }, small);

        double found = Enumerable.Range(0, 400).Average(index => LostShare(scene, new DateOnly(2000, 1, 1).AddDays(index)) > 0.0 ? 1.0 : 0.0);

        Assert.Equal(0.3, found, 0.08);
    }

    [Fact]
    public void Observe_PolarGap_IsTheCircleOfTheSensor()
    {
        Scene scene = Make(coverage => coverage, sensor: TestWorld.Sensor with { PolarGapLatitudeDegrees = 84.5 });
        ReadOnlySpan<float> kelvins = scene.Observed(new(2000, 1, 1)).Kelvins(Channel.V19);
        for (int cell = 0; cell < kelvins.Length; cell++)
        {
            Assert.Equal(scene.Grid.LatitudesDegrees[cell] >= 84.5, float.IsNaN(kelvins[cell]));
        }
    }

    // Origin: independent. Orbits flown step by step over a turning Earth (tests/data/scenes/swath_gaps.py, NumPy). Here the
    // share is a mean over a belt of two degrees and there it is that of one circle: two points in a hundred are allowed.
    [Fact]
    public void Observe_SwathGaps_LoseTheShareThatFlownOrbitsLose()
    {
        Grid wide = TestWorld.GridOf(Hemisphere.North, cells: 200, cellMeters: 85_000);
        Scene scene = Make(
            coverage => coverage with { SwathKilometers = 1394, OrbitsPerDay = 14.1, InclinationDegrees = 98.8 }, wide);
        float[] kelvins = scene.Observed(new(2000, 1, 1)).Kelvins(Channel.V19).ToArray();
        foreach (string[] row in Shipped.Rows("swath_gaps.csv"))
        {
            double latitude = Shipped.Number(row[0]);
            int[] ring = [.. Enumerable.Range(0, kelvins.Length).Where(cell => Math.Abs(wide.LatitudesDegrees[cell] - latitude) < 1.0)];
            double lost = ring.Average(cell => float.IsNaN(kelvins[cell]) ? 1.0 : 0.0);

            Assert.True(ring.Length > 300);
            Assert.True(Math.Abs(lost - Shipped.Number(row[1])) < 0.02, $"{latitude}°: {lost:F3} here, {row[1]} flown.");
        }
    }

    [Fact]
    public void Observe_WiderSwath_LosesNoMore() =>
        Gen.Select(Gen.Double[700, 1500], Gen.Double[0, 600]).Sample(
            (swath, more) =>
            {
                Grid grid = TestWorld.GridOf(Hemisphere.North, cells: 50, cellMeters: 250_000);
                double Lost(double width) => LostShare(Make(coverage => coverage with { SwathKilometers = width }, grid), new(2000, 1, 1));
                Assert.True(Lost(swath + more) <= Lost(swath));
            },
            iter: 20);
}
