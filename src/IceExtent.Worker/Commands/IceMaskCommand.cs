using System.CommandLine;
using System.Globalization;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>ice-mask</c>: where ice can be in each month, from the grids of an archive.</summary>
internal static class IceMaskCommand
{
    public static Command Make(CommandConsole console)
    {
        Option<string?> method = new("--method") { Description = "A method of the run file; the default is its first.", HelpName = "METHOD" };
        Option<string> output = new("--out") { Description = "The file to write.", HelpName = "FILE", DefaultValueFactory = _ => "ice-mask.nc" };
        Option<bool> json = CommonOptions.Json();
        Option<int> workers = CommonOptions.Workers();
        Command command = new(
            "ice-mask",
            "Make a mask of where ice can be in each month of the year, from the concentration grids of a finished run.\n\nExample:\n  iceextent ice-mask run.toml --method nasa-team --from 1990-01-01 --to 2019-12-31 --out ice-mask.nc")
        {
            method, output, json, workers,
        };
        RunFilePeriod period = new(command);
        command.SetAction((parsed, cancellation) =>
        {
            RunSettings settings = period.Load(parsed);
            string chosen = Chosen(settings, parsed.GetValue(method));
            IceMaskBuild build = new(settings, chosen);
            IReadOnlyList<BuiltMonth> months = build.Build(period.From(parsed), period.To(parsed), parsed.GetValue(workers), cancellation);
            string path = Path.GetFullPath(parsed.GetValue(output)!);
            build.Write(path, months, PeriodText(period.From(parsed), period.To(parsed)));
            console.Tell(months.SelectMany(month => month.Faults));
            Print(settings, chosen, months, path, parsed.GetValue(json), console);
            return Task.FromResult(months.Any(month => month.Faults.Count > 0) ? ExitCode.DoneWithGaps : ExitCode.Done);
        });
        return command;
    }

    private static string Chosen(RunSettings settings, string? method)
    {
        if (settings.Weather.IceMaskPath is not null)
        {
            throw new ConfigurationException([new(
                "IE1011", settings.RunFile, "weather.ice_mask_file in the run that is to give an ice mask", "an archive of days without one", "Make the mask of a run without it: a mask made of masked days can only shrink.")]);
        }

        return method is null || settings.Methods.Contains(method)
            ? method ?? settings.Methods[0]
            : throw new ConfigurationException([new(
                "IE1007", "command line (--method)", $"the unknown name {method}", string.Join(", ", settings.Methods), NearestName.Suggestion(method, [.. settings.Methods]))]);
    }

    private static string PeriodText(DateOnly? from, DateOnly? to) => string.Create(
        CultureInfo.InvariantCulture,
        $"{(from is { } first ? first.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) : "the first day")} to {(to is { } last ? last.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) : "the last day")}");

    private static void Print(RunSettings settings, string method, IReadOnlyList<BuiltMonth> months, string path, bool json, CommandConsole console)
    {
        var rows = months.Select(month => new { month.Month, month.Days, IceCanBeKm2 = Area(settings, month, IceMaskMonth.Ice), NoIceKm2 = Area(settings, month, IceMaskMonth.NoIce) }).ToList();
        if (json)
        {
            console.Print(JsonText.Of(new { File = path, Method = method, Months = rows }));
            return;
        }

        console.Print($"Ice mask of {method} on {settings.Grid.Name}; areas in million km²");
        console.Print("month   days  ice can be    no ice");
        foreach (var row in rows)
        {
            console.Print(string.Create(CultureInfo.InvariantCulture, $"{row.Month,5} {row.Days,6} {row.IceCanBeKm2 / 1e6,11:F3} {row.NoIceKm2 / 1e6,9:F3}"));
        }

        console.Print($"Mask: {path}");
        if (settings.Notice is { } notice)
        {
            console.Print(notice);
        }

        console.Print(Cautions.Text);
    }

    // Ocean alone: what the mask says of land means nothing.
    private static double Area(RunSettings settings, BuiltMonth month, byte value)
    {
        const double SquareMetersPerSquareKilometer = 1e6;
        double sum = 0.0;
        for (int cell = 0; cell < month.Mask.Length; cell++)
        {
            sum += settings.Ocean[cell] && month.Mask[cell] == value ? settings.Grid.CellAreasSquareMeters[cell] : 0.0;
        }

        return sum / SquareMetersPerSquareKilometer;
    }
}
