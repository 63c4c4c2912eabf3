using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;
using IceExtent.Worker.Running;
using IceExtent.Worker.Seasons;

namespace IceExtent.EndToEnd.Tests;

/// <summary>What the program says and does when something is wrong.</summary>
public sealed class BadInputTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 3, 1);
    private readonly TinyRun run = new();

    public BadInputTests()
    {
        for (int day = 0; day < 4; day++)
        {
            run.WriteDay(First.AddDays(day), cell => Math.Abs(Math.Sin(cell + day)));
        }
    }

    public void Dispose() => run.Dispose();

    [Fact]
    public async Task Run_FileCutShort_CostsItsDayAndChangesNoOther()
    {
        await ProgramRun.OfAsync("run", run.RunFile);
        IReadOnlyList<DailyRow> good = Rows();
        byte[] goodGrid = File.ReadAllBytes(Grid(First.AddDays(2)));
        File.WriteAllBytes(run.DayFile(First.AddDays(1), "v19"), [1, 2, 3]);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Contains("19900302_v19.bin", ended.Messages, StringComparison.Ordinal);
        Assert.Equal(good.Where(row => row.Date != First.AddDays(1)), Rows());
        Assert.Equal(goodGrid, File.ReadAllBytes(Grid(First.AddDays(2))));
        Assert.False(File.Exists(Grid(First.AddDays(1))), "A grid of a day that cannot be read any more must not stay.");
    }

    [Fact]
    public async Task Run_ChannelFileMissing_IsAGapWithAName()
    {
        File.Delete(run.DayFile(First, "v37"));

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Contains("IE2", ended.Messages, StringComparison.Ordinal);
        Assert.Contains("37v", ended.Messages, StringComparison.Ordinal);
        Assert.Equal(3, Rows().Count);
    }

    [Fact]
    public async Task Run_DayOutOfService_IsAGap()
    {
        run.Write("tiny.toml", TinyRun.Sensor("1990-03-02", "1999-12-31"));

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Contains("IE2302", ended.Messages, StringComparison.Ordinal);
        Assert.Contains("1990-03-02 to 1999-12-31", ended.Messages, StringComparison.Ordinal);
        Assert.Equal(3, Rows().Count);
    }

    [Fact]
    public async Task Run_TwoFilesForOneDay_IsAGap()
    {
        Directory.CreateDirectory(run.PathOf("days", "again"));
        foreach (string channel in new[] { "v19", "h19", "v22", "v37", "h37" })
        {
            string file = run.DayFile(First, channel);
            File.Copy(file, run.PathOf("days", "again", Path.GetFileName(file)));
        }

        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace("days/*.bin", "days/**/*.bin", StringComparison.Ordinal));

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Contains("1990-03-01", ended.Messages, StringComparison.Ordinal);
        Assert.Equal(3, Rows().Count);
    }

    [Fact]
    public async Task Run_NothingUsable_ExitsWithThree()
    {
        run.Write("tiny.toml", TinyRun.Sensor("1995-01-01", "1999-12-31"));

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.NoUsableInput, ended.ExitCode);
    }

    [Fact]
    public async Task Run_OutputIsAFile_IsRefused()
    {
        run.Write("out", "in the way");

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE3003", ended.Messages, StringComparison.Ordinal);
        Assert.Equal("in the way\n", File.ReadAllText(run.PathOf("out")));
    }

    [Fact]
    public async Task Run_ArchiveHeldByAnother_IsRefused()
    {
        using ArchiveLock held = ArchiveLock.Take(run.PathOf("out"), DateTimeOffset.UnixEpoch);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.ArchiveHeld, ended.ExitCode);
        Assert.Contains("IE3002", ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_OtherConfigurationOnTheSameArchive_IsRefusedAndChangesNothing()
    {
        await ProgramRun.OfAsync("run", run.RunFile);
        SortedDictionary<string, byte[]> before = ArchiveFiles.Of(run.PathOf("out"));
        run.WriteRunFile("[totals]\nice_fraction = 0.30");

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE3001", ended.Messages, StringComparison.Ordinal);
        ArchiveFiles.AssertSame(before, ArchiveFiles.Of(run.PathOf("out")));
    }

    /// <summary>A wrong sensor rejects every day; the days that an earlier run made must not be taken for lost.</summary>
    [Fact]
    public async Task Run_WrongSensorOnAGoodArchive_IsRefusedAndChangesNothing()
    {
        await ProgramRun.OfAsync("run", run.RunFile);
        SortedDictionary<string, byte[]> before = ArchiveFiles.Of(run.PathOf("out"));
        run.Write("other.toml", TinyRun.Sensor("1995-01-01", "1999-12-31"));
        run.WriteRunFile(sensor: "other.toml");

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE3001", ended.Messages, StringComparison.Ordinal);
        ArchiveFiles.AssertSame(before, ArchiveFiles.Of(run.PathOf("out")));
    }

    [Fact]
    public async Task Run_EveryDayLost_SaysSoAndLeavesNoEmptyTable()
    {
        await ProgramRun.OfAsync("run", run.RunFile);
        foreach (string file in Directory.EnumerateFiles(run.PathOf("days"), "*_v19.bin"))
        {
            File.WriteAllBytes(file, [0]);
        }

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.NoUsableInput, ended.ExitCode);
        Assert.Contains("4 days taken out of the archive", ended.Results, StringComparison.Ordinal);
        Assert.Empty(ArchiveFiles.Of(run.PathOf("out")));
    }

    [Theory]
    [InlineData("run")]
    [InlineData("plan")]
    [InlineData("check")]
    public async Task Command_PeriodThatEndsBeforeItBegins_IsRefused(string verb)
    {
        ProgramRun ended = await ProgramRun.OfAsync(verb, run.RunFile, "--from", "1990-03-03", "--to", "1990-03-01");

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("Swap the two dates", ended.Messages, StringComparison.Ordinal);
        Assert.False(Directory.Exists(run.PathOf("out")));
    }

    [Fact]
    public async Task Run_DataFileAsRunFile_IsOneFault()
    {
        ProgramRun ended = await ProgramRun.OfAsync("run", run.PathOf("land.nc"));

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE1002", Assert.Single(ended.Messages.Split('\n', StringSplitOptions.RemoveEmptyEntries)), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Scene_FileInTheWay_IsACodedErrorNotADefect()
    {
        ProgramRun ended = await ProgramRun.OfAsync(
            "scene", "--grid", run.PathOf("grid.toml"), "--sensor", run.PathOf("tiny.toml"), "--from", "1990-01-01", "--to", "1990-01-02", "--out", run.PathOf("land.nc"));

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.StartsWith("IE31", ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Check_FileInPlaceOfTheOutput_IsSeenBeforeTheRun()
    {
        run.Write("out", "in the way");

        ProgramRun ended = await ProgramRun.OfAsync("check", run.RunFile);

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Contains("IE3003", ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_Cancelled_LeavesNothingHalfWritten()
    {
        using CancellationTokenSource stop = new();
        await stop.CancelAsync();
        Worker.Configuration.RunSettings settings = Worker.Configuration.RunFileLoader.Load(run.RunFile, Worker.Configuration.ConfigFolder.BesideProgram);
        ArchiveRun cancelled = new(settings, new(null, null, 2, []), TimeProvider.System);

        await Assert.ThrowsAnyAsync<OperationCanceledException>(() => cancelled.RunAsync(new Silent(), stop.Token));

        Assert.Empty(ArchiveFiles.Of(run.PathOf("out")));
        ProgramRun after = await ProgramRun.OfAsync("run", run.RunFile);
        Assert.Equal(ExitCode.Done, after.ExitCode);
    }

    [Theory]
    [InlineData("run")]
    [InlineData("run", "x.toml", "--from", "12/25/1984")]
    [InlineData("run", "x.toml", "--workers", "0")]
    [InlineData("rnu", "x.toml")]
    [InlineData("run", "x.toml", "--worker", "2")]
    [InlineData("run", "--hlep")]
    [InlineData]
    public async Task CommandLine_Wrong_IsACodedErrorWithExitTwo(params string[] args)
    {
        ProgramRun ended = await ProgramRun.OfAsync(args);

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE1012", ended.Messages, StringComparison.Ordinal);
        Assert.Empty(ended.Results);
    }

    private IReadOnlyList<DailyRow> Rows() =>
        DailyTable.Read(new ArchiveLayout(run.PathOf("out")).DailyFile("nasa-team", Grids.Hemisphere.North, 1990)).Rows;

    private string Grid(DateOnly day) => new ArchiveLayout(run.PathOf("out")).GridFile("nasa-team", Grids.Hemisphere.North, day);

    private sealed class Silent : IRunObserver
    {
        public void Planned(RunPlan plan)
        {
        }

        public void DayDone(DayResult result)
        {
        }

        public void SeasonDone(SeasonYearReport year)
        {
        }
    }
}
