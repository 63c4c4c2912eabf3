using IceExtent.Grids;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;

namespace IceExtent.Scenes.Observation;

/// <summary>Which days and cells the radiometer does not see.</summary>
internal sealed class Coverage
{
    private readonly CoverageParameters parameters;
    private readonly DateOnly firstDay;
    private readonly ulong key;
    private readonly int[] polarGap;
    private readonly SwathGaps swathGaps;
    private readonly LostPasses lostPasses;
    private readonly double missingStart;

    public Coverage(CoverageParameters parameters, DateOnly firstDay, double? polarGapLatitudeDegrees, Grid grid, ulong key)
    {
        (this.parameters, this.firstDay, this.key) = (parameters, firstDay, key);
        List<int> gap = [];
        for (int cell = 0; cell < grid.CellCount; cell++)
        {
            if (Math.Abs(grid.LatitudesDegrees[cell]) >= polarGapLatitudeDegrees)
            {
                gap.Add(cell);
            }
        }

        polarGap = [.. gap];
        swathGaps = new(parameters, grid, Draws.Key(key, 1));
        lostPasses = new(parameters, grid, Draws.Key(key, 2));
        missingStart = StartShare(parameters.MissingDayShare);
    }

    /// <summary>Whether a whole day is missing.</summary>
    public bool IsMissing(DateOnly day)
    {
        int sinceFirst = day.DayNumber - firstDay.DayNumber;
        if (sinceFirst % parameters.DayStep != 0 || parameters.Outages.Any(outage => day >= outage.FirstDay && day <= outage.LastDay))
        {
            return true;
        }

        for (int before = 0; before < 3; before++)
        {
            ulong start = Draws.Key(Draws.Key(key, 3), day.DayNumber - before);
            int length = 1 + (int)(3.0 * Draws.Unit(Draws.Key(start, 1)));
            if (Draws.Unit(start) < missingStart && length > before)
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>Makes unseen cells NaN in every plane.</summary>
    /// <param name="day">The day.</param>
    /// <param name="lost">One flag a cell; overwritten.</param>
    public void MarkLost(DateOnly day, Span<bool> lost)
    {
        lost.Clear();
        foreach (int cell in polarGap)
        {
            lost[cell] = true;
        }

        swathGaps.Mark(day, lost);
        lostPasses.Mark(day, lost);
        MarkSingleCells(day, lost);
    }

    // A missing stretch starts on a day with this chance and lasts one to three days, each equally likely, so a day is
    // seen with the chance (1 − q)(1 − 2q/3)(1 − q/3). Solved for q by halving.
    private static double StartShare(double missingShare)
    {
        double low = 0.0, high = 1.0;
        for (int round = 0; round < 60; round++)
        {
            double q = (low + high) / 2.0;
            double missing = 1.0 - ((1.0 - q) * (1.0 - (2.0 * q / 3.0)) * (1.0 - (q / 3.0)));
            (low, high) = missing < missingShare ? (q, high) : (low, q);
        }

        return missingShare == 0.0 ? 0.0 : low;
    }

    private void MarkSingleCells(DateOnly day, Span<bool> lost)
    {
        ushort limit = (ushort)Math.Round(parameters.LostCellShare * 65_536.0);
        if (limit == 0)
        {
            return;
        }

        ulong dayKey = Draws.Key(Draws.Key(key, 4), day.DayNumber);
        for (int cell = 0; cell < lost.Length; cell += 4)
        {
            ulong bits = Draws.Key(dayKey, cell);
            int last = Math.Min(cell + 4, lost.Length);
            for (int at = cell; at < last; at++)
            {
                lost[at] |= (ushort)bits < limit;
                bits >>= 16;
            }
        }
    }
}
