using System.Numerics;

namespace IceExtent.Scenes.Emission;

/// <summary>How sea water answers to microwaves. Source: [Wentz2000] section 2.4; values from memory.</summary>
public static class SeaWater
{
    private const double OpticalLimit = 4.44;   // Permittivity at infinite frequency.
    private const double ColeColeSpread = 0.012;
    private const double MeltingKelvins = 273.15;

    /// <summary>The relative permittivity of sea water, ε' − jε''.</summary>
    /// <param name="frequencyGigahertz">In GHz.</param>
    /// <param name="kelvins">The water's temperature, in K.</param>
    /// <param name="salinityPerMille">Dissolved salt, in parts per thousand.</param>
    /// <remarks>Accuracy: 1e-3 against an independent program (see <c>SeaWaterReferenceTests</c>).</remarks>
    public static Complex Permittivity(double frequencyGigahertz, double kelvins, double salinityPerMille)
    {
        double t = kelvins - MeltingKelvins;
        double s = salinityPerMille;
        double wavelength = OceanConstants.LightCentimetersPerSecond / (frequencyGigahertz * 1e9);

        double still = 87.90 * Math.Exp(-0.004585 * t)
            * Math.Exp((-3.45e-3 * s) + (4.69e-6 * s * s) + (1.36e-5 * s * t));
        double relaxation = (3.30 * Math.Exp((-0.0346 * t) + (0.00017 * t * t)))
            - (6.54e-3 * (1.0 - (3.06e-2 * t) + (2.0e-4 * t * t)) * s);

        Complex turning = Complex.Pow(new Complex(0.0, relaxation / wavelength), 1.0 - ColeColeSpread);
        return OpticalLimit
            + ((still - OpticalLimit) / (1.0 + turning))
            - new Complex(0.0, 2.0 * Conductivity(t, s) * wavelength / OceanConstants.LightCentimetersPerSecond);
    }

    /// <summary>The share of power that a flat surface reflects. Unit: 1.</summary>
    /// <param name="permittivity">Of the water, relative.</param>
    /// <param name="incidenceDegrees">From the vertical, in degrees.</param>
    /// <param name="polarization">The plane of the wave.</param>
    /// <remarks>Fresnel's formulas.</remarks>
    public static double Reflectivity(Complex permittivity, double incidenceDegrees, Polarization polarization)
    {
        double angle = double.DegreesToRadians(incidenceDegrees);
        double cosine = Math.Cos(angle);
        double sine = Math.Sin(angle);
        Complex root = Complex.Sqrt(permittivity - (sine * sine));
        Complex first = polarization == Polarization.Vertical ? permittivity * cosine : cosine;
        Complex amplitude = (first - root) / (first + root);
        return (amplitude.Real * amplitude.Real) + (amplitude.Imaginary * amplitude.Imaginary);
    }

    // In 1/s; t in °C, s in parts per thousand.
    private static double Conductivity(double t, double s)
    {
        double chlorinity = 0.5536 * s;
        double below25 = 25.0 - t;
        double decay = 2.03e-2 + (1.27e-4 * below25) + (2.46e-6 * below25 * below25)
            - (chlorinity * (3.34e-5 - (4.60e-7 * below25) + (4.60e-8 * below25 * below25)));
        return 3.39e9 * Math.Pow(chlorinity, 0.892) * Math.Exp(-below25 * decay);
    }
}
