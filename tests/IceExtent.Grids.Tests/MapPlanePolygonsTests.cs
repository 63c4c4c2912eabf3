using IceExtent.TestKit;
using NetTopologySuite.Geometries;
using NetTopologySuite.IO;

namespace IceExtent.Grids.Tests;

/// <summary>
/// Rings in longitude and latitude as people and files write them. Expected areas are worked: on an equal-area map
/// the cap beyond a parallel is a circle, whose radius the projection gives (itself tested against print).
/// </summary>
public sealed class MapPlanePolygonsTests
{
    private const double ChordShare = 1e-4; // Chords run up to 25 m inside an arc of some 1000 km.

    private static readonly Grid North = ConfigGrids.Get("north-25km-equal-area");
    private static readonly Grid South = ConfigGrids.Get("south-25km-equal-area");

    // The cap north of 80 degrees, five ways.
    public static TheoryData<string> Caps() =>
    [
        "POLYGON ((0 80, 90 80, 180 80, 270 80, 0 80))",
        "POLYGON ((0 80, -90 80, -180 80, 90 80, 0 80))",
        "POLYGON ((-180 80, -90 80, 0 80, 90 80, 180 80, 180 90, 90 90, 0 90, -90 90, -180 90, -180 80))",
        "POLYGON ((-180 80, -90 80, 0 80, 90 80, 180 80, 180 90, -180 90, -180 80))",
        "MULTIPOLYGON (((-180 80, -90 80, 0 80, 0 90, -180 80)), ((0 80, 90 80, 180 80, 0 90, 0 80)))",
    ];

    [Theory]
    [MemberData(nameof(Caps))]
    public void Project_CapRoundThePole_IsOneWholeCircle(string text)
    {
        Geometry cap = MapPlanePolygons.Project(North, Read(text));

        Assert.True(cap.IsValid);
        Assert.Equal(1.0, cap.Area / CapArea(North, 80), tolerance: ChordShare);
        Assert.Equal(1.0, ShareAt(North, cap, new(90, 0)));
        Assert.Equal(1.0, ShareAt(North, cap, new(85, 180)));
        Assert.Equal(0.0, ShareAt(North, cap, new(79, 180)));
    }

    // Everything south of 60 degrees south: round the pole without an end, closed along −90 in two ways, and cut in halves.
    public static TheoryData<string> SouthernCaps() =>
    [
        "POLYGON ((0 -60, 90 -60, 180 -60, 270 -60, 0 -60))",
        "POLYGON ((-180 -60, -90 -60, 0 -60, 90 -60, 180 -60, 180 -90, -180 -90, -180 -60))",
        "POLYGON ((-180 -60, -90 -60, 0 -60, 90 -60, 180 -60, 180 -90, 90 -90, 0 -90, -90 -90, -180 -90, -180 -60))",
        "MULTIPOLYGON (((-180 -60, -90 -60, 0 -60, 0 -90, -180 -90, -180 -60)), ((0 -60, 90 -60, 180 -60, 180 -90, 0 -90, 0 -60)))",
    ];

    [Theory]
    [MemberData(nameof(SouthernCaps))]
    public void Project_SouthernCapOnTheSouthernMap_IsOneWholeCircle(string text)
    {
        Geometry cap = MapPlanePolygons.Project(South, Read(text));

        Assert.Equal(1.0, cap.Area / CapArea(South, -60), tolerance: ChordShare);
        Assert.Equal(1.0, ShareAt(South, cap, new(-90, 0)));
        Assert.Equal(1.0, ShareAt(South, cap, new(-70, 180)));
        Assert.Equal(0.0, ShareAt(South, cap, new(-59, -90)));
    }

    /// <summary>The northern equal-area grid reaches far beyond the equator in its corners: there the southern cap is a ring around the map.</summary>
    [Theory]
    [MemberData(nameof(SouthernCaps))]
    public void Project_SouthernCapOnTheNorthernMap_IsTheRingOutside(string text)
    {
        double[] shares = PolygonShares.Compute(North.Frame, MapPlanePolygons.Project(North, Read(text)));

        double limit = North.Projection.Forward(new(-60, 0)).YMeters;
        for (int cell = 0; cell < shares.Length; cell += 7)
        {
            MapPosition center = North.CenterOf(cell);
            double distance = Math.Sqrt((center.XMeters * center.XMeters) + (center.YMeters * center.YMeters)) - Math.Abs(limit);
            if (Math.Abs(distance) > North.Frame.CellMeters)
            {
                Assert.Equal(distance > 0.0 ? 1.0 : 0.0, shares[cell]);
            }
        }
    }

