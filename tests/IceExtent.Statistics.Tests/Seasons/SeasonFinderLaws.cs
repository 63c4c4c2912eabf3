using CsCheck;
using IceExtent.Statistics.Seasons;
using Xunit;

namespace IceExtent.Statistics.Tests.Seasons;

/// <summary>What must hold for every series.</summary>
public sealed class SeasonFinderLaws
{
    private static readonly SeasonScheme[] Every =
    [
        Schemes.North,
        Schemes.First,
        Schemes.South,
        Schemes.North with { Smoothing = SeasonSmoothing.Median, SmoothingDays = 5, BridgedDays = 2, Opening = Schemes.North.Opening with { Persistence = 3 } , Retreat = Schemes.North.Retreat with { Persistence = 3 }, Advance = new(0.15, 3), Closing = new(0.80, 3) },
        Schemes.First with { Smoothing = SeasonSmoothing.Mean, SmoothingDays = 7, BridgedDays = 1 },
    ];

    private static readonly IceYearSpan Span = Schemes.SpanOf(Schemes.North, year: 2005);

    // A year with a winter, a summer and waves, so that crossings come often; some days missing.
    private static readonly Gen<float[]> Years = Gen.Select(
        Gen.Double[0.0, 0.6], Gen.Double[0.0, 0.4], Gen.Double[3.0, 40.0], Gen.Int[0, 80], Gen.Int[0, 12].Array[0, 30], Gen.Int[0, 1_000_000],
        (low, wave, length, shift, gaps, noise) =>
        {
            Random random = new(noise);
            float[] year = new float[400];
            for (int day = 0; day < year.Length; day++)
            {
                double season = 0.5 + (0.65 * Math.Cos(2.0 * Math.PI * (day - shift) / 366.0));
                year[day] = (float)Math.Clamp(season - low + 0.3 + (wave * Math.Sin(day / length)) + (0.1 * (random.NextDouble() - 0.5)), 0.0, 1.0);
            }

            foreach (int gap in gaps)
            {
                Array.Fill(year, float.NaN, random.Next(0, 380), gap);
            }

            return year;
        });

    private static readonly Gen<SeasonScheme> AnyScheme = Gen.Int[0, Every.Length - 1].Select(index => Every[index]);

    [Fact]
    public void Find_AnySeries_KeepsTheOrderOfDates() => Gen.Select(Years, AnyScheme).Sample((year, scheme) =>
    {
        IceDates dates = Find(scheme, year);
        int?[] order = scheme.Begins == YearBeginning.Ice
            ? [dates.Opening.Day, dates.Retreat.Day, dates.Advance.Day, dates.Closing.Day]
            : [dates.Advance.Day, dates.Closing.Day, dates.Opening.Day, dates.Retreat.Day];
        return order.Contains(null) || (order[0] <= order[1] && order[1] <= order[2] && order[2] <= order[3]);
    });

    [Fact]
    public void Find_AnyDate_LiesInsideItsLimits() => Gen.Select(Years, AnyScheme, Gen.Double[0.0, 0.2]).Sample((year, scheme, error) =>
        All(Find(scheme, year, error)).All(date => date.Day is not { } day || (date.Earliest <= day && day <= date.Latest)));

    [Fact]
    public void Find_LargerStandardError_NeverNarrowsLimits() => Gen.Select(Years, AnyScheme, Gen.Double[0.0, 0.1], Gen.Double[0.0, 0.1]).Sample((year, scheme, error, more) =>
        All(Find(scheme, year, error)).Zip(All(Find(scheme, year, error + more))).All(pair => pair.First.SpreadDays is not { } narrow || narrow <= pair.Second.SpreadDays));

    /// <summary>In a window that does not move with the ice: where the lowest day parts the year, ice after it can move it, and with it what is searched.</summary>
    [Fact]
    public void Find_MoreIce_NeverMakesRetreatEarlier() => Gen.Select(Years, AnyScheme, Gen.Int[0, 399], Gen.Int[1, 60], Gen.Float[0f, 0.5f]).Sample((year, scheme, from, days, more) =>
    {
        SeasonScheme still = Still(scheme);
        float[] icier = [.. year];
        for (int day = from; day < Math.Min(from + days, icier.Length); day++)
        {
            icier[day] = Math.Min(icier[day] + more, 1f);
        }

        return NotEarlier(Find(still, year).Retreat, Find(still, icier).Retreat) && NotEarlier(Find(still, year).Opening, Find(still, icier).Opening);
    });

