using IceExtent.Statistics.Seasons;
using Xunit;

namespace IceExtent.Statistics.Tests.Seasons.Melt;

/// <summary>Every step and every state of the method. Origin of every expected day: worked; limits of [Drobot2001], values from memory.</summary>
[Trait("Reference", "Drobot2001")]
public sealed class HorizontalRangeMeltTests
{
    private static readonly MeltRules AsRemembered = MeltCell.Rules();
    private static readonly MeltRules WithLead = MeltCell.Rules(MeltCell.Leading);

    /// <summary>12 K is above 4 K: dry on every day.</summary>
    [Fact]
    public void Onset_RangeAboveFour_IsNeverReached() =>
        Assert.Equal(SeasonDate.Without(SeasonDateState.NeverReached), new MeltCell().Onset(AsRemembered));

    /// <summary>12 K on day 59 is dry; −12 K on day 60 is below −10 K.</summary>
    [Fact]
    public void Onset_RangeBelowMinusTen_IsThatDay()
    {
        MeltCell cell = new MeltCell().Range(60, -12f);

        Assert.Equal(SeasonDate.Found(60), cell.Onset(AsRemembered));
        Assert.Equal(SeasonDate.Found(60), cell.Onset(WithLead));
    }

    /// <summary>
    /// 3 K until day 60, then −5 K and 3 K in turn from day 61. As remembered the ten days from day 52 on hold day 61 and spread by
    /// 8 K, more than 7.5 K above the 0 K of the ten days before: nine days too early. With the lead the later days are 52 to 61
    /// when day 54 is looked at, and the first of them below the middle of 3 and −5 K, −1 K, is day 61.
    /// </summary>
    [Fact]
    public void Onset_BetweenTheLimits_IsByTheSpreadOfTwentyDays()
    {
        MeltCell cell = new MeltCell().Range(0, 3f).Range(61, -5f, 3f);

        Assert.Equal(SeasonDate.Found(52), cell.Onset(AsRemembered));
        Assert.Equal(61, MeltCellDay(new MeltCell().Range(0, 3f).Range(61, -5f)));

        static int? MeltCellDay(MeltCell step) => step.Onset(WithLead).Day;
    }

    /// <summary>The spread grows by 7 K, less than 7.5 K.</summary>
    [Fact]
    public void Onset_SpreadGrowsTooLittle_IsNeverReached() =>
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Range(0, 3f).Range(61, -4f, 3f).Onset(AsRemembered).State);

    /// <summary>
    /// 12 K until day 59, −3 K from day 60 on: the ten days from 60 on spread by nothing, so that as remembered the step is not
    /// seen. With the lead they begin on day 58 and spread by 15 K; the first below the middle, 4.5 K, is day 60.
    /// </summary>
    [Fact]
    public void Onset_StepToBetweenTheLimits_IsSeenWithTheLeadAlone()
    {
        MeltCell cell = new MeltCell().Range(60, -3f);

        Assert.Equal(SeasonDateState.NeverReached, cell.Onset(AsRemembered).State);
        Assert.Equal(SeasonDate.Found(60), cell.Onset(WithLead));
    }

    /// <summary>A day of −3 K among days of 12 K: seven of the eight days from it on lie above the middle. A rise: none lies below.</summary>
    [Fact]
    public void Onset_ShortDipOrRise_IsNoMeltWithTheLead()
    {
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Range(60, -3f).Range(61, 12f).Onset(WithLead).State);
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Range(0, 3f).Range(61, 14f, 3f).Onset(WithLead).State);
    }

    /// <summary>Three missing days are allowed: after day 59, not after day 63. Five are not: between 60 and 65.</summary>
    [Fact]
    public void Onset_GapOverTheEvent_WidensOrHides()
    {
        Assert.Equal(SeasonDate.Found(63, 60, 63), new MeltCell().Range(60, -12f).Missing(60, 3).Onset(AsRemembered));
        Assert.Equal(SeasonDate.Hidden(60, 65), new MeltCell().Range(60, -12f).Missing(60, 5).Onset(AsRemembered));
    }

    /// <summary>Missing days elsewhere: neither make nor break. Half of the later days are enough, four of ten are not.</summary>
    [Fact]
    public void Onset_GapsElsewhere_ChangeNothing()
    {
        Assert.Equal(SeasonDate.Found(60), new MeltCell().Range(60, -12f).Missing(40, 10).Missing(70, 30).Onset(AsRemembered));
        Assert.Equal(60, new MeltCell().Range(60, -3f).Missing(63, 5).Onset(WithLead).Day); // 58 to 62 are left of 58 to 67.
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Range(60, -3f).Missing(62, 100).Onset(WithLead).State); // 58 to 61.
    }

    /// <summary>The record begins on day 50, wet; or ends on day 59 or before the window, dry.</summary>
    [Fact]
    public void Onset_RecordTooShort_SaysAtWhichEnd()
    {
        Assert.Equal(SeasonDateState.BeforeRecord, new MeltCell { RecordFirst = 50 }.Range(0, -12f).Onset(AsRemembered).State);
        Assert.Equal(SeasonDateState.NotYetReached, new MeltCell { RecordLast = 59 }.Range(60, -12f).Onset(AsRemembered).State);
        Assert.Equal(SeasonDateState.NotYetReached, new MeltCell { RecordLast = 5 }.Onset(AsRemembered).State);
        Assert.Equal(SeasonDateState.BeforeRecord, new MeltCell { RecordFirst = 200 }.Onset(AsRemembered).State);
    }

    /// <summary>Nothing is known from day 151 to the window's last, 180. Where open water was seen there, nothing is hidden.</summary>
    [Fact]
    public void Onset_GapToTheEndOfTheWindow_HidesUnlessIceWasGone()
    {
        Assert.Equal(SeasonDate.Hidden(151, 180), new MeltCell().Missing(151, 100).Onset(AsRemembered));
        Assert.Equal(SeasonDateState.NeverReached, new MeltCell().Ice(100, 0f).Onset(AsRemembered).State);
    }

    /// <summary>30 % ice is less than 50 %: the −30 K of these days are water's.</summary>
    [Fact]
    public void Onset_LittleIce_IsNotUsed() =>
        Assert.Equal(SeasonDate.Found(80), new MeltCell().Range(60, -30f).Ice(60, 0.3f).Range(70, 12f).Ice(70, 0.9f).Range(80, -12f).Onset(AsRemembered));

    /// <summary>
    /// Standard error 2 K: 95 % are 3.92 K. 12 K until day 58, 7 K on day 59, −3 K from day 60. The middle is 4.5 K: day 59 may be
    /// wet, since 7 &lt; 8.42, day 58 not; day 60 is wet beyond doubt, since −3 &lt; 0.58. Two days more on either side.
    /// </summary>
    [Fact]
    public void Onset_NoiseOfTheRange_WidensTheLimits()
    {
        MeltRules noisy = MeltCell.Rules(new HorizontalRangeRules(4.0, -10.0, 10, 5, 7.5, 2, errorKelvins: 2.0, spreadDays: 2));

        Assert.Equal(SeasonDate.Found(60, 57, 62), new MeltCell().Range(59, 7f).Range(60, -3f).Onset(noisy));
    }
}
