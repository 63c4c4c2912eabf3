namespace IceExtent.Retrieval;

/// <summary>From which days an empty cell may be filled, and how fast ice may change unseen.</summary>
/// <remarks>An instance is always valid. With both limits above 0 a cell needs a day on either side; with one of them 0 the other side alone gives.</remarks>
public sealed record DayFillingRules
{
    /// <summary>The farthest day, before or after, that may be asked for.</summary>
    public const int MostDays = 15;

    /// <summary>Sets the rules up.</summary>
    /// <param name="daysBefore">How many days back a value may come from, 0 to <see cref="MostDays"/>.</param>
    /// <param name="daysAfter">How many days ahead, 0 to <see cref="MostDays"/>; not both 0.</param>
    /// <param name="changePerDay">Standard deviation of what half-covered water does by chance in one day. Unit: 1; 0 or more.</param>
    public DayFillingRules(int daysBefore, int daysAfter, double changePerDay)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(daysBefore);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(daysBefore, MostDays);
        ArgumentOutOfRangeException.ThrowIfNegative(daysAfter);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(daysAfter, MostDays);
        ArgumentOutOfRangeException.ThrowIfZero(daysBefore + daysAfter);
        ArgumentOutOfRangeException.ThrowIfNegative(changePerDay);
        (DaysBefore, DaysAfter, ChangePerDay) = (daysBefore, daysAfter, changePerDay);
    }

    /// <summary>How many days back a value may come from.</summary>
    public int DaysBefore { get; }

    /// <summary>How many days ahead a value may come from.</summary>
    public int DaysAfter { get; }

    /// <summary>Standard deviation of what half-covered water does by chance in one day. Unit: 1.</summary>
    public double ChangePerDay { get; }
}
