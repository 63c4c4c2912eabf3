namespace IceExtent.Grids;

/// <summary>Whether a file is on a grid, and if not, why.</summary>
public abstract record GridMatch
{
    private GridMatch()
    {
    }

    // Nested on purpose: the private constructor closes the set, so a caller's switch over the two is complete.
#pragma warning disable CA1034
    /// <summary>The file is on the grid.</summary>
    /// <param name="FlipX">Its columns run from right to left and have to be turned round.</param>
    /// <param name="FlipY">Its rows run from bottom to top and have to be turned round.</param>
    public sealed record Same(bool FlipX, bool FlipY) : GridMatch;

    /// <summary>The file is on another grid.</summary>
    /// <param name="Differences">At least one phrase, each with what was found and what the grid has, with units.</param>
    public sealed record Different(IReadOnlyList<string> Differences) : GridMatch;
#pragma warning restore CA1034
}
