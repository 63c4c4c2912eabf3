using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes;
using IceExtent.Statistics.Scoring;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Worker.Configuration;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Days of the northern scene, lost on purpose, filled from days round them and held against the truth.</summary>
/// <remarks>Shows that the limits of filled cells are honest where those of observed ones are. It does not show that the scene's ice moves as real ice does.</remarks>
public sealed class DayFillingScoreTests
{
    private static readonly DateOnly Middle = new(2003, 2, 8);

    /// <summary>
    /// The aim is the project's own: 95 %, and no fewer than the observed cells of the same day reach less 2 %. Marginal cells over
    /// five days either side are the hardest; see docs/METHODS.md for the whole table.
    /// </summary>
    [Theory]
    [InlineData(1, 1)]
    [InlineData(1, 4)]
    [InlineData(3, 3)]
    [InlineData(1, 0)]
    public void Fill_LostWinterDay_LimitsHoldTheTruth(int daysBefore, int daysAfter)
    {
        List<Fault> faults = [];
        ConfigFolder config = ConfigFolder.BesideProgram;
        LoadedGrid loaded = GridLoader.Load(Path.Combine(config.Grids, "north-25km.toml"), faults)!;
        Sensor sensor = SensorLoader.Load(Path.Combine(config.Sensors, "ssmi-f13.toml"), faults)!;
        LandShare land = LandShareFile.Read(loaded.LandPath, loaded.Grid);
        Scene scene = new(SceneLoader.Load(Path.Combine(config.Scenes, "north.toml"), faults)!, loaded.Grid, land, sensor, seed: 1);
        SceneDefaults defaults = SceneDefaults.Load(config, loaded.Grid, null, null);
        CellMask mask = new(loaded.Grid, land.OceanBelow(defaults.LandLimitFraction), sensor.PolarGapLatitudeDegrees);
        Retriever retriever = new(scene, mask, defaults.Smearing);
        List<NearDay> near = [new(-daysBefore, retriever.On(Middle.AddDays(-daysBefore)))];
        if (daysAfter > 0)
        {
            near.Add(new(daysAfter, retriever.On(Middle.AddDays(daysAfter))));
        }

        ConcentrationPlanes today = retriever.On(Middle);
        ConcentrationPlanes lost = new(scene.Grid.CellCount);
        lost.MakeUnobserved(mask);
        int filled = new DayFilling(new(daysBefore, daysAfter, changePerDay: 0.10)).Fill(lost, near.ToArray(), new(scene.Grid.CellCount));
        SceneTruth truth = new(scene.Grid.CellCount);
        scene.Truth(Middle, scene.CreateWorkspace(), truth);

        Assert.Empty(faults);
        Assert.True(filled > 50_000);
        (CellScore ice, CellScore marginal) = (Score(lost, truth, 0f, 1f), Score(lost, truth, 0.15f, 0.8f));
        Assert.True(marginal.Cells > 500);
        Assert.InRange(ice.Share95, 0.95, 1.0);
        Assert.InRange(marginal.Share95, Score(today, truth, 0.15f, 0.8f).Share95 - 0.02, 1.0);
        Assert.InRange(marginal.Bias, -0.05, 0.05);
    }

    // The cells whose true concentration lies above the lower and up to the upper end.
    private static CellScore Score(ConcentrationPlanes planes, SceneTruth truth, float above, float upTo)
    {
        CellScore score = default;
        for (int cell = 0; cell < planes.CellCount; cell++)
        {
            float value = truth.Concentration[cell];
            if (value > above && value <= upTo && !float.IsNaN(planes.Total[cell]))
            {
                score = score.With(planes.Total[cell], planes.StandardError[cell], value);
            }
        }

        return score;
    }

    private sealed class Retriever(Scene scene, CellMask mask, SmearingFactors smearing)
    {
        private readonly DayRetrieval retrieval = new(
            ConcentrationMethods.Create("nasa-team", scene.Sensor.In(scene.Grid.Hemisphere), scene.Grid.Hemisphere),
            scene.Sensor.In(scene.Grid.Hemisphere).Screens,
            scene.Sensor.Scatter,
            mask,
            coast: null,
            smearing);

        public ConcentrationPlanes On(DateOnly day)
        {
            BrightnessPlanes observed = new(scene.Grid.CellCount, scene.Channels);
            CellConditions[] conditions = new CellConditions[scene.Grid.CellCount];
            scene.Observe(day, scene.CreateWorkspace(), observed);
            DayRetrieval.CheckRange(observed, scene.Sensor.Range, conditions);
            ConcentrationPlanes planes = new(scene.Grid.CellCount);
            retrieval.Retrieve(observed, conditions, planes);
            return planes;
        }
    }
}
