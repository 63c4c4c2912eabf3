using System.Globalization;
using IceExtent.Retrieval;
using IceExtent.Scenes;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;

namespace IceExtent.Worker.Running;

/// <summary>Writes an invented scene as files that any run can read.</summary>
/// <remarks>One NetCDF-4 file a day, temperatures in tenths of a kelvin as radiometer grids usually have them; the truth in files of its own.</remarks>
internal sealed class SceneFiles(Scene scene, string folder, string notice)
{
    /// <summary>Where the temperatures stand, inside the folder.</summary>
    public const string TemperatureFolder = "brightness";

    private static readonly Packing Tenths = new(0.1, 0.0, 0.0, 400.0);
    private static readonly KeyValuePair<string, string>[] Nothing = [];

    /// <summary>The variable that holds a channel.</summary>
    public static string VariableOf(Channel channel) => "tb_" + ChannelNames.NameOf(channel);

    /// <summary>Writes every day of a period that the radiometer sees.</summary>
    /// <param name="from">The first day.</param>
    /// <param name="to">The last day.</param>
    /// <param name="withTruth">Whether the truth is written too.</param>
    /// <param name="workers">How many days are made at a time.</param>
    /// <param name="cancellation">Stops after the days in hand.</param>
    /// <returns>The number of days written.</returns>
    public int Write(DateOnly from, DateOnly to, bool withTruth, int workers, CancellationToken cancellation)
    {
        DateOnly[] days = [.. Enumerable.Range(from.DayNumber, to.DayNumber - from.DayNumber + 1).Select(DateOnly.FromDayNumber).Where(day => !scene.IsMissing(day))];
        using ThreadLocal<Pen> pens = new(() => new Pen(scene));
        try
        {
            Parallel.ForEach(days, new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = cancellation }, day =>
            {
                WriteTemperatures(day, pens.Value!);
                if (withTruth)
                {
                    WriteTruth(day, pens.Value!);
                }
            });
        }
        catch (AggregateException failures) when (failures.InnerExceptions.OfType<FaultException>().FirstOrDefault() is { } fault)
        {
            throw new FaultException(fault.Fault, failures); // All workers meet the same disk: one fault says it.
        }

        return days.Length;
    }

    private void WriteTemperatures(DateOnly day, Pen pen)
    {
        scene.Observe(day, pen.Workspace, pen.Observed);
        GridVariable[] variables = [.. scene.Channels.Select(channel => new PackedVariable(
            VariableOf(channel),
            string.Create(CultureInfo.InvariantCulture, $"brightness temperature, {scene.Sensor.FrequenciesGigahertz[channel]} GHz, {(ChannelNames.NameOf(channel)[^1] == 'v' ? "vertical" : "horizontal")}"),
            "brightness_temperature",
            Nothing,
            "K",
            pen.Observed.KelvinMemory(channel),
            Tenths))];
        GridFile.Write(PathOf(TemperatureFolder, day), scene.Grid, day, variables, Attributes("Invented brightness temperatures"));
    }

    private void WriteTruth(DateOnly day, Pen pen)
    {
        scene.Truth(day, pen.Workspace, pen.Truth);
        GridFile.Write(
            PathOf("truth", day),
            scene.Grid,
            day,
            [
                new PackedVariable("concentration", "true sea-ice concentration of the invented scene", "sea_ice_area_fraction", Nothing, "1", pen.Truth.Concentration, Packing.Fraction),
                new PackedVariable("first_year_concentration", "true concentration of first-year ice", null, Nothing, "1", pen.Truth.FirstYear, Packing.Fraction),
                new PackedVariable("multiyear_concentration", "true concentration of multiyear ice", null, Nothing, "1", pen.Truth.Multiyear, Packing.Fraction),
            ],
            Attributes("Truth of an invented scene"));
    }

    private string PathOf(string kind, DateOnly day) =>
        Path.Combine(folder, kind, string.Create(CultureInfo.InvariantCulture, $"{day:yyyy-MM-dd}.nc"));

    private KeyValuePair<string, string>[] Attributes(string title) =>
        [new("title", title), new("notice", notice), new("sensor", scene.Sensor.Name), new("program", $"IceExtent {ProgramVersion.Text}")];

    private sealed class Pen(Scene scene)
    {
        public SceneWorkspace Workspace { get; } = scene.CreateWorkspace();

        public BrightnessPlanes Observed { get; } = new(scene.Grid.CellCount, scene.Channels);

        public SceneTruth Truth { get; } = new(scene.Grid.CellCount);
    }
}
