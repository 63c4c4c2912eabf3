using IceExtent.Grids;

namespace IceExtent.Scenes.Demo;

/// <summary>A part of the invented sea.</summary>
/// <param name="Key">The name in files, such as <c>drosmer-strait</c>.</param>
/// <param name="Name">The name for people.</param>
/// <param name="Ring">The outline on the map of <see cref="InventedSea.Grid"/>, in m; the last corner is not repeated.</param>
public sealed record InventedRegion(string Key, string Name, IReadOnlyList<MapPosition> Ring)
{
    private const double EdgeMeters = 2_000_000.0;
    private const double BeyondMeters = 2_060_000.0;

    /// <summary>The outline in longitude and latitude, with so many positions that lines straight there follow it; the first is not repeated.</summary>
    /// <remarks>Where it runs along the edge of the grid it is drawn a little outside, so that no cell there is cut.</remarks>
    public IReadOnlyList<GeoPosition> Outline()
    {
        MapPosition[] corners = [.. Ring.Append(Ring[0]).Select(corner => new MapPosition(Beyond(corner.XMeters), Beyond(corner.YMeters)))];
        return [.. InventedLines.Along(corners)];
    }

    private static double Beyond(double meters) => Math.Abs(meters) >= EdgeMeters ? Math.CopySign(BeyondMeters, meters) : meters;
}

/// <summary>The parts of the invented sea. Together they cover it, and no two overlap.</summary>
public static class InventedRegions
{
    /// <summary>Every region.</summary>
    public static IReadOnlyList<InventedRegion> All { get; } =
    [
        Region(
            "tessivar-deep", "Tessivar Deep",
            [
                (-2000, 1000), (-2000, 60), (-1220, 60), (-1220, -180), (-880, -900), (-560, -1200), (-200, -1000), (130, -1050),
                (240, -850), (1150, -330), (1150, 420), (420, 420), (420, 1150), (1200, 1150), (1200, 1500), (2000, 1500),
                (2000, 2000), (-850, 2000), (-850, 1350), (-1000, 1000),
            ]),
        Region("sound-of-ondalesk", "Sound of Ondalesk", [(-2000, 2000), (-2000, 1000), (-1000, 1000), (-850, 1350), (-850, 2000)]),
        Region("kivalde-bay", "Kivalde Bay", [(-2000, 60), (-2000, -330), (-1560, -330), (-1220, -180), (-1220, 60)]),
        Region(
            "gulf-of-umbraske", "Gulf of Umbraske",
            [(-2000, -330), (-2000, -2000), (-560, -2000), (-560, -1200), (-880, -900), (-1220, -180), (-1560, -330)]),
        Region("drosmer-strait", "Drosmer Strait", [(-560, -2000), (130, -2000), (130, -1050), (-200, -1000), (-560, -1200)]),
        Region(
            "ferrundel-basin", "Ferrundel Basin",
            [(130, -2000), (2000, -2000), (2000, -330), (1150, -330), (240, -850), (130, -1050)]),
        Region(
            "hessivane-channel", "Hessivane Channel",
            [(1150, -330), (2000, -330), (2000, 1500), (1200, 1500), (1200, 1150), (1150, 420)]),
        Region("pellavane-waters", "Pellavane Waters", [(420, 420), (1150, 420), (1200, 1150), (420, 1150)]),
    ];

    private static InventedRegion Region(string key, string name, (double X, double Y)[] kilometers) =>
        new(key, name, Array.ConvertAll(kilometers, at => new MapPosition(1000.0 * at.X, 1000.0 * at.Y)));
}
