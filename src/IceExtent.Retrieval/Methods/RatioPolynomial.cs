namespace IceExtent.Retrieval;

/// <summary>One polynomial in the polarisation and gradient ratios: constant + p·PR + g·GR + pg·PR·GR.</summary>
/// <param name="Constant">The constant term, in K².</param>
/// <param name="Polarization">The factor of PR, in K².</param>
/// <param name="Gradient">The factor of GR, in K².</param>
/// <param name="Product">The factor of PR·GR, in K².</param>
public readonly record struct RatioPolynomial(double Constant, double Polarization, double Gradient, double Product)
{
    /// <summary>Adds term by term.</summary>
    public static RatioPolynomial operator +(RatioPolynomial left, RatioPolynomial right) => left.Add(right);

    /// <summary>Adds term by term.</summary>
    public RatioPolynomial Add(RatioPolynomial other) => new(
        Constant + other.Constant,
        Polarization + other.Polarization,
        Gradient + other.Gradient,
        Product + other.Product);

    /// <summary>The polynomial's value.</summary>
    public double At(double polarizationRatio, double gradientRatio) =>
        Constant + (Polarization * polarizationRatio) + (Gradient * gradientRatio)
        + (Product * polarizationRatio * gradientRatio);

    /// <summary>The derivative by PR.</summary>
    public double PolarizationSlope(double gradientRatio) => Polarization + (Product * gradientRatio);

    /// <summary>The derivative by GR.</summary>
    public double GradientSlope(double polarizationRatio) => Gradient + (Product * polarizationRatio);
}
