namespace IceExtent.Retrieval;

/// <summary>A run of neighbouring cells of a plane: what one pass of the kernels handles while it is in the cache.</summary>
/// <param name="Start">The first cell's index.</param>
/// <param name="Length">The number of cells.</param>
public readonly record struct CellRange(int Start, int Length)
{
    /// <summary>The range's part of a plane.</summary>
    public Span<T> Of<T>(Span<T> plane) => plane.Slice(Start, Length);

    /// <summary>The range's part of a plane that is only read.</summary>
    public ReadOnlySpan<T> Of<T>(ReadOnlySpan<T> plane) => plane.Slice(Start, Length);
}
