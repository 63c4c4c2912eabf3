namespace IceExtent.Statistics.Seasons;

/// <summary>Where a date is sought in one series.</summary>
/// <param name="Window">The days.</param>
/// <param name="BeginSettledOn">The day from which on the record can no longer move the window's beginning.</param>
/// <param name="SettledOn">The day from which on the record can no longer move its end.</param>
internal readonly record struct SearchedHalf(SeasonWindow Window, int BeginSettledOn, int SettledOn);

/// <summary>Reads single dates off one series, and says why there is none.</summary>
/// <param name="span">The days of the series.</param>
/// <param name="raw">As observed: tells gaps that were bridged.</param>
/// <param name="series">Bridged and smoothed.</param>
/// <param name="lower">The same some standard errors lower.</param>
/// <param name="upper">The same some standard errors higher.</param>
/// <param name="pondless">The same with the ice that melt may hide.</param>
internal readonly ref struct DateSearch(
    IceYearSpan span, ReadOnlySpan<float> raw, ReadOnlySpan<float> series, ReadOnlySpan<float> lower, ReadOnlySpan<float> upper, ReadOnlySpan<float> pondless)
{
    private readonly ReadOnlySpan<float> raw = raw;
    private readonly ReadOnlySpan<float> series = series;
    private readonly ReadOnlySpan<float> lower = lower;
    private readonly ReadOnlySpan<float> upper = upper;
    private readonly ReadOnlySpan<float> pondless = pondless;

    /// <summary>A date of the melting half.</summary>
    public SeasonDate Fall(FallRule rule, float level, SearchedHalf half)
    {
        (int first, int last) = IndicesOf(half.Window);
        Bracket found = FallIn(series, rule, level, first, last);
        if (found.IsNone)
        {
            return rule.Pick == CrossingPick.Last && IsKnownIn(first, last) ? WithoutIce(half) : Absent(half, first, last);
        }

        bool isIceAtEnd = rule.Pick == CrossingPick.Last && (found.Before == last || (found.After != Crossings.None && series[found.After] >= level));
        if (isIceAtEnd)
        {
            return span.RecordLast < half.SettledOn ? SeasonDate.Without(SeasonDateState.NotYetReached) : SeasonDate.Without(SeasonDateState.NeverReached);
        }

        if (found.After == Crossings.None && span.RecordLast < half.SettledOn)
        {
            return SeasonDate.Without(SeasonDateState.NotYetReached);
        }

        Bracket early = FallIn(lower, rule, level, first, last), late = FallIn(pondless, rule, level, first, last);
        int latest = late.IsNone || late.After == Crossings.None || late.Before == last ? last : late.After;
        return Dated(found, isIceBefore: true, level, half, (early.Before == Crossings.None ? first : early.Before + 1, latest), rule.Named);
    }

    /// <summary>A date of the freezing half.</summary>
    public SeasonDate Rise(int days, float level, SearchedHalf half)
    {
        (int first, int last) = IndicesOf(half.Window);
        Bracket found = RiseIn(series, days, level, first, last);
        if (found.IsNone)
        {
            return Absent(half, first, last);
        }

        Bracket early = RiseIn(upper, days, level, first, last), late = RiseIn(lower, days, level, first, last);
        return Dated(
            found, isIceBefore: false, level, half, (early.Before == Crossings.None ? first : early.Before + 1, late.IsNone ? last : late.After), FallDay.FirstWithout);
    }

    // Not one day with ice in the window.
    private SeasonDate WithoutIce(SearchedHalf half) => SeasonDate.Without(
        span.RecordFirst > half.Window.First ? SeasonDateState.BeforeRecord
        : span.RecordLast < half.SettledOn ? SeasonDateState.NotYetReached
        : SeasonDateState.NeverReached);

    // No crossing in the window.
    private SeasonDate Absent(SearchedHalf half, int first, int last) =>
        span.RecordLast < half.SettledOn ? SeasonDate.Without(SeasonDateState.NotYetReached)
        : IsKnownIn(first, last) ? SeasonDate.Without(SeasonDateState.NeverReached)
        : span.RecordFirst > half.Window.Last ? SeasonDate.Without(SeasonDateState.BeforeRecord)
        : SeasonDate.Hidden(half.Window.First, Math.Max(half.Window.First, half.Window.Last));

    private SeasonDate Dated(Bracket found, bool isIceBefore, float level, SearchedHalf half, (int Earliest, int Latest) limits, FallDay named)
    {
        (int first, int last) = IndicesOf(half.Window);
        if (found.Before == Crossings.None && span.RecordFirst >= half.Window.First)
        {
            return SeasonDate.Without(SeasonDateState.BeforeRecord);
        }

        if (found.Before != Crossings.None && (series[found.Before] >= level) != isIceBefore)
        {
            // It was so when the window opened; an opening that may still move can change that.
            return SeasonDate.Without(span.RecordLast < half.BeginSettledOn ? SeasonDateState.NotYetReached : SeasonDateState.NeverReached);
        }

        int knownBefore = found.Before == Crossings.None ? first - 1 : KnownAtOrBefore(found.Before);
        int knownAfter = found.After == Crossings.None ? last : KnownAtOrAfter(found.After);
        int shift = span.Lead + (named == FallDay.LastWith ? 1 : 0);
        int earliest = Math.Max(Math.Min(limits.Earliest, knownBefore + 1) - shift, half.Window.First);
        int latest = Math.Max(limits.Latest, knownAfter) - shift;
        if (found.Before == Crossings.None || found.After == Crossings.None || found.After - found.Before > 1)
        {
            return SeasonDate.Hidden(Math.Min(earliest, latest), latest);
        }

        int day = found.After - shift;
        return SeasonDate.Found(day, Math.Min(earliest, day), Math.Max(latest, day));
    }

    private static Bracket FallIn(ReadOnlySpan<float> values, FallRule rule, float level, int first, int last)
    {
        if (rule.Pick == CrossingPick.First)
        {
            int below = Crossings.FirstBelow(values, first, last, level, rule.Persistence);
            return below == Crossings.None ? Bracket.None : new(Crossings.KnownBefore(values, below), below);
        }

        int above = Crossings.LastAtLeast(values, first, last, level, rule.Persistence);
        return above == Crossings.None ? Bracket.None : new(above, Crossings.KnownAfter(values, above));
    }

    private static Bracket RiseIn(ReadOnlySpan<float> values, int days, float level, int first, int last)
    {
        int above = Crossings.FirstAtLeast(values, first, last, level, days);
        return above == Crossings.None ? Bracket.None : new(Crossings.KnownBefore(values, above), above);
    }

    private (int First, int Last) IndicesOf(SeasonWindow window) =>
        (Math.Max(span.Lead + window.First, 0), Math.Min(span.Lead + window.Last, series.Length - 1));

    private bool IsKnownIn(int first, int last)
    {
        int known = Crossings.KnownAfter(series, first - 1);
        return known != Crossings.None && known <= last;
    }

    private int KnownAtOrBefore(int day) => float.IsNaN(raw[day]) ? Crossings.KnownBefore(raw, day) : day;

    private int KnownAtOrAfter(int day) => float.IsNaN(raw[day]) ? Crossings.KnownAfter(raw, day) : day;

    /// <summary>The known days on either side of a crossing; either may be missing.</summary>
    private readonly record struct Bracket(int Before, int After)
    {
        public static Bracket None => new(Crossings.None, Crossings.None);

        public bool IsNone => Before == Crossings.None && After == Crossings.None;
    }
}
