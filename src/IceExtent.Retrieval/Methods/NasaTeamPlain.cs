namespace IceExtent.Retrieval;

/// <summary>The NASA Team equations in double precision, one cell at a time: the yardstick of the fast kernel.</summary>
public static class NasaTeamPlain
{
    /// <summary>Solves one cell.</summary>
    /// <param name="coefficients">From the tie points.</param>
    /// <param name="v19Kelvins">19 GHz vertical, in K; NaN is missing.</param>
    /// <param name="h19Kelvins">19 GHz horizontal, in K; NaN is missing.</param>
    /// <param name="v37Kelvins">37 GHz vertical, in K; NaN is missing.</param>
    /// <returns>Unclipped fractions of first-year and multiyear ice; NaN where a channel is missing or there is no solution.</returns>
    /// <remarks>[Cavalieri1984] eqs. 1 to 5.</remarks>
    public static (double FirstYear, double Multiyear) Solve(
        NasaTeamCoefficients coefficients, double v19Kelvins, double h19Kelvins, double v37Kelvins)
    {
        ArgumentNullException.ThrowIfNull(coefficients);
        double polarization = (v19Kelvins - h19Kelvins) / (v19Kelvins + h19Kelvins);
        double gradient = (v37Kelvins - v19Kelvins) / (v37Kelvins + v19Kelvins);
        double denominator = coefficients.Denominator.At(polarization, gradient);
        return Math.Abs(denominator) < NasaTeamKernel.SmallestDenominator * Math.Abs(coefficients.Denominator.Constant)
            ? (double.NaN, double.NaN)
            : (coefficients.FirstYear.At(polarization, gradient) / denominator,
                coefficients.Multiyear.At(polarization, gradient) / denominator);
    }

    /// <summary>The total and its derivatives at one surface.</summary>
    /// <param name="coefficients">From the tie points.</param>
    /// <param name="surface">19V, 19H and 37V.</param>
    /// <returns>A form in the three channels, weights per K; NaN where there is no solution.</returns>
    /// <remarks>The chain rule through both ratios: ∂PR/∂V19 = 2·H19/(V19 + H19)², and so on.</remarks>
    public static LinearForm TangentAt(NasaTeamCoefficients coefficients, ChannelKelvins surface)
    {
        ArgumentNullException.ThrowIfNull(coefficients);
        ArgumentNullException.ThrowIfNull(surface);
        (double v19, double h19, double v37) = (surface[Channel.V19], surface[Channel.H19], surface[Channel.V37]);
        (double firstYear, double multiyear) = Solve(coefficients, v19, h19, v37);
        double total = firstYear + multiyear;

        (double polarizationSum, double gradientSum) = (v19 + h19, v37 + v19);
        (double polarization, double gradient) = ((v19 - h19) / polarizationSum, (v37 - v19) / gradientSum);
        RatioPolynomial numerator = coefficients.FirstYear + coefficients.Multiyear;
        RatioPolynomial denominator = coefficients.Denominator;
        double below = denominator.At(polarization, gradient);
        double byPolarization = (numerator.PolarizationSlope(gradient) - (total * denominator.PolarizationSlope(gradient))) / below;
        double byGradient = (numerator.GradientSlope(polarization) - (total * denominator.GradientSlope(polarization))) / below;
        byPolarization *= 2.0 / (polarizationSum * polarizationSum);
        byGradient *= 2.0 / (gradientSum * gradientSum);
        return LinearForm.Through(
            total,
            surface,
            (Channel.V19, (byPolarization * h19) - (byGradient * v37)),
            (Channel.H19, -byPolarization * v19),
            (Channel.V37, byGradient * v19));
    }
}
