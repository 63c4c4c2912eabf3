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
        SensorSpans sensors = SensorSpans.Of(plan);
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
                    sensors.Ruling,
                    sensors.Overlaps,
                    sensors.LeftToEarlier,
                    sensors.HeldBack,
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
            console.Print(string.Create(CultureInfo.InvariantCulture, $"Sensor:  {span.Sensor,-12} {Counted.Days(span.Days),11}, {span.First:yyyy-MM-dd} to {span.Last:yyyy-MM-dd}"));
        }

        if (settings.Sources.Count > 1)
        {
            Print(sensors, console);
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

    private static void Print(SensorSpans sensors, CommandConsole console)
    {
        foreach (RulingSpan span in sensors.Ruling)
        {
            string why = span.Why.Count == 1 ? span.Why[0].Reason : string.Join(", ", span.Why.Select(reason => $"{reason.Reason} ({Counted.Days(reason.Days)})"));
            console.Print($"Rules:   {span.Sensor,-12} {Text(span.First, span.Last, span.Days)}: {why}");
        }

        foreach (PairSpan span in sensors.Overlaps)
        {
            console.Print($"Overlap: {Names(span)} {Text(span.First, span.Last, span.Days)}");
        }

        foreach (PairSpan span in sensors.LeftToEarlier)
        {
            console.Print($"Left:    {span.LaterSensor} to {span.EarlierSensor} {Text(span.First, span.Last, span.Days)}");
        }

        foreach (DaySpan span in sensors.HeldBack)
        {
            console.Print($"Unruled: {Text(span.First, span.Last, span.Days)} with input that first_day and last_day leave out");
        }
    }

    private static string Names(PairSpan span) => $"{span.EarlierSensor} (source {span.Earlier}) and {span.LaterSensor} (source {span.Later})";

    private static string Text(DateOnly first, DateOnly last, int days) =>
        string.Create(CultureInfo.InvariantCulture, $"{Counted.Days(days),10}, {first:yyyy-MM-dd} to {last:yyyy-MM-dd}");
}
