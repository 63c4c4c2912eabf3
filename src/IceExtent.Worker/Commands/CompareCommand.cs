using System.CommandLine;
using System.Globalization;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>compare</c>: the methods of a run file side by side on the same days.</summary>
internal static class CompareCommand
{
    public static Command Make(CommandConsole console)
    {
        Option<string> output = new("--out") { Description = "The folder to write to.", HelpName = "DIR", DefaultValueFactory = _ => "comparison" };
        Option<bool> sensors = new("--sensors") { Description = "Compare the sources instead, on the days that two of them have: totals by month, offsets of channels." };
        Option<bool> json = CommonOptions.Json();
        Command command = new(
            "compare",
            "Run every method of a run file on the same days: totals, differences from the first method, and maps of their spread.\n\nExample:\n  iceextent compare run.toml --from 1984-12-25 --to 1984-12-27 --out comparison\n  iceextent compare run.toml --sensors")
        {
            output, sensors, json,
        };
        RunFilePeriod period = new(command);
        command.SetAction((parsed, cancellation) =>
        {
            RunSettings settings = period.Load(parsed);
            if (parsed.GetValue(sensors))
            {
                RunPlan both = RunPlanner.Plan(settings, period.From(parsed), period.To(parsed), cancellation);
                return Task.FromResult(SensorReport.Write(settings, both, Path.GetFullPath(parsed.GetValue(output)!), Metadata(settings), parsed.GetValue(json), console, cancellation));
            }

            if (settings.Methods.Count < 2)
            {
                throw new ConfigurationException([new("IE1014", settings.RunFile, $"one method ({settings.Methods[0]})", "two methods or more", "Name several in methods = [...].")]);
            }

            string folder = Path.GetFullPath(parsed.GetValue(output)!);
            RunPlan plan = RunPlanner.Plan(settings, period.From(parsed), period.To(parsed), cancellation);
            (List<MethodComparisonRow> rows, List<Fault> faults) = Compare(settings, plan, (period.From(parsed), period.To(parsed)), folder, cancellation);
            ComparisonTable.Write(Path.Combine(folder, "comparison.parquet"), rows, Metadata(settings));
            console.Tell(faults);
            Print(settings, rows, folder, parsed.GetValue(json), console);
            return Task.FromResult(rows.Count == 0 ? ExitCode.NoUsableInput : faults.Count > 0 ? ExitCode.DoneWithGaps : ExitCode.Done);
        });
        return command;
    }

    private static (List<MethodComparisonRow> Rows, List<Fault> Faults) Compare(
        RunSettings settings, RunPlan plan, (DateOnly? From, DateOnly? To) wanted, string folder, CancellationToken cancellation)
    {
        List<MethodComparisonRow> rows = [];
        List<Fault> faults = [.. plan.Gaps.Select(gap => gap.Fault)];
        DayPreparation preparation = new(settings);
        MethodComparison comparison = new(settings, preparation, SampleSeries.For(preparation, plan, wanted, Environment.ProcessorCount, cancellation), folder);
        foreach (PlannedDay day in plan.Days)
        {
            cancellation.ThrowIfCancellationRequested();
            try
            {
                rows.AddRange(comparison.Compare(day));
            }
            catch (FaultException unreadable) when (unreadable.Fault.Code.StartsWith("IE2", StringComparison.Ordinal))
            {
                faults.Add(unreadable.Fault); // A bad file costs its day; a fault of the output ends the command.
            }
        }

        return (rows, faults);
    }

    private static KeyValuePair<string, string>[] Metadata(RunSettings settings) =>
    [
        new("methods", string.Join(' ', settings.Methods)),
        new("grid", settings.Grid.Name),
        new("program_version", ProgramVersion.Text),
        new(DailySeries.DigestKey, ConfigurationDigest.Of(settings)),
        new("caution", Cautions.Text),
        new("notice", settings.Notice ?? "none"),
    ];

    private static void Print(RunSettings settings, List<MethodComparisonRow> rows, string folder, bool json, CommandConsole console)
    {
        var means = rows.Where(row => row.Region == TotalsRegion.WholeHemisphere).GroupBy(row => row.Method).Select(method => new
        {
            Method = method.Key,
            Days = method.Count(),
            ExtentKm2 = method.Average(row => row.ExtentSquareKilometers),
            AreaKm2 = method.Average(row => row.AreaSquareKilometers),
            ExtentDifferenceKm2 = method.Average(row => row.ExtentDifferenceSquareKilometers),
            AreaDifferenceKm2 = method.Average(row => row.AreaDifferenceSquareKilometers),
            MeanDifference = method.Average(row => row.MeanDifferenceFraction),
            RmsDifference = method.Average(row => row.RootMeanSquareDifferenceFraction),
        }).ToList();
        if (json)
        {
            console.Print(JsonText.Of(new { Folder = folder, Against = settings.Methods[0], Means = means }));
            return;
        }

        console.Print(string.Create(CultureInfo.InvariantCulture, $"Means over {rows.Select(row => row.Date).Distinct().Count()} days; differences from {settings.Methods[0]}; areas in km²"));
        console.Print("method             extent       area  extent diff    area diff  mean diff   rms diff");
        foreach (var method in means)
        {
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{method.Method,-14} {method.ExtentKm2,10:F0} {method.AreaKm2,10:F0} {method.ExtentDifferenceKm2,12:F0} {method.AreaDifferenceKm2,12:F0} {method.MeanDifference,10:P2} {method.RmsDifference,10:P2}"));
        }

        console.Print($"Table and maps: {folder}");
        if (settings.Notice is { } notice)
        {
            console.Print(notice);
        }

        console.Print(Cautions.Text);
    }
}
