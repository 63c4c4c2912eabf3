using CsCheck;
using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>Instrument noise in every method: the fast kernel, the plain twin and a drawing of lots agree.</summary>
public sealed class NoiseVarianceLaws
{
    private static readonly Gen<ChannelKelvins> Pixels = Gen.Select(
        Gen.Select(Gen.Double[170, 260], Gen.Double[100, 240], Gen.Double[180, 250]), Gen.Double[130, 240], Gen.Double[0, 60]).Select((low, h37, difference) =>
            new ChannelKelvins(new Dictionary<Channel, double>
            {
                [Channel.V19] = low.Item1, [Channel.H19] = low.Item2, [Channel.V22] = 210.0, [Channel.V37] = low.Item3, [Channel.H37] = h37,
                [Channel.V89] = 180.0 + difference, [Channel.H89] = 180.0,
            }));

    private static readonly Gen<ChannelNoise> Noises = Gen.Double[0, 3].Array[7].Select(values =>
        new ChannelNoise(values.Select((value, at) => ((Channel)at, value)).ToDictionary(pair => pair.Item1, pair => pair.value)));

    public static TheoryData<string, Hemisphere> Methods() => TunedMethods.All();

    /// <summary>The kernel is within 1e-3 of the variance by the tangent, wherever concentrations are from −0.5 to 1.5; runs of any length.</summary>
    [Theory]
    [MemberData(nameof(Methods))]
    public void WriteNoiseVariance_AnyPixels_AgreesWithTheTangent(string name, Hemisphere hemisphere)
    {
        IConcentrationMethod method = TunedMethods.Create(name, hemisphere);
        int compared = 0;
        Gen.Select(Pixels.Array[1, 40], Noises).Sample((pixels, noise) =>
        {
            // As the planes hold them: the twin must see the same temperatures.
            ChannelKelvins[] single = Array.ConvertAll(pixels, pixel => new ChannelKelvins(ChannelNames.All.ToDictionary(channel => channel, channel => (double)(float)pixel[channel])));
            float[] fast = TunedMethods.Variances(method, TunedMethods.Planes(single), noise);
            return Enumerable.Range(0, single.Length).All(cell =>
            {
                LinearForm tangent = method.TangentAt(single[cell]);
                if (tangent.At(single[cell]) is not (>= -0.5 and <= 1.5) || TunedMethods.NearTheChoice(method, single[cell]))
                {
                    return true;
                }

                Interlocked.Increment(ref compared);
                double plain = noise.VarianceOf(tangent);

                // Inside the blend two projections may cancel; what is left is then known no better than they are.
                double scale = method is SelfTuning blend ? plain + noise.VarianceOf(blend.OverWater) + noise.VarianceOf(blend.OverIce) : plain;
                return Math.Abs(fast[cell] - plain) <= (1e-3 * scale) + 1e-12; // Lots may be next to no noise.
            });
        });
        Assert.True(compared > 200, $"Only {compared} pixels were compared.");
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public void WriteNoiseVariance_PartOfAPlane_IsThatPartOfTheWhole(string name, Hemisphere hemisphere)
    {
        IConcentrationMethod method = TunedMethods.Create(name, hemisphere);
        BrightnessPlanes observed = TunedMethods.Planes([.. Enumerable.Range(0, 50).Select(cell => TunedMethods.Mixture(cell / 100.0, cell / 125.0))]);
        float[] part = new float[21];

        method.WriteNoiseVariance(observed, new(13, 21), TunedMethods.Noise, part);

        Assert.Equal(TunedMethods.Variances(method, observed, TunedMethods.Noise)[13..34], part);
    }

    /// <summary>
    /// Origin: independent of the derivatives, a drawing of 20,000 lots a mixture with a fixed seed. Their spread is known to 0.5 %
    /// (1/√(2·20,000)); 2 % allow four times that. Bootstrap changes its mode at 89 % ice, and
    /// polynomial-89 is flat from its ends on: no mixture is near.
    /// </summary>
    [Theory]
    [MemberData(nameof(Methods))]
    public void WriteNoiseVariance_Mixtures_IsTheSpreadOfNoisyRetrievals(string name, Hemisphere hemisphere)
    {
        const int Lots = 20_000;
        IConcentrationMethod method = TunedMethods.Create(name, hemisphere);
        Random random = new(Seed: 20_260_714);
        (double, double)[] closed = method is Polynomial89 ? [] : [(0.97, 0.0), (0.2, 0.78)];
        foreach ((double first, double multi) in closed.Concat([(0.15, 0.0), (0.3, 0.1), (0.2, 0.4), (0.0, 0.75), (0.5, 0.3)]))
        {
            ChannelKelvins mixture = TunedMethods.Mixture(first, multi);
            BrightnessPlanes noisy = TunedMethods.Planes([.. Enumerable.Repeat(mixture, Lots)]);
            foreach (Channel channel in noisy.Channels)
            {
                Disturb(noisy.Kelvins(channel), TunedMethods.Noise[channel], random);
            }

            double spread = Spread(TunedMethods.Totals(method, noisy));
            double predicted = Math.Sqrt(TunedMethods.Variances(method, TunedMethods.Planes(mixture), TunedMethods.Noise)[0]);

            Assert.InRange(spread / predicted, 0.98, 1.02);
        }
    }

    /// <summary>Origin: worked. Forms 2x + y and x − 3y with 0.5 and 2 K: 4·0.25 + 4 = 5; 0.25 + 36 = 36.25; 2·0.25 − 3·4 = −11.5.</summary>
    [Fact]
    public void ChannelNoise_WorkedForms_GiveVarianceAndCovariance()
    {
        ChannelNoise noise = new(new Dictionary<Channel, double> { [Channel.V19] = 0.5, [Channel.H89] = 2.0 });
        LinearForm left = new(7.0, (Channel.V19, 2.0), (Channel.H89, 1.0), (Channel.V37, 100.0)); // 37V has no noise.
        LinearForm right = new(0.0, (Channel.V19, 1.0), (Channel.H89, -3.0));

        Assert.Equal(5.0, noise.VarianceOf(left), 1e-12);
        Assert.Equal(36.25, noise.VarianceOf(right), 1e-12);
        Assert.Equal(-11.5, noise.CovarianceOf(left, right), 1e-12);
        Assert.Equal(0.0, ChannelNoise.None.VarianceOf(left));
    }

    [Theory]
    [InlineData(-0.1)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void ChannelNoise_ImpossibleValue_IsRefused(double kelvins) =>
        Assert.Throws<ArgumentException>(() => new ChannelNoise(new Dictionary<Channel, double> { [Channel.V19] = kelvins }));

    private static void Disturb(Span<float> kelvins, double noiseKelvins, Random random)
    {
        for (int cell = 0; cell < kelvins.Length; cell++)
        {
            // Box and Muller: two even numbers give one normal one.
            double normal = Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
            kelvins[cell] += (float)(noiseKelvins * normal);
        }
    }

    private static double Spread(float[] values)
    {
        double mean = values.Average(value => (double)value);
        return Math.Sqrt(values.Average(value => (value - mean) * (value - mean)));
    }
}
