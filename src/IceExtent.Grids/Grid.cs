namespace IceExtent.Grids;

/// <summary>A regular grid of square cells on a polar map. An instance is always valid.</summary>
/// <remarks>
/// Shape: rows × columns, row-major, row 0 at the top (largest y), column 0 at the left (smallest x).
/// A cell is named by its index, row × columns + column.
/// </remarks>
public sealed class Grid
{
    private readonly Lazy<double[]> areas;
    private readonly Lazy<double[]> latitudes;

    /// <summary>Sets a grid up.</summary>
    /// <param name="name">The name run files use, such as <c>north-25km</c>.</param>
    /// <param name="epsg">The code of the coordinate reference system, or null for one that has none.</param>
    /// <param name="projection">The map.</param>
    /// <param name="frame">Size and place of the grid on the map.</param>
    /// <exception cref="ArgumentException">The frame has no cells or a cell has no size.</exception>
    public Grid(string name, int? epsg, IMapProjection projection, GridFrame frame)
    {
        ArgumentException.ThrowIfNullOrEmpty(name);
        ArgumentNullException.ThrowIfNull(projection);
        ArgumentNullException.ThrowIfNull(frame);
        if (frame.Columns < 1 || frame.Rows < 1 || !(frame.CellMeters > 0.0) || !double.IsFinite(frame.CellMeters))
        {
            throw new ArgumentException("A grid needs at least one cell, and a cell needs a size.", nameof(frame));
        }

        (Name, Epsg, Projection, Frame) = (name, epsg, projection, frame);
        latitudes = new(ComputeLatitudes);
        areas = new(ComputeAreas);
    }

    /// <summary>The name run files use.</summary>
    public string Name { get; }

    /// <summary>The [EPSG] code of the coordinate reference system, or null for one that has none.</summary>
    public int? Epsg { get; }

    /// <summary>The map.</summary>
    public IMapProjection Projection { get; }

    /// <summary>Size and place on the map.</summary>
    public GridFrame Frame { get; }

    /// <summary>The pole in the middle of the map.</summary>
    public Hemisphere Hemisphere => Projection.Hemisphere;

    /// <summary>The number of columns.</summary>
    public int Columns => Frame.Columns;

    /// <summary>The number of rows.</summary>
    public int Rows => Frame.Rows;

    /// <summary>The number of cells.</summary>
    public int CellCount => Frame.Rows * Frame.Columns;

    /// <summary>The true area of every cell on the ellipsoid, in m². Shape: one value a cell.</summary>
    /// <remarks>
    /// Cell size squared over the areal scale at the cell's centre: within 2e-6 of the geodesic polygon
    /// (see <c>CellAreaReferenceTests</c>).
    /// </remarks>
    public ReadOnlySpan<double> CellAreasSquareMeters => areas.Value;

    /// <summary>The latitude of every cell's centre, degrees north. Shape: one value a cell.</summary>
    public ReadOnlySpan<double> LatitudesDegrees => latitudes.Value;

    /// <summary>The x of a column's centre, in m.</summary>
    public double ColumnCenterMeters(int column) => Frame.LeftMeters + ((column + 0.5) * Frame.CellMeters);

    /// <summary>The y of a row's centre, in m.</summary>
    public double RowCenterMeters(int row) => Frame.TopMeters - ((row + 0.5) * Frame.CellMeters);

    /// <summary>The map position of a cell's centre.</summary>
    public MapPosition CenterOf(int cell) => new(ColumnCenterMeters(cell % Columns), RowCenterMeters(cell / Columns));

    /// <summary>The latitude and longitude of a cell's centre.</summary>
    public GeoPosition PositionOf(int cell) => Projection.Inverse(CenterOf(cell));

    /// <summary>The cell that holds a map position, or null outside the grid.</summary>
    /// <remarks>A position on an edge belongs to the cell on its right or below it.</remarks>
    public int? CellAt(MapPosition position)
    {
        double column = Math.Floor((position.XMeters - Frame.LeftMeters) / Frame.CellMeters);
        double row = Math.Floor((Frame.TopMeters - position.YMeters) / Frame.CellMeters);
        return column >= 0 && column < Columns && row >= 0 && row < Rows
            ? ((int)row * Columns) + (int)column
            : null;
    }

    /// <summary>The cell that holds a position on the Earth, or null outside the grid.</summary>
    public int? CellAt(GeoPosition position) => CellAt(Projection.Forward(position));

    private double[] ComputeLatitudes()
    {
        double[] values = new double[CellCount];
        for (int cell = 0; cell < values.Length; cell++)
        {
            values[cell] = PositionOf(cell).LatitudeDegrees;
        }

        return values;
    }

    private double[] ComputeAreas()
    {
        double[] values = new double[CellCount];
        double mapArea = Frame.CellMeters * Frame.CellMeters;
        ReadOnlySpan<double> cellLatitudes = LatitudesDegrees;
        for (int cell = 0; cell < values.Length; cell++)
        {
            values[cell] = mapArea / Projection.ArealScale(cellLatitudes[cell]);
        }

        return values;
    }
}
