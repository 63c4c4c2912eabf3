using IceExtent.Statistics.Seasons;
using Xunit;

namespace IceExtent.Statistics.Tests.Seasons;

/// <summary>Every definition and every state, worked by hand. Origin of every expected day: worked, from the steps of its series.</summary>
public sealed class SeasonFinderTests
{
    private static readonly IceYearSpan Span = Schemes.SpanOf(Schemes.North);

    // Ice of 95 % until day 79, of 50 % from day 80, of 5 % from day 110; 40 % from day 250, 90 % from day 270.
    private static readonly (int From, double Fraction)[] Usual = [(-9, 0.95), (80, 0.50), (110, 0.05), (250, 0.40), (270, 0.90)];

    [Fact]
    public void Find_UsualYear_GivesFourDatesAndTheirPeriods()
    {
        IceDates dates = new IceSeries(Span, Usual).Find(Schemes.North);

        Assert.Equal(SeasonDate.Found(79), dates.Opening); // The last day above 80 %.
        Assert.Equal(SeasonDate.Found(110), dates.Retreat); // The first day below 15 %.
        Assert.Equal(SeasonDate.Found(250), dates.Advance);
        Assert.Equal(SeasonDate.Found(270), dates.Closing);
        Assert.Equal((31, 20), (dates.LossOfIceDays, dates.GainOfIceDays)); // 110 − 79 and 270 − 250.
        Assert.Equal(140, dates.InnerIceFreeDays(Span.Year, YearBeginning.Ice)); // 250 − 110.
        Assert.Equal(191, dates.OuterIceFreeDays(Span.Year, YearBeginning.Ice)); // 270 − 79.
        Assert.Equal((366, 140), (dates.KnownDays, dates.OpenWaterDays)); // 1 March 2003 to 29 February 2004.
    }

    [Fact]
    public void Find_LeapYear_CountsDaysAndNotCalendarDays()
    {
        // Days 300 to 365 are 26 December 2003 to 29 February 2004: 366 days in all; the same days a year later end on 28 February.
        IceYear leap = Schemes.North.YearStart.Beginning(2003), common = Schemes.North.YearStart.Beginning(2004);

        Assert.Equal((366, new DateOnly(2004, 2, 29)), (leap.Length, leap.LastDay));
        Assert.Equal((365, new DateOnly(2005, 2, 28)), (common.Length, common.LastDay));
        IceSeries series = new(Span, (-9, 0.95), (110, 0.05), (365, 0.90));
        Assert.Equal(new DateOnly(2004, 2, 29), leap.DateOf(series.Find(Schemes.North).Advance.Day ?? 0));
    }

    [Fact]
    public void Find_ReopeningAfterClosing_LeavesTheFirstClosing()
    {
        // A polynya from day 300 to 320, after the ice had closed on day 270.
        IceDates dates = new IceSeries(Span, [.. Usual, (300, 0.05), (321, 0.95)]).Find(Schemes.North);

        Assert.Equal((250, 270), (dates.Advance.Day, dates.Closing.Day));
        Assert.Equal(110, dates.Retreat.Day);
        Assert.Equal(161, dates.OpenWaterDays); // 140 and 21 of the polynya.
    }

    [Theory]
    [InlineData(4, 120)] // Four days of five: broken, so the later run counts.
    [InlineData(5, 100)] // Five days: met.
    public void Find_FiveDayPersistence_IsBrokenOnDayFourAndMetOnDayFive(int daysOfIce, int expected)
    {
        IceYearSpan span = Schemes.SpanOf(Schemes.South);
        IceSeries series = new(span, (-9, 0.0), (100, 0.30), (100 + daysOfIce, 0.0), (120, 0.30), (280, 0.0));

        Assert.Equal(SeasonDate.Found(expected), series.Find(Schemes.South).Advance);
    }

    [Fact]
    public void Find_SouthernYear_AcrossNewYear_GivesAdvanceBeforeRetreat()
    {
        IceYearSpan span = Schemes.SpanOf(Schemes.South);
        IceSeries series = new(span, (-9, 0.0), (60, 0.30), (90, 0.95), (250, 0.60), (330, 0.0));

        IceDates dates = series.Find(Schemes.South);

        Assert.Equal(new DateOnly(2003, 4, 16), span.Year.DateOf(dates.Advance.Day ?? 0)); // 15 February and 60 days.
        Assert.Equal(90, dates.Closing.Day);
        Assert.Equal(249, dates.Opening.Day); // The last day above 80 %.
        Assert.Equal(new DateOnly(2004, 1, 10), span.Year.DateOf(dates.Retreat.Day ?? 0)); // Day 329, the last day with 15 %.
        Assert.Equal(365 - (329 - 60), dates.InnerIceFreeDays(span.Year, YearBeginning.Water));
    }

