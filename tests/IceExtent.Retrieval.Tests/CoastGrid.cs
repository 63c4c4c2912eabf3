using IceExtent.Grids;

namespace IceExtent.Retrieval.Tests;

/// <summary>Small grids of 25 km with coasts that can be drawn: '#' is land, anything else is sea.</summary>
internal sealed class CoastGrid
{
    public const double CellMeters = 25_000.0;

    public CoastGrid(params string[] rows)
        : this(rows[0].Length, [.. string.Concat(rows).Select(sign => sign == '#' ? 1f : 0f)])
    {
    }

    public CoastGrid(int columns, float[] landFraction)
    {
        int rows = landFraction.Length / columns;
        Grid = new("coast", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(columns, rows, CellMeters, 0.0, 0.0));
        Land = new(landFraction);
        Ocean = Land.OceanBelow(0.5);
    }

    public Grid Grid { get; }

    public LandShare Land { get; }

    public bool[] Ocean { get; }

    public CoastZones Zones => new(Grid, Ocean);

    /// <summary>A day's concentrations: the given ones on the sea, missing on land; a third of the ice is multiyear.</summary>
    public ConcentrationPlanes Day(Func<int, float> fraction)
    {
        ConcentrationPlanes planes = new(Grid.CellCount);
        for (int cell = 0; cell < Grid.CellCount; cell++)
        {
            float total = Ocean[cell] ? fraction(cell) : float.NaN;
            planes.Total[cell] = total;
            planes.Multiyear[cell] = total / 3f;
            planes.FirstYear[cell] = total - planes.Multiyear[cell];
        }

        return planes;
    }
}
