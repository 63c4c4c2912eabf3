using NetTopologySuite.Geometries;
using NetTopologySuite.IO;

namespace IceExtent.Grids.Tests;

/// <summary>Worked by hand on a grid of 4 columns and 3 rows of 10 m cells; x runs from 0 to 40, y from 0 to 30.</summary>
public sealed class PolygonSharesTests
{
    private static readonly GridFrame Frame = new(Columns: 4, Rows: 3, CellMeters: 10, LeftMeters: 0, TopMeters: 30);

    public static TheoryData<string, double[]> Cases() => new()
    {
        { // The right half of the first cell and the left half of the second, in the top row.
            "POLYGON ((5 20, 15 20, 15 30, 5 30, 5 20))",
            [0.5, 0.5, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0]
        },
        { // A square around the corner of four cells, a quarter of it in each; given clockwise.
            "POLYGON ((5 5, 5 15, 15 15, 15 5, 5 5))",
            [0, 0, 0, 0, 0.25, 0.25, 0, 0, 0.25, 0.25, 0, 0]
        },
        { // A triangle below the diagonal from (0, 0) to (30, 30).
            "POLYGON ((0 0, 30 0, 30 30, 0 0))",
            [0, 0, 0.5, 0, 0, 0.5, 1, 0, 0.5, 1, 1, 0]
        },
        { // A line of slope one half through three columns: areas under it are 0.25, 0.75 and then 1 + 0.25.
            "POLYGON ((0 0, 30 0, 30 15, 0 0))",
            [0, 0, 0, 0, 0, 0, 0.25, 0, 0.25, 0.75, 1, 0]
        },
        { // Everything, with a hole of 10 m by 5 m across two cells of the middle row.
            "POLYGON ((-100 -100, 200 -100, 200 200, -100 200, -100 -100), (15 12, 25 12, 25 17, 15 17, 15 12))",
            [1, 1, 1, 1, 1, 0.75, 0.75, 1, 1, 1, 1, 1]
        },
        { // Two apart: the lower right cell, and a part of the left edge that begins far outside.
            "MULTIPOLYGON (((30 0, 40 0, 40 10, 30 10, 30 0)), ((-500 12, 2 12, 2 17, -500 17, -500 12)))",
            [0, 0, 0, 0, 0.1, 0, 0, 0, 0, 0, 0, 1]
        },
        { // A slanted edge that enters from outside: the triangle is cut by the left edge of the grid at y = 5.
            "POLYGON ((-10 0, 10 0, 10 10, -10 0))",
            [0, 0, 0, 0, 0, 0, 0, 0, 0.75, 0, 0, 0]
        },
        { "POLYGON ((50 0, 60 0, 60 30, 50 30, 50 0))", new double[12] },
        { "POLYGON ((0 40, 40 40, 40 50, 0 50, 0 40))", new double[12] },
        { "POLYGON ((0 -9, 40 -9, 40 -1, 0 -1, 0 -9))", new double[12] },
        { "POLYGON EMPTY", new double[12] },
        { "POINT (5 5)", new double[12] },
    };

    [Theory]
    [MemberData(nameof(Cases))]
    public void Compute_PolygonWorkedByHand_GivesItsShares(string text, double[] expected)
    {
        double[] shares = PolygonShares.Compute(Frame, new WKTReader().Read(text));

        Assert.Equal(expected.Length, shares.Length);
        for (int cell = 0; cell < expected.Length; cell++)
        {
            Assert.Equal(expected[cell], shares[cell], tolerance: 1e-12);
        }
    }

    [Fact]
    public void Compute_CollectionInACollection_CountsEveryPolygon()
    {
        Geometry collection = new WKTReader().Read(
            "GEOMETRYCOLLECTION (GEOMETRYCOLLECTION (GEOMETRYCOLLECTION (POLYGON ((0 0, 10 0, 10 10, 0 10, 0 0)))), LINESTRING (0 0, 40 30))");

        Assert.Equal(1.0, PolygonShares.Compute(Frame, collection).Sum(), tolerance: 1e-12);
    }
}
