using System.Diagnostics;
using System.Globalization;
using IceExtent.Worker.Running;
using IceExtent.Worker.Seasons;
using Spectre.Console;

namespace IceExtent.Worker.Commands;

/// <summary>Shows how a run goes on: a bar with days per second and time left on a terminal, plain lines elsewhere.</summary>
internal sealed class RunProgress(CommandConsole console) : IRunObserver
{
    private static readonly TimeSpan LineEvery = TimeSpan.FromSeconds(10);

    private readonly Stopwatch watch = new();
    private TimeSpan lastLine;
    private ProgressTask? bar;
    private int total;
    private int done;

    /// <summary>Runs work under the bar.</summary>
    public async Task<T> ShowAsync<T>(Func<Task<T>> work)
    {
        if (!console.IsTerminal)
        {
            return await work();
        }

        IAnsiConsole terminal = AnsiConsole.Create(new AnsiConsoleSettings { Out = new AnsiConsoleOutput(console.Messages) });
        return await terminal.Progress()
            .AutoClear(true)
            .Columns(new TaskDescriptionColumn(), new ProgressBarColumn(), new PercentageColumn(), new RemainingTimeColumn())
            .StartAsync(async context =>
            {
                bar = context.AddTask("listing input", maxValue: 1);
                bar.IsIndeterminate = true;
                return await work();
            });
    }

    /// <summary>What the days came to.</summary>
    public SeriesSummary Series { get; } = new();

    public void Planned(RunPlan plan)
    {
        total = plan.OutputCount;
        watch.Start();
        if (bar is null)
        {
            DateOnly[] dates = [.. plan.Days.Select(day => day.Date).Concat(plan.DaysToFill).Order()];
            console.Say(dates.Length == 0
                ? "No day to process."
                : string.Create(CultureInfo.InvariantCulture, $"{Counted.Days(total)} to process, {dates[0]:yyyy-MM-dd} to {dates[^1]:yyyy-MM-dd}."));
            return;
        }

        bar.MaxValue = Math.Max(1, total);
        bar.IsIndeterminate = false;
    }

    public void DayDone(DayResult result)
    {
        done++;
        Series.Add(result);
        double perSecond = done / Math.Max(1e-3, watch.Elapsed.TotalSeconds);
        if (bar is not null)
        {
            bar.Value = done;
            bar.Description = string.Create(CultureInfo.InvariantCulture, $"{result.Date:yyyy-MM-dd} {perSecond,6:F0} days/s");
        }
        else if (watch.Elapsed - lastLine >= LineEvery)
        {
            lastLine = watch.Elapsed;
            console.Say(string.Create(
                CultureInfo.InvariantCulture, $"{result.Date:yyyy-MM-dd}: {done} of {total} days, {perSecond:F0} days/s, {(total - done) / perSecond:F0} s left"));
        }
    }

    /// <summary>How many ice years had their dates found.</summary>
    public int SeasonsDone { get; private set; }

    public void SeasonDone(SeasonYearReport year)
    {
        SeasonsDone++;
        if (bar is not null)
        {
            bar.Description = string.Create(CultureInfo.InvariantCulture, $"season dates {year.Method} {year.Year}");
        }
        else if (watch.Elapsed - lastLine >= LineEvery)
        {
            lastLine = watch.Elapsed;
            console.Say(string.Create(CultureInfo.InvariantCulture, $"Season dates of {year.Year} ({year.Method})."));
        }
    }
}
