namespace IceExtent.Storage.Faults;

/// <summary>Guesses which name was meant.</summary>
public static class NearestName
{
    /// <summary>The candidate with the fewest edits, or null where none is close.</summary>
    public static string? Of(string written, IEnumerable<string> candidates)
    {
        ArgumentNullException.ThrowIfNull(written);
        ArgumentNullException.ThrowIfNull(candidates);
        int most = Math.Max(2, written.Length / 3);
        return candidates
            .Select(candidate => (candidate, edits: Edits(written.ToUpperInvariant(), candidate.ToUpperInvariant())))
            .Where(pair => pair.edits <= most)
            .OrderBy(pair => pair.edits)
            .ThenBy(pair => pair.candidate, StringComparer.Ordinal)
            .Select(pair => pair.candidate)
            .FirstOrDefault();
    }

    /// <summary>A sentence that suggests the nearest candidate, if any is near; the fault itself lists them all.</summary>
    public static string Suggestion(string written, IReadOnlyCollection<string> candidates) =>
        Of(written, candidates) is { } nearest ? $"Did you mean {nearest}?" : "Choose an allowed one.";

    // The optimal string alignment distance: insertions, deletions, replacements and swaps of neighbours cost 1.
    private static int Edits(string left, string right)
    {
        int width = right.Length + 1;
        int[] cost = new int[(left.Length + 1) * width];
        for (int i = 0; i <= left.Length; i++)
        {
            for (int j = 0; j <= right.Length; j++)
            {
                int here = (i * width) + j;
                if (i == 0 || j == 0)
                {
                    cost[here] = i + j;
                    continue;
                }

                int replaced = cost[here - width - 1] + (left[i - 1] == right[j - 1] ? 0 : 1);
                cost[here] = Math.Min(replaced, 1 + Math.Min(cost[here - width], cost[here - 1]));
                if (i > 1 && j > 1 && left[i - 1] == right[j - 2] && left[i - 2] == right[j - 1])
                {
                    cost[here] = Math.Min(cost[here], 1 + cost[here - (2 * width) - 2]);
                }
            }
        }

        return cost[^1];
    }
}
