namespace IceExtent.Statistics.Seasons;

/// <summary>One ice year: the twelve months from one first day to the next.</summary>
/// <param name="Year">The calendar year of its first day, which is its name.</param>
/// <param name="FirstDay">The first day, UTC.</param>
/// <param name="Length">Its days: 365, or 366 where it holds a 29 February.</param>
public readonly record struct IceYear(int Year, DateOnly FirstDay, int Length)
{
    /// <summary>The last day.</summary>
    public DateOnly LastDay => FirstDay.AddDays(Length - 1);

    /// <summary>The date of a day of this year, which may also lie before or after it.</summary>
    /// <param name="day">Days from the first day.</param>
    public DateOnly DateOf(int day) => FirstDay.AddDays(day);

    /// <summary>The day of this year of a date: 0 for the first day, below it for earlier ones.</summary>
    public int DayOf(DateOnly date) => date.DayNumber - FirstDay.DayNumber;
}

/// <summary>On which day of the calendar ice years begin.</summary>
public readonly record struct IceYearStart
{
    private readonly int monthBefore;
    private readonly int dayBefore;

    /// <summary>Names the day.</summary>
    /// <param name="month">1 to 12.</param>
    /// <param name="day">A day that the month has in every year.</param>
    /// <exception cref="ArgumentOutOfRangeException">There is no such day in every year.</exception>
    public IceYearStart(int month, int day)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(month, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(month, 12);
        ArgumentOutOfRangeException.ThrowIfLessThan(day, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(day, DateTime.DaysInMonth(2001, month)); // 2001: no 29 February.
        (monthBefore, dayBefore) = (month - 1, day - 1);
    }

    /// <summary>The month, 1 to 12; 1 by default.</summary>
    public int Month => monthBefore + 1;

    /// <summary>The day of the month; 1 by default.</summary>
    public int Day => dayBefore + 1;

    /// <summary>The ice year that begins in a calendar year.</summary>
    public IceYear Beginning(int year)
    {
        DateOnly first = new(year, Month, Day);
        return new(year, first, new DateOnly(year + 1, Month, Day).DayNumber - first.DayNumber);
    }

    /// <summary>The ice year that holds a date.</summary>
    public IceYear Of(DateOnly date) => Beginning(date >= new DateOnly(date.Year, Month, Day) ? date.Year : date.Year - 1);
}
