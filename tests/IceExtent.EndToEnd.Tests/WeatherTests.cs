using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Runs with masks of months and with retuned screens. Columns 1 to 4 of the small grid are ocean, 625 km² a cell.</summary>
public sealed class WeatherTests : IDisposable
{
    private const double Cell = TinyRun.CellSquareKilometers;
    private const CellConditions Outside = CellConditions.OutsideIceMask;
    private const CellConditions Warm = CellConditions.WarmWater;
    private static readonly DateOnly January = new(1990, 1, 31);
    private static readonly DateOnly February = new(1990, 2, 1);
    private readonly TinyRun run = new();

    /// <summary>Both days hold ice of 0.2 in column 1, 0.4 in column 2, 0.6 in column 3 and none in column 4.</summary>
    public WeatherTests()
    {
        foreach (DateOnly day in (DateOnly[])[January, February])
        {
            run.WriteDay(day, cell => (cell % TinyRun.Columns) switch { 1 => 0.2, 2 => 0.4, 3 => 0.6, _ => -0.02 });
        }
    }

    public void Dispose() => run.Dispose();

    [Fact]
    public async Task Run_LimitsFixed_IsTheRunWithoutTheTable()
    {
        await RunAsync(string.Empty);
        SortedDictionary<string, byte[]> silent = ArchiveFiles.Of(run.PathOf("out"));

        await RunAsync("[weather]\nlimits = \"fixed\"\nretuned_ice_fraction = 0.2\nwarm_water_north_k = 275.0\n[ice_mask]\nmargin_km = 50.0");

        ArchiveFiles.AssertSame(silent, ArchiveFiles.Of(run.PathOf("out")));
    }

    /// <summary>
    /// Origin: worked. The mask of January has columns 1 and 2 alone, but no value in row 0, so nothing is masked there: 8 + 1 cells
    /// are ice, 3 cells of column 3 lose theirs, and column 4 had none. February has all columns.
    /// </summary>
    [Fact]
    public async Task Run_IceMask_SetsTheMonthsCellsToOpenWater()
    {
        WriteMask((month, cell) => cell < TinyRun.Columns ? byte.MaxValue : month == 1 && cell % TinyRun.Columns > 2 ? (byte)0 : (byte)1);

        (RunRecord record, ProgramRun ended) = await RunAsync("[weather]\nice_mask_file = \"mask.nc\"");

        Assert.Equal((9 * Cell, 12 * Cell), (Row(January).ExtentSquareKilometers!.Value, Row(February).ExtentSquareKilometers!.Value), Close);
        Assert.Equal(1.0, Row(January).ObservedShare);
        Assert.Equal([3, 0], record.Days.Select(day => day.Cells[0].OutsideIceMask));
        Assert.Equal([0, 0], record.Days.Select(day => day.Cells[0].WarmWater));
        Assert.Equal(0, record.Counts.EmptiedDays);
        Assert.Contains("nasa-team: ice taken away from 2 cells a day outside the ice mask, from 0 in warm water.", ended.Results, StringComparison.Ordinal);
        Assert.All(Enumerable.Range(0, 20), cell => Assert.Equal(cell >= 5 && cell % 5 > 2, Conditions(January)[cell].HasFlag(Outside)));
        Assert.All(Conditions(February), condition => Assert.False(condition.HasFlag(Outside)));
        Assert.Equal([0.6f, 0f, 0f], new[] { 3, 8, 13 }.Select(cell => Fraction(January, "concentration")[cell]), (one, other) => Math.Abs(one - other) < 0.002f);
        Assert.Equal(0.6f, Fraction(January, "concentration_unscreened")[8], 0.002f);
    }

