using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>The standard error that the scatter of the two pure surfaces gives a mixed cell.</summary>
/// <remarks>
/// σ² = (1 − C)²·σ_water² + C²·σ_ice² + σ_noise². Source: [Tonboe2016], [Lavergne2019]. σ_ice goes from the scatter of loose ice to
/// that of closed ice where self-tuning changes its projection: our own. Footprint smearing at the edge is not in it.
/// </remarks>
public static class CellScatter
{
    /// <summary>Writes the standard error of a run of cells.</summary>
    /// <param name="totalFraction">Clipped concentrations; NaN is missing.</param>
    /// <param name="scatter">The scatter over the pure surfaces.</param>
    /// <param name="standardErrorFraction">Receives one standard error a cell, NaN where the concentration is.</param>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    public static void Apply(ReadOnlySpan<float> totalFraction, RetrievalScatter scatter, Span<float> standardErrorFraction)
    {
        ArgumentNullException.ThrowIfNull(scatter);
        int cells = totalFraction.Length;
        if (standardErrorFraction.Length != cells)
        {
            throw new ArgumentException("Both planes must have the same number of cells.", nameof(standardErrorFraction));
        }

        Surfaces surfaces = new(scatter);
        int cell = 0;
        for (; cell <= cells - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Of(new Vector<float>(totalFraction[cell..]), surfaces).CopyTo(standardErrorFraction[cell..]);
        }

        for (; cell < cells; cell++)
        {
            standardErrorFraction[cell] = Of(new Vector<float>(totalFraction[cell]), surfaces)[0];
        }
    }

    /// <summary>Writes the standard error of a run of cells with the noise of each.</summary>
    /// <param name="totalFraction">Clipped concentrations; NaN is missing.</param>
    /// <param name="scatter">The scatter over the pure surfaces, without noise.</param>
    /// <param name="noiseVariance">The variance that noise gives each cell, without unit; above 1 it counts as 1, which is all there is to be wrong by.</param>
    /// <param name="waterNoiseVariance">The variance that stands in cells of concentration 0, screened and clipped ones: no ice, no ice's noise.</param>
    /// <param name="standardErrorFraction">
    /// Receives one standard error a cell, NaN where the concentration is. May be the same memory as <paramref name="noiseVariance"/>.
    /// </param>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    public static void Apply(
        ReadOnlySpan<float> totalFraction, RetrievalScatter scatter, ReadOnlySpan<float> noiseVariance, double waterNoiseVariance, Span<float> standardErrorFraction)
    {
        ArgumentNullException.ThrowIfNull(scatter);
        int cells = totalFraction.Length;
        if (noiseVariance.Length != cells || standardErrorFraction.Length != cells)
        {
            throw new ArgumentException("All planes must have the same number of cells.", nameof(standardErrorFraction));
        }

        Vector<float> water = new((float)waterNoiseVariance);
        Surfaces surfaces = new(scatter);
        int cell = 0;
        for (; cell <= cells - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Vector<float> fraction = new(totalFraction[cell..]);
            Vector.SquareRoot(VarianceOf(fraction, surfaces) + NoiseOf(fraction, new(noiseVariance[cell..]), water)).CopyTo(standardErrorFraction[cell..]);
        }

        for (; cell < cells; cell++)
        {
            Vector<float> fraction = new(totalFraction[cell]);
            standardErrorFraction[cell] = Vector.SquareRoot(VarianceOf(fraction, surfaces) + NoiseOf(fraction, new(noiseVariance[cell]), water))[0];
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private static Vector<float> Of(Vector<float> fraction, Surfaces surfaces) => Vector.SquareRoot(VarianceOf(fraction, surfaces));

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private static Vector<float> VarianceOf(Vector<float> fraction, Surfaces surfaces)
    {
        Vector<float> closed = Vector.Min(
            Vector.Max((fraction - surfaces.LooseTo) * surfaces.InverseChange, Vector<float>.Zero), Vector<float>.One);
        Vector<float> fromWater = (Vector<float>.One - fraction) * surfaces.Water;
        Vector<float> fromIce = fraction * (surfaces.Loose + (closed * surfaces.Closing));
        return (fromWater * fromWater) + (fromIce * fromIce);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private static Vector<float> NoiseOf(Vector<float> fraction, Vector<float> noise, Vector<float> water) =>
        Vector.ConditionalSelect(Vector.Equals(fraction, Vector<float>.Zero), water, Vector.Min(noise, Vector<float>.One));

    private readonly struct Surfaces(RetrievalScatter scatter)
    {
        public readonly Vector<float> Water = new((float)scatter.OpenWaterFraction);
        public readonly Vector<float> Loose = new((float)scatter.LooseIceFraction);
        public readonly Vector<float> Closing = new((float)(scatter.ClosedIceFraction - scatter.LooseIceFraction));
        public readonly Vector<float> LooseTo = new((float)scatter.Blend.From);
        public readonly Vector<float> InverseChange = new((float)(1.0 / (scatter.Blend.To - scatter.Blend.From)));
    }
}
