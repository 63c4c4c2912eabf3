using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>What the scatter of the file and the noise of each cell make together.</summary>
public sealed class ErrorBudgetTests
{
    private static readonly RetrievalScatter File = new(0.05, 0.04);

    public static TheoryData<string, Hemisphere> Methods() => TunedMethods.All();

    /// <summary>Origin: worked. Over a pure surface what was taken out of the scatter comes back; over the noisier kind of ice there is more.</summary>
    [Theory]
    [MemberData(nameof(Methods))]
    public void Apply_PureSurfaces_HaveTheScatterOfTheFile(string name, Hemisphere hemisphere)
    {
        IConcentrationMethod method = TunedMethods.Create(name, hemisphere);
        BrightnessPlanes pure = TunedMethods.Planes(TunedMethods.Mixture(0, 0), TunedMethods.Mixture(1, 0), TunedMethods.Mixture(0, 1));
        float[] errors = new float[3];

        new ErrorBudget(method, File, TunedMethods.Noise).Apply(pure, new(0, 3), [0f, 1f, 1f], errors);

        Assert.Equal(0.05, errors[0], 1e-6);
        Assert.Equal(0.04, Math.Min(errors[1], errors[2]), 1e-6);
        PureTangents tangents = method.PureTangents;
        double difference = Math.Abs(TunedMethods.Noise.VarianceOf(tangents.FirstYear) - TunedMethods.Noise.VarianceOf(tangents.Multiyear));
        Assert.Equal(Math.Sqrt((0.04 * 0.04) + difference), Math.Max(errors[1], errors[2]), 1e-6);
    }

    /// <summary>
    /// Origin: worked. A form 0.01·(37V − 19V) with 1 K in each channel has a noise variance of 2e-4, on pure surfaces and between:
    /// at C = 0.5, sqrt(0.25·(25 − 2)e-4 + 0.25·(16 − 2)e-4 + 2e-4) = sqrt(11.25e-4) = 3.354 %; all of the file's scatter alone
    /// gives sqrt(10.25e-4) = 3.202 %.
    /// </summary>
    [Fact]
    public void Apply_LinearMethodHalfIce_IsTheWorkedError()
    {
        ErrorBudget budget = new(new Even(), File, new(new Dictionary<Channel, double> { [Channel.V19] = 1.0, [Channel.V37] = 1.0 }));
        float[] errors = new float[3];

        budget.Apply(new(3, [Channel.V19, Channel.V37]), new(0, 3), [0f, 0.5f, float.NaN], errors);

        Assert.Equal(Math.Sqrt(23e-4), budget.SurfaceScatter.OpenWaterFraction, 1e-12);
        Assert.Equal(Math.Sqrt(14e-4), budget.SurfaceScatter.ClosedIceFraction, 1e-12);
        Assert.Equal(0.05, errors[0], 1e-6);
        Assert.Equal(0.03354, errors[1], 5e-6);
        Assert.True(float.IsNaN(errors[2]));
    }

    /// <summary>
    /// Origin: worked. As above with an offset in 37V that is known to 2 K: (0.01·2)² = 4e-4 comes on top everywhere, and the scatter,
    /// which does not hold it, keeps what it had: sqrt(15.25e-4) = 3.905 % at C = 0.5. Without noise the file's scatter stays whole.
    /// </summary>
    [Fact]
    public void Apply_OffsetError_ComesOnTopOfTheScatter()
    {
        ChannelNoise offsets = new(new Dictionary<Channel, double> { [Channel.V37] = 2.0 });
        ErrorBudget noisy = new(new Even(), File, new(new Dictionary<Channel, double> { [Channel.V19] = 1.0, [Channel.V37] = 1.0 }), offsets);
        ErrorBudget quiet = new(new Even(), File, ChannelNoise.None, offsets);
        float[] errors = new float[2];

        noisy.Apply(new(2, [Channel.V19, Channel.V37]), new(0, 2), [0f, 0.5f], errors);
        Assert.Equal(Math.Sqrt(29e-4), errors[0], 1e-6);
        Assert.Equal(0.03905, errors[1], 5e-6);

        quiet.Apply(new(2, [Channel.V19, Channel.V37]), new(0, 2), [0f, 1f], errors);
        Assert.Equal(File, quiet.SurfaceScatter);
        Assert.Equal(Math.Sqrt(29e-4), errors[0], 1e-6);
        Assert.Equal(Math.Sqrt(20e-4), errors[1], 1e-6);
    }

    /// <summary>Origin: worked. 10 K in two channels is a variance of 2e-2, more than the file's: nothing is left to vary, and noise alone is the error.</summary>
    [Fact]
    public void Apply_MoreNoiseThanScatter_IsNoiseAlone()
    {
        ErrorBudget budget = new(new Even(), File, new(new Dictionary<Channel, double> { [Channel.V19] = 10.0, [Channel.V37] = 10.0 }));
        float[] errors = new float[2];

        budget.Apply(new(2, [Channel.V19, Channel.V37]), new(0, 2), [0f, 0.7f], errors);

        Assert.Equal(new(0.0, 0.0), budget.SurfaceScatter);
        Assert.All(errors, error => Assert.Equal(Math.Sqrt(2e-2), error, 1e-6));
    }

    /// <summary>Origin: worked. A method near the end of its range may give any variance; the error stays near 1.</summary>
    [Fact]
    public void CellScatter_NoiseBeyondOne_CountsAsOne()
    {
        float[] errors = [.. Enumerable.Repeat(4000f, 9), float.PositiveInfinity];

        CellScatter.Apply([.. Enumerable.Repeat(1f, 10)], File, errors, 0.0, errors);

        Assert.All(errors, error => Assert.Equal(Math.Sqrt(1.0016), error, 1e-6)); // 0.04² and 1.
    }

