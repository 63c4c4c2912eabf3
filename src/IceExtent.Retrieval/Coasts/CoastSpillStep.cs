using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>What rules the spill method.</summary>
/// <param name="LandIceFraction">The ice that land is given. Unit: 1.</param>
/// <param name="BoxCells">The side of the square that is averaged, an odd number of cells.</param>
public sealed record CoastSpillRules(double LandIceFraction, int BoxCells);

/// <summary>Empties coastal cells that hold no more ice than land alone would feign.</summary>
/// <remarks>
/// Source: [Markus2009]; from memory (medium): land is given a concentration, ocean none, and a square is averaged; a cell
/// that is not above its average is open water. Departure: land enters with its share of each cell.
/// </remarks>
public sealed class CoastSpillStep : ICoastStep
{
    private readonly (int Cell, float Spill)[] cells;

    /// <summary>Works out what land alone would feign.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="land">How much of each cell is land.</param>
    /// <param name="ocean">Whether each cell counts as ocean. Shape: one value a cell.</param>
    /// <param name="rules">The concentration of land and the square.</param>
    /// <exception cref="ArgumentException">A plane does not fit the grid.</exception>
    public CoastSpillStep(Grid grid, LandShare land, bool[] ocean, CoastSpillRules rules)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(land);
        ArgumentNullException.ThrowIfNull(ocean);
        ArgumentNullException.ThrowIfNull(rules);
        if (ocean.Length != grid.CellCount || land.Fraction.Length != grid.CellCount)
        {
            throw new ArgumentException("The planes must have the grid's cells.", nameof(ocean));
        }

        cells = [.. Enumerable.Range(0, grid.CellCount)
            .Where(cell => ocean[cell])
            .Select(cell => (cell, (float)(rules.LandIceFraction * MeanOf(land.Fraction, CellBox.Around(grid, cell, rules.BoxCells / 2), grid.Columns))))
            .Where(cell => cell.Item2 > 0f)];
    }

    /// <summary>What land alone would feign, cell by cell. Unit: 1.</summary>
    public IReadOnlyList<(int Cell, float SpillFraction)> Cells => cells;

    /// <inheritdoc/>
    public int Correct(ConcentrationPlanes planes)
    {
        ArgumentNullException.ThrowIfNull(planes);
        int corrected = 0;
        foreach ((int cell, float spill) in cells)
        {
            if (planes.Total[cell] > 0f && planes.Total[cell] <= spill)
            {
                CoastalIce.Lower(planes, cell, 0f);
                planes.Conditions[cell] |= CellConditions.CoastCorrected;
                corrected++;
            }
        }

        return corrected;
    }

    private static double MeanOf(ReadOnlySpan<float> fraction, CellBox box, int columns)
    {
        double sum = 0.0;
        for (int row = box.Top; row <= box.Bottom; row++)
        {
            for (int column = box.Left; column <= box.Right; column++)
            {
                sum += fraction[(row * columns) + column];
            }
        }

        return sum / ((box.Bottom - box.Top + 1) * (box.Right - box.Left + 1));
    }
}
