using IceExtent.Grids;

namespace IceExtent.Statistics.Overlaps;

/// <summary>A surface whose brightness temperatures two sensors can be compared over.</summary>
public enum ComparedSurface
{
    /// <summary>Neither.</summary>
    None,

    /// <summary>Water far from ice and land.</summary>
    OpenWater,

    /// <summary>Pack ice far from water and land.</summary>
    ClosedIce,
}

/// <summary>What makes a cell a pure one.</summary>
/// <param name="LandDistanceMeters">No land lies in the square that reaches so far.</param>
/// <param name="EdgeDistanceMeters">How far the square reaches whose ice decides.</param>
/// <param name="OpenWaterFraction">Open water: the mean concentration round the cell is below this. Unit: 1.</param>
/// <param name="ClosedIceFraction">Closed ice: the mean concentration round the cell is at or above this. Unit: 1.</param>
/// <param name="IceFraction">Open water: no cell round it is at or above this. Unit: 1.</param>
public sealed record PureCellRules(
    double LandDistanceMeters, double EdgeDistanceMeters, double OpenWaterFraction, double ClosedIceFraction, double IceFraction);

/// <summary>Finds cells of pure surfaces that two sensors both see. Reused from day to day; not shared between threads.</summary>
/// <remarks>
/// A cell is judged by its neighbours and by both sensors' mean, never by its own temperatures: a limit on a cell's own
/// concentration would pick cells whose noise points one way, and the difference between the sensors would be biased. Own choice.
/// </remarks>
public sealed class PureCells
{
    // A share of land is stored in steps of 0.004; sums of it are exact to far less than that.
    private const double LeastLand = 1e-6;

    private readonly PureCellRules rules;
    private readonly bool[] farFromLand;
    private readonly float[] seen;
    private readonly float[] mean;
    private readonly float[] ice;
    private readonly BoxSums seenSums;
    private readonly BoxSums meanSums;
    private readonly BoxSums iceSums;
    private readonly int reach;

    /// <summary>Measures the distance to land.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="land">The share of land of each of its cells: any land at all counts.</param>
    /// <param name="rules">What makes a cell pure.</param>
    /// <exception cref="ArgumentException">The land shares do not fit the grid.</exception>
    public PureCells(Grid grid, LandShare land, PureCellRules rules)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(land);
        ArgumentNullException.ThrowIfNull(rules);
        if (land.Fraction.Length != grid.CellCount)
        {
            throw new ArgumentException($"There are land shares of {land.Fraction.Length} cells; the grid has {grid.CellCount}.", nameof(land));
        }

        this.rules = rules;
        (seenSums, meanSums, iceSums) = (new(grid.Columns, grid.Rows), new(grid.Columns, grid.Rows), new(grid.Columns, grid.Rows));
        (seen, mean, ice) = (new float[grid.CellCount], new float[grid.CellCount], new float[grid.CellCount]);
        reach = CellsFor(rules.EdgeDistanceMeters, grid);
        farFromLand = new bool[grid.CellCount];
        meanSums.Fill(land.Fraction);
        int landReach = CellsFor(rules.LandDistanceMeters, grid);
        for (int cell = 0; cell < farFromLand.Length; cell++)
        {
            farFromLand[cell] = land.Fraction[cell] == 0f && meanSums.Around(cell, landReach) < LeastLand;
        }
    }

    /// <summary>Judges every cell of a day.</summary>
    /// <param name="first">Concentrations by one sensor; NaN is missing. Unit: 1. Shape: one value a cell.</param>
    /// <param name="second">The same by the other sensor.</param>
    /// <param name="surfaces">Receives the surface of every cell.</param>
    public void Find(ReadOnlySpan<float> first, ReadOnlySpan<float> second, Span<ComparedSurface> surfaces)
    {
        float limit = (float)rules.IceFraction;
        for (int cell = 0; cell < seen.Length; cell++)
        {
            float both = 0.5f * (first[cell] + second[cell]);
            bool known = !float.IsNaN(both);
            seen[cell] = known ? 1f : 0f;
            mean[cell] = known ? both : 0f;
            ice[cell] = known && (first[cell] >= limit || second[cell] >= limit) ? 1f : 0f;
        }

        seenSums.Fill(seen);
        meanSums.Fill(mean);
        iceSums.Fill(ice);
        for (int cell = 0; cell < seen.Length; cell++)
        {
            surfaces[cell] = farFromLand[cell] && seen[cell] > 0f ? Judge(cell) : ComparedSurface.None;
        }
    }

    private ComparedSurface Judge(int cell)
    {
        double around = seenSums.Around(cell, reach) - 1.0;
        double square = (2.0 * reach) + 1.0;
        if (2.0 * around < (square * square) - 1.0) // Less than half of the square is known.
        {
            return ComparedSurface.None;
        }

        double fraction = (meanSums.Around(cell, reach) - mean[cell]) / around;
        return fraction >= rules.ClosedIceFraction ? ComparedSurface.ClosedIce
            : fraction < rules.OpenWaterFraction && iceSums.Around(cell, reach) - ice[cell] == 0.0 ? ComparedSurface.OpenWater
            : ComparedSurface.None;
    }

    // At least the next cell, for a cell is judged by others.
    private static int CellsFor(double meters, Grid grid) => Math.Max(1, (int)Math.Ceiling(meters / grid.Frame.CellMeters));
}
