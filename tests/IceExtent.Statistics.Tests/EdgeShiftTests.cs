using IceExtent.Grids;

namespace IceExtent.Statistics.Tests;

/// <summary>What one more smearing adds to extent.</summary>
public sealed class EdgeShiftTests
{
    private const double CellArea = 625e6;

    // A Gaussian of 59 km at half height has a standard deviation of one cell of 25 km.
    private const double Footprint = 2.354820045 * 25_000.0;

    /// <summary>
    /// Origin: worked by hand. Ice from column 10 on, none before. With weights 1, e^(-1/2), e^(-2), e^(-9/2) the first column without ice
    /// sees (0.6065 + 0.1353 + 0.0111) / (1 + 2 · 0.7529) = 0.300, the next (0.1353 + 0.0111) / 2.5058 = 0.058. So one column of 20 cells
    /// is added to full cover; to ice of 0.4, which gives 0.120 there, none; and its own first column keeps 0.280.
    /// </summary>
    [Theory]
    [InlineData(1f, 20)]
    [InlineData(0.4f, 0)]
    public void ExtentSquareMeters_StraightEdge_MovesByTheCellsWorkedByHand(float ice, int cells)
    {
        Grid grid = SmallGrid.EqualArea(20, 20);
        float[] total = Columns(grid, column => column < 10 ? 0f : ice);

        Assert.Equal(cells * CellArea, Shift(grid, total, total), 1e-3 * CellArea);
    }

    /// <summary>Origin: worked by hand: smeared, one cell of 0.5 keeps 0.5 / 2.5058² = 0.080 and gives its neighbours less, so it is lost.</summary>
    [Fact]
    public void ExtentSquareMeters_LoneCell_IsLost()
    {
        Grid grid = SmallGrid.EqualArea(20, 20);
        float[] total = new float[grid.CellCount];
        total[210] = 0.5f;

        Assert.Equal(-CellArea, Shift(grid, total, total), 1e-3 * CellArea);
    }

    /// <summary>
    /// Origin: worked by hand: a foot of 0.1 that a screen took from the two columns before the edge at column 10. The first of them sees
    /// 0.120 of ice of 0.4 and 0.1 · (1 + 0.6065) / 2.5058 = 0.064 of the foot, so it is added; the next 0.023 + 0.064. Without the foot
    /// there is none, as above.
    /// </summary>
    [Fact]
    public void ExtentSquareMeters_ScreenedFoot_StillTells()
    {
        Grid grid = SmallGrid.EqualArea(20, 20);
        float[] total = Columns(grid, column => column < 10 ? 0f : 0.4f);
        float[] unscreened = Columns(grid, column => column < 8 ? 0f : column < 10 ? 0.1f : 0.4f);

        Assert.Equal(20 * CellArea, Shift(grid, total, unscreened), 1e-3 * CellArea);
    }

    /// <summary>Origin: worked by hand: ice that only a screen took away, twelve cells from any edge, is no edge; a missing plane is the total.</summary>
    [Fact]
    public void ExtentSquareMeters_WeatherFarFromIceAndMissingUnscreened_ChangeNothing()
    {
        Grid grid = SmallGrid.EqualArea(20, 30);
        float[] total = Columns(grid, column => column < 20 ? 0f : 1f);
        float[] weather = [.. total];
        weather[(10 * grid.Columns) + 4] = 0.9f;
        double expected = Shift(grid, total, total);

        Assert.Equal(20 * CellArea, expected, 1e-3 * CellArea);
        Assert.Equal(expected, Shift(grid, total, weather));
        Assert.Equal(expected, Shift(grid, total, [.. Enumerable.Repeat(float.NaN, grid.CellCount)]));
    }

    private static double Shift(Grid grid, float[] total, float[] unscreened)
    {
        EdgeShift edge = new(grid, Footprint);
        edge.Smear(total, unscreened, 0.15);
        return edge.ExtentSquareMeters(TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid)));
    }

    private static float[] Columns(Grid grid, Func<int, float> fraction) =>
        [.. Enumerable.Range(0, grid.CellCount).Select(cell => fraction(cell % grid.Columns))];
}
