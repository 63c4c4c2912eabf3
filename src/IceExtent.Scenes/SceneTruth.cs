namespace IceExtent.Scenes;

/// <summary>The true ice of one day. Reused from day to day.</summary>
/// <remarks>
/// Unit: 1, shares of the sea part of the cell. Range: 0 to 1. Shape: one value a cell, row-major. Missing: NaN where
/// the cell is all land. Concentration is the sum of the other two.
/// </remarks>
/// <param name="cellCount">The number of cells of the grid.</param>
public sealed class SceneTruth(int cellCount)
{
    /// <summary>Ice of any kind.</summary>
    public float[] Concentration { get; } = new float[cellCount];

    /// <summary>First-year ice (type A in the south).</summary>
    public float[] FirstYear { get; } = new float[cellCount];

    /// <summary>Multiyear ice (type B in the south).</summary>
    public float[] Multiyear { get; } = new float[cellCount];
}
