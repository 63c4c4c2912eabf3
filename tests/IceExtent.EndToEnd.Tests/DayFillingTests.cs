using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;
using PureHDF;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Whole runs with cells filled over days, over invented small days that can be worked by hand: 16 ocean cells of 625 km².</summary>
public sealed class DayFillingTests : IDisposable
{
    private const double Cell = TinyRun.CellSquareKilometers;
    private static readonly DateOnly First = FillingRun.First;
    private readonly FillingRun run = new();

    public void Dispose() => run.Dispose();

    /// <summary>
    /// Origin: worked. Columns 1 and 2 (8 cells) are lost on day 1. They held 0.6 a day before and hold 0.9 two days after:
    /// 0.7. The others hold 0.5: area 625 · (8 · 0.7 + 8 · 0.5) = 6,000 km².
    /// </summary>
    [Fact]
    public async Task Run_LostSwath_IsFilledBetweenBothDays()
    {
        run.Tiny.WriteDay(First, cell => Lost(cell) ? 0.6 : 0.5);
        run.Tiny.WriteDay(First.AddDays(1), cell => Lost(cell) ? double.NaN : 0.5);
        run.Tiny.WriteDay(First.AddDays(3), cell => Lost(cell) ? 0.9 : 0.5);

        ProgramRun ended = await run.RunAsync("days_before = 1\ndays_after = 2");

        DailyRow row = run.Rows().Single(row => row.Date == First.AddDays(1));
        Assert.Equal(ExitCode.Done, ended.ExitCode);
        Assert.Equal([0, 1, 3], run.Rows().Select(day => day.Date.DayNumber - First.DayNumber));
        Assert.Equal(6_000.0, row.AreaSquareKilometers!.Value, 15.0);
        Assert.Equal(16 * Cell, row.ExtentSquareKilometers!.Value, 1e-3);
        Assert.Equal((0.5, 0.5, "tiny"), (row.ObservedShare, row.FilledShare, row.Sensor));
        Assert.Equal([0, 8, 0], run.Record().Days.Select(day => Assert.Single(day.Cells).FilledFromDays));
        Assert.True(row.AreaStandardErrorSquareKilometers > run.Rows()[0].AreaStandardErrorSquareKilometers);
        Assert.Equal(("1", "2", "false"), (run.Metadata("filling_days_before"), run.Metadata("filling_days_after"), run.Metadata("filling_missing_days")));
    }

    /// <summary>Origin: worked. As above with one day after: the later day is out of reach, and a cell needs both.</summary>
    [Theory]
    [InlineData("days_before = 1\ndays_after = 1", 0.0)]
    [InlineData("days_before = 1", 0.5)] // A nightly run knows no later day: the earlier one is carried.
    [InlineData("days_after = 2", 0.5)]
    [InlineData("days_before = 0\ndays_after = 0", 0.0)]
    public async Task Run_OneSideOutOfReach_FillsOnlyWhereItWasNotAskedFor(string limits, double share)
    {
        run.Tiny.WriteDay(First, cell => Lost(cell) ? 0.6 : 0.5);
        run.Tiny.WriteDay(First.AddDays(1), cell => Lost(cell) ? double.NaN : 0.5);
        run.Tiny.WriteDay(First.AddDays(3), cell => Lost(cell) ? 0.9 : 0.5);

        await run.RunAsync(limits);

        Assert.Equal(share, run.Rows()[1].FilledShare);
    }

    /// <summary>
    /// Origin: worked. Cell 6 is lost on day 1 and seen on days 0 and 3, so 1 and 2 days away. Cell 0 is land. 255 is missing.
    /// The bits are 4 for no observation and 4096 for filled over days.
    /// </summary>
    [Fact]
    public async Task Run_FilledCell_SaysInTheGridWhichDaysGave()
    {
        run.Tiny.WriteDay(First, _ => 0.5);
        run.Tiny.WriteDay(First.AddDays(1), cell => cell == 6 ? double.NaN : 0.5);
        run.Tiny.WriteDay(First.AddDays(3), _ => 0.8);

        await run.RunAsync("days_before = 1\ndays_after = 2");

        using var grid = H5File.OpenRead(run.Grid(1));
        byte[] before = grid.Dataset("/fill_days_before").Read<byte[]>(), after = grid.Dataset("/fill_days_after").Read<byte[]>();
        ushort[] conditions = grid.Dataset("/conditions").Read<ushort[]>();
        short[] concentration = grid.Dataset("/concentration").Read<short[]>();
        Assert.Equal((1, 2, 4 + 4096), (before[6], after[6], conditions[6]));
        Assert.InRange(concentration[6], 5_980, 6_020); // 0.6, from temperatures in tenths of a kelvin.
        Assert.All(Enumerable.Range(0, before.Length).Where(cell => cell != 6), cell => Assert.Equal((255, 255), (before[cell], after[cell])));
        using var plain = H5File.OpenRead(await PlainGridAsync());
        Assert.False(plain.LinkExists("fill_days_before"));
    }

