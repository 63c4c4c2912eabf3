using IceExtent.Grids;

namespace IceExtent.Storage.Reading;

/// <summary>Where the cells of a grid stand among stored numbers.</summary>
/// <param name="Rows">Rows of the grid.</param>
/// <param name="Columns">Columns of the grid.</param>
/// <param name="First">The index of the number of the top left cell.</param>
/// <param name="RowStride">The step to the cell below; negative where the bottom row is stored first.</param>
/// <param name="ColumnStride">The step to the cell on the right; 1 in most files.</param>
internal readonly record struct CellOrder(int Rows, int Columns, int First, int RowStride, int ColumnStride)
{
    /// <summary>The common order: top row first, left to right.</summary>
    public static CellOrder TopDown(Grid grid) => new(grid.Rows, grid.Columns, 0, grid.Columns, 1);

    /// <summary>Bottom row first, left to right.</summary>
    public static CellOrder BottomUp(Grid grid) => TopDown(grid).Turned(rows: true, columns: false);

    /// <summary>The same numbers with the axes turned round.</summary>
    public CellOrder Turned(bool rows, bool columns)
    {
        CellOrder turned = this;
        if (rows)
        {
            turned = turned with { First = turned.First + ((Rows - 1) * turned.RowStride), RowStride = -turned.RowStride };
        }

        if (columns)
        {
            turned = turned with { First = turned.First + ((Columns - 1) * turned.ColumnStride), ColumnStride = -turned.ColumnStride };
        }

        return turned;
    }
}
