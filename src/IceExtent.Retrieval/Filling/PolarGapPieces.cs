namespace IceExtent.Retrieval;

/// <summary>The gap cells of a mask, in pieces that hang together by their sides.</summary>
internal sealed class PolarGapPieces
{
    private readonly int rows;
    private readonly int columns;
    private readonly int[] pieceOfCell;
    private readonly List<bool> hasRim = [];

    public PolarGapPieces(int rows, int columns, ReadOnlySpan<CellConditions> mask)
    {
        (this.rows, this.columns) = (rows, columns);
        pieceOfCell = new int[mask.Length];
        pieceOfCell.AsSpan().Fill(-1);
        for (int cell = 0; cell < mask.Length; cell++)
        {
            if (mask[cell] == CellConditions.PolarGap && pieceOfCell[cell] < 0)
            {
                hasRim.Add(Spread(cell, hasRim.Count, mask));
            }
        }
    }

    /// <summary>The number of pieces.</summary>
    public int Count => hasRim.Count;

    /// <summary>The piece of a gap cell.</summary>
    public int PieceOf(int cell) => pieceOfCell[cell];

    /// <summary>The gap cells of all pieces that touch ocean outside the gap, rising.</summary>
    public int[] CellsWithRim() => [.. Enumerable.Range(0, pieceOfCell.Length).Where(cell => pieceOfCell[cell] >= 0 && hasRim[pieceOfCell[cell]])];

    /// <summary>The cells at the four sides of a cell, those beyond the edge of the grid left out.</summary>
    public IEnumerable<int> NeighboursOf(int cell)
    {
        (int row, int column) = Math.DivRem(cell, columns);
        if (row > 0)
        {
            yield return cell - columns;
        }

        if (column > 0)
        {
            yield return cell - 1;
        }

        if (column < columns - 1)
        {
            yield return cell + 1;
        }

        if (row < rows - 1)
        {
            yield return cell + columns;
        }
    }

    // Gives every gap cell that hangs together with the first its piece; true where the piece touches open ocean.
    private bool Spread(int first, int piece, ReadOnlySpan<CellConditions> mask)
    {
        bool touches = false;
        Stack<int> todo = new([first]);
        pieceOfCell[first] = piece;
        while (todo.TryPop(out int cell))
        {
            foreach (int near in NeighboursOf(cell))
            {
                touches |= mask[near] == CellConditions.None;
                if (mask[near] == CellConditions.PolarGap && pieceOfCell[near] < 0)
                {
                    pieceOfCell[near] = piece;
                    todo.Push(near);
                }
            }
        }

        return touches;
    }
}
