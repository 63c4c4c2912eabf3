using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes;
using IceExtent.Scenes.Parameters;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Worker.Configuration;

namespace IceExtent.References.Tests;

/// <summary>Facts that the trade takes for granted: common practice, no source.</summary>
public sealed class TradeFactTests
{
    private const double WorldOceanSquareKilometers = 361e6; // Common practice: 71 % of the Earth's surface.

    public static TheoryData<string> Scenes() => ["north", "south"];

    /// <summary>Common practice, no source: sea water freezes near −1.8 °C.</summary>
    [Theory]
    [MemberData(nameof(Scenes))]
    public void Scene_SeaWater_FreezesNearMinus1Point8(string hemisphere) =>
        Assert.InRange(Parameters(hemisphere).Weather.FreezingKelvins - 273.15, -1.9, -1.7);

    /// <summary>
    /// Common practice, no source: over the year sea ice covers about 7 % of the world's ocean. The scenes, the land files,
    /// the cell areas and the sums must bring that out together; 6 to 8 % is what "about" is taken to mean.
    /// </summary>
    [Fact]
    public void Scenes_BothPolesOverAYear_CoverAboutSevenPercentOfTheOcean()
    {
        double share = (MeanExtentSquareKilometers("north", "ssmis-f17") + MeanExtentSquareKilometers("south", "ssmis-f17")) / WorldOceanSquareKilometers;

        Assert.InRange(share, 0.06, 0.08);
    }

    private static double MeanExtentSquareKilometers(string hemisphere, string sensorName)
    {
        List<Fault> faults = [];
        LoadedGrid loaded = GridLoader.Load(Path.Combine(ConfigFolder.BesideProgram.Grids, $"{hemisphere}-25km.toml"), faults)!;
        Sensor sensor = SensorLoader.Load(Path.Combine(ConfigFolder.BesideProgram.Sensors, sensorName + ".toml"), faults)!;
        LandShare land = LandShareFile.Read(loaded.LandPath, loaded.Grid);
        Scene scene = new(Parameters(hemisphere), loaded.Grid, land, sensor, seed: 7);
        SceneWorkspace workspace = scene.CreateWorkspace();
        SceneTruth truth = new(loaded.Grid.CellCount);
        TotalsRegion ocean = TotalsRegion.Hemisphere(loaded.Grid, land.OceanBelow(0.5));
        CellConditions[] nothing = new CellConditions[loaded.Grid.CellCount];

        Assert.Empty(faults);
        return Enumerable.Range(1, 12).Average(month =>
        {
            scene.Truth(new DateOnly(2015, month, 15), workspace, truth);
            return DailyTotals.Sum(ocean, truth.Concentration, nothing, new(0.15, 0.80)).Extent / 1e6;
        });
    }

    private static SceneParameters Parameters(string hemisphere)
    {
        List<Fault> faults = [];
        SceneParameters? parameters = SceneLoader.Load(Path.Combine(ConfigFolder.BesideProgram.Scenes, hemisphere + ".toml"), faults);

        Assert.Empty(faults);
        return parameters!;
    }
}
