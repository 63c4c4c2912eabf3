using System.Runtime.CompilerServices;
using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>How far each cell of a grid lies from the nearest cell of a set.</summary>
/// <remarks>
/// Two sweeps over the plane with steps of 3 to a side and 4 to a corner. Source: [Borgefors1986]. Accuracy: within 8 % of the
/// straight line between cell centres (see <c>ChamferDistanceTests</c>); the map's scale is taken as true.
/// </remarks>
public sealed class ChamferDistance
{
    /// <summary>The length of a step to a neighbour at a side; distances count in thirds of a cell.</summary>
    public const int StepsPerCell = 3;

    private const int CornerSteps = 4;
    private const int Far = int.MaxValue / 2;

    private readonly int rows;
    private readonly int columns;
    private readonly int stride;
    private readonly int[] padded;

    /// <summary>Makes room for a grid.</summary>
    public ChamferDistance(Grid grid)
    {
        ArgumentNullException.ThrowIfNull(grid);
        (rows, columns) = (grid.Rows, grid.Columns);
        stride = columns + 2; // A rim of far cells saves every test for the ends.
        padded = new int[(rows + 2) * stride];
    }

    /// <summary>Measures.</summary>
    /// <param name="members">Whether a cell belongs to the set. Shape: one value a cell, row-major.</param>
    /// <param name="steps">Receives the distance in steps: 0 in the set; a very large number everywhere where the set is empty.</param>
    /// <exception cref="ArgumentException">A plane does not fit the grid.</exception>
    public void Measure(ReadOnlySpan<bool> members, Span<int> steps)
    {
        if (members.Length != rows * columns || steps.Length != rows * columns)
        {
            throw new ArgumentException($"The planes have {members.Length} and {steps.Length} cells; the grid has {rows * columns}.", nameof(members));
        }

        padded.AsSpan().Fill(Far);
        for (int row = 0; row < rows; row++)
        {
            Sweep(members.Slice(row * columns, columns), (row + 1) * stride);
        }

        for (int row = rows - 1; row >= 0; row--)
        {
            SweepBack((row + 1) * stride);
            padded.AsSpan(((row + 1) * stride) + 1, columns).CopyTo(steps[(row * columns)..]);
        }
    }

    // From the row above and the left.
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private void Sweep(ReadOnlySpan<bool> members, int start)
    {
        Span<int> above = padded.AsSpan(start - stride, stride);
        Span<int> here = padded.AsSpan(start, stride);
        for (int column = 1; column <= columns; column++)
        {
            int side = Math.Min(above[column], here[column - 1]) + StepsPerCell;
            int corner = Math.Min(above[column - 1], above[column + 1]) + CornerSteps;
            here[column] = members[column - 1] ? 0 : Math.Min(Math.Min(side, corner), Far);
        }
    }

    // From the row below and the right.
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private void SweepBack(int start)
    {
        Span<int> here = padded.AsSpan(start, stride);
        Span<int> below = padded.AsSpan(start + stride, stride);
        for (int column = columns; column >= 1; column--)
        {
            int side = Math.Min(below[column], here[column + 1]) + StepsPerCell;
            int corner = Math.Min(below[column - 1], below[column + 1]) + CornerSteps;
            here[column] = Math.Min(here[column], Math.Min(side, corner));
        }
    }
}
