namespace IceExtent.Storage.Reading;

/// <summary>Guesses which name was meant.</summary>
internal static class NearestName
{
    /// <summary>The name that takes the fewest changed letters, or null where none is near.</summary>
    public static string? Of(string wrong, IReadOnlyList<string> names)
    {
        (string? best, int fewest) = (null, (wrong.Length / 2) + 1);
        foreach (string name in names)
        {
            int changes = Changes(wrong, name);
            if (changes < fewest)
            {
                (best, fewest) = (name, changes);
            }
        }

        return best;
    }

    // Letters to put in, take out or change; upper and lower case count as one.
    private static int Changes(string from, string to)
    {
        int[] row = [.. Enumerable.Range(0, to.Length + 1)];
        for (int i = 1; i <= from.Length; i++)
        {
            int diagonal = row[0];
            row[0] = i;
            for (int j = 1; j <= to.Length; j++)
            {
                int change = diagonal + (char.ToUpperInvariant(from[i - 1]) == char.ToUpperInvariant(to[j - 1]) ? 0 : 1);
                diagonal = row[j];
                row[j] = Math.Min(change, Math.Min(row[j], row[j - 1]) + 1);
            }
        }

        return row[^1];
    }
}
