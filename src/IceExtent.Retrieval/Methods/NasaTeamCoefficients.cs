namespace IceExtent.Retrieval;

/// <summary>The twelve numbers of the NASA Team equations, computed from tie points.</summary>
/// <remarks>
/// Source: [Cavalieri1984] eqs. 1-5; the closed form is the normalised cross product of the two mixing
/// equations (docs/METHODS.md). A common factor of all twelve means nothing.
/// </remarks>
public sealed record NasaTeamCoefficients
{
    private const double SmallestTriangle = 1e-6; // Relative; rounding of tie points to 0.1 K moves it by about 1e-3.

    private NasaTeamCoefficients(RatioPolynomial firstYear, RatioPolynomial multiyear, RatioPolynomial denominator) =>
        (FirstYear, Multiyear, Denominator) = (firstYear, multiyear, denominator);

    /// <summary>a0 to a3: the numerator of first-year (type A) ice.</summary>
    public RatioPolynomial FirstYear { get; }

    /// <summary>b0 to b3: the numerator of multiyear (type B) ice.</summary>
    public RatioPolynomial Multiyear { get; }

    /// <summary>c0 to c3: the denominator.</summary>
    public RatioPolynomial Denominator { get; }

    /// <summary>Computes the coefficients.</summary>
    /// <exception cref="ArgumentException">The three surfaces lie on one line, so no mixture can be told from another.</exception>
    public static NasaTeamCoefficients From(TiePoints points)
    {
        ArgumentNullException.ThrowIfNull(points);
        Surface water = Surface.Of(points.OpenWater);
        Surface first = Surface.Of(points.FirstYear);
        Surface multi = Surface.Of(points.Multiyear);

        RatioPolynomial firstYear = Cross(multi, water);
        RatioPolynomial multiyear = Cross(water, first);
        RatioPolynomial openWater = Cross(first, multi);
        RatioPolynomial denominator = firstYear + multiyear + openWater;

        // Over each pure surface the denominator is the determinant of the triangle, the same up to the sums' product.
        double triangle = denominator.At(water.PolarizationRatio, water.GradientRatio);
        if (!(Math.Abs(triangle) > SmallestTriangle * Math.Max(1.0, Math.Abs(denominator.Constant))))
        {
            throw new ArgumentException("The three tie points lie on one line: concentrations have no unique solution.", nameof(points));
        }

        return new(firstYear, multiyear, denominator);
    }

    // The cross product (Σ over channels) of the polarisation and gradient equations of two surfaces, expanded
    // in powers of the two ratios.
    private static RatioPolynomial Cross(Surface p, Surface q) => new(
        (p.A * q.D) - (q.A * p.D),
        (q.B * p.D) - (p.B * q.D),
        (q.A * p.E) - (p.A * q.E),
        (p.B * q.E) - (q.B * p.E));

    // Differences and sums of one pure surface, named as in the closed form.
    private readonly record struct Surface(double A, double B, double D, double E)
    {
        public double PolarizationRatio => A / B;

        public double GradientRatio => D / E;

        public static Surface Of(TiePoint point) => new(
            point.V19Kelvins - point.H19Kelvins,
            point.V19Kelvins + point.H19Kelvins,
            point.V37Kelvins - point.V19Kelvins,
            point.V37Kelvins + point.V19Kelvins);
    }
}
