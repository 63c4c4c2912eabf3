using IceExtent.Grids;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>The lengths of a variable's axes and which of them are the grid's rows, its columns and time.</summary>
/// <param name="Lengths">The length of every axis, in the order they are stored.</param>
/// <param name="Row">The axis of the rows.</param>
/// <param name="Column">The axis of the columns.</param>
/// <param name="Time">The axis of time, or null.</param>
/// <param name="Steps">How many days the variable has; 1 where it has no axis of time.</param>
internal sealed record PlaneShape(ulong[] Lengths, int Row, int Column, int? Time, int Steps)
{
    /// <summary>Whether a step was ever written: a variable may be shorter than its growing axis of time, and is then missing there.</summary>
    public bool IsWritten(int step) => Time is not { } axis || (ulong)step < Lengths[axis];

    /// <summary>Where a step of time starts in the variable.</summary>
    public ulong[] StartOf(int step)
    {
        ulong[] start = new ulong[Lengths.Length];
        if (Time is { } axis)
        {
            start[axis] = (ulong)step;
        }

        return start;
    }

    /// <summary>How far one step of time reaches along every axis.</summary>
    public ulong[] BlockOfStep()
    {
        ulong[] block = OneCell();
        (block[Row], block[Column]) = (Lengths[Row], Lengths[Column]);
        return block;
    }

    /// <summary>How far a single number reaches along every axis.</summary>
    public ulong[] OneCell()
    {
        ulong[] block = new ulong[Lengths.Length];
        Array.Fill(block, 1UL);
        return block;
    }

    /// <summary>Whether a block of this shape, laid at the start of the variable, holds all rows and columns.</summary>
    public bool IsHeldBy(ulong[] block) => block[Row] >= Lengths[Row] && block[Column] >= Lengths[Column];

    /// <summary>Where the grid's cells stand inside a block that holds one step of time.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="block">The block's length along every axis.</param>
    /// <param name="start">Where the step starts in the variable, in whole blocks or inside one.</param>
    public CellOrder OrderIn(Grid grid, ulong[] block, ulong[] start)
    {
        int[] strides = new int[block.Length];
        int stride = 1;
        int first = 0;
        for (int axis = block.Length - 1; axis >= 0; axis--)
        {
            strides[axis] = stride;
            first += (int)(start[axis] % block[axis]) * stride;
            stride = checked(stride * (int)block[axis]);
        }

        return new(grid.Rows, grid.Columns, first, strides[Row], strides[Column]);
    }
}
