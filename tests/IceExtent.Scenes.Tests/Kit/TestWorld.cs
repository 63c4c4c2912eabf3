using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes.Parameters;

namespace IceExtent.Scenes.Tests.Kit;

/// <summary>Small worlds for tests.</summary>
internal static class TestWorld
{
    /// <summary>4,800 km across in cells of 100 km, the north pole in the middle.</summary>
    public static Grid North { get; } = GridOf(Hemisphere.North, cells: 48, cellMeters: 100_000);

    /// <summary>9,600 km across in cells of 150 km, the south pole in the middle.</summary>
    public static Grid South { get; } = GridOf(Hemisphere.South, cells: 64, cellMeters: 150_000);

    public static LandShare NoLand(Grid grid) => new(new float[grid.CellCount]);

    /// <summary>A sensor with all five channels, with tie points near those of many radiometers.</summary>
    public static Sensor Sensor { get; } = new()
    {
        Name = "test",
        Title = "Test",
        FrequenciesGigahertz = new Dictionary<Channel, double>
        {
            [Channel.V19] = 19.35, [Channel.H19] = 19.35, [Channel.V22] = 22.235, [Channel.V37] = 37.0, [Channel.H37] = 37.0,
        },
        FirstDay = new(1990, 1, 1),
        LastDay = null,
        Range = new(50, 350),
        PolarGapLatitudeDegrees = null,
        Scatter = new(0.05, 0.05),
        North = new(TiePoints, new(0.05, 0.045)),
        South = new(TiePoints, new(0.05, 0.045)),
    };

    public static TiePoints TiePoints => new(
        OpenWater: new(V19Kelvins: 185.2, H19Kelvins: 114.4, V37Kelvins: 205.2),
        FirstYear: new(V19Kelvins: 251.2, H19Kelvins: 235.4, V37Kelvins: 241.1),
        Multiyear: new(V19Kelvins: 222.4, H19Kelvins: 198.6, V37Kelvins: 186.2));

    public static Grid GridOf(Hemisphere hemisphere, int cells, double cellMeters)
    {
        double half = cells * cellMeters / 2.0;
        double trueScale = hemisphere == Hemisphere.North ? 70.0 : -70.0;
        return new(
            "test", null, new PolarStereographic(Ellipsoid.Wgs84, trueScale, 0.0), new(cells, cells, cellMeters, -half, half));
    }

    /// <summary>The shipped northern scene with everything observed and no instrument errors.</summary>
    public static SceneParameters Clean(this SceneParameters parameters)
    {
        Dictionary<Channel, double> none = [];
        return parameters with
        {
            Instrument = parameters.Instrument with
            {
                NoiseKelvins = none, FootprintKilometers = none, OffsetKelvins = none, DriftKelvinsPerDecade = none,
            },
            Coverage = parameters.Coverage with
            {
                SwathKilometers = 0, DayStep = 1, MissingDayShare = 0, LostPassDayShare = 0, LostCellShare = 0, Outages = [],
            },
        };
    }

    public static Scene Make(SceneParameters parameters, long seed = 1, Grid? grid = null, Sensor? sensor = null)
    {
        Grid where = grid ?? North;
        return new(parameters, where, NoLand(where), sensor ?? Sensor, seed);
    }

    public static BrightnessPlanes Observed(this Scene scene, DateOnly day)
    {
        BrightnessPlanes planes = new(scene.Grid.CellCount, scene.Channels);
        scene.Observe(day, scene.CreateWorkspace(), planes);
        return planes;
    }

    public static SceneTruth TruthOf(this Scene scene, DateOnly day)
    {
        SceneTruth truth = new(scene.Grid.CellCount);
        scene.Truth(day, scene.CreateWorkspace(), truth);
        return truth;
    }

    /// <summary>The area of cells of at least 15 % ice, in m².</summary>
    public static double Extent(this Scene scene, DateOnly day)
    {
        float[] ice = scene.TruthOf(day).Concentration;
        double sum = 0.0;
        for (int cell = 0; cell < ice.Length; cell++)
        {
            sum += ice[cell] >= 0.15f ? scene.Grid.CellAreasSquareMeters[cell] : 0.0;
        }

        return sum;
    }
}
