using IceExtent.Retrieval;

namespace IceExtent.Scenes.Emission;

/// <summary>The brightness temperature of the open sea through the air, one state at a time.</summary>
/// <remarks>
/// Source: [Wentz2000], sections 2.3 to 2.6, constants in <see cref="OceanConstants"/>. This is the plain
/// version that the fast one (<c>SceneEmission</c>) is measured against. Accuracy: 0.01 K against an
/// independent program (see <c>OceanModelReferenceTests</c>). Nothing checks its arguments.
/// </remarks>
/// <param name="incidenceDegrees">The angle from the vertical at which the sensor looks, in degrees.</param>
/// <param name="salinityPerMille">Of the sea, in parts per thousand.</param>
public sealed class OceanModel(double incidenceDegrees, double salinityPerMille)
{
    /// <summary>The angle from the vertical at which the sensor looks, in degrees.</summary>
    public double IncidenceDegrees { get; } = incidenceDegrees;

    /// <summary>Of the sea, in parts per thousand.</summary>
    public double SalinityPerMille { get; } = salinityPerMille;

    /// <summary>The air's opacity is divided by this: the cosine of the angle of incidence.</summary>
    public double PathCosine { get; } = Math.Cos(double.DegreesToRadians(incidenceDegrees));

    /// <summary>The brightness temperature of an open sea, in K.</summary>
    /// <exception cref="ArgumentException">The model has no constants for the channel.</exception>
    public double BrightnessKelvins(Channel channel, OceanState state)
    {
        BandCoefficients band = OceanConstants.BandOf(channel)
            ?? throw new ArgumentException($"The ocean model has no constants for {ChannelNames.NameOf(channel)}.", nameof(channel));
        return BrightnessKelvins(band, OceanConstants.PolarizationOf(channel), state);
    }

    /// <summary>The brightness temperature of an open sea, in K.</summary>
    public double BrightnessKelvins(BandCoefficients band, Polarization polarization, OceanState state)
    {
        AirColumn column = Column(band, state.SeaKelvins, state.VaporMillimeters, state.CloudMillimeters);
        double emissivity = Emissivity(band, polarization, state.SeaKelvins, state.WindMetersPerSecond);
        double sky = SkyKelvins(band, polarization, column, state.WindMetersPerSecond);
        return column.UpwellingKelvins
            + (column.Transmittance * ((emissivity * state.SeaKelvins) + ((1.0 - emissivity) * sky)));
    }

    /// <summary>The air over a surface, seen in one band.</summary>
    public AirColumn Column(BandCoefficients band, double seaKelvins, double vaporMillimeters, double cloudMillimeters)
    {
        ArgumentNullException.ThrowIfNull(band);
        double v = vaporMillimeters;
        IReadOnlyList<double> b = band.DownwellingPolynomial;
        double down = b[0] + (v * (b[1] + (v * (b[2] + (v * (b[3] + (v * b[4])))))))
            + (band.SeaContrastShare * Contrast(seaKelvins - TypicalSeaKelvins(v)));
        double up = down + band.UpwellingOffsetKelvins + (band.UpwellingKelvinsPerMillimeter * v);

        double cloudKelvins = (up + 273.0) / 2.0;
        double opacity = band.OxygenOpacity + (band.OxygenOpacityPerKelvin * (down - 270.0))
            + (band.VaporOpacity * v) + (band.VaporOpacitySquared * v * v)
            + (band.CloudOpacity * (1.0 - (band.CloudOpacityPerKelvin * (cloudKelvins - 283.0))) * cloudMillimeters);
        return new(down, up, Math.Exp(-opacity / PathCosine));
    }

    /// <summary>The share of power that a flat sea reflects, with the fitted correction in vertical polarization.</summary>
    public double CalmReflectivity(BandCoefficients band, Polarization polarization, double seaKelvins)
    {
        ArgumentNullException.ThrowIfNull(band);
        double reflectivity = SeaWater.Reflectivity(
            SeaWater.Permittivity(band.FrequencyGigahertz, seaKelvins, SalinityPerMille), IncidenceDegrees, polarization);
        double warm = seaKelvins - 273.0;
        return polarization == Polarization.Vertical
            ? reflectivity + 4.887e-8 - (6.108e-8 * warm * warm * warm)
            : reflectivity;
    }

    /// <summary>The emissivity of a sea roughened and foamed by wind. Unit: 1.</summary>
    public double Emissivity(BandCoefficients band, Polarization polarization, double seaKelvins, double windMetersPerSecond)
    {
        ArgumentNullException.ThrowIfNull(band);
        RoughnessCoefficients rough = band.In(polarization);
        double slope = rough.Slope + (rough.SlopePerDegree * (IncidenceDegrees - 53.0))
            + (rough.SlopePerKelvin * (seaKelvins - 288.0));
        double withoutFoam = CalmReflectivity(band, polarization, seaKelvins) - (slope * windMetersPerSecond);
        return 1.0 - ((1.0 - FoamEffect(rough, windMetersPerSecond)) * withoutFoam);
    }

    /// <summary>What a wind-roughened sea sees of the sky, in K: more than a flat one, for it also mirrors the lower sky.</summary>
    public static double SkyKelvins(BandCoefficients band, Polarization polarization, AirColumn column, double windMetersPerSecond)
    {
        ArgumentNullException.ThrowIfNull(band);
        double variance = Math.Min(
            SlopeVariancePerWind(band.FrequencyGigahertz) * windMetersPerSecond, OceanConstants.LargestSlopeVariance);
        double spread = variance - (70.0 * variance * variance * variance);
        double below37 = 37.0 - band.FrequencyGigahertz;
        double tau = column.Transmittance;
        double excess = polarization == Polarization.Vertical
            ? (2.5 + (0.018 * below37)) * spread * Math.Pow(tau, 3.4)
            : (6.2 - (0.001 * below37 * below37)) * spread * tau * tau;
        return ((1.0 + excess) * (1.0 - tau) * (column.DownKelvins - OceanConstants.SpaceKelvins))
            + OceanConstants.SpaceKelvins;
    }

    /// <summary>The variance of the sea's slopes that a band feels, per m/s of wind.</summary>
    public static double SlopeVariancePerWind(double frequencyGigahertz)
    {
        double factor = frequencyGigahertz < 37.0 ? 1.0 - (0.00748 * Math.Pow(37.0 - frequencyGigahertz, 1.3)) : 1.0;
        return 5.22e-3 * factor;
    }

    // The share of the reflection that foam takes away.
    private static double FoamEffect(RoughnessCoefficients rough, double wind)
    {
        double from = rough.FoamWindMetersPerSecond;
        const double To = OceanConstants.StrongWindMetersPerSecond;
        double gain = rough.FoamSlopeHigh - rough.FoamSlopeLow;
        return wind < from ? rough.FoamSlopeLow * wind
            : wind > To ? (rough.FoamSlopeHigh * wind) - (0.5 * gain * (To + from))
            : (rough.FoamSlopeLow * wind) + (0.5 * gain * (wind - from) * (wind - from) / (To - from));
    }

    // TV: the sea temperature that usually goes with a vapor column.
    private static double TypicalSeaKelvins(double vapor) =>
        vapor <= 48.0 ? 273.16 + (0.8337 * vapor) - (3.029e-5 * Math.Pow(vapor, 3.33)) : 301.16;

    // ζ: how far an unusual sea shifts the air's temperature, in K.
    private static double Contrast(double difference) =>
        Math.Abs(difference) <= 20.0
            ? 1.05 * difference * (1.0 - (difference * difference / 1200.0))
            : 14.0 * Math.Sign(difference);
}
