using IceExtent.Statistics.Seasons;
using Xunit;

namespace IceExtent.Statistics.Tests.Seasons;

/// <summary>Levels from a series' own winter and summer. Origin of every expected day: worked, from the steps of its series.</summary>
public sealed class OwnLevelsTests
{
    private static readonly SeasonScheme Scheme = Schemes.First with
    {
        OwnLevels = new(
            new(new(1, 1), new(2, 28)), new(new(8, 1), new(9, 30)), WinterDeviations: 2.0, SummerDeviations: 1.0, ClosingBelowWinter: 0.10, HighestSummer: 0.40, LeastDays: 10),
    };

    private static readonly IceYearSpan Span = Schemes.SpanOf(Scheme);

    [Fact]
    public void LeadDays_HoldTheWinterBefore() => Assert.True(Scheme.LeadDays >= 60); // 1 January to 29 February.

    [Fact]
    public void Find_OwnWinter_OpensBelowItsMeanAndClosesTenPercentUnderIt()
    {
        // Winter all at 70 %: mean 0.70, no scatter: opening below 70 %, closing at 60 %; summer 0: retreat and advance at 15 %.
        IceDates dates = new IceSeries(Span, (-99, 0.70), (60, 0.65), (90, 0.30), (110, 0.0), (240, 0.20), (260, 0.55), (270, 0.60)).Find(Scheme);

        Assert.Equal((60, 110, 240, 270), (dates.Opening.Day, dates.Retreat.Day, dates.Advance.Day, dates.Closing.Day));
    }

    [Fact]
    public void Find_IceInSummer_RaisesTheLevelOfRetreat()
    {
        // Days 153 to 213 are August and September: 25 % throughout, so retreat and advance at 25 %: below it from day 120 (24 %).
        IceDates dates = new IceSeries(Span, (-99, 0.95), (100, 0.30), (120, 0.24), (140, 0.25), (220, 0.24), (240, 0.60)).Find(Scheme);

        Assert.Equal(120, dates.Retreat.Day);
    }

    [Theory]
    [InlineData(0.45, SeasonDateState.NeverReached)]
    [InlineData(0.39, SeasonDateState.Found)]
    public void Find_MuchIceInSummer_HasNoRetreat(double summer, SeasonDateState expected)
    {
        IceDates dates = new IceSeries(Span, (-99, 0.95), (100, 0.10), (153, summer), (214, 0.10), (240, 0.95)).Find(Scheme);

        Assert.Equal(expected, dates.Retreat.State);
    }

    [Fact]
    public void Find_RunningYear_KnowsItsOpeningBeforeItsSummer()
    {
        IceYearSpan span = Schemes.SpanOf(Scheme, recordLast: 120);

        IceDates dates = new IceSeries(span, (-99, 0.95), (60, 0.50), (100, 0.05)).Find(Scheme);

        Assert.Equal(SeasonDate.Found(60), dates.Opening);
        Assert.Equal(SeasonDateState.NotYetReached, dates.Retreat.State);
    }

    [Fact]
    public void Find_RecordBeginsAfterTheWinter_HasNoOpening()
    {
        IceYearSpan span = Schemes.SpanOf(Scheme, recordFirst: 0);

        IceDates dates = new IceSeries(span, (-99, 0.95), (60, 0.50), (100, 0.05), (240, 0.95)).Find(Scheme);

        Assert.Equal(SeasonDateState.BeforeRecord, dates.Opening.State);
        Assert.Equal(100, dates.Retreat.Day);
    }
}
