using IceExtent.Retrieval;
using IceExtent.Scenes.Parameters;

namespace IceExtent.Scenes.Emission;

/// <summary>The brightness temperature of a mixed cell, one cell at a time.</summary>
/// <remarks>
/// The emissivities follow from the sensor's tie points: at the reference state, a cell of one pure surface gives
/// exactly that surface's tie point. Away from it, water follows [Wentz2000] and ice its temperature, both
/// through the same air. At one state of air and surfaces the result is linear in the shares. This is the plain
/// version that <see cref="EmissionKernel"/> is measured against.
/// </remarks>
public sealed class SurfaceEmission
{
    private readonly ChannelSurfaces?[] surfaces = new ChannelSurfaces?[ChannelNames.All.Count];

    /// <summary>Finds the emissivities that fit a sensor.</summary>
    /// <param name="parameters">The reference state and the surfaces that tie points do not give.</param>
    /// <param name="incidenceDegrees">The angle from the vertical at which the sensor looks, in degrees.</param>
    /// <param name="sensor">The sensor's channels; those the ocean model does not know (89 GHz) are left out.</param>
    /// <param name="tiePoints">The sensor's tie points in the hemisphere of the scene.</param>
    /// <exception cref="ArgumentException">No emissivity from 0 to 1 gives a tie point at the reference state.</exception>
    public SurfaceEmission(SurfaceParameters parameters, double incidenceDegrees, Sensor sensor, TiePoints tiePoints)
    {
        ArgumentNullException.ThrowIfNull(parameters);
        ArgumentNullException.ThrowIfNull(sensor);
        ArgumentNullException.ThrowIfNull(tiePoints);
        Ocean = new(incidenceDegrees, parameters.SalinityPerMille);
        Channels = [.. ChannelNames.All.Where(channel =>
            sensor.FrequenciesGigahertz.ContainsKey(channel) && OceanConstants.BandOf(channel) is not null)];
        foreach (Channel channel in Channels)
        {
            surfaces[(int)channel] = Fit(parameters, channel, tiePoints);
        }
    }

    /// <summary>The open sea.</summary>
    public OceanModel Ocean { get; }

    /// <summary>The channels that can be made, in the order of the enumeration.</summary>
    public IReadOnlyList<Channel> Channels { get; }

    /// <summary>The emissivities in one channel.</summary>
    /// <exception cref="ArgumentException">The channel cannot be made.</exception>
    public ChannelSurfaces SurfacesIn(Channel channel) =>
        surfaces[(int)channel]
        ?? throw new ArgumentException($"There is no surface model for {ChannelNames.NameOf(channel)}.", nameof(channel));

    /// <summary>The brightness temperature of a cell, in K. Nothing checks the state.</summary>
    /// <exception cref="ArgumentException">The channel cannot be made.</exception>
    public double BrightnessKelvins(Channel channel, CellState cell)
    {
        ChannelSurfaces surface = SurfacesIn(channel);
        BandCoefficients band = OceanConstants.BandOf(channel)!;
        Polarization polarization = OceanConstants.PolarizationOf(channel);
        AirColumn column = Ocean.Column(band, cell.SeaKelvins, cell.VaporMillimeters, cell.CloudMillimeters);

        double water = surface.WaterShift
            + Ocean.Emissivity(band, polarization, cell.SeaKelvins, cell.WindMetersPerSecond);
        double waterSky = OceanModel.SkyKelvins(band, polarization, column, cell.WindMetersPerSecond);
        double firstYear = Mix(surface.FirstYear, surface.WetIce, cell.Wetness);
        double multiyear = Mix(surface.Multiyear, surface.WetIce, cell.Wetness);

        double dryShare = 1.0 - cell.PondShare;
        double sea = ((1.0 - (dryShare * (cell.FirstYear + cell.Multiyear))) * Emitted(water, cell.SeaKelvins, waterSky))
            + (dryShare * cell.FirstYear * Emitted(firstYear, cell.IceKelvins, column.SkyKelvins))
            + (dryShare * cell.Multiyear * Emitted(multiyear, cell.IceKelvins, column.SkyKelvins));
        double land = Emitted(surface.Land, cell.LandKelvins, column.SkyKelvins);
        return column.UpwellingKelvins + (column.Transmittance * Mix(sea, land, cell.LandShare));
    }

    private static double Mix(double first, double second, double shareOfSecond) =>
        first + (shareOfSecond * (second - first));

    // What leaves a surface: its own emission and the sky that it mirrors.
    private static double Emitted(double emissivity, double kelvins, double skyKelvins) =>
        (emissivity * kelvins) + ((1.0 - emissivity) * skyKelvins);

    private ChannelSurfaces Fit(SurfaceParameters parameters, Channel channel, TiePoints tiePoints)
    {
        ReferenceState at = parameters.Reference;
        BandCoefficients band = OceanConstants.BandOf(channel)!;
        Polarization polarization = OceanConstants.PolarizationOf(channel);
        AirColumn column = Ocean.Column(band, at.SeaKelvins, at.VaporMillimeters, at.CloudMillimeters);
        double waterSky = OceanModel.SkyKelvins(band, polarization, column, at.WindMetersPerSecond);

        double water = EmissivityFor(
            TieKelvins(tiePoints.OpenWater, parameters.OpenWater, channel), at.SeaKelvins, waterSky, column, channel);
        return new(
            WaterShift: water - Ocean.Emissivity(band, polarization, at.SeaKelvins, at.WindMetersPerSecond),
            FirstYear: EmissivityFor(
                TieKelvins(tiePoints.FirstYear, parameters.FirstYear, channel), at.IceKelvins, column.SkyKelvins, column, channel),
            Multiyear: EmissivityFor(
                TieKelvins(tiePoints.Multiyear, parameters.Multiyear, channel), at.IceKelvins, column.SkyKelvins, column, channel),
            WetIce: parameters.WetIceEmissivity[channel],
            Land: parameters.LandEmissivity[channel]);
    }

    private static double TieKelvins(TiePoint point, SurfaceDifferences more, Channel channel) => channel switch
    {
        Channel.V19 => point.V19Kelvins,
        Channel.H19 => point.H19Kelvins,
        Channel.V22 => point.V19Kelvins + more.V22AboveV19Kelvins,
        Channel.V37 => point.V37Kelvins,
        Channel.H37 => point.V37Kelvins + more.H37AboveV37Kelvins,
        _ => throw new ArgumentOutOfRangeException(nameof(channel), channel, "There is no tie point for this channel."),
    };

    private static double EmissivityFor(double tieKelvins, double kelvins, double skyKelvins, AirColumn column, Channel channel)
    {
        double leaving = (tieKelvins - column.UpwellingKelvins) / column.Transmittance;
        double emissivity = (leaving - skyKelvins) / (kelvins - skyKelvins);
        return emissivity is >= 0.0 and <= 1.0
            ? emissivity
            : throw new ArgumentException(string.Create(
                System.Globalization.CultureInfo.InvariantCulture,
                $"A tie point of {tieKelvins} K in {ChannelNames.NameOf(channel)} would need an emissivity of {emissivity:F3} at the reference state; it must lie in 0 to 1."));
    }
}
