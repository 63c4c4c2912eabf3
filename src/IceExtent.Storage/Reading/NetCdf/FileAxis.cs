using PureHDF.VOL.Native;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>What an axis of a variable counts.</summary>
internal enum AxisRole
{
    /// <summary>The file does not say.</summary>
    Unknown,

    /// <summary>Days or other times.</summary>
    Time,

    /// <summary>The y of the map.</summary>
    Row,

    /// <summary>The x of the map.</summary>
    Column,
}

/// <summary>One axis of a variable.</summary>
/// <param name="Length">How many steps of it the variable has.</param>
/// <param name="Scale">Its coordinate variable or bare dimension, or null where the file names none.</param>
internal sealed record FileAxis(ulong Length, FileVariable? Scale)
{
    private static readonly string[] TimeNames = ["time", "t"];
    private static readonly string[] RowNames = ["y", "yc", "ygrid", "row", "rows"];
    private static readonly string[] ColumnNames = ["x", "xc", "xgrid", "column", "columns", "col", "cols"];

    /// <summary>What the axis counts, by [CF] attributes and, where they are silent, by its name.</summary>
    public AxisRole Role { get; } = Scale is null ? AxisRole.Unknown : RoleOf(Scale);

    /// <summary>How many steps the axis has, written by this variable or not.</summary>
    public ulong Extent => Scale?.Lengths is [var length] ? Math.Max(Length, length) : Length;

    /// <summary>The axes of a variable, in the order they are stored.</summary>
    public static FileAxis[] Of(FileVariable variable)
    {
        ulong[] lengths = variable.Lengths;
        NativeObjectReference1[][]? scales = variable.Attributes.References("DIMENSION_LIST");
        FileAxis[] axes = new FileAxis[lengths.Length];
        for (int axis = 0; axis < lengths.Length; axis++)
        {
            FileVariable? scale = axis < scales?.Length && scales[axis] is [var first, ..]
                ? variable.File.Scale(first)
                : null;
            axes[axis] = new(lengths[axis], scale);
        }

        return axes;
    }

    /// <summary>Whether a variable's attributes say that it counts time.</summary>
    public static bool CountsTime(FileVariable variable) =>
        variable.Attributes.Text("standard_name") == "time"
        || variable.Attributes.Text("axis") == "T"
        || variable.Attributes.Text("units")?.Contains(" since ", StringComparison.Ordinal) == true;

    /// <summary>The axis as messages show it, such as <c>y 448</c>.</summary>
    public override string ToString() => Scale is null ? $"{Length}" : $"{Scale.Name} {Length}";

    // The attribute that decides is asked first: most files have it, and each question costs.
    private static AxisRole RoleOf(FileVariable scale) => scale.Attributes.Text("standard_name") switch
    {
        "projection_y_coordinate" => AxisRole.Row,
        "projection_x_coordinate" => AxisRole.Column,
        _ when CountsTime(scale) => AxisRole.Time,
        _ => scale.Attributes.Text("axis") switch
        {
            "Y" => AxisRole.Row,
            "X" => AxisRole.Column,
            _ when Among(TimeNames, scale.Name) => AxisRole.Time,
            _ when Among(RowNames, scale.Name) => AxisRole.Row,
            _ when Among(ColumnNames, scale.Name) => AxisRole.Column,
            _ => AxisRole.Unknown,
        },
    };

    private static bool Among(string[] names, string name) => names.Contains(name, StringComparer.OrdinalIgnoreCase);
}
