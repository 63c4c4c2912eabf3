using IceExtent.Grids.Outlines;

namespace IceExtent.Grids;

/// <summary>How much of a route runs over cells that are no ocean, or off the grid.</summary>
/// <param name="Share">The share of its length. Range: 0 to 1.</param>
/// <param name="FirstAt">Where the first such stretch begins, or null without one.</param>
public readonly record struct RouteOnLand(double Share, GeoPosition? FirstAt)
{
    private const double PiecesPerCell = 8.0;

    /// <summary>Follows a route in steps of an eighth of a cell: the middle of each step tells whether it is over ocean.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="place">The route.</param>
    /// <param name="ocean">Whether each cell counts as ocean. Shape: one value a cell.</param>
    /// <exception cref="ArgumentException">The plane does not fit the grid.</exception>
    public static RouteOnLand Of(Grid grid, PlaceOutline place, ReadOnlySpan<bool> ocean)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(place);
        if (ocean.Length != grid.CellCount)
        {
            throw new ArgumentException($"The plane has {ocean.Length} cells; the grid has {grid.CellCount}.", nameof(ocean));
        }

        (double whole, double onLand, GeoPosition? first) = (0.0, 0.0, null);
        foreach (IReadOnlyList<GeoPosition> line in place.Lines)
        {
            List<GeoPosition> course = LineCourse.Cut(line, grid.Frame.CellMeters / PiecesPerCell);
            for (int end = 1; end < course.Count; end++)
            {
                (GeoPosition start, GeoPosition stop) = (course[end - 1], course[end]);
                double meters = GeodesicDistance.Meters(grid.Projection.Ellipsoid, start, stop);
                GeoPosition middle = new(0.5 * (start.LatitudeDegrees + stop.LatitudeDegrees), 0.5 * (start.LongitudeDegrees + stop.LongitudeDegrees));
                whole += meters;
                if (grid.CellAt(middle) is not { } cell || !ocean[cell])
                {
                    onLand += meters;
                    first ??= start with { LongitudeDegrees = Longitudes.Normalize(start.LongitudeDegrees) };
                }
            }
        }

        return new(whole > 0.0 ? onLand / whole : 0.0, first);
    }
}
