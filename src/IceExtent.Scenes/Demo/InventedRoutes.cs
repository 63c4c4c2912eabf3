using IceExtent.Grids;

namespace IceExtent.Scenes.Demo;

/// <summary>A way of ships across the invented sea.</summary>
/// <param name="Key">The name in files.</param>
/// <param name="Name">The name for people.</param>
/// <param name="Course">Positions close enough that lines straight in longitude and latitude follow it.</param>
public sealed record InventedRoute(string Key, string Name, IReadOnlyList<GeoPosition> Course);

/// <summary>The routes of the invented sea.</summary>
public static class InventedRoutes
{
    /// <summary>Every route.</summary>
    public static IReadOnlyList<InventedRoute> All { get; } =
    [
        Route(
            "yarrosk-passage",
            "Yarrosk Passage, from Port Trunnel round Cape Yarrosk to Ilmosk",
            [(-312.5, -1637.5), (-137.5, -1512.5), (400, -1400), (900, -900), (1100, -450), (1300, 100), (1612.5, 312.5)]),
    ];

    private static InventedRoute Route(string key, string name, (double X, double Y)[] kilometers)
    {
        MapPosition[] corners = Array.ConvertAll(kilometers, at => new MapPosition(1000.0 * at.X, 1000.0 * at.Y));
        return new(key, name, [.. InventedLines.Along(corners), InventedSea.Grid.Projection.Inverse(corners[^1])]);
    }
}
