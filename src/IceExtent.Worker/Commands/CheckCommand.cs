using System.CommandLine;
using System.Globalization;
using System.Text.Json;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>check</c>: the run file and every input file, read but not processed.</summary>
internal static class CheckCommand
{
    private static readonly JsonSerializerOptions Indented = new() { WriteIndented = true, PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower };

    public static Command Make(CommandConsole console)
    {
        Argument<string> runFile = CommonOptions.RunFile();
        Option<DateOnly?> from = CommonOptions.Day("--from", "Leave out days before this one.");
        Option<DateOnly?> to = CommonOptions.Day("--to", "Leave out days after this one.");
        Option<bool> json = CommonOptions.Json();
        Command command = new("check", "Check a run file and read every input file, without writing anything.\n\nExample:\n  iceextent check run.toml")
        {
            runFile, from, to, json,
        };
        command.SetAction((parsed, cancellation) =>
        {
            CommonOptions.CheckPeriod(parsed.GetValue(from), parsed.GetValue(to));
            RunSettings settings = RunFileLoader.Load(parsed.GetValue(runFile)!, ConfigFolder.BesideProgram);
            RunPlan plan = RunPlanner.Plan(settings, parsed.GetValue(from), parsed.GetValue(to), cancellation);
            List<Fault> faults = [.. plan.Gaps.Select(gap => gap.Fault)];
            if (ArchiveLock.Obstacle(settings.Output) is { } obstacle)
            {
                faults.Add(obstacle);
            }

            int readable = ReadAll(settings, plan, faults, cancellation);
            Write(readable, faults, parsed.GetValue(json), console);
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

    private static void Write(int readable, List<Fault> faults, bool json, CommandConsole console)
    {
        if (json)
        {
            console.Print(JsonSerializer.Serialize(
                new { DaysReadable = readable, Faults = faults.Select(fault => new { fault.Code, Text = fault.ToString() }) }, Indented));
            return;
        }

        console.Tell(faults);
        console.Print(string.Create(CultureInfo.InvariantCulture, $"The run file can be understood. {Counted.Days(readable)} can be read, {Counted.Of(faults.Count, "fault")}."));
    }
}
