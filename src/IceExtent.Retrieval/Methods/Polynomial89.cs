using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>The polynomial in the polarisation difference at 85 to 91 GHz.</summary>
/// <remarks>
/// C = d3·P³ + d2·P² + d1·P + d0 with P = T89V − T89H. The coefficients solve C(P0) = 0, C(P1) = 1,
/// C′(P0) = −1.14/P0, C′(P1) = −0.14/P1; they are never typed in, because the rounded printed ones leave 4 % ice over
/// open water. At and beyond the tie points the concentration is 0 or 1.
/// Source: [Svendsen1987], [Spreen2008]; the conditions are from memory (high) and reproduce the printed coefficients.
/// </remarks>
public sealed class Polynomial89 : IConcentrationMethod
{
    /// <summary>The name run files use.</summary>
    public const string MethodName = "polynomial-89";

    private static readonly LinearForm Difference = new(0.0, (Channel.V89, 1.0), (Channel.H89, -1.0));

    private const double SlopeAtWater = -1.14;
    private const double SlopeAtIce = -0.14;

    private readonly double[] coefficients;
    private readonly float water;
    private readonly float ice;
    private readonly float slope0;
    private readonly float slope1;
    private readonly float slope2;

    /// <summary>Tunes the method.</summary>
    /// <param name="points">The polarisation differences over the two pure surfaces.</param>
    /// <exception cref="ArgumentException">Water is not above ice, or one of them is not above 0.</exception>
    public Polynomial89(PolarizationPoints points)
    {
        ArgumentNullException.ThrowIfNull(points);
        if (!(points.IceKelvins > 0.0) || !(points.WaterKelvins > points.IceKelvins))
        {
            throw new ArgumentException("The difference over water must exceed that over ice, and both must be above 0 K.", nameof(points));
        }

        coefficients = Solve(points.WaterKelvins, points.IceKelvins);
        (water, ice) = ((float)points.WaterKelvins, (float)points.IceKelvins);
        (slope0, slope1, slope2) = ((float)coefficients[1], (float)(2.0 * coefficients[2]), (float)(3.0 * coefficients[3]));
        PureTangents = new(TangentAt(points.WaterKelvins), TangentAt(points.IceKelvins), TangentAt(points.IceKelvins));
    }

    /// <summary>d0 to d3, in 1/K to the power of the index.</summary>
    public ReadOnlySpan<double> Coefficients => coefficients;

    /// <inheritdoc/>
    public string Name => MethodName;

    /// <inheritdoc/>
    public string Source => "[Svendsen1987], [Spreen2008]";

    /// <inheritdoc/>
    public IReadOnlyList<Channel> Channels { get; } = [Channel.V89, Channel.H89];

    /// <inheritdoc/>
    public bool SeparatesIceTypes => false;

    /// <inheritdoc/>
    public PureTangents PureTangents { get; }

    /// <inheritdoc/>
    public void Retrieve(BrightnessPlanes observed, CellRange cells, ConcentrationPlanes into)
    {
        ArgumentNullException.ThrowIfNull(observed);
        ArgumentNullException.ThrowIfNull(into);
        ReadOnlySpan<float> vertical = cells.Of(observed.Kelvins(Channel.V89));
        ReadOnlySpan<float> horizontal = cells.Of(observed.Kelvins(Channel.H89));
        Span<float> total = cells.Of(into.Total);
        (float d0, float d1, float d2, float d3) =
            ((float)coefficients[0], (float)coefficients[1], (float)coefficients[2], (float)coefficients[3]);
        for (int cell = 0; cell < total.Length; cell++)
        {
            float difference = vertical[cell] - horizontal[cell];
            float inside = (((((d3 * difference) + d2) * difference) + d1) * difference) + d0;
            total[cell] = difference >= water ? 0f : difference <= ice ? 1f : inside; // NaN passes through.
        }

        cells.Of(into.Multiyear).Fill(float.NaN);
    }

