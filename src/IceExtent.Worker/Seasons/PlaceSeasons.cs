using IceExtent.Grids;
using IceExtent.Statistics;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Seasons;

/// <summary>The season table of places: dates of their mean concentration, with melt onset and freeze-up as medians of their cells.</summary>
/// <remarks>The dates of every year are found anew from the daily table; the medians of years that a run does not touch stay as they are.</remarks>
internal sealed class PlaceSeasons
{
    private readonly RunSettings settings;
    private readonly SeasonSettings season;
    private readonly ArchiveLayout layout;
    private readonly string method;
    private readonly SeasonArchive archive;
    private readonly RecordPeriod record;
    private readonly IReadOnlyList<PlaceSeasonRow> before;
    private readonly Dictionary<(int Year, string Place), (SeasonDate? MeltOnset, SeasonDate? FreezeUp)> melt = [];

    /// <summary>Reads what the archive has.</summary>
    public PlaceSeasons(
        RunSettings settings, SeasonSettings season, ArchiveLayout layout, string method, SeasonArchive archive, RecordPeriod record)
    {
        (this.settings, this.season, this.layout, this.method, this.archive, this.record) = (settings, season, layout, method, archive, record);
        before = File.Exists(archive.PlacePath) ? SeasonTableReader.ReadPlaces(archive.PlacePath).Rows : [];
        foreach (PlaceSeasonRow row in before)
        {
            melt[(row.Year.Year, row.Place)] = (row.Dates.MeltOnset, row.Dates.FreezeUp);
        }
    }

    /// <summary>Takes melt onset and freeze-up of one year from the cells.</summary>
    public void Add(IceYearSpan span, CellSeasons cells, IReadOnlyList<(GridPlace Place, TotalsRegion Cells)> places)
    {
        RegionMedians medians = new(cells, season.Regions.LeastDatedShare);
        foreach ((GridPlace place, TotalsRegion near) in places)
        {
            YearDates dates = medians.Of(near).Dates;
            melt[(span.Year.Year, place.Name)] = (dates.MeltOnset, dates.FreezeUp);
        }
    }

    /// <summary>Finds the other dates and writes the table, or takes it away where the run has no place.</summary>
    /// <param name="spans">The ice years of the record.</param>
    /// <returns>What moved, was withdrawn or is new in years that were not over, in words.</returns>
    public IReadOnlyList<string> Write(IReadOnlyList<IceYearSpan> spans)
    {
        if (settings.Places.Places.Count == 0)
        {
            PublishedFile.Delete(archive.PlacePath);
            return [];
        }

        ILookup<string, DailyPlaceRow> days = record.Files(year => layout.DailyPlaceFile(method, settings.Grid.Hemisphere, year))
            .SelectMany(path => DailyPlaceTable.Read(path).Rows)
            .Where(row => row.ConcentrationFraction is not null && row.ObservedShare + row.FilledShare >= season.LeastPlaceShare)
            .ToLookup(row => row.Place, StringComparer.Ordinal);
        List<PlaceSeasonRow> rows = [];
        foreach (IceYearSpan span in spans)
        {
            SeasonFinder finder = new(season.Scheme, span);
            rows.AddRange(settings.Places.Places.Select(place => RowOf(place.Name, span, finder, days[place.Name])));
        }

        archive.WritePlaces(rows);
        return [.. NamedChanges.Of(before, rows, row => row.Place)];
    }

    private PlaceSeasonRow RowOf(string place, IceYearSpan span, SeasonFinder finder, IEnumerable<DailyPlaceRow> days)
    {
        (float[] fraction, float[] error) = span.Lay(days.Select(day => (day.Date, day.ConcentrationFraction!.Value, day.ConcentrationStandardErrorFraction ?? 0.0)));
        IceDates ice = finder.Find(fraction, error);
        (SeasonDate? meltOnset, SeasonDate? freezeUp) = melt.GetValueOrDefault((span.Year.Year, place));
        return new()
        {
            Year = span.Year,
            Begins = season.Scheme.Begins,
            Dates = new(ice, meltOnset, freezeUp),
            KnownDays = ice.KnownDays,
            OpenWaterDays = ice.OpenWaterDays,
            IsFinal = span.IsComplete,
            Place = place,
        };
    }
}
