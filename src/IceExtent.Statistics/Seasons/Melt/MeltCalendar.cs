namespace IceExtent.Statistics.Seasons;

/// <summary>Where in the year melt and freeze-up are looked for, in one hemisphere.</summary>
/// <param name="Melt">Where melt onset may lie.</param>
/// <param name="Winter">The winter before it, which tells how the frozen cell looks.</param>
/// <param name="Freeze">Where freeze-up may lie.</param>
/// <param name="NextWinter">The winter after it, which tells how the cell looks once it is frozen again.</param>
public sealed record MeltCalendar(CalendarWindow Melt, CalendarWindow Winter, CalendarWindow Freeze, CalendarWindow NextWinter)
{
    /// <summary>The four windows of one ice year.</summary>
    public MeltWindows In(IceYear year) => new(
        SeasonWindow.Of(Melt, year), SeasonWindow.Of(Winter, year), SeasonWindow.Of(Freeze, year), SeasonWindow.Of(NextWinter, year));
}

/// <summary>The windows of one ice year, in days from its first day.</summary>
/// <param name="Melt">Where melt onset may lie.</param>
/// <param name="Winter">The winter before it.</param>
/// <param name="Freeze">Where freeze-up may lie.</param>
/// <param name="NextWinter">The winter after it.</param>
public readonly record struct MeltWindows(SeasonWindow Melt, SeasonWindow Winter, SeasonWindow Freeze, SeasonWindow NextWinter);
