namespace IceExtent.Statistics.Seasons;

/// <summary>Which days a series of one ice year holds. Unit: days from the year's first day.</summary>
/// <param name="Year">The ice year.</param>
/// <param name="Lead">Days of the series before the year's first day.</param>
/// <param name="Tail">Days of the series after its last day.</param>
/// <param name="RecordFirst">The record's first day, which may lie far before the year.</param>
/// <param name="RecordLast">The record's last day, which may lie far after it.</param>
public readonly record struct IceYearSpan(IceYear Year, int Lead, int Tail, int RecordFirst, int RecordLast)
{
    /// <summary>The number of days.</summary>
    public int Days => Lead + Year.Length + Tail;

    /// <summary>The date of the first of them.</summary>
    public DateOnly FirstDate => Year.DateOf(-Lead);

    /// <summary>Lays dated values out as a series; days without one are missing, days outside it are left out.</summary>
    /// <param name="days">The values and their standard errors, in any order.</param>
    /// <returns>Two series of <see cref="Days"/> values; NaN is missing.</returns>
    public (float[] Values, float[] StandardErrors) Lay(IEnumerable<(DateOnly Date, double Value, double StandardError)> days)
    {
        ArgumentNullException.ThrowIfNull(days);
        float[] values = new float[Days], errors = new float[Days];
        Array.Fill(values, float.NaN);
        Array.Fill(errors, float.NaN);
        foreach ((DateOnly date, double value, double error) in days)
        {
            int index = Year.DayOf(date) + Lead;
            if (index >= 0 && index < Days)
            {
                (values[index], errors[index]) = ((float)value, (float)error);
            }
        }

        return (values, errors);
    }

    /// <summary>Whether no later day can change what is found.</summary>
    public bool IsComplete => RecordLast >= Year.Length - 1 + Tail;

    /// <summary>The days that a scheme, and melt where it is sought, need for one ice year of a record.</summary>
    /// <param name="year">The ice year.</param>
    /// <param name="scheme">The scheme.</param>
    /// <param name="melt">How melt onset and freeze-up are found, or null where they are not.</param>
    /// <param name="recordFirst">The record's first day.</param>
    /// <param name="recordLast">The record's last day.</param>
    public static IceYearSpan Of(IceYear year, SeasonScheme scheme, MeltRules? melt, DateOnly recordFirst, DateOnly recordLast)
    {
        ArgumentNullException.ThrowIfNull(scheme);
        SeasonWindow needed = melt?.Needed(melt.Calendar.In(year)) ?? new(0, 0);
        return new(
            year,
            Math.Max(scheme.LeadDays, -needed.First),
            Math.Max(scheme.TailDays, needed.Last - year.Length + 1),
            year.DayOf(recordFirst),
            year.DayOf(recordLast));
    }
}
