using CsCheck;
using IceExtent.TestKit;

namespace IceExtent.Grids.Tests;

public sealed class GridTests
{
    private static readonly PolarStereographic Map = new(Ellipsoid.Wgs84, 70, 0);

    [Theory]
    [MemberData(nameof(Names))]
    public void CellAt_CenterOfAnyCell_IsThatCell(string name)
    {
        Grid grid = ConfigGrids.Get(name);

        Gen.Int[0, grid.CellCount - 1].Sample(cell => grid.CellAt(grid.PositionOf(cell)) == cell);
    }

    /// <summary>Origin: worked. Two columns and two rows of 10 m around the pole; an edge belongs to the right and below.</summary>
    [Theory]
    [InlineData(-10, 10, 0)]
    [InlineData(0, 10, 1)]
    [InlineData(-10, 0, 2)]
    [InlineData(0, 0, 3)]
    [InlineData(9.999, -9.999, 3)]
    [InlineData(-10.001, 5, null)]
    [InlineData(10, 5, null)]
    [InlineData(5, 10.001, null)]
    [InlineData(5, -10, null)]
    [InlineData(double.NaN, 0, null)]
    public void CellAt_PlaceOnAnEdge_BelongsToTheRightAndBelow(double x, double y, int? expected)
    {
        Grid grid = new("small", null, Map, new(Columns: 2, Rows: 2, CellMeters: 10, LeftMeters: -10, TopMeters: 10));

        Assert.Equal(expected, grid.CellAt(new MapPosition(x, y)));
    }

    [Theory]
    [InlineData(0, 1, 10)]
    [InlineData(1, 0, 10)]
    [InlineData(1, 1, 0)]
    [InlineData(1, 1, double.NaN)]
    [InlineData(1, 1, double.PositiveInfinity)]
    public void Constructor_FrameWithoutCells_IsRefused(int columns, int rows, double cellMeters) =>
        Assert.Throws<ArgumentException>(() => new Grid("none", null, Map, new(columns, rows, cellMeters, 0, 0)));

    [Theory]
    [InlineData(0)]
    [InlineData(90)]
    [InlineData(-90)]
    [InlineData(double.NaN)]
    public void Constructor_TrueScaleAtPoleOrEquator_IsRefused(double latitude) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new PolarStereographic(Ellipsoid.Wgs84, latitude, 0));

    [Theory]
    [InlineData(180, 180)]
    [InlineData(-180, 180)]
    [InlineData(540, 180)]
    [InlineData(-190, 170)]
    [InlineData(359, -1)]
    public void Normalize_AnyTurn_IsAboveMinus180UpTo180(double longitude, double expected) =>
        Assert.Equal(expected, Longitudes.Normalize(longitude));

    /// <summary>Origin: printed, [EPSG] ellipsoid 7030: the polar radius of WGS 84 is 6356752.314 m, e² 0.00669437999.</summary>
    [Fact]
    public void Ellipsoid_Wgs84_HasThePublishedPolarRadius()
    {
        Assert.Equal(6_356_752.314, Ellipsoid.Wgs84.SemiMinorAxisMeters, tolerance: 5e-4);
        Assert.Equal(0.006_694_379_99, Ellipsoid.Wgs84.SquaredEccentricity, tolerance: 5e-12);
    }

    /// <summary>Origin: read in print: Hughes 1980 has b = 6356889.449 m and e = 0.08181615; e² = 0.006693883 is often quoted.</summary>
    [Fact]
    public void Ellipsoid_Hughes1980_HasThePublishedPolarRadius()
    {
        Assert.Equal(6_356_889.449, Ellipsoid.Hughes1980.SemiMinorAxisMeters, tolerance: 5e-4);
        Assert.Equal(0.08181615, Ellipsoid.Hughes1980.Eccentricity, tolerance: 5e-9);
        Assert.Equal(0.006_693_883, Ellipsoid.Hughes1980.SquaredEccentricity, tolerance: 5e-10);
    }

    public static TheoryData<string> Names() => [.. ConfigGrids.Names];
}
