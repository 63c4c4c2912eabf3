using System.Globalization;
using IceExtent.Grids;
using IceExtent.Statistics.Seasons;

namespace IceExtent.Storage.Writing;

/// <summary>Writes the dates of one ice year as maps: one CF NetCDF-4 file.</summary>
public static class SeasonGridFile
{
    private static readonly Packing WholeDays = new(1.0, 0.0, -1_000.0, 2_000.0);
    private static readonly Packing HalfDays = new(0.5, 0.0, 0.0, 1_000.0);
    private static readonly (byte Value, string Meaning)[] States =
        [.. Enum.GetValues<SeasonDateState>().Select(state => ((byte)state, SeasonDateStates.NameOf(state)))];

    /// <summary>Writes the file beside its place, flushes it and renames it.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="grid">The grid.</param>
    /// <param name="year">The ice year.</param>
    /// <param name="begins">What it begins with.</param>
    /// <param name="cells">The dates of its ocean cells; a date that no cell has is left out.</param>
    /// <param name="attributes">Global attributes.</param>
    /// <exception cref="Faults.FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    public static void Write(
        string path, Grid grid, IceYear year, YearBeginning begins, CellSeasons cells, IReadOnlyList<KeyValuePair<string, string>> attributes)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(cells);
        string since = $"days since {year.FirstDay.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture)} 00:00:00";
        List<GridVariable> variables = [];
        foreach (SeasonEvent which in SeasonEvents.All.Where(which => Array.Exists(cells.Dates, dates => dates.Of(which) is not null)))
        {
            string name = SeasonEvents.NameOf(which);
            variables.Add(new PackedVariable(
                name, $"date of {LongName(which)}", null,
                [new("calendar", "standard"), new("ancillary_variables", $"{name}_state {name}_spread")],
                since, Plane(dates => dates.Of(which)?.Day), WholeDays));
            variables.Add(new PackedVariable(
                $"{name}_spread", $"half of the days between the first and the last day that {LongName(which)} may have been (95 % limits)", null, [], "days",
                Plane(dates => dates.Of(which)?.SpreadDays), HalfDays));
            variables.Add(new FlagVariable($"{name}_state", $"whether there is a date of {LongName(which)}, and why not", "status_flag", [], StatePlane(which), States));
        }

        variables.Add(Days("inner_ice_free_days", "days of the inner ice-free period", dates => dates.Ice.InnerIceFreeDays(year, begins)));
        variables.Add(Days("outer_ice_free_days", "days of the outer ice-free period", dates => dates.Ice.OuterIceFreeDays(year, begins)));
        variables.Add(Days("open_water_days", "days of the year with less ice than the level of retreat", dates => dates.Ice.OpenWaterDays));
        variables.Add(Days("known_days", "days of the year with a value", dates => dates.Ice.KnownDays));
        GridFile.WriteSpan(path, grid, year.FirstDay, year.Length, variables, attributes);

        PackedVariable Days(string name, string longName, Func<YearDates, int?> daysOf) =>
            new(name, longName, null, [], "days", Plane(dates => daysOf(dates)), WholeDays);

        float[] Plane(Func<YearDates, double?> valueOf)
        {
            float[] plane = new float[grid.CellCount];
            Array.Fill(plane, float.NaN);
            for (int index = 0; index < cells.Cells.Count; index++)
            {
                plane[cells.Cells[index]] = (float)(valueOf(cells.Dates[index]) ?? double.NaN);
            }

            return plane;
        }

        byte[] StatePlane(SeasonEvent which)
        {
            byte[] plane = new byte[grid.CellCount];
            Array.Fill(plane, byte.MaxValue);
            for (int index = 0; index < cells.Cells.Count; index++)
            {
                plane[cells.Cells[index]] = cells.Dates[index].Of(which) is { } date ? (byte)date.State : byte.MaxValue;
            }

            return plane;
        }
    }

    private static string LongName(SeasonEvent which) => which switch
    {
        SeasonEvent.MeltOnset => "melt onset",
        SeasonEvent.FreezeUp => "freeze-up",
        _ => SeasonEvents.NameOf(which),
    };
}
