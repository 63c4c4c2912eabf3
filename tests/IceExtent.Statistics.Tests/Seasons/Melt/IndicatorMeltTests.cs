using IceExtent.Statistics.Seasons;
using Xunit;

namespace IceExtent.Statistics.Tests.Seasons.Melt;

/// <summary>
/// Runs, states and the mirror in autumn, by the level alone. Origin of every expected day: worked. In winter both channels are
/// 200 K: a level of 360 K without scatter, so that 5 K count as one. 220 K give (396 − 360) / 5 = 7.2, above 4: melt.
/// </summary>
public sealed class IndicatorMeltTests
{
    private static readonly MeltRules Rules = MeltCell.Rules();

    private static MeltCell Usual => new MeltCell().Kelvins(60, 220f).Kelvins(220, 200f);

    [Fact]
    public void Dates_UsualYear_GivesAllFour() => Assert.Equal(
        new MeltDates(SeasonDate.Found(60), SeasonDate.Found(60), SeasonDate.Found(220), SeasonDate.Found(220)), Usual.Dates(Rules));

    /// <summary>205 K give (369 − 360) / 5 = 1.8.</summary>
    [Fact]
    public void Dates_WarmButDry_HasNoMelt() =>
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Kelvins(60, 205f).Dates(Rules).ContinuousMelt.State);

    /// <summary>Four days of melt are early melt alone; five last.</summary>
    [Theory]
    [InlineData(4, 60)]
    [InlineData(5, 40)]
    public void Dates_SpellBeforeMelt_LastsFromFiveDaysOn(int days, int continuous)
    {
        MeltDates dates = new MeltCell().Kelvins(40, 220f).Kelvins(40 + days, 200f).Kelvins(60, 220f).Dates(Rules);

        Assert.Equal((40, continuous), (dates.EarlyMelt.Day, dates.ContinuousMelt.Day));
    }

    /// <summary>Melt on days 60 and 61 and on day 64, nothing known between: five days from first to last.</summary>
    [Fact]
    public void Dates_MissingDaysInARun_NeitherMakeNorBreak() =>
        Assert.Equal(60, new MeltCell().Kelvins(60, 220f).Kelvins(65, 200f).Missing(62, 2).Dates(Rules).ContinuousMelt.Day);

    /// <summary>Ice that melts on two days and is gone on the third has melted; ice that is gone without melt has not.</summary>
    [Fact]
    public void Dates_IceVanishes_CountsAsMeltOnlyAfterMelt()
    {
        Assert.Equal(60, new MeltCell().Kelvins(60, 220f).Ice(62, 0f).Dates(Rules).ContinuousMelt.Day);
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Ice(60, 0f).Dates(Rules).ContinuousMelt.State);
    }

    [Fact]
    public void Dates_GapOverMelt_WidensOrHides()
    {
        Assert.Equal(SeasonDate.Found(63, 60, 63), Usual.Missing(60, 3).Dates(Rules).ContinuousMelt);
        Assert.Equal(SeasonDate.Hidden(60, 67), Usual.Missing(60, 7).Dates(Rules).ContinuousMelt);
        Assert.Equal(SeasonDate.Hidden(220, 227), Usual.Missing(220, 7).Dates(Rules).ContinuousFreeze);
    }

    /// <summary>Two days of melt after freeze-up do not interrupt it, three do; only five would move early freeze.</summary>
    [Theory]
    [InlineData(2, 220, 220)]
    [InlineData(3, 220, 243)]
    [InlineData(5, 245, 245)]
    public void Dates_SpellAfterFreeze_InterruptsFromThreeDaysOn(int days, int early, int continuous)
    {
        MeltDates dates = Usual.Kelvins(240, 220f).Kelvins(240 + days, 200f).Dates(Rules);

        Assert.Equal((early, continuous), (dates.EarlyFreeze.Day, dates.ContinuousFreeze.Day));
    }

    /// <summary>Gone from day 100 to 249; back and frozen, or back wet and frozen on day 260.</summary>
    [Fact]
    public void Dates_OpenSummer_FreezeWhenIceIsBackAndFrozen()
    {
        Assert.Equal(250, Usual.Ice(100, 0f).Ice(250, 0.9f).Dates(Rules).ContinuousFreeze.Day);
        Assert.Equal(260, new MeltCell().Ice(100, 0f).Ice(250, 0.9f).Kelvins(250, 220f).Kelvins(260, 200f).Dates(Rules).ContinuousFreeze.Day);
    }

    /// <summary>Summer at 240 K is (432 − 360) / 5 = 14.4: half of it, 7.2, is the limit of autumn, so that 215 K (5.4) are frozen ice that still ages.</summary>
    [Fact]
    public void Dates_FreezeOfIceThatAges_IsHalfWayFromSummer() =>
        Assert.Equal(220, new MeltCell().Kelvins(60, 240f).Kelvins(220, 215f).Kelvins(280, 200f).Dates(Rules).ContinuousFreeze.Day);

    /// <summary>Frozen from day 220 on: five days of it are known when the record ends on day 224, three on day 222.</summary>
    [Fact]
    public void Dates_RecordEndsInAutumn_WaitsUntilItIsSure()
    {
        Assert.Equal(220, At(224).ContinuousFreeze.Day);
        Assert.Equal(SeasonDateState.NotYetReached, At(222).ContinuousFreeze.State);
        Assert.Equal(SeasonDateState.NotYetReached, At(150).ContinuousFreeze.State);
        Assert.Equal(SeasonDateState.NotYetReached, At(62).ContinuousMelt.State);

        static MeltDates At(int last) => new MeltCell { RecordLast = last }.Kelvins(60, 220f).Kelvins(220, 200f).Dates(Rules);
    }

    /// <summary>The windows of a year in which winter is over long before melt may come; the record ends between them, or before either.</summary>
    [Theory]
    [InlineData(60)]
    [InlineData(20)]
    [InlineData(-15)]
    public void Dates_RecordEndsBeforeTheWindow_HaveNotBeenReached(int last)
    {
        float[] days = new float[400], ice = new float[400];
        Array.Fill(days, 200f);
        Array.Fill(ice, 0.9f);
        Array.Fill(ice, float.NaN, 20 + last + 1, 379 - last);
        MeltWindows late = MeltCell.Windows with { Melt = new(120, 180) };
        MeltSeries series = new(days, days, days, ice);
        SeriesDays lie = new(20, 0, 20 + last);

        Assert.Equal(SeasonDateState.NotYetReached, IndicatorMelt.Dates(series, lie, late, Rules, new(400)).ContinuousMelt.State);
        Assert.Equal(SeasonDateState.NotYetReached, HorizontalRangeMelt.Onset(series, lie, late, Rules, new(400)).State);
    }

    [Fact]
    public void Dates_NeverFrozenOrNeverMelted_AreNeverReached()
    {
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Kelvins(60, 220f).Kelvins(310, 200f).Dates(Rules).ContinuousFreeze.State);
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Dates(Rules).ContinuousFreeze.State);
    }

    /// <summary>Winter before the record; winter without ice; winter that was not observed.</summary>
    [Fact]
    public void Dates_NoWinterToCompareWith_SayWhy()
    {
        Assert.Equal(SeasonDateState.BeforeRecord, new MeltCell { RecordFirst = 40 }.Kelvins(60, 220f).Dates(Rules).ContinuousMelt.State);
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Ice(-20, 0f).Ice(50, 0.9f).Kelvins(60, 220f).Dates(Rules).ContinuousMelt.State);
        Assert.Equal(SeasonDate.Hidden(10, 180), Usual.Missing(-5, 40).Dates(Rules).ContinuousMelt);
    }

    /// <summary>
    /// Standard error 1: 95 % are 1.96. 206 K on day 59 give 2.16, above 4 − 1.96: may be melt. 212 K on day 60 give 4.32, melt but
    /// not beyond doubt, 5.96; 220 K on day 61 do. One day more on either side.
    /// </summary>
    [Fact]
    public void Dates_ErrorOfTheSum_WidensTheLimits() => Assert.Equal(
        SeasonDate.Found(60, 58, 62),
        new MeltCell().Kelvins(59, 206f).Kelvins(60, 212f).Kelvins(61, 220f).Dates(MeltCell.Rules(indicators: MeltCell.LevelAlone(error: 1.0, spread: 1))).ContinuousMelt);

    /// <summary>
    /// The jump alone: 37V against the mean of the five days before, 3 K count as one. 200 to 220 K on day 60 is 20 / 3 = 6.7; two days
    /// later (220 − (3 · 200 + 2 · 220) / 5) / 3 = 4, and on the next day 2.7: melt on days 60 to 62.
    /// </summary>
    [Theory]
    [InlineData(3, true)]
    [InlineData(4, false)]
    public void Dates_JumpAlone_FadesAsItsDaysPass(int persist, bool lasts)
    {
        MeltIndicatorRules jump = new(new(1.0, 3.0), new(0.0, 1.0), new(0.0, 1.0), new(0.0, 1.0), 5, 3.99, 0.0, persist, 1, 31, 10, 0, 0);

        MeltDates dates = new MeltCell().Kelvins(60, 220f).Dates(MeltCell.Rules(indicators: jump));

        Assert.Equal(60, dates.EarlyMelt.Day);
        Assert.Equal(lasts ? 60 : null, dates.ContinuousMelt.Day);
    }

    /// <summary>The horizontal range alone, counted downward: from 12 to 6 K is 6 / 1.5 = 4.</summary>
    [Fact]
    public void Dates_HorizontalRangeAlone_CountsDownward()
    {
        MeltIndicatorRules range = new(new(0.0, 1.0), new(0.0, 1.0), new(0.0, 1.0), new(1.0, 1.5), 5, 3.99, 0.0, 5, 3, 31, 10, 0, 0);

        Assert.Equal(60, new MeltCell().Range(60, 6f).Dates(MeltCell.Rules(indicators: range)).ContinuousMelt.Day);
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Range(60, 18f).Dates(MeltCell.Rules(indicators: range)).ContinuousMelt.State);
    }
}
