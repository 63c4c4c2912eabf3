using IceExtent.TestKit;

namespace IceExtent.Grids.Tests;

/// <summary>Expected phrases are worked by hand from the sizes of the grid.</summary>
public sealed class GridComparisonTests
{
    private static readonly Grid North = ConfigGrids.Get("north-25km");
    private static readonly double[] Columns = [.. Enumerable.Range(0, 304).Select(North.ColumnCenterMeters)];
    private static readonly double[] Rows = [.. Enumerable.Range(0, 448).Select(North.RowCenterMeters)];

    [Fact]
    public void Compare_OwnCoordinates_IsTheSame() =>
        Assert.Equal(new GridMatch.Same(false, false), GridComparison.Compare(North, Columns, Rows, null));

    [Theory]
    [InlineData(false, true)]
    [InlineData(true, false)]
    [InlineData(true, true)]
    public void Compare_AxisTurnedRound_AsksForAFlip(bool x, bool y) =>
        Assert.Equal(
            new GridMatch.Same(x, y),
            GridComparison.Compare(North, x ? Reversed(Columns) : Columns, y ? Reversed(Rows) : Rows, null));

    [Fact]
    public void Compare_CoordinatesOffByLessThanAHundredthOfACell_IsTheSame() =>
        Assert.Equal(
            new GridMatch.Same(false, false),
            GridComparison.Compare(North, Array.ConvertAll(Columns, x => x + 249), Array.ConvertAll(Rows, y => y - 249), null));

    [Fact]
    public void Compare_CoordinatesOffByMoreThanAHundredthOfACell_SaysWhereItStarts() =>
        Assert.Equal(
            ["x starts at -3837249 m, grid north-25km has -3837500 m there"],
            Differences(GridComparison.Compare(North, Array.ConvertAll(Columns, x => x + 251), Rows, null)));

    [Fact]
    public void Compare_OtherCellSize_SaysShapeAndSpacing()
    {
        Grid finer = ConfigGrids.Get("north-12.5km");
        double[] columns = [.. Enumerable.Range(0, 608).Select(finer.ColumnCenterMeters)];
        double[] rows = [.. Enumerable.Range(0, 896).Select(finer.RowCenterMeters)];

        Assert.Equal(
            [
                "896 rows and 608 columns, grid north-25km has 448 rows and 304 columns",
                "column spacing 12500 m, grid north-25km has 25000 m",
                "row spacing 12500 m, grid north-25km has 25000 m",
            ],
            Differences(GridComparison.Compare(North, columns, rows, null)));
    }

    [Theory]
    [InlineData(12_500, "x is shifted by half a cell (12500 m right): it may give edges where grid north-25km has centres")]
    [InlineData(-12_500, "x is shifted by half a cell (12500 m left): it may give edges where grid north-25km has centres")]
    public void Compare_EdgesInPlaceOfCentres_SaysHalfACell(double shift, string phrase) =>
        Assert.Equal([phrase], Differences(GridComparison.Compare(North, Array.ConvertAll(Columns, x => x + shift), Rows, null)));

    [Theory]
    [InlineData(12_500, "y is shifted by half a cell (12500 m up): it may give edges where grid north-25km has centres")]
    [InlineData(-12_500, "y is shifted by half a cell (12500 m down): it may give edges where grid north-25km has centres")]
    public void Compare_BottomUpRowsShifted_SaysHalfACell(double shift, string phrase) =>
        Assert.Equal(
            [phrase],
            Differences(GridComparison.Compare(North, Columns, Array.ConvertAll(Reversed(Rows), y => y + shift), null)));

    [Fact]
    public void Compare_AllEdges_SaysEdges()
    {
        double[] edges = [.. Enumerable.Range(0, 305).Select(column => -3_850_000.0 + (column * 25_000.0))];

        Assert.Equal(
            [
                "448 rows and 305 columns, grid north-25km has 448 rows and 304 columns",
                "x gives the 305 edges of the columns, not their 304 centres",
            ],
            Differences(GridComparison.Compare(North, edges, Rows, null)));
    }

    [Fact]
    public void Compare_Kilometers_GuessesTheUnit() =>
        Assert.Equal(
            [
                "column spacing 25 m, grid north-25km has 25000 m: the coordinates are probably in km",
                "row spacing 25 m, grid north-25km has 25000 m: the coordinates are probably in km",
            ],
            Differences(GridComparison.Compare(
                North, Array.ConvertAll(Columns, x => x / 1000), Array.ConvertAll(Rows, y => y / 1000), null)));

    [Fact]
    public void Compare_OneColumnMisplaced_SaysWhich()
    {
        double[] columns = [.. Columns];
        columns[7] += 1000;

        Assert.Equal(
            ["x is not evenly spaced (-3661500 m at column 7, where even steps of 25000 m give -3662500 m)"],
            Differences(GridComparison.Compare(North, columns, Rows, null)));
    }

    [Fact]
    public void Compare_CoordinateMissing_SaysWhich()
    {
        double[] rows = [.. Rows];
        rows[3] = double.NaN;

        Assert.Equal(["y of row 3 is not a number"], Differences(GridComparison.Compare(North, Columns, rows, null)));
    }

