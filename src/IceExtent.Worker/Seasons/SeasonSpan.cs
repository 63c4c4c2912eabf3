using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Seasons;

/// <summary>Brings the season tables of an archive up to date with its days.</summary>
/// <param name="settings">The run.</param>
/// <param name="season">How its dates are found.</param>
/// <param name="preparation">Its regions, the hemisphere first, and its places.</param>
/// <param name="configuration">The digest of the days' configuration.</param>
/// <param name="workers">How many days, or blocks of cells, are handled at a time.</param>
internal sealed class SeasonSpan(
    RunSettings settings, SeasonSettings season, DayPreparation preparation, string configuration, int workers)
{
    private readonly ArchiveLayout layout = new(settings.Output);
    private readonly int[] ocean = [.. Enumerable.Range(0, settings.Grid.CellCount).Where(cell => settings.Ocean[cell])];

    /// <summary>Makes what is missing, was made of other days, or by other rules.</summary>
    /// <param name="touched">Days that the run wrote or took away.</param>
    /// <param name="yearDone">Told of each year, in order.</param>
    /// <param name="cancellation">Stops between days.</param>
    /// <exception cref="Storage.Faults.FaultException">A file cannot be written.</exception>
    public IReadOnlyList<SeasonYearReport> Update(IReadOnlySet<DateOnly> touched, Action<SeasonYearReport> yearDone, CancellationToken cancellation)
    {
        IceYearStack stack = new(ocean, settings.Grid.CellCount);
        List<SeasonYearReport> reports = [];
        foreach (string method in settings.Methods)
        {
            reports.AddRange(UpdateMethod(method, stack, touched, yearDone, cancellation));
        }

        return reports;
    }

    private List<SeasonYearReport> UpdateMethod(
        string method, IceYearStack stack, IReadOnlySet<DateOnly> touched, Action<SeasonYearReport> yearDone, CancellationToken cancellation)
    {
        ArchiveGrids reader = new(layout, method, settings.Grid);
        Dictionary<DateOnly, string> files = reader.List(null, null).ToDictionary(file => file.Day, file => file.Path);
        if (files.Count == 0)
        {
            return [];
        }

        RecordPeriod record = new(files.Keys.Min(), files.Keys.Max());
        SeasonArchive archive = new(settings, season, layout, method, configuration, record);
        RegionSeasons named = new(settings, season, layout, method, archive, record);
        PlaceSeasons places = new(settings, season, layout, method, archive, record);
        StoredDays<ArchiveGrids> grids = new(reader, files);
        StoredDays<ArchiveMeltSignals>? melt = season.Melt is null ? null : MeltDays();
        List<SeasonYearReport> reports = [];
        using Writing writing = new(); // A year is written while the next is read.
        foreach (IceYearSpan span in named.Spans)
        {
            if (archive.Has(span) && !IsTouched(span, touched))
            {
                continue;
            }

            RunningYear? before = RunningYear.Read(archive.GridPathOf(span.Year), settings.Grid, archive.IsRunning(span.Year));
            stack.Load(grids, span, melt, workers, cancellation);
            CellSeasons cells = CellSeasonSearch.Find(stack, season.Scheme, season.Melt, span, workers, cancellation);
            named.Add(span, cells, preparation.Regions);
            places.Add(span, cells, preparation.Places);
            writing.Begin(() => archive.WriteCells(span, cells));
            SeasonYearReport report = new(
                method, span.Year.Year, span.IsComplete, Enumerable.Range(0, cells.Cells.Count).Count(cells.HadIce), before?.ChangesTo(cells), stack.Faults);
            reports.Add(report);
            yearDone(report);
        }

        writing.End();
        archive.RemoveYearsOutside(named.Spans);
        if (reports.Count > 0)
        {
            reports[^1] = reports[^1] with { Named = [.. named.Write(), .. places.Write(named.Spans)] };
        }

        return reports;
    }

    /// <summary>One piece of writing at a time beside other work.</summary>
    private sealed class Writing : IDisposable
    {
        private Task task = Task.CompletedTask;

        public void Begin(Action write)
        {
            End();
            task = Task.Run(write);
        }

        public void End() => task.GetAwaiter().GetResult();

        // Nothing is left running, whatever happened; its failure was told by End, or another one is under way.
        public void Dispose() => Task.WhenAny(task).GetAwaiter().GetResult();
    }

    private StoredDays<ArchiveMeltSignals> MeltDays()
    {
        ArchiveMeltSignals reader = new(layout, settings.Grid);
        return new(reader, reader.List(null, null).ToDictionary(file => file.Day, file => file.Path));
    }

    private static bool IsTouched(IceYearSpan span, IReadOnlySet<DateOnly> touched)
    {
        DateOnly first = span.FirstDate, last = span.FirstDate.AddDays(span.Days - 1);
        return touched.Any(day => day >= first && day <= last);
    }
}
