using System.Globalization;
using System.Text.RegularExpressions;

namespace IceExtent.Storage.Reading;

/// <summary>Finds dates in file names and attributes.</summary>
internal static partial class DateText
{
    // No passive-microwave record starts earlier; numbers outside these years are no dates.
    private const int FirstYear = 1970;
    private const int LastYear = 2099;

    /// <summary>The date a text starts with, as [ISO8601] writes it: 2020-01-31, 20200131, 2020-031 or 2020031; or null.</summary>
    public static DateOnly? AtStart(string text)
    {
        Match match = Any.Match(text.TrimStart());
        return match is { Success: true, Index: 0 } ? DateOf(match) : null;
    }

    /// <summary>The different dates in a file's name: yyyyMMdd or yyyy-MM-dd and, where there is none of these, yyyyDDD.</summary>
    public static IReadOnlyList<DateOnly> InName(string fileName)
    {
        string name = Path.GetFileNameWithoutExtension(fileName);
        DateOnly[] found = [.. Any.Matches(name).Where(match => match.Groups["month"].Success).Select(DateOf).OfType<DateOnly>().Distinct()];
        return found.Length > 0
            ? found
            : [.. Any.Matches(name).Select(DateOf).OfType<DateOnly>().Distinct()];
    }

    [GeneratedRegex(
        @"(?<!\d)(?<year>\d{4})(?:-(?<month>\d{2})-(?<day>\d{2})|(?<month>\d{2})(?<day>\d{2})|-?(?<ordinal>\d{3}))(?!\d)",
        RegexOptions.CultureInvariant)]
    private static partial Regex Any { get; }

    private static DateOnly? DateOf(Match match)
    {
        int year = Number(match, "year");
        if (year is < FirstYear or > LastYear)
        {
            return null;
        }

        if (match.Groups["ordinal"].Success)
        {
            int ordinal = Number(match, "ordinal");
            return ordinal >= 1 && ordinal <= (DateTime.IsLeapYear(year) ? 366 : 365)
                ? new DateOnly(year, 1, 1).AddDays(ordinal - 1)
                : null;
        }

        (int month, int day) = (Number(match, "month"), Number(match, "day"));
        return month is >= 1 and <= 12 && day >= 1 && day <= DateTime.DaysInMonth(year, month)
            ? new DateOnly(year, month, day)
            : null;
    }

    private static int Number(Match match, string group) => int.Parse(match.Groups[group].ValueSpan, CultureInfo.InvariantCulture);
}
