using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes;
using IceExtent.Scenes.Demo;
using IceExtent.Scenes.Parameters;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Faults;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Seasons;

namespace IceExtent.Worker.Tests;

/// <summary>Dates of an invented sea whose temperatures are mixtures of the pure surfaces, without noise, weather or footprint.</summary>
/// <remarks>
/// Origin of the expected dates: the scene's own truth, read by the same rules, so this proves what lies between: retrieval, 16-bit storage and
/// the search of every cell. That the rules themselves are right is shown by the worked examples of <c>SeasonFinderTests</c>.
/// </remarks>
public sealed class NoiseFreeSeasonTests
{
    [Theory]
    [InlineData("steady")]
    [InlineData("stammerjohn-2008")]
    [InlineData("lebrun-2019")]
    [InlineData("johnson-eicken-2016")]
    public void Find_NoiseFreeScene_GivesTheTrueDates(string scheme)
    {
        SeasonSettings season = Season(scheme);
        List<Fault> faults = [];
        SceneParameters parameters = SceneLoader.Load(Path.Combine(ConfigFolder.BesideProgram.Scenes, "demo.toml"), faults)!;
        Scene scene = new(parameters, InventedSea.Grid, InventedSea.Land, InventedRadiometer.Sensor, seed: 7);
        IceYear year = season.Scheme.YearStart.Beginning(2022);
        IceYearSpan span = season.SpanOf(year, year.FirstDay.AddYears(-1), year.LastDay.AddYears(1));
        bool[] ocean = InventedSea.Land.OceanBelow(0.5);
        int[] cells = [.. Enumerable.Range(0, ocean.Length).Where(cell => ocean[cell])];
        IceYearStack truth = new(cells, ocean.Length), seen = new(cells, ocean.Length);
        truth.Clear(span);
        seen.Clear(span);
        Mixtures mixtures = new(scene, ocean);
        for (int day = 0; day < span.Days; day++)
        {
            mixtures.Make(span.FirstDate.AddDays(day));
            truth.Set(day, mixtures.Truth.Concentration, new float[ocean.Length]);
            seen.Set(day, mixtures.Retrieved.Total, mixtures.Retrieved.StandardError);
        }

        CellSeasons expected = CellSeasonSearch.Find(truth, season.Scheme, melt: null, span, 1, CancellationToken.None);
        CellSeasons found = CellSeasonSearch.Find(seen, season.Scheme, melt: null, span, 1, CancellationToken.None);

        int[] withIce = [.. Enumerable.Range(0, cells.Length).Where(expected.HadIce)];
        Assert.True(withIce.Length > 5_000, $"{withIce.Length} cells had ice.");
        int same = withIce.Count(cell => SeasonEvents.All.All(which =>
            expected.Dates[cell].Of(which)?.State == found.Dates[cell].Of(which)?.State && expected.Dates[cell].Of(which)?.Day == found.Dates[cell].Of(which)?.Day));
        Assert.True(same >= 0.99 * withIce.Length, $"{same} of {withIce.Length} cells have every date of the truth.");
        Assert.Contains(withIce, cell => expected.Dates[cell].Ice.Retreat.Day is not null && expected.Dates[cell].Ice.Advance.Day is not null);
    }

    private static SeasonSettings Season(string scheme)
    {
        List<Fault> faults = [];
        ConfigScope run = new(TomlFile.Parse($"[season]\nscheme = \"{scheme}\"\n", "run.toml", faults)!, string.Empty, faults);
        ConfigScope defaults = new(TomlFile.Read(ConfigFolder.BesideProgram.Defaults, faults)!, string.Empty, faults);
        SeasonSettings? season = SeasonLoader.Load(run, defaults, ConfigFolder.BesideProgram, Hemisphere.North, ".", faults);
        Assert.Empty(faults);
        return season!;
    }

    private sealed class Mixtures(Scene scene, bool[] ocean)
    {
        private static readonly Channel[] Channels = [Channel.V19, Channel.H19, Channel.V37];

        private readonly TiePoints points = scene.Sensor.In(Hemisphere.North).TiePoints;
        private readonly SceneWorkspace workspace = scene.CreateWorkspace();
        private readonly BrightnessPlanes observed = new(scene.Grid.CellCount, Channels);
        private readonly CellConditions[] conditions = new CellConditions[scene.Grid.CellCount];
        private readonly DayRetrieval retrieval = new(
            new NasaTeam(scene.Sensor.In(Hemisphere.North).TiePoints), new(1.0, null), new(0.02, 0.02), new CellMask(scene.Grid, ocean, null));

        public SceneTruth Truth { get; } = new(scene.Grid.CellCount);

        public ConcentrationPlanes Retrieved { get; } = new(scene.Grid.CellCount);

        public void Make(DateOnly day)
        {
            scene.Truth(day, workspace, Truth);
            foreach (Channel channel in Channels)
            {
                Span<float> kelvins = observed.Kelvins(channel);
                (double open, double first, double multi) = (KelvinsOf(points.OpenWater, channel), KelvinsOf(points.FirstYear, channel), KelvinsOf(points.Multiyear, channel));
                for (int cell = 0; cell < kelvins.Length; cell++)
                {
                    double water = 1.0 - Truth.Concentration[cell];
                    kelvins[cell] = (float)((water * open) + (Truth.FirstYear[cell] * first) + (Truth.Multiyear[cell] * multi));
                }
            }

            Array.Clear(conditions);
            retrieval.Retrieve(observed, conditions, Retrieved);
        }

        private static double KelvinsOf(TiePoint point, Channel channel) =>
            channel == Channel.V19 ? point.V19Kelvins : channel == Channel.H19 ? point.H19Kelvins : point.V37Kelvins;
    }
}
