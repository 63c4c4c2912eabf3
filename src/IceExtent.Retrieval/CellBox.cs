using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>A square of cells round a cell, cut at the rim of the grid. All four ends belong to it.</summary>
internal readonly record struct CellBox(int Top, int Bottom, int Left, int Right)
{
    /// <summary>The square that reaches some cells to each side.</summary>
    public static CellBox Around(Grid grid, int cell, int reach)
    {
        (int row, int column) = (cell / grid.Columns, cell % grid.Columns);
        return new(
            Math.Max(row - reach, 0), Math.Min(row + reach, grid.Rows - 1), Math.Max(column - reach, 0), Math.Min(column + reach, grid.Columns - 1));
    }
}
