namespace IceExtent.Statistics.Seasons;

/// <summary>A day of the calendar that every year has.</summary>
/// <param name="Month">1 to 12.</param>
/// <param name="Day">1 to the month's days; 29 February is not one.</param>
public readonly record struct CalendarDay(int Month, int Day)
{
    /// <summary>The day of an ice year on which it falls: 0 for the year's first day.</summary>
    public int In(IceYear year)
    {
        DateOnly first = year.FirstDay;
        DateOnly here = new(first.Year, Month, Day);
        return year.DayOf(here < first ? new DateOnly(first.Year + 1, Month, Day) : here);
    }
}

/// <summary>Days of an ice year between two calendar days, both within.</summary>
/// <param name="From">The first.</param>
/// <param name="To">The last; 28 February stands for the last day of February.</param>
public readonly record struct CalendarWindow(CalendarDay From, CalendarDay To);

/// <summary>Days of one ice year in which a date is sought, both ends within. Unit: days from the year's first day.</summary>
/// <param name="First">The first.</param>
/// <param name="Last">The last, not before the first.</param>
public readonly record struct SeasonWindow(int First, int Last)
{
    /// <summary>The window of a calendar window in an ice year; it may begin before the year where it ends in it.</summary>
    public static SeasonWindow Of(CalendarWindow window, IceYear year)
    {
        int last = window.To.In(year);
        last += year.DateOf(last + 1) is { Month: 2, Day: 29 } ? 1 : 0;
        int first = window.From.In(year);
        return new(first <= last ? first : year.DayOf(year.DateOf(first).AddYears(-1)), last);
    }

    /// <summary>The last of the windows of all years that is over before a day.</summary>
    /// <param name="window">The calendar window.</param>
    /// <param name="year">The ice year whose days are meant.</param>
    /// <param name="day">The day.</param>
    public static SeasonWindow LastBefore(CalendarWindow window, IceYear year, int day)
    {
        SeasonWindow here = Of(window, year);
        if (here.Last < day)
        {
            return here;
        }

        DateOnly before = year.FirstDay.AddYears(-1);
        SeasonWindow earlier = Of(window, new(before.Year, before, year.FirstDay.DayNumber - before.DayNumber));
        int shift = year.DayOf(before);
        return new(earlier.First + shift, earlier.Last + shift);
    }
}
