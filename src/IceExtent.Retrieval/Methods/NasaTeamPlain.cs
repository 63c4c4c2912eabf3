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
}
