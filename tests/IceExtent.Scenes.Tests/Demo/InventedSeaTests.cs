using IceExtent.Grids;
using IceExtent.Grids.Outlines;
using IceExtent.Scenes.Demo;
using NetTopologySuite.Geometries;

namespace IceExtent.Scenes.Tests.Demo;

public sealed class InventedSeaTests
{
    private static readonly Grid Map = InventedSea.Grid;

    private static bool IsSea(int cell) => InventedSea.Land.Fraction[cell] < 0.5f;

    [Fact]
    public void Land_Sea_IsInOnePiece()
    {
        HashSet<int> reached = [];
        Stack<int> open = new([Map.CellAt(new GeoPosition(90, 0))!.Value]);
        while (open.TryPop(out int cell))
        {
            if (IsSea(cell) && reached.Add(cell))
            {
                foreach (int next in Neighbors(cell))
                {
                    open.Push(next);
                }
            }
        }

        Assert.Equal(Enumerable.Range(0, Map.CellCount).Count(IsSea), reached.Count);
    }

    [Fact]
    public void Land_Shares_AreSixteenthsAndMakeAThirdOfTheMap()
    {
        Assert.All(InventedSea.Land.Fraction.ToArray(), share => Assert.Equal(0f, share * 16f % 1f));
        Assert.InRange(InventedSea.Land.Fraction.ToArray().Average(), 0.25, 0.45);
    }

    // Coasts drawn with a ruler or a compass would have few shore cells: a round sea of this size has about 450.
    [Fact]
    public void Land_Coast_IsLong() =>
        Assert.True(Enumerable.Range(0, Map.CellCount).Count(cell => IsSea(cell) && Neighbors(cell).Any(next => !IsSea(next))) > 900);

    [Fact]
    public void Places_Positions_FitWhatTheyAre()
    {
        foreach (InventedPlace place in InventedPlaces.All)
        {
            int cell = Map.CellAt(place.Position)!.Value;
            bool onLand = place.Kind is PlaceKind.Island or PlaceKind.Cape;
            Assert.True(IsSea(cell) != onLand, $"{place.Name} is {(onLand ? "not on land" : "not on water")}.");
            if (place.Kind == PlaceKind.Harbor)
            {
                Assert.True(Neighbors(cell).Any(next => !IsSea(next)), $"{place.Name} has no shore.");
            }
        }
    }

    [Fact]
    public void Places_KeysAndNames_AreUnique()
    {
        Assert.Equal(InventedPlaces.All.Count, InventedPlaces.All.DistinctBy(place => place.Key).Count());
        Assert.Equal(InventedPlaces.All.Count, InventedPlaces.All.DistinctBy(place => place.Name).Count());
    }

    // Law: every cell of the map lies in exactly one region.
    [Fact]
    public void Regions_EveryCell_LiesInExactlyOne()
    {
        for (int cell = 0; cell < Map.CellCount; cell++)
        {
            MapPosition at = Map.CenterOf(cell);
            Assert.Single(InventedRegions.All, region => Holds(region.Ring, at));
        }
    }

    [Fact]
    public void Regions_NamedWaters_HoldTheirPlaces()
    {
        foreach (InventedRegion region in InventedRegions.All)
        {
            if (InventedPlaces.All.SingleOrDefault(place => place.Key == region.Key) is { } place)
            {
                Assert.True(Holds(region.Ring, Map.Projection.Forward(place.Position)), region.Name);
            }
        }
    }

    /// <summary>Law: the outlines in longitude and latitude share every cell out among the regions, as the plan on the map does.</summary>
    [Fact]
    public void Outlines_LaidOverTheMap_ShareEveryCell()
    {
        bool[] everywhere = Enumerable.Repeat(true, Map.CellCount).ToArray();
        double[] sum = new double[Map.CellCount];
        foreach (InventedRegion region in InventedRegions.All)
        {
            Coordinate[] ring = [.. region.Outline().Append(region.Outline()[0]).Select(at => new Coordinate(at.LongitudeDegrees, at.LatitudeDegrees))];
            RegionOutline outline = new(region.Key, region.Name, "demo", GeometryFactory.Default.CreatePolygon(ring));
            Assert.Null(OutlineCheck.FirstFault(outline.LongitudeLatitude));
            GridRegion laid = GridRegion.Of(Map, outline, everywhere);
            for (int index = 0; index < laid.Cells.Count; index++)
            {
                sum[laid.Cells[index]] += laid.Shares[index];
            }
        }

        Assert.All(sum, share => Assert.Equal(1.0, share, 1e-9));
    }

    [Fact]
    public void Routes_OverTheMap_RunOverWaterButForACellOrTwo()
    {
        bool[] ocean = InventedSea.Land.OceanBelow(0.5);
        foreach (InventedRoute route in InventedRoutes.All)
        {
            RouteOnLand course = RouteOnLand.Of(Map, new(route.Key, route.Name, [route.Course], 40_000.0), ocean);

            Assert.True(course.Share <= 0.05, $"{route.Key}: {course.Share:P1} over land, first at {course.FirstAt}.");
            Assert.DoesNotContain(InventedPlaces.All, place => place.Key == route.Key);
        }
    }

    private static IEnumerable<int> Neighbors(int cell)
    {
        int column = cell % Map.Columns;
        if (column > 0)
        {
            yield return cell - 1;
        }

        if (column < Map.Columns - 1)
        {
            yield return cell + 1;
        }

        if (cell >= Map.Columns)
        {
            yield return cell - Map.Columns;
        }

        if (cell < Map.CellCount - Map.Columns)
        {
            yield return cell + Map.Columns;
        }
    }

    // A ray to the right crosses the outline an odd number of times from inside.
    private static bool Holds(IReadOnlyList<MapPosition> ring, MapPosition at)
    {
        bool inside = false;
        for (int index = 0; index < ring.Count; index++)
        {
            MapPosition from = ring[index], to = ring[(index + 1) % ring.Count];
            bool spans = from.YMeters > at.YMeters != to.YMeters > at.YMeters;
            if (spans && at.XMeters < from.XMeters + ((at.YMeters - from.YMeters) / (to.YMeters - from.YMeters) * (to.XMeters - from.XMeters)))
            {
                inside = !inside;
            }
        }

        return inside;
    }
}
