using System.CommandLine;
using System.Globalization;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>coast-minimum</c>: what land alone feigns at coasts, from a year of an archive's own grids.</summary>
internal static class CoastMinimumCommand
{
    private const int LastYear = 9998; // The day after the year must be a date too.

    public static Command Make(CommandConsole console)
    {
        Argument<string> runFile = new("RUNFILE") { Description = "The run file (TOML) of the archive." };
        Option<int> year = CommonOptions.Count("--year", "The year whose grids are read.", null, LastYear);
        Option<string?> method = new("--method") { Description = "A method of the run file; needed where it has several.", HelpName = "METHOD" };
        Option<string> output = new("--out") { Description = "The file to write.", HelpName = "FILE", DefaultValueFactory = _ => "minima.nc" };
        Option<bool> json = CommonOptions.Json();
        year.Required = true;
        Command command = new(
            "coast-minimum",
            "Write the smallest monthly mean concentration of each coastal cell over a year: the file that coast.minimum_file of a run file names.\n\nExample:\n  iceextent coast-minimum run.toml --year 1992 --method nasa-team --out minima.nc")
        {
            runFile, year, method, output, json,
        };
        command.SetAction((parsed, cancellation) =>
        {
            RunSettings settings = RunFileLoader.Load(parsed.GetValue(runFile)!, ConfigFolder.BesideProgram);
            string name = MethodOf(settings, parsed.GetValue(method));
            RefuseCorrected(settings);
            CoastMinimumResult result;
            try
            {
                result = new CoastMinimumBuild(settings).Make(name, parsed.GetValue(year), cancellation);
            }
            catch (FaultException nothing) when (nothing.Fault.Code is "IE2207" or "IE2208")
            {
                console.Tell([nothing.Fault]);
                return Task.FromResult(ExitCode.NoUsableInput);
            }

            string path = Path.GetFullPath(parsed.GetValue(output)!);
            CoastMinimumFile.Write(path, settings.Grid, result.MinimumFraction, Attributes(settings, name, parsed.GetValue(year), result));
            console.Tell(result.Faults);
            Print(path, result, parsed.GetValue(json), console);
            return Task.FromResult(result.Faults.Count > 0 ? ExitCode.DoneWithGaps : ExitCode.Done);
        });
        return command;
    }

    private static string MethodOf(RunSettings settings, string? named)
    {
        if (named is null && settings.Methods.Count == 1)
        {
            return settings.Methods[0];
        }

        return settings.Methods.FirstOrDefault(method => method == named) ?? throw new ConfigurationException([new(
            "IE1007",
            "command line (--method)",
            named is null ? "no method" : $"the unknown name {named}",
            string.Join(", ", settings.Methods),
            named is null ? "Name one." : NearestName.Suggestion(named, [.. settings.Methods]))]);
    }

    // Grids from which ice was taken at coasts would give minima that are too small.
    private static void RefuseCorrected(RunSettings settings)
    {
        if (settings.Coast.InConcentrations)
        {
            throw new ConfigurationException([new(
                "IE1011",
                $"{settings.RunFile} (coast.correction)",
                "grids whose concentrations were corrected at coasts",
                "\"off\", or \"brightness\" for minima that are used with \"both\"",
                "Name the run file of an archive without that correction.")]);
        }
    }

    private static List<KeyValuePair<string, string>> Attributes(RunSettings settings, string method, int year, CoastMinimumResult result)
    {
        List<KeyValuePair<string, string>> attributes =
        [
            new("title", "Smallest monthly mean concentration of coastal cells"),
            new("method", method),
            new("year", year.ToString(CultureInfo.InvariantCulture)),
            new("days", result.DaysByMonth.Sum().ToString(CultureInfo.InvariantCulture)),
            new("least_days_per_month", settings.Coast.LeastDaysPerMonth.ToString(CultureInfo.InvariantCulture)),
            new("caps", FormattableString.Invariant(
                $"{settings.Coast.Minimum.Shore.CapFraction} {settings.Coast.Minimum.NearShore.CapFraction} {settings.Coast.Minimum.Offshore.CapFraction}")),
            new("program", $"IceExtent {ProgramVersion.Text}"),
        ];
        if (settings.Notice is { } notice)
        {
            attributes.Add(new("notice", notice));
        }

        return attributes;
    }

    private static void Print(string path, CoastMinimumResult result, bool json, CommandConsole console)
    {
        int cells = result.MinimumFraction.Count(fraction => fraction > 0f);
        double mean = result.MinimumFraction.Where(fraction => fraction > 0f).DefaultIfEmpty(0f).Average(fraction => (double)fraction);
        if (json)
        {
            console.Print(JsonText.Of(new { File = path, Days = result.DaysByMonth.Sum(), Cells = cells, MeanMinimum = mean }));
            return;
        }

        console.Print(string.Create(
            CultureInfo.InvariantCulture, $"{Counted.Days(result.DaysByMonth.Sum())} read; {cells} coastal cells with a minimum above 0, {mean:P1} in the mean."));
        console.Print($"File: {path}");
    }
}
