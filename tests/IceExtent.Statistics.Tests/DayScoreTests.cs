using CsCheck;
using IceExtent.Grids;
using IceExtent.Statistics.Scoring;

namespace IceExtent.Statistics.Tests;

/// <summary>Scores against hand-worked days. Cells are 625 km² and 25 km wide.</summary>
public sealed class DayScoreTests
{
    private static readonly TotalsRules Rules = new(0.15, 0.80);

    /// <summary>
    /// Origin: worked. A row of six cells. Truth 0, 0, 0.1, 0.5, 0.9, 1; retrieved 0, 0.2, 0.1, 0.4, missing, 1; all with
    /// standard error 0.06. Cell 1 is false ice: 625 km² disagree. True extent of observed cells: 0.5 and 1, 1,250 km²; retrieved
    /// 0.2, 0.4 and 1, 1,875. One true edge side between cells 2 and 3: 25 km · π/4 = 19.635 km, so the edge error is
    /// 625 / 19.635 = 31.83 km. Open water: bias (0 + 0.2)/2 = 0.1, one of two within 95 %. Marginal zone: −0.1, beyond
    /// 0.06 and within 0.1176.
    /// </summary>
    [Fact]
    public void Of_WorkedRow_FollowsTheDefinitions()
    {
        Grid grid = SmallGrid.EqualArea(1, 6);
        float[] truth = [0f, 0f, 0.1f, 0.5f, 0.9f, 1f];
        float[] retrieved = [0f, 0.2f, 0.1f, 0.4f, float.NaN, 1f];
        float[] error = Enumerable.Repeat(0.06f, 6).ToArray();

        DayScore score = DayScore.Of(grid, TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid)), retrieved, error, truth, Rules);

        Assert.Equal(1_250e6, score.TrueExtentSquareMeters, 1.0);
        Assert.Equal(1_875e6, score.ExtentSquareMeters, 1.0);
        Assert.Equal(625e6, score.DisagreeingSquareMeters, 1.0);
        Assert.Equal(31_831.0, score.EdgeErrorMeters, 1.0);
        CellScore water = score.Of(TruthClass.OpenWater);
        Assert.Equal((2, 1, 1), (water.Cells, water.Within68, water.Within95));
        Assert.Equal(0.1, water.Bias, 1e-7);
        Assert.Equal(Math.Sqrt(0.02), water.Spread, 1e-7);
        CellScore marginal = score.Of(TruthClass.MarginalZone);
        Assert.Equal((1, 0, 1), (marginal.Cells, marginal.Within68, marginal.Within95));
        Assert.Equal(1, score.Of(TruthClass.BelowLimit).Cells);
        Assert.Equal(1, score.Of(TruthClass.Pack).Cells);
    }

    /// <summary>Origin: worked. Of six cells the last three melt by 0, 4 and 6 %: only the last, above 5 %, leaves its class; open water cannot melt.</summary>
    [Fact]
    public void Of_MeltingCells_StandInAClassOfTheirOwn()
    {
        Grid grid = SmallGrid.EqualArea(1, 6);
        float[] truth = [0f, 0f, 0f, 0.9f, 0.9f, 0.9f];
        float[] error = Enumerable.Repeat(0.06f, 6).ToArray();

        DayScore score = DayScore.Of(
            grid, TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid)), truth, error, truth, Rules, [0.9f, 0.9f, 0.9f, 0f, 0.04f, 0.06f]);

        Assert.Equal(3, score.Of(TruthClass.OpenWater).Cells);
        Assert.Equal(2, score.Of(TruthClass.Pack).Cells);
        Assert.Equal(1, score.Of(TruthClass.Melting).Cells);
    }

    [Fact]
    public void Of_NoEdge_HasNoEdgeError()
    {
        Grid grid = SmallGrid.EqualArea(2, 2);
        float[] ice = [1f, 1f, 1f, 1f];

        DayScore score = DayScore.Of(grid, TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid)), ice, ice, ice, Rules);

        Assert.True(double.IsNaN(score.EdgeErrorMeters));
    }

    /// <summary>Gaussian errors of the stated size are held by the limits as often as the limits say; 20,000 draws, seed 5, known to 0.35 %.</summary>
    [Fact]
    public void CellScore_RightStandardErrors_HoldTheTruthAsOftenAsStated()
    {
        MathNet.Numerics.Distributions.Normal normal = new(0.0, 0.05, new Random(5));
        CellScore score = default;
        for (int draw = 0; draw < 20_000; draw++)
        {
            score = score.With(0.5 + normal.Sample(), 0.05, 0.5);
        }

        Assert.InRange(score.Share68, 0.67, 0.69);
        Assert.InRange(score.Share95, 0.945, 0.955);
        Assert.InRange(score.Bias, -0.0015, 0.0015);
        Assert.InRange(score.Spread, 0.049, 0.051);
    }

    /// <summary>Adding tallies is the same as one tally over all cells.</summary>
    [Fact]
    public void CellScore_SumOfParts_IsTheWhole() =>
        Gen.Select(Gen.Double[0, 1], Gen.Double[0.01, 0.2], Gen.Double[0, 1]).Array[1, 30].Sample(cells =>
        {
            CellScore whole = cells.Aggregate(default(CellScore), (score, cell) => score.With(cell.Item1, cell.Item2, cell.Item3));
            CellScore parts = cells.Select(cell => default(CellScore).With(cell.Item1, cell.Item2, cell.Item3)).Aggregate((left, right) => left + right);
            return whole.Cells == parts.Cells && whole.Within95 == parts.Within95 && Math.Abs(whole.Sum - parts.Sum) < 1e-9;
        });
}
