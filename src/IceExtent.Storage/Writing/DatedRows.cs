namespace IceExtent.Storage.Writing;

/// <summary>The order of tables that have one row a day and name.</summary>
internal static class DatedRows
{
    /// <summary>Orders rows by date, then by name.</summary>
    /// <exception cref="ArgumentException">A day and name comes twice.</exception>
    public static IReadOnlyList<TRow> InOrder<TRow>(IEnumerable<TRow> rows, Func<TRow, DateOnly> date, Func<TRow, string> name)
    {
        List<TRow> ordered = [.. rows.OrderBy(date).ThenBy(name, StringComparer.Ordinal)];
        for (int row = 1; row < ordered.Count; row++)
        {
            if (date(ordered[row]) == date(ordered[row - 1]) && name(ordered[row]) == name(ordered[row - 1]))
            {
                throw new ArgumentException($"{name(ordered[row])} has two rows on {date(ordered[row]):O}.", nameof(rows));
            }
        }

        return ordered;
    }
}
