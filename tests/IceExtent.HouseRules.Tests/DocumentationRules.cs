using System.Text.RegularExpressions;

namespace IceExtent.HouseRules.Tests;

/// <summary>The manuals cannot fall behind the source.</summary>
public sealed partial class DocumentationRules
{
    [GeneratedRegex("\"(IE[0-9]{4})\"")]
    private static partial Regex CodeInSource { get; }

    [GeneratedRegex(@"IE[0-9]{4}")]
    private static partial Regex CodeAnywhere { get; }

    [GeneratedRegex(@"\[([A-Z][A-Za-z]+[0-9]{4}[a-z]?|EPSG|CF)\]")]
    private static partial Regex Key { get; }

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
    public void EveryKey_InSourcesAndConfig_IsInTheBibliography()
    {
        string bibliography = Repository.Read("docs", "REFERENCES.md");
        IEnumerable<string> files = Repository.Sources("src").Concat(Repository.Sources("tests"))
            .Concat(Directory.EnumerateFiles(Path.Combine(Repository.Root, "config"), "*.toml", SearchOption.AllDirectories));
        string[] keys = [.. files.SelectMany(file => Key.Matches(File.ReadAllText(file)).Select(match => match.Groups[1].Value)).Distinct()];

        string[] unknown = [.. keys.Where(key => !bibliography.Contains($"**[{key}]**", StringComparison.Ordinal)).Order(StringComparer.Ordinal)];

        Assert.NotEmpty(keys);
        Assert.Empty(unknown);
    }

    private static IEnumerable<string> CodesInSource() => Repository.Sources("src")
        .SelectMany(file => CodeInSource.Matches(File.ReadAllText(file)).Select(match => match.Groups[1].Value))
        .Distinct()
        .Order(StringComparer.Ordinal);
}