    [Theory]
    [MemberData(nameof(SouthernCaps))]
    public void Project_SouthernCapOnTheNorthernStereographicMap_IsEmpty(string text) =>
        Assert.True(MapPlanePolygons.Project(ConfigGrids.Get("north-25km"), Read(text)).IsEmpty);

    /// <summary>Nothing of the ring itself lies on the grid, and yet the whole grid is inside it.</summary>
    [Theory]
    [InlineData("POLYGON ((0 20, 90 20, 180 20, 270 20, 0 20))")]
    [InlineData("POLYGON ((-180 -20, -90 -20, 0 -20, 90 -20, 180 -20, 180 90, -180 90, -180 -20))")]
    public void Project_CapWiderThanTheGrid_CoversEveryCell(string text)
    {
        Grid grid = ConfigGrids.Get("north-25km");

        double[] shares = PolygonShares.Compute(grid.Frame, MapPlanePolygons.Project(grid, Read(text)));

        Assert.All(shares, share => Assert.Equal(1.0, share));
    }

    [Fact]
    public void Project_BandWithARingAsItsHole_IsTheDifferenceOfTheCaps()
    {
        Geometry band = MapPlanePolygons.Project(
            North, Read("POLYGON ((0 60, 90 60, 180 60, 270 60, 0 60), (0 70, 90 70, 180 70, 270 70, 0 70))"));

        Assert.Equal(1.0, band.Area / (CapArea(North, 60) - CapArea(North, 70)), tolerance: ChordShare);
        Assert.Equal(0.0, ShareAt(North, band, new(90, 0)));
    }

    /// <summary>A quarter of a band, so that its long edges have to follow the parallels.</summary>
    [Fact]
    public void Project_LongEdges_FollowTheParallels()
    {
        Geometry quarter = MapPlanePolygons.Project(North, Read("POLYGON ((10 60, 100 60, 100 70, 10 70, 10 60))"));

        Assert.Equal(1.0, quarter.Area / (0.25 * (CapArea(North, 60) - CapArea(North, 70))), tolerance: ChordShare);
    }

    /// <summary>The same 20 degrees of longitude across the date line, written in five ways.</summary>
    [Theory]
    [InlineData("POLYGON ((170 60, -170 60, -170 70, 170 70, 170 60))")]
    [InlineData("POLYGON ((170 60, 190 60, 190 70, 170 70, 170 60))")]
    [InlineData("POLYGON ((-190 60, -190 70, -170 70, -170 60, -190 60))")]
    [InlineData("MULTIPOLYGON (((170 60, 180 60, 180 70, 170 70, 170 60)), ((-180 60, -170 60, -170 70, -180 70, -180 60)))")]
    [InlineData("POLYGON ((170 60, 180 60, -180 60, -170 60, -170 70, -180 70, 180 70, 170 70, 170 60))")]
    public void Project_AcrossTheDateLine_IsOnePieceWithoutASeam(string text)
    {
        Geometry area = MapPlanePolygons.Project(North, Read(text));

        Polygon piece = Assert.IsType<Polygon>(area);
        Assert.Empty(piece.Holes);
        Assert.Equal(1.0, piece.Area / (20.0 / 360.0 * (CapArea(North, 60) - CapArea(North, 70))), tolerance: ChordShare);
        Assert.Equal(1.0, ShareAt(North, area, new(65, 180)));
    }

    /// <summary>A sector with the pole as a corner, whatever longitude the pole is given.</summary>
    [Theory]
    [InlineData("POLYGON ((170 70, -170 70, 0 90, 170 70))")]
    [InlineData("POLYGON ((170 70, -170 70, -170 90, 170 90, 170 70))")]
    public void Project_SectorToThePole_HasStraightSides(string text)
    {
        foreach ((Grid grid, string ring) in ((Grid, string)[])[(North, text), (South, text.Replace(" 70", " -70", StringComparison.Ordinal).Replace(" 90", " -90", StringComparison.Ordinal))])
        {
            Geometry sector = MapPlanePolygons.Project(grid, Read(ring));

            Assert.Equal(1.0, sector.Area / (20.0 / 360.0 * CapArea(grid, 70)), tolerance: ChordShare);
        }
    }

