using System.Globalization;
using System.Text.RegularExpressions;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>A unit of time since a moment, such as <c>hours since 1979-01-01 00:00:00</c>. Source: [CF] section 4.4.</summary>
internal sealed partial class TimeUnits
{
    private const double SecondsPerDay = 86_400.0;

    private readonly double secondsPerUnit;
    private readonly double referenceSeconds;

    private TimeUnits(double secondsPerUnit, double referenceSeconds) =>
        (this.secondsPerUnit, this.referenceSeconds) = (secondsPerUnit, referenceSeconds);

    /// <summary>Whether a calendar is one of observations; a missing one is.</summary>
    public static bool IsReal(string? calendar) => calendar is null || IsMixed(calendar) || Is(calendar, "proleptic_gregorian");

    /// <summary>Understands a units attribute; null where it makes no sense.</summary>
    /// <param name="units">The attribute.</param>
    /// <param name="calendar">The calendar attribute, one of observations, or null.</param>
    public static TimeUnits? Parse(string units, string? calendar)
    {
        Match match = Pattern.Match(units);
        if (!match.Success || SecondsOf(match.Groups["unit"].Value) is not { } seconds)
        {
            return null;
        }

        long? day = CalendarDays.Since1970(Whole(match, "year"), Whole(match, "month"), Whole(match, "day"), IsMixed(calendar));
        (int hour, int minute, double second) = (Whole(match, "hour"), Whole(match, "minute"), Real(match, "second"));
        return day is { } days && hour < 24 && minute < 60 && second < 61.0 && Whole(match, "zoneMinute") < 60
            ? new(seconds, (days * SecondsPerDay) + (hour * 3600.0) + (minute * 60.0) + second - ZoneSeconds(match))
            : null;
    }

    /// <summary>The day of a time, UTC; null where it lies outside the years 1 to 9999 or is no number.</summary>
    /// <remarks>Rounded to the second first, as broken numbers of days miss midnight by a little.</remarks>
    public DateOnly? DayOf(double time)
    {
        double seconds = Math.Round(referenceSeconds + (time * secondsPerUnit));
        double day = Math.Floor(seconds / SecondsPerDay) + new DateOnly(1970, 1, 1).DayNumber;
        return day >= DateOnly.MinValue.DayNumber && day <= DateOnly.MaxValue.DayNumber
            ? DateOnly.FromDayNumber((int)day)
            : null;
    }

    [GeneratedRegex(
        @"^\s*(?<unit>[a-z]+)\s+since\s+(?<year>\d{1,4})-(?<month>\d{1,2})-(?<day>\d{1,2})"
            + @"(?:(?:\s+|T)(?<hour>\d{1,2})(?::(?<minute>\d{1,2})(?::(?<second>\d{1,2}(?:\.\d*)?))?)?)?"
            + @"\s*(?:Z|UTC|GMT|(?<sign>[+-])?(?<zoneHour>\d{1,2}):?(?<zoneMinute>\d{2})?)?\s*$",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex Pattern { get; }

    private static bool IsMixed(string? calendar) => calendar is null || Is(calendar, "standard") || Is(calendar, "gregorian");

    private static bool Is(string calendar, string name) => calendar.Equals(name, StringComparison.OrdinalIgnoreCase);

    // Months and years are not here: they have no fixed length.
    private static double? SecondsOf(string unit) => unit.ToUpperInvariant() switch
    {
        "WEEK" or "WEEKS" => 7.0 * SecondsPerDay,
        "DAY" or "DAYS" or "D" => SecondsPerDay,
        "HOUR" or "HOURS" or "HR" or "HRS" or "H" => 3600.0,
        "MINUTE" or "MINUTES" or "MIN" or "MINS" => 60.0,
        "SECOND" or "SECONDS" or "SEC" or "SECS" or "S" => 1.0,
        "MILLISECOND" or "MILLISECONDS" or "MSEC" or "MSECS" or "MILLISEC" or "MILLISECS" or "MS" => 1e-3,
        "MICROSECOND" or "MICROSECONDS" or "MICROSEC" or "MICROSECS" => 1e-6,
        "NANOSECOND" or "NANOSECONDS" => 1e-9,
        _ => null,
    };

    private static double ZoneSeconds(Match match) =>
        ((Whole(match, "zoneHour") * 3600.0) + (Whole(match, "zoneMinute") * 60.0))
        * (match.Groups["sign"].Value == "-" ? -1.0 : 1.0);

    private static int Whole(Match match, string group) =>
        match.Groups[group].Success ? int.Parse(match.Groups[group].Value, CultureInfo.InvariantCulture) : 0;

    private static double Real(Match match, string group) =>
        match.Groups[group].Success ? double.Parse(match.Groups[group].Value, CultureInfo.InvariantCulture) : 0.0;
}
