using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>What became of one day of a run.</summary>
/// <param name="Order">Its place among the days that the run writes, from 0.</param>
/// <param name="Date">The day.</param>
/// <param name="Files">The files that were read for it.</param>
/// <param name="Observed">Whether it has an observation of its own; a day without one may still be filled from others.</param>
/// <param name="Fault">Why its own input could not be used, or null.</param>
/// <param name="OutOfRange">Brightness temperatures made missing.</param>
/// <param name="Methods">One entry a method with numbers, in the order of the run; empty for a gap.</param>
internal sealed record DayResult(
    int Order, DateOnly Date, IReadOnlyList<string> Files, bool Observed, Fault? Fault, int OutOfRange, IReadOnlyList<MethodResult> Methods)
{
    /// <summary>The sensor that saw the day.</summary>
    public string Sensor { get; init; } = DayLabel.NoSensor;

    /// <summary>The pure surfaces of the day, or of the nearest where nobody saw it; null where the run takes no samples.</summary>
    public TunedDay? Tuned { get; init; }
}

/// <summary>What one method made of one day.</summary>
/// <param name="Method">The method.</param>
/// <param name="Counts">What happened to the cells.</param>
/// <param name="Filled">What was filled.</param>
/// <param name="Rows">One a region, the whole hemisphere first.</param>
/// <param name="Emptied">Whether screens, masks and coast correction left no cell that counts as ice, though there were such cells before them.</param>
internal sealed record MethodResult(string Method, RetrievalCounts Counts, FilledCells Filled, IReadOnlyList<DailyRow> Rows, bool Emptied = false)
{
    /// <summary>One a place.</summary>
    public IReadOnlyList<DailyPlaceRow> PlaceRows { get; init; } = [];
}

/// <summary>How many cells of one day were filled, and from what.</summary>
/// <param name="FromNeighbours">From their neighbours.</param>
/// <param name="FromDays">From days before and after.</param>
/// <param name="PolarGap">In the polar gap, 0 where the day's rim was too empty; null where the run fills no gap.</param>
internal readonly record struct FilledCells(int FromNeighbours, int FromDays, int? PolarGap);

/// <summary>What the outputs of a day say of where it comes from.</summary>
/// <param name="Date">The day.</param>
/// <param name="Sensor">The sensor that ruled it.</param>
/// <param name="Status">Whether it may still change.</param>
/// <param name="TiePoints">Where its tie points come from, for methods whose tie points move.</param>
/// <param name="Offsets">What was taken off the sensor's channels, in words.</param>
internal readonly record struct DayLabel(DateOnly Date, string Sensor, DayStatus Status, TiePointState TiePoints, string Offsets)
{
    /// <summary>Stands for the sensor of a day that no sensor saw.</summary>
    public const string NoSensor = "none";

    /// <summary>Describes a day with input.</summary>
    public static DayLabel Of(PlannedDay day, TunedDay? tuned) => new(
        day.Date, day.Source.Settings.Sensor.Name, day.Source.Settings.Status, tuned?.State ?? TiePointState.Fixed, SourceOffsetText.Of(day.Source.Settings));
}
