using IceExtent.Statistics.Seasons;

namespace IceExtent.Worker.Seasons;

/// <summary>Finds the dates of every ocean cell of one ice year.</summary>
internal static class CellSeasonSearch
{
    private const int BlockCells = 64; // The blocks of series stay in a core's cache.

    /// <summary>Finds them; the result does not depend on the number of workers.</summary>
    /// <param name="stack">The year's days.</param>
    /// <param name="scheme">The rules.</param>
    /// <param name="melt">How melt is found, or null where it is not.</param>
    /// <param name="span">The year.</param>
    /// <param name="workers">How many blocks of cells are handled at a time.</param>
    /// <param name="cancellation">Stops at the next block.</param>
    public static CellSeasons Find(
        IceYearStack stack, SeasonScheme scheme, MeltChoice? melt, IceYearSpan span, int workers, CancellationToken cancellation)
    {
        YearDates[] dates = new YearDates[stack.Cells.Length];
        Parallel.For(
            0,
            (dates.Length + BlockCells - 1) / BlockCells,
            new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = cancellation },
            () => new Room(scheme, melt, span),
            (block, _, room) =>
            {
                int first = block * BlockCells;
                room.Find(stack, first, Math.Min(BlockCells, dates.Length - first), dates);
                return room;
            },
            _ => { });
        return new(stack.Cells, dates);
    }

    private sealed class Room(SeasonScheme scheme, MeltChoice? melt, IceYearSpan span)
    {
        private readonly SeasonFinder finder = new(scheme, span);
        private readonly float[] fraction = new float[BlockCells * span.Days];
        private readonly float[] error = new float[BlockCells * span.Days];
        private readonly float[][] signals = [.. Enumerable.Range(0, 3).Select(_ => new float[melt is null ? 0 : BlockCells * span.Days])];
        private readonly MeltWorkspace workspace = new(melt is null ? 1 : span.Days);
        private readonly MeltWindows windows = melt?.Rules.Calendar.In(span.Year) ?? default;
        private readonly SeriesDays days = new(span.Lead, span.Lead + span.RecordFirst, span.Lead + span.RecordLast);

        public void Find(IceYearStack stack, int first, int count, YearDates[] dates)
        {
            stack.CopySeries(span.Days, first, count, fraction, error);
            if (melt is not null)
            {
                stack.CopySignals(span.Days, first, count, signals);
            }

            for (int cell = 0; cell < count; cell++)
            {
                int at = cell * span.Days;
                IceDates ice = finder.Find(fraction.AsSpan(at, span.Days), error.AsSpan(at, span.Days));
                dates[first + cell] = melt is null ? new(ice, null, null) : WithMelt(melt, ice, at);
            }
        }

        private YearDates WithMelt(MeltChoice choice, IceDates ice, int at)
        {
            CellMelt found = CellMelt.None;
            if (ice.KnownDays > ice.OpenWaterDays)
            {
                MeltSeries series = new(
                    signals[0].AsSpan(at, span.Days), signals[1].AsSpan(at, span.Days), signals[2].AsSpan(at, span.Days), fraction.AsSpan(at, span.Days));
                found = new(
                    HorizontalRangeMelt.Onset(series, days, windows, choice.Rules, workspace),
                    IndicatorMelt.Dates(series, days, windows, choice.Rules, workspace));
            }

            return new(ice, found.Onset(choice.Onset), found.Indicators.ContinuousFreeze) { Melt = found };
        }
    }
}

/// <summary>How melt onset and freeze-up are found.</summary>
/// <param name="Rules">The rules of both methods.</param>
/// <param name="Onset">Which of them gives melt onset.</param>
internal sealed record MeltChoice(MeltRules Rules, MeltOnsetMethod Onset);
