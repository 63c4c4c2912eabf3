using System.CommandLine;
using System.Globalization;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>run</c>: brings an archive up to its inputs.</summary>
internal static class RunCommand
{
    public static Command Make(CommandConsole console)
    {
        Option<int> workers = CommonOptions.Workers();
        Command command = new(
            "run",
            "Turn brightness temperatures into concentration grids and a daily series.\n\nExample:\n  iceextent run run.toml --from 1984-12-01 --to 1984-12-31")
        {
            workers,
        };
        RunFilePeriod period = new(command);
        command.SetAction((parsed, cancellation) => RunAsync(
            period.RunFile(parsed),
            new(period.From(parsed), period.To(parsed), parsed.GetValue(workers), [.. parsed.Tokens.Select(token => token.Value)]),
            console,
            cancellation));
        return command;
    }

    /// <summary>Runs one run file and prints what came of it.</summary>
    public static async Task<int> RunAsync(string runFile, RunOptions options, CommandConsole console, CancellationToken cancellation)
    {
        CommonOptions.CheckPeriod(options.From, options.To);
        _ = Task.Run(DailyTable.Rehearse, CancellationToken.None); // The other core is idle while files are checked.
        RunSettings settings = RunFileLoader.Load(runFile, ConfigFolder.BesideProgram);
        RunProgress progress = new(console);
        RunOutcome outcome = await progress.ShowAsync(() => new ArchiveRun(settings, options, TimeProvider.System).RunAsync(progress, cancellation));
        console.Tell(outcome.Gaps.Select(gap => gap.Fault));
        console.Print($"{Counted.Days(outcome.DaysDone)} done, {outcome.Gaps.Count} rejected, {Counted.Days(outcome.Plan.DaysWithoutInput)} between without input.");
        if (outcome.DaysFilled > 0)
        {
            console.Print($"{Counted.Days(outcome.DaysFilled)} without usable input made wholly from days before and after.");
        }

        if (outcome.DaysRemoved > 0)
        {
            console.Print($"{Counted.Days(outcome.DaysRemoved)} taken out of the archive: their input can no longer be used.");
        }

        progress.Series.Print(console);
        if (progress.SeasonsDone > 0)
        {
            console.Print($"Season dates of {Counted.Years(progress.SeasonsDone)} found.");
        }

        console.Print($"Archive: {settings.Output}");
        console.Print($"Record:  {outcome.RecordPath}");
        if (settings.Notice is { } notice)
        {
            console.Print(notice);
        }

        console.Print(Cautions.Text);
        return outcome.ExitCode;
    }
}
