namespace IceExtent.Grids.Outlines;

/// <summary>A named place, as a file gives it: a point, or a route of one line or several.</summary>
/// <param name="Name">The name in the <c>place</c> column.</param>
/// <param name="Title">The name for people.</param>
/// <param name="Lines">Lines straight in longitude and latitude, the short way round; a point is a line of one position.</param>
/// <param name="ReachMeters">How far round it cells belong to it, in m.</param>
public sealed record PlaceOutline(string Name, string Title, IReadOnlyList<IReadOnlyList<GeoPosition>> Lines, double ReachMeters)
{
    /// <summary>Whether it is a route.</summary>
    public bool IsRoute => Lines.Any(line => line.Count > 1);
}
