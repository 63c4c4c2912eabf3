using IceExtent.Grids;

namespace IceExtent.Scenes.Demo;

/// <summary>The invented sea of the demonstration: its grid and its coasts. No real sea looks like it.</summary>
public static class InventedSea
{
    private static readonly Lazy<LandShare> DrawnLand = new(() => InventedCoast.Draw(Grid!));

    /// <summary>The grid: 160 × 160 cells of 25 km round the north pole, true to scale at 75 degrees north.</summary>
    /// <remarks>The same as config/demo/grids/tessivar-25km.toml (see <c>DemoFilesTests</c>).</remarks>
    public static Grid Grid { get; } = new(
        "tessivar-25km",
        epsg: null,
        new PolarStereographic(Ellipsoid.Wgs84, trueScaleLatitudeDegrees: 75.0, originLongitudeDegrees: 0.0),
        new(Columns: 160, Rows: 160, CellMeters: 25_000.0, LeftMeters: -2_000_000.0, TopMeters: 2_000_000.0));

    /// <summary>The share of land of every cell, in sixteenths. The cells below one half make one connected sea.</summary>
    public static LandShare Land => DrawnLand.Value;
}
