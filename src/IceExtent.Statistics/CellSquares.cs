namespace IceExtent.Statistics;

/// <summary>A grid cut into squares of cells, those at its right and lower edge smaller. Safe to share.</summary>
internal sealed class CellSquares
{
    private readonly int[] ofCell;

    /// <summary>Cuts a grid.</summary>
    public CellSquares(int columns, int rows, int side)
    {
        Side = side;
        int squareColumns = ((columns - 1) / side) + 1;
        Count = squareColumns * (((rows - 1) / side) + 1);
        ofCell = new int[columns * rows];
        for (int cell = 0; cell < ofCell.Length; cell++)
        {
            ofCell[cell] = (cell / columns / side * squareColumns) + (cell % columns / side); // Once: a day would divide four times a cell.
        }
    }

    /// <summary>The side of a square, in cells.</summary>
    public int Side { get; }

    /// <summary>The number of squares.</summary>
    public int Count { get; }

    /// <summary>The square of each cell.</summary>
    public ReadOnlySpan<int> OfCell => ofCell;
}
