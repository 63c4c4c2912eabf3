using CsCheck;
using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>The linearisation of every method is that of its own concentrations.</summary>
public sealed class TangentLaws
{
    // Inside the triangle of pure surfaces: beyond its ends polynomial-89 is flat.
    private static readonly Gen<ChannelKelvins> Mixtures = Gen.Select(Gen.Double[0.05, 0.95], Gen.Double[0, 1])
        .Select((ice, multi) => TunedMethods.Mixture(ice * (1.0 - multi), ice * multi));

    public static TheoryData<string, Hemisphere> Methods() => TunedMethods.All();

    /// <summary>
    /// Central differences over ±1 K of what the method retrieves, in every channel: two per cent, and 3e-5 for single precision
    /// and curvature; derivatives are near 0.01 per K. Where a step crosses from one form to another there is no derivative.
    /// </summary>
    [Theory]
    [MemberData(nameof(Methods))]
    public void TangentAt_Mixtures_HasTheSlopesOfWhatIsRetrieved(string name, Hemisphere hemisphere)
    {
        IConcentrationMethod method = TunedMethods.Create(name, hemisphere);
        int compared = 0;
        Mixtures.Sample(
            surface =>
            {
                LinearForm tangent = method.TangentAt(surface);
                return ChannelNames.All.All(channel =>
                {
                    (ChannelKelvins lower, ChannelKelvins upper) = (TunedMethods.Moved(surface, channel, -1.0), TunedMethods.Moved(surface, channel, 1.0));
                    if (CrossesModes(method, lower, upper))
                    {
                        return true;
                    }

                    Interlocked.Increment(ref compared);
                    float[] totals = TunedMethods.Totals(method, TunedMethods.Planes(lower, upper));
                    double slope = (totals[1] - totals[0]) / 2.0;
                    return Math.Abs(tangent.WeightOf(channel) - slope) <= 3e-5 + (0.02 * Math.Abs(slope));
                });
            },
            iter: 300);
        Assert.True(compared > 1_500, $"Only {compared} of 2,100 steps stayed within one form.");
    }

    /// <summary>Over the surface itself the linearisation has the retrieved concentration, beyond the ends too.</summary>
    [Theory]
    [MemberData(nameof(Methods))]
    public void TangentAt_AnySurface_HasTheRetrievedValue(string name, Hemisphere hemisphere)
    {
        IConcentrationMethod method = TunedMethods.Create(name, hemisphere);
        Gen.Select(Gen.Double[-0.1, 1.1], Gen.Double[0, 1]).Sample((ice, multi) =>
        {
            ChannelKelvins surface = TunedMethods.Mixture(ice * (1.0 - multi), ice * multi);
            float total = TunedMethods.Totals(method, TunedMethods.Planes(surface))[0];
            return Math.Abs(method.TangentAt(surface).At(surface) - total) <= 1e-5 || TunedMethods.NearTheChoice(method, surface);
        });
    }

    /// <summary>NASA Team in double precision against differences over ±0.01 K: 1e-7 of the slope's size.</summary>
    [Fact]
    public void NasaTeamTangent_PlausiblePixels_HasTheSlopesOfThePlainTwin() =>
        Gen.Select(Gen.Double[170, 260], Gen.Double[100, 240], Gen.Double[180, 250]).Sample((v19, h19, v37) =>
        {
            NasaTeamCoefficients coefficients = NasaTeamCoefficients.From(TiePointSets.F13South);
            LinearForm tangent = NasaTeamPlain.TangentAt(coefficients, new TiePoint(v19, h19, v37).Kelvins);
            const double Step = 0.01;
            (double V19, double H19, double V37) slope = (
                (Total(v19 + Step, h19, v37) - Total(v19 - Step, h19, v37)) / (2 * Step),
                (Total(v19, h19 + Step, v37) - Total(v19, h19 - Step, v37)) / (2 * Step),
                (Total(v19, h19, v37 + Step) - Total(v19, h19, v37 - Step)) / (2 * Step));
            double allowed = 1e-6 * (Math.Abs(slope.V19) + Math.Abs(slope.H19) + Math.Abs(slope.V37));
            return Total(v19, h19, v37) is not (> -0.5 and < 1.5)
                || (Math.Abs(tangent.WeightOf(Channel.V19) - slope.V19) <= allowed
                    && Math.Abs(tangent.WeightOf(Channel.H19) - slope.H19) <= allowed
                    && Math.Abs(tangent.WeightOf(Channel.V37) - slope.V37) <= allowed);

            double Total(double v, double h, double w)
            {
                (double first, double multi) = NasaTeamPlain.Solve(coefficients, v, h, w);
                return first + multi;
            }
        });

