using IceExtent.Grids;

namespace IceExtent.References.Tests;

/// <summary>Compares the projection with worked examples from print. Keys: docs/REFERENCES.md.</summary>
/// <remarks>
/// The digits of [Snyder1987] are values from memory that a computation of the printed formulas confirms to the last
/// digit; those of [EPSG] guidance note 7-2 were read in print. Tolerance: half a unit of the last printed digit.
/// </remarks>
public sealed class PolarStereographicReferenceTests
{
    private const double FalseEasting = 6_000_000;
    private const double FalseNorthing = 6_000_000;

    private static readonly PolarStereographic Snyder = new(
        Ellipsoid.International1924, trueScaleLatitudeDegrees: -71, originLongitudeDegrees: -100);

    private static readonly PolarStereographic Epsg = new(
        Ellipsoid.Wgs84, trueScaleLatitudeDegrees: -71, originLongitudeDegrees: 70);

    /// <summary>Source: [Snyder1987] p. 314; printed to 0.1 m.</summary>
    [Fact]
    [Trait("Reference", "Snyder1987")]
    public void Forward_SnyderPage314_AgreesToThePrintedDigits()
    {
        MapPosition position = Snyder.Forward(new(LatitudeDegrees: -75, LongitudeDegrees: 150));

        Assert.Equal(-1_540_033.6, position.XMeters, tolerance: 0.05);
        Assert.Equal(-560_526.4, position.YMeters, tolerance: 0.05);
    }

    /// <summary>Source: [Snyder1987] p. 314, read backwards; 0.05 m are 5e-7 degrees of latitude, 2e-6 of longitude.</summary>
    [Fact]
    [Trait("Reference", "Snyder1987")]
    public void Inverse_SnyderPage314_GivesTheRoundDegrees()
    {
        GeoPosition position = Snyder.Inverse(new(-1_540_033.6, -560_526.4));

        Assert.Equal(-75.0, position.LatitudeDegrees, tolerance: 1e-6);
        Assert.Equal(150.0, position.LongitudeDegrees, tolerance: 3e-6);
    }

    /// <summary>Source: [Snyder1987] p. 314; printed to seven digits.</summary>
    [Fact]
    [Trait("Reference", "Snyder1987")]
    public void ScaleFactor_SnyderPage314_AgreesToThePrintedDigits() =>
        Assert.Equal(0.9896256, Snyder.ScaleFactor(-75), tolerance: 5e-8);

    /// <summary>Source: [EPSG] guidance note 7-2, method 9829, worked example; printed to 0.01 m.</summary>
    [Fact]
    [Trait("Reference", "EPSG-G7-2")]
    public void Forward_EpsgMethod9829_AgreesToTheCentimeter()
    {
        MapPosition position = Epsg.Forward(new(LatitudeDegrees: -75, LongitudeDegrees: 120));

        Assert.Equal(7_255_380.79, position.XMeters + FalseEasting, tolerance: 0.005);
        Assert.Equal(7_053_389.56, position.YMeters + FalseNorthing, tolerance: 0.005);
    }

    /// <summary>Source: [EPSG] guidance note 7-2, method 9829, worked example, reverse.</summary>
    [Fact]
    [Trait("Reference", "EPSG-G7-2")]
    public void Inverse_EpsgMethod9829_GivesTheRoundDegrees()
    {
        GeoPosition position = Epsg.Inverse(new(7_255_380.79 - FalseEasting, 7_053_389.56 - FalseNorthing));

        Assert.Equal(-75.0, position.LatitudeDegrees, tolerance: 1e-7);
        Assert.Equal(120.0, position.LongitudeDegrees, tolerance: 3e-7);
    }

    /// <summary>Source: [EPSG] guidance note 7-2, method 9829, worked example: k0 at the pole, printed to eight digits.</summary>
    [Fact]
    [Trait("Reference", "EPSG-G7-2")]
    public void ScaleFactor_EpsgMethod9829AtThePole_AgreesToThePrintedDigits() =>
        Assert.Equal(0.97276901, Epsg.ScaleFactor(-90), tolerance: 5e-9);

    /// <summary>
    /// Source: [EPSG] guidance note 7-2, method 9810 (the pole's scale given instead of a parallel), UPS North; value
    /// from memory, confirmed by computation; printed to 0.01 m. Scaling the map by 0.994 over its own scale at the
    /// pole turns one variant into the other, which tests the shape of the map apart from its scale.
    /// </summary>
    [Fact]
    [Trait("Reference", "EPSG-G7-2")]
    public void Forward_EpsgMethod9810Rescaled_AgreesToTheCentimeter()
    {
        PolarStereographic map = new(Ellipsoid.Wgs84, trueScaleLatitudeDegrees: 70, originLongitudeDegrees: 0);
        double scale = 0.994 / map.ScaleFactor(90);

        MapPosition position = map.Forward(new(LatitudeDegrees: 73, LongitudeDegrees: 44));

        Assert.Equal(3_320_416.75, (position.XMeters * scale) + 2_000_000, tolerance: 0.005);
        Assert.Equal(632_668.43, (position.YMeters * scale) + 2_000_000, tolerance: 0.005);
    }
}
