using IceExtent.Retrieval;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Tie points that move, through whole runs over an invented sea.</summary>
public sealed class TiePointTests : IDisposable
{
    private const string Surfaces = """
        [north.surface_points_k]
        open_water = { 19v = 184.9, 37v = 207.1, 37h = 145.0 }
        first_year = { 19v = 248.4, 37v = 242.3, 37h = 231.0 }
        multiyear = { 19v = 220.7, 37v = 188.5, 37h = 177.0 }
        """;

    private readonly string folder = Path.Combine(Path.GetTempPath(), "iceextent-tests", Guid.NewGuid().ToString("N"));
    private readonly TinyRun tiny = new();

    public void Dispose()
    {
        tiny.Dispose();
        if (Directory.Exists(folder))
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    /// <summary>
    /// Six days of the northern scene. The tie points move, their standard errors are those of a few days' weather (under 3 K),
    /// and open water lies where the forward model has it: above its reference
    /// state, the fixed points, which is clear and dry, by less than 10 K.
    /// </summary>
    [Fact]
    public async Task Run_SelfTuning_WritesItsTiePoints()
    {
        string runFile = await SceneAsync("[\"nasa-team\", \"self-tuning\"]", string.Empty);

        ProgramRun ended = await ProgramRun.OfAsync("run", runFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        ArchiveLayout layout = new(Path.Combine(folder, "archive"));
        IReadOnlyList<TiePointRow> rows = TiePointTable.Read(layout.TiePointFile(Grids.Hemisphere.North, 2003));
        Assert.Equal(6, rows.Select(row => row.Date).Distinct().Count());
        TiePointRow water = rows.First(row => row is { Surface: "open-water", Channel: "19v" });
        Assert.Equal("moving", water.State);
        Assert.InRange(water.Kelvins, 185.2, 195.2);
        Assert.InRange(water.StandardErrorKelvins!.Value, 1e-3, 3.0);
        Assert.Equal(
            [TiePointState.Fixed, TiePointState.Moving],
            new[] { "nasa-team", "self-tuning" }.Select(method => DailyTable.Read(layout.DailyFile(method, Grids.Hemisphere.North, 2003)).Rows[0].TiePoints));
    }

    /// <summary>The same bytes for any number of workers, and for a part of the period asked for by itself.</summary>
    [Theory]
    [InlineData("")]
    [InlineData("[filling]\ndays_before = 2\ndays_after = 2\nmissing_days = true\n")] // Days read for filling have tie points of their own.
    public async Task Run_InPartsOrByManyWorkers_GivesTheSameNumbers(string filling)
    {
        string runFile = await SceneAsync("[\"nasa-team\", \"bootstrap\"]", "[tie_points]\nmoving = true\ndays_behind = 2\ndays_ahead = 1\n" + filling);
        File.Delete(Path.Combine(folder, "brightness", "2003-02-04.nc")); // At the seam of the two parts.
        string archive = Path.Combine(folder, "archive");
        await ProgramRun.OfAsync("run", runFile, "--workers", "1");
        SortedDictionary<string, byte[]> whole = ArchiveFiles.Of(archive);
        Directory.Delete(archive, recursive: true);

        await ProgramRun.OfAsync("run", runFile, "--to", "2003-02-03", "--workers", "3");
        ProgramRun ended = await ProgramRun.OfAsync("run", runFile, "--from", "2003-02-04", "--workers", "2");

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        ArchiveFiles.AssertSame(whole, ArchiveFiles.Of(archive));
    }

    /// <summary>
    /// Retuned limits follow the day's tie points: the sea of a day is steeper or flatter than the sensor's own, so another number of cells
    /// is screened than by the same rule on its own points. The samples are taken with the fixed screens: tie points are the same.
    /// </summary>
    [Fact]
    public async Task Run_RetunedLimits_FollowTheDaysTiePoints()
    {
        (int ofDay, byte[] points) = await ScreenedAsync("[weather]\nlimits = \"retuned\"\n[tie_points]\nmoving = true\n");
        (int ofSensor, _) = await ScreenedAsync("[weather]\nlimits = \"retuned\"\n");
        (_, byte[] pointsWithFixed) = await ScreenedAsync("[tie_points]\nmoving = true\n");

        Assert.NotEqual(ofSensor, ofDay);
        Assert.Equal(pointsWithFixed, points);

        async Task<(int Screened, byte[] TiePoints)> ScreenedAsync(string head)
        {
            string runFile = await SceneAsync("[\"nasa-team\"]", head);
            string archive = Path.Combine(folder, "archive");
            Assert.Equal(ExitCode.Done, (await ProgramRun.OfAsync("run", runFile, "--to", "2003-02-01")).ExitCode);
            RunRecord record = RunRecordFile.Read(Directory.GetFiles(Path.Combine(archive, "runs")).Single());
            string table = new ArchiveLayout(archive).TiePointFile(Grids.Hemisphere.North, 2003);
            byte[] rows = File.Exists(table) ? [.. TiePointTable.Read(table).SelectMany(row => BitConverter.GetBytes(row.Kelvins))] : [];
            Directory.Delete(archive, recursive: true);
            return (Assert.Single(Assert.Single(record.Days).Cells).Screened3719, rows);
        }
    }

    /// <summary>A grid of twenty cells has no samples: the sensor's own tie points stand, and table, tie points and run record say so.</summary>
    [Fact]
    public async Task Run_TooFewSamples_FallsBackAndSaysSo()
    {
        tiny.WriteDay(new(1990, 1, 1), cell => cell % TinyRun.Columns < 3 ? 0.0 : 1.0);
        tiny.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + "\n" + Surfaces);
        tiny.Write("run.toml", File.ReadAllText(tiny.RunFile).Replace("[\"nasa-team\"]", "[\"self-tuning\"]", StringComparison.Ordinal));

        ProgramRun ended = await ProgramRun.OfAsync("run", tiny.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        ArchiveLayout layout = new(tiny.PathOf("out"));
        Statistics.DailyRow row = Assert.Single(DailyTable.Read(layout.DailyFile("self-tuning", Grids.Hemisphere.North, 1990)).Rows);
        Assert.Equal(TiePointState.TooFewSamples, row.TiePoints);
        Assert.Equal(5_000.0, row.ExtentSquareKilometers!.Value, 1e-6); // Origin: worked, two columns of four cells of 625 km².
        Assert.All(TiePointTable.Read(layout.TiePointFile(Grids.Hemisphere.North, 1990)), point => Assert.Null(point.StandardErrorKelvins));
        RunRecord record = RunRecordFile.Read(Directory.GetFiles(tiny.PathOf("out", "runs")).Single());
        Assert.Equal(1, record.Counts.TiePointFallbacks);
        Assert.Equal("too-few-samples", Assert.Single(record.Days).TiePoints);
    }

    /// <summary>No open water anywhere, and none but open water: whole numbers by the sensor's own points, never NaN. Origin: worked, 16 cells of 625 km².</summary>
    [Theory]
    [InlineData(1.0, 10_000.0)]
    [InlineData(0.0, 0.0)]
    public async Task Run_OneSurfaceAlone_HasTotals(double fraction, double extent)
    {
        string[] methods = ["nasa-team", "bootstrap", "bristol", "self-tuning"];
        tiny.WriteDay(new(1990, 1, 1), _ => fraction);
        tiny.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + "\n" + Surfaces);
        tiny.WriteRunFile("[tie_points]\nmoving = true\nleast_days = 1\nleast_samples = 2\ncoast_distance_km = 0.0\nedge_distance_km = 0.0\nwater_from_km = 0.0");
        tiny.Write("run.toml", File.ReadAllText(tiny.RunFile).Replace(
            "[\"nasa-team\"]", $"[{string.Join(", ", methods.Select(method => $"\"{method}\""))}]", StringComparison.Ordinal));

