using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>The variance that instrument noise gives NASA Team concentrations, in single precision, several cells at a time.</summary>
/// <remarks>
/// Multiplied by both sums of temperatures and divided by T19V, numerator N and denominator D of the total are linear in
/// T19V, T19H and T37V: three channels are a mixture of three surfaces times a factor. With C = N/D a derivative is
/// (n − C·d)/D, n and d being the weights of a channel. Accuracy: 1e-3 of the variance against
/// <see cref="NasaTeamPlain.TangentAt"/>, which goes through the ratios (see <c>NoiseVarianceLaws</c>).
/// </remarks>
public sealed class NasaTeamNoiseKernel
{
    private readonly Weights numerator;
    private readonly Weights denominator;

    /// <summary>Prepares the coefficients.</summary>
    public NasaTeamNoiseKernel(NasaTeamCoefficients coefficients)
    {
        ArgumentNullException.ThrowIfNull(coefficients);
        double unit = 1.0 / Math.Abs(coefficients.Denominator.Constant); // Brings numbers near 1 before they become floats.
        numerator = new(coefficients.FirstYear + coefficients.Multiyear, unit);
        denominator = new(coefficients.Denominator, unit);
    }

    /// <summary>Writes the variance of the unclipped total of all ice.</summary>
    /// <param name="v19Kelvins">19 GHz vertical, in K; NaN is missing.</param>
    /// <param name="h19Kelvins">19 GHz horizontal, in K.</param>
    /// <param name="v37Kelvins">37 GHz vertical, in K.</param>
    /// <param name="noise">The noise of the three channels.</param>
    /// <param name="variance">Receives one variance a cell, without unit; NaN where a channel is missing, no meaning where there is no solution.</param>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    public void Write(
        ReadOnlySpan<float> v19Kelvins, ReadOnlySpan<float> h19Kelvins, ReadOnlySpan<float> v37Kelvins, ChannelNoise noise, Span<float> variance)
    {
        ArgumentNullException.ThrowIfNull(noise);
        int cells = v19Kelvins.Length;
        if (h19Kelvins.Length != cells || v37Kelvins.Length != cells || variance.Length != cells)
        {
            throw new ArgumentException("All planes must have the same number of cells.", nameof(variance));
        }

        Vector<float> v19Noise = new((float)noise[Channel.V19]);
        Vector<float> h19Noise = new((float)noise[Channel.H19]);
        Vector<float> v37Noise = new((float)noise[Channel.V37]);
        int cell = 0;
        for (; cell <= cells - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Of(new Vector<float>(v19Kelvins[cell..]), new Vector<float>(h19Kelvins[cell..]), new Vector<float>(v37Kelvins[cell..]), v19Noise, h19Noise, v37Noise)
                .CopyTo(variance[cell..]);
        }

        for (; cell < cells; cell++)
        {
            variance[cell] = Of(new(v19Kelvins[cell]), new(h19Kelvins[cell]), new(v37Kelvins[cell]), v19Noise, h19Noise, v37Noise)[0];
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private Vector<float> Of(
        Vector<float> v19, Vector<float> h19, Vector<float> v37, Vector<float> v19Noise, Vector<float> h19Noise, Vector<float> v37Noise)
    {
        Vector<float> inverse = Vector<float>.One / denominator.At(v19, h19, v37);
        Vector<float> concentration = numerator.At(v19, h19, v37) * inverse;
        Vector<float> fromV19 = (numerator.V19 - (concentration * denominator.V19)) * v19Noise;
        Vector<float> fromH19 = (numerator.H19 - (concentration * denominator.H19)) * h19Noise;
        Vector<float> fromV37 = (numerator.V37 - (concentration * denominator.V37)) * v37Noise;
        return ((fromV19 * fromV19) + (fromH19 * fromH19) + (fromV37 * fromV37)) * (inverse * inverse);
    }

    // constant·(V + H)(W + V) + polarisation·(V − H)(W + V) + gradient·(V + H)(W − V) + product·(V − H)(W − V), divided by
    // V; the factor of H·W, constant − polarisation + gradient − product, is 0 for every cross product of two surfaces.
    private readonly struct Weights(RatioPolynomial row, double unit)
    {
        private readonly float v19 = (float)((row.Constant + row.Polarization - row.Gradient - row.Product) * unit);
        private readonly float h19 = (float)((row.Constant - row.Polarization - row.Gradient + row.Product) * unit);
        private readonly float v37 = (float)((row.Constant + row.Polarization + row.Gradient + row.Product) * unit);

        public Vector<float> V19 => new(v19);

        public Vector<float> H19 => new(h19);

        public Vector<float> V37 => new(v37);

        [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
        public Vector<float> At(Vector<float> v19Kelvins, Vector<float> h19Kelvins, Vector<float> v37Kelvins) =>
            (V19 * v19Kelvins) + (H19 * h19Kelvins) + (V37 * v37Kelvins);
    }
}
