using IceExtent.Grids;

namespace IceExtent.Statistics;

/// <summary>The ocean cells over which totals are summed, each with the area it brings.</summary>
public sealed class TotalsRegion
{
    /// <summary>The region that is every ocean cell of the grid.</summary>
    public const string WholeHemisphere = "hemisphere";

    private readonly int[] cells;
    private readonly double[] areas;

    private TotalsRegion(string name, Grid grid, int[] cells, double[] areas)
    {
        (Name, this.cells, this.areas) = (name, cells, areas);
        (FirstColumn, LastColumn) = (int.MaxValue, 0);
        foreach (int cell in cells)
        {
            (FirstColumn, LastColumn) = (Math.Min(FirstColumn, cell % grid.Columns), Math.Max(LastColumn, cell % grid.Columns));
        }
    }

    /// <summary>The name in the <c>region</c> column.</summary>
    public string Name { get; }

    /// <summary>Indices of the cells, rising.</summary>
    public ReadOnlySpan<int> Cells => cells;

    /// <summary>The area each cell brings, in m², in the order of <see cref="Cells"/>.</summary>
    public ReadOnlySpan<double> AreasSquareMeters => areas;

    /// <summary>The columns between which all cells lie, both included.</summary>
    internal int FirstColumn { get; }

    /// <inheritdoc cref="FirstColumn"/>
    internal int LastColumn { get; }

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

        return new(WholeHemisphere, grid, [.. cells], areas);
    }

    /// <summary>A part of the ocean: of each cell it brings the share that lies in the region.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="region">The ocean cells of the region, laid over the same grid.</param>
    /// <exception cref="ArgumentException">A cell is not of the grid.</exception>
    public static TotalsRegion Part(Grid grid, GridRegion region)
    {
        ArgumentNullException.ThrowIfNull(region);
        return Of(region.Name, grid, region.Cells, region.Shares);
    }

    /// <summary>The surroundings of a place: its cells, each with its whole area on the ellipsoid.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="place">The ocean cells in reach of the place, found on the same grid.</param>
    /// <exception cref="ArgumentException">A cell is not of the grid.</exception>
    public static TotalsRegion Around(Grid grid, GridPlace place)
    {
        ArgumentNullException.ThrowIfNull(place);
        return Of(place.Name, grid, place.Cells, null);
    }

    private static TotalsRegion Of(string name, Grid grid, IReadOnlyList<int> cells, IReadOnlyList<double>? shares)
    {
        ArgumentNullException.ThrowIfNull(grid);
        if (cells.Count > 0 && (cells[0] < 0 || cells[^1] >= grid.CellCount))
        {
            throw new ArgumentException($"{name} has cells outside the grid {grid.Name}.", nameof(cells));
        }

        ReadOnlySpan<double> gridAreas = grid.CellAreasSquareMeters;
        double[] areas = new double[cells.Count];
        for (int index = 0; index < areas.Length; index++)
        {
            areas[index] = gridAreas[cells[index]] * (shares?[index] ?? 1.0);
        }

        return new(name, grid, [.. cells], areas);
    }
}
