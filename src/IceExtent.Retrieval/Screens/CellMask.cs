using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>Which cells of a grid can have a concentration, and why the others cannot. Made once a sensor and grid.</summary>
public sealed class CellMask
{
    private readonly CellConditions[] conditions;

    /// <summary>Builds the mask.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="ocean">Whether each cell counts as ocean. Shape: one value a cell.</param>
    /// <param name="polarGapLatitudeDegrees">
    /// The absolute latitude at which the unseen circle begins, in degrees, or null for none. A cell belongs to it
    /// when its centre is at this latitude or nearer the pole.
    /// </param>
    /// <exception cref="ArgumentException">The ocean plane does not fit the grid.</exception>
    public CellMask(Grid grid, ReadOnlySpan<bool> ocean, double? polarGapLatitudeDegrees)
    {
        ArgumentNullException.ThrowIfNull(grid);
        if (ocean.Length != grid.CellCount)
        {
            throw new ArgumentException($"The ocean plane has {ocean.Length} cells; the grid has {grid.CellCount}.", nameof(ocean));
        }

        Columns = grid.Columns;
        double poleward = grid.Hemisphere == Hemisphere.North ? 1.0 : -1.0;
        ReadOnlySpan<double> latitudes = grid.LatitudesDegrees;
        conditions = new CellConditions[grid.CellCount];
        for (int cell = 0; cell < conditions.Length; cell++)
        {
            bool gap = polarGapLatitudeDegrees is { } limit && poleward * latitudes[cell] >= limit;
            conditions[cell] = !ocean[cell] ? CellConditions.Land : gap ? CellConditions.PolarGap : CellConditions.None;
        }
    }

    /// <summary>The number of columns of the grid.</summary>
    public int Columns { get; }

    /// <summary><see cref="CellConditions.Land"/>, <see cref="CellConditions.PolarGap"/> or none. Shape: one value a cell.</summary>
    public ReadOnlySpan<CellConditions> Conditions => conditions;
}
