using System.Globalization;
using DuckDB.NET.Data;
using IceExtent.Grids;
using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;
using IceExtent.Worker.Configuration;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Places from their files to the table of daily means, on a grid round the pole whose cells are 625 km² each.</summary>
public sealed class PlaceTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 12, 30);
    private readonly TinyRun run = new();

    public PlaceTests()
    {
        run.WriteRunFile("places = [\"harbors.csv\", \"routes.geojson\"]");
        run.Write("harbors.csv", $"name,title,latitude,longitude,radius_km\nport,\"Port, the old\",{At(25.0, 12.5, swapped: false)},26");
        run.Write("routes.geojson", $$"""
            { "type": "FeatureCollection", "features": [ { "type": "Feature", "properties": { "name": "way", "reach_km": 5 },
              "geometry": { "type": "LineString", "coordinates": [{{string.Join(", ", Enumerable.Range(0, 31).Select(step => $"[{At(-25.0 + (2.5 * step), 12.5, swapped: true)}]"))}}] } } ] }
            """);
    }

    public void Dispose() => run.Dispose();

    /// <summary>
    /// Origin: worked. The port lies on the cell of row 1, column 3; within 26 km are that cell and its four neighbours, 25 km away: columns
    /// 2, 3, 3, 3, 4 with 50, 90, 90, 90 and 0 %: 0.64. The route runs along row 1 over columns 1 to 4: (0.5 + 0.5 + 0.9 + 0) / 4 = 0.475.
    /// Temperatures are rounded to a tenth of a kelvin; the map keeps lengths to 1e-5 there.
    /// </summary>
    [Fact]
    public async Task Run_PortAndRoute_HaveTheWorkedMeans()
    {
        run.WriteDay(First, Ice);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        IReadOnlyList<DailyPlaceRow> rows = Places(1990).Rows;
        Assert.Equal(["port", "way"], rows.Select(row => row.Place));
        Assert.Equal(0.64, rows[0].ConcentrationFraction!.Value, 0.002);
        Assert.Equal((5, 1.0, 0.0, "tiny", DayStatus.Final), (rows[0].Cells, rows[0].ObservedShare, rows[0].FilledShare, rows[0].Sensor, rows[0].Status));
        Assert.Equal(0.0, rows[0].NearestKilometers, 1e-3);
        Assert.Equal(25.0, rows[0].FarthestKilometers, 1e-2);
        Assert.Equal(0.475, rows[1].ConcentrationFraction!.Value, 0.002);
        Assert.Equal(4, rows[1].Cells);
        Assert.All(rows, row => Assert.InRange(row.ConcentrationStandardErrorFraction!.Value, 0.01, 0.5));
        Assert.Equal("hemisphere", Assert.Single(Daily(1990)).Region);
    }

    /// <summary>Two of the five cells are not observed: (0.5 + 0.9 + 0.9) / 3, from 60 % of the area.</summary>
    [Fact]
    public async Task Run_CellsMissing_AreLeftOutOfTheMean()
    {
        run.WriteDay(First, cell => cell is 8 or 9 ? double.NaN : Ice(cell));
        run.WriteDay(First.AddDays(1), _ => double.NaN);

        await ProgramRun.OfAsync("run", run.RunFile);

        DailyPlaceRow[] port = [.. Places(1990).Rows.Where(row => row.Place == "port")];
        Assert.Equal((0.5 + 0.9 + 0.9) / 3.0, port[0].ConcentrationFraction!.Value, 0.002);
        Assert.Equal(0.6, port[0].ObservedShare, 1e-9);
        Assert.Equal((null, null, 0.0), (port[1].ConcentrationFraction, port[1].ConcentrationStandardErrorFraction, port[1].ObservedShare));
    }

    /// <summary>As with daily totals: a day that cannot be read any more goes, a day read again is replaced, others stay.</summary>
    [Fact]
    public async Task Run_DayLost_IsTakenOutOfTheTable()
    {
        run.WriteDay(First, Ice);
        run.WriteDay(First.AddDays(1), Ice);
        run.WriteDay(First.AddDays(2), Ice);
        await ProgramRun.OfAsync("run", run.RunFile);
        File.WriteAllBytes(run.DayFile(First.AddDays(1), "v19"), [1]);
        run.WriteDay(First, _ => 0.2);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile, "--to", "1990-12-31");

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Equal([First, First], Places(1990).Rows.Select(row => row.Date));
        Assert.Equal(0.2, Places(1990).Rows[0].ConcentrationFraction!.Value, 0.002);
        Assert.Equal([First.AddDays(2), First.AddDays(2)], Places(1991).Rows.Select(row => row.Date));
    }

    [Fact]
    public async Task Run_AnyNumberOfWorkersAndASecondTime_WritesTheSameBytes()
    {
        for (int day = 0; day < 12; day++)
        {
            run.WriteDay(First.AddDays(day), cell => Math.Abs(Math.Sin(cell + day)));
        }

        await ProgramRun.OfAsync("run", run.RunFile, "--workers", "1");
        SortedDictionary<string, byte[]> one = ArchiveFiles.Of(run.PathOf("out"));
        Assert.True(RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram).Places.Stored);
        await ProgramRun.OfAsync("run", run.RunFile, "--workers", "4");
        SortedDictionary<string, byte[]> again = ArchiveFiles.Of(run.PathOf("out"));
        Directory.Delete(run.PathOf("out"), recursive: true);
        await ProgramRun.OfAsync("run", run.RunFile, "--workers", "4");

        Assert.Contains(Path.Join("place_cells", "hemisphere=north", "place_cells.parquet"), one.Keys);
        ArchiveFiles.AssertSame(one, again);
        ArchiveFiles.AssertSame(one, ArchiveFiles.Of(run.PathOf("out")));
    }

    [Fact]
    public async Task Run_PlaceFileChanged_RefusesTheOldDays()
    {
        run.WriteDay(First, Ice);
        await ProgramRun.OfAsync("run", run.RunFile);
        File.AppendAllText(run.PathOf("harbors.csv"), "second,,89.8,10,30\n");

        ProgramRun refused = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Configuration, refused.ExitCode);
        Assert.Contains("IE3001", refused.Messages, StringComparison.Ordinal);
    }

    /// <summary>Origin: independent, DuckDB 1.5.</summary>
    [Fact]
    public async Task Tables_ReadByDuckDb_GoTogether()
    {
        run.WriteDay(First, Ice);
        await ProgramRun.OfAsync("run", run.RunFile);
        using DuckDBConnection connection = new("DataSource=:memory:");
        connection.Open();
        using DuckDBCommand command = connection.CreateCommand();
        command.CommandText = $"""
            SELECT d.place, any_value(c.title), any_value(d.concentration), any_value(d.cells), count(*), sum(c.area_km2), max(c.distance_km), any_value(d.farthest_km)
            FROM read_parquet('{run.PathOf("out")}/daily_places/**/*.parquet', hive_partitioning = true) d
            JOIN read_parquet('{run.PathOf("out")}/place_cells/**/*.parquet', hive_partitioning = true) c USING (place, hemisphere)
            WHERE d.method = 'nasa-team' AND d.year = 1990 GROUP BY d.place ORDER BY d.place
            """;
        using DuckDBDataReader reader = command.ExecuteReader();

        Assert.True(reader.Read());
        Assert.Equal(("port", "Port, the old"), (reader.GetString(0), reader.GetString(1)));
        Assert.Equal(0.64, reader.GetDouble(2), 0.002);
        Assert.Equal((5, 5L), (reader.GetInt32(3), reader.GetInt64(4)));
        Assert.Equal(3_125.0, reader.GetDouble(5), 1e-3);
        Assert.Equal(reader.GetDouble(7), reader.GetDouble(6));
    }

    [Fact]
    public async Task Check_Places_AreTold()
    {
        run.WriteDay(First, Ice);

        ProgramRun text = await ProgramRun.OfAsync("check", run.RunFile);
        ProgramRun json = await ProgramRun.OfAsync("check", run.RunFile, "--json");

        Assert.Matches("port +5 +3125 +0.0 +25.0  Port, the old", text.Results);
        Assert.Contains("\"farthest_km\": 2", json.Results, StringComparison.Ordinal);
    }

    private static double Ice(int cell) => (cell % TinyRun.Columns) switch { 1 or 2 => 0.5, 3 => 0.9, _ => 0.0 };

    private static string At(double xKilometers, double yKilometers, bool swapped)
    {
        GeoPosition at = TinyRun.Grid.Projection.Inverse(new(1_000.0 * xKilometers, 1_000.0 * yKilometers));
        return swapped
            ? string.Create(CultureInfo.InvariantCulture, $"{at.LongitudeDegrees}, {at.LatitudeDegrees}")
            : string.Create(CultureInfo.InvariantCulture, $"{at.LatitudeDegrees},{at.LongitudeDegrees}");
    }

    private StoredDailyPlaceTable Places(int year) =>
        DailyPlaceTable.Read(new ArchiveLayout(run.PathOf("out")).DailyPlaceFile("nasa-team", Hemisphere.North, year));

    private IReadOnlyList<DailyRow> Daily(int year) =>
        DailyTable.Read(new ArchiveLayout(run.PathOf("out")).DailyFile("nasa-team", Hemisphere.North, year)).Rows;
}
