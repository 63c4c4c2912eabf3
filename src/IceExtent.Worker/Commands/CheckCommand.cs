using System.CommandLine;
using System.Globalization;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>check</c>: the run file and every input file, read but not processed.</summary>
internal static class CheckCommand
{
    public static Command Make(CommandConsole console)
    {
        Option<bool> json = CommonOptions.Json();
        Command command = new("check", "Check a run file and read every input file, without writing anything.\n\nExample:\n  iceextent check run.toml")
        {
            json,
        };
        RunFilePeriod period = new(command);
        command.SetAction((parsed, cancellation) =>
        {
            RunSettings settings = period.Load(parsed);
            RunPlan plan = RunPlanner.Plan(settings, period.From(parsed), period.To(parsed), cancellation);
            List<Fault> faults = [.. plan.Gaps.Select(gap => gap.Fault)];
            if (ArchiveLock.Obstacle(settings.Output) is { } obstacle)
            {
                faults.Add(obstacle);
            }

            int readable = ReadAll(settings, plan, faults, cancellation);
            Write(settings, readable, faults, parsed.GetValue(json), console);
            return Task.FromResult(readable == 0 ? ExitCode.NoUsableInput : faults.Count > 0 ? ExitCode.DoneWithGaps : ExitCode.Done);
        });
        return command;
    }

    private static int ReadAll(RunSettings settings, RunPlan plan, List<Fault> faults, CancellationToken cancellation)
    {
        int readable = 0;
        foreach (PlannedDay day in plan.Days)
        {
            cancellation.ThrowIfCancellationRequested();
            try
            {
                day.Source.Reader.Read(day.Input, new BrightnessPlanes(settings.Grid.CellCount, day.Source.Settings.Description.Channels.Keys));
                readable++;
            }
            catch (FaultException unreadable)
            {
                faults.Add(unreadable.Fault);
            }
        }

        return readable;
    }

    private static void Write(RunSettings settings, int readable, List<Fault> faults, bool json, CommandConsole console)
    {
        if (json)
        {
            console.Print(JsonText.Of(new
            {
                DaysReadable = readable,
                Regions = CellReport.RegionsOf(settings),
                Places = CellReport.PlacesOf(settings),
                Faults = faults.Select(fault => new { fault.Code, Text = fault.ToString() }),
            }));
            return;
        }

        console.Tell(faults);
        CellReport.Print(settings, console);
        console.Print(string.Create(CultureInfo.InvariantCulture, $"The run file can be understood. {Counted.Days(readable)} can be read, {Counted.Of(faults.Count, "fault")}."));
    }
}
