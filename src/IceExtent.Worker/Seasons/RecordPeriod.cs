using System.Globalization;
using IceExtent.Statistics.Seasons;

namespace IceExtent.Worker.Seasons;

/// <summary>The days from the first to the last grid of an archive.</summary>
/// <param name="First">The first.</param>
/// <param name="Last">The last.</param>
internal readonly record struct RecordPeriod(DateOnly First, DateOnly Last)
{
    private const string Between = " to ";

    /// <summary>The part of it that an ice year depends on.</summary>
    public RecordPeriod In(IceYearSpan span)
    {
        DateOnly first = span.FirstDate, last = first.AddDays(span.Days - 1);
        return new(First > first ? First : first, Last < last ? Last : last);
    }

    /// <summary>The files of its calendar years that exist, in order.</summary>
    /// <param name="pathOf">The file of a year.</param>
    public IEnumerable<string> Files(Func<int, string> pathOf) =>
        Enumerable.Range(First.Year, Last.Year - First.Year + 1).Select(pathOf).Where(File.Exists);

    /// <summary>Reads what <see cref="ToString"/> wrote, or gives null.</summary>
    public static RecordPeriod? Parse(string? text)
    {
        string[] ends = text?.Split(Between) ?? [];
        return ends.Length == 2 && Day(ends[0]) is { } first && Day(ends[1]) is { } last ? new(first, last) : null;
    }

    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{First:yyyy-MM-dd}{Between}{Last:yyyy-MM-dd}");

    private static DateOnly? Day(string text) =>
        DateOnly.TryParseExact(text, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out DateOnly day) ? day : null;
}
