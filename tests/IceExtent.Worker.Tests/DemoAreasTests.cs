using IceExtent.Grids;
using IceExtent.Scenes.Demo;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.Outlines;
using IceExtent.Worker.Commands;

namespace IceExtent.Worker.Tests;

/// <summary>The files of regions and places that the demonstration writes, read back as a run reads them.</summary>
public sealed class DemoAreasTests : IDisposable
{
    private readonly string folder = Path.Combine(Path.GetTempPath(), "iceextent-tests", Guid.NewGuid().ToString("N"));

    public void Dispose() => Directory.Delete(folder, recursive: true);

    /// <summary>Law: the regions of the file share out the whole ocean; positions rounded to a tenth of a meter leave 1e-5 of a cell.</summary>
    [Fact]
    public void Write_Regions_ShareOutTheOcean()
    {
        DemoAreas.Write(folder, "Invented");
        List<Fault> faults = [];
        Grid map = InventedSea.Grid;
        bool[] ocean = InventedSea.Land.OceanBelow(0.5);

        IReadOnlyList<DrawnRegion> regions = RegionFile.Read(Path.Combine(folder, "regions", "tessivar-sea.geojson"), faults);

        Assert.Empty(faults);
        Assert.Equal(InventedRegions.All.Select(region => (region.Key, region.Name, "tessivar-sea")), regions.Select(region => (region.Outline.Name, region.Outline.Title, region.Outline.Set)));
        double[] sum = new double[map.CellCount];
        foreach (GridRegion laid in regions.Select(region => GridRegion.Of(map, region.Outline, ocean)))
        {
            Assert.NotEmpty(laid.Cells);
            for (int index = 0; index < laid.Cells.Count; index++)
            {
                sum[laid.Cells[index]] += laid.Shares[index];
            }
        }

        Assert.All(sum.Zip(ocean), cell => Assert.Equal(cell.Second ? 1.0 : 0.0, cell.First, 1e-5));
    }

    [Fact]
    public void Write_Places_HaveOceanInReach()
    {
        DemoAreas.Write(folder, "Invented");
        List<Fault> faults = [];
        PlaceSearch search = new(InventedSea.Grid, InventedSea.Land.OceanBelow(0.5));

        DrawnPlace[] places = [.. new[] { "harbors.csv", "routes.geojson" }.SelectMany(file => PlaceFile.Read(Path.Combine(folder, "places", file), faults))];

        Assert.Empty(faults);
        Assert.Equal(
            InventedPlaces.All.Where(place => place.Kind == PlaceKind.Harbor).Select(place => place.Key).Concat(InventedRoutes.All.Select(route => route.Key)),
            places.Select(place => place.Outline.Name));
        Assert.All(places, place => Assert.InRange(search.CellsOf(place.Outline).NearestKilometers, 0.0, 12.5));
        Assert.All(places, place => Assert.NotEmpty(search.CellsOf(place.Outline).Cells));
    }
}
