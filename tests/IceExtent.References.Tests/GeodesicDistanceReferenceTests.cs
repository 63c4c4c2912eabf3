using IceExtent.Grids;
using IceExtent.Grids.Outlines;
using IceExtent.TestKit;

namespace IceExtent.References.Tests;

/// <summary>Distances and the cells near places against GeographicLib; tests/data/README.md has the command.</summary>
public sealed class GeodesicDistanceReferenceTests
{
    private static readonly Grid Grid = ConfigGrids.Get("north-25km");

    public static TheoryData<string, PlaceOutline> Places() => new()
    {
        { "coast", Near(100.0, new GeoPosition(69.2, 33.5)) },
        { "date-line", Near(120.0, new GeoPosition(70.0, 180.0)) },
        { "pole", Near(150.0, new GeoPosition(90.0, 0.0)) },
        { "far-south", Near(500.0, new GeoPosition(47.0, -52.0)) },
        { "line", Near(60.0, new GeoPosition(69.0, 55.0), new GeoPosition(74.0, 75.0), new GeoPosition(77.0, 80.0)) },
        { "line-over-the-date-line", Near(45.0, new GeoPosition(70.0, 170.0), new GeoPosition(71.0, -165.0)) },
    };

    /// <summary>Origin: independent, GeographicLib through pyproj 3.4.1, printed to a micrometer: 1 cm up to 10,000 km, 1 mm up to 5,000 km.</summary>
    [Fact]
    [Trait("Reference", "Vincenty1975")]
    public void Meters_PairsOfPlaces_AreThoseOfGeographicLib()
    {
        string[][] rows = [.. ReferenceTable.Rows("geodesic-distances.csv")];
        Assert.Equal(76, rows.Length);
        foreach (string[] row in rows)
        {
            double[] numbers = [.. row[1..].Select(ReferenceTable.Number)];

            double meters = GeodesicDistance.Meters(
                row[0] == "wgs-84" ? Ellipsoid.Wgs84 : Ellipsoid.Hughes1980, new(numbers[0], numbers[1]), new(numbers[2], numbers[3]));

            Assert.True(Math.Abs(meters - numbers[4]) <= (numbers[4] < 5e6 ? 0.001 : 0.01), $"{string.Join(',', row)}: {meters:F6} m.");
        }
    }

    [Fact]
    public void Meters_OppositePlaces_AreHalfTheMeridian() =>
        Assert.Equal(20_003_931.0, GeodesicDistance.Meters(Ellipsoid.Wgs84, new(0.1, 0.0), new(-0.1, 179.9)), 40_000.0);

    /// <summary>
    /// Origin: independent, every cell of the grid by brute force in the same script: lines sampled about every 700 m there, followed without
    /// steps here, so distances to lines agree within what half a step can add.
    /// </summary>
    [Theory]
    [MemberData(nameof(Places))]
    public void CellsOf_Place_AreThoseOfTheBruteForce(string name, PlaceOutline place)
    {
        double[] expected = [.. ReferenceTable.Rows("place-cells.csv").Single(row => row[0] == name)[1..].Select(ReferenceTable.Number)];
        bool[] everywhere = Enumerable.Repeat(true, Grid.CellCount).ToArray();

        GridPlace found = new PlaceSearch(Grid, everywhere).CellsOf(place);

        Assert.Equal((int)expected[0], found.Cells.Count);
        Assert.Equal((long)expected[4], found.Cells.Sum(cell => (long)cell));
        Assert.Equal(expected[1], found.NearestKilometers, place.IsRoute ? 0.1 : 1e-4);
        Assert.Equal(expected[2], found.FarthestKilometers, 0.01);
        Assert.Equal(expected[3], found.DistancesKilometers.Sum(), place.IsRoute ? 0.02 * found.Cells.Count : 0.001);
    }

    [Fact]
    public void NearestMeters_PlaceFarFromEveryWantedCell_IsItsDistance()
    {
        bool[] one = new bool[Grid.CellCount];
        one[1234] = true;
        GeoPosition center = Grid.PositionOf(1234);
        PlaceOutline place = Near(10.0, new GeoPosition(80.0, 0.0));

        PlaceSearch search = new(Grid, one);

        Assert.Empty(search.CellsOf(place).Cells);
        Assert.Equal(GeodesicDistance.Meters(Grid.Projection.Ellipsoid, center, new(80.0, 0.0)), search.NearestMeters(place)!.Value, 1e-6);
        Assert.Null(new PlaceSearch(Grid, new bool[Grid.CellCount]).NearestMeters(place));
    }

    private static PlaceOutline Near(double kilometers, params GeoPosition[] line) => new("a", "A", [line], 1_000.0 * kilometers);
}
