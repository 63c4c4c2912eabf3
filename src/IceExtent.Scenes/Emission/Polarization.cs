namespace IceExtent.Scenes.Emission;

/// <summary>The plane in which a channel receives.</summary>
public enum Polarization
{
    /// <summary>The electric field swings in the plane of incidence.</summary>
    Vertical,

    /// <summary>The electric field swings across the plane of incidence.</summary>
    Horizontal,
}
