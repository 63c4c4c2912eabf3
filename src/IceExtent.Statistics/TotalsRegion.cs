using IceExtent.Grids;

namespace IceExtent.Statistics;

/// <summary>The ocean cells over which totals are summed, each with the area it brings.</summary>
public sealed class TotalsRegion
{
    /// <summary>The region that is every ocean cell of the grid.</summary>
    public const string WholeHemisphere = "hemisphere";

    private readonly int[] cells;
    private readonly double[] areas;

    private TotalsRegion(string name, int[] cells, double[] areas) => (Name, this.cells, this.areas) = (name, cells, areas);

    /// <summary>The name in the <c>region</c> column.</summary>
    public string Name { get; }

    /// <summary>Indices of the cells, rising.</summary>
    public ReadOnlySpan<int> Cells => cells;

    /// <summary>The area each cell brings, in m², in the order of <see cref="Cells"/>.</summary>
    public ReadOnlySpan<double> AreasSquareMeters => areas;

    /// <summary>Every ocean cell of a grid, with its whole area on the ellipsoid.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="ocean">Whether each cell counts as ocean. Shape: one value a cell.</param>
    /// <exception cref="ArgumentException">The plane does not fit the grid.</exception>
    public static TotalsRegion Hemisphere(Grid grid, ReadOnlySpan<bool> ocean)
    {
        ArgumentNullException.ThrowIfNull(grid);
        if (ocean.Length != grid.CellCount)
        {
            throw new ArgumentException($"The ocean plane has {ocean.Length} cells; the grid has {grid.CellCount}.", nameof(ocean));
        }

        List<int> cells = [];
        for (int cell = 0; cell < ocean.Length; cell++)
        {
            if (ocean[cell])
            {
                cells.Add(cell);
            }
        }

        ReadOnlySpan<double> gridAreas = grid.CellAreasSquareMeters;
        double[] areas = new double[cells.Count];
        for (int index = 0; index < areas.Length; index++)
        {
            areas[index] = gridAreas[cells[index]];
        }

        return new(WholeHemisphere, [.. cells], areas);
    }
}
