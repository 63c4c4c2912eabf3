using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>The cells around a cell, the nearest first.</summary>
internal sealed class NearbyCells
{
    private readonly int columns;
    private readonly int rows;
    private readonly (int Row, int Column, int DistanceSquared)[] offsets;

    /// <summary>Lists the neighbours of any cell.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="radiusMeters">How far away their centres may be on the map.</param>
    public NearbyCells(Grid grid, double radiusMeters)
    {
        (columns, rows) = (grid.Columns, grid.Rows);
        double radius = radiusMeters / grid.Frame.CellMeters;
        int reach = (int)radius;
        IEnumerable<int> steps = Enumerable.Range(-reach, (2 * reach) + 1);
        offsets = [.. steps
            .SelectMany(_ => steps, (row, column) => (Row: row, Column: column, DistanceSquared: (row * row) + (column * column)))
            .Where(offset => offset.DistanceSquared > 0 && offset.DistanceSquared <= radius * radius)
            .OrderBy(offset => offset.DistanceSquared)];
    }

    /// <summary>Adds the nearest cells that are wanted, and all that are as near as the last of them.</summary>
    /// <param name="cell">The cell in the middle.</param>
    /// <param name="wanted">Which cells count. Shape: one value a cell.</param>
    /// <param name="count">How many are enough.</param>
    /// <param name="found">Receives them.</param>
    /// <returns>How many were added.</returns>
    public int Nearest(int cell, bool[] wanted, int count, List<int> found)
    {
        (int row, int column) = (cell / columns, cell % columns);
        int added = 0;
        int farthest = int.MaxValue;
        foreach ((int down, int right, int distance) in offsets)
        {
            if (distance > farthest)
            {
                break;
            }

            if (row + down >= 0 && row + down < rows && column + right >= 0 && column + right < columns
                && wanted[cell + (down * columns) + right])
            {
                found.Add(cell + (down * columns) + right);
                farthest = ++added >= count ? distance : farthest;
            }
        }

        return added;
    }
}
