namespace IceExtent.Grids;

/// <summary>Which pole a grid, a tie point or a total belongs to.</summary>
public enum Hemisphere
{
    /// <summary>North of the equator.</summary>
    North,

    /// <summary>South of the equator.</summary>
    South,
}
