using System.CommandLine;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Seasons;

namespace IceExtent.Worker.Commands;

/// <summary><c>season</c>: the dates of one region or place.</summary>
internal static class SeasonCommand
{
    public static Command Make(CommandConsole console)
    {
        Argument<string> runFile = new("RUNFILE") { Description = "The run file (TOML) of the archive." };
        Argument<string> name = new("NAME") { Description = "A region or place of the archive." };
        Option<string?> method = new("--method") { Description = "A method of the run; the default is its first.", HelpName = "METHOD" };
        Option<int> years = CommonOptions.Count("--years", "How many of the last ice years are listed.", _ => 10, 200);
        Option<bool> json = CommonOptions.Json();
        Command command = new(
            "season",
            "When the water of a region or place opens and closes: this year so far, the last years, what is usual and how it changes.\n\nExample:\n  iceextent season run.toml kivalde-bay\n  iceextent season run.toml port-trunnel --json")
        {
            runFile, name, method, years, json,
        };
        command.SetAction(parsed =>
        {
            RunSettings settings = RunFileLoader.Load(parsed.GetValue(runFile)!, ConfigFolder.BesideProgram);
            SeasonSettings season = settings.Season ?? throw new ConfigurationException(
                [new("IE1014", settings.RunFile, "no table [season]", "a run that finds season dates", "Add a line [season] and run it.")]);
            string wanted = MethodOf(settings, parsed.GetValue(method));
            SeasonAnswer answer = Find(settings, season, wanted, parsed.GetValue(name)!);
            if (answer.Metadata.GetValueOrDefault(SeasonMetadata.SchemeKey) is { } made && made != season.Scheme.Name)
            {
                console.Say($"The dates in the archive are of the scheme {made}; the run file now names {season.Scheme.Name}: run it to have those.");
            }

            SeasonReport.Print(answer, wanted, parsed.GetValue(years), parsed.GetValue(json), settings.Notice, console);
            return ExitCode.Done;
        });
        return command;
    }

    private static string MethodOf(RunSettings settings, string? asked) => asked is null ? settings.Methods[0]
        : settings.Methods.Contains(asked) ? asked
        : throw new ConfigurationException([new("IE1007", "--method", $"the unknown name {asked}", string.Join(", ", settings.Methods), NearestName.Suggestion(asked, settings.Methods))]);

    private static SeasonAnswer Find(RunSettings settings, SeasonSettings season, string method, string name)
    {
        ArchiveLayout layout = new(settings.Output);
        (IReadOnlyList<RegionSeasonRow> regions, IReadOnlyDictionary<string, string> ofRegions) = Read(layout.TableFile("season_regions", method, settings.Grid.Hemisphere), SeasonTableReader.ReadRegions);
        (IReadOnlyList<PlaceSeasonRow> places, IReadOnlyDictionary<string, string> ofPlaces) = Read(layout.TableFile("season_places", method, settings.Grid.Hemisphere), SeasonTableReader.ReadPlaces);
        if (regions.Any(row => row.Region == name))
        {
            return SeasonAnswer.Of(name, "region", regions.Where(row => row.Region == name), season, ofRegions);
        }

        if (places.Any(row => row.Place == name))
        {
            return SeasonAnswer.Of(name, "place", places.Where(row => row.Place == name), season, ofPlaces);
        }

        string[] known = [.. regions.Select(row => row.Region).Concat(places.Select(row => row.Place)).Distinct()];
        throw new FaultException(known.Length == 0
            ? new("IE3141", settings.Output, $"no season dates of {method}", "an archive with season tables", "Run the run file first.")
            : new("IE3142", settings.Output, $"no region or place {name}", string.Join(", ", known), NearestName.Suggestion(name, known)));
    }

    private static (IReadOnlyList<T> Rows, IReadOnlyDictionary<string, string> Metadata) Read<T>(
        string path, Func<string, (IReadOnlyList<T>, IReadOnlyDictionary<string, string>)> read) =>
        File.Exists(path) ? read(path) : ([], new Dictionary<string, string>());
}
