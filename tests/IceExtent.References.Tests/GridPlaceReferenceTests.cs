using IceExtent.Grids;
using IceExtent.TestKit;

namespace IceExtent.References.Tests;

/// <summary>Where the corners and cells of the built-in grids lie.</summary>
public sealed class GridPlaceReferenceTests
{
    /// <summary>
    /// Outer corners in degrees north and east. Origin: the published corner list, a value from memory (two decimals),
    /// to four decimals by PROJ 9.1.1 with EPSG:3411 and EPSG:3412.
    /// </summary>
    [Theory]
    [InlineData("north-25km", 0, 0, 30.9806, 168.3497)]
    [InlineData("north-25km", 1, 0, 31.3653, 102.3391)]
    [InlineData("north-25km", 1, 1, 34.3454, 350.0279)]
    [InlineData("north-25km", 0, 1, 33.9250, 279.2602)]
    [InlineData("south-25km", 0, 0, -39.2309, 317.7591)]
    [InlineData("south-25km", 1, 0, -39.2309, 42.2409)]
    [InlineData("south-25km", 1, 1, -41.4470, 135.0000)]
    [InlineData("south-25km", 0, 1, -41.4470, 225.0000)]
    public void Inverse_Corner_IsWhereItWasPublished(string name, int right, int down, double latitude, double longitude)
    {
        Grid grid = ConfigGrids.Get(name);
        GridFrame frame = grid.Frame;

        GeoPosition corner = grid.Projection.Inverse(new(
            frame.LeftMeters + (right * frame.Columns * frame.CellMeters),
            frame.TopMeters - (down * frame.Rows * frame.CellMeters)));

        Assert.Equal(latitude, corner.LatitudeDegrees, tolerance: 5.1e-5);
        Assert.Equal(0.0, Math.IEEERemainder(corner.LongitudeDegrees - longitude, 360.0), tolerance: 5.1e-5);
    }

    /// <summary>Origin: independent, PROJ 9.1.1; printed to four decimals.</summary>
    [Theory]
    [InlineData("north-25km", 0, 0, 31.1027, 168.3204)]
    [InlineData("south-25km", 0, 0, -39.3649, 317.7674)]
    [InlineData("north-25km", 100, 100, 57.6615, 156.8384)]
    [InlineData("south-25km", 100, 100, -68.7028, -38.0365)]
    public void PositionOf_NamedCell_AgreesToFourDecimals(string name, int row, int column, double latitude, double longitude)
    {
        Grid grid = ConfigGrids.Get(name);

        GeoPosition center = grid.PositionOf((row * grid.Columns) + column);

        Assert.Equal(latitude, center.LatitudeDegrees, tolerance: 5.1e-5);
        Assert.Equal(0.0, Math.IEEERemainder(center.LongitudeDegrees - longitude, 360.0), tolerance: 5.1e-5);
    }

    /// <summary>Origin: read in print for 25 and 12.5 km; 6.25 km worked: four times as many.</summary>
    [Theory]
    [InlineData("north-25km", 304, 448)]
    [InlineData("south-25km", 316, 332)]
    [InlineData("north-12.5km", 608, 896)]
    [InlineData("south-12.5km", 632, 664)]
    [InlineData("north-6.25km", 1216, 1792)]
    [InlineData("south-6.25km", 1264, 1328)]
    public void Grid_BothEllipsoids_HasThePublishedShape(string name, int columns, int rows)
    {
        foreach (string variant in (string[])[name, name + "-wgs84"])
        {
            Grid grid = ConfigGrids.Get(variant);

            Assert.Equal((columns, rows), (grid.Columns, grid.Rows));
        }
    }

    /// <summary>Origin: worked. 720 cells of 25 km are 18,000 km, half of them on each side of the pole.</summary>
    [Theory]
    [InlineData("north-25km-equal-area")]
    [InlineData("south-25km-equal-area")]
    public void Grid_EqualArea_SpansNineThousandKilometersToEachSide(string name)
    {
        GridFrame frame = ConfigGrids.Get(name).Frame;

        Assert.Equal(new GridFrame(720, 720, 25_000.0, -9_000_000.0, 9_000_000.0), frame);
    }

    /// <summary>Origin: worked from the rule that names, hemispheres and signs say the same thing in every file.</summary>
    [Theory]
    [MemberData(nameof(Names))]
    public void ConfigGrid_EveryFile_AgreesWithItself(string name)
    {
        Dictionary<string, string> keys = ConfigGrids.Read(name);
        Grid grid = ConfigGrids.Get(name);

        Assert.StartsWith(keys["hemisphere"], name, StringComparison.Ordinal);
        Assert.Equal(keys["hemisphere"] == "north" ? Hemisphere.North : Hemisphere.South, grid.Hemisphere);
        Assert.Equal($"../land/{name}.nc", keys["land"]);
        Assert.Equal(keys["projection"] == "polar-equal-area", !keys.ContainsKey("true_scale_latitude"));
        Assert.Equal(
            name.Contains("wgs84", StringComparison.Ordinal) || name.Contains("equal", StringComparison.Ordinal)
                ? Ellipsoid.Wgs84
                : Ellipsoid.Hughes1980,
            grid.Projection.Ellipsoid);
    }

    public static TheoryData<string> Names() => [.. ConfigGrids.Names];
}
