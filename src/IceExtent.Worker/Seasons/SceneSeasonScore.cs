using IceExtent.Grids;
using IceExtent.Scenes;
using IceExtent.Statistics;
using IceExtent.Statistics.Scoring;
using IceExtent.Statistics.Seasons;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Seasons;

/// <summary>The dates of one method held against the true ones.</summary>
/// <param name="Method">The method.</param>
/// <param name="Cells">By date.</param>
/// <param name="Regions">Errors of the regions' medians, and of the dates of their areas, in days.</param>
internal sealed record ScoredSeasons(
    string Method, IReadOnlyDictionary<SeasonEvent, SeasonDateScore> Cells, IReadOnlyList<(string Region, int Year, string Date, int Days)> Regions);

/// <summary>Finds season dates in an invented scene, as observed and as it was, without writing anything.</summary>
internal sealed class SceneSeasonScore
{
    private static readonly SeasonEvent[] FromConcentration = [SeasonEvent.Opening, SeasonEvent.Retreat, SeasonEvent.Advance, SeasonEvent.Closing];

    private readonly Scene scene;
    private readonly SceneScore retrieval;
    private readonly IReadOnlyList<string> methods;
    private readonly SeasonSettings season;
    private readonly IReadOnlyList<TotalsRegion> regions;
    private readonly IceYearStack truth;
    private readonly IceYearStack[] observed;

    /// <summary>Prepares room for one ice year a method.</summary>
    public SceneSeasonScore(Scene scene, LandShare land, IReadOnlyList<string> methods, SceneDefaults defaults, SeasonSettings season, IReadOnlyList<TotalsRegion> regions)
    {
        (this.scene, this.methods, this.season, this.regions) = (scene, methods, season, regions);
        retrieval = new(scene, land, methods, defaults);
        int[] cells = retrieval.Region.Cells.ToArray();
        truth = new(cells, scene.Grid.CellCount);
        observed = [.. methods.Select(_ => new IceYearStack(cells, scene.Grid.CellCount))];
    }

    /// <summary>Scores ice years.</summary>
    /// <param name="years">The calendar years of their first days.</param>
    /// <param name="workers">How many days or blocks of cells at a time; the result does not depend on it.</param>
    /// <param name="cancellation">Stops.</param>
    public IReadOnlyList<ScoredSeasons> Run(IEnumerable<int> years, int workers, CancellationToken cancellation)
    {
        Dictionary<SeasonEvent, SeasonDateScore>[] cells = [.. methods.Select(_ => FromConcentration.ToDictionary(which => which, _ => new SeasonDateScore()))];
        List<(string, int, string, int)>[] medians = [.. methods.Select(_ => new List<(string, int, string, int)>())];
        foreach (int year in years)
        {
            IceYear iceYear = season.Scheme.YearStart.Beginning(year);
            IceYearSpan span = IceYearSpan.Of(iceYear, season.Scheme, melt: null, iceYear.FirstDay.AddYears(-1), iceYear.LastDay.AddYears(1));
            Fill(span, workers, cancellation);
            CellSeasons real = CellSeasonSearch.Find(truth, season.Scheme, melt: null, span, workers, cancellation);
            for (int method = 0; method < methods.Count; method++)
            {
                CellSeasons found = CellSeasonSearch.Find(observed[method], season.Scheme, melt: null, span, workers, cancellation);
                Hold(real, found, cells[method]);
                medians[method].AddRange(Medians(year, real, found));
                medians[method].AddRange(Areas(span, observed[method]));
            }
        }

        return [.. methods.Select((method, index) => new ScoredSeasons(method, cells[index], medians[index]))];
    }