        ProgramRun ended = await ProgramRun.OfAsync("run", tiny.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        foreach (string method in methods)
        {
            Statistics.DailyRow row = Assert.Single(DailyTable.Read(new ArchiveLayout(tiny.PathOf("out")).DailyFile(method, Grids.Hemisphere.North, 1990)).Rows);
            Assert.Equal(extent, row.ExtentSquareKilometers!.Value, 1e-6);
            Assert.True(double.IsFinite(row.ExtentStandardErrorSquareKilometers!.Value) && double.IsFinite(row.AreaStandardErrorSquareKilometers!.Value));
        }
    }

    /// <summary>A day that can no longer be read loses its tie points with its numbers.</summary>
    [Fact]
    public async Task Run_DayThatBreaks_LosesItsTiePoints()
    {
        DateOnly first = new(1990, 1, 1);
        tiny.WriteDay(first, _ => 0.5);
        tiny.WriteDay(first.AddDays(1), _ => 0.5);
        tiny.WriteRunFile("[tie_points]\nmoving = true");
        await ProgramRun.OfAsync("run", tiny.RunFile);
        File.WriteAllBytes(tiny.DayFile(first, "v19"), [1, 2, 3]);

        ProgramRun ended = await ProgramRun.OfAsync("run", tiny.RunFile);

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        IReadOnlyList<TiePointRow> left = TiePointTable.Read(new ArchiveLayout(tiny.PathOf("out")).TiePointFile(Grids.Hemisphere.North, 1990));
        Assert.Equal([first.AddDays(1)], left.Select(row => row.Date).Distinct());
    }

    private async Task<string> SceneAsync(string methods, string head)
    {
        ProgramRun written = await ProgramRun.OfAsync(
            "scene", "--sensor", "ssmi-f13", "--from", "2003-02-01", "--to", "2003-02-06", "--no-truth", "--out", folder);
        Assert.Equal(ExitCode.Done, written.ExitCode);
        string runFile = Path.Combine(folder, "run.toml");
        string text = File.ReadAllText(runFile).Replace("[\"nasa-team\"]", methods, StringComparison.Ordinal);
        File.WriteAllText(runFile, text.Replace("[[source]]", head + "\n[[source]]", StringComparison.Ordinal));
        return runFile;
    }
}
