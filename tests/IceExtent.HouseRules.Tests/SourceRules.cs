using System.Text.RegularExpressions;

namespace IceExtent.HouseRules.Tests;

/// <summary>What every source file keeps to.</summary>
public sealed partial class SourceRules
{
    private const int MostLines = 400;

    // Written in parts, so that this file does not match itself.
    [GeneratedRegex(@"\b(TO" + @"DO|FIX" + @"ME|HA" + @"CK|NotImplemented" + @"Exception)\b|Skip" + @"\s*=\s*""")]
    private static partial Regex Unfinished { get; }

    [GeneratedRegex(@"^(namespace|public|internal|file)\b.*\b(class|record|struct)\s+\w*(Manager|Helper|Utils|Info)\b", RegexOptions.Multiline)]
    private static partial Regex EmptyName { get; }

    [Fact]
    public void EverySource_IsShorterThanTheHardLimit() => AssertNone(file => File.ReadLines(file).Count() > MostLines);

    [Fact]
    public void NoSource_HoldsUnfinishedWork() => AssertNone(file => Unfinished.IsMatch(File.ReadAllText(file)));

    [Fact]
    public void NoType_HasANameThatSaysNothing() => AssertNone(file => EmptyName.IsMatch(File.ReadAllText(file)));

    /// <summary>Packages are pinned in one place.</summary>
    [Fact]
    public void NoProject_NamesAVersion()
    {
        string[] projects = [.. Directory.EnumerateFiles(Repository.Root, "*.csproj", SearchOption.AllDirectories)];

        string[] pinned = [.. projects.Where(file => File.ReadAllText(file).Contains("Version=\"", StringComparison.Ordinal)).Select(Relative)];

        Assert.NotEmpty(projects);
        Assert.Empty(pinned);
    }

    private static void AssertNone(Func<string, bool> fault)
    {
        string[] sources = [.. Repository.Sources("src").Concat(Repository.Sources("tests")).Concat(Repository.Sources("scripts"))];
        string[] faulty = [.. sources.Where(fault).Select(Relative)];

        Assert.NotEmpty(sources);
        Assert.Empty(faulty);
    }

    private static string Relative(string file) => Path.GetRelativePath(Repository.Root, file);
}
