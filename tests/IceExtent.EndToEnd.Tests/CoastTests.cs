using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Runs that take land out of coastal cells. Column 0 of the small grid is land.</summary>
public sealed class CoastTests : IDisposable
{
    private const string Footprints = """

        [footprints_km]
        19v = [50.0, 50.0]
        19h = [50.0, 50.0]
        22v = [50.0, 50.0]
        37v = [50.0, 50.0]
        37h = [50.0, 50.0]
        """;

    private static readonly DateOnly Day = new(1990, 12, 30);
    private readonly TinyRun run = new();

    public CoastTests() =>
        run.WriteDay(Day, cell => (cell % TinyRun.Columns) switch { 0 => 0.95, 1 => 0.30, 2 => 0.10, 3 => 0.05, _ => 0.0 });

    public void Dispose() => run.Dispose();

    [Fact]
    public async Task Run_CorrectionOff_IsTheRunWithoutTheTable()
    {
        await RunAsync(string.Empty);
        SortedDictionary<string, byte[]> silent = ArchiveFiles.Of(run.PathOf("out"));

        CellCounts counts = await RunAsync("[coast]\ncorrection = \"off\"\nland_ice_fraction = 0.5");

        Assert.Equal(0, counts.CoastCorrected);
        ArchiveFiles.AssertSame(silent, ArchiveFiles.Of(run.PathOf("out")));
    }

    /// <summary>
    /// Origin: worked. Without a file the shore column, 30 % ice, stands against 0.9 times the land in a square of 7 x 7
    /// cut by this grid to 4 rows and columns 0 to 4: 0.9/5 = 0.18. It stays. The next two columns, 10 and 5 %, stand against
    /// 0.18 too and become open water: 8 cells. Extent was 4 cells of 625 km² and is so still.
    /// </summary>
    [Fact]
    public async Task Run_ConcentrationWithoutAFile_EmptiesWhatLandWouldFeign()
    {
        CellCounts counts = await RunAsync("[coast]\ncorrection = \"concentration\"");

        Assert.Equal(8, counts.CoastCorrected);
        Assert.Equal(2_500.0, Row().ExtentSquareKilometers!.Value, 1e-3);
    }

    /// <summary>Origin: worked. Shore 0.30 less its minimum 0.25 is 0.05, below 15 %: no extent is left. Near-shore has minimum 0.</summary>
    [Fact]
    public async Task Run_ConcentrationWithAFile_SubtractsTheMinimum()
    {
        WriteMinima(TinyRun.Grid, 0.25f);

        CellCounts counts = await RunAsync("[coast]\ncorrection = \"concentration\"\nminimum_file = \"minima.nc\"");

        Assert.Equal(4, counts.CoastCorrected);
        Assert.Equal(0.0, Row().ExtentSquareKilometers!.Value);
    }

    /// <summary>
    /// Origin: worked. Land is 95 % like ice, so its share a of a shore cell feigns about a·0.95 of ice. With σ = 50/25/2.355 =
    /// 0.85 cells a is about 0.29, so of the 30 % observed nearly nothing is left, and no cell has 15 %. The land is one
    /// column wide, at the rim, so land of 50 % must do for pure.
    /// </summary>
    [Fact]
    public async Task Run_Brightness_TakesTheLandOutOfTheTemperatures()
    {
        run.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + Footprints);
        await RunAsync(string.Empty);
        double before = Row().ExtentSquareKilometers!.Value;

        Directory.Delete(run.PathOf("out"), recursive: true);
        CellCounts counts = await RunAsync("[coast]\ncorrection = \"brightness\"\npure_land_fraction = 0.5");

