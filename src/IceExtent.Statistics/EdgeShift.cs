using IceExtent.Grids;

namespace IceExtent.Statistics;

/// <summary>How much extent one more smearing by a footprint adds. Reused from day to day; not shared between threads.</summary>
/// <remarks>
/// A footprint moves the contour of the limit outward, along all of an edge at once, the farther the sharper the edge is. By how much, the
/// day itself tells when it is smeared once more: a Gaussian of the footprint's width at half its height, over the cells that were
/// observed, as they were before screens, which cut the foot of the edge off. Counted are cells near the edge alone: weather far from
/// ice is no edge. Our own; the thought is that of twicing.
/// </remarks>
public sealed class EdgeShift
{
    private const double DeviationsPerWidth = 2.354820045; // 2 √(2 ln 2), a Gaussian's width at half height.
    private const double ReachInDeviations = 3.0;

    private readonly int columns;
    private readonly int rows;
    private readonly int nearCells;
    private readonly double[] kernel; // From the middle outward.
    private readonly bool[] near;
    private readonly sbyte[] changes;

    /// <summary>Makes the working memory.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="footprintMeters">The width of a footprint at half its height, in m.</param>
    /// <exception cref="ArgumentOutOfRangeException">It is not positive.</exception>
    public EdgeShift(Grid grid, double footprintMeters)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentOutOfRangeException.ThrowIfLessThanOrEqual(footprintMeters, 0.0);
        (columns, rows) = (grid.Columns, grid.Rows);
        nearCells = Math.Max(1, (int)Math.Round(footprintMeters / grid.Frame.CellMeters));
        double deviation = footprintMeters / DeviationsPerWidth / grid.Frame.CellMeters;
        kernel = [.. Enumerable.Range(0, 1 + (int)Math.Ceiling(ReachInDeviations * deviation)).Select(step => Math.Exp(-0.5 * step * step / (deviation * deviation)))];
        near = new bool[grid.CellCount];
        changes = new sbyte[grid.CellCount];
    }

    /// <summary>Smears a day once more.</summary>
    /// <param name="totalFraction">Clipped concentrations. Unit: 1. Missing: NaN.</param>
    /// <param name="unscreenedFraction">The same without screens and masks; where it is missing, as in filled cells, the total stands for it.</param>
    /// <param name="iceFraction">The limit from which a cell counts as ice. Unit: 1.</param>
    public void Smear(ReadOnlySpan<float> totalFraction, ReadOnlySpan<float> unscreenedFraction, double iceFraction)
    {
        float limit = (float)iceFraction;
        near.AsSpan().Clear();
        changes.AsSpan().Clear();
        MarkEdge(totalFraction, limit);
        for (int cell = 0; cell < near.Length; cell++)
        {
            if (near[cell] && !float.IsNaN(totalFraction[cell]))
            {
                bool before = Seen(totalFraction, unscreenedFraction, cell) >= limit;
                bool after = Smeared(totalFraction, unscreenedFraction, cell) >= limit;
                changes[cell] = (sbyte)((after ? 1 : 0) - (before ? 1 : 0));
            }
        }
    }

    /// <summary>What the smearing added to the extent of a region, in m²; below 0 where it took away.</summary>
    /// <param name="region">The cells and their areas.</param>
    public double ExtentSquareMeters(TotalsRegion region)
    {
        ArgumentNullException.ThrowIfNull(region);
        double sum = 0.0;
        for (int index = 0; index < region.Cells.Length; index++)
        {
            sum += region.AreasSquareMeters[index] * changes[region.Cells[index]];
        }

        return sum;
    }

    private static float Seen(ReadOnlySpan<float> total, ReadOnlySpan<float> unscreened, int cell) =>
        float.IsNaN(unscreened[cell]) ? total[cell] : unscreened[cell];

    private void MarkEdge(ReadOnlySpan<float> total, float limit)
    {
        for (int cell = 0; cell < near.Length; cell++)
        {
            bool ice = total[cell] >= limit;
            bool right = (cell + 1) % columns != 0 && IsEdge(ice, total[cell], total[cell + 1], limit);
            if (right || (cell + columns < near.Length && IsEdge(ice, total[cell], total[cell + columns], limit)))
            {
                MarkRound(cell);
            }
        }
    }

    private static bool IsEdge(bool ice, float here, float there, float limit) =>
        ice != (there >= limit) && !float.IsNaN(here) && !float.IsNaN(there);

    private void MarkRound(int cell)
    {
        (int row, int column) = (cell / columns, cell % columns);
        (int left, int right) = (Math.Max(0, column - nearCells), Math.Min(columns - 1, column + nearCells + 1)); // The pair is this cell and the next.
        for (int at = Math.Max(0, row - nearCells); at <= Math.Min(rows - 1, row + nearCells + 1); at++)
        {
            near.AsSpan((at * columns) + left, right - left + 1).Fill(true);
        }
    }

    private double Smeared(ReadOnlySpan<float> total, ReadOnlySpan<float> unscreened, int cell)
    {
        int reach = kernel.Length - 1;
        (int row, int column) = (cell / columns, cell % columns);
        (double sum, double weights) = (0.0, 0.0);
        for (int y = Math.Max(0, row - reach); y <= Math.Min(rows - 1, row + reach); y++)
        {
            for (int x = Math.Max(0, column - reach); x <= Math.Min(columns - 1, column + reach); x++)
            {
                float value = Seen(total, unscreened, (y * columns) + x);
                if (!float.IsNaN(value))
                {
                    double weight = kernel[Math.Abs(y - row)] * kernel[Math.Abs(x - column)];
                    sum += weight * value;
                    weights += weight;
                }
            }
        }

        return sum / weights;
    }
}
