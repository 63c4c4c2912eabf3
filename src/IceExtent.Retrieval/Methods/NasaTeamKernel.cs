using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>The NASA Team equations over planes, in single precision, several cells at a time.</summary>
/// <remarks>
/// Multiplying numerators and denominator by both sums of temperatures leaves one division a cell. Every lane
/// does the same operations in the same order, so the result does not depend on the vector's width.
/// Accuracy: 1e-5 against <see cref="NasaTeamPlain"/> for concentrations from −0.5 to 1.5 (see <c>NasaTeamLaws</c>).
/// </remarks>
public sealed class NasaTeamKernel
{
    /// <summary>Below this share of its constant term the denominator counts as zero: no solution.</summary>
    /// <remarks>Far outside the triangle of tie points; a mixture of pure surfaces never comes near.</remarks>
    public const double SmallestDenominator = 1e-3;

    private readonly Scaled firstYear;
    private readonly Scaled multiyear;
    private readonly Scaled denominator;

    /// <summary>Prepares the coefficients.</summary>
    public NasaTeamKernel(NasaTeamCoefficients coefficients)
    {
        ArgumentNullException.ThrowIfNull(coefficients);
        double unit = 1.0 / Math.Abs(coefficients.Denominator.Constant); // Brings numbers near 1 before they become floats.
        firstYear = new(coefficients.FirstYear, unit);
        multiyear = new(coefficients.Multiyear, unit);
        denominator = new(coefficients.Denominator, unit);
    }

    /// <summary>Writes unclipped fractions of all ice and of multiyear ice (type B in the south).</summary>
    /// <param name="v19Kelvins">19 GHz vertical, in K; NaN is missing.</param>
    /// <param name="h19Kelvins">19 GHz horizontal, in K.</param>
    /// <param name="v37Kelvins">37 GHz vertical, in K.</param>
    /// <param name="totalFraction">Receives all ice; NaN where a channel is missing or there is no solution.</param>
    /// <param name="multiyearFraction">Receives multiyear ice, with the same NaN.</param>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    public void Retrieve(
        ReadOnlySpan<float> v19Kelvins,
        ReadOnlySpan<float> h19Kelvins,
        ReadOnlySpan<float> v37Kelvins,
        Span<float> totalFraction,
        Span<float> multiyearFraction)
    {
        int cells = v19Kelvins.Length;
        if (h19Kelvins.Length != cells || v37Kelvins.Length != cells
            || totalFraction.Length != cells || multiyearFraction.Length != cells)
        {
            throw new ArgumentException("All planes must have the same number of cells.", nameof(totalFraction));
        }

        int cell = 0;
        for (; cell <= cells - Vector<float>.Count; cell += Vector<float>.Count)
        {
            (Vector<float> total, Vector<float> multi) = Solve(
                new Vector<float>(v19Kelvins[cell..]), new Vector<float>(h19Kelvins[cell..]), new Vector<float>(v37Kelvins[cell..]));
            total.CopyTo(totalFraction[cell..]);
            multi.CopyTo(multiyearFraction[cell..]);
        }

        for (; cell < cells; cell++)
        {
            (Vector<float> total, Vector<float> multi) = Solve(
                new Vector<float>(v19Kelvins[cell]), new Vector<float>(h19Kelvins[cell]), new Vector<float>(v37Kelvins[cell]));
            totalFraction[cell] = total[0];
            multiyearFraction[cell] = multi[0];
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private (Vector<float> Total, Vector<float> Multiyear) Solve(Vector<float> v19, Vector<float> h19, Vector<float> v37)
    {
        Vector<float> polarizationSum = v19 + h19;
        Vector<float> polarizationDifference = v19 - h19;
        Vector<float> gradientSum = v37 + v19;
        Vector<float> gradientDifference = v37 - v19;

        Vector<float> one = polarizationSum * gradientSum;
        Vector<float> polarization = polarizationDifference * gradientSum;
        Vector<float> gradient = polarizationSum * gradientDifference;
        Vector<float> product = polarizationDifference * gradientDifference;

        Vector<float> below = denominator.At(one, polarization, gradient, product);
        Vector<float> solvable = Vector.AsVectorSingle(Vector.GreaterThanOrEqual(
            Vector.Abs(below), one * new Vector<float>((float)SmallestDenominator)));
        Vector<float> inverse = Vector.ConditionalSelect(
            Vector.AsVectorInt32(solvable), Vector<float>.One / below, new Vector<float>(float.NaN));

        Vector<float> first = firstYear.At(one, polarization, gradient, product) * inverse;
        Vector<float> multi = multiyear.At(one, polarization, gradient, product) * inverse;
        return (first + multi, multi);
    }

    private readonly struct Scaled(RatioPolynomial row, double unit)
    {
        private readonly float constant = (float)(row.Constant * unit);
        private readonly float polarizationFactor = (float)(row.Polarization * unit);
        private readonly float gradientFactor = (float)(row.Gradient * unit);
        private readonly float productFactor = (float)(row.Product * unit);

        [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
        public Vector<float> At(Vector<float> one, Vector<float> polarization, Vector<float> gradient, Vector<float> product) =>
            (one * constant) + (polarization * polarizationFactor) + (gradient * gradientFactor) + (product * productFactor);
    }
}
