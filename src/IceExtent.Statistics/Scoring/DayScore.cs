using IceExtent.Grids;

namespace IceExtent.Statistics.Scoring;

/// <summary>How one day of one method stands to the truth, over the cells that it observed.</summary>
public sealed class DayScore
{
    // From this share of wet or ponded surface on ice counts as melting: own choice, a tenth of what melts in full summer.
    private const float MeltingShare = 0.05f;

    private readonly CellScore[] byClass;

    private DayScore(CellScore[] byClass, double trueExtent, double extent, double disagreeing, double edgeMeters) =>
        (this.byClass, TrueExtentSquareMeters, ExtentSquareMeters, DisagreeingSquareMeters, EdgeMeters) =
        (byClass, trueExtent, extent, disagreeing, edgeMeters);

    /// <summary>True extent of the cells that were observed, in m².</summary>
    public double TrueExtentSquareMeters { get; }

    /// <summary>Retrieved extent, in m².</summary>
    public double ExtentSquareMeters { get; }

    /// <summary>Area that one calls ice and the other not, in m².</summary>
    public double DisagreeingSquareMeters { get; }

    /// <summary>Length of the true ice edge between observed cells, in m on the map.</summary>
    public double EdgeMeters { get; }

    /// <summary>
    /// How far the retrieved edge lies from the true one in the mean, in m: the disagreeing area over the edge's length. False ice far
    /// from the edge counts too. NaN where there is no edge.
    /// </summary>
    public double EdgeErrorMeters => EdgeMeters > 0.0 ? DisagreeingSquareMeters / EdgeMeters : double.NaN;

    /// <summary>The cells of one class.</summary>
    public CellScore Of(TruthClass truth) => byClass[(int)truth];

    /// <summary>Scores one day.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="region">The ocean cells that count.</param>
    /// <param name="retrieved">Clipped concentrations; NaN is not scored. Shape: one value a cell of the grid.</param>
    /// <param name="standardError">Their standard errors.</param>
    /// <param name="truth">True concentrations; NaN is not scored.</param>
    /// <param name="rules">The limits.</param>
    /// <param name="melting">The share of the ice's surface that melts, one value a cell, or nothing where no ice does.</param>
    public static DayScore Of(
        Grid grid,
        TotalsRegion region,
        ReadOnlySpan<float> retrieved,
        ReadOnlySpan<float> standardError,
        ReadOnlySpan<float> truth,
        TotalsRules rules,
        ReadOnlySpan<float> melting = default)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(region);
        ArgumentNullException.ThrowIfNull(rules);
        float limit = (float)rules.IceFraction;
        CellScore[] byClass = new CellScore[Enum.GetValues<TruthClass>().Length];
        (double trueExtent, double extent, double disagreeing, long sides) = (0.0, 0.0, 0.0, 0);
        for (int index = 0; index < region.Cells.Length; index++)
        {
            int cell = region.Cells[index];
            if (float.IsNaN(retrieved[cell]) || float.IsNaN(truth[cell]))
            {
                continue;
            }

            (bool trueIce, bool ice) = (truth[cell] >= limit, retrieved[cell] >= limit);
            double area = region.AreasSquareMeters[index];
            trueExtent += trueIce ? area : 0.0;
            extent += ice ? area : 0.0;
            disagreeing += trueIce != ice ? area : 0.0;
            sides += Differs(cell, 1, (cell + 1) % grid.Columns != 0, retrieved, truth, limit)
                + Differs(cell, grid.Columns, cell + grid.Columns < grid.CellCount, retrieved, truth, limit);
            ref CellScore score = ref byClass[(int)ClassOf(truth[cell], melting.IsEmpty ? 0f : melting[cell], rules)];
            score = score.With(retrieved[cell], standardError[cell], truth[cell]);
        }

        // Cell sides follow an edge in steps; a straight line of any direction is π/4 of its steps long in the mean.
        return new(byClass, trueExtent, extent, disagreeing, sides * grid.Frame.CellMeters * Math.PI / 4.0);
    }

    private static int Differs(int cell, int step, bool inside, ReadOnlySpan<float> retrieved, ReadOnlySpan<float> truth, float limit) =>
        inside && !float.IsNaN(retrieved[cell + step]) && !float.IsNaN(truth[cell + step])
            && (truth[cell] >= limit) != (truth[cell + step] >= limit)
            ? 1
            : 0;

    private static TruthClass ClassOf(float truth, float melting, TotalsRules rules) =>
        truth <= 0f ? TruthClass.OpenWater
        : melting >= MeltingShare ? TruthClass.Melting
        : truth < (float)rules.IceFraction ? TruthClass.BelowLimit
        : truth < (float)rules.PackFraction ? TruthClass.MarginalZone
        : TruthClass.Pack;
}
