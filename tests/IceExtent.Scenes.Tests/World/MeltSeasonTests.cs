using IceExtent.Retrieval;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests.World;

/// <summary>The melt season that a scene may impose, and its truth.</summary>
public sealed class MeltSeasonTests
{
    private static readonly SceneParameters North = Shipped.Scene("north");
    private static readonly SceneParameters Imposed = North with { MeltSeason = North.MeltSeason with { Imposed = true } };

    /// <summary>Without the weather's part the turn is exact: more wet than dry at noon from the day on, and not on the day before.</summary>
    [Fact]
    public void MeltTurns_WithoutWeather_AreTheDaysOfTheWetness()
    {
        Scene scene = TestWorld.Make(Imposed with { MeltSeason = Imposed.MeltSeason with { EarlyMeltShare = 0, RefreezeShare = 0 } });
        SceneWorkspace workspace = scene.CreateWorkspace();
        (int[] wet, int[] dry) = Turns(scene, 2001);
        float[] share = new float[scene.Grid.CellCount], before = new float[scene.Grid.CellCount];
        int turned = 0;
        for (int day = new DateOnly(2001, 4, 1).DayNumber; day < new DateOnly(2001, 11, 15).DayNumber; day += 3)
        {
            scene.Melt(DateOnly.FromDayNumber(day), workspace, share);
            scene.Melt(DateOnly.FromDayNumber(day - 1), workspace, before);
            for (int cell = 0; cell < wet.Length; cell++)
            {
                if (wet[cell] == day || dry[cell] == day)
                {
                    bool melts = wet[cell] == day;
                    Assert.Equal((melts, !melts), (share[cell] >= 0.5f, before[cell] >= 0.5f));
                    turned++;
                }
            }
        }

        Assert.True(turned > 1_000);
    }

    /// <summary>At least 1 − 0.3 wet two days inside the season, at most 0.1 two days outside: shares of the shipped file.</summary>
    [Fact]
    public void Melt_Imposed_KeepsToItsShares()
    {
        Scene scene = TestWorld.Make(Imposed);
        SceneWorkspace workspace = scene.CreateWorkspace();
        (int[] wet, int[] dry) = Turns(scene, 2001);
        float[] share = new float[scene.Grid.CellCount];
        for (int day = new DateOnly(2001, 1, 10).DayNumber; day < new DateOnly(2001, 12, 20).DayNumber; day += 17)
        {
            scene.Melt(DateOnly.FromDayNumber(day), workspace, share);
            for (int cell = 0; cell < wet.Length; cell++)
            {
                if (day >= wet[cell] + 2 && day < dry[cell] - 2)
                {
                    Assert.InRange(share[cell], 0.6999f, 1f);
                }
                else if (day < wet[cell] - 2 || day >= dry[cell] + 2)
                {
                    Assert.InRange(share[cell], 0f, 0.1001f);
                }
            }
        }
    }

    /// <summary>Two days later for each degree, and 1.8 sooner in autumn; another year, another field.</summary>
    [Fact]
    public void MeltTurns_ByLatitudeAndYear_FollowTheParameters()
    {
        Scene scene = TestWorld.Make(Imposed);
        (int[] wet, int[] dry) = Turns(scene, 2001);
        ReadOnlySpan<double> latitudes = scene.Grid.LatitudesDegrees;
        int newYear = new DateOnly(2001, 1, 1).DayNumber;
        double wetError = 0.0, dryError = 0.0;
        for (int cell = 0; cell < wet.Length; cell++)
        {
            wetError += wet[cell] - newYear - (111.5 + (2.0 * (latitudes[cell] - 60.0)));
            dryError += dry[cell] - newYear - (299.5 - (1.8 * (latitudes[cell] - 60.0)));
        }

        Assert.InRange(wetError / wet.Length, -3.0, 3.0); // A few independent places of 6 days each.
        Assert.InRange(dryError / dry.Length, -3.0, 3.0);
        Assert.NotEqual(wet, Array.ConvertAll(Turns(scene, 2002).Wet, day => day - 365));
    }

    [Fact]
    public void MeltTurns_South_EndInTheNextYear()
    {
        SceneParameters south = Shipped.Scene("south");
        Scene scene = TestWorld.Make(south with { MeltSeason = south.MeltSeason with { Imposed = true } }, grid: TestWorld.South);
        (int[] wet, int[] dry) = Turns(scene, 2001);

        double[] latitudes = scene.Grid.LatitudesDegrees.ToArray();
        int[] sea = [.. Enumerable.Range(0, wet.Length).Where(cell => latitudes[cell] > -79.0)]; // Nearer the pole, where land is, seasons shrink to nothing.
        Assert.All(sea, cell => Assert.InRange(dry[cell] - wet[cell], 5, 300));
        Assert.All(sea, cell => Assert.Equal(2002, DateOnly.FromDayNumber(dry[cell]).Year));
    }

    /// <summary>Where the weather decides, nothing of the season reaches a temperature, and there is no truth to ask for.</summary>
    [Fact]
    public void Observe_NotImposed_DoesNotDependOnTheSeason()
    {
        DateOnly summer = new(2001, 6, 20);
        SceneParameters other = North with { MeltSeason = North.MeltSeason with { OnsetDayOfYear = 10, SpreadDays = 0, RefreezeShare = 0.4 } };

        Assert.Equal(
            TestWorld.Make(North).Observed(summer).Kelvins(Channel.H19).ToArray(), TestWorld.Make(other).Observed(summer).Kelvins(Channel.H19).ToArray());
        Assert.Throws<InvalidOperationException>(() => Turns(TestWorld.Make(North), 2001));
        Assert.NotEqual(
            TestWorld.Make(North).Observed(summer).Kelvins(Channel.H19).ToArray(), TestWorld.Make(Imposed).Observed(summer).Kelvins(Channel.H19).ToArray());
    }

    private static (int[] Wet, int[] Dry) Turns(Scene scene, int year)
    {
        int[] wet = new int[scene.Grid.CellCount], dry = new int[scene.Grid.CellCount];
        scene.MeltTurns(year, scene.CreateWorkspace(), wet, dry);
        return (wet, dry);
    }
}
