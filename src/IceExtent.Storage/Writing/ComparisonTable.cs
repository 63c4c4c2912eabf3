using IceExtent.Statistics;

namespace IceExtent.Storage.Writing;

/// <summary>The <c>comparison</c> table: one row a day, region and method.</summary>
/// <remarks>Columns are documented in docs/DATA.md.</remarks>
public static class ComparisonTable
{
    private const string SquareKilometers = "km2";

    /// <summary>The columns, in the order they are written.</summary>
    public static IReadOnlyList<TableColumn<MethodComparisonRow>> Columns { get; } =
    [
        TableColumn.Date<MethodComparisonRow>("date", row => row.Date),
        TableColumn.Text<MethodComparisonRow>("region", row => row.Region),
        TableColumn.Text<MethodComparisonRow>("method", row => row.Method),
        TableColumn.OptionalNumber<MethodComparisonRow>("extent_km2", SquareKilometers, row => row.ExtentSquareKilometers),
        TableColumn.OptionalNumber<MethodComparisonRow>("area_km2", SquareKilometers, row => row.AreaSquareKilometers),
        TableColumn.OptionalNumber<MethodComparisonRow>("extent_difference_km2", SquareKilometers, row => row.ExtentDifferenceSquareKilometers),
        TableColumn.OptionalNumber<MethodComparisonRow>("area_difference_km2", SquareKilometers, row => row.AreaDifferenceSquareKilometers),
        TableColumn.OptionalNumber<MethodComparisonRow>("mean_difference", TableColumn.NoUnit, row => row.MeanDifferenceFraction),
        TableColumn.OptionalNumber<MethodComparisonRow>("rms_difference", TableColumn.NoUnit, row => row.RootMeanSquareDifferenceFraction),
    ];

    /// <summary>Writes the rows in their order.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="rows">In the order of date, region and method.</param>
    /// <param name="metadata">Key-value metadata, in the order it is written.</param>
    public static void Write(string path, IReadOnlyList<MethodComparisonRow> rows, IReadOnlyList<KeyValuePair<string, string>> metadata) =>
        TableFile.Write(path, Columns, rows, metadata);
}
