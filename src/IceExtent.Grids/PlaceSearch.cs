using IceExtent.Grids.Outlines;

namespace IceExtent.Grids;

/// <summary>Finds cells near places. One a grid and choice of cells; safe to share.</summary>
public sealed class PlaceSearch
{
    private const double MetersPerKilometer = 1_000.0;
    private const double ChordSlack = 1.0; // In m: what a chord of a piece of a line strays from it.

    private readonly Ellipsoid ellipsoid;
    private readonly List<(int Cell, GeoPosition Center, BodyPoint Point)> candidates = [];

    /// <summary>Prepares the cells.</summary>
    /// <param name="grid">The grid; distances are taken on its ellipsoid.</param>
    /// <param name="wanted">Which cells may belong to places. Shape: one value a cell.</param>
    /// <exception cref="ArgumentException">The plane does not fit the grid.</exception>
    public PlaceSearch(Grid grid, ReadOnlySpan<bool> wanted)
    {
        ArgumentNullException.ThrowIfNull(grid);
        if (wanted.Length != grid.CellCount)
        {
            throw new ArgumentException($"The plane has {wanted.Length} cells; the grid has {grid.CellCount}.", nameof(wanted));
        }

        ellipsoid = grid.Projection.Ellipsoid;
        for (int cell = 0; cell < wanted.Length; cell++)
        {
            if (wanted[cell])
            {
                GeoPosition center = grid.PositionOf(cell);
                candidates.Add((cell, center, BodyPoint.Of(ellipsoid, center)));
            }
        }
    }

    /// <summary>The cells whose centers lie in reach of a place, by the shortest way on the ellipsoid (<see cref="GeodesicDistance"/>).</summary>
    /// <param name="place">The place.</param>
    public GridPlace CellsOf(PlaceOutline place)
    {
        ArgumentNullException.ThrowIfNull(place);
        PlaceDistance distance = new(ellipsoid, place);
        List<int> cells = [];
        List<double> distances = [];
        foreach ((int cell, GeoPosition center, BodyPoint point) in candidates)
        {
            if (distance.Within(center, point, place.ReachMeters + ChordSlack) is { } meters && meters <= place.ReachMeters)
            {
                cells.Add(cell);
                distances.Add(meters / MetersPerKilometer);
            }
        }

        return new(place.Name, place.Title, cells, distances);
    }

    /// <summary>How far the nearest center lies from a place, in m, or null where there is no cell at all.</summary>
    /// <param name="place">The place.</param>
    public double? NearestMeters(PlaceOutline place)
    {
        ArgumentNullException.ThrowIfNull(place);
        PlaceDistance distance = new(ellipsoid, place);
        double nearest = double.MaxValue;
        foreach ((_, GeoPosition center, BodyPoint point) in candidates)
        {
            nearest = Math.Min(nearest, distance.Within(center, point, nearest) ?? nearest);
        }

        return candidates.Count > 0 ? nearest : null;
    }
}
