using System.CommandLine;
using System.Globalization;
using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes;
using IceExtent.Scenes.Parameters;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>scene</c>: invented brightness temperatures on any grid, for any sensor, with a run file that reads them.</summary>
internal static class SceneCommand
{
    /// <summary>What every output of invented data says.</summary>
    public const string Notice = "Invented data: no real sea, no real observations.";

    public static Command Make(CommandConsole console)
    {
        Option<string> grid = new("--grid") { Description = "A grid of config/grids, or a path ending in .toml.", HelpName = "GRID", DefaultValueFactory = _ => "north-25km" };
        Option<string> sensor = new("--sensor") { Description = "A sensor of config/sensors, or a path ending in .toml.", HelpName = "SENSOR", DefaultValueFactory = _ => "ssmis-f17" };
        Option<string?> parameters = new("--scene") { Description = "A scene of config/scenes, or a path ending in .toml; the default is the one of the grid's hemisphere.", HelpName = "SCENE" };
        Option<DateOnly?> from = CommonOptions.Day("--from", "The first day.");
        Option<DateOnly?> to = CommonOptions.Day("--to", "The last day.");
        Option<long> seed = new("--seed") { Description = "Another number gives other ice and weather.", HelpName = "N", DefaultValueFactory = _ => 1 };
        Option<int> radiometer = CommonOptions.Count("--radiometer", "Another number is another radiometer over the same sea: other noise, other lost passes.", _ => Scene.FirstRadiometer, 1_000);
        Option<bool> noTruth = new("--no-truth") { Description = "Leave out the files of the true concentration." };
        Option<string?> output = new("--out") { Description = "The folder to write to; needed unless --score is given.", HelpName = "DIR" };
        Option<bool> score = new("--score") { Description = "Write nothing: run methods on the scene and print how they stand to its truth." };
        Option<string[]> methods = new("--methods") { Description = "With --score: the methods, separated by spaces.", HelpName = "METHOD", AllowMultipleArgumentsPerToken = true, DefaultValueFactory = _ => [.. ConcentrationMethods.Names] };
        Option<string?> coast = new("--coast") { Description = "With --score: off, brightness, concentration or both, as coast.correction of a run file.", HelpName = "CORRECTION" };
        Option<string?> settings = new("--settings") { Description = "With --score: a TOML file with tables of a run file, such as [tie_points] or [weather].", HelpName = "FILE" };
        Option<string?> successor = new("--successor") { Description = "With --score: the scene file of a radiometer that follows the first, with other offsets or drifts.", HelpName = "SCENE" };
        Option<DateOnly?> changeOver = CommonOptions.Day("--change-over", "With --successor: its first day.");
        Option<int> every = CommonOptions.Count("--every", "With --score: take one day of so many.", _ => 5, 366);
        Option<bool> seasons = new("--seasons") { Description = "With --score: hold season dates against the true ones, in every ice year that begins in the period." };
        Option<bool> imposed = new("--melt-season") { Description = "Give every cell a day on which its ice turns wet, as [melt_season] of the scene says, in place of melt that comes and goes with the weather; with --score: hold melt onset and freeze-up against it." };
        Option<bool> json = CommonOptions.Json();
        Option<int> workers = CommonOptions.Workers();
        (from.Required, to.Required) = (true, true);
        Command command = new(
            "scene",
            "Write invented brightness temperatures with a known truth, and a run file for them.\n\nExample:\n  iceextent scene --grid north-25km --sensor ssmi-f13 --from 2000-01-01 --to 2000-01-31 --out scene\n  iceextent scene --score --methods nasa-team bristol --from 2000-01-01 --to 2000-12-31 --sensor ssmi-f13")
        {
            grid, sensor, parameters, from, to, seed, radiometer, noTruth, output, score, methods, coast, settings, successor, changeOver, every, seasons, imposed, json, workers,
        };
        command.SetAction((parsed, cancellation) =>
        {
            (DateOnly first, DateOnly last) = (parsed.GetValue(from)!.Value, parsed.GetValue(to)!.Value);
            CommonOptions.CheckPeriod(first, last);
            (Scene scene, LandShare land, string gridName, string sensorName) = Load(
                parsed.GetValue(grid)!, parsed.GetValue(sensor)!, parsed.GetValue(parameters), parsed.GetValue(seed), parsed.GetValue(radiometer), parsed.GetValue(imposed));
            if (parsed.GetValue(score))
            {
                SceneDefaults defaults = SceneDefaults.Load(ConfigFolder.BesideProgram, scene.Grid, parsed.GetValue(coast), parsed.GetValue(settings));
                if (parsed.GetValue(seasons) || parsed.GetValue(imposed))
                {
                    int[] years = [.. Enumerable.Range(first.Year, last.Year - first.Year + 1).Where(year => defaults.Season.Scheme.YearStart.Beginning(year).FirstDay is var begins && begins >= first && begins <= last)];
                    return Task.FromResult(parsed.GetValue(imposed)
                        ? SceneScoring.ScoreMelt(scene, years, land, parsed.GetValue(methods)!, defaults, parsed.GetValue(workers), parsed.GetValue(json), console, cancellation)
                        : SceneScoring.ScoreSeasons(
                        scene, years, land, parsed.GetValue(methods)!, defaults, parsed.GetValue(workers), parsed.GetValue(json), console, cancellation));
                }

                DateOnly[] wanted = [.. SceneScoring.Days(first, last, parsed.GetValue(every))];
                List<(Scene, IReadOnlyList<DateOnly>)> scenes = [(scene, wanted)];
                if (ChangeOver(parsed.GetValue(successor), parsed.GetValue(changeOver)) is { } change)
                {
                    Scene next = Load(parsed.GetValue(grid)!, parsed.GetValue(sensor)!, change.Scene, parsed.GetValue(seed), parsed.GetValue(radiometer)).Scene;
                    scenes = [(scene, [.. wanted.Where(day => day < change.Day)]), (next, [.. wanted.Where(day => day >= change.Day)])];
                }

                return Task.FromResult(SceneScoring.Score(
                    scenes, land, parsed.GetValue(methods)!, defaults, parsed.GetValue(workers), parsed.GetValue(json), console, cancellation));
            }

            string folder = Path.GetFullPath(parsed.GetValue(output) ?? throw new ConfigurationException(
                [new("IE1012", "--out", "nothing", "a folder to write to", "Name one, or ask for --score.")]));
            int days = new SceneFiles(scene, folder, Notice).Write(first, last, !parsed.GetValue(noTruth), parsed.GetValue(workers), cancellation);
            string runFile = Path.Combine(folder, "run.toml");
            PublishedFile.WriteText(runFile, RunFileText(gridName, sensorName, scene.Channels, Notice));
            console.Print(string.Create(CultureInfo.InvariantCulture, $"{days} days of {scene.Sensor.Name} on {scene.Grid.Name}, {last.DayNumber - first.DayNumber + 1 - days} left out as the radiometer would."));
            console.Print($"Run file: {runFile}");
            console.Print(Notice);
            return Task.FromResult(days == 0 ? ExitCode.NoUsableInput : ExitCode.Done);
        });
        return command;
    }

