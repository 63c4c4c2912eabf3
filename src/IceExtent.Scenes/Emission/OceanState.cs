namespace IceExtent.Scenes.Emission;

/// <summary>An open sea and the air over it.</summary>
/// <param name="SeaKelvins">The temperature of the surface, in K.</param>
/// <param name="WindMetersPerSecond">The wind 10 m up, in m/s, 0 or more.</param>
/// <param name="VaporMillimeters">Water vapor of the whole column, in mm (kg/m²), 0 or more.</param>
/// <param name="CloudMillimeters">Liquid water of the clouds, in mm (kg/m²), 0 or more.</param>
public readonly record struct OceanState(
    double SeaKelvins, double WindMetersPerSecond, double VaporMillimeters, double CloudMillimeters);
