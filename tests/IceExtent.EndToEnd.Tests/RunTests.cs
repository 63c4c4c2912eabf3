using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;
using IceExtent.Worker.Running;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Whole runs over invented small days whose totals can be worked by hand.</summary>
public sealed class RunTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 12, 30);
    private readonly TinyRun run = new();

    public void Dispose() => run.Dispose();

    /// <summary>
    /// Origin: worked. 16 ocean cells of 625 km². Columns 1 and 2 (8 cells) hold 50 % ice, column 3 (4 cells) 90 %,
    /// column 4 none: extent 12 · 625 = 7,500; area 8 · 312.5 + 4 · 562.5 = 4,750; marginal zone 5,000; pack 2,500 km².
    /// Temperatures are rounded to a tenth of a kelvin, which moves a concentration by under 0.2 %.
    /// </summary>
    [Fact]
    public async Task Run_WorkedDay_GivesTheWorkedTotals()
    {
        run.WriteDay(First, cell => (cell % TinyRun.Columns) switch { 1 or 2 => 0.5, 3 => 0.9, _ => 0.0 });

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        DailyRow row = Assert.Single(Daily(1990).Rows);
        Assert.Equal(First, row.Date);
        Assert.Equal("hemisphere", row.Region);
        Assert.Equal("tiny", row.Sensor);
        Assert.Equal(7_500.0, row.ExtentSquareKilometers!.Value, 1e-3);
        Assert.Equal(4_750.0, row.AreaSquareKilometers!.Value, 15.0);
        Assert.Equal(5_000.0, row.MarginalZoneSquareKilometers!.Value, 1e-3);
        Assert.Equal(2_500.0, row.PackSquareKilometers!.Value, 1e-3);
        Assert.Equal(10_000.0, row.OceanSquareKilometers, 1e-3);
        Assert.Equal(1.0, row.ObservedShare);
        Assert.True(row.AreaStandardErrorSquareKilometers > 0.0);
        Assert.Contains("no basis for navigation", ended.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_AnyNumberOfWorkers_WritesTheSameBytes()
    {
        for (int day = 0; day < 40; day++)
        {
            run.WriteDay(First.AddDays(day), cell => Math.Abs(Math.Sin(cell + day)));
        }

        List<SortedDictionary<string, byte[]>> archives = [];
        foreach (string workers in new[] { "1", "2", "8" })
        {
            ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile, "--workers", workers);
            Assert.Equal(ExitCode.Done, ended.ExitCode);
            archives.Add(ArchiveFiles.Of(run.PathOf("out")));
            Directory.Delete(run.PathOf("out"), recursive: true);
        }

        Assert.Equal(42, archives[0].Count); // 40 grids, and tables of 1990 and 1991.
        ArchiveFiles.AssertSame(archives[0], archives[1]);
        ArchiveFiles.AssertSame(archives[0], archives[2]);
    }

    [Fact]
    public async Task Run_InPartsOrAtOnce_MakesTheSameArchive()
    {
        for (int day = 0; day < 6; day++)
        {
            run.WriteDay(First.AddDays(day), cell => Math.Abs(Math.Cos(cell * day)));
        }

        await ProgramRun.OfAsync("run", run.RunFile);
        SortedDictionary<string, byte[]> atOnce = ArchiveFiles.Of(run.PathOf("out"));
        Directory.Delete(run.PathOf("out"), recursive: true);
        await ProgramRun.OfAsync("run", run.RunFile, "--from", "1991-01-01");
        await ProgramRun.OfAsync("run", run.RunFile, "--to", "1990-12-31");
        await ProgramRun.OfAsync("run", run.RunFile, "--from", "1991-01-02", "--to", "1991-01-02");

        ArchiveFiles.AssertSame(atOnce, ArchiveFiles.Of(run.PathOf("out")));
    }

    /// <summary>NASA Team and its screens never look at 37H: its file may be missing, and is not opened where it stands.</summary>
    [Fact]
    public async Task Run_ChannelThatNothingUses_IsNotRead()
    {
        run.WriteDay(First, _ => 0.5);
        File.Delete(run.DayFile(First, "h37"));

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        Assert.Equal(10_000.0, Assert.Single(Daily(1990).Rows).ExtentSquareKilometers!.Value, 1e-3);
    }

    [Fact]
    public async Task Run_GridsNotWanted_WritesTablesOnly()
    {
        run.WriteDay(First, _ => 0.5);
        run.WriteRunFile("write_grids = false");

        await ProgramRun.OfAsync("run", run.RunFile);

        Assert.False(Directory.Exists(run.PathOf("out", "grids")));
        Assert.Single(Daily(1990).Rows);
    }

    [Fact]
    public async Task Run_NoticeInTheRunFile_StandsInEveryOutput()
    {
        run.WriteDay(First, _ => 0.5);
        run.WriteRunFile("notice = \"Invented numbers\"");

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Contains("Invented numbers", ended.Results, StringComparison.Ordinal);
        Assert.Equal("Invented numbers", Daily(1990).Metadata["notice"]);
        Assert.Contains("Invented numbers", File.ReadAllText(run.PathOf("out", "grids", "method=nasa-team", "hemisphere=north", "year=1990", "1990-12-30.nc"), System.Text.Encoding.Latin1), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_EveryRun_LeavesARecord()
    {
        run.WriteDay(First, _ => 1.2);

        await ProgramRun.OfAsync("run", run.RunFile);

        RunRecord record = RunRecordFile.Read(Assert.Single(Directory.EnumerateFiles(run.PathOf("out", "runs"))));
        Assert.Equal(new RunCounts(1, 0, 0), record.Counts);
        Assert.Equal(16, Assert.Single(Assert.Single(record.Days).Cells).ClippedAbove);
        Assert.Equal(5, record.FilesRead.Count);
        Assert.Equal(ExitCode.Done, record.ExitCode);
    }

    [Fact]
    public async Task Plan_AnyRun_TouchesNothing()
    {
        run.WriteDay(First, _ => 0.5);

        ProgramRun ended = await ProgramRun.OfAsync("plan", run.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        Assert.Contains("1 day,", ended.Results, StringComparison.Ordinal);
        Assert.False(Directory.Exists(run.PathOf("out")));
    }

    private StoredDailyTable Daily(int year) =>
        DailyTable.Read(new ArchiveLayout(run.PathOf("out")).DailyFile("nasa-team", Grids.Hemisphere.North, year));
}
