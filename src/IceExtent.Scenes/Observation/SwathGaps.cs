using IceExtent.Grids;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;

namespace IceExtent.Scenes.Observation;

/// <summary>The lens-shaped gaps between neighbouring swaths, far from the pole.</summary>
/// <remarks>
/// A cell is seen by the orbits whose ascending node lies within a stretch of longitudes, one for the way up and one
/// for the way down. Nodes are spaced by 360° over the orbits a day and move on from day to day. While the satellite
/// climbs to a latitude the Earth turns under it, by what it turns on the satellite's track; across the swath that is
/// the same. Beyond the orbit's highest latitude nothing is lost here: what lies there is the polar gap, which the
/// sensor's file gives. Accuracy: the share of lost cells agrees with orbits flown step by step (see
/// <c>CoverageTests</c>).
/// </remarks>
internal sealed class SwathGaps
{
    private const double EarthRadiusKilometers = 6371.0;

    private readonly double spacing;
    private readonly ulong key;
    private readonly List<Candidate> candidates = [];

    public SwathGaps(CoverageParameters parameters, Grid grid, ulong key)
    {
        this.key = key;
        if (parameters.SwathKilometers == 0.0)
        {
            return;
        }

        spacing = 360.0 / parameters.OrbitsPerDay;
        double inclination = double.DegreesToRadians(parameters.InclinationDegrees);
        double topLatitude = Math.Min(parameters.InclinationDegrees, 180.0 - parameters.InclinationDegrees);
        double halfSwath = Math.Sin(parameters.SwathKilometers / 2.0 / EarthRadiusKilometers);
        for (int cell = 0; cell < grid.CellCount; cell++)
        {
            GeoPosition at = grid.PositionOf(cell);
            double latitude = double.DegreesToRadians(at.LatitudeDegrees);

            // The sine of the distance from an orbit's plane is sinφ cos i − cosφ sin i sin(λ − node); a cell is seen
            // where that is no more than the half swath.
            double scale = Math.Cos(latitude) * Math.Abs(Math.Sin(inclination));
            double middle = Math.Sin(latitude) * Math.Cos(inclination);
            double low = double.RadiansToDegrees(Math.Asin(Math.Clamp((middle - halfSwath) / scale, -1.0, 1.0)));
            double high = double.RadiansToDegrees(Math.Asin(Math.Clamp((middle + halfSwath) / scale, -1.0, 1.0)));
            double climb = double.RadiansToDegrees(Math.Asin(Math.Clamp(Math.Sin(latitude) / Math.Sin(inclination), -1.0, 1.0)));
            if (high - low < spacing && Math.Abs(at.LatitudeDegrees) < topLatitude)
            {
                double turnUp = spacing * climb / 360.0;
                double turnDown = spacing * (180.0 - climb) / 360.0;
                candidates.Add(new(
                    cell, at.LongitudeDegrees - high + turnUp, at.LongitudeDegrees - 180.0 + low + turnDown, high - low));
            }
        }
    }

    /// <summary>Marks the cells that no orbit of a day sees.</summary>
    public void Mark(DateOnly day, Span<bool> lost)
    {
        double firstNode = spacing * Draws.Unit(Draws.Key(key, day.DayNumber));
        foreach (Candidate candidate in candidates)
        {
            lost[candidate.Cell] |= !Holds(candidate.AscendingFrom, candidate.Width, firstNode)
                && !Holds(candidate.DescendingFrom, candidate.Width, firstNode);
        }
    }

    // Whether a node lies in a stretch of longitudes.
    private bool Holds(double from, double width, double firstNode)
    {
        double toNext = (firstNode - from) / spacing;
        return (toNext - Math.Floor(toNext)) * spacing <= width;
    }

    /// <summary>A cell that may be missed, with the nodes of the orbits that see it.</summary>
    private readonly record struct Candidate(int Cell, double AscendingFrom, double DescendingFrom, double Width);
}
