using System.Globalization;

namespace IceExtent.Grids;

/// <summary>Says whether a file is on a grid.</summary>
/// <remarks>
/// Tolerances: a hundredth of a cell for coordinates, 1 m for the axes of the ellipsoid, 1e-6 degrees for angles
/// (longitudes in any turn), 1e-6 for the scale at the pole. Common practice; no source.
/// </remarks>
public static class GridComparison
{
    private const double CellShare = 0.01;

    /// <summary>Compares the number of rows and columns alone, for a file without coordinates.</summary>
    /// <param name="grid">The grid the file should be on.</param>
    /// <param name="rows">The length of the file's slower dimension.</param>
    /// <param name="columns">The length of the file's faster dimension.</param>
    /// <returns><see cref="GridMatch.Same"/> never asks for a flip here: a shape cannot tell which way rows run.</returns>
    public static GridMatch CompareShape(Grid grid, int rows, int columns)
    {
        ArgumentNullException.ThrowIfNull(grid);
        List<string> differences = [];
        AddShape(grid, rows, columns, differences);
        return Result(differences, flipX: false, flipY: false);
    }

    /// <summary>Compares coordinates and, where the file has one, its map.</summary>
    /// <param name="grid">The grid the file should be on.</param>
    /// <param name="columnMeters">The file's x, one a column, at cell centres, in m.</param>
    /// <param name="rowMeters">The file's y, one a row, at cell centres, in m.</param>
    /// <param name="mapping">The file's map, or null where it has none. Attributes that it lacks are not compared.</param>
    public static GridMatch Compare(
        Grid grid, ReadOnlySpan<double> columnMeters, ReadOnlySpan<double> rowMeters, GridMapping? mapping)
    {
        ArgumentNullException.ThrowIfNull(grid);
        List<string> differences = [];
        AddShape(grid, rowMeters.Length, columnMeters.Length, differences);

        GridFrame frame = grid.Frame;
        Axis x = new("x", "column", "right", "left", grid.Name, frame.Columns, frame.CellMeters, grid.ColumnCenterMeters(0));
        Axis y = new("y", "row", "up", "down", grid.Name, frame.Rows, -frame.CellMeters, grid.RowCenterMeters(0));
        bool flipX = x.Compare(columnMeters, differences);
        bool flipY = y.Compare(rowMeters, differences);

        if (mapping is not null)
        {
            GridMappingComparison.Compare(grid, mapping, differences);
        }

        return Result(differences, flipX, flipY);
    }

    private static GridMatch Result(List<string> differences, bool flipX, bool flipY) =>
        differences.Count == 0 ? new GridMatch.Same(flipX, flipY) : new GridMatch.Different(differences);

    private static void AddShape(Grid grid, int rows, int columns, List<string> differences)
    {
        if (rows == grid.Rows && columns == grid.Columns)
        {
            return;
        }

        string remark = rows == grid.Columns && columns == grid.Rows ? ": rows and columns are exchanged" : string.Empty;
        differences.Add(string.Create(
            CultureInfo.InvariantCulture,
            $"{rows} rows and {columns} columns, grid {grid.Name} has {grid.Rows} rows and {grid.Columns} columns{remark}"));
    }

    // One axis of the grid, in the order of its indices: x grows from column to column, y falls from row to row.
    private readonly record struct Axis(
        string Letter, string Line, string Forward, string Backward, string Grid, int Count, double StepMeters, double FirstMeters)
    {
        private double Tolerance => CellShare * Math.Abs(StepMeters);

        private double LastMeters => FirstMeters + ((Count - 1) * StepMeters);

        // Adds what differs and says whether the axis runs the other way.
        public bool Compare(ReadOnlySpan<double> found, List<string> differences)
        {
            if (found.Length == 0)
            {
                return false;
            }

            if (IndexOfNonFinite(found) is var bad and >= 0)
            {
                differences.Add(string.Create(CultureInfo.InvariantCulture, $"{Letter} of {Line} {bad} is not a number"));
                return false;
            }

            double step = found.Length > 1 ? (found[^1] - found[0]) / (found.Length - 1) : StepMeters;
            bool flip = step * StepMeters < 0.0;
            if (IndexOfUneven(found, step) is var uneven and >= 0)
            {
                differences.Add(string.Create(
                    CultureInfo.InvariantCulture,
                    $"{Letter} is not evenly spaced ({found[uneven]} m at {Line} {uneven}, where even steps of {Math.Abs(step)} m give {found[0] + (uneven * step)} m)"));
            }
            else if (Math.Abs(Math.Abs(step) - Math.Abs(StepMeters)) * (found.Length - 1) > Tolerance)
            {
                string remark = Math.Abs((Math.Abs(step) * 1000.0) - Math.Abs(StepMeters)) < Tolerance
                    ? ": the coordinates are probably in km"
                    : string.Empty;
                differences.Add(string.Create(
                    CultureInfo.InvariantCulture,
                    $"{Line} spacing {Math.Abs(step)} m, grid {Grid} has {Math.Abs(StepMeters)} m{remark}"));
            }
            else
            {
                AddPlace(found[0], flip, found.Length, differences);
            }

            return flip;
        }

        private void AddPlace(double first, bool flip, int count, List<string> differences)
        {
            double expected = flip ? LastMeters : FirstMeters;
            double shift = first - expected;
            double half = 0.5 * Math.Abs(StepMeters);
            if (Math.Abs(shift) <= Tolerance)
            {
                return;
            }

            if (count == Count + 1 && Math.Abs(Math.Abs(shift) - half) <= Tolerance)
            {
                differences.Add(string.Create(
                    CultureInfo.InvariantCulture,
                    $"{Letter} gives the {count} edges of the {Line}s, not their {Count} centres"));
            }
            else if (Math.Abs(Math.Abs(shift) - half) <= Tolerance)
            {
                differences.Add(string.Create(
                    CultureInfo.InvariantCulture,
                    $"{Letter} is shifted by half a cell ({half} m {(shift > 0.0 ? Forward : Backward)}): it may give edges where grid {Grid} has centres"));
            }
            else
            {
                differences.Add(string.Create(
                    CultureInfo.InvariantCulture,
                    $"{Letter} starts at {first} m, grid {Grid} has {expected} m there"));
            }
        }

        private static int IndexOfNonFinite(ReadOnlySpan<double> found)
        {
            for (int index = 0; index < found.Length; index++)
            {
                if (!double.IsFinite(found[index]))
                {
                    return index;
                }
            }

            return -1;
        }

        private int IndexOfUneven(ReadOnlySpan<double> found, double step)
        {
            for (int index = 1; index < found.Length; index++)
            {
                // Relative to the file's own step: coordinates in km must still be seen as even.
                double allowed = CellShare * Math.Min(Math.Abs(step), Math.Abs(StepMeters));
                if (Math.Abs(found[index] - (found[0] + (index * step))) > allowed)
                {
                    return index;
                }
            }

            return -1;
        }
    }
}
