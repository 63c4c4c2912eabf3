namespace IceExtent.Grids;

/// <summary>A map projection with a pole at its origin.</summary>
/// <remarks>Nothing checks its arguments: every member runs once a cell.</remarks>
public interface IMapProjection
{
    /// <summary>The figure of the Earth.</summary>
    Ellipsoid Ellipsoid { get; }

    /// <summary>The pole in the middle of the map.</summary>
    Hemisphere Hemisphere { get; }

    /// <summary>The meridian on which x is zero: −y in the north, +y in the south. Degrees east.</summary>
    double OriginLongitudeDegrees { get; }

    /// <summary>Projects a position onto the map plane.</summary>
    MapPosition Forward(GeoPosition position);

    /// <summary>Turns a position on the map plane back into latitude and longitude (−180 to 180).</summary>
    GeoPosition Inverse(MapPosition position);

    /// <summary>How many times larger an area is on the map than on the ellipsoid, without unit.</summary>
    /// <param name="latitudeDegrees">Degrees north; the scale of a polar map depends on nothing else.</param>
    double ArealScale(double latitudeDegrees);
}
