using IceExtent.Grids;
using IceExtent.TestKit;

namespace IceExtent.References.Tests;

/// <summary>Compares 20 positions on each built-in grid with PROJ 9.1.1.</summary>
/// <remarks>Origin: independent; tests/data/proj-positions.csv, made as tests/data/README.md says.</remarks>
public sealed class ProjPositionTests
{
    private const double ToleranceMeters = 1e-6;

    public static TheoryData<string> Grids() => [.. ConfigGrids.Names];

    [Theory]
    [MemberData(nameof(Grids))]
    public void Forward_TwentyPositions_AgreesToAMicrometer(string name)
    {
        IMapProjection map = ConfigGrids.Get(name).Projection;
        (GeoPosition Geo, MapPosition Map)[] places = Places(name);
        Assert.Equal(20, places.Length);

        foreach ((GeoPosition geo, MapPosition expected) in places)
        {
            MapPosition found = map.Forward(geo);

            Assert.True(
                Distance(found, expected) <= ToleranceMeters,
                $"{name} {geo}: {Distance(found, expected):E2} m from PROJ.");
        }
    }

    /// <summary>The same tolerance backwards: what the inverse gives must lie within a micrometer on the ground.</summary>
    [Theory]
    [MemberData(nameof(Grids))]
    public void Inverse_TwentyPositions_AgreesToAMicrometer(string name)
    {
        IMapProjection map = ConfigGrids.Get(name).Projection;
        foreach ((GeoPosition expected, MapPosition position) in Places(name))
        {
            GeoPosition found = map.Inverse(position);

            const double metersPerDegree = 111_000.0;
            double north = (found.LatitudeDegrees - expected.LatitudeDegrees) * metersPerDegree;
            double east = Math.IEEERemainder(found.LongitudeDegrees - expected.LongitudeDegrees, 360.0)
                * metersPerDegree * Math.Cos(double.DegreesToRadians(expected.LatitudeDegrees));
            Assert.True(
                Math.Sqrt((north * north) + (east * east)) <= ToleranceMeters,
                $"{name} {position}: {north:E2} m north and {east:E2} m east of PROJ.");
        }
    }

    private static (GeoPosition Geo, MapPosition Map)[] Places(string name) =>
        [.. ReferenceTable.Rows("proj-positions.csv")
            .Where(row => row[0] == name)
            .Select(row => Array.ConvertAll(row[1..], ReferenceTable.Number))
            .Select(row => (new GeoPosition(row[0], row[1]), new MapPosition(row[2], row[3])))];

    private static double Distance(MapPosition one, MapPosition other) =>
        Math.Sqrt(Math.Pow(one.XMeters - other.XMeters, 2) + Math.Pow(one.YMeters - other.YMeters, 2));
}
