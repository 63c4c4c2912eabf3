using IceExtent.Grids;
using IceExtent.Grids.Outlines;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.Outlines;
using IceExtent.TestKit;

namespace IceExtent.References.Tests;

/// <summary>Areas of regions through the cells of a grid against geodesic polygons. Also the laws that the shipped sets keep.</summary>
public sealed class RegionAreaReferenceTests
{
    private const double LeastSquareKilometers = 100_000.0; // For smaller ones half a per cent is not promised.

    public static TheoryData<string, string> Grids() => new()
    {
        { "25km", "12.5km" },
        { "25km-wgs84", "12.5km-wgs84" },
    };

    /// <summary>
    /// Origin: independent, GeographicLib through pyproj 3.4.1; tests/data/region-areas.csv, made as tests/data/README.md says. Land
    /// is counted here. The shapes lie over the date line, round both poles, with cuts and with a hole. What is left is that the
    /// scale within a cell is taken as even: it shrinks with the square of the side.
    /// </summary>
    [Theory]
    [MemberData(nameof(Grids))]
    public void Area_RegionsOverACellGrid_IsThatOfTheGeodesicPolygon(string coarse, string fine)
    {
        (double largest, double coarseSum, double fineSum, int regions) = (0.0, 0.0, 0.0, 0);
        foreach ((RegionOutline region, double expected) in References(coarse.EndsWith("wgs84", StringComparison.Ordinal) ? "wgs-84" : "hughes-1980"))
        {
            string side = region.LongitudeLatitude.Centroid.Y > 0.0 ? "north" : "south";
            double wide = Math.Abs((Area(side + "-" + coarse, region) / expected) - 1.0);
            double narrow = Math.Abs((Area(side + "-" + fine, region) / expected) - 1.0);
            Assert.True(wide <= 0.005 && narrow <= 0.005, $"{region.Name}: relative errors {wide:E2} and {narrow:E2}.");
            (largest, coarseSum, fineSum, regions) = (Math.Max(largest, wide), coarseSum + wide, fineSum + narrow, regions + 1);
        }

        Assert.InRange(regions, 24, 30);
        Assert.InRange(largest, 0.0, 2e-4); // What docs/DATA.md promises.
        Assert.True(fineSum < 0.5 * coarseSum, $"Mean relative error {coarseSum / regions:E2} at 25 km, {fineSum / regions:E2} at 12.5 km.");
    }

    /// <summary>The same shape with a cut along the date line or down to the pole. Origin: a law, the cut has no area, and edges keep to their course within a thousandth of a cell.</summary>
    [Theory]
    [InlineData("north-date-line", "north-date-line-cut")]
    [InlineData("north-pole-ring", "north-pole-cut")]
    public void Cells_ShapeWithACut_AreThoseWithoutIt(string whole, string cut)
    {
        Dictionary<string, RegionOutline> shapes = Shapes(RepositoryFolder.PathOf("tests", "data", "regions.geojson")).ToDictionary(region => region.Name);
        Grid grid = ConfigGrids.Get("north-25km");

        double[] one = Plane(grid, shapes[whole]);
        double[] other = Plane(grid, shapes[cut]);

        Assert.All(one.Zip(other), pair => Assert.Equal(pair.First, pair.Second, 2e-3));
    }

    [Theory]
    [InlineData("northern-seas", "north-25km")]
    [InlineData("northern-seas", "north-12.5km-wgs84")]
    [InlineData("southern-sectors", "south-25km")]
    [InlineData("southern-sectors", "south-25km-equal-area")]
    public void Cells_ShippedSet_AreSharedByNoTwoRegions(string set, string gridName)
    {
        Grid grid = ConfigGrids.Get(gridName);
        double[] sum = new double[grid.CellCount];
        foreach (RegionOutline region in Shipped(set))
        {
            GridRegion laid = GridRegion.Of(grid, region, Everywhere(grid));
            Assert.NotEmpty(laid.Cells);
            for (int index = 0; index < laid.Cells.Count; index++)
            {
                sum[laid.Cells[index]] += laid.Shares[index];
            }
        }

        Assert.InRange(sum.Max(), 1.0 - 1e-9, 1.0 + 1e-9);
    }

    /// <summary>Origin: a law. The sectors leave no ocean out, to the rounding of shares.</summary>
    [Theory]
    [InlineData("south-25km")]
    [InlineData("south-12.5km-wgs84")]
    [InlineData("south-25km-equal-area")]
    public void Cells_SouthernSectors_SumToTheOcean(string gridName)
    {
        Grid grid = ConfigGrids.Get(gridName);
        bool[] ocean = Storage.Reading.LandShareFile.Read(ConfigGrids.LandFile(gridName), grid).OceanBelow(0.5);
        double whole = 0.0;
        for (int cell = 0; cell < ocean.Length; cell++)
        {
            whole += ocean[cell] ? grid.CellAreasSquareMeters[cell] : 0.0;
        }

        double sum = Shipped("southern-sectors").Sum(region => GridRegion.Of(grid, region, ocean).AreaSquareMeters(grid));

        Assert.Equal(1.0, sum / whole, 1e-9);
    }

    private static List<RegionOutline> Shipped(string set) => Shapes(RepositoryFolder.PathOf("config", "regions", set + ".geojson"));

    private static List<RegionOutline> Shapes(string path)
    {
        List<Fault> faults = [];
        List<RegionOutline> shapes = [.. RegionFile.Read(path, faults).Select(region => region.Outline)];
        Assert.Empty(faults);
        Assert.NotEmpty(shapes);
        return shapes;
    }

    private static IEnumerable<(RegionOutline Region, double SquareKilometers)> References(string ellipsoid)
    {
        Dictionary<string, RegionOutline> shapes = Shapes(RepositoryFolder.PathOf("tests", "data", "regions.geojson"))
            .Concat(Shipped("northern-seas"))
            .ToDictionary(region => region.Name);
        return ReferenceTable.Rows("region-areas.csv")
            .Where(row => row[2] == ellipsoid && ReferenceTable.Number(row[3]) >= LeastSquareKilometers && row[1] != "sea-of-japan") // Its south lies off the grid.
            .Select(row => (shapes[row[1]], ReferenceTable.Number(row[3])));
    }

    private static double Area(string gridName, RegionOutline region)
    {
        Grid grid = ConfigGrids.Get(gridName);
        return GridRegion.Of(grid, region, Everywhere(grid)).AreaSquareMeters(grid) / 1e6;
    }

    private static double[] Plane(Grid grid, RegionOutline region)
    {
        double[] plane = new double[grid.CellCount];
        GridRegion laid = GridRegion.Of(grid, region, Everywhere(grid));
        for (int index = 0; index < laid.Cells.Count; index++)
        {
            plane[laid.Cells[index]] = laid.Shares[index];
        }

        return plane;
    }

    private static bool[] Everywhere(Grid grid) => Enumerable.Repeat(true, grid.CellCount).ToArray();
}
