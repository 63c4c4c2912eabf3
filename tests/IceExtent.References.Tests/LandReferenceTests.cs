using IceExtent.Grids;
using IceExtent.Storage.Reading;
using IceExtent.TestKit;

namespace IceExtent.References.Tests;

/// <summary>Judges the committed land files.</summary>
public sealed class LandReferenceTests
{
    public static TheoryData<string> Names() => [.. ConfigGrids.Names];

    [Theory]
    [MemberData(nameof(Names))]
    public void Read_BuiltInGrid_HasItsLandFile(string name)
    {
        LandShare land = LandShareFile.Read(ConfigGrids.LandFile(name), ConfigGrids.Get(name));

        Assert.Equal(ConfigGrids.Get(name).CellCount, land.Fraction.Length);
    }

    /// <summary>
    /// Origin: independent; 10,000 points counted in each of 15 coastal cells a grid, with PROJ 9.1.1 and Matplotlib;
    /// tests/data/land-shares.csv, made as tests/data/README.md says. Half a step of storage is 0.002, counting adds 0.001.
    /// </summary>
    [Theory]
    [InlineData("north-25km")]
    [InlineData("south-25km")]
    [InlineData("north-6.25km-wgs84")]
    [InlineData("south-12.5km-wgs84")]
    [InlineData("north-25km-equal-area")]
    [InlineData("south-25km-equal-area")]
    public void Fraction_CoastalCells_AgreesWithCountedPoints(string name)
    {
        Grid grid = ConfigGrids.Get(name);
        LandShare land = Land(name);
        string[][] rows = [.. ReferenceTable.Rows("land-shares.csv").Where(row => row[0] == name)];
        Assert.Equal(15, rows.Length);

        foreach (string[] row in rows)
        {
            int cell = ((int)ReferenceTable.Number(row[1]) * grid.Columns) + (int)ReferenceTable.Number(row[2]);
            double difference = land.Fraction[cell] - ReferenceTable.Number(row[3]);
            Assert.True(Math.Abs(difference) <= 0.003, $"{name} row {row[1]}, column {row[2]}: off by {difference:F4}.");
        }
    }

    /// <summary>Common practice: what any atlas shows. No source.</summary>
    [Theory]
    [InlineData("the north pole", "north", 90, 0, false)]
    [InlineData("the central Arctic Ocean", "north", 82, 170, false)]
    [InlineData("Hudson Bay", "north", 60, -85, false)]
    [InlineData("the Sea of Okhotsk", "north", 55, 150, false)]
    [InlineData("the Baltic Sea", "north", 58.5, 20, false)]
    [InlineData("the Chukchi Sea on the date line", "north", 69.5, 180, false)]
    [InlineData("the ice sheet of Greenland", "north", 72, -40, true)]
    [InlineData("Siberia", "north", 65, 110, true)]
    [InlineData("Chukotka on the date line", "north", 67.5, 180, true)]
    [InlineData("northern Canada", "north", 62, -115, true)]
    [InlineData("the south pole", "south", -90, 0, true)]
    [InlineData("East Antarctica", "south", -75, 100, true)]
    [InlineData("Marie Byrd Land", "south", -78, -120, true)]
    [InlineData("the Ross Ice Shelf on the date line", "south", -81, 180, true)]
    [InlineData("the Ronne Ice Shelf", "south", -77.5, -60, true)]
    [InlineData("the Amery Ice Shelf", "south", -70, 71, true)]
    [InlineData("the Weddell Sea", "south", -70, -40, false)]
    [InlineData("the Ross Sea on the date line", "south", -75, 180, false)]
    [InlineData("the Drake Passage", "south", -58.5, -64, false)]
    public void Fraction_KnownPlace_IsLandOrSeaOnEveryGrid(string place, string hemisphere, double latitude, double longitude, bool isLand)
    {
        foreach (string name in ConfigGrids.Names.Where(name => name.StartsWith(hemisphere, StringComparison.Ordinal)))
        {
            int cell = ConfigGrids.Get(name).CellAt(new GeoPosition(latitude, longitude))!.Value;

            Assert.True(Land(name).Fraction[cell] == (isLand ? 1f : 0f), $"{name}: the share of land at {place} is {Land(name).Fraction[cell]}.");
        }
    }