    [Fact]
    public void NasaTeamTangent_VanishingDenominator_IsMissing()
    {
        NasaTeamCoefficients coefficients = NasaTeamCoefficients.From(TiePointSets.F13North);
        RatioPolynomial below = coefficients.Denominator;
        const double Polarization = 0.3;
        double gradient = -(below.Constant + (below.Polarization * Polarization)) / (below.Gradient + (below.Product * Polarization));
        ChannelKelvins surface = new TiePoint(200.0, 200.0 * (1 - Polarization) / (1 + Polarization), 200.0 * (1 + gradient) / (1 - gradient)).Kelvins;

        Assert.True(double.IsNaN(NasaTeamPlain.TangentAt(coefficients, surface).WeightOf(Channel.V19)));
    }

    /// <summary>Origin: worked. At the tie points the slopes are the conditions of the polynomial, −1.14/47 and −0.14/11.7; beyond, they stay.</summary>
    [Theory]
    [InlineData(47.0, -1.14 / 47.0, 0.0)]
    [InlineData(60.0, -1.14 / 47.0, 0.0)]
    [InlineData(11.7, -0.14 / 11.7, 1.0)]
    [InlineData(5.0, -0.14 / 11.7, 1.0)]
    public void Polynomial89Tangent_AtAndBeyondTheEnds_KeepsTheSlopeOfTheEnd(double difference, double slope, double value)
    {
        ChannelKelvins surface = new(new Dictionary<Channel, double> { [Channel.V89] = 200.0 + difference, [Channel.H89] = 200.0 });

        LinearForm tangent = TunedMethods.Create(Polynomial89.MethodName, Hemisphere.North).TangentAt(surface);

        Assert.Equal(slope, tangent.WeightOf(Channel.V89), 1e-7);
        Assert.Equal(-slope, tangent.WeightOf(Channel.H89), 1e-7);
        Assert.Equal(value, tangent.At(surface), 1e-12);
    }

    /// <summary>Origin: worked. Pure water is open in frequency mode, pure ice lies on the line and so in polarisation mode.</summary>
    [Fact]
    public void BootstrapPureTangents_North_AreThoseOfTheModeOfEachSurface()
    {
        SurfacePoints points = LinearMethodTests.SsmiNorth;
        Bootstrap method = new(points, Hemisphere.North);

        Assert.Equal(method.FrequencyMode.Concentration(points.OpenWater), method.PureTangents.OpenWater);
        Assert.Equal(method.PolarizationMode.Concentration(points.OpenWater), method.PureTangents.FirstYear);
        Assert.Equal(method.PolarizationMode.Concentration(points.OpenWater), method.PureTangents.Multiyear);
        Assert.Equal(method.PureTangents.OpenWater, new Bootstrap(points, Hemisphere.South).PureTangents.FirstYear);
    }

    // Bootstrap in the north has a step between two forms, self-tuning a corner at either end of its blend.
    private static bool CrossesModes(IConcentrationMethod method, ChannelKelvins lower, ChannelKelvins upper) => method switch
    {
        Bootstrap => method.TangentAt(lower) != method.TangentAt(upper),
        SelfTuning blend => Part(blend, lower) != Part(blend, upper),
        _ => false,
    };

    private static int Part(SelfTuning blend, ChannelKelvins surface) => blend.ShareOverIce(blend.OverWater.At(surface)) switch
    {
        <= 0.0 => -1,
        >= 1.0 => 1,
        _ => 0,
    };
}
