namespace IceExtent.Statistics.Seasons;

/// <summary>How the days of a series lie in the ice year and in the record. All three are indices into the series.</summary>
/// <param name="DayZero">The first day of the ice year; below 0 or beyond the series where it is not in it.</param>
/// <param name="RecordFirst">The record's first day; 0 or less where the record begins before the series.</param>
/// <param name="RecordLast">The record's last day; the last index or more where the record goes on.</param>
public readonly record struct SeriesDays(int DayZero, int RecordFirst, int RecordLast)
{
    /// <summary>The index of a day of the ice year.</summary>
    public int IndexOf(int day) => DayZero + day;

    /// <summary>The day of the ice year of an index.</summary>
    public int DayOf(int index) => index - DayZero;
}