    /// <summary>Origin: worked. A cell set to open water has the noise of water, 0.03², whatever its temperatures: sqrt(0.05² + 0.03²).</summary>
    [Fact]
    public void CellScatter_ScreenedCell_HasTheNoiseOfWater()
    {
        float[] errors = [.. Enumerable.Repeat(0.25f, 10)];

        CellScatter.Apply(new float[10], File, errors, 0.0009, errors);

        Assert.All(errors, error => Assert.Equal(Math.Sqrt(0.0034), error, 1e-6));
    }

    /// <summary>Without noise, with noise of 0 K and with noise in a channel that the method does not use, every byte is the same.</summary>
    [Theory]
    [MemberData(nameof(Methods))]
    public void Retrieve_NoNoiseInItsChannels_GivesTheSameBytes(string name, Hemisphere hemisphere)
    {
        IConcentrationMethod method = TunedMethods.Create(name, hemisphere);
        ChannelNoise elsewhere = new(ChannelNames.All.Except(method.Channels).ToDictionary(channel => channel, _ => 3.0));
        ChannelNoise zero = new(ChannelNames.All.ToDictionary(channel => channel, _ => 0.0));

        (float[] total, float[] error) = Day(method, noise: null);
        float[] expected = new float[total.Length];
        CellScatter.Apply(total, File, expected);

        Assert.Equal(expected, error);
        Assert.Equal(error, Day(method, zero).Error);
        Assert.Equal(error, Day(method, elsewhere).Error);
        Assert.NotEqual(error, Day(method, TunedMethods.Noise).Error);
        Assert.Equal(total, Day(method, TunedMethods.Noise).Total);
    }

    /// <summary>A screened cell has the error of open water, noise included: 0.05 as the file says, whatever its temperatures.</summary>
    [Fact]
    public void Retrieve_ScreenedCell_HasTheErrorOfOpenWater()
    {
        NasaTeam method = new(TiePointSets.F13North);
        ChannelKelvins windy = new TiePoint(200.0, 150.0, 225.0).Kelvins; // GR(37/19) = 25/425 = 0.059, above 0.05.
        BrightnessPlanes observed = new(1, method.Channels);
        foreach (Channel channel in method.Channels)
        {
            observed.Kelvins(channel)[0] = (float)windy[channel];
        }

        ConcentrationPlanes day = new(1);
        DayRetrieval retrieval = new(method, new(0.05, null), File, Mask(1), noise: TunedMethods.Noise);
        RetrievalCounts counts = retrieval.Retrieve(observed, new CellConditions[1], day);

        Assert.Equal(1, counts.Gradient3719);
        Assert.Equal(0f, day.Total[0]);
        Assert.Equal(0.05, day.StandardError[0], 1e-6);
    }

    /// <summary>A cell that a coast correction empties has the error of open water too.</summary>
    [Fact]
    public void Retrieve_CoastCorrectedCell_HasTheErrorOfOpenWater()
    {
        NasaTeam method = new(TiePointSets.F13North);
        ChannelKelvins half = TunedMethods.Mixture(0.3, 0.2);
        ConcentrationPlanes day = new(1);

        new DayRetrieval(method, new(0.05, null), File, Mask(1), new Emptying(), noise: TunedMethods.Noise)
            .Retrieve(TunedMethods.Planes(half), new CellConditions[1], day);

        Assert.Equal(0.05, day.StandardError[0], 1e-6);
    }

    private static (float[] Total, float[] Error) Day(IConcentrationMethod method, ChannelNoise? noise)
    {
        const int Cells = 77;
        BrightnessPlanes observed = TunedMethods.Planes([.. Enumerable.Range(0, Cells).Select(cell => TunedMethods.Mixture((cell - 5) / 70.0, 0.05))]);
        ConcentrationPlanes day = new(Cells);
        new DayRetrieval(method, new(0.05, null), File, Mask(Cells), noise: noise).Retrieve(observed, new CellConditions[Cells], day);
        return (day.Total.ToArray(), day.StandardError.ToArray());
    }

    private static CellMask Mask(int cells)
    {
        Grid grid = new("row", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(cells, 1, 10_000.0, 0.0, 5_000.0));
        bool[] ocean = new bool[cells];
        Array.Fill(ocean, true);
        return new(grid, ocean, null);
    }

    /// <summary>Takes all ice away.</summary>
    private sealed class Emptying : ICoastStep
    {
        public int Correct(ConcentrationPlanes planes)
        {
            planes.Total.Clear();
            return planes.CellCount;
        }
    }

    /// <summary>A method that is one linear form, so that all can be worked by hand.</summary>
    private sealed class Even : IConcentrationMethod
    {
        private static readonly LinearForm Form = new(0.0, (Channel.V37, 0.01), (Channel.V19, -0.01));

        public string Name => "even";

        public string Source => "invented";

        public IReadOnlyList<Channel> Channels => Form.Channels;

        public bool SeparatesIceTypes => false;

        public PureTangents PureTangents => new(Form, Form, Form);

        public void Retrieve(BrightnessPlanes observed, CellRange cells, ConcentrationPlanes into) =>
            new LinearKernel(Form).Evaluate(observed, cells, cells.Of(into.Total));

        public LinearForm TangentAt(ChannelKelvins surface) => Form;

        public void WriteNoiseVariance(BrightnessPlanes observed, CellRange cells, ChannelNoise noise, Span<float> variance) =>
            variance.Fill((float)noise.VarianceOf(Form));
    }
}
