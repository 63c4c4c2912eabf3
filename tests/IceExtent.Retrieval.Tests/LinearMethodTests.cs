using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>Bootstrap and Bristol against worked lines and pixels.</summary>
public sealed class LinearMethodTests
{
    /// <summary>[Pedersen2015], SSM/I north: value from memory (medium).</summary>
    internal static SurfacePoints SsmiNorth { get; } = new(Point(185.04, 208.72, 149.39), Point(252.79, 244.68, 233.25), Point(223.64, 190.14, 179.68));

    /// <summary>Origin: worked; slope (233.25 − 179.68)/(244.68 − 190.14) and so on. Independent: NumPy 1.24.</summary>
    [Fact]
    public void Bootstrap_SsmiNorth_HasTheWorkedLines()
    {
        Bootstrap method = new(SsmiNorth, Hemisphere.North);

        Assert.Equal(0.982215, method.PolarizationMode.Slope, 6e-7);
        Assert.Equal(-7.0783, method.PolarizationMode.InterceptKelvins, 6e-5);
        Assert.Equal(0.534470, method.FrequencyMode.Slope, 6e-7);
        Assert.Equal(122.0159, method.FrequencyMode.InterceptKelvins, 6e-5);
    }

    /// <summary>Origin: independent, NumPy 1.24, over T19V 225, T37V 222, T37H 200 K.</summary>
    [Fact]
    public void Concentration_FreePixel_AgreesToTheLastDigit()
    {
        Bootstrap bootstrap = new(SsmiNorth, Hemisphere.North);
        ChannelKelvins pixel = Point(225, 222, 200);

        Assert.Equal(0.77393, bootstrap.PolarizationMode.Concentration(SsmiNorth.OpenWater).At(pixel), 6e-6);
        Assert.Equal(0.67715, bootstrap.FrequencyMode.Concentration(SsmiNorth.OpenWater).At(pixel), 6e-6);
        Assert.Equal(0.71149, new Bristol(SsmiNorth).Line.Concentration(SsmiNorth.OpenWater).At(pixel), 6e-6);
    }

    /// <summary>Origin: independent, NumPy 1.24.</summary>
    [Fact]
    public void Bristol_SsmiNorth_HasTheWorkedPoints()
    {
        Assert.Equal(461.97855, Bristol.Abscissa.At(SsmiNorth.OpenWater), 6e-6);
        Assert.Equal(35.02279, Bristol.Ordinate.At(SsmiNorth.OpenWater), 6e-6);
        Assert.Equal(621.14100, Bristol.Abscissa.At(SsmiNorth.FirstYear), 6e-6);
        Assert.Equal(102.78538, Bristol.Ordinate.At(SsmiNorth.FirstYear), 6e-6);
        Assert.Equal(495.31660, Bristol.Abscissa.At(SsmiNorth.Multiyear), 6e-6);
        Assert.Equal(104.01482, Bristol.Ordinate.At(SsmiNorth.Multiyear), 6e-6);
    }

    /// <summary>
    /// Origin: worked. The pixel's 37H of 200 K lies 0.982215 · 222 − 7.0783 − 200 = 10.97 K below the line: frequency
    /// mode. With 206.5 K it is 4.47 K below: polarisation mode. The south knows frequency mode only.
    /// </summary>
    [Theory]
    [InlineData(200.0, Hemisphere.North, false)]
    [InlineData(206.5, Hemisphere.North, true)]
    [InlineData(206.5, Hemisphere.South, false)]
    public void Bootstrap_DistanceFromTheLine_ChoosesTheMode(double h37, Hemisphere hemisphere, bool polarization)
    {
        Bootstrap method = new(SsmiNorth, hemisphere);
        IceLine line = polarization ? method.PolarizationMode : method.FrequencyMode;

        float[] total = Retrieve(method, 225, 222, h37, 0, 0);

        Assert.All(total, value => Assert.Equal(line.Concentration(SsmiNorth.OpenWater).At(Point(225, 222, h37)), value, 1e-5));
    }

    [Fact]
    public void Line_WaterOnIt_IsRefused()
    {
        ChannelKelvins first = Point(250, 245, 233);
        ChannelKelvins multi = Point(230, 195, 183);
        ChannelKelvins between = Point(240, 220, 208);

        Assert.Throws<ArgumentException>(() => new Bristol(new(between, first, multi)));
        Assert.Throws<ArgumentException>(() => new Bootstrap(new(between, first, first), Hemisphere.North));
    }

    /// <summary>
    /// Origin: printed (rounded coefficients of [Spreen2008]; value from memory, high) and independent (NumPy 1.24 solving the
    /// four conditions).
    /// </summary>
    [Fact]
    [Trait("Reference", "Spreen2008")]
    public void Polynomial89_PublishedPoints_GiveThePublishedCoefficients()
    {
        Polynomial89 method = new(new(47.0, 11.7));

        Assert.Equal(1.64002e-5, method.Coefficients[3], 6e-11);
        Assert.Equal(-1.61811e-3, method.Coefficients[2], 6e-9);
        Assert.Equal(1.91628e-2, method.Coefficients[1], 6e-8);
        Assert.Equal(0.971031, method.Coefficients[0], 6e-7);
        Assert.Equal([1.64, -16.0, 1.92, 0.971], [Math.Round(method.Coefficients[3] * 1e5, 2), Math.Round(method.Coefficients[2] * 1e4), Math.Round(method.Coefficients[1] * 1e2, 2), Math.Round(method.Coefficients[0], 3)]);
    }

    /// <summary>Origin: independent, NumPy 1.24 with the solved coefficients.</summary>
    [Theory]
    [InlineData(15, 0.9497)]
    [InlineData(20, 0.8382)]
    [InlineData(25, 0.6950)]
    [InlineData(30, 0.5324)]
    [InlineData(35, 0.3627)]
    [InlineData(40, 0.1982)]
    [InlineData(45, 0.0512)]
    [InlineData(47, 0.0)]
    [InlineData(60, 0.0)]
    [InlineData(11.7, 1.0)]
    [InlineData(5, 1.0)]
    public void Polynomial89_Differences_GiveTheWorkedConcentrations(double difference, double expected)
    {
        float[] total = Retrieve(new Polynomial89(new(47.0, 11.7)), 0, 0, 0, 200 + difference, 200);

        Assert.All(total, value => Assert.Equal(expected, value, 6e-5));
    }

    internal static ChannelKelvins Point(double v19, double v37, double h37) =>
        new(new Dictionary<Channel, double> { [Channel.V19] = v19, [Channel.V37] = v37, [Channel.H37] = h37 });

    // Thirty-five equal cells, so that vector loop and tail both run.
    private static float[] Retrieve(IConcentrationMethod method, double v19, double v37, double h37, double v89, double h89)
    {
        BrightnessPlanes observed = new(35, [Channel.V19, Channel.V37, Channel.H37, Channel.V89, Channel.H89]);
        observed.Kelvins(Channel.V19).Fill((float)v19);
        observed.Kelvins(Channel.V37).Fill((float)v37);
        observed.Kelvins(Channel.H37).Fill((float)h37);
        observed.Kelvins(Channel.V89).Fill((float)v89);
        observed.Kelvins(Channel.H89).Fill((float)h89);
        ConcentrationPlanes planes = new(35);
        method.Retrieve(observed, new(0, 35), planes);
        return planes.Total.ToArray();
    }
}
