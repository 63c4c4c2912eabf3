using IceExtent.Grids;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Files of melt signals: what is in them, when they are written and when they go.</summary>
public sealed class MeltSignalTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 5, 1);
    private readonly TinyRun run = new();

    public void Dispose() => run.Dispose();

    /// <summary>
    /// Origin: worked. Full ice is 232.0 − 231.0 = 1.0 K at H, 248.4 and 242.3 K at V. A cell of 10 % ice is below the 15 % of extent
    /// and has none; a cell of 40 % has 0.4 · 1.0 + 0.6 · (113.4 − 145.0) = −18.6 K, each temperature rounded to 0.1 K.
    /// </summary>
    [Fact]
    public async Task Run_SignalsAsked_WritesThemWhereIceIs()
    {
        await RunAsync("[melt]\nsignals = true", cell => cell switch { 6 => 0.1, 7 => 0.4, 8 => double.NaN, _ => 1.0 });
        (short[] range, short[] v19, short[] v37) = Read(First);

        Assert.Equal((10, 2_484, 2_423), (range[9], v19[9], v37[9]));
        Assert.Equal((Packing.Fill, Packing.Fill), (range[6], range[8]));
        Assert.Equal(Packing.Fill, range[5]); // Land.
        Assert.InRange(range[7], -187, -185);
    }

    [Fact]
    public async Task Run_SignalsNotAsked_WritesNone()
    {
        await RunAsync(string.Empty, _ => 1.0);

        Assert.False(Directory.Exists(run.PathOf("out", "melt_signals")));
    }

    /// <summary>The totals do not depend on the signals: they need a channel that nasa-team does not.</summary>
    [Theory]
    [InlineData("")]
    [InlineData("[filling]\ndays_before = 1\ndays_after = 1\n")]
    public async Task Run_SignalsAsked_LeavesConcentrationsAsTheyAre(string filling)
    {
        string grid = run.PathOf("out", "grids", "method=nasa-team", "hemisphere=north", "year=1990", "1990-05-01.nc");
        await RunAsync(filling, cell => 0.05 * cell);
        float[] without = ConcentrationGridFile.Read(grid, TinyRun.Grid);
        Directory.Delete(run.PathOf("out"), recursive: true);
        await RunAsync(filling + "[melt]\nsignals = true", cell => 0.05 * cell);

        Assert.Equal(without, ConcentrationGridFile.Read(grid, TinyRun.Grid));
    }

    /// <summary>A day whose input is damaged loses its file; days that are only read for filling get none.</summary>
    [Theory]
    [InlineData("")]
    [InlineData("[filling]\ndays_before = 1\ndays_after = 1\n")]
    public async Task Run_DayLostOrOutsideThePeriod_HasNoFile(string filling)
    {
        for (int day = 0; day < 4; day++)
        {
            run.WriteDay(First.AddDays(day), _ => 1.0);
        }

        run.WriteRunFile(filling + "[melt]\nsignals = true");
        await ProgramRun.OfAsync("run", run.RunFile, "--from", "1990-05-02", "--to", "1990-05-03");
        Assert.Equal([false, true, true, false], Exist());

        await File.WriteAllTextAsync(run.DayFile(First.AddDays(2), "v19"), "short");
        ProgramRun again = await ProgramRun.OfAsync("run", run.RunFile, "--from", "1990-05-02", "--to", "1990-05-03");

        Assert.Equal(ExitCode.DoneWithGaps, again.ExitCode);
        Assert.Equal([false, true, false, false], Exist());

        IEnumerable<bool> Exist() => Enumerable.Range(0, 4).Select(day => File.Exists(Layout.MeltSignalFile(Hemisphere.North, First.AddDays(day))));
    }

    /// <summary>The numbers of one worker and of three, byte by byte.</summary>
    [Fact]
    public async Task Run_SeveralWorkers_WriteTheSameBytes()
    {
        for (int day = 0; day < 5; day++)
        {
            run.WriteDay(First.AddDays(day), cell => (cell + day) % 10 / 10.0);
        }

        run.WriteRunFile("[melt]\nsignals = true");
        await ProgramRun.OfAsync("run", run.RunFile, "--workers", "1");
        byte[][] one = Bytes();
        Directory.Delete(run.PathOf("out"), recursive: true);
        await ProgramRun.OfAsync("run", run.RunFile, "--workers", "3");

        Assert.Equal(one, Bytes());

        byte[][] Bytes() => [.. Enumerable.Range(0, 5).Select(day => File.ReadAllBytes(Layout.MeltSignalFile(Hemisphere.North, First.AddDays(day))))];
    }

    private ArchiveLayout Layout => new(run.PathOf("out"));

    private async Task RunAsync(string head, Func<int, double> iceFraction)
    {
        run.WriteDay(First, iceFraction);
        run.WriteRunFile(head);
        Assert.Equal(ExitCode.Done, (await ProgramRun.OfAsync("run", run.RunFile)).ExitCode);
    }

    private (short[] Range, short[] V19, short[] V37) Read(DateOnly day)
    {
        ArchiveMeltSignals signals = new(Layout, TinyRun.Grid);
        short[] range = new short[20], v19 = new short[20], v37 = new short[20];
        signals.Read(signals.List(day, day).Single().Path, range, v19, v37);
        return (range, v19, v37);
    }
}
