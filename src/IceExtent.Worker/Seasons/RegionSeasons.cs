using IceExtent.Statistics;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Seasons;

/// <summary>The season tables of regions: medians of their cells, and the dates of their ice area.</summary>
/// <remarks>
/// Medians of years that a run does not touch stay as the table has them. The dates of ice areas are found anew for every year,
/// since their level follows from the whole record.
/// </remarks>
internal sealed class RegionSeasons
{
    private readonly RunSettings settings;
    private readonly SeasonSettings season;
    private readonly ArchiveLayout layout;
    private readonly string method;
    private readonly SeasonArchive archive;
    private readonly RecordPeriod record;
    private readonly Dictionary<(int Year, string Region), RegionSeasonRow> rows = [];
    private readonly IReadOnlyList<RegionSeasonRow> before;

    /// <summary>Reads what the archive has.</summary>
    public RegionSeasons(
        RunSettings settings, SeasonSettings season, ArchiveLayout layout, string method, SeasonArchive archive, RecordPeriod record)
    {
        (this.settings, this.season, this.layout, this.method, this.archive, this.record) = (settings, season, layout, method, archive, record);
        IceYearStart start = season.Scheme.YearStart;
        Spans = [.. Enumerable.Range(start.Of(record.First).Year, start.Of(record.Last).Year - start.Of(record.First).Year + 1)
            .Select(year => season.SpanOf(start.Beginning(year), record.First, record.Last))];
        before = File.Exists(archive.RegionPath) ? SeasonTableReader.ReadRegions(archive.RegionPath).Rows : [];
        HashSet<int> years = [.. Spans.Select(span => span.Year.Year)];
        foreach (RegionSeasonRow row in before.Where(row => years.Contains(row.Year.Year)))
        {
            rows[(row.Year.Year, row.Region)] = row;
        }
    }

    /// <summary>The ice years of the record.</summary>
    public IReadOnlyList<IceYearSpan> Spans { get; }

    /// <summary>Takes the medians of one year.</summary>
    public void Add(IceYearSpan span, CellSeasons cells, IReadOnlyList<TotalsRegion> regions)
    {
        RegionMedians medians = new(cells, season.Regions.LeastDatedShare);
        foreach (TotalsRegion region in regions)
        {
            (YearDates dates, double area, double known, double open) = medians.Of(region);
            rows[(span.Year.Year, region.Name)] = new()
            {
                Year = span.Year,
                Begins = season.Scheme.Begins,
                Dates = dates,
                KnownDays = known,
                OpenWaterDays = open,
                IsFinal = span.IsComplete,
                Region = region.Name,
                IcyAreaSquareKilometers = area / 1e6,
                AreaLevelSquareKilometers = null,
                AreaFall = null,
                AreaRise = null,
            };
        }
    }

    /// <summary>Adds the dates of ice areas and writes the table.</summary>
    /// <returns>What moved, was withdrawn or is new in years that were not over, in words.</returns>
    public IReadOnlyList<string> Write()
    {
        ILookup<string, DailyIce> days = DailyAreas();
        List<RegionSeasonRow> dated = [];
        foreach (IGrouping<string, RegionSeasonRow> region in rows.Values.GroupBy(row => row.Region))
        {
            RegionArea area = new(days[region.Key], season.Scheme, season.Regions);
            foreach (RegionSeasonRow row in region)
            {
                (SeasonDate? fall, SeasonDate? rise) = area.In(row.Year, record.First, record.Last);
                dated.Add(row with { AreaLevelSquareKilometers = area.LevelSquareKilometers, AreaFall = fall, AreaRise = rise });
            }
        }

        archive.WriteRegions(dated);
        return [.. NamedChanges.Of(before, dated, row => row.Region)];
    }

    // A sum over part of a region would fall where nothing melts.
    private ILookup<string, DailyIce> DailyAreas() => record.Files(year => layout.DailyFile(method, settings.Grid.Hemisphere, year))
        .SelectMany(path => DailyTable.Read(path).Rows)
        .Where(row => row.AreaSquareKilometers is not null && row.ObservedShare + row.FilledShare >= season.LeastAreaShare)
        .ToLookup(
            row => row.Region,
            row => new DailyIce(row.Date, row.AreaSquareKilometers!.Value, row.AreaStandardErrorSquareKilometers ?? 0.0),
            StringComparer.Ordinal);
}
