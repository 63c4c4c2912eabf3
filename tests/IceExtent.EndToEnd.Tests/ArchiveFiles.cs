namespace IceExtent.EndToEnd.Tests;

/// <summary>The files of an archive that must not depend on how it was made.</summary>
internal static class ArchiveFiles
{
    /// <summary>Relative path and bytes of everything but run records and the lock.</summary>
    public static SortedDictionary<string, byte[]> Of(string folder)
    {
        SortedDictionary<string, byte[]> files = new(StringComparer.Ordinal);
        foreach (string path in Directory.EnumerateFiles(folder, "*", SearchOption.AllDirectories))
        {
            string name = Path.GetRelativePath(folder, path);
            if (!name.StartsWith("runs", StringComparison.Ordinal) && name != ".lock")
            {
                files.Add(name, File.ReadAllBytes(path));
            }
        }

        return files;
    }

    /// <summary>Fails with the names of files that differ or are on one side only.</summary>
    public static void AssertSame(SortedDictionary<string, byte[]> expected, SortedDictionary<string, byte[]> actual)
    {
        Assert.Equal(expected.Keys, actual.Keys);
        Assert.Empty(expected.Where(file => !file.Value.AsSpan().SequenceEqual(actual[file.Key])).Select(file => file.Key));
    }
}
