namespace IceExtent.Statistics.Seasons;

/// <summary>A stretch of every calendar year, which may run over its end.</summary>
public readonly record struct CalendarWindow
{
    private const int CommonYear = 2001;
    private readonly IceYearStart first;
    private readonly IceYearStart last;

    /// <summary>Names the stretch.</summary>
    /// <param name="firstDayOfYear">Its first day, counted in a year of 365 days: 1 to 365. 60 is 1 March in every year.</param>
    /// <param name="lastDayOfYear">Its last day, counted likewise; before the first where it lies in the next calendar year.</param>
    /// <exception cref="ArgumentOutOfRangeException">A day is not of 1 to 365.</exception>
    public CalendarWindow(int firstDayOfYear, int lastDayOfYear) => (first, last) = (Of(firstDayOfYear), Of(lastDayOfYear));

    /// <summary>The stretch whose last day lies in an ice year; its first day may lie before it.</summary>
    public DayRange In(IceYear year)
    {
        DateOnly end = last.Beginning(year.Year).FirstDay;
        end = end < year.FirstDay ? last.Beginning(year.Year + 1).FirstDay : end;
        DateOnly begin = first.Beginning(end.Year).FirstDay;
        begin = begin > end ? first.Beginning(end.Year - 1).FirstDay : begin;
        return new(year.DayOf(begin), year.DayOf(end));
    }

    private static IceYearStart Of(int dayOfYear)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(dayOfYear, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(dayOfYear, 365);
        DateOnly day = new DateOnly(CommonYear, 1, 1).AddDays(dayOfYear - 1);
        return new(day.Month, day.Day);
    }
}