    /// <summary>Origin: worked. Column 3 has 6 °C, 279.15 K, above the 278 K of the north; column 2 has 4.8 °C, 277.95 K; column 1 no value.</summary>
    [Fact]
    public async Task Run_WarmWater_SetsTheWarmSeaToOpenWater()
    {
        WriteTemperatures("degC", (_, cell) => (cell % TinyRun.Columns) switch { 2 => 4.8f, 3 => 6f, 4 => 20f, _ => float.NaN });

        (RunRecord record, _) = await RunAsync("[weather]\nwarm_water_file = \"sst.nc\"");

        Assert.Equal(8 * Cell, Row(January).ExtentSquareKilometers!.Value, 1e-3);
        Assert.Equal(4, record.Days[0].Cells[0].WarmWater);
        Assert.All(Enumerable.Range(0, 20), cell => Assert.Equal(cell % 5 > 2, Conditions(January)[cell].HasFlag(Warm)));
    }

    /// <summary>
    /// Origin: worked. Both masks, all cells: nothing is left, the totals are 0 and not missing, and the record says so. A cell of the
    /// January mask that is empty and gets filled from its neighbours' 0 stays 0.
    /// </summary>
    [Fact]
    public async Task Run_EveryCellMasked_HasTotalsOfZeroAndANote()
    {
        run.WriteDay(January, cell => cell == 12 ? double.NaN : 0.5);
        WriteMask((month, _) => month == 1 ? (byte)0 : (byte)1);
        WriteTemperatures("K", (_, cell) => cell % 5 == 1 ? 290f : 271f);

        (RunRecord record, ProgramRun ended) = await RunAsync("[weather]\nice_mask_file = \"mask.nc\"\nwarm_water_file = \"sst.nc\"\n[filling]\nneighbours = 3");

        DailyRow row = Row(January);
        Assert.Equal((0.0, 0.0), (row.ExtentSquareKilometers!.Value, row.AreaSquareKilometers!.Value));
        Assert.Equal((0.0, 0.0), (row.MarginalZoneSquareKilometers!.Value, row.PackSquareKilometers!.Value));
        Assert.True(double.IsFinite(row.ExtentStandardErrorSquareKilometers!.Value) && double.IsFinite(row.AreaStandardErrorSquareKilometers!.Value));
        Assert.Equal(15.0 / 16.0, row.ObservedShare, 1e-9);
        Assert.Equal((15, 4), (record.Days[0].Cells[0].OutsideIceMask, record.Days[0].Cells[0].WarmWater));
        Assert.Equal(1, record.Counts.EmptiedDays);
        Assert.Contains("1 day with ice before screens, masks and coast correction and none after them", ended.Results, StringComparison.Ordinal);
        Assert.Equal(Outside | Warm, Conditions(January)[11] & (Outside | Warm));
        Assert.Equal(8 * Cell, Row(February).ExtentSquareKilometers!.Value, 1e-3); // Column 1 is warm in every month.
    }

    /// <summary>
    /// Origin: worked. Cell 8 is empty and outside in January; its eight observed neighbours fill it with ice, and the mask takes
    /// that away again: 15 of 16 cells.
    /// </summary>
    [Fact]
    public async Task Run_FilledOutsideTheMask_IsOpenWaterToo()
    {
        run.WriteDay(January, cell => cell == 8 ? double.NaN : 0.5);
        WriteMask((month, cell) => month == 1 && cell == 8 ? (byte)0 : (byte)1);

        (RunRecord record, _) = await RunAsync("[weather]\nice_mask_file = \"mask.nc\"\n[filling]\nneighbours = 3");

        Assert.Equal(15 * Cell, Row(January).ExtentSquareKilometers!.Value, 1e-3);
        Assert.Equal((1, 0), (record.Days[0].Cells[0].Filled, record.Days[0].Cells[0].OutsideIceMask));
        Assert.Equal(CellConditions.NoObservation | CellConditions.FilledFromNeighbours | Outside, Conditions(January)[8]);
        Assert.Equal(0f, Fraction(January, "concentration")[8]);
    }

