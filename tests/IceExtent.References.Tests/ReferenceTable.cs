using System.Globalization;
using IceExtent.TestKit;

namespace IceExtent.References.Tests;

/// <summary>Reads the committed tables under tests/data.</summary>
internal static class ReferenceTable
{
    /// <summary>The fields of each line after the header.</summary>
    public static IEnumerable<string[]> Rows(string file) =>
        File.ReadLines(RepositoryFolder.PathOf("tests", "data", file)).Skip(1).Select(line => line.Split(','));

    /// <summary>Reads a number.</summary>
    public static double Number(string field) => double.Parse(field, CultureInfo.InvariantCulture);
}
