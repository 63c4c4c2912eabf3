namespace IceExtent.Statistics.Seasons;

/// <summary>The part of a search window that a series and its record hold. Both ends are indices and count.</summary>
/// <param name="First">The first day searched.</param>
/// <param name="Last">The last; before the first where there is none.</param>
/// <param name="StartsLate">Whether the window begins before the record.</param>
/// <param name="EndsEarly">Whether it goes on after the record.</param>
internal readonly record struct SearchSpan(int First, int Last, bool StartsLate, bool EndsEarly)
{
    /// <summary>How many standard errors leave no doubt: 95 %, both sides.</summary>
    public const double Limit95 = 1.96;

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

    /// <summary>Why no day of the span is the event: the record, a gap at the span's end, or that it did not come.</summary>
    /// <param name="ice">Concentration: a day with ice or water was seen.</param>
    /// <param name="days">How the series lies.</param>
    /// <param name="gapDays">A longer gap hides the event.</param>
    /// <param name="ruledOut">The last day that is known not to be the event, or below the span.</param>
    public SeasonDate Without(ReadOnlySpan<float> ice, SeriesDays days, int gapDays, int ruledOut)
    {
        if (Cut is { } state)
        {
            return SeasonDate.Without(state);
        }

        int known = Last;
        while (known >= First && float.IsNaN(ice[known]))
        {
            known--;
        }

        return Last - known > gapDays
            ? SeasonDate.Hidden(days.DayOf(Math.Max(ruledOut + 1, First)), days.DayOf(Last))
            : SeasonDate.Without(SeasonDateState.NeverReached);
    }
}
