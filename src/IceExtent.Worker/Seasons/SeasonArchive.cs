using System.Security.Cryptography;
using System.Text;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Seasons;

/// <summary>Writes the season tables and grids of one method, and knows of what they were made.</summary>
/// <param name="settings">The run.</param>
/// <param name="season">How its dates are found.</param>
/// <param name="layout">Where the files stand.</param>
/// <param name="method">One of its methods.</param>
/// <param name="configuration">The digest of the days' configuration.</param>
/// <param name="record">The days that the archive has.</param>
internal sealed class SeasonArchive(
    RunSettings settings, SeasonSettings season, ArchiveLayout layout, string method, string configuration, RecordPeriod record)
{
    private const string CellTable = "season_cells";
    private const string RegionTable = "season_regions";
    private const string PlaceTable = "season_places";
    private const string GridTable = "season_grids";
    private const string StatusKey = "status";
    private const string Provisional = "provisional";

    private readonly string digest = DigestOf(configuration, season);
    private IReadOnlyDictionary<string, string>? regionMetadata;

    /// <summary>The table of every region and year.</summary>
    public string RegionPath => layout.TableFile(RegionTable, method, settings.Grid.Hemisphere);

    /// <summary>The table of every place and year.</summary>
    public string PlacePath => layout.TableFile(PlaceTable, method, settings.Grid.Hemisphere);

    /// <summary>The maps of one year.</summary>
    public string GridPathOf(IceYear year) => layout.IceYearFile(GridTable, method, settings.Grid.Hemisphere, year.Year, ".nc");

    /// <summary>Whether the tables of a year were made by the same rules of as long a record, the rows of its regions among them.</summary>
    public bool Has(IceYearSpan span)
    {
        string path = CellPathOf(span.Year);
        if (!File.Exists(path) || !File.Exists(GridPathOf(span.Year)) || !File.Exists(RegionPath))
        {
            return false;
        }

        // Regions are written when all years are: a run that was stopped between leaves them as they were.
        regionMetadata ??= TableFile.ReadMetadata(RegionPath);
        string now = record.In(span).ToString();
        IReadOnlyDictionary<string, string> metadata = TableFile.ReadMetadata(path);
        return metadata.GetValueOrDefault(SeasonMetadata.DigestKey) == digest && metadata.GetValueOrDefault(SeasonMetadata.RecordKey) == now
            && regionMetadata.GetValueOrDefault(SeasonMetadata.DigestKey) == digest
            && RecordPeriod.Parse(regionMetadata.GetValueOrDefault(SeasonMetadata.RecordKey))?.In(span).ToString() == now;
    }

    /// <summary>Writes the cells of one year: the table of those that held ice, and the maps of all.</summary>
    public void WriteCells(IceYearSpan span, CellSeasons cells)
    {
        IceYear year = span.Year;
        Task maps = Task.Run(() => SeasonGridFile.Write(GridPathOf(year), settings.Grid, year, season.Scheme.Begins, cells, Text(span)));
        CellSeasonRow[] rows = [.. Enumerable.Range(0, cells.Cells.Count).Where(cells.HadIce).Select(RowAt)];

        // The table is put in its place last: its metadata tell that the year is done.
        TableFile.Write(CellPathOf(year), SeasonTables.CellColumns, rows, Text(span), maps.GetAwaiter().GetResult);

        CellSeasonRow RowAt(int index)
        {
            int cell = cells.Cells[index];
            int row = cell / settings.Grid.Columns, column = cell % settings.Grid.Columns;
            Grids.GeoPosition center = settings.Grid.PositionOf(cell);
            return new()
            {
                Year = year,
                Begins = season.Scheme.Begins,
                Dates = cells.Dates[index],
                KnownDays = cells.Dates[index].Ice.KnownDays,
                OpenWaterDays = cells.Dates[index].Ice.OpenWaterDays,
                IsFinal = span.IsComplete,
                GridRow = row,
                GridColumn = column,
                LatitudeDegrees = center.LatitudeDegrees,
                LongitudeDegrees = center.LongitudeDegrees,
                AreaSquareKilometers = settings.Grid.CellAreasSquareMeters[cell] / 1e6,
            };
        }
    }

    /// <summary>Writes the table of regions.</summary>
    public void WriteRegions(IEnumerable<RegionSeasonRow> rows) => TableFile.Write(
        RegionPath, SeasonTables.RegionColumns, [.. rows.OrderBy(row => row.Year.Year).ThenBy(row => row.Region, StringComparer.Ordinal)], Text(null));

    /// <summary>Writes the table of places.</summary>
    public void WritePlaces(IEnumerable<PlaceSeasonRow> rows) => TableFile.Write(
        PlacePath, SeasonTables.PlaceColumns, [.. rows.OrderBy(row => row.Year.Year).ThenBy(row => row.Place, StringComparer.Ordinal)], Text(null));

    /// <summary>Whether the archive has a year as one that was not over.</summary>
    public bool IsRunning(IceYear year) =>
        File.Exists(CellPathOf(year)) && TableFile.ReadMetadata(CellPathOf(year)).GetValueOrDefault(StatusKey) == Provisional;

    /// <summary>Takes years out of the archive whose days it no longer has.</summary>
    public void RemoveYearsOutside(IReadOnlyList<IceYearSpan> spans)
    {
        HashSet<string> kept = [.. spans.SelectMany(span => new[] { CellPathOf(span.Year), GridPathOf(span.Year) })];
        foreach (string table in (string[])[CellTable, GridTable])
        {
            string folder = Path.GetDirectoryName(layout.TableFile(table, method, settings.Grid.Hemisphere))!;
            foreach (string file in Directory.Exists(folder) ? Directory.EnumerateFiles(folder, $"{table}.*", SearchOption.AllDirectories) : [])
            {
                if (!kept.Contains(file))
                {
                    PublishedFile.Delete(file);
                }
            }
        }
    }

    private string CellPathOf(IceYear year) => layout.IceYearFile(CellTable, method, settings.Grid.Hemisphere, year.Year, ".parquet");

    private List<KeyValuePair<string, string>> Text(IceYearSpan? span)
    {
        List<KeyValuePair<string, string>> text =
        [
            new("method", method),
            new(SeasonMetadata.SchemeKey, season.Scheme.Name),
            new(SeasonMetadata.SchemeSourceKey, season.Scheme.Source),
            new(SeasonMetadata.BeginsKey, season.Scheme.Begins == YearBeginning.Ice ? SeasonMetadata.Ice : SeasonMetadata.Water),
            new("limits", FormattableString.Invariant($"95 %, from the series {season.Scheme.LimitDeviations:R} standard errors lower and higher, and from gaps")),
            new("grid", settings.Grid.Name),
            new("program_version", ProgramVersion.Text),
            new(DailySeries.DigestKey, configuration),
            new(SeasonMetadata.DigestKey, digest),
            new("caution", Cautions.Text),
            new(SeasonMetadata.RecordKey, (span is { } part ? record.In(part) : record).ToString()),
        ];
        if (span is { } year)
        {
            text.Insert(0, new("title", $"Season dates of the ice year {year.Year.Year} on the grid {settings.Grid.Name}"));
            text.Add(new(StatusKey, year.IsComplete ? "final" : Provisional));
        }

        if (settings.Notice is { } notice)
        {
            text.Insert(0, new("notice", notice));
        }

        return text;
    }

    private static string DigestOf(string configuration, SeasonSettings season) =>
        Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes($"{configuration}\n{season.Scheme}\n{season.Regions}\n{season.Melt}\n{season.LeastPlaceShare:R} {season.LeastAreaShare:R}")));
}
