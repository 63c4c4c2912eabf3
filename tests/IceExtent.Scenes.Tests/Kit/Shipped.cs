using System.Collections.Concurrent;
using System.Globalization;
using IceExtent.Scenes.Parameters;

namespace IceExtent.Scenes.Tests.Kit;

/// <summary>Files that ship with the program or with the tests.</summary>
internal static class Shipped
{
    private static readonly ConcurrentDictionary<string, SceneParameters> Scenes = new();

    public static SceneParameters Scene(string name) =>
        Scenes.GetOrAdd(name, key => RecordFromToml.Read<SceneParameters>(PathOf("config", "scenes", key + ".toml")));

    public static string PathOf(params string[] parts) => Path.Combine([AppContext.BaseDirectory, .. parts]);

    /// <summary>The rows of a comma-separated file below its heading.</summary>
    public static IEnumerable<string[]> Rows(string name) =>
        File.ReadLines(PathOf("data", name)).Skip(1).Select(line => line.Split(','));

    public static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
