using CsCheck;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;
using IceExtent.Scenes.World;

namespace IceExtent.Scenes.Tests.World;

public sealed class SeasonClockTests
{
    private static readonly SeasonParameters Steady = Shipped.Scene("north").Season with
    {
        TimingSpreadDays = 0,
        WinterSpreadDegrees = 0,
        SummerSpreadDegrees = 0,
        WinterRetreatDegreesPerDecade = 0,
        SummerRetreatDegreesPerDecade = 2,
        ReferenceYear = 2000,
        WinterEdgeLatitudeDegrees = 60,
        SummerEdgeLatitudeDegrees = 75,
        MaximumDayOfYear = 72,
        MinimumDayOfYear = 258,
    };

    private static double Noon(int year, int dayOfYear) => new DateOnly(year, 1, 1).AddDays(dayOfYear - 1).DayNumber + 0.5;

    // Origin: worked. Without luck the edge stands at the given latitudes on the given days; 2 degrees a decade make
    // 75 + 2 × 1.5 = 78 in 2015.
    [Theory]
    [InlineData(2000, 72, 60.0)]
    [InlineData(2000, 258, 75.0)]
    [InlineData(2015, 258, 78.0)]
    public void Edge_TurningDays_StandsWhereTheParametersSay(int year, int dayOfYear, double degrees) =>
        Assert.Equal(degrees, new SeasonClock(Steady, 1).EdgeDegrees(Noon(year, dayOfYear)), 1e-9);

    [Fact]
    public void Edge_BetweenTurns_MovesOneWay() =>
        Gen.Select(Gen.Int[1980, 2040], Gen.Int[73, 257]).Sample((year, day) =>
        {
            SeasonClock clock = new(Steady, 1);
            Assert.True(clock.EdgeDegrees(Noon(year, day)) < clock.EdgeDegrees(Noon(year, day + 1)));
            Assert.True(clock.Summerness(Noon(year, day)) < clock.Summerness(Noon(year, day + 1)));
        });

    [Fact]
    public void Edge_AnyNight_DoesNotJump() =>
        Gen.Select(Gen.ULong, Gen.Int[1, 12_000]).Sample((key, day) =>
        {
            SeasonClock clock = new(Shipped.Scene("south").Season, key);
            double time = Noon(1990, 1) + day;
            Assert.Equal(clock.EdgeDegrees(time), clock.EdgeDegrees(time + 1.0), 0.6);
        });

    // Origin: worked. The minimum is on day 258; survivors take over from 25 days before to 25 days after.
    [Theory]
    [InlineData(2004, 232, 2003, 1.0)]
    [InlineData(2004, 258, 2004, 0.5)]
    [InlineData(2004, 284, 2004, 1.0)]
    [InlineData(2005, 40, 2004, 1.0)]
    public void OldIce_RoundTheMinimum_ChangesHands(int year, int day, int oldestYear, double share)
    {
        (int found, double weight) = new SeasonClock(Steady, 1).OldIceAt(Noon(year, day));

        Assert.Equal(oldestYear, found);
        Assert.Equal(share, weight, 1e-9);
    }
}