    [Fact]
    public void Find_IceAllYear_ReachesNothing()
    {
        IceDates dates = new IceSeries(Span, (-9, 0.97), (160, 0.60), (200, 0.97)).Find(Schemes.North);

        Assert.Equal(159, dates.Opening.Day); // Thinner for a while: closed ice ended and came back.
        Assert.Equal(200, dates.Closing.Day);
        Assert.Equal(SeasonDateState.NeverReached, dates.Retreat.State);
        Assert.Equal(SeasonDateState.NeverReached, dates.Advance.State);
    }

    [Fact]
    public void Find_NoIceAllYear_ReachesNothing()
    {
        IceDates dates = new IceSeries(Span, (-9, 0.0)).Find(Schemes.North);

        Assert.All([dates.Opening, dates.Retreat, dates.Advance, dates.Closing], date => Assert.Equal(SeasonDateState.NeverReached, date.State));
        Assert.Equal(366, dates.OpenWaterDays);
        Assert.All(
            [new IceSeries(Span, (-9, 0.0)).Find(Schemes.First).Retreat, new IceSeries(Span, (-9, 0.0)).Find(Schemes.First).Opening],
            date => Assert.Equal(SeasonDateState.NeverReached, date.State));
    }

    [Fact]
    public void Find_GapOverTheCrossing_HidesItBetweenTheDaysOnEitherSide()
    {
        // Retreat on day 110 lies in a gap from day 105 to 114: it came on one of the days 105 to 115.
        IceDates dates = new IceSeries(Span, Usual).Without(105, 114).Find(Schemes.North);

        Assert.Equal(SeasonDate.Hidden(105, 115), dates.Retreat);
        Assert.Equal(SeasonDate.Found(79), dates.Opening);
        Assert.Equal(5.0, dates.Retreat.SpreadDays);
        Assert.Null(dates.InnerIceFreeDays(Span.Year, YearBeginning.Ice));
    }

    [Fact]
    public void Find_GapOverAdvance_HidesIt()
    {
        IceDates dates = new IceSeries(Span, Usual).Without(245, 252).Find(Schemes.North);

        Assert.Equal(SeasonDate.Hidden(245, 253), dates.Advance);
    }

    [Fact]
    public void Find_BridgedGap_GivesADateWhoseLimitsAreTheGap()
    {
        // Days 109 to 111 are missing: a line from 50 % on day 108 to 5 % on day 112 falls below 15 % after day 111
        // (38.75, 27.5 and 16.25 %): day 112.
        IceDates dates = new IceSeries(Span, Usual).Without(109, 111).Find(Schemes.North with { BridgedDays = 3 });

        Assert.Equal(SeasonDate.Found(112, 109, 112), dates.Retreat);
    }

    [Fact]
    public void Find_RecordBeginsInTheOpenWater_IsBeforeTheRecord()
    {
        IceYearSpan span = Schemes.SpanOf(Schemes.North, recordFirst: 130);

        IceDates dates = new IceSeries(span, Usual).Find(Schemes.North);

        Assert.Equal(SeasonDateState.BeforeRecord, dates.Opening.State);
        Assert.Equal(SeasonDateState.BeforeRecord, dates.Retreat.State);
        Assert.Equal(SeasonDate.Found(250), dates.Advance);
        Assert.Equal(SeasonDateState.BeforeRecord, new IceSeries(span, Usual).Find(Schemes.First).Retreat.State);
    }

    [Fact]
    public void Find_RecordBeginsInTheFreeze_AdvanceIsBeforeTheRecord()
    {
        IceYearSpan span = Schemes.SpanOf(Schemes.South, recordFirst: 70);

        Assert.Equal(SeasonDateState.BeforeRecord, new IceSeries(span, (-9, 0.0), (60, 0.30), (280, 0.0)).Find(Schemes.South).Advance.State);
    }

