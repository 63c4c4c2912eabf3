namespace IceExtent.Grids;

/// <summary>How much of every cell is land. An instance is always valid.</summary>
public sealed class LandShare
{
    private readonly float[] fraction;

    /// <summary>Takes the shares of one grid.</summary>
    /// <param name="fraction">One share a cell, 0 (sea) to 1 (land), row-major; none missing.</param>
    /// <exception cref="ArgumentException">A share is missing or outside 0 to 1.</exception>
    public LandShare(float[] fraction)
    {
        ArgumentNullException.ThrowIfNull(fraction);
        int fault = Array.FindIndex(fraction, share => share is not (>= 0f and <= 1f));
        if (fault >= 0)
        {
            throw new ArgumentException($"The land share of cell {fault} is {fraction[fault]}; it must lie in 0 to 1.", nameof(fraction));
        }

        this.fraction = fraction;
    }

    /// <summary>The share of land. Range: 0 to 1. Shape: one value a cell.</summary>
    public ReadOnlySpan<float> Fraction => fraction;

    /// <summary>Which cells count as ocean: those with less land than the limit.</summary>
    /// <param name="limitFraction">0 to 1. A cell at the limit counts as land.</param>
    public bool[] OceanBelow(double limitFraction) => Array.ConvertAll(fraction, share => share < limitFraction);
}