    /// <summary>
    /// Origin: worked. The tie points of F17 give at 10 % first-year ice 19V 191.25, 37V 210.62, ratio 0.0482; the fixed limit of the small
    /// sensor is 0.07. Ice of 8 % has 0.0498 and goes, ice of 12 % has 0.0465 and stays.
    /// </summary>
    [Theory]
    [InlineData("fixed", 0.08f, 0)]
    [InlineData("retuned", 0f, 8)]
    public async Task Run_Limits_ScreenAtTheirOwnConcentration(string limits, float seen, int screened)
    {
        run.WriteDay(January, cell => (cell % TinyRun.Columns) switch { 1 or 2 => 0.08, _ => 0.12 });

        (RunRecord record, _) = await RunAsync($"[weather]\nlimits = \"{limits}\"");

        Assert.Equal(screened, record.Days[0].Cells[0].Screened3719);
        Assert.Equal(seen, Fraction(January, "concentration")[1], 0.002f);
        Assert.Equal(0.12f, Fraction(January, "concentration")[3], 0.002f);
        Assert.Equal(0.08f, Fraction(January, "concentration_unscreened")[1], 0.002f);
    }

    [Fact]
    public async Task Run_AnyNumberOfWorkers_WritesTheSameBytes()
    {
        for (int day = 1; day < 40; day++)
        {
            run.WriteDay(January.AddDays(day), cell => Math.Abs(Math.Sin(cell + day)));
        }

        WriteMask((month, cell) => (byte)((cell + month) % 2));
        const string Table = "[weather]\nlimits = \"retuned\"\nice_mask_file = \"mask.nc\"";
        await RunAsync(Table, "--workers", "1");
        SortedDictionary<string, byte[]> one = ArchiveFiles.Of(run.PathOf("out"));
        Directory.Delete(run.PathOf("out"), recursive: true);
        await RunAsync(Table, "--workers", "4");

        ArchiveFiles.AssertSame(one, ArchiveFiles.Of(run.PathOf("out")));
    }

    /// <summary>The digest covers the files' bytes, the limits and the fraction.</summary>
    [Theory]
    [InlineData("[weather]\nice_mask_file = \"mask.nc\"", "[weather]\nice_mask_file = \"mask.nc\"", true)]
    [InlineData("[weather]\nice_mask_file = \"mask.nc\"", "", false)]
    [InlineData("[weather]\nlimits = \"retuned\"", "", false)]
    [InlineData("[weather]\nlimits = \"retuned\"", "[weather]\nlimits = \"retuned\"\nretuned_ice_fraction = 0.12", false)]
    public async Task Run_OtherWeatherOrMask_IsAnotherConfiguration(string first, string second, bool changeMask)
    {
        WriteMask((_, _) => 1);
        await RunAsync(first);
        WriteMask((_, cell) => changeMask && cell == 7 ? (byte)0 : (byte)1);
        run.WriteRunFile(second);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Contains("IE3001", ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_FilesThatCannotBeUsed_AreAllToldBeforeAnythingIsMade()
    {
        Grid other = new("other", null, TinyRun.Grid.Projection, TinyRun.Grid.Frame with { LeftMeters = -50_000.0 });
        WriteMask((_, _) => 1, other);
        run.WriteRunFile("[weather]\nlimits = \"retunde\"");
        ProgramRun limits = await ProgramRun.OfAsync("run", run.RunFile);
        run.WriteRunFile("[weather]\nice_mask_file = \"mask.nc\"\nwarm_water_file = \"none.nc\"");

        ProgramRun files = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Contains("Did you mean retuned?", limits.Messages, StringComparison.Ordinal);
        Assert.Equal(ExitCode.Configuration, files.ExitCode);
        Assert.Contains("IE2221", files.Messages, StringComparison.Ordinal);
        Assert.Contains("IE2232", files.Messages, StringComparison.Ordinal);
        Assert.Contains("none.nc", files.Messages, StringComparison.Ordinal);
        Assert.False(Directory.Exists(run.PathOf("out")));
    }

    /// <summary>A comparison screens as the run does: column 3 is outside in January.</summary>
    [Fact]
    public async Task Compare_IceMask_IsUsed()
    {
        WriteMask((_, cell) => cell % TinyRun.Columns == 3 ? (byte)0 : (byte)1);
        run.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + "\n" + """
            [north.surface_points_k]
            open_water = { 19v = 184.9, 37v = 207.1, 37h = 145.0 }
            first_year = { 19v = 248.4, 37v = 242.3, 37h = 231.0 }
            multiyear = { 19v = 220.7, 37v = 188.5, 37h = 177.0 }
            """);
        run.WriteRunFile("[weather]\nice_mask_file = \"mask.nc\"");
        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace("[\"nasa-team\"]", "[\"nasa-team\", \"bristol\"]", StringComparison.Ordinal));

        ProgramRun ended = await ProgramRun.OfAsync("compare", run.RunFile, "--out", run.PathOf("cmp"), "--json");

        using System.Text.Json.JsonDocument answer = System.Text.Json.JsonDocument.Parse(ended.Results);
        Assert.All(answer.RootElement.GetProperty("means").EnumerateArray(), method => Assert.Equal(8 * Cell, method.GetProperty("extent_km2").GetDouble(), 1e-3));
    }

