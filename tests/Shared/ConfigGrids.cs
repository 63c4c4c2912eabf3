using System.Globalization;
using IceExtent.Grids;

namespace IceExtent.TestKit;

/// <summary>Builds the grids that config/grids describes, so that what the files say is what is tested.</summary>
/// <remarks>Reads only the flat form of those files: one <c>key = value  # comment</c> a line. The product reads them with its own loader.</remarks>
internal static class ConfigGrids
{
    private static readonly Dictionary<string, Grid> Built = Directory
        .EnumerateFiles(RepositoryFolder.PathOf("config", "grids"), "*.toml")
        .Select(Path.GetFileNameWithoutExtension)
        .OfType<string>()
        .Order(StringComparer.Ordinal)
        .ToDictionary(name => name, Build);

    /// <summary>The names of all grids, in ordinal order.</summary>
    public static IReadOnlyList<string> Names { get; } = [.. Built.Keys.Order(StringComparer.Ordinal)];

    /// <summary>The grid of a name; the same instance each time, so that its areas are computed once.</summary>
    public static Grid Get(string name) => Built[name];

    /// <summary>The land file that a grid names.</summary>
    public static string LandFile(string name) =>
        Path.GetFullPath(Path.Combine(RepositoryFolder.PathOf("config", "grids"), Read(name)["land"]));

    /// <summary>The keys and values of a file, text without its quotes.</summary>
    public static Dictionary<string, string> Read(string name) => File
        .ReadLines(RepositoryFolder.PathOf("config", "grids", name + ".toml"))
        .Select(line => line.Split('#')[0].Trim())
        .Where(line => line.Length > 0)
        .Select(line => line.Split('=', 2))
        .ToDictionary(pair => pair[0].Trim(), pair => pair[1].Trim().Trim('"'));

    private static Grid Build(string name)
    {
        Dictionary<string, string> keys = Read(name);
        double Number(string key) => double.Parse(keys[key], CultureInfo.InvariantCulture);

        Ellipsoid ellipsoid = new(Number("semi_major_axis_m"), Number("inverse_flattening"));
        Hemisphere hemisphere = keys["hemisphere"] == "north" ? Hemisphere.North : Hemisphere.South;
        IMapProjection map = keys["projection"] switch
        {
            "polar-stereographic" => new PolarStereographic(ellipsoid, Number("true_scale_latitude"), Number("origin_longitude")),
            "polar-equal-area" => new PolarEqualArea(ellipsoid, hemisphere, Number("origin_longitude")),
            string other => throw new InvalidDataException($"{name}: projection {other}."),
        };
        GridFrame frame = new(
            (int)Number("columns"), (int)Number("rows"), Number("cell_m"), Number("left_m"), Number("top_m"));
        return new(name, (int)Number("epsg"), map, frame);
    }
}
