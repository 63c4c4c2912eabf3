using IceExtent.Grids;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Which axes of a file run against the grid's: rows from the bottom, columns from the right.</summary>
internal readonly record struct Turn(bool Rows, bool Columns);

/// <summary>Compares the coordinates and the map of one file with the grid of the run.</summary>
/// <remarks>The channels of a file share their axes, so the answer to the last question is kept.</remarks>
internal sealed class GridAgreement(Grid grid)
{
    // Attributes that [CF] or common practice put on a grid mapping beside its numbers.
    private static readonly string[] MapNumbers =
    [
        GridMapping.OriginLatitude,
        GridMapping.OriginLongitude,
        GridMapping.VerticalLongitude,
        GridMapping.StandardParallel,
        GridMapping.OriginScale,
        GridMapping.FalseEasting,
        GridMapping.FalseNorthing,
        GridMapping.SemiMajorAxis,
        GridMapping.SemiMinorAxis,
        GridMapping.InverseFlattening,
        GridMapping.EarthRadius,
    ];

    private (FileVariable? X, FileVariable? Y, string? Map)? asked;
    private Turn answer;

    /// <summary>Which axes of a variable must be turned; none where the file has no coordinates.</summary>
    /// <exception cref="Faults.FaultException">IE2108: the file is on another grid.</exception>
    public Turn TurnOf(FileVariable variable, GridAxes axes)
    {
        (FileVariable? X, FileVariable? Y, string? Map) question =
            (axes.Columns.Scale, axes.Rows.Scale, variable.Attributes.Text("grid_mapping"));
        if (asked != question || question.X is null || question.Y is null)
        {
            answer = Compare(variable, axes, question.Map);
            asked = question;
        }

        return answer;
    }

    private Turn Compare(FileVariable variable, GridAxes axes, string? map)
    {
        double[] x = CoordinatesOf(variable.File, axes.Columns, "x") ?? Own(grid.Columns, grid.ColumnCenterMeters);
        double[] y = CoordinatesOf(variable.File, axes.Rows, "y") ?? Own(grid.Rows, grid.RowCenterMeters);
        return GridComparison.Compare(grid, x, y, MapOf(variable.File, map)) switch
        {
            GridMatch.Same same => new(Rows: same.FlipY, Columns: same.FlipX),
            GridMatch.Different other => throw NetCdfFaults.OtherGrid(
                variable.File.Path, string.Join("; ", other.Differences), $"coordinates and map of the grid {grid.Name}"),
            var match => throw new InvalidOperationException($"There is no such match: {match}."),
        };
    }

    // Where a file says nothing of an axis there is nothing to compare but its length.
    private static double[] Own(int count, Func<int, double> center) => [.. Enumerable.Range(0, count).Select(center)];

    // The coordinates of an axis in m, or null where the file has none.
    private static double[]? CoordinatesOf(HdfFile file, FileAxis axis, string usualName)
    {
        FileVariable? scale = axis.Scale ?? file.Find(usualName);
        if (scale is null || scale.Lengths is not [var length] || length != axis.Length || scale.ReadAll((int)length) is not { } values)
        {
            return null;
        }

        double meters = scale.Attributes.Text("units") switch
        {
            null or "m" or "meter" or "meters" or "metre" or "metres" => 1.0,
            "km" or "kilometer" or "kilometers" or "kilometre" or "kilometres" => 1000.0,
            { } unit => throw NetCdfFaults.OtherGrid(scale.Where, $"the unit '{unit}'", "coordinates on the map in m or km"),
        };
        double factor = scale.Attributes.Number("scale_factor") ?? 1.0;
        double offset = scale.Attributes.Number("add_offset") ?? 0.0;
        return Array.ConvertAll(values, value => ((value * factor) + offset) * meters);
    }

    // The attribute names the variable, in [CF] 1.7 and later with a colon and the coordinates it holds for.
    private static GridMapping? MapOf(HdfFile file, string? attribute)
    {
        string name = attribute?.Split(':', ' ')[0] ?? string.Empty;
        if (name.Length == 0
            || file.Find(name)?.Attributes is not { } attributes
            || attributes.Text("grid_mapping_name") is not { } kind)
        {
            return null;
        }

        Dictionary<string, double> numbers = new(StringComparer.Ordinal);
        foreach (string number in MapNumbers)
        {
            if (attributes.Number(number) is { } value)
            {
                numbers[number] = value;
            }
        }

        return new(kind, numbers);
    }
}
