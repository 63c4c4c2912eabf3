namespace IceExtent.Grids;

/// <summary>Size and place of a grid on its map.</summary>
/// <param name="Columns">The number of columns, 1 or more.</param>
/// <param name="Rows">The number of rows, 1 or more.</param>
/// <param name="CellMeters">The side of a cell on the map, in m.</param>
/// <param name="LeftMeters">The x of the left edge of column 0, in m.</param>
/// <param name="TopMeters">The y of the top edge of row 0, in m.</param>
public sealed record GridFrame(int Columns, int Rows, double CellMeters, double LeftMeters, double TopMeters);
