namespace IceExtent.Statistics.Seasons;

/// <summary>The dates of every ocean cell in one ice year.</summary>
/// <param name="Cells">Indices of the ocean cells on the grid, rising.</param>
/// <param name="Dates">Their dates, in the same order.</param>
public sealed record CellSeasons(IReadOnlyList<int> Cells, YearDates[] Dates)
{
    /// <summary>Whether a cell held ice on some day of the year: only such cells have a season.</summary>
    public bool HadIce(int index) => Dates[index].Ice.KnownDays > Dates[index].Ice.OpenWaterDays;
}