    /// <summary>Common practice: the equal-area grids reach beyond the equator, and nothing there may count as ocean.</summary>
    [Theory]
    [InlineData("north-25km-equal-area", -70, -45)]
    [InlineData("north-25km-equal-area", -10, 135)]
    [InlineData("south-25km-equal-area", 75, -135)]
    [InlineData("south-25km-equal-area", 10, 45)]
    public void Fraction_BeyondTheEquator_CountsAsLand(string name, double latitude, double longitude)
    {
        int cell = ConfigGrids.Get(name).CellAt(new GeoPosition(latitude, longitude))!.Value;

        Assert.Equal(1f, Land(name).Fraction[cell]);
    }

    /// <summary>
    /// Origin: printed; value from memory. [Fretwell2013] gives 13.924 million km² for the ice sheet of Antarctica
    /// with its ice shelves; outlines of other years and rock outside the ice allow a hundredth.
    /// </summary>
    [Theory]
    [InlineData("south-25km")]
    [InlineData("south-6.25km-wgs84")]
    [InlineData("south-25km-equal-area")]
    public void Fraction_SouthOfSixtySouth_AddsUpToAntarctica(string name)
    {
        Grid grid = ConfigGrids.Get(name);
        double total = Total(name, (cell, share) => grid.LatitudesDegrees[cell] < -60.0 ? share : 0.0);

        Assert.Equal(13_924_000.0, total, tolerance: 139_240.0);
    }

    /// <summary>Origin: worked from the design of the files. The same outlines cut into other cells cover the same area.</summary>
    [Theory]
    [InlineData("north-25km", "north-12.5km", "north-6.25km")]
    [InlineData("south-25km", "south-12.5km", "south-6.25km")]
    [InlineData("north-25km-wgs84", "north-12.5km-wgs84", "north-6.25km-wgs84")]
    [InlineData("south-25km-wgs84", "south-12.5km-wgs84", "south-6.25km-wgs84")]
    public void Fraction_FinerCells_CoverTheSameArea(string coarse, string middle, string fine)
    {
        double expected = Total(coarse, (_, share) => share);

        Assert.Equal(1.0, Total(middle, (_, share) => share) / expected, tolerance: 2e-5);
        Assert.Equal(1.0, Total(fine, (_, share) => share) / expected, tolerance: 2e-5);
    }

    /// <summary>Origin: pinned; our own output, to notice a change. Cells with less than half of land.</summary>
    [Theory]
    [InlineData("north-25km", 67_682, 37_691_426)]
    [InlineData("south-25km", 83_064, 47_019_677)]
    public void OceanBelow_Half_CoversWhatItDid(string name, int cells, double squareKilometers)
    {
        bool[] ocean = Land(name).OceanBelow(0.5);

        Assert.Equal(cells, ocean.Count(isOcean => isOcean));
        Assert.Equal(squareKilometers, Total(name, (cell, _) => ocean[cell] ? 1.0 : 0.0), tolerance: 1.0);
    }

    private static readonly Dictionary<string, LandShare> Loaded = ConfigGrids.Names.ToDictionary(
        name => name, name => LandShareFile.Read(ConfigGrids.LandFile(name), ConfigGrids.Get(name)));

    private static LandShare Land(string name) => Loaded[name];

    private static double Total(string name, Func<int, float, double> weight)
    {
        ReadOnlySpan<double> areas = ConfigGrids.Get(name).CellAreasSquareMeters;
        ReadOnlySpan<float> shares = Land(name).Fraction;
        double total = 0.0;
        for (int cell = 0; cell < shares.Length; cell++)
        {
            total += weight(cell, shares[cell]) * areas[cell];
        }

        return total / 1e6;
    }
}
