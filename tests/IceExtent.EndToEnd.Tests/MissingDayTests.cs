using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Days without usable input that are made from the days round them: 16 ocean cells of 625 km².</summary>
public sealed class MissingDayTests : IDisposable
{
    private const double Cell = TinyRun.CellSquareKilometers;
    private static readonly DateOnly First = FillingRun.First;
    private readonly FillingRun run = new();

    public void Dispose() => run.Dispose();

    /// <summary>Origin: worked. Day 1 has no file: all 16 cells get the mean of 0.4 and 0.8, 0.6; area 16 · 625 · 0.6 = 6,000 km².</summary>
    [Fact]
    public async Task Run_DayWithoutInput_IsMadeFromItsNeighbours()
    {
        run.Tiny.WriteDay(First, _ => 0.4);
        run.Tiny.WriteDay(First.AddDays(2), _ => 0.8);

        ProgramRun ended = await run.RunAsync("days_before = 1\ndays_after = 1\nmissing_days = true");

        DailyRow row = run.Rows()[1];
        Assert.Equal(ExitCode.Done, ended.ExitCode);
        Assert.Equal([0, 1, 2], run.Rows().Select(day => day.Date.DayNumber - First.DayNumber));
        Assert.Equal(6_000.0, row.AreaSquareKilometers!.Value, 15.0);
        Assert.Equal((0.0, 1.0, "none", DayStatus.Final), (row.ObservedShare, row.FilledShare, row.Sensor, row.Status));
        Assert.Equal(new RunCounts(2, 0, 0, DaysFilled: 1), run.Record().Counts);
        Assert.Equal([DayOutcome.Done, DayOutcome.Filled, DayOutcome.Done], run.Record().Days.Select(day => day.Outcome));
        Assert.Contains("1 day without usable input made wholly", ended.Results, StringComparison.Ordinal);
        Assert.True(File.Exists(run.Grid(1)));
    }

    /// <summary>A radiometer that is on every other day gives a daily series from its first to its last day.</summary>
    [Fact]
    public async Task Run_AlternateDays_GiveADailySeries()
    {
        for (int day = 0; day <= 20; day += 2)
        {
            run.Tiny.WriteDay(First.AddDays(day), _ => 0.02 * (day + 10));
        }

        await run.RunAsync("days_before = 1\ndays_after = 1\nmissing_days = true");

        Assert.Equal(Enumerable.Range(0, 21), run.Rows().Select(row => row.Date.DayNumber - First.DayNumber));
        Assert.All(run.Rows(), row => Assert.Equal(16 * Cell * 0.02 * (row.Date.DayNumber - First.DayNumber + 10), row.AreaSquareKilometers!.Value, 20.0));
        Assert.Equal(new RunCounts(11, 0, 0, DaysFilled: 10), run.Record().Counts);
    }

    /// <summary>Origin: worked. The gap (cells 7 and 12) is filled from a rim that was itself filled over days; all is 0.6: area 16 · 375 km².</summary>
    [Fact]
    public async Task Run_DayWithoutInputAndPolarGap_FillsTheGapToo()
    {
        run.Tiny.Write("tiny.toml", TinyRun.SensorWithPolarGap("1990-01-01", "1999-12-31"));
        run.Tiny.WriteDay(First, _ => 0.4);
        run.Tiny.WriteDay(First.AddDays(2), _ => 0.8);
        run.Tiny.WriteRunFile("[filling]\ndays_before = 1\ndays_after = 1\nmissing_days = true\n[polar_gap]\nrule = \"laplace\"");

        await ProgramRun.OfAsync("run", run.Tiny.RunFile);

        Assert.Equal(16 * 0.6 * Cell, run.Rows()[1].AreaSquareKilometers!.Value, 15.0);
        Assert.Equal((2, 14), (run.Record().Days[1].Cells[0].PolarGapFilled, run.Record().Days[1].Cells[0].FilledFromDays));
    }

    [Theory]
    [InlineData("final", DayStatus.Final)]
    [InlineData("provisional", DayStatus.Provisional)]
    public async Task Run_DayWithoutInput_HasTheStatusOfItsSources(string written, DayStatus status)
    {
        run.Tiny.WriteDay(First, _ => 0.4);
        run.Tiny.WriteDay(First.AddDays(2), _ => 0.8);
        run.Tiny.WriteRunFile("[filling]\ndays_before = 1\ndays_after = 1\nmissing_days = true", $"status = \"{written}\"");

        await ProgramRun.OfAsync("run", run.Tiny.RunFile);

        Assert.Equal(status, run.Rows()[1].Status);
    }

    [Fact]
    public async Task Run_DayWithoutInput_StaysAGapUnlessAskedFor()
    {
        run.Tiny.WriteDay(First, _ => 0.4);
        run.Tiny.WriteDay(First.AddDays(2), _ => 0.8);

        await run.RunAsync("days_before = 1\ndays_after = 1");

        Assert.Equal([0, 2], run.Rows().Select(day => day.Date.DayNumber - First.DayNumber));
        Assert.Equal(new RunCounts(2, 1, 0), run.Record().Counts);
        Assert.False(File.Exists(run.Grid(1)));
    }

