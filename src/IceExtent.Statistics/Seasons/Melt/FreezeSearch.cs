namespace IceExtent.Statistics.Seasons;

/// <summary>Looks back from the end of autumn for the last day and the last lasting run of days that look like melt or are open.</summary>
internal ref struct FreezeSearch(ReadOnlySpan<float> ice, SeriesDays days, SearchSpan search, MeltRules rules, MeltWorkspace room)
{
    private const double Limit95 = 1.96;
    private const int None = -1;

    private readonly ReadOnlySpan<float> ice = ice;
    private readonly ReadOnlySpan<float> scores = room.Score.AsSpan(MeltIndicators.Pad, search.Last + 1);
    private readonly MeltIndicatorRules limits = rules.Indicators;

    public readonly (SeasonDate Early, SeasonDate Continuous) Find()
    {
        (float limit, float leastIce) = ((float)limits.MeltScore, (float)rules.LeastIceFraction);
        int lastFrozen = None, frozen = None; // The last frozen day, and the next one after the day in hand.
        int runEnd = None, openEnd = None;    // The last days of the runs in hand: melt or water, water alone.
        (int Thaw, int Frozen) continuous = (None, None), early = (None, None);
        for (int day = search.Last; day >= search.First && early.Thaw == None; day--)
        {
            float score = scores[day];
            bool open = ice[day] < leastIce;
            if (score < limit)
            {
                (lastFrozen, frozen, runEnd, openEnd) = (Math.Max(lastFrozen, day), day, None, None);
                continue;
            }

            if (!open && float.IsNaN(score))
            {
                continue;
            }

            runEnd = runEnd == None ? day : runEnd;
            openEnd = !open ? None : openEnd == None ? day : openEnd;
            if (continuous.Thaw == None && (!open || openEnd - day + 1 >= limits.PersistDays))
            {
                continuous = (open ? openEnd : day, frozen);
            }

            early = runEnd - day + 1 >= limits.PersistDays ? (runEnd, frozen) : early;
        }

        return (Date(early, lastFrozen, None), Date(continuous, lastFrozen, limits.PersistDays));
    }

    private readonly SeasonDate Date((int Thaw, int Frozen) turn, int lastFrozen, int leastDays)
    {
        if (turn.Thaw == None)
        {
            return lastFrozen == None ? Unseen() : SeasonDate.Without(search.StartsLate ? SeasonDateState.BeforeRecord : SeasonDateState.NeverReached);
        }

        if (turn.Frozen == None || (search.EndsEarly && lastFrozen - turn.Frozen + 1 < leastDays))
        {
            return SeasonDate.Without(search.EndsEarly ? SeasonDateState.NotYetReached : SeasonDateState.NeverReached);
        }

        return turn.Frozen - turn.Thaw > rules.GapDays + 1
            ? SeasonDate.Hidden(days.DayOf(turn.Thaw + 1), days.DayOf(turn.Frozen))
            : SeasonDate.Found(
                days.DayOf(turn.Frozen), days.DayOf(Earliest(turn.Frozen)) - limits.SpreadDays, days.DayOf(Latest(turn.Frozen)) + limits.SpreadDays);
    }

    // No day that could be judged: open all through, or never looked at.
    private readonly SeasonDate Unseen()
    {
        int missing = 0;
        for (int day = search.First; day <= search.Last; day++)
        {
            missing += float.IsNaN(ice[day]) ? 1 : 0;
        }

        return search.Cut is { } state ? SeasonDate.Without(state)
            : 2 * missing > search.Last - search.First + 1 ? SeasonDate.Hidden(days.DayOf(search.First), days.DayOf(search.Last))
            : SeasonDate.Without(SeasonDateState.NeverReached);
    }

    // Back to the day after the last that melts beyond doubt or is open.
    private readonly int Earliest(int day)
    {
        double sure = limits.MeltScore + (Limit95 * limits.ScoreError);
        int before = day - 1;
        while (before >= search.First && !(scores[before] >= sure) && !(ice[before] < rules.LeastIceFraction))
        {
            before--;
        }

        return before + 1;
    }

    // On to the first that is frozen beyond doubt, no farther than a run must last.
    private readonly int Latest(int day)
    {
        double sure = limits.MeltScore - (Limit95 * limits.ScoreError);
        int farthest = Math.Min(day + limits.PersistDays, search.Last), latest = day;
        for (int after = day; after <= farthest; after++)
        {
            latest = float.IsNaN(scores[after]) ? latest : after;
            if (scores[after] < sure)
            {
                break;
            }
        }

        return latest;
    }
}
