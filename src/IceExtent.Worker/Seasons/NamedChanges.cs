using IceExtent.Statistics.Seasons;

namespace IceExtent.Worker.Seasons;

/// <summary>What became of the provisional dates of regions and places, in words.</summary>
internal static class NamedChanges
{
    /// <summary>Dates that moved, were withdrawn or are new in years that were not over.</summary>
    /// <param name="before">The rows that the archive had.</param>
    /// <param name="now">Those that it gets.</param>
    /// <param name="nameOf">The region or place of a row.</param>
    public static IEnumerable<string> Of<TRow>(IEnumerable<TRow> before, IEnumerable<TRow> now, Func<TRow, string> nameOf)
        where TRow : SeasonRow
    {
        Dictionary<(int, string), TRow> was = before.Where(row => !row.IsFinal).ToDictionary(row => (row.Year.Year, nameOf(row)));
        foreach (TRow row in now)
        {
            if (!was.TryGetValue((row.Year.Year, nameOf(row)), out TRow? old))
            {
                continue;
            }

            foreach (SeasonEvent which in SeasonEvents.All)
            {
                if (ChangeOf(row.Year, old.Dates.Of(which), row.Dates.Of(which)) is { } change)
                {
                    yield return $"{nameOf(row)} {row.Year.Year} {SeasonEvents.NameOf(which)}: {change}";
                }
            }
        }
    }

    private static string? ChangeOf(IceYear year, SeasonDate? before, SeasonDate? now) => (before?.Day, now?.Day) switch
    {
        ({ } day, { } again) when day == again => null,
        ({ } day, { } other) => FormattableString.Invariant($"moved from {year.DateOf(day):yyyy-MM-dd} to {year.DateOf(other):yyyy-MM-dd}"),
        ({ } day, null) => FormattableString.Invariant($"{year.DateOf(day):yyyy-MM-dd} withdrawn"),
        (null, { } found) => FormattableString.Invariant($"new, {year.DateOf(found):yyyy-MM-dd}"),
        _ => null,
    };
}
