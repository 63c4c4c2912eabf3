using System.CommandLine;
using System.Globalization;
using IceExtent.Scenes;
using IceExtent.Scenes.Demo;
using IceExtent.Scenes.Parameters;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>demo</c>: an invented polar sea, three years of it, through the whole job.</summary>
internal static class DemoCommand
{
    private const long Seed = 20_22;
    private const string Notice = "Invented: the Tessivar Sea, its coasts, ice and weather, and the radiometer floe-1 exist nowhere.";
    private static readonly DateOnly FirstDay = new(2022, 1, 1);
    private static readonly DateOnly LastDay = new(2024, 12, 31);

    public static Command Make(CommandConsole console)
    {
        Option<string> output = new("--out") { Description = "The folder to write to.", HelpName = "DIR", DefaultValueFactory = _ => "iceextent-demo" };
        Option<int> workers = CommonOptions.Workers();
        Command command = new(
            "demo",
            "Invent a polar sea with three years of daily brightness temperatures and run the whole job on it.\n\nExample:\n  iceextent demo --out iceextent-demo")
        {
            output, workers,
        };
        command.SetAction((parsed, cancellation) => DemoAsync(Path.GetFullPath(parsed.GetValue(output)!), parsed.GetValue(workers), console, cancellation));
        return command;
    }

    private static async Task<int> DemoAsync(string folder, int workers, CommandConsole console, CancellationToken cancellation)
    {
        string runFile = Path.Combine(folder, "run.toml");
        RefuseForeignFolder(folder, runFile);
        console.Say($"Inventing a polar sea in {folder} ...");
        int days = Invent(folder, runFile, workers, cancellation);
        console.Say(string.Create(CultureInfo.InvariantCulture, $"{days} days of brightness temperatures written."));
        int exitCode = await RunCommand.RunAsync(runFile, new(null, null, workers, ["run", runFile]), console, cancellation);
        PrintYears(folder, console);
        console.Print(string.Empty);
        console.Print($"Run it again: {CommandLine.ProgramPath} run {runFile}");
        console.Print($"Series:       {Path.Combine(folder, "archive", "daily")}");
        console.Print($"Seasons:      {CommandLine.ProgramPath} season {runFile} kivalde-bay");
        console.Print($"Places:       {Path.Combine(folder, "archive", "daily_places")}");
        console.Print($"Grids:        {Path.Combine(folder, "archive", "grids")}");
        return exitCode;
    }

    // Nobody's own files are overwritten: a folder with other content and no run file of the demonstration is left alone.
    private static void RefuseForeignFolder(string folder, string runFile)
    {
        bool ours = File.Exists(runFile) && File.ReadAllText(runFile).Contains(Notice, StringComparison.Ordinal);
        if (!ours && (File.Exists(folder) || (Directory.Exists(folder) && Directory.EnumerateFileSystemEntries(folder).Any())))
        {
            throw new FaultException(new("IE3004", folder, "something that is not a demonstration", "a new or empty folder, or an earlier demonstration", "Name another folder with --out."));
        }
    }

    private static int Invent(string folder, string runFile, int workers, CancellationToken cancellation)
    {
        CopyDescriptions(folder);
        DemoAreas.Write(folder, Notice);
        GridFile.WriteUndated(
            Path.Combine(folder, "land", InventedSea.Grid.Name + ".nc"),
            InventedSea.Grid,
            [new BytePackedVariable(LandShareFile.VariableName, "share of land in the cell", "land_area_fraction", [], "1", InventedSea.Land.Fraction.ToArray(), BytePacking.Fraction)],
            [new("title", "Invented coasts"), new("notice", Notice)]);
        List<Fault> faults = [];
        SceneParameters parameters = SceneLoader.Load(Path.Combine(ConfigFolder.BesideProgram.Scenes, "demo.toml"), faults)
            ?? throw new ConfigurationException(faults);
        Scene scene = new(parameters, InventedSea.Grid, InventedSea.Land, InventedRadiometer.Sensor, Seed);
        PublishedFile.WriteText(runFile, SceneCommand.RunFileText($"grids/{InventedSea.Grid.Name}.toml", $"sensors/{InventedRadiometer.Sensor.Name}.toml", scene.Channels, Notice, DemoAreas.RunFileLines)); // First, so that a stopped demonstration is known as one.
        int days = new SceneFiles(scene, folder, Notice).Write(FirstDay, LastDay, withTruth: false, workers, cancellation);
        return days;
    }

    private static void CopyDescriptions(string folder)
    {
        foreach (string source in Directory.EnumerateFiles(ConfigFolder.BesideProgram.Demo, "*.toml", SearchOption.AllDirectories))
        {
            PublishedFile.WriteText(Path.Combine(folder, Path.GetRelativePath(ConfigFolder.BesideProgram.Demo, source)), File.ReadAllText(source));
        }
    }

    // Days with wide gaps are no candidates for a yearly extreme.
    private static void PrintYears(string folder, CommandConsole console)
    {
        const double LeastObservedShare = 0.98;
        ArchiveLayout layout = new(Path.Combine(folder, "archive"));
        console.Print(string.Empty);
        console.Print("The Tessivar Sea (invented): extremes of extent in million km² with their standard errors,");
        console.Print(string.Create(CultureInfo.InvariantCulture, $"from days of which at least {LeastObservedShare:P0} was observed:"));
        console.Print(string.Empty);
        console.Print("year  largest                    smallest                   days used");
        for (int year = FirstDay.Year; year <= LastDay.Year; year++)
        {
            DailyRow[] rows = [.. DailyTable.Read(layout.DailyFile("nasa-team", Grids.Hemisphere.North, year)).Rows.Where(row => row.Region == TotalsRegion.WholeHemisphere)];
            DailyRow[] covered = [.. rows.Where(row => row.ObservedShare >= LeastObservedShare)];
            console.Print(covered.Length == 0
                ? string.Create(CultureInfo.InvariantCulture, $"{year}  no day observed well enough")
                : string.Create(
                    CultureInfo.InvariantCulture,
                    $"{year}  {Extreme(covered.MaxBy(row => row.ExtentSquareKilometers)!)}   {Extreme(covered.MinBy(row => row.ExtentSquareKilometers)!)}   {covered.Length} of {rows.Length}"));
        }
    }

    private static string Extreme(DailyRow row) => string.Create(
        CultureInfo.InvariantCulture,
        $"{row.ExtentSquareKilometers / 1e6:F3} ± {row.ExtentStandardErrorSquareKilometers / 1e6:F3} on {row.Date:dd MMM}");
}
