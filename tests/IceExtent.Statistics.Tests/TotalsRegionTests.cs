using CsCheck;
using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Statistics.Tests;

/// <summary>Parts of the ocean: what their cells bring, and what their standard errors are.</summary>
public sealed class TotalsRegionTests
{
    /// <summary>Origin: worked. Cells of 625 km², of which a quarter and the whole lie in the region.</summary>
    [Fact]
    public void Part_SharesOfCells_BringTheirShareOfTheArea()
    {
        Grid grid = SmallGrid.EqualArea(2, 2);

        TotalsRegion part = TotalsRegion.Part(grid, new("a", "A", "set", [1, 2], [0.25, 1.0]));

        Assert.Equal("a", part.Name);
        Assert.Equal([1, 2], part.Cells.ToArray());
        Assert.Equal(156.25e6, part.AreasSquareMeters[0], 1.0);
        Assert.Equal(625e6, part.AreasSquareMeters[1], 1.0);
    }

    [Fact]
    public void Part_CellOutsideTheGrid_IsRefused() =>
        Assert.Throws<ArgumentException>(() => TotalsRegion.Part(SmallGrid.EqualArea(2, 2), new("a", "A", "set", [1, 4], [1.0, 1.0])));

    /// <summary>
    /// Origin: a law. A region of whole cells has the standard errors of a hemisphere in which all other cells are missing, whatever
    /// regions were summed with the same memory before it.
    /// </summary>
    [Fact]
    public void StandardErrors_AnyRegion_AreThoseOfAHemisphereWithNothingElse()
    {
        Grid grid = SmallGrid.EqualArea(24, 30);
        ErrorCorrelation correlation = new(grid, 150_000.0, 50_000.0, 100_000.0);
        TotalsUncertainty reused = new(correlation);
        TotalsRegion whole = TotalsRegion.Hemisphere(grid, SmallGrid.AllOcean(grid));
        RetrievalScatter scatter = new(0.02, 0.04);
        Gen.Select(Gen.Float[0f, 1f].Array[grid.CellCount], Gen.Int[0, 23], Gen.Int[0, 23], Gen.Int[0, 29], Gen.Int[0, 29]).Sample(
            (total, row, otherRow, column, otherColumn) =>
            {
                bool Inside(int cell) =>
                    cell / grid.Columns >= Math.Min(row, otherRow) && cell / grid.Columns <= Math.Max(row, otherRow)
                    && cell % grid.Columns >= Math.Min(column, otherColumn) && cell % grid.Columns <= Math.Max(column, otherColumn);

                int[] cells = [.. Enumerable.Range(0, grid.CellCount).Where(Inside)];
                float[] errors = [.. Enumerable.Repeat(0.08f, grid.CellCount)];
                float[] alone = [.. errors.Select((error, cell) => Inside(cell) ? error : float.NaN)];
                TotalsRegion part = TotalsRegion.Part(grid, new("a", "A", "set", cells, [.. cells.Select(_ => 1.0)]));

                (double extent, double area) = reused.StandardErrorsSquareMeters(part, total, errors, 0.15, scatter);
                (double wholeExtent, double wholeArea) = new TotalsUncertainty(correlation).StandardErrorsSquareMeters(whole, total, alone, 0.15, scatter);
                return Math.Abs(extent - wholeExtent) <= 1e-9 * (wholeExtent + 1.0) && Math.Abs(area - wholeArea) <= 1e-9 * (wholeArea + 1.0);
            },
            iter: 200,
            threads: 1); // The memory is not shared between threads.
    }
}
