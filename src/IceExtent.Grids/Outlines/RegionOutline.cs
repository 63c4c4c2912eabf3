using NetTopologySuite.Geometries;

namespace IceExtent.Grids.Outlines;

/// <summary>A named part of the sea, as a file draws it.</summary>
/// <param name="Name">The name in the <c>region</c> column.</param>
/// <param name="Title">The name for people.</param>
/// <param name="Set">The name of the set it belongs to: that of its file.</param>
/// <param name="LongitudeLatitude">A polygon or a set of them; x is the longitude, y the latitude, in degrees.</param>
public sealed record RegionOutline(string Name, string Title, string Set, Geometry LongitudeLatitude);
