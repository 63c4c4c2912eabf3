using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Statistics.Tests;

/// <summary>The mean over the cells of a place, and its standard error. Cells of 625 km².</summary>
public sealed class PlaceTotalsTests
{
    private static readonly Grid Grid = SmallGrid.EqualArea(2, 3);
    private static readonly TotalsRegion Place = TotalsRegion.Around(Grid, new("a", "A", [0, 1, 3, 4], [1.0, 2.0, 3.0, 4.0]));

    /// <summary>Origin: worked. Of four cells one is empty; 10 % counts although it is below every limit: (0.1 + 0.6 + 0.8) / 3 = 0.5.</summary>
    [Fact]
    public void Sum_CellsWithGapAndFilling_GivesTheMeanOfWhatIsKnown()
    {
        CellConditions[] conditions = new CellConditions[6];
        conditions[1] = CellConditions.NoObservation | CellConditions.FilledFromNeighbours;

        PlaceTotals totals = PlaceTotals.Sum(Place, [0.1f, 0.6f, 1f, float.NaN, 0.8f, 1f], conditions);

        Assert.Equal(0.5, totals.MeanFraction!.Value, 1e-7);
        Assert.Equal(0.50, totals.Observed / totals.Whole, 1e-6);
        Assert.Equal(0.25, totals.Filled / totals.Whole, 1e-6);
    }

    [Fact]
    public void Sum_NothingKnown_HasNoMean()
    {
        float[] nothing = Enumerable.Repeat(float.NaN, 6).ToArray();

        Assert.Null(PlaceTotals.Sum(Place, nothing, new CellConditions[6]).MeanFraction);
    }

    [Fact]
    public void Sum_FilledPolarGap_CountsAsFilled()
    {
        CellConditions[] conditions = Enumerable.Repeat(CellConditions.PolarGap | CellConditions.FilledPolarGap, 6).ToArray();

        PlaceTotals totals = PlaceTotals.Sum(Place, [1f, 1f, 1f, 1f, 1f, 1f], conditions);

        Assert.Equal(0.0, totals.Observed);
        Assert.Equal(totals.Whole, totals.Filled);
    }

    /// <summary>Origin: worked. One cell has its own standard error; four that are wholly alike, since the length is far and no part is local, have theirs too.</summary>
    [Fact]
    public void AreaStandardError_CellsAlike_IsThatOfOneCell()
    {
        float[] total = [0.05f, 0.4f, 0f, 0.7f, 0.9f, 0f];
        float[] errors = Enumerable.Repeat(0.08f, 6).ToArray();
        TotalsUncertainty uncertainty = new(new ErrorCorrelation(Grid, 1e9, 25_000.0, 25_000.0));
        TotalsRegion single = TotalsRegion.Around(Grid, new("b", "B", [4], [0.0]));

        double one = uncertainty.AreaStandardErrorSquareMeters(single, total, errors);
        double four = uncertainty.AreaStandardErrorSquareMeters(Place, total, errors);

        Assert.Equal(0.08, one / 625e6, 1e-6);
        Assert.Equal(0.08, four / (4 * 625e6), 1e-6);
    }

    /// <summary>Origin: worked. Errors that are local to single cells, with a common part of 0.03 of 0.05: sqrt(0.03² + (0.05² − 0.03²) / 4).</summary>
    [Fact]
    public void AreaStandardError_LocalPart_ShrinksWithTheNumberOfCells()
    {
        float[] total = [1f, 1f, 1f, 1f, 1f, 1f];
        float[] errors = Enumerable.Repeat(0.05f, 6).ToArray();
        TotalsUncertainty uncertainty = new(new ErrorCorrelation(Grid, 1e9, 25_000.0, 25_000.0));

        double four = uncertainty.AreaStandardErrorSquareMeters(Place, total, errors, new RetrievalScatter(0.03, 0.03));

        Assert.Equal(Math.Sqrt(0.0009 + ((0.0025 - 0.0009) / 4.0)), four / (4 * 625e6), 1e-6);
    }
}
