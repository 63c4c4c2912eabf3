using System.Text.RegularExpressions;

namespace IceExtent.HouseRules.Tests;

/// <summary>What every source file keeps to.</summary>
public sealed partial class SourceRules
{
    private const int MostLines = 400;

    [GeneratedRegex(@"\b(TO" + @"DO|FIX" + @"ME|HA" + @"CK|NotImplementedException)\b|Skip\s*=\s*""")]
    private static partial Regex Unfinished { get; }

    [GeneratedRegex(@"^(namespace|public|internal|file)\b.*\b(class|record|struct)\s+\w*(Manager|Helper|Utils|Info)\b", RegexOptions.Multiline)]
    private static partial Regex EmptyName { get; }

    [Fact]
    public void EverySource_IsShorterThanTheHardLimit() =>
        Assert.Empty(All().Select(file => (Name: Relative(file), Lines: File.ReadLines(file).Count())).Where(file => file.Lines > MostLines));

    [Fact]
    public void NoSource_HoldsUnfinishedWork() =>
        Assert.Empty(All().Where(file => Unfinished.IsMatch(File.ReadAllText(file))).Select(Relative));

    [Fact]
    public void NoType_HasANameThatSaysNothing() =>
        Assert.Empty(All().Where(file => EmptyName.IsMatch(File.ReadAllText(file))).Select(Relative));

    /// <summary>Packages are pinned in one place.</summary>
    [Fact]
    public void NoProject_NamesAVersion()
    {
        string[] projects = [.. Directory.EnumerateFiles(Repository.Root, "*.csproj", SearchOption.AllDirectories)];

        Assert.NotEmpty(projects);
        Assert.Empty(projects.Where(file => File.ReadAllText(file).Contains("Version=\"", StringComparison.Ordinal)).Select(Relative));
    }

    private static IEnumerable<string> All() => Repository.Sources("src").Concat(Repository.Sources("tests")).Concat(Repository.Sources("scripts"));

    private static string Relative(string file) => Path.GetRelativePath(Repository.Root, file);
}
