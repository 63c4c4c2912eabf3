namespace IceExtent.Statistics.Seasons;

/// <summary>Looks back from the end of autumn for the last day and the last lasting run of days that look like melt or are open.</summary>
internal ref struct FreezeSearch(ReadOnlySpan<float> ice, SeriesDays days, SearchSpan search, MeltRules rules, MeltWorkspace room)
{
    private const int None = -1;

    private readonly ReadOnlySpan<float> ice = ice;
    private readonly ReadOnlySpan<float> scores = room.Score.AsSpan(MeltIndicators.Pad, search.Last + 1);
    private readonly MeltIndicatorRules limits = rules.Indicators;

    public readonly (SeasonDate Early, SeasonDate Continuous) Find()
    {
        (double limit, float leastIce) = (Limit(), (float)rules.LeastIceFraction);
        int lastFrozen = None, frozen = None, runEnd = None; // The last frozen day, the next one after the day in hand, the end of the run in hand.
        (int Thaw, int Frozen) continuous = (None, None), early = (None, None);
        for (int day = search.Last; day >= search.First && early.Thaw == None; day--)
        {
            float score = scores[day];
            if (score < limit)
            {
                (lastFrozen, frozen, runEnd) = (Math.Max(lastFrozen, day), day, None);
            }
            else if (score >= limit || ice[day] < leastIce)
            {
                runEnd = runEnd == None ? day : runEnd;
                int length = runEnd - day + 1;
                continuous = continuous.Thaw == None && length >= limits.InterruptDays ? (runEnd, frozen) : continuous;
                early = length >= limits.PersistDays ? (runEnd, frozen) : early;
            }
        }

        return (Date(early, lastFrozen, None, limit), Date(continuous, lastFrozen, limits.PersistDays, limit));
    }

    // Half-way from the winter to the summer of the cell, and never less than the limit of melt: ice changes while it ages.
    private readonly double Limit()
    {
        double sum = 0.0;
        int count = 0;
        for (int day = search.First; day <= search.Last && day < search.First + limits.SummerDays; day++)
        {
            if (!float.IsNaN(scores[day]))
            {
                sum += scores[day];
                count++;
            }
        }

        return count == 0 ? limits.MeltScore : Math.Max(limits.MeltScore, 0.5 * sum / count);
    }

    private readonly SeasonDate Date((int Thaw, int Frozen) turn, int lastFrozen, int leastDays, double limit)
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
                days.DayOf(turn.Frozen), days.DayOf(Earliest(turn.Frozen, limit)) - limits.FreezeSpreadDays, days.DayOf(Latest(turn.Frozen, limit)) + limits.FreezeSpreadDays);
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
    private readonly int Earliest(int day, double limit)
    {
        double sure = limit + (SearchSpan.Limit95 * limits.ScoreError);
        int before = day - 1;
        while (before >= search.First && !(scores[before] >= sure) && !(ice[before] < rules.LeastIceFraction))
        {
            before--;
        }

        return before + 1;
    }

    // On to the first that is frozen beyond doubt, no farther than a run must last.
    private readonly int Latest(int day, double limit)
    {
        double sure = limit - (SearchSpan.Limit95 * limits.ScoreError);
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
