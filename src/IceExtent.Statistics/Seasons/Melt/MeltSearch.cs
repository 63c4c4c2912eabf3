namespace IceExtent.Statistics.Seasons;

/// <summary>Looks forward for the first day and the first lasting run of days that look like melt.</summary>
internal ref struct MeltSearch(ReadOnlySpan<float> ice, SeriesDays days, SearchSpan search, MeltRules rules, MeltWorkspace room, int begin, int end)
{
    private readonly ReadOnlySpan<float> ice = ice;
    private readonly ReadOnlySpan<float> scores = room.Score.AsSpan(MeltIndicators.Pad, end);
    private readonly MeltIndicatorRules limits = rules.Indicators;

    public readonly (SeasonDate Early, SeasonDate Continuous) Find()
    {
        (float limit, float leastIce) = ((float)limits.MeltScore, (float)rules.LeastIceFraction);
        int frozen = -1, early = -1, earlyFrozen = -1, start = -1, startFrozen = -1;
        for (int day = FirstMelt(limit, ref frozen); day < end && (day <= search.Last || start >= 0); day++)
        {
            float score = scores[day];
            if (score < limit)
            {
                (frozen, start) = (day, -1);
                continue;
            }

            if (score >= limit && start < 0 && day >= search.First && day <= search.Last)
            {
                (start, startFrozen) = (day, frozen);
                (early, earlyFrozen) = early < 0 ? (day, frozen) : (early, earlyFrozen);
            }

            // Ice that vanishes while it melts goes on melting.
            if (start >= 0 && day - start + 1 >= limits.PersistDays && (score >= limit || ice[day] < leastIce))
            {
                return (Date(early, earlyFrozen), Date(start, startFrozen));
            }
        }

        return (early < 0 ? Without(frozen) : Date(early, earlyFrozen), Without(frozen));
    }

    // The first day of the window that looks like melt, or the one after the window; and the last frozen day before it.
    private readonly int FirstMelt(float limit, ref int frozen)
    {
        int day = search.First;
        while (day <= search.Last && !(scores[day] >= limit))
        {
            day++;
        }

        int before = day - 1;
        while (before >= begin && !(scores[before] < limit))
        {
            before--;
        }

        frozen = before >= begin ? before : frozen;
        return day;
    }

    private readonly SeasonDate Date(int day, int frozen)
    {
        if (frozen < 0 && search.StartsLate)
        {
            return SeasonDate.Without(SeasonDateState.BeforeRecord);
        }

        int after = frozen < 0 ? search.First - 1 : frozen;
        return day - after > rules.GapDays + 1
            ? SeasonDate.Hidden(days.DayOf(after + 1), days.DayOf(day))
            : SeasonDate.Found(days.DayOf(day), days.DayOf(Earliest(day)) - limits.SpreadDays, days.DayOf(Latest(day)) + limits.SpreadDays);
    }

    private readonly SeasonDate Without(int frozen) => search.Without(ice, days, rules.GapDays, frozen);

    // Back to the day after the last that is frozen beyond doubt.
    private readonly int Earliest(int day)
    {
        double sure = limits.MeltScore - (SearchSpan.Limit95 * limits.ScoreError);
        int before = day - 1;
        while (before >= search.First && !(scores[before] < sure))
        {
            before--;
        }

        return before + 1;
    }

    // On to the first that melts beyond doubt, no farther than a run must last.
    private readonly int Latest(int day)
    {
        double sure = limits.MeltScore + (SearchSpan.Limit95 * limits.ScoreError);
        int farthest = Math.Min(day + limits.PersistDays, end - 1), latest = day;
        for (int after = day; after <= farthest; after++)
        {
            latest = float.IsNaN(scores[after]) ? latest : after;
            if (scores[after] >= sure)
            {
                break;
            }
        }

        return latest;
    }
}
