namespace IceExtent.Statistics.Overlaps;

/// <summary>Sums over squares of cells, each at the cost of four look-ups whatever its size. Reused; not shared between threads.</summary>
internal sealed class BoxSums(int columns, int rows)
{
    private readonly double[] table = new double[(columns + 1) * (rows + 1)];

    /// <summary>Takes a plane.</summary>
    /// <param name="values">One finite value a cell, row-major.</param>
    public void Fill(ReadOnlySpan<float> values)
    {
        for (int row = 0; row < rows; row++)
        {
            double inRow = 0.0;
            int above = row * (columns + 1);
            for (int column = 0; column < columns; column++)
            {
                inRow += values[(row * columns) + column];
                table[above + columns + 2 + column] = table[above + column + 1] + inRow;
            }
        }
    }

    /// <summary>The sum over the square that reaches some cells to each side, cut at the rim of the grid.</summary>
    public double Around(int cell, int reach)
    {
        (int row, int column) = (cell / columns, cell % columns);
        int top = Math.Max(row - reach, 0) * (columns + 1);
        int bottom = Math.Min(row + reach + 1, rows) * (columns + 1);
        int left = Math.Max(column - reach, 0);
        int right = Math.Min(column + reach + 1, columns);
        return table[bottom + right] - table[top + right] - table[bottom + left] + table[top + left];
    }
}
