namespace IceExtent.Scenes.Emission;

/// <summary>The constants of the ocean and air model in one frequency band; symbols as in [Wentz2000].</summary>
public sealed record BandCoefficients
{
    /// <summary>The frequency the constants were fitted at, in GHz.</summary>
    public required double FrequencyGigahertz { get; init; }

    /// <summary>b0 to b4: the effective temperature of the air seen from below, in K per mmⁿ of vapor.</summary>
    public required IReadOnlyList<double> DownwellingPolynomial { get; init; }

    /// <summary>b5: how much of the contrast between sea and air reaches the air's temperature. Unit: 1.</summary>
    public required double SeaContrastShare { get; init; }

    /// <summary>b6: the air seen from above less the air seen from below, in K.</summary>
    public required double UpwellingOffsetKelvins { get; init; }

    /// <summary>b7: the same difference per mm of vapor, in K/mm.</summary>
    public required double UpwellingKelvinsPerMillimeter { get; init; }

    /// <summary>aO1: opacity of oxygen at 270 K, in neper.</summary>
    public required double OxygenOpacity { get; init; }

    /// <summary>aO2: its change with the air's temperature, in neper/K.</summary>
    public required double OxygenOpacityPerKelvin { get; init; }

    /// <summary>aV1: opacity of vapor, in neper/mm.</summary>
    public required double VaporOpacity { get; init; }

    /// <summary>aV2: its quadratic part, in neper/mm².</summary>
    public required double VaporOpacitySquared { get; init; }

    /// <summary>aL1: opacity of cloud liquid at 283 K, in neper/mm.</summary>
    public required double CloudOpacity { get; init; }

    /// <summary>aL2: its relative change with the cloud's temperature, in 1/K.</summary>
    public required double CloudOpacityPerKelvin { get; init; }

    /// <summary>Wind effects in vertical polarization.</summary>
    public required RoughnessCoefficients Vertical { get; init; }

    /// <summary>Wind effects in horizontal polarization.</summary>
    public required RoughnessCoefficients Horizontal { get; init; }

    /// <summary>Wind effects in one polarization.</summary>
    public RoughnessCoefficients In(Polarization polarization) =>
        polarization == Polarization.Vertical ? Vertical : Horizontal;
}

/// <summary>What wind does to a sea surface in one band and polarization.</summary>
/// <param name="Slope">r0: change of reflectivity at 53° and 288 K, in s/m (sign as in the source).</param>
/// <param name="SlopePerDegree">r1: its change with the angle of incidence, in s/m per degree.</param>
/// <param name="SlopePerKelvin">r2: its change with the sea's temperature, in s/m per K.</param>
/// <param name="FoamSlopeLow">m1: foam effect in light wind, in s/m.</param>
/// <param name="FoamSlopeHigh">m2: foam effect in strong wind, in s/m.</param>
/// <param name="FoamWindMetersPerSecond">W1: the wind from which foam grows faster, in m/s.</param>
public sealed record RoughnessCoefficients(
    double Slope,
    double SlopePerDegree,
    double SlopePerKelvin,
    double FoamSlopeLow,
    double FoamSlopeHigh,
    double FoamWindMetersPerSecond);