    private async Task<(RunRecord Record, ProgramRun Ended)> RunAsync(string table, params string[] options)
    {
        run.WriteRunFile(table);
        ProgramRun ended = await ProgramRun.OfAsync(["run", run.RunFile, .. options]);
        Assert.Equal((ExitCode.Done, string.Empty), (ended.ExitCode, ended.ExitCode == ExitCode.Done ? string.Empty : ended.Messages));
        return (RunRecordFile.Read(Directory.EnumerateFiles(run.PathOf("out", "runs")).Order(StringComparer.Ordinal).Last()), ended);
    }

    private DailyRow Row(DateOnly day) =>
        Assert.Single(DailyTable.Read(new ArchiveLayout(run.PathOf("out")).DailyFile("nasa-team", Hemisphere.North, 1990)).Rows, row => row.Date == day);

    private CellConditions[] Conditions(DateOnly day) => Array.ConvertAll(Fraction(day, "conditions"), bits => (CellConditions)(ushort)bits);

    // Any variable of a grid file, by the reader that also reads temperatures.
    private float[] Fraction(DateOnly day, string variable)
    {
        string path = new ArchiveLayout(run.PathOf("out")).GridFile("nasa-team", Hemisphere.North, day);
        IBrightnessSource source = BrightnessSources.Open(new([path], TinyRun.Grid, new Dictionary<Channel, string> { [Channel.V19] = variable }, null));
        BrightnessPlanes planes = new(TinyRun.Grid.CellCount, [Channel.V19]);
        source.Read(Assert.Single(source.List(CancellationToken.None).Days), planes);
        return planes.Kelvins(Channel.V19).ToArray();
    }

    private void WriteMask(Func<int, int, byte> value, Grid? grid = null) => GridFile.WriteMonths(
        run.PathOf("mask.nc"), grid ?? TinyRun.Grid, [new FlagVariable("ice_possible", "invented", null, [], Months(value), [(0, "no_ice"), (1, "ice_can_be")])], [new("title", "Invented mask")]);

    private void WriteTemperatures(string units, Func<int, int, float> value) => GridFile.WriteMonths(
        run.PathOf("sst.nc"), TinyRun.Grid, [new PackedVariable("sea_surface_temperature", "invented", null, [], units, Months(value), new Packing(0.01, 0.0, -10.0, 320.0))], [new("title", "Invented sea")]);

    private static T[] Months<T>(Func<int, int, T> value) =>
        [.. Enumerable.Range(1, 12).SelectMany(_ => Enumerable.Range(0, TinyRun.Grid.CellCount), value)];

    private static bool Close((double One, double Other) expected, (double One, double Other) actual) =>
        Math.Abs(expected.One - actual.One) < 1e-3 && Math.Abs(expected.Other - actual.Other) < 1e-3;
}
