using IceExtent.Grids;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests;

public sealed class SceneTruthTests
{
    public static TheoryData<string> Names() => ["north", "south", "demo"];

    private static Scene Make(string name, long seed = 1) =>
        TestWorld.Make(Shipped.Scene(name), seed, name == "south" ? TestWorld.South : TestWorld.North);

    [Theory]
    [MemberData(nameof(Names))]
    public void Truth_AnyDay_HasSharesThatAddUp(string name)
    {
        Scene scene = Make(name);
        for (DateOnly day = new(2001, 1, 5); day.Year == 2001; day = day.AddDays(23))
        {
            SceneTruth truth = scene.TruthOf(day);
            for (int cell = 0; cell < truth.Concentration.Length; cell++)
            {
                Assert.InRange(truth.FirstYear[cell], 0f, 1f);
                Assert.InRange(truth.Multiyear[cell], 0f, 1f);
                Assert.InRange(truth.Concentration[cell], 0f, 1f);
                Assert.Equal(truth.Concentration[cell], truth.FirstYear[cell] + truth.Multiyear[cell], 1e-6f);
            }
        }
    }

    // Law: in the north March has more ice than September in every year, in the south less.
    [Theory]
    [MemberData(nameof(Names))]
    public void Truth_EveryYear_HasItsSeasons(string name)
    {
        Scene scene = Make(name);
        for (int year = 1980; year < 2030; year++)
        {
            double march = scene.Extent(new(year, 3, 13));
            double september = scene.Extent(new(year, 9, 15));
            Assert.True(name == "south" ? september > march : march > september, $"{year}: {march:E3} m², {september:E3} m².");
        }
    }

    // Law: with a retreat of the summer edge, Septembers lose ice over the decades. The shipped scene retreats by 0.9
    // degrees a decade with a spread of 0.9: over two means of 20 years, 20 years apart, six standard errors.
    [Fact]
    public void Truth_RetreatingEdge_LosesIceOverTheDecades()
    {
        Scene scene = Make("north");
        double Mean(int first) => Enumerable.Range(first, 20).Average(year => scene.Extent(new(year, 9, 15)));

        Assert.True(Mean(2005) < 0.9 * Mean(1985));
    }

    [Fact]
    public void Truth_TwoYears_Differ() =>
        Assert.NotEqual(Make("north").Extent(new(2001, 9, 15)), Make("north").Extent(new(2002, 9, 15)));

    [Fact]
    public void Truth_OtherSeed_IsAnotherSea() =>
        Assert.NotEqual(Make("north", 1).TruthOf(new(2001, 6, 1)).Concentration, Make("north", 2).TruthOf(new(2001, 6, 1)).Concentration);

    [Fact]
    public void Truth_NextDay_IsMuchTheSame()
    {
        Scene scene = Make("demo");
        float[] today = scene.TruthOf(new(2001, 5, 1)).Concentration, tomorrow = scene.TruthOf(new(2001, 5, 2)).Concentration;

        Assert.True(today.Zip(tomorrow, (a, b) => Math.Abs(a - b)).Average() < 0.03);
    }

    [Fact]
    public void Truth_OldIce_IsThereAfterTheMinimumAndGoesWithTheEdge()
    {
        Scene scene = Make("north");
        SceneTruth winter = scene.TruthOf(new(2001, 2, 1));
        SceneTruth before = scene.TruthOf(new(2000, 9, 15));
        for (int cell = 0; cell < winter.Multiyear.Length; cell++)
        {
            // Two and a half degrees (three widths of the rim) outside the summer's ice no old ice may stand in winter.
            if (winter.Multiyear[cell] > 0.5f)
            {
                Assert.True(Nearby(before.Concentration, cell, scene.Grid) > 0.15f, $"Cell {cell} holds old ice far from the summer's pack.");
            }
        }

        Assert.Contains(winter.Multiyear, share => share > 0.5f);
        Assert.Contains(winter.FirstYear, share => share > 0.9f);
    }

    [Fact]
    public void Truth_LandCells_AreMissing()
    {
        Grid grid = TestWorld.North;
        float[] share = new float[grid.CellCount];
        (share[5], share[6], share[7]) = (1f, 0.99f, 0.5f);
        Scene scene = new(Shipped.Scene("north"), grid, new(share), TestWorld.Sensor, 1);

        SceneTruth truth = scene.TruthOf(new(2001, 3, 1));

        Assert.Equal([5], Enumerable.Range(0, grid.CellCount).Where(cell => float.IsNaN(truth.Concentration[cell])));
        Assert.True(float.IsNaN(truth.FirstYear[5]) && float.IsNaN(truth.Multiyear[5]));
    }

