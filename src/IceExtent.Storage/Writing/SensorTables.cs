using IceExtent.Statistics.Overlaps;

namespace IceExtent.Storage.Writing;

/// <summary>The tables of <c>compare --sensors</c>: <c>sensor_differences</c> and <c>offsets</c>.</summary>
/// <remarks>Columns are documented in docs/DATA.md.</remarks>
public static class SensorTables
{
    private const string SquareKilometers = "km2";
    private const string Kelvins = "K";
    private const string Days = "days";

    /// <summary>The columns of <c>sensor_differences</c>, in the order they are written.</summary>
    public static IReadOnlyList<TableColumn<SensorDifferenceRow>> DifferenceColumns { get; } =
    [
        TableColumn.Whole<SensorDifferenceRow>("earlier_source", TableColumn.NoUnit, row => row.Pair.Earlier),
        TableColumn.Text<SensorDifferenceRow>("earlier_sensor", row => row.Pair.EarlierSensor),
        TableColumn.Whole<SensorDifferenceRow>("later_source", TableColumn.NoUnit, row => row.Pair.Later),
        TableColumn.Text<SensorDifferenceRow>("later_sensor", row => row.Pair.LaterSensor),
        TableColumn.Text<SensorDifferenceRow>("method", row => row.Method),
        TableColumn.Text<SensorDifferenceRow>("region", row => row.Region),
        TableColumn.Text<SensorDifferenceRow>("quantity", row => row.Quantity),
        TableColumn.Text<SensorDifferenceRow>("cells", row => row.Cells),
        TableColumn.OptionalWhole<SensorDifferenceRow>("month", TableColumn.NoUnit, row => row.Month),
        TableColumn.Date<SensorDifferenceRow>("first_day", row => row.FirstDay),
        TableColumn.Date<SensorDifferenceRow>("last_day", row => row.LastDay),
        TableColumn.Whole<SensorDifferenceRow>("days", Days, row => row.Difference.Days),
        TableColumn.Number<SensorDifferenceRow>("mean_difference_km2", SquareKilometers, row => row.Difference.Mean),
        TableColumn.OptionalNumber<SensorDifferenceRow>("standard_deviation_km2", SquareKilometers, row => row.Difference.StandardDeviation),
        TableColumn.OptionalNumber<SensorDifferenceRow>("lag1_correlation", TableColumn.NoUnit, row => row.Difference.Lag1Correlation),
        TableColumn.OptionalNumber<SensorDifferenceRow>("effective_days", Days, row => row.Difference.EffectiveDays),
        TableColumn.OptionalNumber<SensorDifferenceRow>("mean_se_km2", SquareKilometers, row => row.Difference.StandardError),
        TableColumn.OptionalNumber<SensorDifferenceRow>("lower_95_km2", SquareKilometers, row => row.Difference.Lower95),
        TableColumn.OptionalNumber<SensorDifferenceRow>("upper_95_km2", SquareKilometers, row => row.Difference.Upper95),
        TableColumn.Text<SensorDifferenceRow>("limits", row => NameOf(row.Difference.Limits)),
    ];

    /// <summary>The columns of <c>offsets</c>, in the order they are written.</summary>
    public static IReadOnlyList<TableColumn<ChannelOffset>> OffsetColumns { get; } =
    [
        TableColumn.Whole<ChannelOffset>("earlier_source", TableColumn.NoUnit, row => row.Pair.Earlier),
        TableColumn.Text<ChannelOffset>("earlier_sensor", row => row.Pair.EarlierSensor),
        TableColumn.Whole<ChannelOffset>("later_source", TableColumn.NoUnit, row => row.Pair.Later),
        TableColumn.Text<ChannelOffset>("later_sensor", row => row.Pair.LaterSensor),
        TableColumn.Text<ChannelOffset>("channel", row => row.Channel),
        TableColumn.Text<ChannelOffset>("surface", row => row.Surface),
        TableColumn.Number<ChannelOffset>("offset_k", Kelvins, row => row.OffsetKelvins),
        TableColumn.OptionalNumber<ChannelOffset>("offset_se_k", Kelvins, row => row.StandardErrorKelvins),
        TableColumn.Whole<ChannelOffset>("days", Days, row => row.Days),
        TableColumn.OptionalNumber<ChannelOffset>("effective_days", Days, row => row.EffectiveDays),
        TableColumn.Number<ChannelOffset>("cells_per_day", TableColumn.NoUnit, row => row.CellsPerDay),
        TableColumn.Text<ChannelOffset>("limits", row => NameOf(row.Limits)),
    ];

    /// <summary>Whether a mean has limits, in the words of the tables.</summary>
    public static string NameOf(MeanLimits limits) => limits switch
    {
        MeanLimits.Given => "given",
        MeanLimits.OneDay => "none: one day",
        MeanLimits.FewDays => "none: two or three days",
        _ => "none: two effective days or fewer",
    };

    /// <summary>Writes <c>sensor_differences</c>.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="rows">The rows in their order.</param>
    /// <param name="metadata">Key-value metadata, in the order it is written.</param>
    public static void WriteDifferences(string path, IReadOnlyList<SensorDifferenceRow> rows, IReadOnlyList<KeyValuePair<string, string>> metadata) =>
        TableFile.Write(path, DifferenceColumns, rows, metadata);

    /// <summary>Writes <c>offsets</c>.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="rows">The rows in their order.</param>
    /// <param name="metadata">Key-value metadata, in the order it is written.</param>
    public static void WriteOffsets(string path, IReadOnlyList<ChannelOffset> rows, IReadOnlyList<KeyValuePair<string, string>> metadata) =>
        TableFile.Write(path, OffsetColumns, rows, metadata);
}
