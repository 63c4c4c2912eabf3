namespace IceExtent.Statistics.Seasons;

/// <summary>The part of a search window that a series and its record hold. Both ends are indices and count.</summary>
/// <param name="First">The first day searched.</param>
/// <param name="Last">The last; before the first where there is none.</param>
/// <param name="StartsLate">Whether the window begins before the record.</param>
/// <param name="EndsEarly">Whether it goes on after the record.</param>
internal readonly record struct SearchSpan(int First, int Last, bool StartsLate, bool EndsEarly)
{
    public static SearchSpan Of(SeasonWindow window, SeriesDays days, int length)
    {
        int begin = days.IndexOf(window.First), end = days.IndexOf(window.Last);
        int first = Math.Max(0, days.RecordFirst), last = Math.Min(length - 1, days.RecordLast);
        return new(Math.Max(begin, first), Math.Min(end, last), begin < first, end > last);
    }

    /// <summary>Why an event that no day of the span shows has no date, where the record is the reason; else null.</summary>
    public SeasonDateState? Cut => (Last < First, StartsLate, EndsEarly) switch
    {
        (true, true, false) => SeasonDateState.BeforeRecord,
        (_, _, true) => SeasonDateState.NotYetReached,
        _ => null,
    };
}
