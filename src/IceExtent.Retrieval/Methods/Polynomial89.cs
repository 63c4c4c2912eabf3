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

    private const double SlopeAtWater = -1.14;
    private const double SlopeAtIce = -0.14;

    private readonly double[] coefficients;
    private readonly float water;
    private readonly float ice;

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

    /// <summary>The polynomial's value in double precision, without the ends: the plain twin.</summary>
    public double At(double differenceKelvins) =>
        (((((coefficients[3] * differenceKelvins) + coefficients[2]) * differenceKelvins) + coefficients[1]) * differenceKelvins) + coefficients[0];

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
