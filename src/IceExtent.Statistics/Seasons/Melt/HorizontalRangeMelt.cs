using System.Numerics;

namespace IceExtent.Statistics.Seasons;

/// <summary>Melt onset by the horizontal range, 19 GHz less 37 GHz in horizontal polarization.</summary>
/// <remarks>
/// Source: [Drobot2001]. Day by day: above one limit the snow is dry; below another it is wet; between them it is wet when the
/// range spreads more over the days from this one on than over those before it, by more than a limit. Departures, all our own:
/// days with little ice or without a value neither make nor break anything, a gap over the event hides it, and the limits of
/// the date: back and forth to where the noise of the range leaves no doubt, widened by a fixed number of days.
/// </remarks>
public static class HorizontalRangeMelt
{
    private const double Limit95 = 1.96;

    // Positions in the workspace: days before the series are there, and missing.
    private const int Pad = HorizontalRangeRules.MostTestDays;

    /// <summary>Finds the day.</summary>
    /// <param name="series">The cell; the vertical temperatures are not used.</param>
    /// <param name="days">How its days lie.</param>
    /// <param name="windows">The windows of the ice year; that of melt is used.</param>
    /// <param name="rules">Limits.</param>
    /// <param name="room">Room for the series.</param>
    /// <exception cref="ArgumentException">The room is too small.</exception>
    public static SeasonDate Onset(in MeltSeries series, SeriesDays days, MeltWindows windows, MeltRules rules, MeltWorkspace room)
    {
        ArgumentNullException.ThrowIfNull(rules);
        ArgumentNullException.ThrowIfNull(room);
        room.Check(series.Length);
        SearchSpan search = SearchSpan.Of(windows.Melt, days, series.Length);
        if (search.Last < search.First)
        {
            return SeasonDate.Without(search.Cut ?? SeasonDateState.NeverReached);
        }

        int begin = Math.Max(0, search.First - rules.HorizontalRange.TestDays);
        int end = Math.Min(series.Length, search.Last + rules.HorizontalRange.TestDays);
        KeepIce(series, begin, end, (float)rules.LeastIceFraction, room.Usable);
        return new Finder(series.IceFraction, days, search, rules, room, begin, end).Find();
    }

    // The range on days with ice, missing on all others and beyond the days that are asked for.
    private static void KeepIce(in MeltSeries series, int begin, int end, float leastIce, float[] usable)
    {
        usable.AsSpan(0, Pad + begin).Fill(float.NaN);
        ReadOnlySpan<float> range = series.HorizontalRangeKelvins, ice = series.IceFraction;
        Vector<float> least = new(leastIce), missing = new(float.NaN);
        int day = begin;
        for (; day <= end - Vector<float>.Count; day += Vector<float>.Count)
        {
            Vector<int> enough = Vector.GreaterThanOrEqual(new Vector<float>(ice[day..]), least);
            Vector.ConditionalSelect(enough, new Vector<float>(range[day..]), missing).CopyTo(usable, Pad + day);
        }

        for (; day < end; day++)
        {
            usable[Pad + day] = ice[day] >= leastIce ? range[day] : float.NaN;
        }

        usable.AsSpan(Pad + end).Fill(float.NaN);
    }

    // One search; positions are those of the series.
    private ref struct Finder(ReadOnlySpan<float> ice, SeriesDays days, SearchSpan search, MeltRules rules, MeltWorkspace room, int begin, int end)
    {
        private readonly ReadOnlySpan<float> ice = ice;
        private readonly HorizontalRangeRules limits = rules.HorizontalRange;
        private bool spreadsReady;

        public SeasonDate Find()
        {
            float dryAbove = (float)limits.DryAboveKelvins, wetBelow = (float)limits.WetBelowKelvins, change = (float)limits.LeastChangeKelvins;
            ReadOnlySpan<float> usable = room.Usable.AsSpan(Pad, end);
            int dry = -1; // The last day that is known to be dry.
            for (int day = begin; day <= search.Last; day++)
            {
                float range = usable[day];
                if (float.IsNaN(range) || (day >= search.First && range <= dryAbove && range >= wetBelow && float.IsNaN(ChangeAt(day))))
                {
                    continue;
                }

                if (day >= search.First && (range < wetBelow || (range <= dryAbove && ChangeAt(day) > change)))
                {
                    return Date(day, dry);
                }

                dry = day;
            }

            return Without(dry);
        }

        private SeasonDate Date(int day, int dry)
        {
            if (dry < 0 && search.StartsLate)
            {
                return SeasonDate.Without(SeasonDateState.BeforeRecord);
            }

            int after = dry < 0 ? search.First - 1 : dry;
            return day - after > rules.GapDays + 1
                ? SeasonDate.Hidden(days.DayOf(after + 1), days.DayOf(day))
                : SeasonDate.Found(days.DayOf(day), days.DayOf(Earliest(day)) - limits.SpreadDays, days.DayOf(Latest(day)) + limits.SpreadDays);
        }

        private readonly SeasonDate Without(int dry)
        {
            if (search.Cut is { } state)
            {
                return SeasonDate.Without(state);
            }

            int known = search.Last; // The last day on which anything was seen, ice or water.
            while (known >= search.First && float.IsNaN(ice[known]))
            {
                known--;
            }

            return search.Last - known > rules.GapDays
                ? SeasonDate.Hidden(days.DayOf(Math.Max(dry + 1, search.First)), days.DayOf(search.Last))
                : SeasonDate.Without(SeasonDateState.NeverReached);
        }

        // Back to the day after the last that is dry beyond doubt.
        private int Earliest(int day)
        {
            int before = day - 1;
            while (before >= search.First && (float.IsNaN(room.Usable[Pad + before]) || MayBeWet(before, Limit95 * limits.ErrorKelvins, whereUntested: true)))
            {
                before--;
            }

            return before + 1;
        }

        // On to the first that is wet beyond doubt, no farther than the test reaches.
        private int Latest(int day)
        {
            int farthest = Math.Min(day + limits.TestDays, end - 1), latest = day;
            for (int after = day; after <= farthest; after++)
            {
                if (!float.IsNaN(room.Usable[Pad + after]))
                {
                    latest = after;
                    if (MayBeWet(after, -Limit95 * limits.ErrorKelvins, whereUntested: false))
                    {
                        break;
                    }
                }
            }

            return latest;
        }

        private bool MayBeWet(int day, double doubt, bool whereUntested)
        {
            double range = room.Usable[Pad + day];
            double change = ChangeAt(day);
            return range < limits.WetBelowKelvins + doubt
                || (range <= limits.DryAboveKelvins + doubt && (double.IsNaN(change) ? whereUntested : change > limits.LeastChangeKelvins - doubt));
        }

        // How much more the range spreads from a day on than before it, in K; NaN with too few days on either side.
        private float ChangeAt(int day)
        {
            if (!spreadsReady)
            {
                SlidingSpread.Fill(room, Pad + search.First - limits.TestDays, Pad + search.Last + 1 + limits.TestDays, limits.TestDays);
                spreadsReady = true;
            }

            int at = Pad + day, before = at - limits.TestDays;
            return room.Count[at] >= limits.LeastTestDays && room.Count[before] >= limits.LeastTestDays
                ? room.Range[at] - room.Range[before]
                : float.NaN;
        }
    }
}
