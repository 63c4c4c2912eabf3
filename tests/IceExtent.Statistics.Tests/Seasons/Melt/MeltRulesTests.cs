using IceExtent.Statistics.Seasons;
using Xunit;

namespace IceExtent.Statistics.Tests.Seasons.Melt;

/// <summary>What rules refuse, and which days they ask for. Origin of expected days: worked.</summary>
public sealed class MeltRulesTests
{
    [Fact]
    public void Rules_ImpossibleNumbers_AreRefused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => new HorizontalRangeRules(4.0, 4.0, 10, 5, 7.5, 2, 2.0, 2));
        Assert.Throws<ArgumentOutOfRangeException>(() => new HorizontalRangeRules(4.0, -10.0, 10, 11, 7.5, 2, 2.0, 2));
        Assert.Throws<ArgumentOutOfRangeException>(() => new HorizontalRangeRules(4.0, -10.0, 33, 5, 7.5, 2, 2.0, 2));
        Assert.Throws<ArgumentOutOfRangeException>(() => new HorizontalRangeRules(4.0, -10.0, 3, 2, 7.5, 3, 2.0, 2));
        Assert.Throws<ArgumentOutOfRangeException>(() => new MeltIndicator(1.0, 0.0));
        Assert.Throws<ArgumentOutOfRangeException>(() => new MeltIndicatorRules(new(0.0, 1.0), new(0.0, 1.0), new(0.0, 1.0), new(0.0, 1.0), 5, 4.0, 0.0, 5, 3, 31, 10, 0, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => new MeltIndicatorRules(new(1.0, 1.0), new(0.0, 1.0), new(0.0, 1.0), new(0.0, 1.0), 5, 4.0, 0.0, 5, 6, 31, 10, 0, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => new MeltRules(MeltCell.Calendar, 1.5, 3, MeltCell.Published, MeltCell.LevelAlone()));
    }

    /// <summary>
    /// Ice year from 1 March 2003: winter days 0 to 30, melt from 11 March, 10, to 31 August, 183; freeze from 1 July, 122, to
    /// 15 December, 289; the next winter ends on 29 February 2004, 365. Ten days and a lead of two are asked for before 1 March.
    /// </summary>
    [Fact]
    public void Needed_NorthernYear_IsFromFebruaryToTheNext()
    {
        MeltWindows windows = MeltCell.Calendar.In(new IceYearStart(3, 1).Beginning(2003));
        MeltRules rules = MeltCell.Rules(MeltCell.Leading);

        Assert.Equal(new MeltWindows(new(10, 183), new(0, 30), new(122, 289), new(320, 365)), windows);
        Assert.Equal(new SeasonWindow(-12, 365), rules.Needed(windows));
    }

    [Fact]
    public void Onset_SeriesLongerThanTheRoom_IsRefused()
    {
        float[] days = new float[11];

        Assert.Throws<ArgumentException>(() => HorizontalRangeMelt.Onset(new(days, days, days, days), new(0, 0, 10), MeltCell.Windows, MeltCell.Rules(), new(10)));
        Assert.Throws<ArgumentException>(() => new MeltSeries(days, days, days, new float[10]));
    }
}
