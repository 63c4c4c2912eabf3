using IceExtent.Statistics.Seasons;

namespace IceExtent.Statistics.Tests.Seasons.Melt;

/// <summary>One cell's invented series, day by day. Ice of 95 %; day -20 to 379 of the ice year; windows round numbers.</summary>
internal sealed class MeltCell
{
    private const int DayZero = 20;
    private const int Days = 400;

    private readonly float[] range = Filled(12f);
    private readonly float[] kelvins = Filled(200f);
    private readonly float[] ice = Filled(0.95f);

    /// <summary>Melt 10 to 180, winter 0 to 30, freeze 182 to 300, next winter 320 to 360.</summary>
    public static MeltWindows Windows { get; } = new(new(10, 180), new(0, 30), new(182, 300), new(320, 360));

    public static MeltCalendar Calendar { get; } =
        new(new(new(3, 11), new(8, 31)), new(new(3, 1), new(3, 31)), new(new(7, 1), new(12, 15)), new(new(1, 15), new(2, 28)));

    public int RecordFirst { get; init; } = -20;

    public int RecordLast { get; init; } = 379;

    /// <summary>The horizontal range from a day on, in K.</summary>
    public MeltCell Range(int from, params float[] values)
    {
        Fill(range, from, values);
        return this;
    }

    /// <summary>19 and 37 GHz vertical from a day on, in K.</summary>
    public MeltCell Kelvins(int from, float value)
    {
        Fill(kelvins, from, [value]);
        return this;
    }

    /// <summary>Concentration from a day on.</summary>
    public MeltCell Ice(int from, float value)
    {
        Fill(ice, from, [value]);
        return this;
    }

    /// <summary>Days that were not observed.</summary>
    public MeltCell Missing(int from, int count)
    {
        foreach (float[] plane in (float[][])[range, kelvins, ice])
        {
            Array.Fill(plane, float.NaN, DayZero + from, count);
        }

        return this;
    }

    public SeasonDate Onset(MeltRules rules) => HorizontalRangeMelt.Onset(Series, Lie, Windows, rules, new(Days));

    public MeltDates Dates(MeltRules rules) => IndicatorMelt.Dates(Series, Lie, Windows, rules, new(Days));

    public static MeltRules Rules(HorizontalRangeRules? range = null, MeltIndicatorRules? indicators = null) => new(
        Calendar, leastIceFraction: 0.5, gapDays: 3, range ?? Published, indicators ?? LevelAlone());

    /// <summary>The limits of [Drobot2001] as remembered, without doubt.</summary>
    public static HorizontalRangeRules Published { get; } = new(4.0, -10.0, 10, 5, 7.5, leadDays: 0, errorKelvins: 0.0, spreadDays: 0);

    /// <summary>The same with the later days two days earlier.</summary>
    public static HorizontalRangeRules Leading { get; } = new(4.0, -10.0, 10, 5, 7.5, leadDays: 2, errorKelvins: 0.0, spreadDays: 0);

    /// <summary>The level alone, z-scores of 5 K, melt from 4 on; five days last, three interrupt.</summary>
    public static MeltIndicatorRules LevelAlone(double error = 0.0, int spread = 0) => new(
        new(0.0, 1.0), new(0.0, 1.0), new(1.0, 5.0), new(0.0, 1.0),
        jumpDays: 5, meltScore: 4.0, error, persistDays: 5, interruptDays: 3, summerDays: 31, leastWinterDays: 10, spread, spread);

    private MeltSeries Series
    {
        get
        {
            Blank(-20, RecordFirst);
            Blank(RecordLast + 1, 380);
            return new(range, kelvins, kelvins, ice);
        }
    }

    private SeriesDays Lie => new(DayZero, DayZero + RecordFirst, DayZero + RecordLast);

    private void Blank(int from, int until) => Missing(from, until - from);

    private static void Fill(float[] plane, int from, float[] values)
    {
        for (int day = DayZero + from, next = 0; day < Days; day++, next++)
        {
            plane[day] = values[next % values.Length];
        }
    }

    private static float[] Filled(float value)
    {
        float[] plane = new float[Days];
        Array.Fill(plane, value);
        return plane;
    }
}