    // Law: the mean share of open leads is as given. Deep inside the pack nothing else opens water.
    [Theory]
    [InlineData(0.05)]
    [InlineData(0.02)]
    public void Truth_DeepPack_HasTheMeanShareOfLeads(double share)
    {
        SceneParameters parameters = Shipped.Scene("north");
        parameters = parameters with
        {
            Ice = parameters.Ice with { WinterLeadShare = share, SummerLeadShare = share },
            Season = parameters.Season with { WinterEdgeLatitudeDegrees = 40, SummerEdgeLatitudeDegrees = 41 },
        };
        Scene scene = TestWorld.Make(parameters);

        double open = Enumerable.Range(0, 200)
            .Average(index => 1.0 - scene.TruthOf(new DateOnly(1990, 1, 1).AddDays(37 * index)).Concentration.Average());

        Assert.Equal(share, open, 0.1 * share);
    }

    [Fact]
    public void Truth_WarmInflow_OpensWaterThereAndNotFarAway()
    {
        SceneParameters north = Shipped.Scene("north");
        WarmInflow inflow = new() { LatitudeDegrees = 84, LongitudeDegrees = 30, ReachKilometers = 300, StrengthDegrees = 40 };
        float[] without = TestWorld.Make(north).TruthOf(new(2001, 3, 10)).Concentration;
        float[] with = TestWorld.Make(north with { Ice = north.Ice with { WarmInflows = [inflow] } }).TruthOf(new(2001, 3, 10)).Concentration;
        int inside = TestWorld.North.CellAt(new GeoPosition(84, 30))!.Value, far = TestWorld.North.CellAt(new GeoPosition(84, 210))!.Value;

        Assert.Equal(0f, with[inside]);
        Assert.True(without[inside] > 0.8f);
        Assert.Equal(without[far], with[far], 1e-3f);
    }

    [Fact]
    public void Truth_CoastThatFreezesEarly_HasMoreIceInWinterOnly()
    {
        Grid grid = TestWorld.North;
        LandShare land = new([.. Enumerable.Range(0, grid.CellCount).Select(cell => cell % grid.Columns < 8 ? 1f : 0f)]);
        SceneParameters north = Shipped.Scene("north");
        double Coastal(double winterDegrees, DateOnly day)
        {
            IceParameters ice = north.Ice with { CoastReachKilometers = 200, CoastWinterDegrees = winterDegrees, CoastSummerDegrees = 0 };
            float[] found = new Scene(north with { Ice = ice }, grid, land, TestWorld.Sensor, 1).TruthOf(day).Concentration;
            return Enumerable.Range(0, grid.CellCount).Where(cell => cell % grid.Columns is >= 8 and < 11).Average(cell => (double)found[cell]);
        }

        Assert.True(Coastal(12, new(2001, 12, 1)) > Coastal(0, new(2001, 12, 1)) + 0.1);
        Assert.Equal(Coastal(0, new(2001, 9, 15)), Coastal(12, new(2001, 9, 15)), 0.02);
    }

    [Fact]
    public void Truth_WorkspaceOfAnotherScene_IsRefused()
    {
        Scene scene = Make("north"), other = Make("north");

        Assert.Throws<ArgumentException>(
            () => scene.Truth(new(2001, 1, 1), other.CreateWorkspace(), new SceneTruth(scene.Grid.CellCount)));
    }

    private static float Nearby(float[] plane, int cell, Grid grid)
    {
        float highest = 0f;
        for (int down = -3; down <= 3; down++)
        {
            for (int right = -3; right <= 3; right++)
            {
                int row = (cell / grid.Columns) + down, column = (cell % grid.Columns) + right;
                bool inside = row >= 0 && row < grid.Rows && column >= 0 && column < grid.Columns;
                highest = inside ? Math.Max(highest, plane[(row * grid.Columns) + column]) : highest;
            }
        }

        return highest;
    }

    // Law: nothing melts anywhere poleward of 75 degrees in February, and most of it does in July; the share is from 0 to 1.
    [Fact]
    public void Melt_NorthernSeasons_IsASummerThing()
    {
        Scene scene = Make("north");
        SceneWorkspace workspace = scene.CreateWorkspace();
        float[] share = new float[scene.Grid.CellCount];
        int[] poleward = [.. Enumerable.Range(0, share.Length).Where(cell => scene.Grid.LatitudesDegrees[cell] > 75.0)];

        scene.Melt(new(2001, 2, 10), workspace, share);
        Assert.All(poleward, cell => Assert.InRange(share[cell], 0f, 0.05f));

        scene.Melt(new(2001, 7, 10), workspace, share);
        Assert.All(share, value => Assert.InRange(value, 0f, 1f));
        Assert.True(poleward.Count(cell => share[cell] > 0.05f) > 0.5 * poleward.Length);
        Assert.Throws<ArgumentException>(() => scene.Melt(new(2001, 7, 10), workspace, new float[3]));
    }
}
