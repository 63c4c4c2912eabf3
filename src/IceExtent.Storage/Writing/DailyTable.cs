using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>The <c>daily</c> table: one row a day and region. Areas in km², shares from 0 to 1.</summary>
/// <remarks>Columns and metadata are documented in docs/DATA.md.</remarks>
public static class DailyTable
{
    private const string SquareKilometers = "km2";

    /// <summary>The columns, in the order they are written.</summary>
    public static IReadOnlyList<TableColumn<DailyRow>> Columns { get; } =
    [
        TableColumn.Date<DailyRow>("date", row => row.Date),
        TableColumn.Text<DailyRow>("region", row => row.Region),
        TableColumn.OptionalNumber<DailyRow>("extent_km2", SquareKilometers, row => row.ExtentSquareKilometers),
        TableColumn.OptionalNumber<DailyRow>("extent_se_km2", SquareKilometers, row => row.ExtentStandardErrorSquareKilometers),
        TableColumn.OptionalNumber<DailyRow>("area_km2", SquareKilometers, row => row.AreaSquareKilometers),
        TableColumn.OptionalNumber<DailyRow>("area_se_km2", SquareKilometers, row => row.AreaStandardErrorSquareKilometers),
        TableColumn.OptionalNumber<DailyRow>("marginal_zone_km2", SquareKilometers, row => row.MarginalZoneSquareKilometers),
        TableColumn.OptionalNumber<DailyRow>("pack_km2", SquareKilometers, row => row.PackSquareKilometers),
        TableColumn.Number<DailyRow>("ocean_km2", SquareKilometers, row => row.OceanSquareKilometers),
        TableColumn.Number<DailyRow>("observed_share", TableColumn.NoUnit, row => row.ObservedShare),
        TableColumn.Number<DailyRow>("filled_share", TableColumn.NoUnit, row => row.FilledShare),
        TableColumn.Number<DailyRow>("polar_gap_km2", SquareKilometers, row => row.PolarGapSquareKilometers),
        TableColumn.Text<DailyRow>("sensor", row => row.Sensor),
        TableColumn.Text<DailyRow>("status", row => DayStatuses.NameOf(row.Status)),
        TableColumn.Text<DailyRow>("tie_points", row => TiePointStates.NameOf(row.TiePoints)),
    ];

    /// <summary>Writes the rows in the order of date and region.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="rows">The rows in any order; no day and region twice.</param>
    /// <param name="metadata">Method, sources, program version, configuration digest, notice: in the order they are written.</param>
    /// <exception cref="ArgumentException">A day and region comes twice, or a number is not finite.</exception>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    public static void Write(
        string path, IEnumerable<DailyRow> rows, IReadOnlyList<KeyValuePair<string, string>> metadata) =>
        TableFile.Write(path, Columns, DatedRows.InOrder(rows, row => row.Date, row => row.Region), metadata);

    /// <summary>Loads what writing needs, so that the first table of a run does not wait a twentieth of a second for it.</summary>
    public static void Rehearse() => TableFile.Rehearse(
        Columns,
        [
            new DailyRow
            {
                Date = default,
                Region = string.Empty,
                ExtentSquareKilometers = 0.0,
                ExtentStandardErrorSquareKilometers = 0.0,
                AreaSquareKilometers = 0.0,
                AreaStandardErrorSquareKilometers = 0.0,
                MarginalZoneSquareKilometers = 0.0,
                PackSquareKilometers = 0.0,
                OceanSquareKilometers = 0.0,
                ObservedShare = 0.0,
                FilledShare = 0.0,
                PolarGapSquareKilometers = 0.0,
                Sensor = string.Empty,
                Status = DayStatus.Final,
            },
        ]);

    /// <summary>Reads a table back.</summary>
    /// <param name="path">A file that <see cref="Write"/> wrote.</param>
    /// <exception cref="FaultException">IE3120: it cannot be read. IE3121: a column is missing or has another type. IE3122: a value has no meaning.</exception>
    public static StoredDailyTable Read(string path)
    {
        StoredTable table = TableFile.Read(path);
        IReadOnlyList<DateOnly> date = table.Column<DateOnly>("date");
        IReadOnlyList<string> region = table.Column<string>("region");
        IReadOnlyList<double?> extent = table.Column<double?>("extent_km2");
        IReadOnlyList<double?> extentError = table.Column<double?>("extent_se_km2");
        IReadOnlyList<double?> area = table.Column<double?>("area_km2");
        IReadOnlyList<double?> areaError = table.Column<double?>("area_se_km2");
        IReadOnlyList<double?> marginalZone = table.Column<double?>("marginal_zone_km2");
        IReadOnlyList<double?> pack = table.Column<double?>("pack_km2");
        IReadOnlyList<double> ocean = table.Column<double>("ocean_km2");
        IReadOnlyList<double> observed = table.Column<double>("observed_share");
        IReadOnlyList<double> filled = table.Column<double>("filled_share");
        IReadOnlyList<double> polarGap = table.Column<double>("polar_gap_km2");
        IReadOnlyList<string> sensor = table.Column<string>("sensor");
        IReadOnlyList<string> status = table.Column<string>("status");
        IReadOnlyList<string> tiePoints = table.Column<string>("tie_points");

        DailyRow RowAt(int row) => new()
        {
            Date = date[row],
            Region = region[row],
            ExtentSquareKilometers = extent[row],
            ExtentStandardErrorSquareKilometers = extentError[row],
            AreaSquareKilometers = area[row],
            AreaStandardErrorSquareKilometers = areaError[row],
            MarginalZoneSquareKilometers = marginalZone[row],
            PackSquareKilometers = pack[row],
            OceanSquareKilometers = ocean[row],
            ObservedShare = observed[row],
            FilledShare = filled[row],
            PolarGapSquareKilometers = polarGap[row],
            Sensor = sensor[row],
            Status = DayStatuses.Of(path, status[row]),
            TiePoints = TiePointsOf(path, tiePoints[row]),
        };
        return new([.. Enumerable.Range(0, table.Rows).Select(RowAt)], table.Metadata);
    }

    private static TiePointState TiePointsOf(string path, string name) => TiePointStates.Parse(name) ?? throw new FaultException(new(
        "IE3122", path, $"the tie points {name}", string.Join(", ", Enum.GetValues<TiePointState>().Select(TiePointStates.NameOf)),
        "The file is from another program: move it away and run that year anew."));
}

/// <summary>A <c>daily</c> table as it was read.</summary>
/// <param name="Rows">In the order of date and region.</param>
/// <param name="Metadata">The key-value metadata, units included.</param>
public sealed record StoredDailyTable(IReadOnlyList<DailyRow> Rows, IReadOnlyDictionary<string, string> Metadata);