    [Theory]
    [InlineData(40)] // Spring: closed ice.
    [InlineData(100)] // Thinning.
    [InlineData(200)] // Open water.
    [InlineData(255)] // Ice is back, not closed.
    public void Find_RunningYear_TellsWhatHasNotComeYet(int recordLast)
    {
        IceYearSpan span = Schemes.SpanOf(Schemes.North, recordLast: recordLast);

        IceDates dates = new IceSeries(span, Usual).Find(Schemes.North);

        Assert.Equal(recordLast >= 80 ? SeasonDate.Found(79) : SeasonDate.Without(SeasonDateState.NotYetReached), dates.Opening);
        Assert.Equal(recordLast >= 110 ? SeasonDate.Found(110) : SeasonDate.Without(SeasonDateState.NotYetReached), dates.Retreat);
        Assert.Equal(recordLast >= 250 ? SeasonDate.Found(250) : SeasonDate.Without(SeasonDateState.NotYetReached), dates.Advance);
        Assert.Equal(SeasonDateState.NotYetReached, dates.Closing.State);
    }

    [Fact]
    public void Find_PersistenceCutByTheRecordsEnd_IsNotYetReached()
    {
        // Ice since day 100, and the record ends on day 103: four days of five.
        IceYearSpan span = Schemes.SpanOf(Schemes.South, recordLast: 103);

        Assert.Equal(SeasonDateState.NotYetReached, new IceSeries(span, (-9, 0.0), (100, 0.30)).Find(Schemes.South).Advance.State);
    }

    [Fact]
    public void Find_CellNeverSeen_IsHidden()
    {
        IceDates dates = new IceSeries(Span, Usual).Without(-Span.Lead, Span.Year.Length + Span.Tail - 1).Find(Schemes.North);

        Assert.All([dates.Opening, dates.Retreat, dates.Advance, dates.Closing], date => Assert.Equal(SeasonDateState.HiddenByGap, date.State));
        Assert.Equal((0, 0), (dates.KnownDays, dates.OpenWaterDays));
    }

    [Fact]
    public void Find_FirstAndLastCrossing_DifferWhereIceComesBack()
    {
        // Open on day 100, ice again from 105 to 108, open from 109.
        IceSeries series = new(Span, (-9, 0.95), (100, 0.05), (105, 0.50), (109, 0.05), (250, 0.95));

        Assert.Equal(109, series.Find(Schemes.North).Retreat.Day);
        Assert.Equal(100, series.Find(Schemes.First).Retreat.Day);
        SeasonScheme fiveDays = Schemes.North with { Retreat = Schemes.North.Retreat with { Persistence = 5 } };
        Assert.Equal(100, series.Find(fiveDays).Retreat.Day); // Ice of four days does not count as back.
    }

    [Fact]
    public void Find_StandardError_GivesLimitsFromTheSeriesAroundIt()
    {
        // Falling by 1 % a day from 60 % on day 100: below 15 % from day 146 (14 %). With 2 × 2 % the lower series
        // (c − 4 %) is below from day 142 (18 − 4 = 14), the upper (c + 4 %) from day 150 (10 + 4 = 14).
        IceSeries series = new IceSeries(Span, [(-9, 0.95), .. Enumerable.Range(0, 61).Select(day => (100 + day, 0.60 - (0.01 * day))), (161, 0.0), (250, 0.95)])
            .WithError(0.02);

        SeasonDate retreat = series.Find(Schemes.North).Retreat;

        Assert.Equal(146, retreat.Day);
        Assert.Equal(142, retreat.Earliest);
        Assert.Equal(150, retreat.Latest);
        Assert.Equal(4.0, retreat.SpreadDays);
    }

    [Fact]
    public void Find_RunningMedian_PassesOverTwoDaysOfIce()
    {
        SeasonScheme median = Schemes.North with { Smoothing = SeasonSmoothing.Median, SmoothingDays = 5 };
        IceSeries series = new(Span, (-9, 0.95), (110, 0.05), (130, 0.90), (132, 0.05), (250, 0.95));

        Assert.Equal(110, series.Find(median).Retreat.Day);
        Assert.Equal(132, series.Find(Schemes.North).Retreat.Day);
    }

    [Fact]
    public void Find_RunningMean_MovesTheCrossingByWhatTheWindowSees()
    {
        // 100 % until day 109, then 0: means of five days on days 108 to 112 are 80, 60, 40, 20 and 0 %: below 15 % from day 112.
        SeasonScheme mean = Schemes.North with { Smoothing = SeasonSmoothing.Mean, SmoothingDays = 5 };

        Assert.Equal(112, new IceSeries(Span, (-9, 1.0), (110, 0.0), (250, 0.95)).Find(mean).Retreat.Day);
    }
}
