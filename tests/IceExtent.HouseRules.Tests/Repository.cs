namespace IceExtent.HouseRules.Tests;

/// <summary>The checkout the tests run from.</summary>
internal static class Repository
{
    private static readonly string[] NotSources = [".git", "artifacts", "bin", "node_modules", "obj", "TestResults"];

    /// <summary>The folder that holds the solution.</summary>
    public static string Root { get; } = FindRoot();

    /// <summary>Every C# source of a part of the tree, build output left out.</summary>
    public static IEnumerable<string> Sources(params string[] folder) => Directory
        .EnumerateFiles(Path.Combine([Root, .. folder]), "*.cs", SearchOption.AllDirectories)
        .Where(file => !file.Contains($"{Path.DirectorySeparatorChar}obj{Path.DirectorySeparatorChar}", StringComparison.Ordinal)
            && !file.Contains($"{Path.DirectorySeparatorChar}bin{Path.DirectorySeparatorChar}", StringComparison.Ordinal))
        .Order(StringComparer.Ordinal);

    /// <summary>Every page of text, build output left out.</summary>
    public static IEnumerable<string> Pages() => Directory
        .EnumerateFiles(Root, "*.md", SearchOption.AllDirectories)
        .Where(file => !Path.GetRelativePath(Root, file).Split(Path.DirectorySeparatorChar).Any(part => NotSources.Contains(part)))
        .Order(StringComparer.Ordinal);

    /// <summary>A file's text.</summary>
    public static string Read(params string[] path) => File.ReadAllText(Path.Combine([Root, .. path]));

    private static string FindRoot()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "IceExtent.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException("The tests do not run inside a checkout.");
    }
}
