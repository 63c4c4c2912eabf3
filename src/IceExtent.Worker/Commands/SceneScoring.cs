using IceExtent.Storage.Faults;
using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

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
    /// <exception cref="ConfigurationException">A method does not exist.</exception>
    public static int Score(
        Scene scene, LandShare land, string[] methods, string coast, string limits, IEnumerable<DateOnly> days, int workers, bool json, CommandConsole console, CancellationToken cancellation)
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

        SceneDefaults defaults = SceneDefaults.Load(ConfigFolder.BesideProgram, scene.Grid, coast, limits);
        SceneScore scoring = new(scene, land, usable, defaults);
        IReadOnlyList<SeasonScore> scores = scoring.Run(days, workers, cancellation);
        ScoreReport.Print(scores, json, console);
        if (!json)
        {
            console.Print(SceneCommand.Notice);
        }

        return scores.Count == 0 ? ExitCode.NoUsableInput : ExitCode.Done;
    }
}
