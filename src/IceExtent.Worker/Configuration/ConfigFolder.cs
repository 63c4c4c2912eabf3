namespace IceExtent.Worker.Configuration;

/// <summary>The folder with the program's own grids, sensors and defaults.</summary>
/// <param name="Path">The folder, absolute.</param>
internal sealed record ConfigFolder(string Path)
{
    /// <summary>The one that was built with the program.</summary>
    public static ConfigFolder BesideProgram { get; } = new(System.IO.Path.Combine(AppContext.BaseDirectory, "config"));

    public string Defaults => System.IO.Path.Combine(Path, "defaults.toml");

    public string Grids => System.IO.Path.Combine(Path, "grids");

    public string Seasons => System.IO.Path.Combine(Path, "seasons");

    public string Regions => System.IO.Path.Combine(Path, "regions");

    public string Scenes => System.IO.Path.Combine(Path, "scenes");

    public string Demo => System.IO.Path.Combine(Path, "demo");

    public string Sensors => System.IO.Path.Combine(Path, "sensors");

    /// <summary>The names that files of one kind have, in ordinal order.</summary>
    public static IReadOnlyList<string> NamesIn(string folder, string ending = ".toml") => Directory.Exists(folder)
        ? [.. Directory.EnumerateFiles(folder, "*" + ending).Select(System.IO.Path.GetFileNameWithoutExtension).OfType<string>().Order(StringComparer.Ordinal)]
        : [];

    /// <summary>The file a run file means: a name in a folder of config/, or a path ending in .toml relative to the run file.</summary>
    /// <returns>The absolute path, or null after adding IE1007.</returns>
    public static string? Resolve(ConfigScope scope, string key, string written, string folder, string runFolder)
    {
        if (written.EndsWith(".toml", StringComparison.Ordinal))
        {
            return System.IO.Path.GetFullPath(written, runFolder);
        }

        IReadOnlyList<string> names = NamesIn(folder);
        if (names.Contains(written))
        {
            return System.IO.Path.Combine(folder, written + ".toml");
        }

        scope.UnknownName(key, scope.PositionOf(key), written, names);
        return null;
    }
}
