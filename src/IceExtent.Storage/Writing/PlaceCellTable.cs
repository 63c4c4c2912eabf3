using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>The <c>place_cells</c> table: one row a place and ocean cell in its reach. Also the memory from which a run takes its places.</summary>
/// <remarks>Columns and metadata are documented in docs/DATA.md.</remarks>
public static class PlaceCellTable
{
    /// <summary>The metadata key of the digest of all that decides the cells.</summary>
    public const string DigestKey = "places_digest";

    private const double SquareMetersPerSquareKilometer = 1e6;

    /// <summary>Writes the places in the order of their names, each with its cells in the order of the grid.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="grid">The grid the cells are of.</param>
    /// <param name="places">The places; no name twice.</param>
    /// <param name="digest">The digest of all that decides the cells.</param>
    /// <param name="metadata">Further metadata, in the order it is written.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    public static void Write(
        string path, Grid grid, IEnumerable<GridPlace> places, string digest, IReadOnlyList<KeyValuePair<string, string>> metadata)
    {
        ArgumentNullException.ThrowIfNull(grid);
        TableColumn<Row>[] columns =
        [
            TableColumn.Text<Row>("place", row => row.Place.Name),
            TableColumn.Text<Row>("title", row => row.Place.Title),
            TableColumn.Whole<Row>("row", TableColumn.NoUnit, row => row.Cell / grid.Columns),
            TableColumn.Whole<Row>("column", TableColumn.NoUnit, row => row.Cell % grid.Columns),
            TableColumn.Number<Row>("distance_km", "km", row => row.DistanceKilometers),
            TableColumn.Number<Row>("area_km2", "km2", row => grid.CellAreasSquareMeters[row.Cell] / SquareMetersPerSquareKilometer),
        ];
        Row[] rows = [.. places
            .OrderBy(place => place.Name, StringComparer.Ordinal)
            .SelectMany(place => place.Cells.Select((cell, index) => new Row(place, cell, place.DistancesKilometers[index])))];
        TableFile.Write(path, columns, rows, [new(DigestKey, digest), .. metadata]);
    }

    /// <summary>Reads the places back, if they are those of a digest.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid of that digest.</param>
    /// <param name="digest">The digest wanted.</param>
    /// <returns>The places in the order of their names, or null where the file is missing, damaged or of another digest.</returns>
    public static IReadOnlyList<GridPlace>? Read(string path, Grid grid, string digest)
    {
        ArgumentNullException.ThrowIfNull(grid);
        return CellTable.Read<IReadOnlyList<GridPlace>>(path, DigestKey, digest, table =>
        {
            IReadOnlyList<string> name = table.Column<string>("place");
            IReadOnlyList<string> title = table.Column<string>("title");
            IReadOnlyList<int> row = table.Column<int>("row");
            IReadOnlyList<int> column = table.Column<int>("column");
            IReadOnlyList<double> distance = table.Column<double>("distance_km");
            return [.. CellTable.Groups(name).Select(group => new GridPlace(
                name[group.First],
                title[group.First],
                [.. Enumerable.Range(group.First, group.End - group.First).Select(at => (row[at] * grid.Columns) + column[at])],
                [.. Enumerable.Range(group.First, group.End - group.First).Select(at => distance[at])]))];
        });
    }

    private readonly record struct Row(GridPlace Place, int Cell, double DistanceKilometers);
}