    /// <summary>Cut short, day 1 is rejected: it costs its own day, gives nothing to others, and is made from them where that is asked for.</summary>
    [Theory]
    [InlineData("days_before = 2\ndays_after = 2\nmissing_days = true", new[] { 0, 1, 2, 3 }, DayOutcome.Filled)]
    [InlineData("days_before = 2\ndays_after = 2", new[] { 0, 2, 3 }, DayOutcome.Rejected)]
    public async Task Run_RejectedDay_IsReportedEvenWhereItIsFilled(string keys, int[] days, DayOutcome outcome)
    {
        run.WriteDays(4, cell => cell == 7 ? double.NaN : 0.5);
        File.WriteAllBytes(run.Tiny.DayFile(First.AddDays(1), "v19"), [1, 2, 3]);

        ProgramRun ended = await run.RunAsync(keys);

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Equal(days, run.Rows().Select(day => day.Date.DayNumber - First.DayNumber));
        Assert.Equal(outcome, run.Record().Days[1].Outcome);
        Assert.Single(run.Record().Days[1].Faults);
        Assert.Equal(outcome == DayOutcome.Filled, File.Exists(run.Grid(1)));
        Assert.All(run.Rows(), row => Assert.Equal(15.0 / 16.0, row.ObservedShare + row.FilledShare, 1e-6)); // Cell 7 was never seen.
    }

    [Fact]
    public async Task Run_NothingToFillFrom_WritesNoRow()
    {
        run.Tiny.WriteDay(First, _ => double.NaN);
        run.Tiny.WriteDay(First.AddDays(2), _ => 0.8);

        await run.RunAsync("days_before = 1\ndays_after = 1\nmissing_days = true");

        Assert.Equal([0, 2], run.Rows().Select(day => day.Date.DayNumber - First.DayNumber));
        Assert.Null(run.Rows()[0].ExtentSquareKilometers);
        Assert.Equal(new RunCounts(2, 1, 0), run.Record().Counts);
    }

    /// <summary>A day that was made from others loses its row and its grid once they can no longer give.</summary>
    [Fact]
    public async Task Run_FilledDayThatCanNoLongerBeFilled_LeavesTheArchive()
    {
        run.WriteDays(1, _ => 0.4);
        run.Tiny.WriteDay(First.AddDays(2), _ => 0.8);
        const string Keys = "days_before = 1\ndays_after = 1\nmissing_days = true";
        await run.RunAsync(Keys);
        Assert.Equal(3, run.Rows().Count);
        run.Tiny.WriteDay(First.AddDays(2), _ => double.NaN);

        await run.RunAsync(Keys);

        Assert.Equal([0, 2], run.Rows().Select(day => day.Date.DayNumber - First.DayNumber));
        Assert.False(File.Exists(run.Grid(1)));
    }

    /// <summary>
    /// Origin: worked. Day 0 is from a radiometer with a polar gap of two cells, day 3 from one without. Day 1 is nearer to the first
    /// and has its gap, day 2 nearer to the second: there the two cells have no earlier day and stay empty.
    /// </summary>
    [Fact]
    public async Task Run_DaysBetweenTwoSensors_HaveTheGapOfTheNearest()
    {
        run.Tiny.Write("tiny.toml", TinyRun.SensorWithPolarGap("1990-01-01", "1990-03-01"));
        run.Tiny.Write("second.toml", TinyRun.Sensor("1990-03-02", "1999-12-31"));
        run.Tiny.WriteDay(First, _ => 0.4);
        run.Tiny.WriteDay(First.AddDays(3), _ => 0.7);
        run.Tiny.WriteRunFile("[filling]\ndays_before = 2\ndays_after = 2\nmissing_days = true");
        string text = File.ReadAllText(run.Tiny.RunFile);
        string source = text[text.IndexOf("[[source]]", StringComparison.Ordinal)..];
        run.Tiny.Write("run.toml", text.Replace("days/*.bin", "days/19900301*.bin", StringComparison.Ordinal)
            + "\n" + source.Replace("days/*.bin", "days/19900304*.bin", StringComparison.Ordinal).Replace("tiny.toml", "second.toml", StringComparison.Ordinal));

        await ProgramRun.OfAsync("run", run.Tiny.RunFile);

        Assert.Equal(["tiny", "none", "none", "second"], run.Rows().Select(row => row.Sensor));
        Assert.Equal([2 * Cell, 2 * Cell, 0.0, 0.0], run.Rows().Select(row => Math.Round(row.PolarGapSquareKilometers, 3)));
        Assert.Equal([0.0, 1.0, 14.0 / 16.0, 0.0], run.Rows().Select(row => Math.Round(row.FilledShare, 6)));
        Assert.Equal(14 * 0.5 * Cell, run.Rows()[1].AreaSquareKilometers!.Value, 15.0);
        Assert.Equal(14 * 0.6 * Cell, run.Rows()[2].AreaSquareKilometers!.Value, 15.0);
    }
}
