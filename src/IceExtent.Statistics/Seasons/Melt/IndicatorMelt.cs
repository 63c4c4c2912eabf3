namespace IceExtent.Statistics.Seasons;

/// <summary>Melt onset and freeze-up by several indicators, each held against the cell's own winter.</summary>
/// <remarks>
/// In the manner of [MarkusStroeve2009], in our own form: their indicators (jump of 37V, change of the gradient ratio, level of 19V +
/// 0.8 · 37V) as z-scores against mean and scatter of the cell's own winter, weighted and summed. A day with a sum from a limit
/// on looks like melt. Early melt is the first such day, continuous melt the first of a run that lasts. Freeze is the mirror
/// image: looking back from the winter after, which is then the reference, continuous freeze follows the last day that looks
/// like melt, and early freeze the last run that lasts; open water counts like melt there, so that where ice vanished in summer
/// freeze-up is when it is back and frozen. Days without a value neither make nor break a run, and a gap over an event hides it.
/// </remarks>
public static class IndicatorMelt
{
    /// <summary>Finds the four dates.</summary>
    /// <param name="series">The cell.</param>
    /// <param name="days">How its days lie.</param>
    /// <param name="windows">The windows of the ice year.</param>
    /// <param name="rules">Weights and limits.</param>
    /// <param name="room">Room for the series.</param>
    /// <exception cref="ArgumentException">The room is too small.</exception>
    public static MeltDates Dates(in MeltSeries series, SeriesDays days, MeltWindows windows, MeltRules rules, MeltWorkspace room)
    {
        ArgumentNullException.ThrowIfNull(rules);
        ArgumentNullException.ThrowIfNull(room);
        room.Check(series.Length);
        (SeasonDate earlyMelt, SeasonDate melt, MeltReference? winter) = Melt(series, days, windows, rules, room);
        (SeasonDate earlyFreeze, SeasonDate freeze) = Freeze(series, days, windows, winter, rules, room);
        return new(earlyMelt, melt, earlyFreeze, freeze);
    }

    private static (SeasonDate Early, SeasonDate Continuous, MeltReference? Winter) Melt(
        in MeltSeries series, SeriesDays days, MeltWindows windows, MeltRules rules, MeltWorkspace room)
    {
        SearchSpan winter = SearchSpan.Of(windows.Winter, days, series.Length);
        SearchSpan search = SearchSpan.Of(windows.Melt, days, series.Length);
        int begin = Math.Max(0, Math.Min(winter.First, search.First) - rules.Indicators.JumpDays);
        int end = Math.Min(series.Length, Math.Max(winter.Last, search.Last + rules.Indicators.PersistDays) + 1);
        if (end <= begin)
        {
            SeasonDate none = SeasonDate.Without(search.Cut ?? winter.Cut ?? SeasonDateState.NeverReached);
            return (none, none, null);
        }

        bool measurable = MeltIndicators.HasIce(series, winter, rules);
        if (measurable)
        {
            MeltIndicators.Fill(series, begin, end, rules, backward: false, room);
        }

        if ((measurable ? MeltReference.Measure(winter, rules.Indicators, room) : null) is not { } reference)
        {
            SeasonDate none = Unmeasured(series.IceFraction, days, winter, search);
            return (none, none, null);
        }

        if (search.Last < search.First)
        {
            SeasonDate none = SeasonDate.Without(search.Cut ?? SeasonDateState.NeverReached);
            return (none, none, reference);
        }

        MeltIndicators.Sum(begin, end, reference, room);
        (SeasonDate early, SeasonDate continuous) = new MeltSearch(series.IceFraction, days, search, rules, room, begin, end).Find();
        return (early, continuous, reference);
    }

    private static (SeasonDate Early, SeasonDate Continuous) Freeze(
        in MeltSeries series, SeriesDays days, MeltWindows windows, MeltReference? winterBefore, MeltRules rules, MeltWorkspace room)
    {
        SearchSpan winter = SearchSpan.Of(windows.NextWinter, days, series.Length);
        SearchSpan search = SearchSpan.Of(windows.Freeze, days, series.Length);
        int begin = Math.Min(winter.First, search.First);
        int end = Math.Min(series.Length, Math.Max(winter.Last, search.Last) + 1 + rules.Indicators.JumpDays);
        if (search.Last < search.First || end <= begin)
        {
            SeasonDate none = SeasonDate.Without(search.Cut ?? SeasonDateState.NeverReached);
            return (none, none);
        }

        bool measurable = MeltIndicators.HasIce(series, winter, rules);
        if (measurable || winterBefore is not null)
        {
            MeltIndicators.Fill(series, begin, end, rules, backward: true, room);
        }

        if (((measurable ? MeltReference.Measure(winter, rules.Indicators, room) : null) ?? winterBefore) is not { } reference)
        {
            SeasonDate none = Unmeasured(series.IceFraction, days, winter, search);
            return (none, none);
        }

        MeltIndicators.Sum(begin, end, reference, room);
        return new FreezeSearch(series.IceFraction, days, search, rules, room).Find();
    }

    // Without a winter nothing can be told; why there is none is why there is no date.
    private static SeasonDate Unmeasured(ReadOnlySpan<float> ice, SeriesDays days, SearchSpan winter, SearchSpan search)
    {
        if (winter.StartsLate || winter.EndsEarly)
        {
            return SeasonDate.Without(winter.EndsEarly ? SeasonDateState.NotYetReached : SeasonDateState.BeforeRecord);
        }

        int seen = 0;
        for (int day = winter.First; day <= winter.Last; day++)
        {
            seen += float.IsNaN(ice[day]) ? 0 : 1;
        }

        return 2 * seen < winter.Last - winter.First + 1 && search.Last >= search.First
            ? SeasonDate.Hidden(days.DayOf(search.First), days.DayOf(search.Last))
            : SeasonDate.Without(search.Cut ?? SeasonDateState.NeverReached);
    }
}