    private static (string Scene, DateOnly Day)? ChangeOver(string? successor, DateOnly? day) => (successor, day) switch
    {
        (null, null) => null,
        ({ } scene, { } first) => (scene, first),
        _ => throw new ConfigurationException([new(
            "IE1012", "command line", "one of --successor and --change-over", "both or neither", "Say which scene follows, and from which day.")]),
    };

    /// <summary>The run file for a folder that <see cref="SceneFiles"/> filled.</summary>
    public static string RunFileText(string grid, string sensor, IEnumerable<Channel> channels, string notice, string more = "") => string.Create(CultureInfo.InvariantCulture, $$"""
        # {{notice}}
        output  = "archive"
        grid    = "{{grid}}"
        methods = ["nasa-team"]
        notice  = "{{notice}}"
        {{more}}
        [[source]]
        sensor   = "{{sensor}}"
        files    = "{{SceneFiles.TemperatureFolder}}/*.nc"
        channels = { {{string.Join(", ", channels.Select(channel => $"{ChannelNames.NameOf(channel)} = \"{SceneFiles.VariableOf(channel)}\""))}} }

        [season]

        """);

    private static (Scene Scene, LandShare Land, string Grid, string Sensor) Load(
        string grid, string sensor, string? parameters, long seed, int radiometer, bool imposedMelt = false)
    {
        List<Fault> faults = [];
        ConfigFolder config = ConfigFolder.BesideProgram;
        string? gridPath = Resolve("--grid", grid, config.Grids, faults);
        string? sensorPath = Resolve("--sensor", sensor, config.Sensors, faults);
        LoadedGrid? loaded = gridPath is null ? null : GridLoader.Load(gridPath, faults);
        Sensor? sensed = sensorPath is null ? null : SensorLoader.Load(sensorPath, faults);
        string sceneName = parameters ?? (loaded?.Grid.Hemisphere == Hemisphere.South ? "south" : "north");
        string? scenePath = Resolve("--scene", sceneName, config.Scenes, faults);
        SceneParameters? scene = scenePath is null ? null : SceneLoader.Load(scenePath, faults);
        if (faults.Count > 0)
        {
            throw new ConfigurationException(faults);
        }

        scene = imposedMelt ? scene! with { MeltSeason = scene.MeltSeason with { Imposed = true } } : scene;
        LandShare land = LandShareFile.Read(loaded!.LandPath, loaded.Grid);
        return (new Scene(scene!, loaded.Grid, land, sensed!, seed, radiometer), land, Named(grid, gridPath!), Named(sensor, sensorPath!));
    }

    private static string Named(string written, string path) => written.EndsWith(".toml", StringComparison.Ordinal) ? path : written;

    private static string? Resolve(string option, string written, string folder, List<Fault> faults)
    {
        if (written.EndsWith(".toml", StringComparison.Ordinal))
        {
            return Path.GetFullPath(written);
        }

        IReadOnlyList<string> names = ConfigFolder.NamesIn(folder);
        if (names.Contains(written))
        {
            return Path.Combine(folder, written + ".toml");
        }

        faults.Add(new("IE1007", $"command line ({option})", $"the unknown name {written}", string.Join(", ", names), NearestName.Suggestion(written, [.. names])));
        return null;
    }
}
