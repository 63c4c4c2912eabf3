using System.Numerics;
using IceExtent.Retrieval;
using static System.Numerics.Vector;

namespace IceExtent.Scenes.Emission;

/// <summary>One channel of an <see cref="EmissionKernel"/>: what a few cells send to the sensor.</summary>
internal sealed class ChannelLayer
{
    private readonly ChannelSurfaces surface;
    private readonly RoughnessCoefficients rough;
    private readonly NewtonPolynomial calmReflectivity;
    private readonly bool vertical;
    private readonly float skyFactor;
    private readonly float slope;

    public ChannelLayer(SurfaceEmission surfaces, Channel channel, double lowestSeaKelvins, double highestSeaKelvins)
    {
        Channel = channel;
        BandCoefficients band = OceanConstants.BandOf(channel)!;
        Polarization polarization = OceanConstants.PolarizationOf(channel);
        OceanModel ocean = surfaces.Ocean;
        surface = surfaces.SurfacesIn(channel);
        rough = band.In(polarization);
        calmReflectivity = NewtonPolynomial.Fit(
            kelvins => ocean.CalmReflectivity(band, polarization, kelvins), lowestSeaKelvins, highestSeaKelvins);
        vertical = polarization == Polarization.Vertical;
        double below37 = 37.0 - band.FrequencyGigahertz;
        skyFactor = (float)(vertical ? 2.5 + (0.018 * below37) : 6.2 - (0.001 * below37 * below37));
        slope = (float)(rough.Slope + (rough.SlopePerDegree * (ocean.IncidenceDegrees - 53.0)));
    }

    public Channel Channel { get; }

    /// <summary>The brightness temperature above the air, in K.</summary>
    public Vector<float> Leaving(CellPlanes cells, int cell, in EmissionKernel.Column column, Vector<float> land)
    {
        Vector<float> sky = column.Glow + Of(OceanConstants.SpaceKelvins);
        Vector<float> firstYear = new(cells.FirstYear, cell);
        Vector<float> multiyear = new(cells.Multiyear, cell);
        Vector<float> dry = Vector<float>.One - new Vector<float>(cells.PondShare, cell);
        Vector<float> wet = new(cells.Wetness, cell);
        Vector<float> ice = dry * (firstYear + multiyear);

        Vector<float> dryEmissivity = (firstYear * Of(surface.FirstYear)) + (multiyear * Of(surface.Multiyear));
        Vector<float> iceEmissivity = (dry * dryEmissivity * (Vector<float>.One - wet)) + (ice * wet * Of(surface.WetIce));
        Vector<float> fromIce = (ice * sky) + (iceEmissivity * (new Vector<float>(cells.IceKelvins, cell) - sky));
        Vector<float> fromWater = (Vector<float>.One - ice) * Water(new(cells.SeaKelvins, cell), column);
        Vector<float> fromLand = sky + (Of(surface.Land) * (new Vector<float>(cells.LandKelvins, cell) - sky));

        Vector<float> fromSea = fromIce + fromWater;
        return column.Upwelling + (column.Tau * (fromSea + (land * (fromLand - fromSea))));
    }

    private Vector<float> Water(Vector<float> seaKelvins, in EmissionKernel.Column column)
    {
        Vector<float> slopeHere = Of(slope) + (Of(rough.SlopePerKelvin) * (seaKelvins - Of(288.0)));
        Vector<float> withoutFoam = calmReflectivity.At(seaKelvins) - (slopeHere * column.Wind);
        Vector<float> reflectivity = ((Vector<float>.One - Foam(column.Wind)) * withoutFoam) - Of(surface.WaterShift);

        Vector<float> tauPower = vertical ? Exp(Of(3.4) * column.LogTau) : column.Tau * column.Tau;
        Vector<float> sky = (column.Glow * (Vector<float>.One + (Of(skyFactor) * column.Spread * tauPower)))
            + Of(OceanConstants.SpaceKelvins);
        return seaKelvins + (reflectivity * (sky - seaKelvins));
    }

    // The foam curve without branches: a line, plus half a square between the two winds, plus a line above.
    private Vector<float> Foam(Vector<float> wind)
    {
        double from = rough.FoamWindMetersPerSecond;
        const double To = OceanConstants.StrongWindMetersPerSecond;
        double gain = rough.FoamSlopeHigh - rough.FoamSlopeLow;
        Vector<float> between = Min(Max(wind - Of(from), Vector<float>.Zero), Of(To - from));
        return (Of(rough.FoamSlopeLow) * wind) + (Of(0.5 * gain / (To - from)) * between * between)
            + (Of(gain) * Max(wind - Of(To), Vector<float>.Zero));
    }

    private static Vector<float> Of(double value) => new((float)value);
}
