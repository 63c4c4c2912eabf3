using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;

namespace IceExtent.Scenes.World;

/// <summary>Where the mean ice edge stands at any time.</summary>
/// <remarks>
/// Every year has a maximum and a minimum, each with a day and a latitude of its own; between them the edge moves
/// smoothly. Times are days on the scale of <see cref="DateOnly.DayNumber"/>.
/// </remarks>
internal sealed class SeasonClock
{
    private const double HalfHandoverDays = 25.0; // Half the time in which a summer's survivors become old ice.

    private readonly SeasonParameters parameters;
    private readonly ulong key;

    public SeasonClock(SeasonParameters parameters, ulong key) => (this.parameters, this.key) = (parameters, key);

    /// <summary>The latitude of the edge, in degrees towards the pole.</summary>
    public double EdgeDegrees(double time)
    {
        (Turn before, Turn after) = TurnsAround(time);
        return before.EdgeDegrees + (Progress(time, before, after) * (after.EdgeDegrees - before.EdgeDegrees));
    }

    /// <summary>0 at the maximum, 1 at the minimum.</summary>
    public double Summerness(double time)
    {
        (Turn before, Turn after) = TurnsAround(time);
        double progress = Progress(time, before, after);
        return before.IsMinimum ? 1.0 - progress : progress;
    }

    /// <summary>The minimum of a calendar year.</summary>
    public Turn Minimum(int year) => Make(year, isMinimum: true);

    /// <summary>Whose survivors the old ice is: a year's minimum, mixed with the one before it while they take over.</summary>
    /// <returns>The year, and the share of its survivors against those of the year before, 0 to 1.</returns>
    public (int Year, double Share) OldIceAt(double time)
    {
        int year = DateOnly.FromDayNumber((int)time).Year + 1;
        while (time < Minimum(year).Time - HalfHandoverDays)
        {
            year--;
        }

        return (year, PlaneMath.SmoothStep((time - Minimum(year).Time + HalfHandoverDays) / (2.0 * HalfHandoverDays)));
    }

    private static DateOnly DayOf(int year, int dayOfYear) => new DateOnly(year, 1, 1).AddDays(dayOfYear - 1);

    private (Turn Before, Turn After) TurnsAround(double time)
    {
        int year = DateOnly.FromDayNumber((int)time).Year;
        Turn? before = null, after = null;
        for (int candidate = year - 1; candidate <= year + 1; candidate++)
        {
            foreach (Turn turn in (ReadOnlySpan<Turn>)[Make(candidate, true), Make(candidate, false)])
            {
                if (turn.Time <= time && (before is not { } known || turn.Time > known.Time))
                {
                    before = turn;
                }
                else if (turn.Time > time && (after is not { } next || turn.Time < next.Time))
                {
                    after = turn;
                }
            }
        }

        return (before!.Value, after!.Value);
    }

    private double Progress(double time, Turn before, Turn after)
    {
        double exponent = before.IsMinimum ? parameters.FreezeExponent : parameters.MeltExponent;
        double share = Math.Pow((time - before.Time) / (after.Time - before.Time), exponent);
        return 0.5 - (0.5 * Math.Cos(Math.PI * share));
    }

    private Turn Make(int year, bool isMinimum)
    {
        ulong turnKey = Draws.Key(Draws.Key(key, year), isMinimum ? 1 : 0);
        double delay = parameters.TimingSpreadDays * Math.Clamp(Draws.Normal(Draws.Key(turnKey, 0)), -3f, 3f);
        double decades = (year - parameters.ReferenceYear) / 10.0;
        double luck = Draws.Normal(Draws.Key(turnKey, 1));
        double edge = isMinimum
            ? parameters.SummerEdgeLatitudeDegrees + (parameters.SummerRetreatDegreesPerDecade * decades) + (parameters.SummerSpreadDegrees * luck)
            : parameters.WinterEdgeLatitudeDegrees + (parameters.WinterRetreatDegreesPerDecade * decades) + (parameters.WinterSpreadDegrees * luck);
        int dayOfYear = isMinimum ? parameters.MinimumDayOfYear : parameters.MaximumDayOfYear;
        return new(isMinimum, DayOf(year, dayOfYear).DayNumber + 0.5 + delay, edge);
    }

    /// <summary>The largest or smallest extent of a year.</summary>
    internal readonly record struct Turn(bool IsMinimum, double Time, double EdgeDegrees);
}
