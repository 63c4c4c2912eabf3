using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>The <c>region_cells</c> table: one row a region and ocean cell. Also the memory from which a run takes its regions.</summary>
/// <remarks>Columns and metadata are documented in docs/DATA.md.</remarks>
public static class RegionCellTable
{
    /// <summary>The metadata key of the digest of all that decides the cells.</summary>
    public const string DigestKey = "regions_digest";

    private const double SquareMetersPerSquareKilometer = 1e6;

    /// <summary>Writes the regions in the order of their names, each with its cells in the order of the grid.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="grid">The grid the regions were laid over.</param>
    /// <param name="regions">The regions; no name twice.</param>
    /// <param name="digest">The digest of all that decides the cells.</param>
    /// <param name="metadata">Further metadata, in the order it is written.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    public static void Write(
        string path, Grid grid, IEnumerable<GridRegion> regions, string digest, IReadOnlyList<KeyValuePair<string, string>> metadata)
    {
        ArgumentNullException.ThrowIfNull(grid);
        TableColumn<Row>[] columns =
        [
            TableColumn.Text<Row>("region", row => row.Region.Name),
            TableColumn.Text<Row>("title", row => row.Region.Title),
            TableColumn.Text<Row>("region_set", row => row.Region.Set),
            TableColumn.Whole<Row>("row", TableColumn.NoUnit, row => row.Cell / grid.Columns),
            TableColumn.Whole<Row>("column", TableColumn.NoUnit, row => row.Cell % grid.Columns),
            TableColumn.Number<Row>("share", TableColumn.NoUnit, row => row.Share),
            TableColumn.Number<Row>("area_km2", "km2", row => grid.CellAreasSquareMeters[row.Cell] * row.Share / SquareMetersPerSquareKilometer),
        ];
        Row[] rows = [.. regions
            .OrderBy(region => region.Name, StringComparer.Ordinal)
            .SelectMany(region => region.Cells.Select((cell, index) => new Row(region, cell, region.Shares[index])))];
        TableFile.Write(path, columns, rows, [new(DigestKey, digest), .. metadata]);
    }

    /// <summary>Reads the regions back, if they are those of a digest.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid of that digest.</param>
    /// <param name="digest">The digest wanted.</param>
    /// <returns>The regions in the order of their names, or null where the file is missing, damaged or of another digest.</returns>
    public static IReadOnlyList<GridRegion>? Read(string path, Grid grid, string digest)
    {
        ArgumentNullException.ThrowIfNull(grid);
        return CellTable.Read<IReadOnlyList<GridRegion>>(path, DigestKey, digest, table =>
        {
            IReadOnlyList<string> name = table.Column<string>("region");
            IReadOnlyList<string> title = table.Column<string>("title");
            IReadOnlyList<string> set = table.Column<string>("region_set");
            IReadOnlyList<int> row = table.Column<int>("row");
            IReadOnlyList<int> column = table.Column<int>("column");
            IReadOnlyList<double> share = table.Column<double>("share");
            return [.. CellTable.Groups(name).Select(group => new GridRegion(
                name[group.First],
                title[group.First],
                set[group.First],
                [.. Enumerable.Range(group.First, group.End - group.First).Select(at => (row[at] * grid.Columns) + column[at])],
                [.. Enumerable.Range(group.First, group.End - group.First).Select(at => share[at])]))];
        });
    }

    private readonly record struct Row(GridRegion Region, int Cell, double Share);
}
