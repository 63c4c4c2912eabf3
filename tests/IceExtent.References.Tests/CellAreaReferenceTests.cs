using IceExtent.Grids;
using IceExtent.TestKit;

namespace IceExtent.References.Tests;

/// <summary>Compares cell areas with geodesic polygons and with a table computed from the printed formulas.</summary>
public sealed class CellAreaReferenceTests
{
    public static TheoryData<string> Grids() => [.. ConfigGrids.Names];

    /// <summary>
    /// Origin: independent, GeographicLib through pyproj 3.4.1, the cell's outline in 800 points; tests/data/cell-areas.csv,
    /// made as tests/data/README.md says. The area at the centre is off by what the scale bends within a cell.
    /// </summary>
    [Theory]
    [MemberData(nameof(Grids))]
    public void CellAreas_SpreadOverTheGrid_AreWithinTwoMillionthsOfTheGeodesicPolygon(string name)
    {
        Grid grid = ConfigGrids.Get(name);
        string[][] rows = [.. ReferenceTable.Rows("cell-areas.csv").Where(row => row[0] == name)];
        Assert.Equal(24, rows.Length);

        foreach (string[] row in rows)
        {
            int cell = ((int)ReferenceTable.Number(row[1]) * grid.Columns) + (int)ReferenceTable.Number(row[2]);
            double expected = ReferenceTable.Number(row[3]);

            double error = (grid.CellAreasSquareMeters[cell] / expected) - 1.0;

            Assert.True(Math.Abs(error) <= 2e-6, $"{name} row {row[1]}, column {row[2]}: relative error {error:E2}.");
        }
    }

    /// <summary>Origin: independent, computed from [Snyder1987] eqs. 14-15, 15-9 and 21-32 with NumPy 1.24; printed to 1e-7 and 1e-4 km².</summary>
    [Theory]
    [InlineData(31, 1.2792981, 381.8885)]
    [InlineData(35, 1.2319275, 411.8222)]
    [InlineData(40, 1.1802408, 448.6822)]
    [InlineData(45, 1.1359319, 484.3680)]
    [InlineData(50, 1.0981373, 518.2827)]
    [InlineData(55, 1.0661577, 549.8410)]
    [InlineData(60, 1.0394281, 578.4837)]
    [InlineData(65, 1.0174952, 603.6918)]
    [InlineData(70, 1.0000000, 625.0000)]
    [InlineData(75, 0.9866643, 642.0091)]
    [InlineData(80, 0.9772810, 654.3967)]
    [InlineData(85, 0.9717070, 661.9259)]
    [InlineData(89, 0.9699321, 664.3507)]
    [InlineData(90, 0.9698582, 664.4519)]
    public void ScaleFactor_HughesGrids_FollowsTheTable(double latitude, double scale, double squareKilometers)
    {
        foreach (double side in (double[])[1.0, -1.0])
        {
            PolarStereographic map = new(Ellipsoid.Hughes1980, 70 * side, originLongitudeDegrees: 0);

            Assert.Equal(scale, map.ScaleFactor(latitude * side), tolerance: 5e-8);
            Assert.Equal(squareKilometers, 625.0 / map.ArealScale(latitude * side), tolerance: 5e-5);
        }
    }

    /// <summary>Origin: independent, as the table above; printed to 1e-4 km².</summary>
    [Theory]
    [InlineData("north-25km", 0, 0, 382.6590)]
    [InlineData("north-25km", 0, 303, 385.5464)]
    [InlineData("north-25km", 447, 303, 407.8863)]
    [InlineData("north-25km", 447, 0, 404.7461)]
    [InlineData("north-25km", 234, 154, 664.4492)]
    [InlineData("north-25km", 100, 100, 565.4843)]
    [InlineData("south-25km", 0, 0, 444.0526)]
    [InlineData("south-25km", 331, 0, 460.1390)]
    [InlineData("south-25km", 100, 100, 619.8698)]
    public void CellAreas_NamedCells_FollowTheTable(string name, int row, int column, double squareKilometers)
    {
        Grid grid = ConfigGrids.Get(name);

        Assert.Equal(
            squareKilometers, grid.CellAreasSquareMeters[(row * grid.Columns) + column] / 1e6, tolerance: 5.1e-5);
    }

    /// <summary>Origin: independent, as the table above; printed to 1 km² and 1e-3 km².</summary>
    [Theory]
    [InlineData("north-25km", 75_660_222, 382.659, 664.449)]
    [InlineData("south-25km", 61_055_051, 444.053, 664.449)]
    public void CellAreas_WholeGrid_FollowTheTable(string name, double total, double lowest, double highest)
    {
        double[] areas = ConfigGrids.Get(name).CellAreasSquareMeters.ToArray();

        Assert.Equal(total, areas.Sum() / 1e6, tolerance: 0.5);
        Assert.Equal(lowest, areas.Min() / 1e6, tolerance: 5e-4);
        Assert.Equal(highest, areas.Max() / 1e6, tolerance: 5e-4);
    }

    /// <summary>Origin: worked. 25 km times 25 km, by construction of the map.</summary>
    [Theory]
    [InlineData("north-25km-equal-area")]
    [InlineData("south-25km-equal-area")]
    public void CellAreas_EqualAreaGrid_AreAllTheSame(string name)
    {
        foreach (double area in ConfigGrids.Get(name).CellAreasSquareMeters)
        {
            Assert.Equal(625e6, area);
        }
    }
}
