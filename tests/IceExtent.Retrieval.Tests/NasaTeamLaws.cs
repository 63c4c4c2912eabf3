using CsCheck;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>What holds for every pixel.</summary>
public sealed class NasaTeamLaws
{
    private static readonly Gen<(double First, double Multi)> Shares =
        Gen.Select(Gen.Double[0, 1], Gen.Double[0, 1], (a, b) => a + b <= 1 ? (a, b) : (1 - a, 1 - b));

    [Fact]
    public void Solve_LinearMixture_ReturnsItsOwnShares() =>
        Shares.Sample(share =>
        {
            (double v19, double h19, double v37) = TiePointSets.Mix(TiePointSets.F13North, share.First, share.Multi);
            (double first, double multi) = NasaTeamPlain.Solve(NasaTeamCoefficients.From(TiePointSets.F13North), v19, h19, v37);
            return Math.Abs(first - share.First) < 1e-9 && Math.Abs(multi - share.Multi) < 1e-9;
        });

    /// <summary>The single-precision kernel is within 1e-5 of the plain twin wherever concentrations are from −0.5 to 1.5.</summary>
    [Fact]
    public void Retrieve_AnyPixels_AgreesWithThePlainTwin() =>
        Gen.Select(Gen.Double[150, 280], Gen.Double[80, 270], Gen.Double[150, 280]).Array[1, 67].Sample(pixels =>
        {
            NasaTeamCoefficients coefficients = NasaTeamCoefficients.From(TiePointSets.F17North);
            float[] v19 = Array.ConvertAll(pixels, pixel => (float)pixel.Item1);
            float[] h19 = Array.ConvertAll(pixels, pixel => (float)pixel.Item2);
            float[] v37 = Array.ConvertAll(pixels, pixel => (float)pixel.Item3);
            float[] total = new float[pixels.Length];
            float[] multi = new float[pixels.Length];
            new NasaTeamKernel(coefficients).Retrieve(v19, h19, v37, total, multi);
            for (int cell = 0; cell < pixels.Length; cell++)
            {
                (double first, double multiyear) = NasaTeamPlain.Solve(coefficients, v19[cell], h19[cell], v37[cell]);
                bool plausible = first + multiyear is > -0.5 and < 1.5 && multiyear is > -0.5 and < 1.5;
                if (plausible && !(Math.Abs(total[cell] - (first + multiyear)) <= 1e-5 && Math.Abs(multi[cell] - multiyear) <= 1e-5))
                {
                    return false;
                }
            }

            return true;
        });

    [Fact]
    public void Retrieve_MissingChannel_IsMissingThereAndOnlyThere() =>
        Gen.Select(Gen.Int[0, 2], Gen.Int[0, 40]).Sample((channel, at) =>
        {
            float[][] planes = [.. Enumerable.Range(0, 3).Select(index => Enumerable.Repeat(new[] { 225f, 190f, 222f }[index], 41).ToArray())];
            planes[channel][at] = float.NaN;
            float[] total = new float[41];
            float[] multi = new float[41];
            new NasaTeamKernel(NasaTeamCoefficients.From(TiePointSets.F13North)).Retrieve(planes[0], planes[1], planes[2], total, multi);
            return Enumerable.Range(0, 41).All(cell => float.IsNaN(total[cell]) == (cell == at) && float.IsNaN(multi[cell]) == (cell == at));
        });

    /// <summary>Where the denominator vanishes there is no number at all, in both twins.</summary>
    [Fact]
    public void Retrieve_VanishingDenominator_IsMissing()
    {
        NasaTeamCoefficients coefficients = NasaTeamCoefficients.From(TiePointSets.F13North);
        RatioPolynomial below = coefficients.Denominator;
        const double polarization = 0.3;
        double gradient = -(below.Constant + (below.Polarization * polarization)) / (below.Gradient + (below.Product * polarization));
        double v19 = 200;
        double h19 = v19 * (1 - polarization) / (1 + polarization);
        double v37 = v19 * (1 + gradient) / (1 - gradient);
        float[] total = new float[1];

        new NasaTeamKernel(coefficients).Retrieve([(float)v19], [(float)h19], [(float)v37], total, new float[1]);

        Assert.True(double.IsNaN(NasaTeamPlain.Solve(coefficients, v19, h19, v37).FirstYear));
        Assert.True(float.IsNaN(total[0]));
    }
}
