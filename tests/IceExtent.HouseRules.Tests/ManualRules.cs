using System.Text.RegularExpressions;

namespace IceExtent.HouseRules.Tests;

/// <summary>The pages hold together: what they point at is there.</summary>
public sealed partial class ManualRules
{
    [GeneratedRegex(@"^(```|~~~).*?^\1", RegexOptions.Multiline | RegexOptions.Singleline)]
    private static partial Regex Fence { get; }

    [GeneratedRegex("`[^`\n]*`")]
    private static partial Regex Code { get; }

    [GeneratedRegex(@"\]\(([^)\s]+)\)")]
    private static partial Regex Link { get; }

    [GeneratedRegex(@"^#+ (.+?)\s*$", RegexOptions.Multiline)]
    private static partial Regex Heading { get; }

    [GeneratedRegex(@"[^\w\- ]")]
    private static partial Regex NotInAnchors { get; }

    [GeneratedRegex(@"^(scripts|config|docs|src|tests)(/[A-Za-z0-9_.-]+)+/?$")]
    private static partial Regex PathInRepository { get; }

    [GeneratedRegex(@"(?:scope|table|layered)\??\.(?:Text|Texts|Name|Number|Numbers|WholeNumber|Flag|Date|Table|Tables)\((?:""[a-z_]+"", )?""([a-z0-9_]+)""")]
    private static partial Regex KeyOfAFile { get; }

    [GeneratedRegex(@"TableColumn\.\w+<(?:DailyRow|DailyPlaceRow|Row)>\(""([a-z0-9_]+)""")]
    private static partial Regex Column { get; }

    [GeneratedRegex(@"\(ushort\)CellConditions\.\w+, ""([a-z0-9_]+)""")]
    private static partial Regex Flag { get; }

    [GeneratedRegex(@"string MethodName = ""([a-z0-9-]+)""")]
    private static partial Regex Method { get; }

    public static TheoryData<string> Pages() => [.. Repository.Pages().Select(page => Path.GetRelativePath(Repository.Root, page))];

    [Theory]
    [MemberData(nameof(Pages))]
    public void Page_Links_LeadSomewhere(string page)
    {
        string[] dead = [.. Link.Matches(Prose(page))
            .Select(match => match.Groups[1].Value)
            .Where(link => !link.Contains("://", StringComparison.Ordinal) && !LeadsSomewhere(page, link))];

        Assert.Empty(dead);
    }

    [Theory]
    [MemberData(nameof(Pages))]
    public void Page_PathsInCode_AreThere(string page)
    {
        string[] missing = [.. Code.Matches(Fence.Replace(Repository.Read(page), string.Empty))
            .Select(match => match.Value.Trim('`').Split(' ')[0])
            .Where(path => PathInRepository.IsMatch(path) && !Exists(Path.Combine(Repository.Root, path)))];

        Assert.Empty(missing);
    }

    /// <summary>Every key of run, sensor and grid files, every column and every flag is in the data dictionary.</summary>
    [Fact]
    public void DataDictionary_TellsEveryKeyColumnAndFlag()
    {
        string dictionary = Repository.Read("docs", "DATA.md");
        string[] words = [.. new[] { (KeyOfAFile, Path.Combine("src", "IceExtent.Worker")), (Column, Path.Combine("src", "IceExtent.Storage")), (Flag, Path.Combine("src", "IceExtent.Worker")) }
            .SelectMany(pair => WordsOf(pair.Item1, pair.Item2))];

        string[] untold = [.. words.Where(word => !Regex.IsMatch(dictionary, $@"`(?:\[*|[^`\n]*\.){word}\b[^`\n]*`"))];

        Assert.Empty(untold);
    }

    [Fact]
    public void EveryMethod_HasItsSectionAndItsRow()
    {
        string[] headings = [.. Heading.Matches(Repository.Read("docs", "METHODS.md")).Select(match => match.Groups[1].Value)];
        string dictionary = Repository.Read("docs", "DATA.md");

        string[] untold = [.. WordsOf(Method, Path.Combine("src", "IceExtent.Retrieval"))
            .Where(name => !headings.Any(heading => heading.EndsWith($"(`{name}`)", StringComparison.Ordinal)) || !dictionary.Contains($"| `{name}` |", StringComparison.Ordinal))];

        Assert.Empty(untold);
    }

    private static string[] WordsOf(Regex form, string folder)
    {
        string[] words = [.. Repository.Sources(folder)
            .SelectMany(file => form.Matches(File.ReadAllText(file)).Select(match => match.Groups[1].Value))
            .Distinct()];
        Assert.NotEmpty(words);
        return words;
    }

    // Without what is code: a bracket there is no link.
    private static string Prose(string page) => Code.Replace(Fence.Replace(Repository.Read(page), string.Empty), string.Empty);

    private static bool LeadsSomewhere(string page, string link)
    {
        string[] parts = link.Split('#', 2);
        string target = parts[0].Length == 0
            ? Path.Combine(Repository.Root, page)
            : Path.GetFullPath(parts[0], Path.GetDirectoryName(Path.Combine(Repository.Root, page))!);
        return Exists(target) && (parts.Length == 1 || Anchors(target).Contains(parts[1]));
    }

    // As the usual hosts make them of headings.
    private static string[] Anchors(string page) => [.. Heading.Matches(File.ReadAllText(page))
        .Select(match => NotInAnchors.Replace(match.Groups[1].Value, string.Empty).Replace(' ', '-').ToLowerInvariant())];

    private static bool Exists(string path) => File.Exists(path) || Directory.Exists(path);
}
