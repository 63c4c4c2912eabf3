using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Which source rules which span of days, and why: what a person checks before a record of many sensors is run.</summary>
/// <param name="Ruling">Spans of days ruled by one source, in date order; days without input do not part a span.</param>
/// <param name="Overlaps">Days that two sources could give, by pair; longer pauses part a span.</param>
/// <param name="LeftToEarlier">Days that a source could rule and that one earlier in the run file rules, by pair.</param>
/// <param name="HeldBack">Days with input that no source rules, because the sources' own periods leave them out.</param>
internal sealed record SensorSpans(
    IReadOnlyList<RulingSpan> Ruling, IReadOnlyList<PairSpan> Overlaps, IReadOnlyList<PairSpan> LeftToEarlier, IReadOnlyList<DaySpan> HeldBack)
{
    private const int LongestPauseDays = 31; // Own choice: a single lost day, or a sensor that looks every other day, is no new span.

    /// <summary>Reads the spans off a plan.</summary>
    public static SensorSpans Of(RunPlan plan)
    {
        Dictionary<DateOnly, List<OpenedSource>> offered = [];
        foreach (SourceOffer offer in plan.Offers)
        {
            foreach (DateOnly date in offer.Days.Select(day => day.Date))
            {
                (offered.TryGetValue(date, out List<OpenedSource>? sources) ? sources : offered[date] = []).Add(offer.Source);
            }
        }

        HashSet<DateOnly> planned = [.. plan.Days.Select(day => day.Date)];
        return new(
            Rules(plan.Days, offered),
            Pairs(plan, (earlier, later) => earlier.Days.Select(day => day.Date).Intersect(later.Days.Select(day => day.Date))),
            Pairs(plan, (earlier, later) => plan.Days
                .Where(day => day.Source == earlier.Source)
                .Select(day => day.Date)
                .Intersect(later.Days.Select(day => day.Date).Where(later.Source.Settings.Period.Holds))),
            [.. Spans(offered.Keys.Where(date => !planned.Contains(date)).Order())]);
    }

    private static List<RulingSpan> Rules(IReadOnlyList<PlannedDay> days, Dictionary<DateOnly, List<OpenedSource>> offered)
    {
        List<RulingSpan> spans = [];
        int start = 0;
        for (int day = 1; day <= days.Count; day++)
        {
            if (day < days.Count && days[day].Source == days[start].Source)
            {
                continue;
            }

            PlannedDay[] span = [.. days.Skip(start).Take(day - start)];
            RulingReason[] why =
            [
                .. span.GroupBy(one => Reason(one, offered.GetValueOrDefault(one.Date) ?? [])).Select(reason => new RulingReason(reason.Key, reason.Count())),
            ];
            spans.Add(new(span[0].Date, span[^1].Date, span.Length, span[0].Source.Index + 1, span[0].Source.Settings.Sensor.Name, why));
            start = day;
        }

        return spans;
    }

    // A choice by order comes before one by period: the first is the one that a change of the file's order would change.
    private static string Reason(PlannedDay day, List<OpenedSource> offering)
    {
        OpenedSource[] others = [.. offering.Where(source => source != day.Source)];
        if (others.Length == 0)
        {
            return "only source with input";
        }

        if (Array.Exists(others, source => source.Settings.Period.Holds(day.Date)))
        {
            return "first in the run file";
        }

        DateOnly change = others
            .Select(source => ChangeOver(day, source.Settings.Period))
            .MinBy(date => Math.Abs(date.DayNumber - day.Date.DayNumber));
        return FormattableString.Invariant($"change-over on {change:yyyy-MM-dd}");
    }

    // The day from which the sensor that follows may rule; the other's period does not hold the planned day.
    private static DateOnly ChangeOver(PlannedDay day, SourcePeriod other)
    {
        if (other.First is { } follows && day.Date < follows)
        {
            return follows;
        }

        DateOnly ended = other.Last!.Value;
        return day.Source.Settings.Period.First is { } first && first > ended ? first : ended.AddDays(1);
    }

    private static List<PairSpan> Pairs(RunPlan plan, Func<SourceOffer, SourceOffer, IEnumerable<DateOnly>> common)
    {
        List<PairSpan> pairs = [];
        for (int earlier = 0; earlier < plan.Offers.Count; earlier++)
        {
            for (int later = earlier + 1; later < plan.Offers.Count; later++)
            {
                (SourceOffer one, SourceOffer other) = (plan.Offers[earlier], plan.Offers[later]);
                pairs.AddRange(Spans(common(one, other).Order()).Select(span => new PairSpan(
                    earlier + 1, one.Source.Settings.Sensor.Name, later + 1, other.Source.Settings.Sensor.Name, span.First, span.Last, span.Days)));
            }
        }

        return pairs;
    }

    private static IEnumerable<DaySpan> Spans(IEnumerable<DateOnly> rising)
    {
        DaySpan? open = null;
        foreach (DateOnly day in rising)
        {
            if (open is not null && day.DayNumber - open.Last.DayNumber > LongestPauseDays)
            {
                yield return open;
                open = null;
            }

            open = open is null ? new(day, day, 1) : open with { Last = day, Days = open.Days + 1 };
        }

        if (open is not null)
        {
            yield return open;
        }
    }
}

/// <summary>Some days from a first to a last one.</summary>
/// <param name="First">The first day.</param>
/// <param name="Last">The last day.</param>
/// <param name="Days">How many of the days between, both included.</param>
internal sealed record DaySpan(DateOnly First, DateOnly Last, int Days);

/// <summary>Days of two sources. Sources count from 1 in the order of the run file.</summary>
internal sealed record PairSpan(int Earlier, string EarlierSensor, int Later, string LaterSensor, DateOnly First, DateOnly Last, int Days);

/// <summary>Days that one source rules.</summary>
/// <param name="First">The first day.</param>
/// <param name="Last">The last day.</param>
/// <param name="Days">How many it rules.</param>
/// <param name="Source">Its number in the run file, from 1.</param>
/// <param name="Sensor">Its sensor.</param>
/// <param name="Why">The reasons, in the order of the first day they hold for.</param>
internal sealed record RulingSpan(DateOnly First, DateOnly Last, int Days, int Source, string Sensor, IReadOnlyList<RulingReason> Why);

/// <summary>Why a source rules some days of a span.</summary>
/// <param name="Reason">In words.</param>
/// <param name="Days">How many.</param>
internal sealed record RulingReason(string Reason, int Days);
