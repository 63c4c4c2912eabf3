using IceExtent.Grids.Outlines;
using NetTopologySuite.Geometries;

namespace IceExtent.Grids;

/// <summary>The cells of a grid that a region covers, wholly or in part.</summary>
/// <param name="Name">The name in the <c>region</c> column.</param>
/// <param name="Title">The name for people.</param>
/// <param name="Set">The name of the set it belongs to.</param>
/// <param name="Cells">Indices of the cells, rising.</param>
/// <param name="Shares">How much of each cell lies in the region, in the order of <paramref name="Cells"/>. Range: above 0, to 1.</param>
public sealed record GridRegion(string Name, string Title, string Set, IReadOnlyList<int> Cells, IReadOnlyList<double> Shares)
{
    /// <summary>Lays an outline over a grid.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="outline">A region without faults (<see cref="OutlineCheck"/>).</param>
    /// <param name="wanted">Which cells to keep. Shape: one value a cell.</param>
    /// <returns>The cells with more than a rounding of themselves in the region; there may be none.</returns>
    /// <remarks>Shares are exact on the map plane (<see cref="PolygonShares"/>); the areal scale within a cell is taken as even.</remarks>
    /// <exception cref="ArgumentException">The plane does not fit the grid, or a ring cannot be read.</exception>
    public static GridRegion Of(Grid grid, RegionOutline outline, ReadOnlySpan<bool> wanted)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(outline);
        if (wanted.Length != grid.CellCount)
        {
            throw new ArgumentException($"The plane has {wanted.Length} cells; the grid has {grid.CellCount}.", nameof(wanted));
        }

        Geometry polygons = MapPlanePolygons.Project(grid, outline.LongitudeLatitude);
        double[] shares = PolygonShares.Compute(grid.Frame, polygons);
        List<int> cells = [];
        for (int cell = 0; cell < shares.Length; cell++)
        {
            if (wanted[cell] && shares[cell] > 0.0)
            {
                cells.Add(cell);
            }
        }

        return new(outline.Name, outline.Title, outline.Set, cells, [.. cells.Select(cell => shares[cell])]);
    }

    /// <summary>The area of the parts of all cells, in m².</summary>
    /// <param name="grid">The grid the region was laid over.</param>
    public double AreaSquareMeters(Grid grid)
    {
        ArgumentNullException.ThrowIfNull(grid);
        double sum = 0.0;
        ReadOnlySpan<double> areas = grid.CellAreasSquareMeters;
        for (int index = 0; index < Cells.Count; index++)
        {
            sum += areas[Cells[index]] * Shares[index];
        }

        return sum;
    }
}
