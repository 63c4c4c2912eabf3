using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>A grid with the file that holds its land.</summary>
internal sealed record LoadedGrid(Grid Grid, string ConfigPath, string LandPath);

/// <summary>Reads grid files: config/grids or a run's own.</summary>
internal static class GridLoader
{
    private const double FarthestMeters = 4e7;

    /// <summary>Reads and checks one grid.</summary>
    /// <returns>The grid, or null after adding to <paramref name="faults"/>.</returns>
    public static LoadedGrid? Load(string path, ICollection<Fault> faults)
    {
        int before = faults.Count;
        if (TomlFile.Read(path, faults) is not { } table)
        {
            return null;
        }

        ConfigScope scope = new(table, string.Empty, faults);
        _ = scope.Text("title");
        int? epsg = scope.WholeNumber("epsg", 1024, 32_767, required: false);
        IMapProjection? projection = Projection(scope);
        int? columns = scope.WholeNumber("columns", 1, 20_000);
        int? rows = scope.WholeNumber("rows", 1, 20_000);
        double? cell = scope.Number("cell_m", 100.0, 1_000_000.0, "m");
        double? left = scope.Number("left_m", -FarthestMeters, FarthestMeters, "m");
        double? top = scope.Number("top_m", -FarthestMeters, FarthestMeters, "m");
        string? land = scope.Text("land");
        scope.RefuseUnknown();
        if (faults.Count > before)
        {
            return null;
        }

        GridFrame frame = new(columns!.Value, rows!.Value, cell!.Value, left!.Value, top!.Value);
        string folder = Path.GetDirectoryName(Path.GetFullPath(path))!;
        return new(
            new Grid(Path.GetFileNameWithoutExtension(path), epsg, projection!, frame),
            Path.GetFullPath(path),
            Path.GetFullPath(land!, folder));
    }

    private static IMapProjection? Projection(ConfigScope scope)
    {
        string? kind = scope.Name("projection", ["polar-stereographic", "polar-equal-area"]);
        double? axis = scope.Number("semi_major_axis_m", 6.3e6, 6.4e6, "m");
        double? flattening = scope.Number("inverse_flattening", 290.0, 310.0, string.Empty);
        string? pole = scope.Name("hemisphere", ["north", "south"]);
        double? origin = scope.Number("origin_longitude", -180.0, 360.0, "degrees east");
        double? trueScale = kind == "polar-equal-area" // It has no such latitude: the key is unknown there.
            ? null
            : scope.Number("true_scale_latitude", -89.9, 89.9, "degrees north", required: kind == "polar-stereographic");
        if (kind is null || axis is null || flattening is null || pole is null || origin is null)
        {
            return null;
        }

        Ellipsoid ellipsoid = new(axis.Value, flattening.Value);
        Hemisphere hemisphere = pole == "north" ? Hemisphere.North : Hemisphere.South;
        if (kind == "polar-equal-area")
        {
            return new PolarEqualArea(ellipsoid, hemisphere, origin.Value);
        }

        if (trueScale is not { } latitude)
        {
            return null;
        }

        if (latitude == 0.0 || latitude > 0.0 != (hemisphere == Hemisphere.North))
        {
            scope.Faults.Add(new(
                "IE1011",
                scope.Where("true_scale_latitude", scope.PositionOf("true_scale_latitude")),
                FormattableString.Invariant($"{latitude} degrees with hemisphere = \"{pole}\""),
                "a latitude of the same hemisphere",
                "Correct one of the two."));
            return null;
        }

        return new PolarStereographic(ellipsoid, latitude, origin.Value);
    }
}
