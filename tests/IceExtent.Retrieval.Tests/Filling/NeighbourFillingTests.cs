using CsCheck;

namespace IceExtent.Retrieval.Tests.Filling;

/// <summary>Isolated cells and their neighbours, on grids small enough to work by hand.</summary>
public sealed class NeighbourFillingTests
{
    /// <summary>
    /// Origin: worked. Four sides hold 1, four corners 0; weights 1 and 1/√2: mean 4/(4 + 4/√2) = 0.585786. Variance among
    /// them 0.585786 · 0.414214 = 0.242641; the cells' own 0.05² = 0.0025; √0.245141 = 0.495117.
    /// </summary>
    [Fact]
    public void Fill_EightNeighbours_GivesTheWeightedMeanAndItsError()
    {
        FillingDay day = new(3, 3, (row, column) => (row, column) == (1, 1) ? double.NaN : (row + column) % 2);

        Assert.Equal(1, day.FillNeighbours(8));

        Assert.Equal(0.585786, day.Planes.Total[4], 1e-6);
        Assert.Equal(0.495117, day.Planes.StandardError[4], 1e-6);
        Assert.Equal(0.585786 / 2.0, day.Planes.Multiyear[4], 1e-6);
        Assert.Equal(day.Planes.Total[4], day.Planes.Multiyear[4] + day.Planes.FirstYear[4], 1e-6);
        Assert.Equal(CellConditions.NoObservation | CellConditions.FilledFromNeighbours, day.Planes.Conditions[4]);
    }

    /// <summary>Origin: worked. The corner has three neighbours, one of them land: (0.2 + 0.5/√2) / (1 + 1/√2) = 0.324264.</summary>
    [Fact]
    public void Fill_CornerBesideLand_NeverUsesLand()
    {
        FillingDay day = new(3, 3, (row, column) => (row, column) switch { (0, 0) => double.NaN, (1, 0) => 0.2, _ => 0.5 }, land: (row, column) => (row, column) == (0, 1));

        Assert.Equal(0, day.FillNeighbours(3));
        Assert.Equal(1, day.FillNeighbours(2));

        Assert.Equal(0.324264, day.Planes.Total[0], 1e-6);
        Assert.True(float.IsNaN(day.Planes.Total[1]));
        Assert.Equal(CellConditions.Land, day.Planes.Conditions[1]);
    }

    /// <summary>Origin: worked. Each of the two empty cells sees one observed cell; neither hands on what it got.</summary>
    [Fact]
    public void Fill_TwoEmptyCellsSideBySide_UseObservedCellsOnly()
    {
        FillingDay day = new(1, 4, (_, column) => column switch { 0 => 0.2, 3 => 0.8, _ => double.NaN });

        Assert.Equal(2, day.FillNeighbours(1));

        Assert.Equal([0.2f, 0.2f, 0.8f, 0.8f], day.Totals);
    }

    [Fact]
    public void Fill_MethodWithoutIceTypes_LeavesThemMissing()
    {
        FillingDay day = new(3, 3, (row, column) => (row, column) == (1, 1) ? double.NaN : 0.5);
        day.Planes.Multiyear.Fill(float.NaN);
        day.Planes.FirstYear.Fill(float.NaN);

        Assert.Equal(1, day.FillNeighbours(8));

        Assert.Equal(0.5f, day.Planes.Total[4]);
        Assert.True(float.IsNaN(day.Planes.Multiyear[4]) && float.IsNaN(day.Planes.FirstYear[4]));
    }

    [Fact]
    public void Fill_PolarGap_NeitherGivesNorGets()
    {
        FillingDay day = new(4, 5, (_, column) => column == 1 ? double.NaN : 0.5, gapRadiusCells: 0.9);

        Assert.Equal(2, day.Planes.Conditions.ToArray().Count(condition => condition == CellConditions.PolarGap)); // Rows 1 and 2 of column 2.
        Assert.Equal(0, day.FillNeighbours(6));
        Assert.Equal(4, day.FillNeighbours(3));
        Assert.Equal(2, day.Totals.Count(float.IsNaN));
    }

    /// <summary>Observed cells keep every bit, a filled one lies among its neighbours, and enough neighbours is what decides.</summary>
    [Fact]
    public void Fill_AnyDay_ChangesNothingObserved() =>
        Gen.Select(Gen.Double[0, 1].Array[42], Gen.Int[0, 3].Array[42], Gen.Int[1, 8]).Sample((values, kinds, least) =>
        {
            FillingDay day = new(6, 7, (row, column) => kinds[(row * 7) + column] == 0 ? double.NaN : values[(row * 7) + column], land: (row, column) => kinds[(row * 7) + column] == 1);
            float[] before = day.Totals;
            CellConditions[] conditionsBefore = day.Planes.Conditions.ToArray();
            int filled = day.FillNeighbours(least);
            int seen = 0;
            for (int cell = 0; cell < before.Length; cell++)
            {
                float[] near = [.. Enumerable.Range(0, before.Length)
                    .Where(other => other != cell && Math.Abs((other / 7) - (cell / 7)) <= 1 && Math.Abs((other % 7) - (cell % 7)) <= 1)
                    .Select(other => before[other])
                    .Where(value => !float.IsNaN(value))];
                bool wanted = conditionsBefore[cell] == CellConditions.NoObservation && near.Length >= least;
                float now = day.Planes.Total[cell];
                seen += wanted ? 1 : 0;
                bool right = wanted
                    ? now >= near.Min() - 1e-6f && now <= near.Max() + 1e-6f && day.Planes.StandardError[cell] >= FillingDay.CellError - 1e-6f
                    : before[cell].Equals(now) && conditionsBefore[cell] == day.Planes.Conditions[cell];
                if (!right)
                {
                    return false;
                }
            }

            return seen == filled;
        });
}
