using System.Text.RegularExpressions;
using Tomlyn.Parsing;
using Tomlyn.Syntax;

namespace IceExtent.HouseRules.Tests;

/// <summary>What every file of config/ keeps to.</summary>
public sealed partial class ConfigurationRules
{
    [GeneratedRegex("\"[^\"]*\"")]
    private static partial Regex Quoted { get; }

    public static TheoryData<string> Files() => [.. Names("config")];

    /// <summary>The files whose numbers decide results.</summary>
    public static TheoryData<string> FilesOfNumbers() =>
        [.. Names("config", "sensors"), .. Names("config", "grids"), Path.Combine("config", "defaults.toml")];

    [Theory]
    [MemberData(nameof(Files))]
    public void File_Shipped_IsToml(string file)
    {
        DocumentSyntax document = SyntaxParser.Parse(Repository.Read(file), file);

        Assert.Empty(document.Diagnostics);
    }

    [Theory]
    [MemberData(nameof(FilesOfNumbers))]
    public void Number_Shipped_HasItsSourceBesideItOrAbove(string file)
    {
        (int numbers, List<string> bare) = NumbersWithoutSource(File.ReadAllLines(Path.Combine(Repository.Root, file)));

        Assert.True(numbers > 0, $"{file}: the rule found no number.");
        Assert.Empty(bare);
    }

    /// <summary>Origin: worked. The first comment tells what the file is, and a blank line ends what a comment holds for.</summary>
    [Theory]
    [InlineData("# A file.\ncell_m = 1.0", 1, 1)]
    [InlineData("# A file.\ncell_m = 1.0 # measured", 1, 0)]
    [InlineData("# A file.\n\n# Measured.\n[table]\nwater = { 19v = 1.0 }\nice = { 19v = 2.0 }\n\nday = 1978-10-26", 3, 1)]
    [InlineData("title = \"25 km # 3\"\nname = 'no'\ntrue_north = true", 0, 0)]
    public void Rule_Text_FindsBareNumbers(string text, int numbers, int bare)
    {
        (int found, List<string> lines) = NumbersWithoutSource(text.Split('\n'));

        Assert.Equal((numbers, bare), (found, lines.Count));
    }

    // A comment holds for its own line, or from a line of its own down to the next blank one.
    private static (int Numbers, List<string> Bare) NumbersWithoutSource(string[] lines)
    {
        int numbers = 0;
        List<string> bare = [];
        bool opening = true;
        bool commented = false;
        foreach (string line in lines)
        {
            string[] parts = Quoted.Replace(line, string.Empty).Split('#', 2);
            bool ownComment = parts.Length == 2;
            if (line.StartsWith('#'))
            {
                commented = !opening;
                continue;
            }

            opening = false;
            commented &= line.Length > 0;
            if (parts[0].Split('=', 2) is [_, var value] && value.Any(char.IsAsciiDigit))
            {
                numbers++;
                if (!ownComment && !commented)
                {
                    bare.Add(line);
                }
            }
        }

        return (numbers, bare);
    }

    private static IEnumerable<string> Names(params string[] folder) => Directory
        .EnumerateFiles(Path.Combine([Repository.Root, .. folder]), "*.toml", SearchOption.AllDirectories)
        .Select(file => Path.GetRelativePath(Repository.Root, file))
        .Order(StringComparer.Ordinal);
}
