namespace IceExtent.Statistics.Seasons;

/// <summary>Brings the dates of a region's cells to one date each: medians weighted by area.</summary>
/// <remarks>
/// Where cells that the ice leaves make up enough of the area with ice, they alone count, so that all dates are of the same water.
/// The limits of a median are the medians of its cells' limits: as if all cells erred alike, so rather too wide. Where too few cells have
/// a date, the commonest reason of the others, by area, stands for the region's. Own choice.
/// </remarks>
public sealed class RegionMedians(CellSeasons cells, double leastDatedShare)
{
    private readonly List<(int Day, double Area)> sorted = [];

    /// <summary>The medians of one region.</summary>
    /// <param name="region">Its cells and the area each brings.</param>
    /// <returns>The dates, and the area of the cells that held ice in m², their mean known and open-water days.</returns>
    public (YearDates Dates, double IcyAreaSquareMeters, double KnownDays, double OpenWaterDays) Of(TotalsRegion region)
    {
        ArgumentNullException.ThrowIfNull(region);
        List<(int Index, double Area)> icy = [];
        double area = 0.0, known = 0.0, open = 0.0;
        int index = 0;
        for (int at = 0; at < region.Cells.Length; at++)
        {
            while (index < cells.Cells.Count && cells.Cells[index] < region.Cells[at])
            {
                index++; // Both rise.
            }

            if (index == cells.Cells.Count || cells.Cells[index] != region.Cells[at] || !cells.HadIce(index))
            {
                continue;
            }

            double weight = region.AreasSquareMeters[at];
            icy.Add((index, weight));
            area += weight;
            known += weight * cells.Dates[index].Ice.KnownDays;
            open += weight * cells.Dates[index].Ice.OpenWaterDays;
        }

        if (area == 0.0)
        {
            return (WithoutIce, 0.0, 0.0, 0.0);
        }

        List<(int Index, double Area)> left = icy.FindAll(cell => cells.Dates[cell.Index].Ice.Retreat.State != SeasonDateState.NeverReached);
        double leftArea = left.Sum(cell => cell.Area);
        (double icyArea, double meanKnown, double meanOpen) = (area, known / area, open / area);
        (icy, area) = leftArea >= leastDatedShare * area ? (left, leftArea) : (icy, area);
        IceDates ice = new(
            Median(icy, area, SeasonEvent.Opening)!.Value,
            Median(icy, area, SeasonEvent.Retreat)!.Value,
            Median(icy, area, SeasonEvent.Advance)!.Value,
            Median(icy, area, SeasonEvent.Closing)!.Value,
            0,
            0);
        return (new(ice, Median(icy, area, SeasonEvent.MeltOnset), Median(icy, area, SeasonEvent.FreezeUp)), icyArea, meanKnown, meanOpen);
    }

    private static YearDates WithoutIce
    {
        get
        {
            SeasonDate never = SeasonDate.Without(SeasonDateState.NeverReached);
            return new(new(never, never, never, never, 0, 0), null, null);
        }
    }

    private SeasonDate? Median(List<(int Index, double Area)> icy, double area, SeasonEvent which)
    {
        double dated = 0.0;
        Span<double> reasons = stackalloc double[Enum.GetValues<SeasonDateState>().Length];
        foreach ((int index, double weight) in icy)
        {
            if (cells.Dates[index].Of(which) is not { } date)
            {
                return null;
            }

            dated += date.Day is null ? 0.0 : weight;
            reasons[(int)date.State] += weight;
        }

        if (dated < leastDatedShare * area)
        {
            return Reason(icy, which, reasons, (leastDatedShare * area) - dated);
        }

        int day = MedianOf(icy, which, date => date.Day);
        return SeasonDate.Found(
            day, Math.Min(day, MedianOf(icy, which, date => date.Day is null ? null : date.Earliest)), Math.Max(day, MedianOf(icy, which, date => date.Day is null ? null : date.Latest)));
    }

    // A reason that would pass goes first where its cells alone keep the region from a date.
    private SeasonDate Reason(List<(int Index, double Area)> icy, SeasonEvent which, ReadOnlySpan<double> reasons, double lacking)
    {
        int commonest = 1;
        foreach (SeasonDateState passing in (SeasonDateState[])[SeasonDateState.NotYetReached, SeasonDateState.BeforeRecord])
        {
            if (reasons[(int)passing] >= lacking)
            {
                return SeasonDate.Without(passing);
            }
        }

        for (int state = 1; state < reasons.Length; state++) // 0 is a date.
        {
            commonest = reasons[state] > reasons[commonest] ? state : commonest;
        }

        return commonest == (int)SeasonDateState.HiddenByGap
            ? SeasonDate.Hidden(MedianOf(icy, which, date => date.Earliest), MedianOf(icy, which, date => date.Latest))
            : SeasonDate.Without((SeasonDateState)commonest);
    }

    // The first day up to which half of the area has it.
    private int MedianOf(List<(int Index, double Area)> icy, SeasonEvent which, Func<SeasonDate, int?> dayOf)
    {
        sorted.Clear();
        double area = 0.0;
        foreach ((int index, double weight) in icy)
        {
            if (cells.Dates[index].Of(which) is { } date && dayOf(date) is { } day)
            {
                sorted.Add((day, weight));
                area += weight;
            }
        }

        sorted.Sort((a, b) => a.Day.CompareTo(b.Day));
        double below = 0.0;
        foreach ((int day, double weight) in sorted)
        {
            below += weight;
            if (below >= 0.5 * area)
            {
                return day;
            }
        }

        return sorted[^1].Day;
    }
}