    /// <summary>Random holes, missing and damaged days; the seeds are printed by the test's name.</summary>
    [Theory]
    [InlineData(7, "days_before = 4\ndays_after = 3\nmissing_days = true")]
    [InlineData(8, "days_before = 15\ndays_after = 15\nmissing_days = true")]
    [InlineData(9, "days_before = 2")]
    [InlineData(10, "days_after = 9")]
    [InlineData(11, "days_before = 1\ndays_after = 1")]
    public async Task Run_AnyNumberOfWorkers_WritesTheSameBytes(int seed, string keys)
    {
        run.WriteHoles(seed, days: 30);
        run.Tiny.WriteRunFile($"[filling]\nneighbours = 4\n{keys}\n[polar_gap]\nrule = \"laplace\"");
        List<SortedDictionary<string, byte[]>> archives = [];
        foreach (string workers in new[] { "1", "2", "5" })
        {
            await ProgramRun.OfAsync("run", run.Tiny.RunFile, "--workers", workers);
            archives.Add(ArchiveFiles.Of(run.Tiny.PathOf("out")));
            Directory.Delete(run.Tiny.PathOf("out"), recursive: true);
        }

        Assert.True(archives[0].Count > 20);
        ArchiveFiles.AssertSame(archives[0], archives[1]);
        ArchiveFiles.AssertSame(archives[0], archives[2]);
    }

    /// <summary>A part of the record reads the days round it, so it writes what the whole run writes for its days.</summary>
    [Fact]
    public async Task Run_InPartsOrAtOnce_MakesTheSameArchive()
    {
        run.WriteHoles(seed: 11, days: 24);
        run.Tiny.WriteRunFile("[filling]\ndays_before = 3\ndays_after = 2\nmissing_days = true");
        await ProgramRun.OfAsync("run", run.Tiny.RunFile);
        SortedDictionary<string, byte[]> atOnce = ArchiveFiles.Of(run.Tiny.PathOf("out"));
        Directory.Delete(run.Tiny.PathOf("out"), recursive: true);
        foreach ((int from, int to) in new[] { (12, 17), (0, 4), (18, 23), (5, 5), (6, 11) })
        {
            await ProgramRun.OfAsync("run", run.Tiny.RunFile, "--from", FillingRun.Text(from), "--to", FillingRun.Text(to));
        }

        ArchiveFiles.AssertSame(atOnce, ArchiveFiles.Of(run.Tiny.PathOf("out")));
    }

    /// <summary>Origin: worked. Days 0 to 9 but 5; asked for 4 to 6 with 2 before and 1 after: 2, 3 and 7 are read besides, and 5 is made.</summary>
    [Fact]
    public async Task Plan_PartOfTheRecord_CountsTheDaysReadForFilling()
    {
        run.WriteDays(10, _ => 0.5);
        Array.ForEach(Directory.GetFiles(run.Tiny.PathOf("days"), "19900306*"), File.Delete);
        run.Tiny.WriteRunFile("[filling]\ndays_before = 2\ndays_after = 1\nmissing_days = true");

        ProgramRun text = await ProgramRun.OfAsync("plan", run.Tiny.RunFile, "--from", FillingRun.Text(4), "--to", FillingRun.Text(6));
        ProgramRun json = await ProgramRun.OfAsync("plan", run.Tiny.RunFile, "--from", FillingRun.Text(4), "--to", FillingRun.Text(6), "--json");

        Assert.Contains("1 day without usable input made from others; 3 days outside the period read for it", text.Results, StringComparison.Ordinal);
        Assert.Contains("\"margin_days\": 3", json.Results, StringComparison.Ordinal);
        Assert.Contains("\"1990-03-06\"", json.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_UnreadableDayOutsideThePeriod_GivesNothingAndIsReported()
    {
        run.WriteDays(3, cell => Lost(cell) ? double.NaN : 0.5);
        run.Tiny.WriteDay(First, _ => 0.5);
        File.WriteAllBytes(run.Tiny.DayFile(First.AddDays(2), "v19"), [1, 2, 3]);

        ProgramRun ended = await run.RunAsync("days_before = 1\ndays_after = 1", "--from", FillingRun.Text(1), "--to", FillingRun.Text(1));

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Equal(0.0, Assert.Single(run.Rows()).FilledShare);
        Assert.Single(run.Record().Faults);
        Assert.Equal(First.AddDays(1), Assert.Single(run.Record().Days).Date);
        Assert.Equal(15, run.Record().FilesRead.Count);
    }

    private static bool Lost(int cell) => cell % TinyRun.Columns is 1 or 2;

    private async Task<string> PlainGridAsync()
    {
        Directory.Delete(run.Tiny.PathOf("out"), recursive: true);
        await run.RunAsync("days_before = 0");
        return run.Grid(1);
    }
}
