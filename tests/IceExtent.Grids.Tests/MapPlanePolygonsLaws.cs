using CsCheck;
using IceExtent.TestKit;
using NetTopologySuite.Geometries;

namespace IceExtent.Grids.Tests;

/// <summary>What holds for every polygon in longitude and latitude: stars of 4 to 16 points, up to 30 degrees wide.</summary>
public sealed class MapPlanePolygonsLaws
{
    private static readonly Grid Stereographic = ConfigGrids.Get("south-25km");

    // A square grid whose rows and columns can be exchanged: turning the map by a quarter turns the grid onto itself.
    private static readonly Grid Square = new(
        "square", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.South, 0), new(120, 120, 50_000, -3_000_000, 3_000_000));

    private static readonly Gen<(double Longitude, double Latitude, double[] Radii)> Stars =
        Gen.Select(Gen.Double[-180, 180], Gen.Double[-84, -50], Gen.Double[0.5, 15].Array[4, 16]);

    [Fact]
    public void Project_AnyStar_IsValid() =>
        Stars.Sample(star => MapPlanePolygons.Project(Stereographic, Ring(star, 0)).IsValid, iter: 200);

    [Fact]
    public void Project_TurnedByAQuarter_TurnsTheShares() => Stars.Sample(
        star =>
        {
            double[] shares = Shares(Ring(star, 0));
            double[] turned = Shares(Ring(star, 90));
            return Enumerable.Range(0, shares.Length).All(cell =>
            {
                // On the southern map a place (x, y) goes to (y, −x): row r, column c to row c, column 119 − r.
                int row = cell / 120;
                int column = cell % 120;
                return Math.Abs(turned[(column * 120) + 119 - row] - shares[cell]) < 1e-6;
            });
        },
        iter: 50);

    [Fact]
    public void Project_LongitudesInAnotherTurn_GivesTheSameShares() => Stars.Sample(
        star =>
        {
            double[] shares = Shares(Ring(star, 0));
            double[] other = Shares(Ring(star, 360));
            return Enumerable.Range(0, shares.Length).All(cell => Math.Abs(other[cell] - shares[cell]) < 1e-6);
        },
        iter: 50);

    /// <summary>The places that the projected edges go through lie on the edges as written, to a thousandth of a cell.</summary>
    [Fact]
    public void Project_AnyEdge_KeepsToItsCourse() =>
        Gen.Select(Gen.Double[-180, 180], Gen.Double[-88, -53], Gen.Double[1, 85], Gen.Double[-30, 30]).Sample(
            (longitude, latitude, width, rise) =>
            {
                double end = Math.Clamp(latitude + rise, -89, -52); // The grid reaches to 51 degrees south.
                Geometry wedge = MapPlanePolygons.Project(Square, Polygon(
                    [new(longitude, latitude), new(longitude + width, end), new(longitude + (0.5 * width), -90)]));
                return Enumerable.Range(0, 50).All(step =>
                {
                    double share = step / 50.0;
                    MapPosition course = Square.Projection.Forward(
                        new(latitude + (share * (end - latitude)), longitude + (share * width)));
                    Point point = GeometryFactory.Default.CreatePoint(new Coordinate(course.XMeters, course.YMeters));
                    return wedge.Boundary.Distance(point) <= 50.0;
                });
            },
            iter: 200);

    private static double[] Shares(Geometry polygon) =>
        PolygonShares.Compute(Square.Frame, MapPlanePolygons.Project(Square, polygon));

    private static Polygon Ring((double Longitude, double Latitude, double[] Radii) star, double turn) => Polygon(
        [.. star.Radii.Select((radius, point) =>
        {
            double angle = 2.0 * Math.PI * point / star.Radii.Length;
            return new Coordinate(
                star.Longitude + turn + (radius * Math.Cos(angle)),
                Math.Clamp(star.Latitude + (0.5 * radius * Math.Sin(angle)), -89.5, 0));
        })]);

    private static Polygon Polygon(Coordinate[] ring) => GeometryFactory.Default.CreatePolygon([.. ring, ring[0].Copy()]);
}
