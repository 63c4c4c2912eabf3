using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>Tables of cells that a run makes once and finds again.</summary>
internal static class CellTable
{
    /// <summary>Reads a table, if it is the one of a digest.</summary>
    /// <param name="path">The file.</param>
    /// <param name="key">The metadata key of the digest.</param>
    /// <param name="digest">The digest wanted.</param>
    /// <param name="decode">Makes something of it.</param>
    /// <returns>That, or null where the file is missing, damaged or of another digest: it can be made again.</returns>
    public static T? Read<T>(string path, string key, string digest, Func<StoredTable, T> decode)
        where T : class
    {
        if (!File.Exists(path))
        {
            return null;
        }

        try
        {
            StoredTable table = TableFile.Read(path);
            return table.Metadata.GetValueOrDefault(key) == digest ? decode(table) : null;
        }
        catch (FaultException)
        {
            return null;
        }
    }

    /// <summary>Splits rows that are ordered by name into those of each name: its first row and the row after its last.</summary>
    public static IEnumerable<(int First, int End)> Groups(IReadOnlyList<string> names)
    {
        for (int first = 0, end; first < names.Count; first = end)
        {
            end = first + 1;
            while (end < names.Count && names[end] == names[first])
            {
                end++;
            }

            yield return (first, end);
        }
    }
}