    [Fact]
    public void Compare_AllCoordinatesAlike_SaysTheSpacing() =>
        Assert.Equal(
            ["column spacing 0 m, grid north-25km has 25000 m"],
            Differences(GridComparison.Compare(North, new double[304], Rows, null)));

    [Fact]
    public void Compare_NoCoordinates_SaysTheShape() =>
        Assert.Equal(
            ["0 rows and 0 columns, grid north-25km has 448 rows and 304 columns"],
            Differences(GridComparison.Compare(North, [], [], null)));

    [Fact]
    public void CompareShape_SameShape_IsTheSame() =>
        Assert.Equal(new GridMatch.Same(false, false), GridComparison.CompareShape(North, rows: 448, columns: 304));

    [Fact]
    public void CompareShape_Transposed_SaysSo() =>
        Assert.Equal(
            ["304 rows and 448 columns, grid north-25km has 448 rows and 304 columns: rows and columns are exchanged"],
            Differences(GridComparison.CompareShape(North, rows: 304, columns: 448)));

    [Theory]
    [MemberData(nameof(Names))]
    public void Compare_OwnMapping_IsTheSame(string name)
    {
        Grid grid = ConfigGrids.Get(name);
        double[] columns = [.. Enumerable.Range(0, grid.Columns).Select(grid.ColumnCenterMeters)];
        double[] rows = [.. Enumerable.Range(0, grid.Rows).Select(grid.RowCenterMeters)];

        Assert.Equal(
            new GridMatch.Same(false, false),
            GridComparison.Compare(grid, columns, rows, CoordinateSystemText.Mapping(grid)));
    }

    [Fact]
    public void Compare_MappingOfTheOtherEllipsoid_SaysTheAxes() =>
        Assert.Equal(
            [
                "semi_major_axis 6378137 m, grid north-25km has 6378273 m",
                "inverse_flattening 298.257223563 (no unit), grid north-25km has 298.279411123064 (no unit)",
            ],
            Compare(CoordinateSystemText.Mapping(ConfigGrids.Get("north-25km-wgs84"))));

    [Fact]
    public void Compare_MappingOfTheOtherPole_SaysEveryAngle() =>
        Assert.Equal(
            [
                "latitude_of_projection_origin -90 degrees, grid north-25km has 90 degrees",
                "straight_vertical_longitude_from_pole 0 degrees, grid north-25km has -45 degrees",
                "standard_parallel -70 degrees, grid north-25km has 70 degrees",
            ],
            Compare(CoordinateSystemText.Mapping(ConfigGrids.Get("south-25km"))));

    [Fact]
    public void Compare_OtherProjection_SaysOnlyThat() =>
        Assert.Equal(
            ["grid_mapping_name lambert_azimuthal_equal_area, grid north-25km has polar_stereographic"],
            Compare(CoordinateSystemText.Mapping(ConfigGrids.Get("north-25km-equal-area"))));

    [Theory]
    [InlineData("straight_vertical_longitude_from_pole", 315.0)]
    [InlineData("longitude_of_projection_origin", -405.0)]
    [InlineData("scale_factor_at_projection_origin", 0.9698582)]
    [InlineData("semi_minor_axis", 6_356_889.449)]
    [InlineData("semi_major_axis", 6_378_273.9)]
    [InlineData("inverse_flattening", 298.279)]
    [InlineData("standard_parallel", 70.0000009)]
    [InlineData("an_attribute_of_their_own", 17.0)]
    public void Compare_SameNumberWrittenAnotherWay_IsTheSame(string attribute, double value) =>
        Assert.Empty(Compare(new("polar_stereographic", new Dictionary<string, double> { [attribute] = value })));

    [Theory]
    [InlineData("straight_vertical_longitude_from_pole", -44.99)]
    [InlineData("longitude_of_projection_origin", 0.0)]
    [InlineData("scale_factor_at_projection_origin", 1.0)]
    [InlineData("semi_minor_axis", 6_356_752.3)]
    [InlineData("earth_radius", 6_371_228.0)]
    [InlineData("false_easting", 3_850_000.0)]
    [InlineData("false_northing", -12_500.0)]
    [InlineData("standard_parallel", 70.00001)]
    [InlineData("standard_parallel", double.NaN)]
    public void Compare_OneOtherNumber_NamesItsAttribute(string attribute, double value) =>
        Assert.StartsWith(
            attribute + " ",
            Assert.Single(Compare(new("polar_stereographic", new Dictionary<string, double> { [attribute] = value }))),
            StringComparison.Ordinal);

    public static TheoryData<string> Names() => [.. ConfigGrids.Names];

    private static IReadOnlyList<string> Compare(GridMapping mapping) =>
        GridComparison.Compare(North, Columns, Rows, mapping) is GridMatch.Different different ? different.Differences : [];

    private static IReadOnlyList<string> Differences(GridMatch match) => Assert.IsType<GridMatch.Different>(match).Differences;

    private static double[] Reversed(double[] values) => [.. Enumerable.Reverse(values)];
}
