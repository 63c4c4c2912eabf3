using System.Xml.Linq;

namespace IceExtent.HouseRules.Tests;

/// <summary>The layers run one way, and the pure ones stay pure.</summary>
public sealed class LayerRules
{
    private static readonly string[] Order = ["Grids", "Retrieval", "Statistics", "Scenes", "Storage", "Reports", "Worker"];

    public static TheoryData<string> Projects() =>
        [.. Directory.EnumerateDirectories(Path.Combine(Repository.Root, "src")).Select(folder => Path.GetFileName(folder)!).Order(StringComparer.Ordinal)];

    public static TheoryData<string> PureProjects() => ["Grids", "Retrieval", "Statistics", "Scenes"];

    [Theory]
    [MemberData(nameof(Projects))]
    public void Project_References_OnlyLayersAboveIt(string project)
    {
        XDocument file = XDocument.Load(Path.Combine(Repository.Root, "src", project, project + ".csproj"));
        int own = LayerOf(project);
        string[] wrong = [.. file.Descendants("ProjectReference")
            .Select(reference => Path.GetFileNameWithoutExtension(reference.Attribute("Include")!.Value.Replace('\\', '/')))
            .Where(other => LayerOf(other) >= own)];

        Assert.True(own >= 0, $"{project} has no place in the order of layers.");
        Assert.Empty(wrong);
    }

    [Fact]
    public void Scenes_References_NoStatistics()
    {
        string file = Repository.Read("src", "IceExtent.Scenes", "IceExtent.Scenes.csproj");

        Assert.DoesNotContain("IceExtent.Statistics", file, StringComparison.Ordinal);
    }

    /// <summary>No clock, file, log, thread or culture in the pure layers. Text search: it finds names, not meanings.</summary>
    [Theory]
    [MemberData(nameof(PureProjects))]
    public void PureProject_Sources_TouchNothingOutside(string layer)
    {
        string[] forbidden =
        [
            "DateTime.Now", "DateTime.UtcNow", "DateTimeOffset.", "Stopwatch", "TimeProvider", "System.IO", "File.", "Directory.", "Console.",
            "Thread.", "Task.", "Parallel.", "lock (", "CurrentCulture", "Environment.", "ILogger", "Random.Shared", "new Random()",
        ];
        string[] found = [.. Repository.Sources("src", $"IceExtent.{layer}")
            .SelectMany(file => File.ReadLines(file), (file, line) => (file, line))
            .Where(pair => !pair.line.TrimStart().StartsWith("//", StringComparison.Ordinal))
            .SelectMany(pair => forbidden.Where(word => ContainsName(pair.line, word)), (pair, word) => $"{Path.GetFileName(pair.file)}: {word}")];

        Assert.Empty(found);
    }

    // "GridFile." must not count as "File.".
    private static bool ContainsName(string line, string word)
    {
        int at = line.IndexOf(word, StringComparison.Ordinal);
        return at >= 0 && (at == 0 || !char.IsLetterOrDigit(line[at - 1]));
    }

    private static int LayerOf(string project) => Array.IndexOf(Order, project.Replace("IceExtent.", string.Empty, StringComparison.Ordinal));
}