    /// <inheritdoc/>
    /// <remarks>At and beyond a tie point the value is 0 or 1 and the slope that of the end, so that noise does not vanish there.</remarks>
    public LinearForm TangentAt(ChannelKelvins surface)
    {
        ArgumentNullException.ThrowIfNull(surface);
        return TangentAt(surface[Channel.V89] - surface[Channel.H89]);
    }

    /// <inheritdoc/>
    public void WriteNoiseVariance(BrightnessPlanes observed, CellRange cells, ChannelNoise noise, Span<float> variance)
    {
        ArgumentNullException.ThrowIfNull(observed);
        ArgumentNullException.ThrowIfNull(noise);
        ReadOnlySpan<float> vertical = cells.Of(observed.Kelvins(Channel.V89));
        ReadOnlySpan<float> horizontal = cells.Of(observed.Kelvins(Channel.H89));
        Vector<float> differenceVariance = new((float)noise.VarianceOf(Difference));
        int cell = 0;
        for (; cell <= variance.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Vector<float> slope = SlopeAt(new Vector<float>(vertical[cell..]) - new Vector<float>(horizontal[cell..]));
            (slope * slope * differenceVariance).CopyTo(variance[cell..]);
        }

        for (; cell < variance.Length; cell++)
        {
            Vector<float> slope = SlopeAt(new Vector<float>(vertical[cell] - horizontal[cell]));
            variance[cell] = (slope * slope * differenceVariance)[0];
        }
    }

    /// <summary>The polynomial's value in double precision, without the ends: the plain twin.</summary>
    public double At(double differenceKelvins) =>
        (((((coefficients[3] * differenceKelvins) + coefficients[2]) * differenceKelvins) + coefficients[1]) * differenceKelvins) + coefficients[0];

    // The slope in 1/K, held at the tie points.
    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private Vector<float> SlopeAt(Vector<float> difference)
    {
        Vector<float> held = Vector.Min(Vector.Max(difference, new Vector<float>(ice)), new Vector<float>(water));
        return (((held * slope2) + new Vector<float>(slope1)) * held) + new Vector<float>(slope0);
    }

    private LinearForm TangentAt(double differenceKelvins)
    {
        double held = Math.Clamp(differenceKelvins, ice, water);
        double value = differenceKelvins >= water ? 0.0 : differenceKelvins <= ice ? 1.0 : At(differenceKelvins);
        double slope = (((3.0 * coefficients[3] * held) + (2.0 * coefficients[2])) * held) + coefficients[1];
        return Difference.Times(slope).Plus(1.0, new LinearForm(value - (slope * differenceKelvins)));
    }

    // Hermite interpolation between the two tie points, expanded in powers of P.
    private static double[] Solve(double water, double ice)
    {
        double span = water - ice;
        double valueSlope = -1.0 / span; // The mean slope from (ice, 1) to (water, 0).
        double second = (valueSlope - (SlopeAtIce / ice)) / span;
        double third = ((SlopeAtWater / water) + (SlopeAtIce / ice) - (2.0 * valueSlope)) / (span * span);

        // Newton form on ice, ice, water: 1 + m(P−ice) + second(P−ice)² + third(P−ice)²(P−water).
        double slope = SlopeAtIce / ice;
        return
        [
            1.0 - (slope * ice) + (second * ice * ice) - (third * ice * ice * water),
            slope - (2.0 * second * ice) + (third * ((2.0 * ice * water) + (ice * ice))),
            second - (third * ((2.0 * ice) + water)),
            third,
        ];
    }
}

/// <summary>The polarisation difference at 85 to 91 GHz over the two pure surfaces.</summary>
/// <param name="WaterKelvins">Over open water, in K.</param>
/// <param name="IceKelvins">Over closed ice, in K.</param>
public sealed record PolarizationPoints(double WaterKelvins, double IceKelvins);