    /// <summary>A band 20 degrees of latitude high that crosses itself in the middle: two triangles, both kept.</summary>
    [Fact]
    public void Project_RingThatCrossesItself_KeepsBothLobes()
    {
        Geometry lobes = MapPlanePolygons.Project(North, Read("POLYGON ((0 60, 20 70, 20 60, 0 70, 0 60))"));

        Assert.True(lobes.IsValid);
        Assert.Equal(1.0, ShareAt(North, lobes, new(65, 3)));
        Assert.Equal(1.0, ShareAt(North, lobes, new(65, 17)));
        Assert.Equal(0.0, ShareAt(North, lobes, new(61, 10)));
        Assert.Equal(0.0, ShareAt(North, lobes, new(69, 10)));
    }

    [Fact]
    public void Project_PolygonsThatOverlap_CountOnce()
    {
        Geometry area = MapPlanePolygons.Project(
            North, Read("MULTIPOLYGON (((0 60, 40 60, 40 70, 0 70, 0 60)), ((20 60, 60 60, 60 70, 20 70, 20 60)))"));

        Assert.Equal(1.0, area.Area / (60.0 / 360.0 * (CapArea(North, 60) - CapArea(North, 70))), tolerance: ChordShare);
    }

    [Theory]
    [InlineData("POLYGON EMPTY")]
    [InlineData("POLYGON ((0 60, 10 70, 0 60, 0 60))")]
    [InlineData("POLYGON ((-180 90, 180 90, 0 90, -180 90))")]
    [InlineData("LINESTRING (0 60, 10 70)")]
    public void Project_NoArea_IsEmpty(string text) => Assert.True(MapPlanePolygons.Project(North, Read(text)).IsEmpty);

    [Theory]
    [InlineData("POLYGON ((-180 60, 180 60, 180 70, -180 70, -180 60))")] // A band by its corners: every edge comes back on itself.
    [InlineData("POLYGON ((-180 80, 180 80, 180 90, -180 90, -180 80))")] // A cap by its corners.
    [InlineData("POLYGON ((0 60, 100 60, 100 70, 0 70, 0 60))")] // 100 degrees could be 260 the other way.
    [InlineData("POLYGON ((0 60, 180 60, 180 70, 0 70, 0 60))")]
    [InlineData("POLYGON ((0 60, 10 91, 20 60, 0 60))")]
    [InlineData("POLYGON ((0 60, NaN 70, 20 60, 0 60))")]
    public void Project_RingThatCannotBeRead_IsRefused(string text)
    {
        ArgumentException error = Assert.ThrowsAny<ArgumentException>(() => MapPlanePolygons.Project(North, Read(text)));

        Assert.Contains("longitude", error.Message, StringComparison.Ordinal);
    }

    /// <summary>Only what lies near the grid is kept, and the course of an edge that leaves it does not bend.</summary>
    [Fact]
    public void Project_EdgeThatLeavesTheNeighbourhood_KeepsItsCourse()
    {
        Grid grid = ConfigGrids.Get("north-25km");
        Geometry wedge = MapPlanePolygons.Project(grid, Read("POLYGON ((110 70, 170 -80, 190 -80, 130 70, 110 70))"));

        // At 40 degrees north a fifth of the way is behind: 12 degrees of longitude.
        Assert.Equal(0.0, ShareAt(grid, wedge, new(40, 121)));
        Assert.Equal(1.0, ShareAt(grid, wedge, new(40, 123)));
        Assert.Equal(1.0, ShareAt(grid, wedge, new(40, 141)));
        Assert.Equal(0.0, ShareAt(grid, wedge, new(40, 143)));
    }

    private static Geometry Read(string text) => new WKTReader().Read(text);

    private static double CapArea(Grid grid, double latitude)
    {
        double poleward = grid.Hemisphere == Hemisphere.North ? Math.Abs(latitude) : -Math.Abs(latitude);
        double radius = grid.Projection.Forward(new(poleward, 0)).YMeters;
        return Math.PI * radius * radius;
    }

    private static double ShareAt(Grid grid, Geometry polygons, GeoPosition position) =>
        PolygonShares.Compute(grid.Frame, polygons)[grid.CellAt(position) ?? throw new InvalidOperationException($"{position} is outside.")];
}
