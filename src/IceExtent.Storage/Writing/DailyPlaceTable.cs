using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>The <c>daily_places</c> table: one row a day and place. Concentrations and shares from 0 to 1.</summary>
/// <remarks>Columns and metadata are documented in docs/DATA.md.</remarks>
public static class DailyPlaceTable
{
    private const string Kilometers = "km";

    /// <summary>The columns, in the order they are written.</summary>
    public static IReadOnlyList<TableColumn<DailyPlaceRow>> Columns { get; } =
    [
        TableColumn.Date<DailyPlaceRow>("date", row => row.Date),
        TableColumn.Text<DailyPlaceRow>("place", row => row.Place),
        TableColumn.OptionalNumber<DailyPlaceRow>("concentration", TableColumn.NoUnit, row => row.ConcentrationFraction),
        TableColumn.OptionalNumber<DailyPlaceRow>("concentration_se", TableColumn.NoUnit, row => row.ConcentrationStandardErrorFraction),
        TableColumn.Number<DailyPlaceRow>("observed_share", TableColumn.NoUnit, row => row.ObservedShare),
        TableColumn.Number<DailyPlaceRow>("filled_share", TableColumn.NoUnit, row => row.FilledShare),
        TableColumn.Whole<DailyPlaceRow>("cells", TableColumn.NoUnit, row => row.Cells),
        TableColumn.Number<DailyPlaceRow>("nearest_km", Kilometers, row => row.NearestKilometers),
        TableColumn.Number<DailyPlaceRow>("farthest_km", Kilometers, row => row.FarthestKilometers),
        TableColumn.Text<DailyPlaceRow>("sensor", row => row.Sensor),
        TableColumn.Text<DailyPlaceRow>("status", row => DayStatuses.NameOf(row.Status)),
    ];

    /// <summary>Writes the rows in the order of date and place.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="rows">The rows in any order; no day and place twice.</param>
    /// <param name="metadata">As of the <c>daily</c> table, in the order they are written.</param>
    /// <exception cref="ArgumentException">A day and place comes twice, or a number is not finite.</exception>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    public static void Write(string path, IEnumerable<DailyPlaceRow> rows, IReadOnlyList<KeyValuePair<string, string>> metadata) =>
        TableFile.Write(path, Columns, DatedRows.InOrder(rows, row => row.Date, row => row.Place), metadata);

    /// <summary>Reads a table back.</summary>
    /// <param name="path">A file that <see cref="Write"/> wrote.</param>
    /// <exception cref="FaultException">IE3120: it cannot be read. IE3121: a column is missing or has another type. IE3122: a value has no meaning.</exception>
    public static StoredDailyPlaceTable Read(string path)
    {
        StoredTable table = TableFile.Read(path);
        IReadOnlyList<DateOnly> date = table.Column<DateOnly>("date");
        IReadOnlyList<string> place = table.Column<string>("place");
        IReadOnlyList<double?> concentration = table.Column<double?>("concentration");
        IReadOnlyList<double?> error = table.Column<double?>("concentration_se");
        IReadOnlyList<double> observed = table.Column<double>("observed_share");
        IReadOnlyList<double> filled = table.Column<double>("filled_share");
        IReadOnlyList<int> cells = table.Column<int>("cells");
        IReadOnlyList<double> nearest = table.Column<double>("nearest_km");
        IReadOnlyList<double> farthest = table.Column<double>("farthest_km");
        IReadOnlyList<string> sensor = table.Column<string>("sensor");
        IReadOnlyList<string> status = table.Column<string>("status");

        DailyPlaceRow RowAt(int row) => new()
        {
            Date = date[row],
            Place = place[row],
            ConcentrationFraction = concentration[row],
            ConcentrationStandardErrorFraction = error[row],
            ObservedShare = observed[row],
            FilledShare = filled[row],
            Cells = cells[row],
            NearestKilometers = nearest[row],
            FarthestKilometers = farthest[row],
            Sensor = sensor[row],
            Status = DayStatuses.Of(path, status[row]),
        };
        return new([.. Enumerable.Range(0, table.Rows).Select(RowAt)], table.Metadata);
    }
}

/// <summary>A <c>daily_places</c> table as it was read.</summary>
/// <param name="Rows">In the order of date and place.</param>
/// <param name="Metadata">The key-value metadata, units included.</param>
public sealed record StoredDailyPlaceTable(IReadOnlyList<DailyPlaceRow> Rows, IReadOnlyDictionary<string, string> Metadata);
