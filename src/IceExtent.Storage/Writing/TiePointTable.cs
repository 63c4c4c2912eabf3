using IceExtent.Retrieval;

namespace IceExtent.Storage.Writing;

/// <summary>One tie point in use on one day.</summary>
/// <param name="Date">The day, UTC.</param>
/// <param name="Sensor">The sensor.</param>
/// <param name="State">Where the day's tie points come from, by name.</param>
/// <param name="Surface">The pure surface, by name.</param>
/// <param name="Channel">The channel, by name.</param>
/// <param name="Kelvins">The tie point, in K.</param>
/// <param name="StandardErrorKelvins">Its standard error, in K, or null for a fixed one.</param>
/// <param name="ScatterKelvins">The standard deviation of samples, in K, or null for a fixed one.</param>
/// <param name="Samples">Samples in the window.</param>
/// <param name="Days">Days of the window with samples.</param>
public sealed record TiePointRow(
    DateOnly Date,
    string Sensor,
    string State,
    string Surface,
    string Channel,
    double Kelvins,
    double? StandardErrorKelvins,
    double? ScatterKelvins,
    int Samples,
    int Days)
{
    /// <summary>The rows of one day.</summary>
    public static IEnumerable<TiePointRow> Of(DateOnly date, string sensor, TunedDay tuned)
    {
        ArgumentNullException.ThrowIfNull(tuned);
        return tuned.Estimates.Select(estimate => new TiePointRow(
            date,
            sensor,
            TiePointStates.NameOf(tuned.State),
            TiePointStates.NameOf(estimate.Surface),
            ChannelNames.NameOf(estimate.Channel),
            estimate.Kelvins,
            estimate.StandardErrorKelvins,
            estimate.ScatterKelvins,
            checked((int)estimate.Samples),
            estimate.Days));
    }
}

/// <summary>The <c>tie_points</c> table: one row a day, surface and channel.</summary>
/// <remarks>Columns are documented in docs/DATA.md.</remarks>
public static class TiePointTable
{
    private const string Kelvin = "K";

    /// <summary>The columns, in the order they are written.</summary>
    public static IReadOnlyList<TableColumn<TiePointRow>> Columns { get; } =
    [
        TableColumn.Date<TiePointRow>("date", row => row.Date),
        TableColumn.Text<TiePointRow>("sensor", row => row.Sensor),
        TableColumn.Text<TiePointRow>("state", row => row.State),
        TableColumn.Text<TiePointRow>("surface", row => row.Surface),
        TableColumn.Text<TiePointRow>("channel", row => row.Channel),
        TableColumn.Number<TiePointRow>("tie_point_k", Kelvin, row => row.Kelvins),
        TableColumn.OptionalNumber<TiePointRow>("tie_point_se_k", Kelvin, row => row.StandardErrorKelvins),
        TableColumn.OptionalNumber<TiePointRow>("scatter_k", Kelvin, row => row.ScatterKelvins),
        TableColumn.Whole<TiePointRow>("samples", TableColumn.NoUnit, row => row.Samples),
        TableColumn.Whole<TiePointRow>("days", TableColumn.NoUnit, row => row.Days),
    ];

    /// <summary>Writes the rows in the order of their days, keeping the order inside a day.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="rows">The rows.</param>
    /// <param name="metadata">Key-value metadata, in the order it is written.</param>
    /// <exception cref="Faults.FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    public static void Write(string path, IEnumerable<TiePointRow> rows, IReadOnlyList<KeyValuePair<string, string>> metadata) =>
        TableFile.Write(path, Columns, [.. rows.OrderBy(row => row.Date)], metadata);

    /// <summary>Reads a table back.</summary>
    /// <param name="path">A file that <see cref="Write"/> wrote.</param>
    /// <exception cref="Faults.FaultException">IE3120: it cannot be read. IE3121: a column is missing or has another type.</exception>
    public static IReadOnlyList<TiePointRow> Read(string path)
    {
        StoredTable table = TableFile.Read(path);
        IReadOnlyList<DateOnly> date = table.Column<DateOnly>("date");
        IReadOnlyList<string> sensor = table.Column<string>("sensor");
        IReadOnlyList<string> state = table.Column<string>("state");
        IReadOnlyList<string> surface = table.Column<string>("surface");
        IReadOnlyList<string> channel = table.Column<string>("channel");
        IReadOnlyList<double> kelvins = table.Column<double>("tie_point_k");
        IReadOnlyList<double?> error = table.Column<double?>("tie_point_se_k");
        IReadOnlyList<double?> scatter = table.Column<double?>("scatter_k");
        IReadOnlyList<int> samples = table.Column<int>("samples");
        IReadOnlyList<int> days = table.Column<int>("days");
        return [.. Enumerable.Range(0, table.Rows).Select(row => new TiePointRow(
            date[row], sensor[row], state[row], surface[row], channel[row], kelvins[row], error[row], scatter[row], samples[row], days[row]))];
    }
}
