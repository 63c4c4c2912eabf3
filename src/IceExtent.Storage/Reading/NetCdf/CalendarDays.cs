namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Counts days in the calendars of observations. Source: [CF] section 4.4.1.</summary>
internal static class CalendarDays
{
    /// <summary>Days from 1970-01-01 to a date; null where the calendar does not have the date.</summary>
    /// <param name="year">1 or later.</param>
    /// <param name="month">1 to 12.</param>
    /// <param name="day">From 1.</param>
    /// <param name="mixed">Whether dates before 1582-10-15 are Julian, as in the calendars standard and gregorian.</param>
    public static long? Since1970(int year, int month, int day, bool mixed)
    {
        if (year is < 1 or > 9999 || month is < 1 or > 12 || day < 1)
        {
            return null;
        }

        if (mixed && (year, month, day).CompareTo((1582, 10, 15)) < 0)
        {
            int februaryLeap = month == 2 && year % 4 == 0 ? 1 : 0;
            bool exists = day <= DateTime.DaysInMonth(2001, month) + februaryLeap
                && (year, month, day).CompareTo((1582, 10, 4)) <= 0;
            return exists ? JulianSince1970(year, month, day) : null;
        }

        return day <= DateTime.DaysInMonth(year, month)
            ? new DateOnly(year, month, day).DayNumber - new DateOnly(1970, 1, 1).DayNumber
            : null;
    }

    // Years counted from March, so that the leap day comes last: 365 days and every fourth year one more.
    private static long JulianSince1970(int year, int month, int day)
    {
        const long MarchOfYearZeroTo1970 = 719_470; // 0000-03-01 Julian to 1970-01-01 Gregorian.
        int marchYear = month < 3 ? year - 1 : year;
        int marchMonth = (month + 9) % 12;
        long dayOfYear = (((153 * marchMonth) + 2) / 5) + day - 1;
        return (365L * marchYear) + Math.DivRem(marchYear, 4).Quotient + dayOfYear - MarchOfYearZeroTo1970;
    }
}
