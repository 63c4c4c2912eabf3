using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>Fills isolated empty ocean cells from the observed ones among their eight neighbours. Immutable and safe to share.</summary>
/// <remarks>
/// The value is the mean weighted by inverse distance. Only observed values are used, never filled ones, so the order
/// of the cells does not matter. Common practice, no one source. Land and the polar gap neither give nor get a value.
/// </remarks>
public sealed class NeighbourFilling
{
    /// <summary>The most neighbours a cell can have.</summary>
    public const int MostNeighbours = 8;

    private const CellConditions Empty = CellConditions.NoObservation | CellConditions.NoSolution;
    private static readonly double DiagonalWeight = 1.0 / Math.Sqrt(2.0); // Unit: 1 / the side of a cell, whose neighbour weighs 1.

    private readonly int rows;
    private readonly int columns;
    private readonly int leastNeighbours;

    /// <summary>Prepares a grid.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="leastNeighbours">The observed neighbours that a cell needs, 1 to <see cref="MostNeighbours"/>.</param>
    public NeighbourFilling(Grid grid, int leastNeighbours)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentOutOfRangeException.ThrowIfLessThan(leastNeighbours, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(leastNeighbours, MostNeighbours);
        (rows, columns, this.leastNeighbours) = (grid.Rows, grid.Columns, leastNeighbours);
    }

    /// <summary>Fills one day.</summary>
    /// <param name="planes">
    /// Screened and clipped. A filled cell gets total, ice types, a standard error (the root of the neighbours' mean
    /// variance and the variance among their values) and <see cref="CellConditions.FilledFromNeighbours"/>. Nothing else changes.
    /// </param>
    /// <returns>The number of cells filled.</returns>
    /// <exception cref="ArgumentException">The planes are of another grid.</exception>
    public int Fill(ConcentrationPlanes planes)
    {
        ArgumentNullException.ThrowIfNull(planes);
        if (planes.CellCount != rows * columns)
        {
            throw new ArgumentException($"The planes have {planes.CellCount} cells; the grid has {rows * columns}.", nameof(planes));
        }

        Span<CellConditions> conditions = planes.Conditions;
        int filled = 0;
        for (int cell = 0; cell < conditions.Length; cell++)
        {
            if ((conditions[cell] & Empty) != CellConditions.None && float.IsNaN(planes.Total[cell]) && TryFill(planes, cell))
            {
                conditions[cell] |= CellConditions.FilledFromNeighbours;
                filled++;
            }
        }

        return filled;
    }

    private bool TryFill(ConcentrationPlanes planes, int cell)
    {
        (int row, int column) = Math.DivRem(cell, columns);
        int found = 0;
        double weights = 0, totals = 0, squares = 0, variances = 0, multiyears = 0;
        for (int nearRow = Math.Max(0, row - 1); nearRow <= Math.Min(rows - 1, row + 1); nearRow++)
        {
            for (int nearColumn = Math.Max(0, column - 1); nearColumn <= Math.Min(columns - 1, column + 1); nearColumn++)
            {
                int near = (nearRow * columns) + nearColumn;
                if (!planes.IsObserved(near)) // The cell itself is empty, so it never counts.
                {
                    continue;
                }

                double weight = nearRow == row || nearColumn == column ? 1.0 : DiagonalWeight;
                double total = planes.Total[near];
                double error = planes.StandardError[near];
                found++;
                weights += weight;
                totals += weight * total;
                squares += weight * total * total;
                variances += weight * error * error;
                multiyears += weight * planes.Multiyear[near];
            }
        }

        if (found < leastNeighbours)
        {
            return false;
        }

        double mean = totals / weights;
        double spread = Math.Max(0.0, (squares / weights) - (mean * mean));
        planes.Put(cell, mean, multiyears / weights, Math.Sqrt((variances / weights) + spread));
        return true;
    }
}
