using IceExtent.Retrieval;

namespace IceExtent.Scenes.Emission;

/// <summary>Every physical constant of the ocean and air model, in one place.</summary>
/// <remarks>
/// Source: [Wentz2000], sections 2.3 to 2.6. <b>All of them are values from memory</b>: none was read in
/// print while this was written. They are checked only through what they give (see <c>OceanModelReferenceTests</c>):
/// open-water brightness temperatures that agree with published tie points to a few K. They belong to a published
/// formula, so they stand here and not in config/.
/// <para>
/// Departures: the cross terms r3, and r2 in horizontal polarization, are not known well enough and are left at
/// zero, which costs less than 0.1 K in polar conditions near 53°.
/// </para>
/// </remarks>
public static class OceanConstants
{
    /// <summary>The cold sky, in K.</summary>
    public const double SpaceKelvins = 2.7;

    /// <summary>W2 of the foam curve, in m/s.</summary>
    public const double StrongWindMetersPerSecond = 12.0;

    /// <summary>The largest variance of the sea's slopes.</summary>
    public const double LargestSlopeVariance = 0.069;

    /// <summary>The speed of light, in cm/s.</summary>
    public const double LightCentimetersPerSecond = 2.99792458e10;

    /// <summary>18.7 GHz.</summary>
    public static BandCoefficients Near19 { get; } = new()
    {
        FrequencyGigahertz = 18.7,
        DownwellingPolynomial = [240.24, 298.88e-2, -725.93e-4, 814.50e-6, -36.07e-7],
        SeaContrastShare = 0.61,
        UpwellingOffsetKelvins = -0.16,
        UpwellingKelvinsPerMillimeter = -1.69e-2,
        OxygenOpacity = 12.15e-3,
        OxygenOpacityPerKelvin = -0.61e-4,
        VaporOpacity = 1.73e-3,
        VaporOpacitySquared = -0.05e-5,
        CloudOpacity = 0.0556,
        CloudOpacityPerKelvin = 0.0288,
        Vertical = new(-0.49e-3, -0.53e-4, 0.48e-5, 0.00140, 0.00736, 3.0),
        Horizontal = new(1.13e-3, 0.70e-4, 0.0, 0.00293, 0.00656, 7.0),
    };

    /// <summary>23.8 GHz.</summary>
    public static BandCoefficients Near22 { get; } = new()
    {
        FrequencyGigahertz = 23.8,
        DownwellingPolynomial = [241.69, 310.32e-2, -814.29e-4, 998.93e-6, -48.37e-7],
        SeaContrastShare = 0.20,
        UpwellingOffsetKelvins = -0.20,
        UpwellingKelvinsPerMillimeter = -5.21e-2,
        OxygenOpacity = 15.75e-3,
        OxygenOpacityPerKelvin = -0.87e-4,
        VaporOpacity = 5.14e-3,
        VaporOpacitySquared = 0.19e-5,
        CloudOpacity = 0.0891,
        CloudOpacityPerKelvin = 0.0281,
        Vertical = new(-0.63e-3, -0.70e-4, 0.75e-5, 0.00178, 0.00730, 3.0),
        Horizontal = new(1.39e-3, 0.85e-4, 0.0, 0.00308, 0.00660, 7.0),
    };

    /// <summary>36.5 GHz.</summary>
    public static BandCoefficients Near37 { get; } = new()
    {
        FrequencyGigahertz = 36.5,
        DownwellingPolynomial = [239.45, 254.41e-2, -512.84e-4, 452.02e-6, -14.36e-7],
        SeaContrastShare = 0.58,
        UpwellingOffsetKelvins = -0.57,
        UpwellingKelvinsPerMillimeter = -2.38e-2,
        OxygenOpacity = 40.06e-3,
        OxygenOpacityPerKelvin = -2.00e-4,
        VaporOpacity = 1.88e-3,
        VaporOpacitySquared = 0.09e-5,
        CloudOpacity = 0.2027,
        CloudOpacityPerKelvin = 0.0261,
        Vertical = new(-1.01e-3, -1.05e-4, 1.27e-5, 0.00257, 0.00701, 3.0),
        Horizontal = new(1.91e-3, 1.12e-4, 0.0, 0.00329, 0.00660, 7.0),
    };

    /// <summary>The band that stands for a channel, or null where the model has none (89 GHz).</summary>
    /// <remarks>
    /// Departure: 18.0 to 19.35 GHz use the constants of 18.7 GHz, 21 to 23.8 those of 23.8, 37.0 those of 36.5.
    /// What that shifts in the mean is taken up by tying the surfaces to the sensor's own tie points
    /// (see <c>SurfaceEmission</c>); the sensitivity to vapor near 22 GHz stays that of 23.8 GHz.
    /// </remarks>
    public static BandCoefficients? BandOf(Channel channel) => channel switch
    {
        Channel.V19 or Channel.H19 => Near19,
        Channel.V22 => Near22,
        Channel.V37 or Channel.H37 => Near37,
        _ => null,
    };

    /// <summary>The polarization of a channel.</summary>
    public static Polarization PolarizationOf(Channel channel) =>
        channel is Channel.H19 or Channel.H37 or Channel.H89 ? Polarization.Horizontal : Polarization.Vertical;
}