    /// <summary>As much ice on every day leaves the lowest day where it is.</summary>
    [Fact]
    public void Find_AsMuchMoreIceEveryDay_NeverMakesRetreatEarlierOrAdvanceLater() => Gen.Select(Years, AnyScheme, Gen.Float[0f, 0.5f]).Sample((year, scheme, more) =>
    {
        float[] icier = Array.ConvertAll(year, fraction => fraction + more);
        (IceDates less, IceDates with) = (Find(scheme, year), Find(scheme, icier));
        return NotEarlier(less.Retreat, with.Retreat) && NotEarlier(less.Opening, with.Opening)
            && (less.Advance.Day is not { } advance || with.Advance.Day is not { } sooner || sooner <= advance);
    });

    /// <summary>A series and its windows moved by as many days: every date moves by as many.</summary>
    [Fact]
    public void Find_SeriesShifted_ShiftsEveryDate() => Gen.Select(Years, AnyScheme, Gen.Int[0, 25]).Sample((year, scheme, shift) =>
    {
        CalendarWindow Window(int first, int last) => new(DayOf(first), DayOf(last));
        SeasonScheme here = scheme with
        {
            YearStart = new(3, 1), LowestIn = scheme.LowestIn is null ? null : Window(100, 200), MeltingHalf = Window(40, 200), FreezingHalf = Window(160, 330),
        };
        SeasonScheme there = here with
        {
            LowestIn = scheme.LowestIn is null ? null : Window(100 + shift, 200 + shift), MeltingHalf = Window(40 + shift, 200 + shift), FreezingHalf = Window(160 + shift, 330 + shift),
        };
        float[] moved = new float[year.Length];
        Array.Fill(moved, year[0], 0, shift);
        Array.Copy(year, 0, moved, shift, year.Length - shift);

        return All(Find(here, year)).Zip(All(Find(there, moved))).All(pair =>
            pair.First.State == pair.Second.State && pair.First.Day + shift == pair.Second.Day + 0 && pair.First.Earliest + shift == pair.Second.Earliest + 0);
    });

    /// <summary>A bridge over no gap is no bridge.</summary>
    [Fact]
    public void Find_NoGapToFill_ChangesNoDate() => Gen.Select(Years, AnyScheme).Sample((year, scheme) =>
    {
        float[] whole = Array.ConvertAll(year, fraction => float.IsNaN(fraction) ? 0.5f : fraction);
        IceYearSpan span = new(scheme.YearStart.Beginning(Span.Year.Year), 14, 14, -1_000, 1_000); // More than either scheme needs.
        float[] errors = new float[span.Days];
        IceDates without = new SeasonFinder(scheme with { BridgedDays = 0 }, span).Find(whole.AsSpan(0, span.Days), errors);
        return without == new SeasonFinder(scheme with { BridgedDays = 9 }, span).Find(whole.AsSpan(0, span.Days), errors);
    });

    private static SeasonScheme Still(SeasonScheme scheme) => scheme.LowestIn is null
        ? scheme
        : scheme with { LowestIn = null, MeltingHalf = new(new(3, 1), new(9, 15)), FreezingHalf = new(new(9, 16), new(2, 28)) };

    private static CalendarDay DayOf(int day)
    {
        DateOnly date = new DateOnly(2005, 3, 1).AddDays(day);
        return new(date.Month, date.Day);
    }

    private static IceDates Find(SeasonScheme scheme, float[] year, double error = 0.0)
    {
        IceYearSpan span = new(scheme.YearStart.Beginning(Span.Year.Year), scheme.LeadDays, scheme.TailDays, -1_000, 1_000);
        float[] errors = new float[span.Days];
        Array.Fill(errors, (float)error);
        return new SeasonFinder(scheme, span).Find(year.AsSpan(0, span.Days), errors);
    }

    private static SeasonDate[] All(IceDates dates) => [dates.Opening, dates.Retreat, dates.Advance, dates.Closing];

    private static bool NotEarlier(SeasonDate less, SeasonDate with) => less.Day is not { } day || with.Day is not { } later || later >= day;
}
