using IceExtent.Grids.Outlines;

namespace IceExtent.Grids.Tests.Outlines;

/// <summary>How much of a route is over land, on one row of cells of 25 km along a parallel.</summary>
public sealed class RouteOnLandTests
{
    private static readonly Grid Grid = new(
        "small", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(8, 3, 25_000.0, -100_000.0, -1_000_000.0));

    /// <summary>
    /// Origin: worked. The middle row runs from x = −100 to 100 km at y = −1,037.5 km; the route from −80 to 70 km. Cells 2 and 3 of it are
    /// land (x = −50 to 0): 50 of 150 km, told to a step of an eighth of a cell at either end.
    /// </summary>
    [Fact]
    public void Of_RouteOverTwoLandCells_IsAThirdOfIt()
    {
        bool[] ocean = [.. Enumerable.Range(0, 24).Select(cell => cell is not (10 or 11))];

        RouteOnLand course = RouteOnLand.Of(Grid, Route(-80, 70), ocean);

        Assert.InRange(course.Share, (50.0 - 6.3) / 150.0, (50.0 + 6.3) / 150.0);
        MapPosition first = Grid.Projection.Forward(course.FirstAt!.Value);
        Assert.InRange(first.XMeters, -54_000.0, -46_000.0);
    }

    [Fact]
    public void Of_RouteOffTheGrid_CountsAsLandThere()
    {
        RouteOnLand course = RouteOnLand.Of(Grid, Route(-200, 100), Enumerable.Repeat(true, 24).ToArray());

        Assert.InRange(course.Share, 0.31, 0.36);
    }

    [Fact]
    public void Of_RouteOverWater_IsNothing() =>
        Assert.Equal(new RouteOnLand(0.0, null), RouteOnLand.Of(Grid, Route(-80, 70), Enumerable.Repeat(true, 24).ToArray()));

    // Straight on the map: corners every 5 km.
    private static PlaceOutline Route(int fromKilometers, int toKilometers) => new(
        "a",
        "A",
        [[.. Enumerable.Range(0, ((toKilometers - fromKilometers) / 5) + 1).Select(step => Grid.Projection.Inverse(new(1_000.0 * (fromKilometers + (5 * step)), -1_037_500.0)))]],
        10_000.0);
}
