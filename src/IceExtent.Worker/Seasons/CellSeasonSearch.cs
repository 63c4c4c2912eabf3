using IceExtent.Statistics.Seasons;

namespace IceExtent.Worker.Seasons;

/// <summary>Finds the dates of every ocean cell of one ice year.</summary>
internal static class CellSeasonSearch
{
    private const int BlockCells = 64; // Two blocks of series stay in a core's cache.

    /// <summary>Finds them; the result does not depend on the number of workers.</summary>
    /// <param name="stack">The year's days.</param>
    /// <param name="scheme">The rules.</param>
    /// <param name="span">The year.</param>
    /// <param name="workers">How many blocks of cells are handled at a time.</param>
    /// <param name="cancellation">Stops at the next block.</param>
    public static CellSeasons Find(IceYearStack stack, SeasonScheme scheme, IceYearSpan span, int workers, CancellationToken cancellation)
    {
        YearDates[] dates = new YearDates[stack.Cells.Length];
        Parallel.For(
            0,
            (dates.Length + BlockCells - 1) / BlockCells,
            new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = cancellation },
            () => new Room(scheme, span),
            (block, _, room) =>
            {
                int first = block * BlockCells;
                room.Find(stack, first, Math.Min(BlockCells, dates.Length - first), dates);
                return room;
            },
            _ => { });
        return new(stack.Cells, dates);
    }

    private sealed class Room(SeasonScheme scheme, IceYearSpan span)
    {
        private readonly SeasonFinder finder = new(scheme, span);
        private readonly float[] fraction = new float[BlockCells * span.Days];
        private readonly float[] error = new float[BlockCells * span.Days];

        public void Find(IceYearStack stack, int first, int count, YearDates[] dates)
        {
            stack.CopySeries(span.Days, first, count, fraction, error);
            for (int cell = 0; cell < count; cell++)
            {
                int at = cell * span.Days;
                dates[first + cell] = new(finder.Find(fraction.AsSpan(at, span.Days), error.AsSpan(at, span.Days)), null, null);
            }
        }
    }
}
