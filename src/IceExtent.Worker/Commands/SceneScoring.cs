using IceExtent.Storage.Faults;
using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes;
using IceExtent.Statistics;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;
using IceExtent.Worker.Seasons;

namespace IceExtent.Worker.Commands;

/// <summary>The part of <c>scene</c> that holds methods against the truth.</summary>
internal static class SceneScoring
{
    /// <summary>Every n-th day of a period.</summary>
    public static IEnumerable<DateOnly> Days(DateOnly from, DateOnly to, int every)
    {
        for (DateOnly day = from; day <= to; day = day.AddDays(every))
        {
            yield return day;
        }
    }

    /// <summary>Scores and prints.</summary>
    /// <param name="scenes">The scene, and the one that follows it, each with its days.</param>
    /// <param name="land">The land of their grid.</param>
    /// <param name="methods">The methods asked for.</param>
    /// <param name="defaults">Everything else.</param>
    /// <param name="workers">How many days are processed at a time.</param>
    /// <param name="json">Whether the result is printed as JSON.</param>
    /// <param name="console">Where to.</param>
    /// <param name="cancellation">Stops.</param>
    /// <exception cref="ConfigurationException">A method does not exist.</exception>
    public static int Score(
        IReadOnlyList<(Scene Scene, IReadOnlyList<DateOnly> Days)> scenes, LandShare land, string[] methods, SceneDefaults defaults, int workers, bool json, CommandConsole console, CancellationToken cancellation)
    {
        List<string> usable = Usable(scenes[0].Scene, methods, console);

        // Each radiometer is scored by itself: samples of one never tune the other.
        ScoredDay[] scored = [.. scenes.SelectMany(part => new SceneScore(part.Scene, land, usable, defaults).Run(part.Days, workers, cancellation))];
        IReadOnlyList<SeasonScore> scores = ScoreSummary.Seasons(usable, scored);
        ScoreReport.Print(scores, ScoreSummary.Trends(usable, scored), json, console);
        if (!json)
        {
            console.Print(SceneCommand.Notice);
        }

        return scores.Count == 0 ? ExitCode.NoUsableInput : ExitCode.Done;
    }

    /// <summary>Scores season dates and prints.</summary>
    /// <param name="scene">The scene.</param>
    /// <param name="years">The calendar years of the ice years' first days.</param>
    /// <param name="land">The land of its grid.</param>
    /// <param name="methods">The methods asked for.</param>
    /// <param name="defaults">Everything else.</param>
    /// <param name="workers">How many days are processed at a time.</param>
    /// <param name="json">Whether the result is printed as JSON.</param>
    /// <param name="console">Where to.</param>
    /// <param name="cancellation">Stops.</param>
    /// <exception cref="ConfigurationException">A method does not exist.</exception>
    public static int ScoreSeasons(
        Scene scene, IReadOnlyList<int> years, LandShare land, string[] methods, SceneDefaults defaults, int workers, bool json, CommandConsole console, CancellationToken cancellation)
    {
        List<string> usable = Usable(scene, methods, console);
        bool[] ocean = land.OceanBelow(defaults.LandLimitFraction);
        TotalsRegion[] regions = [TotalsRegion.Hemisphere(scene.Grid, ocean), .. defaults.Regions.On(scene.Grid, ocean).Select(region => TotalsRegion.Part(scene.Grid, region))];
        IReadOnlyList<ScoredSeasons> scores = new SceneSeasonScore(scene, land, usable, defaults, defaults.Season, regions).Run(years, workers, cancellation);
        SeasonScoreReport.Print(scores, json, console);
        if (!json)
        {
            console.Print(SceneCommand.Notice);
        }

        return scores.Count == 0 || years.Count == 0 ? ExitCode.NoUsableInput : ExitCode.Done;
    }

    /// <summary>Scores melt onset and freeze-up and prints.</summary>
    /// <param name="scene">The scene, its melt season imposed.</param>
    /// <param name="years">The ice years.</param>
    /// <param name="land">The land of its grid.</param>
    /// <param name="methods">The methods asked for; the first that the scene can serve says where ice is.</param>
    /// <param name="defaults">Everything else.</param>
    /// <param name="workers">How many days are processed at a time.</param>
    /// <param name="json">Whether the result is printed as JSON.</param>
    /// <param name="console">Where to.</param>
    /// <param name="cancellation">Stops.</param>
    /// <exception cref="ConfigurationException">A method does not exist.</exception>
    public static int ScoreMelt(
        Scene scene, IReadOnlyList<int> years, LandShare land, string[] methods, SceneDefaults defaults, int workers, bool json, CommandConsole console, CancellationToken cancellation)
    {
        const int CellStep = 3; // Neighbours tell the same; one in nine is enough.
        if (Usable(scene, methods, console) is not [string method, ..] || years.Count == 0)
        {
            console.Say(years.Count == 0 ? "No ice year begins in the period." : "No method is left.");
            return ExitCode.NoUsableInput;
        }

        MeltScoreReport.Print(new SceneMeltScore(scene, land, method, defaults, CellStep).Run(years, workers, cancellation), json, console);
        if (!json)
        {
            console.Print(SceneCommand.Notice);
        }

        return ExitCode.Done;
    }

    private static List<string> Usable(Scene scene, string[] methods, CommandConsole console)
    {
        HemisphereTuning tuning = scene.Sensor.In(scene.Grid.Hemisphere);
        List<string> usable = [];
        foreach (string name in methods)
        {
            if (!ConcentrationMethods.Names.Contains(name))
            {
                throw new ConfigurationException([new(
                    "IE1007", "--methods", $"the unknown name {name}", string.Join(", ", ConcentrationMethods.Names), NearestName.Suggestion(name, [.. ConcentrationMethods.Names]))]);
            }

            bool able = ConcentrationMethods.TryCreate(name, tuning, scene.Grid.Hemisphere) is { } method && method.Channels.All(scene.Channels.Contains);
            if (able)
            {
                usable.Add(name);
            }
            else
            {
                console.Say($"{name} is left out: the scene or {scene.Sensor.Name} lacks a channel or the pure surfaces it needs.");
            }
        }

        return usable;
    }
}
