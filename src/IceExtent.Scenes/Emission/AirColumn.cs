namespace IceExtent.Scenes.Emission;

/// <summary>The air over a cell as one band sees it.</summary>
/// <param name="DownKelvins">TD: effective temperature of the air seen from below, in K.</param>
/// <param name="UpKelvins">TU: effective temperature of the air seen from above, in K.</param>
/// <param name="Transmittance">τ along the slanted path, 0 to 1.</param>
public readonly record struct AirColumn(double DownKelvins, double UpKelvins, double Transmittance)
{
    /// <summary>What the air itself sends up, in K.</summary>
    public double UpwellingKelvins => UpKelvins * (1.0 - Transmittance);

    /// <summary>What comes down onto the surface, the cold sky through the air included, in K.</summary>
    public double SkyKelvins =>
        ((1.0 - Transmittance) * (DownKelvins - OceanConstants.SpaceKelvins)) + OceanConstants.SpaceKelvins;
}