    private void Fill(IceYearSpan span, int workers, CancellationToken cancellation)
    {
        truth.Clear(span);
        Array.ForEach(observed, stack => stack.Clear(span));
        DateOnly[] days = [.. Enumerable.Range(0, span.Days).Select(span.FirstDate.AddDays)];
        float[] sure = new float[scene.Grid.CellCount];
        using ThreadLocal<(SceneWorkspace Workspace, SceneTruth Truth)> rooms = new(() => (scene.CreateWorkspace(), new(scene.Grid.CellCount)));
        Parallel.For(0, days.Length, new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = cancellation }, day =>
        {
            scene.Truth(days[day], rooms.Value.Workspace, rooms.Value.Truth);
            truth.Set(day, rooms.Value.Truth.Concentration, sure);
        });
        retrieval.Run(days, workers, cancellation, (date, method, planes) =>
            observed[method].Set(date.DayNumber - span.FirstDate.DayNumber, planes.Total, planes.StandardError));
    }

    private static void Hold(CellSeasons real, CellSeasons found, Dictionary<SeasonEvent, SeasonDateScore> scores)
    {
        for (int index = 0; index < real.Cells.Count; index++)
        {
            if (found.Dates[index].Ice.KnownDays == 0 || !(real.HadIce(index) || found.HadIce(index)))
            {
                continue; // In the polar gap, or without a season.
            }

            foreach ((SeasonEvent which, SeasonDateScore score) in scores)
            {
                score.Add(real.Dates[index].Of(which)!.Value, found.Dates[index].Of(which)!.Value);
            }
        }
    }

    private IEnumerable<(string, int, string, int)> Medians(int year, CellSeasons real, CellSeasons found)
    {
        RegionMedians realMedians = new(real, season.Regions.LeastDatedShare), foundMedians = new(found, season.Regions.LeastDatedShare);
        foreach (TotalsRegion region in regions)
        {
            YearDates was = realMedians.Of(region).Dates, is_ = foundMedians.Of(region).Dates;
            foreach (SeasonEvent which in FromConcentration)
            {
                if (was.Of(which)?.Day is { } day && is_.Of(which)?.Day is { } other)
                {
                    yield return (region.Name, year, SeasonEvents.NameOf(which), other - day);
                }
            }
        }
    }

    // The level of each region is that of the one year.
    private IEnumerable<(string, int, string, int)> Areas(IceYearSpan span, IceYearStack found)
    {
        List<DailyIce>[] real = DailyAreas(span, truth), seen = DailyAreas(span, found);
        (DateOnly first, DateOnly last) = (span.FirstDate, span.Year.DateOf(span.Year.Length + span.Tail));
        for (int region = 0; region < regions.Count; region++)
        {
            (SeasonDate? fall, SeasonDate? rise) = new RegionArea(real[region], season.Scheme, season.Regions).In(span.Year, first, last);
            (SeasonDate? fallSeen, SeasonDate? riseSeen) = new RegionArea(seen[region], season.Scheme, season.Regions).In(span.Year, first, last);
            if (fallSeen?.Day - fall?.Day is { } fallError)
            {
                yield return (regions[region].Name, span.Year.Year, "area_fall", fallError);
            }

            if (riseSeen?.Day - rise?.Day is { } riseError)
            {
                yield return (regions[region].Name, span.Year.Year, "area_rise", riseError);
            }
        }
    }

    // Ice area of days on which nearly all of a region is known: of others the sum would lack what was not seen.
    private List<DailyIce>[] DailyAreas(IceYearSpan span, IceYearStack stack)
    {
        List<DailyIce>[] areas = [.. regions.Select(_ => new List<DailyIce>())];
        float[] fraction = new float[scene.Grid.CellCount];
        for (int day = 0; day < span.Days; day++)
        {
            stack.CopyDay(day, fraction);
            for (int region = 0; region < regions.Count; region++)
            {
                double ice = 0.0, known = 0.0, whole = 0.0;
                for (int index = 0; index < regions[region].Cells.Length; index++)
                {
                    float value = fraction[regions[region].Cells[index]];
                    double area = regions[region].AreasSquareMeters[index];
                    whole += area;
                    known += float.IsNaN(value) ? 0.0 : area;
                    ice += value >= season.Scheme.Retreat.Level ? value * area : 0.0;
                }

                if (known >= season.LeastAreaShare * whole)
                {
                    areas[region].Add(new(span.FirstDate.AddDays(day), ice / 1e6, 0.0));
                }
            }
        }

        return areas;
    }
}
