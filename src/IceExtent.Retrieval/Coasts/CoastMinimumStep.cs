using System.Buffers;
using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>Subtracts the smallest concentration a coastal cell ever has where open water lies beside it.</summary>
/// <remarks>
/// Source: [Cavalieri1999], steps 2 and 3; from memory (medium). Which square goes with which zone is our reading: the
/// cells beside a shore cell hold land signal too, so its square is the largest.
/// </remarks>
public sealed class CoastMinimumStep : ICoastStep
{
    private readonly (int Cell, CellBox Box, float Minimum)[] cells;
    private readonly int columns;
    private readonly float openWater;
    private readonly int openWaterCells;

    /// <summary>Lists the cells that have something to subtract.</summary>
    /// <param name="zones">The distances from land.</param>
    /// <param name="minimumFraction">The minima; cut at the caps. Unit: 1. Missing: NaN. Shape: one value a cell.</param>
    /// <param name="rules">Caps, squares and what is open water.</param>
    /// <exception cref="ArgumentException">The plane does not fit the grid.</exception>
    public CoastMinimumStep(CoastZones zones, ReadOnlySpan<float> minimumFraction, CoastMinimumRules rules)
    {
        float[] capped = CoastMinimum.Capped(minimumFraction, zones, rules);
        Grid grid = zones.Grid;
        (columns, openWater, openWaterCells) = (grid.Columns, (float)rules.OpenWaterFraction, rules.OpenWaterCells);
        cells = [.. Enumerable.Range(0, grid.CellCount)
            .Where(cell => capped[cell] > 0f)
            .Select(cell => (cell, CellBox.Around(grid, cell, rules.Of(zones.Zones[cell]).BoxCells / 2), capped[cell]))];
    }

    /// <inheritdoc/>
    public int Correct(ConcentrationPlanes planes)
    {
        ArgumentNullException.ThrowIfNull(planes);
        int[] chosen = ArrayPool<int>.Shared.Rent(cells.Length);
        int corrected = 0;
        for (int index = 0; index < cells.Length; index++)
        {
            // Chosen first and lowered later: what is open water must not depend on the order of the cells.
            if (planes.Total[cells[index].Cell] > 0f && HasOpenWater(planes.Total, cells[index].Box))
            {
                chosen[corrected++] = index;
            }
        }

        foreach (int index in chosen.AsSpan(0, corrected))
        {
            (int cell, _, float minimum) = cells[index];
            CoastalIce.Lower(planes, cell, Math.Max(planes.Total[cell] - minimum, 0f));
            planes.Conditions[cell] |= CellConditions.CoastCorrected;
        }

        ArrayPool<int>.Shared.Return(chosen);
        return corrected;
    }

    private bool HasOpenWater(ReadOnlySpan<float> totalFraction, CellBox box)
    {
        int found = 0;
        for (int row = box.Top; row <= box.Bottom; row++)
        {
            for (int column = box.Left; column <= box.Right; column++)
            {
                found += totalFraction[(row * columns) + column] < openWater ? 1 : 0; // Land is NaN and never counts.
            }
        }

        return found >= openWaterCells;
    }
}
