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
    private const int SpreadsAtOnce = 40; // Days of spreads that are worked out together.

    // Positions in the workspace: days before the series are there, and missing. A test looks back so far at most.
    private const int Reach = SpreadsAtOnce + (2 * HorizontalRangeRules.MostTestDays) + 16; // What is read beyond the last day.
    private const int Pad = HorizontalRangeRules.MostTestDays + HorizontalRangeRules.MostLeadDays;

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

        int begin = Math.Max(0, search.First - rules.HorizontalRange.TestDays - rules.HorizontalRange.LeadDays);
        int end = Math.Min(series.Length, search.Last + rules.HorizontalRange.TestDays);
        bool any = KeepIce(series, begin, end, (float)rules.LeastIceFraction, room.Usable);
        end = any ? end : begin; // Without a usable day there is nothing to look through.
        return new Finder(series.IceFraction, days, search, rules, room, begin, end).Find();
    }

    // The range on days with ice, missing on all others and beyond the days that are asked for. Whether there is any.
    private static bool KeepIce(in MeltSeries series, int begin, int end, float leastIce, float[] usable)
    {
        int past = Math.Min(Pad + end + Reach, usable.Length);
        usable.AsSpan(begin, Pad).Fill(float.NaN);
        ReadOnlySpan<float> range = series.HorizontalRangeKelvins, ice = series.IceFraction;
        Vector<float> least = new(leastIce), missing = new(float.NaN);
        Vector<int> any = Vector<int>.Zero;
        int day = begin;
        for (; day <= end - Vector<float>.Count; day += Vector<float>.Count)
        {
            Vector<int> enough = Vector.GreaterThanOrEqual(new Vector<float>(ice[day..]), least);
            Vector.ConditionalSelect(enough, new Vector<float>(range[day..]), missing).CopyTo(usable, Pad + day);
            any |= enough;
        }

        bool found = any != Vector<int>.Zero;
        for (; day < end; day++)
        {
            usable[Pad + day] = ice[day] >= leastIce ? range[day] : float.NaN;
            found |= ice[day] >= leastIce;
        }

        usable.AsSpan(Pad + end, past - Pad - end).Fill(float.NaN);
        return found;
    }

    // One search; positions are those of the series.
    private ref struct Finder(ReadOnlySpan<float> ice, SeriesDays days, SearchSpan search, MeltRules rules, MeltWorkspace room, int begin, int end)
    {
        private readonly ReadOnlySpan<float> ice = ice;
        private readonly ReadOnlySpan<float> ranges = room.Usable.AsSpan(Pad, end);
        private readonly HorizontalRangeRules limits = rules.HorizontalRange;
        private int spreadsFrom; // Spreads are known from the first of these positions until before the second.
        private int spreadsUntil;
        private double drop = double.NaN; // Below it the snow is wet, where the test gave the date and it was moved.

        public SeasonDate Find()
        {
            float dryAbove = (float)limits.DryAboveKelvins, wetBelow = (float)limits.WetBelowKelvins, change = (float)limits.LeastChangeKelvins;
            int dry = -1; // The last day that is known to be dry.
            for (int day = begin; day <= search.Last && day < end; day++)
            {
                float range = ranges[day];
                if (day < search.First || range > dryAbove || float.IsNaN(range))
                {
                    dry = float.IsNaN(range) ? dry : day;
                    continue;
                }

                if (range < wetBelow)
                {
                    return Date(day, dry);
                }

                float growth = GrowthAt(day);
                if (growth > change && (limits.LeadDays > 0 ? DropAt(day) : day) is var wet && wet >= 0)
                {
                    return Date(wet, LastUsable(wet - 1, day, dry));
                }

                dry = float.IsNaN(growth) ? dry : day;
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

        private readonly SeasonDate Without(int dry) => search.Without(ice, days, rules.GapDays, dry);

        // The first day below the middle between the lowest range of either half, where most days from it on are; -1 where there is none.
        private int DropAt(int day)
        {
            int at = Pad + day - limits.LeadDays, before = at - limits.TestDays;
            int end = Math.Min(day - limits.LeadDays + limits.TestDays, ranges.Length);
            float middle = 0.5f * (room.Lagged[at] - room.Range[at] + room.Lagged[before] - room.Range[before]);
            int first = -1, below = 0, above = 0;
            for (int later = day; later < end; later++)
            {
                first = first < 0 && ranges[later] < middle && later <= search.Last ? later : first;
                below += first >= 0 && ranges[later] < middle ? 1 : 0;
                above += first >= 0 && ranges[later] >= middle ? 1 : 0;
            }

            drop = below > above ? middle : double.NaN;
            return below > above ? first : -1;
        }

        private readonly int LastUsable(int day, int first, int otherwise)
        {
            while (day >= first && float.IsNaN(ranges[day]))
            {
                day--;
            }

            return day >= first ? day : otherwise;
        }

        // Back to the day after the last that is dry beyond doubt.
        private int Earliest(int day)
        {
            int before = day - 1;
            while (before >= search.First && (float.IsNaN(ranges[before]) || MayBeWet(before, SearchSpan.Limit95 * limits.ErrorKelvins, whereUntested: true)))
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
                if (!float.IsNaN(ranges[after]))
                {
                    latest = after;
                    if (MayBeWet(after, -SearchSpan.Limit95 * limits.ErrorKelvins, whereUntested: false))
                    {
                        break;
                    }
                }
            }

            return latest;
        }

        private bool MayBeWet(int day, double doubt, bool whereUntested)
        {
            double range = ranges[day];
            if (!double.IsNaN(drop))
            {
                return range < drop + doubt;
            }

            double growth = GrowthAt(day);
            return range < limits.WetBelowKelvins + doubt
                || (range <= limits.DryAboveKelvins + doubt && (double.IsNaN(growth) ? whereUntested : growth > limits.LeastChangeKelvins - doubt));
        }

        // How much more the range spreads from a day on than before it, in K; NaN with too few days on either side.
        private float GrowthAt(int day)
        {
            int at = Pad + day - limits.LeadDays, before = at - limits.TestDays;
            if (at >= spreadsUntil || before < spreadsFrom)
            {
                (spreadsFrom, spreadsUntil) = (before, at + SpreadsAtOnce);
                SlidingSpread.Fill(room, spreadsFrom, spreadsUntil, limits.TestDays);
            }

            return room.Count[at] >= limits.LeastTestDays && room.Count[before] >= limits.LeastTestDays
                ? room.Range[at] - room.Range[before]
                : float.NaN;
        }
    }
}
