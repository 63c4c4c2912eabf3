using System.Text.RegularExpressions;

namespace IceExtent.HouseRules.Tests;

/// <summary>The manuals cannot fall behind the source.</summary>
public sealed partial class DocumentationRules
{
    [GeneratedRegex("\"(IE[0-9]{4})\"")]
    private static partial Regex CodeInSource { get; }

    [GeneratedRegex(@"IE[0-9]{4}")]
    private static partial Regex CodeAnywhere { get; }

    // Author and year, or the short name of a standard or data set.
    [GeneratedRegex(@"\[([A-Z][A-Za-z]+[0-9]{4,5}[a-z]?|[A-Z]{2,}[0-9]*(?:-[A-Z]+)?|NetCDF4|NaturalEarth|TopoJSON)\]")]
    private static partial Regex Key { get; }

    [GeneratedRegex(@"^- \*\*\[([^\]]+)\]\*\* ", RegexOptions.Multiline)]
    private static partial Regex Entry { get; }

    [Fact]
    public void EveryErrorCode_InSource_HasAHeadingInErrorsMd()
    {
        string manual = Repository.Read("docs", "ERRORS.md");
        string[] codes = [.. CodesInSource()];
        string[] untold = [.. codes.Where(code => !manual.Contains($"## {code} ", StringComparison.Ordinal))];

        Assert.NotEmpty(codes);
        Assert.Empty(untold);
    }

    [Fact]
    public void EveryErrorCode_InErrorsMd_IsInTheSource()
    {
        HashSet<string> codes = [.. CodesInSource(), .. CodeAnywhere.Matches(Repository.Read("scripts", "iceextent")).Select(match => match.Value)];
        string[] headings = [.. Repository.Read("docs", "ERRORS.md").Split('\n').Where(line => line.StartsWith("## IE", StringComparison.Ordinal)).Select(line => line.Split(' ')[1])];

        string[] unused = [.. headings.Where(code => !codes.Contains(code))];

        Assert.NotEmpty(headings);
        Assert.Empty(unused);
    }

    [Fact]
    public void ErrorsMd_Headings_RiseAndComeOnce()
    {
        string[] headings = [.. Repository.Read("docs", "ERRORS.md").Split('\n').Where(line => line.StartsWith("## IE", StringComparison.Ordinal)).Select(line => line.Split(' ')[1])];

        Assert.Equal(headings.Distinct().Order(StringComparer.Ordinal), headings);
    }

    [Fact]
    public void EveryKey_InSourcesConfigAndPages_IsInTheBibliography()
    {
        string[] entries = [.. Entries()];
        string[] keys = [.. KeysInUse()];

        string[] unknown = [.. keys.Except(entries)];

        Assert.NotEmpty(keys);
        Assert.Empty(unknown);
    }

    [Fact]
    public void EveryEntry_OfTheBibliography_IsUsedAndComesOnce()
    {
        string[] entries = [.. Entries()];
        HashSet<string> keys = [.. KeysInUse()];

        string[] unused = [.. entries.Where(entry => !keys.Contains(entry))];

        Assert.NotEmpty(entries);
        Assert.Empty(unused);
        Assert.Equal(entries.Distinct(), entries);
    }

    private static IEnumerable<string> Entries() => Entry.Matches(Repository.Read("docs", "REFERENCES.md")).Select(match => match.Groups[1].Value);

    private static IEnumerable<string> KeysInUse() => Repository.Sources("src").Concat(Repository.Sources("tests")).Concat(Repository.Sources("scripts"))
        .Concat(Directory.EnumerateFiles(Path.Combine(Repository.Root, "config"), "*.toml", SearchOption.AllDirectories))
        .Concat(Repository.Pages().Where(page => Path.GetFileName(page) != "REFERENCES.md"))
        .SelectMany(file => Key.Matches(File.ReadAllText(file)).Select(match => match.Groups[1].Value))
        .Distinct()
        .Order(StringComparer.Ordinal);

    private static IEnumerable<string> CodesInSource() => Repository.Sources("src")
        .SelectMany(file => CodeInSource.Matches(File.ReadAllText(file)).Select(match => match.Groups[1].Value))
        .Distinct()
        .Order(StringComparer.Ordinal);
}
