using IceExtent.Grids;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>The axes of a variable with what the file says of them.</summary>
internal sealed class GridAxes
{
    private readonly FileAxis[] axes;

    private GridAxes(FileAxis[] axes, PlaneShape shape) => (this.axes, Shape) = (axes, shape);

    /// <summary>The axes without the file they come from.</summary>
    public PlaneShape Shape { get; }

    /// <summary>The axis of the rows.</summary>
    public FileAxis Rows => axes[Shape.Row];

    /// <summary>The axis of the columns.</summary>
    public FileAxis Columns => axes[Shape.Column];

    /// <summary>The axis of time, or null.</summary>
    public FileAxis? Time => Shape.Time is { } time ? axes[time] : null;

    /// <summary>Finds the axes by what they say of themselves and, where they are silent, by their lengths.</summary>
    /// <param name="variable">The variable.</param>
    /// <param name="grid">The grid.</param>
    /// <param name="anySteps">Whether the axis beside rows and columns may count anything, such as months of the year.</param>
    /// <exception cref="Faults.FaultException">IE2107: the variable does not have the shape of the grid.</exception>
    public static GridAxes Find(FileVariable variable, Grid grid, bool anySteps = false)
    {
        FileAxis[] axes = FileAxis.Of(variable);
        if (PlaneOf(axes, grid) is not var (row, column))
        {
            throw NetCdfFaults.Shape(variable, Describe(axes), grid);
        }

        int? time = null;
        for (int axis = 0; axis < axes.Length; axis++)
        {
            if (axis == row || axis == column || (axes[axis].Role != AxisRole.Time && axes[axis].Length == 1))
            {
                continue;
            }

            time = time is null && axes[axis].Extent <= int.MaxValue && (anySteps || IsTime(variable, axes[axis]))
                ? axis
                : throw NetCdfFaults.Shape(variable, Describe(axes), grid);
        }

        int steps = time is { } timeAxis ? (int)axes[timeAxis].Extent : 1;
        return new(axes, new(variable.Lengths, row, column, time, steps));
    }

    // Of all pairs of axes with the right lengths: those that name themselves, then rows before columns, then the last.
    private static (int Row, int Column)? PlaneOf(FileAxis[] axes, Grid grid)
    {
        (int Row, int Column)? best = null;
        int bestWorth = -1;
        for (int row = 0; row < axes.Length; row++)
        {
            for (int column = 0; column < axes.Length; column++)
            {
                int worth = Worth(axes, row, column);
                if (row != column
                    && axes[row].Length == (ulong)grid.Rows
                    && axes[column].Length == (ulong)grid.Columns
                    && worth > bestWorth)
                {
                    (best, bestWorth) = ((row, column), worth);
                }
            }
        }

        return best;
    }

    private static int Worth(FileAxis[] axes, int row, int column)
    {
        const int Named = 1000;
        const int RowsFirst = 100;
        bool contradicted = axes[row].Role is AxisRole.Column or AxisRole.Time
            || axes[column].Role is AxisRole.Row or AxisRole.Time
            || Array.Exists(axes, axis => axis.Role == AxisRole.Row && !ReferenceEquals(axis, axes[row]))
            || Array.Exists(axes, axis => axis.Role == AxisRole.Column && !ReferenceEquals(axis, axes[column]));
        return contradicted
            ? -1
            : (axes[row].Role == AxisRole.Row ? Named : 0)
                + (axes[column].Role == AxisRole.Column ? Named : 0)
                + (row < column ? RowsFirst : 0)
                + row + column;
    }

    // An axis without a name is time where the file's variable of that name is as long.
    private static bool IsTime(FileVariable variable, FileAxis axis) =>
        axis.Role == AxisRole.Time
        || (axis.Scale is null && variable.File.Find("time")?.Lengths is [var length] && length == axis.Length);

    private static string Describe(FileAxis[] axes) =>
        axes.Length == 0 ? "a single number" : $"the shape {string.Join(", ", axes.Select(axis => axis.ToString()))}";
}
