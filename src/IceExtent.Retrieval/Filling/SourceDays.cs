namespace IceExtent.Retrieval;

/// <summary>How far away the days lie that a cell was filled from. Reused from day to day.</summary>
/// <remarks>Unit: days, 1 or more. Shape: one value a cell, row-major. Missing: NaN, where no day of that side gave.</remarks>
public sealed class SourceDays
{
    private readonly float[] before;
    private readonly float[] after;

    /// <summary>Makes room for one grid; no cell was filled yet.</summary>
    /// <param name="cellCount">The number of cells, 1 or more.</param>
    public SourceDays(int cellCount)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(cellCount, 1);
        (before, after) = (new float[cellCount], new float[cellCount]);
        Clear();
    }

    /// <summary>The number of cells.</summary>
    public int CellCount => before.Length;

    /// <summary>Days back to the earlier of the two days.</summary>
    public ReadOnlyMemory<float> Before => before;

    /// <summary>Days ahead to the later of the two days.</summary>
    public ReadOnlyMemory<float> After => after;

    internal void Clear()
    {
        before.AsSpan().Fill(float.NaN);
        after.AsSpan().Fill(float.NaN);
    }

    internal void Put(int cell, int daysBefore, int daysAfter)
    {
        before[cell] = daysBefore > 0 ? daysBefore : float.NaN;
        after[cell] = daysAfter > 0 ? daysAfter : float.NaN;
    }
}
