using IceExtent.Grids;

namespace IceExtent.Retrieval.Tests.Filling;

/// <summary>A small day round the north pole: every cell 25 km, the pole in the middle of the grid.</summary>
internal sealed class FillingDay
{
    public const float CellError = 0.05f;
    private const double KilometersPerDegree = 111.694; // Along a meridian at the pole.

    /// <summary>Makes a day; NaN is a cell without an observation.</summary>
    public FillingDay(int rows, int columns, Func<int, int, double> total, double gapRadiusCells = 0.0, Func<int, int, bool>? land = null)
    {
        Grid = new("small", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(columns, rows, 25_000.0, -12_500.0 * columns, 12_500.0 * rows));
        bool[] ocean = [.. Enumerable.Range(0, Grid.CellCount).Select(cell => land?.Invoke(cell / columns, cell % columns) != true)];
        Mask = new(Grid, ocean, gapRadiusCells > 0.0 ? 90.0 - (gapRadiusCells * 25.0 / KilometersPerDegree) : null);
        Planes = new(Grid.CellCount);
        Observe(total);
    }

    public Grid Grid { get; }

    public CellMask Mask { get; }

    public ConcentrationPlanes Planes { get; }

    public float[] Totals => Planes.Total.ToArray();

    /// <summary>Starts the day again with other values; half of the ice is multiyear.</summary>
    public void Observe(Func<int, int, double> total)
    {
        for (int cell = 0; cell < Grid.CellCount; cell++)
        {
            float value = Mask.Conditions[cell] == CellConditions.None ? (float)total(cell / Grid.Columns, cell % Grid.Columns) : float.NaN;
            Planes.Total[cell] = value;
            Planes.Multiyear[cell] = value / 2f;
            Planes.FirstYear[cell] = value - (value / 2f);
            Planes.StandardError[cell] = float.IsNaN(value) ? float.NaN : CellError;
            Planes.Conditions[cell] = Mask.Conditions[cell] != CellConditions.None ? Mask.Conditions[cell]
                : float.IsNaN(value) ? CellConditions.NoObservation : CellConditions.None;
        }
    }

    public int FillNeighbours(int least) => new NeighbourFilling(Grid, least).Fill(Planes);

    public int FillGap(double leastRimShare = 0.5) => new PolarGapFilling(new PolarGapSystem(Grid, Mask), leastRimShare).Fill(Planes);
}
