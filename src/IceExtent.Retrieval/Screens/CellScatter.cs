using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>The standard error that the scatter of the two pure surfaces gives a mixed cell.</summary>
/// <remarks>
/// σ² = (1 − C)²·σ_water² + C²·σ_ice². Source: [Tonboe2016], [Lavergne2019]; the scatter is the sensor file's and
/// holds instrument noise. Footprint smearing at the edge is not in it.
/// </remarks>
public static class CellScatter
{
    /// <summary>Writes the standard error of a run of cells.</summary>
    /// <param name="totalFraction">Clipped concentrations; NaN is missing.</param>
    /// <param name="scatter">The scatter over the pure surfaces.</param>
    /// <param name="standardErrorFraction">Receives one standard error a cell, NaN where the concentration is.</param>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    public static void Apply(ReadOnlySpan<float> totalFraction, RetrievalScatter scatter, Span<float> standardErrorFraction)
    {
        ArgumentNullException.ThrowIfNull(scatter);
        int cells = totalFraction.Length;
        if (standardErrorFraction.Length != cells)
        {
            throw new ArgumentException("Both planes must have the same number of cells.", nameof(standardErrorFraction));
        }

        Vector<float> water = new((float)scatter.OpenWaterFraction);
        Vector<float> ice = new((float)scatter.ClosedIceFraction);
        int cell = 0;
        for (; cell <= cells - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Of(new Vector<float>(totalFraction[cell..]), water, ice).CopyTo(standardErrorFraction[cell..]);
        }

        for (; cell < cells; cell++)
        {
            standardErrorFraction[cell] = Of(new Vector<float>(totalFraction[cell]), water, ice)[0];
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private static Vector<float> Of(Vector<float> fraction, Vector<float> water, Vector<float> ice)
    {
        Vector<float> fromWater = (Vector<float>.One - fraction) * water;
        Vector<float> fromIce = fraction * ice;
        return Vector.SquareRoot((fromWater * fromWater) + (fromIce * fromIce));
    }
}
