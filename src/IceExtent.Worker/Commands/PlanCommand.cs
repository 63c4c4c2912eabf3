using System.CommandLine;
using System.Globalization;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>plan</c>: what a run would do, doing nothing.</summary>
internal static class PlanCommand
{
    public static Command Make(CommandConsole console)
    {
        Option<bool> json = CommonOptions.Json();
        Command command = new("plan", "Show which days a run would process, from which sensor, and why others are left out.\n\nExample:\n  iceextent plan run.toml --json")
        {
            json,
        };
        RunFilePeriod period = new(command);
        command.SetAction((parsed, cancellation) =>
        {
            RunSettings settings = period.Load(parsed);
            RunPlan plan = RunPlanner.Plan(settings, period.From(parsed), period.To(parsed), cancellation);
            Write(settings, plan, parsed.GetValue(json), console);
            return Task.FromResult(plan.OutputCount == 0 ? ExitCode.NoUsableInput : plan.Gaps.Count > 0 ? ExitCode.DoneWithGaps : ExitCode.Done);
        });
        return command;
    }

    private static void Write(RunSettings settings, RunPlan plan, bool json, CommandConsole console)
    {
        var spans = plan.Days
            .GroupBy(day => day.Source.Index)
            .Select(group => new
            {
                Sensor = group.First().Source.Settings.Sensor.Name,
                Days = group.Count(),
                First = group.First().Date,
                Last = group.Last().Date,
            })
            .OrderBy(span => span.First)
            .ToList();
        if (json)
        {
            console.Print(JsonText.Of(
                new
                {
                    settings.Output,
                    Grid = settings.Grid.Name,
                    settings.Methods,
                    settings.WriteGrids,
                    Sources = spans,
                    DaysLeftToAnEarlierSource = plan.Superseded,
                    plan.DaysWithoutInput,
                    plan.DatesWithoutInput,
                    plan.DaysToFill,
                    MarginDays = plan.Margin.Count,
                    Rejected = plan.Gaps.Select(gap => new { gap.Date, gap.Fault.Code, Text = gap.Fault.ToString() }),
                }));
            return;
        }

        console.Print($"Output:  {settings.Output}");
        console.Print($"Grid:    {settings.Grid.Name}, methods {string.Join(", ", settings.Methods)}, grids {(settings.WriteGrids ? "written" : "not written")}");
        foreach (var span in spans)
        {
            console.Print(string.Create(CultureInfo.InvariantCulture, $"Sensor:  {span.Sensor,-12} {span.Days,6} days, {span.First:yyyy-MM-dd} to {span.Last:yyyy-MM-dd}"));
        }

        console.Print(string.Create(
            CultureInfo.InvariantCulture,
            $"To do:   {Counted.Days(plan.Days.Count)}; {plan.Gaps.Count} rejected, {plan.DaysWithoutInput} without input, {plan.Superseded} left to an earlier source"));
        if (settings.DayFilling is not null)
        {
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"Filling: {Counted.Days(plan.DaysToFill.Count)} without usable input made from others; {Counted.Days(plan.Margin.Count)} outside the period read for it"));
        }

        console.Tell(plan.Gaps.Select(gap => gap.Fault));
    }
}
