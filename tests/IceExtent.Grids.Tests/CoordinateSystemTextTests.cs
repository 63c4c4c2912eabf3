using System.Globalization;
using IceExtent.TestKit;

namespace IceExtent.Grids.Tests;

/// <summary>
/// Origin: independent. The texts under tests/data/crs-texts are those that PROJ 9.1.1 was given; what it made of them
/// stands in tests/data/crs-check.csv, made as tests/data/README.md says. A text that changes has to be checked anew.
/// </summary>
public sealed class CoordinateSystemTextTests
{
    [Theory]
    [MemberData(nameof(Names))]
    public void WellKnownText_BuiltInGrid_IsTheTextThatProjWasGiven(string name)
    {
        Grid grid = ConfigGrids.Get(name);

        string given = File.ReadAllText(RepositoryFolder.PathOf("tests", "data", "crs-texts", $"{grid.Epsg}.wkt"));

        Assert.Equal(given.TrimEnd(), CoordinateSystemText.WellKnownText(grid));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void WellKnownText_BuiltInGrid_IsTheSystemOfItsCodeToProj(string name)
    {
        string code = ConfigGrids.Get(name).Epsg!.Value.ToString(CultureInfo.InvariantCulture);

        string row = Assert.Single(
            File.ReadLines(RepositoryFolder.PathOf("tests", "data", "crs-check.csv")),
            line => line.StartsWith(code + ",", StringComparison.Ordinal));

        Assert.Equal($"{code},{code},True,True,0.000000000", row);
    }

    /// <summary>Origin: worked from the definition in methods and [CF]; order as written.</summary>
    [Fact]
    public void Mapping_PolarStereographic_HasTheAttributesOfCf()
    {
        GridMapping mapping = CoordinateSystemText.Mapping(ConfigGrids.Get("south-12.5km"));

        Assert.Equal("polar_stereographic", mapping.Name);
        Assert.Equal(
            [
                new("latitude_of_projection_origin", -90.0),
                new("straight_vertical_longitude_from_pole", 0.0),
                new("standard_parallel", -70.0),
                new("false_easting", 0.0),
                new("false_northing", 0.0),
                new("semi_major_axis", 6_378_273.0),
                new("inverse_flattening", 298.279_411_123_064),
            ],
            mapping.Numbers);
    }

    /// <summary>Origin: worked from the definition in [CF]; order as written.</summary>
    [Fact]
    public void Mapping_PolarEqualArea_HasTheAttributesOfCf()
    {
        GridMapping mapping = CoordinateSystemText.Mapping(ConfigGrids.Get("north-25km-equal-area"));

        Assert.Equal("lambert_azimuthal_equal_area", mapping.Name);
        Assert.Equal(
            [
                new("latitude_of_projection_origin", 90.0),
                new("longitude_of_projection_origin", 0.0),
                new("false_easting", 0.0),
                new("false_northing", 0.0),
                new("semi_major_axis", 6_378_137.0),
                new("inverse_flattening", 298.257_223_563),
            ],
            mapping.Numbers);
    }

    [Fact]
    public void WellKnownText_GridWithoutACode_HasNoneAtItsEnd()
    {
        Grid grid = new("own", null, new PolarStereographic(Ellipsoid.International1924, -71, -100), new(2, 2, 1000, 0, 0));

        string text = CoordinateSystemText.WellKnownText(grid);

        Assert.EndsWith("ORDER[2],LENGTHUNIT[\"metre\",1]]]", text, StringComparison.Ordinal);
        Assert.Contains("ELLIPSOID[\"Own ellipsoid\",6378388,297,", text, StringComparison.Ordinal);
        Assert.Contains("AXIS[\"(x)\",north,MERIDIAN[-10,", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Mapping_ProjectionOfAnotherKind_IsRefused()
    {
        Grid grid = new("own", null, new OtherProjection(), new(2, 2, 1000, 0, 0));

        Assert.Throws<ArgumentException>(() => CoordinateSystemText.Mapping(grid));
        Assert.Throws<ArgumentException>(() => CoordinateSystemText.WellKnownText(grid));
    }

    public static TheoryData<string> Names() => [.. ConfigGrids.Names];

    private sealed class OtherProjection : IMapProjection
    {
        public Ellipsoid Ellipsoid => Ellipsoid.Wgs84;

        public Hemisphere Hemisphere => Hemisphere.North;

        public double OriginLongitudeDegrees => 0.0;

        public MapPosition Forward(GeoPosition position) => new(position.LongitudeDegrees, position.LatitudeDegrees);

        public GeoPosition Inverse(MapPosition position) => new(position.YMeters, position.XMeters);

        public double ArealScale(double latitudeDegrees) => 1.0;
    }
}
