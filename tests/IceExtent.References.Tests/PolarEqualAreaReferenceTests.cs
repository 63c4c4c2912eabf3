using IceExtent.Grids;

namespace IceExtent.References.Tests;

/// <summary>Compares the equal-area map with print and with PROJ. Keys: docs/REFERENCES.md.</summary>
public sealed class PolarEqualAreaReferenceTests
{
    private static readonly PolarEqualArea Snyder = new(
        Ellipsoid.International1924, Hemisphere.North, originLongitudeDegrees: -100);

    /// <summary>Source: [Snyder1987] p. 333, value from memory, confirmed with PROJ 9.1.1; printed to 0.1 m.</summary>
    [Fact]
    [Trait("Reference", "Snyder1987")]
    public void Forward_SnyderPage333_AgreesToThePrintedDigits()
    {
        MapPosition position = Snyder.Forward(new(LatitudeDegrees: 80, LongitudeDegrees: 5));

        Assert.Equal(1_077_459.7, position.XMeters, tolerance: 0.05);
        Assert.Equal(288_704.5, position.YMeters, tolerance: 0.05);
    }

    /// <summary>Source: [Snyder1987] p. 333, read backwards.</summary>
    [Fact]
    [Trait("Reference", "Snyder1987")]
    public void Inverse_SnyderPage333_GivesTheRoundDegrees()
    {
        GeoPosition position = Snyder.Inverse(new(1_077_459.7, 288_704.5));

        Assert.Equal(80.0, position.LatitudeDegrees, tolerance: 1e-6);
        Assert.Equal(5.0, position.LongitudeDegrees, tolerance: 4e-6);
    }

    /// <summary>Origin: independent, PROJ 9.1.1, EPSG:6931. [Brodzik2012] gives the map.</summary>
    [Theory]
    [InlineData(60.0, 0.0, 0.0, -3_309_819.551)]
    [InlineData(45.0, 90.0, 4_889_334.803, 0.0)]
    [InlineData(0.0, 90.0, 9_009_964.761, 0.0)]
    public void Forward_NorthEqualAreaGrid_AgreesToTheMillimeter(double latitude, double longitude, double x, double y)
    {
        PolarEqualArea map = new(Ellipsoid.Wgs84, Hemisphere.North, originLongitudeDegrees: 0);

        MapPosition position = map.Forward(new(latitude, longitude));

        Assert.Equal(x, position.XMeters, tolerance: 5e-4);
        Assert.Equal(y, position.YMeters, tolerance: 5e-4);
    }

    /// <summary>
    /// Origin: printed. The surface of the WGS 84 ellipsoid, 510,065,621.724 km² (a published figure, value from memory);
    /// on an equal-area map half of it lies inside the circle of the equator.
    /// </summary>
    [Fact]
    public void Forward_Equator_EnclosesHalfOfTheEllipsoid()
    {
        PolarEqualArea map = new(Ellipsoid.Wgs84, Hemisphere.South, originLongitudeDegrees: 0);

        double radius = map.Forward(new(0.0, 0.0)).YMeters;

        Assert.Equal(510_065_621.724 / 2.0, Math.PI * radius * radius / 1e6, tolerance: 0.001);
    }
}