        Assert.Equal(2_500.0, before, 1e-3);
        Assert.InRange(counts.CoastCorrected, 4, 8);
        Assert.Equal(0.0, Row().ExtentSquareKilometers!.Value);
    }

    /// <summary>
    /// Origin: worked. The second step finds no square with 101 cells of open water, so it takes nothing: the figures are those
    /// of temperatures alone. What the first step marked must not pass for the second's choice.
    /// </summary>
    [Fact]
    public async Task Run_Both_TakesOneStepAfterTheOther()
    {
        run.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + Footprints);
        CellCounts first = await RunAsync("[coast]\ncorrection = \"brightness\"\npure_land_fraction = 0.5");
        double area = Row().AreaSquareKilometers!.Value;
        Directory.Delete(run.PathOf("out"), recursive: true);
        WriteMinima(TinyRun.Grid, 0.6f);

        CellCounts both = await RunAsync("[coast]\ncorrection = \"both\"\npure_land_fraction = 0.5\nminimum_file = \"minima.nc\"\nopen_water_cells = 101");

        Assert.Equal(first, both);
        Assert.Equal(area, Row().AreaSquareKilometers!.Value);
    }

    [Theory]
    [InlineData("brightness")]
    [InlineData("concentration")]
    [InlineData("both")]
    public async Task Run_AnyNumberOfWorkers_WritesTheSameBytes(string correction)
    {
        run.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + Footprints);
        for (int day = 1; day < 20; day++)
        {
            run.WriteDay(Day.AddDays(day), cell => Math.Abs(Math.Sin(cell + day)));
        }

        string table = $"[coast]\ncorrection = \"{correction}\"\npure_land_fraction = 0.5";
        await RunAsync(table, "--workers", "1");
        SortedDictionary<string, byte[]> one = ArchiveFiles.Of(run.PathOf("out"));
        Directory.Delete(run.PathOf("out"), recursive: true);
        await RunAsync(table, "--workers", "4");

        ArchiveFiles.AssertSame(one, ArchiveFiles.Of(run.PathOf("out")));
    }

    [Fact]
    public async Task Run_MinimaChanged_IsAnotherConfiguration()
    {
        WriteMinima(TinyRun.Grid, 0.25f);
        await RunAsync("[coast]\ncorrection = \"concentration\"\nminimum_file = \"minima.nc\"");
        WriteMinima(TinyRun.Grid, 0.20f);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Contains("IE3001", ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_NoFootprints_IsRefusedByName()
    {
        run.WriteRunFile("[coast]\ncorrection = \"brightness\"");

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE1015", ended.Messages, StringComparison.Ordinal);
        Assert.Contains("no footprint of 22v", ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_MinimaOnAnotherGrid_IsRefused()
    {
        WriteMinima(new("other", null, TinyRun.Grid.Projection, TinyRun.Grid.Frame with { LeftMeters = -50_000.0 }), 0.25f);

        await AssertRefusedAsync("IE2204");
    }

    [Fact]
    public async Task Run_MinimaMissing_IsRefused() => await AssertRefusedAsync("IE2205");

    [Theory]
    [InlineData("minimum", 0.2f)]
    [InlineData("minimum_concentration", 1.5f)]
    public async Task Run_MinimaOfAnotherNameOrSize_AreRefused(string name, float value)
    {
        WriteMinima(TinyRun.Grid, value, name);

        await AssertRefusedAsync("IE2206");
    }

    private async Task AssertRefusedAsync(string code)
    {
        run.WriteRunFile("[coast]\ncorrection = \"concentration\"\nminimum_file = \"minima.nc\"");

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains(code, ended.Messages, StringComparison.Ordinal);
        Assert.Contains("minima.nc", ended.Messages, StringComparison.Ordinal);
        Assert.False(Directory.Exists(run.PathOf("out")));
    }

    private async Task<CellCounts> RunAsync(string table, params string[] options)
    {
        run.WriteRunFile(table);
        ProgramRun ended = await ProgramRun.OfAsync(["run", run.RunFile, .. options]);
        Assert.Equal((ExitCode.Done, string.Empty), (ended.ExitCode, ended.ExitCode == ExitCode.Done ? string.Empty : ended.Messages));
        RunRecord record = RunRecordFile.Read(Directory.EnumerateFiles(run.PathOf("out", "runs")).Order(StringComparer.Ordinal).Last());
        return Assert.Single(record.Days[0].Cells);
    }

    private DailyRow Row() =>
        Assert.Single(DailyTable.Read(new ArchiveLayout(run.PathOf("out")).DailyFile("nasa-team", Hemisphere.North, 1990)).Rows, row => row.Date == Day);

    // Column 1 has the value, the others are missing.
    private void WriteMinima(Grid grid, float shore, string name = "minimum_concentration")
    {
        float[] minima = [.. Enumerable.Range(0, grid.CellCount).Select(cell => cell % grid.Columns == 1 ? shore : float.NaN)];
        GridFile.WriteUndated(
            run.PathOf("minima.nc"), grid, [new PackedVariable(name, "minimum", null, [], "1", minima, new Packing(0.0001, 0.0, 0.0, 2.0))], [new("title", "Invented minima")]);
    }
}
