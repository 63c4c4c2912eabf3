using System.Globalization;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>The days of a variable's steps, and what is wrong with some of them.</summary>
/// <param name="Days">The day and the step of each that can be told, in the order of the file.</param>
/// <param name="Fault">A fault where some steps cannot be told, or null.</param>
internal sealed record DayStamps(IReadOnlyList<(DateOnly Day, int Step)> Days, Fault? Fault)
{
    private const int MostSteps = 1_000_000;

    /// <summary>Reads the days: from time in the file, else from an attribute of the file, else from its name.</summary>
    /// <exception cref="FaultException">IE2109, IE2110 or IE2113: no day can be told.</exception>
    public static DayStamps Of(FileVariable variable, GridAxes axes)
    {
        HdfFile file = variable.File;
        if (TimeOf(variable, axes) is { } time)
        {
            return FromTime(time, axes.Shape.Steps);
        }

        if (axes.Time is { } axis && axis.Extent != 1)
        {
            throw NetCdfFaults.NoDay(variable.Where, $"a time axis of {axis.Extent} steps without a time coordinate");
        }

        if (file.Attributes.Text("time_coverage_start") is { } text)
        {
            return DateText.AtStart(text) is { } start
                ? One(start)
                : throw new FaultException(NetCdfFaults.Time(file.Path, $"the attribute time_coverage_start '{text}'"));
        }

        return DateText.InName(file.Path) switch
        {
            [var day] => One(day),
            [] => throw NetCdfFaults.NoDay(file.Path, "no time in the file and no date in its name"),
            var days => throw NetCdfFaults.NoDay(
                file.Path, $"no time in the file and {days.Count} different dates in its name"),
        };
    }

    private static DayStamps One(DateOnly day) => new([(day, 0)], null);

    // The coordinate of the time axis, else a single time that the variable or the file names.
    private static FileVariable? TimeOf(FileVariable variable, GridAxes axes)
    {
        if (axes.Time is { } axis)
        {
            FileVariable? scale = axis.Scale ?? variable.File.Find("time");
            return scale is { IsDimensionOnly: false } && scale.Lengths is [var length] && length == axis.Extent ? scale : null;
        }

        string[] named = variable.Attributes.Text("coordinates")?.Split(' ', StringSplitOptions.RemoveEmptyEntries) ?? [];
        return named.Append("time")
            .Select(variable.File.Find)
            .FirstOrDefault(candidate => candidate is { Lengths: [] or [1], IsDimensionOnly: false } && FileAxis.CountsTime(candidate));
    }

    private static DayStamps FromTime(FileVariable time, int steps)
    {
        string? calendar = time.Attributes.Text("calendar");
        if (!TimeUnits.IsReal(calendar))
        {
            throw new FaultException(NetCdfFaults.Calendar(time.Where, calendar!));
        }

        string? text = time.Attributes.Text("units");
        TimeUnits units = (text is null ? null : TimeUnits.Parse(text, calendar))
            ?? throw new FaultException(NetCdfFaults.Time(time.Where, text is null ? "no units" : $"the units '{text}'"));
        double[] times = time.ReadAll(MostSteps) is { } values && values.Length == steps
            ? values
            : throw new FaultException(NetCdfFaults.Time(time.Where, $"{NumberTypes.NameOf(time.Dataset.Type)}, not one number a step"));

        if (MiddlesOf(time, times.Length) is { } middles)
        {
            times = middles;
        }

        List<(DateOnly, int)> days = new(times.Length);
        List<int> untold = [];
        double? fill = time.Attributes.Number("_FillValue");
        for (int step = 0; step < times.Length; step++)
        {
            if (!times[step].Equals(fill) && units.DayOf(times[step]) is { } day)
            {
                days.Add((day, step));
            }
            else
            {
                untold.Add(step);
            }
        }

        return new(days, untold.Count == 0 ? null : NetCdfFaults.Time(time.Where, Describe(untold, times)));
    }

    // Many writers put the time of a daily mean at the end of its day. Where the file says over which span a mean was
    // taken, the middle of the span tells the day. Source: [CF] section 7.1.
    private static double[]? MiddlesOf(FileVariable time, int steps)
    {
        if (time.Attributes.Text("bounds") is not { } name
            || time.File.Find(name) is not { } bounds
            || bounds.Attributes.Has("units")
            || bounds.Lengths is not [.., 2]
            || bounds.ReadAll(2 * MostSteps) is not { } ends
            || ends.Length != 2 * steps)
        {
            return null;
        }

        return [.. Enumerable.Range(0, steps).Select(step => (ends[2 * step] + ends[(2 * step) + 1]) / 2.0)];
    }

    private static string Describe(List<int> untold, double[] times) => string.Create(
        CultureInfo.InvariantCulture,
        $"{untold.Count} steps without a day, the first at index {untold[0]} with the value {times[untold[0]]:R}");
}
