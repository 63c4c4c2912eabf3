using DuckDB.NET.Data;
using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;
using IceExtent.Worker.Configuration;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Regions from a file to the daily table, on a grid round the pole whose cells are 625 km² each.</summary>
public sealed class RegionTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 12, 30);
    private readonly TinyRun run = new();

    public RegionTests()
    {
        run.WriteRunFile("regions = [\"halves.geojson\"]");
        WriteHalves();
    }

    public void Dispose() => run.Dispose();

    /// <summary>
    /// Origin: worked. The meridian of 0 and 180 degrees halves column 2; the eastern half has half of it and columns 3 and 4: ocean
    /// 4 · 312.5 + 8 · 625 = 6,250 km². Column 2 holds 50 %, column 3 90 % ice: extent 1,250 + 2,500; area 625 + 2,250.
    /// Temperatures are rounded to a tenth of a kelvin. The western half has the other half of column 2, and column 1 with 50 %.
    /// </summary>
    [Fact]
    public async Task Run_HalvesOfTheGrid_HaveTheWorkedTotals()
    {
        run.WriteDay(First, Ice);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        IReadOnlyList<DailyRow> rows = Daily().Rows;
        Assert.Equal(["east", "hemisphere", "west"], rows.Select(row => row.Region));
        (DailyRow east, DailyRow whole, DailyRow west) = (rows[0], rows[1], rows[2]);
        Assert.Equal(6_250.0, east.OceanSquareKilometers, 1e-6);
        Assert.Equal(3_750.0, east.ExtentSquareKilometers!.Value, 1e-6);
        Assert.Equal(2_875.0, east.AreaSquareKilometers!.Value, 10.0);
        Assert.Equal(2_500.0, east.PackSquareKilometers!.Value, 1e-6);
        Assert.Equal(3_750.0, west.OceanSquareKilometers, 1e-6);
        Assert.Equal(3_750.0, west.ExtentSquareKilometers!.Value, 1e-6);
        Assert.Equal(whole.AreaSquareKilometers!.Value, (east.AreaSquareKilometers + west.AreaSquareKilometers)!.Value, 1e-6);
        Assert.True(east.AreaStandardErrorSquareKilometers > 0.0 && east.AreaStandardErrorSquareKilometers < whole.AreaStandardErrorSquareKilometers);
        Assert.Matches("extent 0.00[78] ", ended.Results); // The summary is that of the hemisphere.
    }

    [Fact]
    public async Task Run_AnyNumberOfWorkers_WritesTheSameBytes()
    {
        for (int day = 0; day < 12; day++)
        {
            run.WriteDay(First.AddDays(day), cell => Math.Abs(Math.Sin(cell + day)));
        }

        await ProgramRun.OfAsync("run", run.RunFile, "--workers", "1");
        SortedDictionary<string, byte[]> one = ArchiveFiles.Of(run.PathOf("out"));
        Directory.Delete(run.PathOf("out"), recursive: true);
        await ProgramRun.OfAsync("run", run.RunFile, "--workers", "4");

        Assert.Contains(Path.Join("region_cells", "hemisphere=north", "region_cells.parquet"), one.Keys);
        ArchiveFiles.AssertSame(one, ArchiveFiles.Of(run.PathOf("out")));
    }

    /// <summary>The second run takes the cells from the archive; its rows are the same to the bit.</summary>
    [Fact]
    public async Task Run_CellsInTheArchive_AreTakenFromThere()
    {
        run.WriteDay(First, Ice);
        await ProgramRun.OfAsync("run", run.RunFile);
        SortedDictionary<string, byte[]> before = ArchiveFiles.Of(run.PathOf("out"));
        File.SetLastWriteTimeUtc(Cells, DateTime.UnixEpoch);

        Assert.True(Load().Regions.Stored);
        await ProgramRun.OfAsync("run", run.RunFile);

        ArchiveFiles.AssertSame(before, ArchiveFiles.Of(run.PathOf("out")));
        Assert.Equal(DateTime.UnixEpoch, File.GetLastWriteTimeUtc(Cells));
    }

    [Fact]
    public async Task Run_CellsInTheArchiveDamaged_AreMadeAgain()
    {
        run.WriteDay(First, Ice);
        await ProgramRun.OfAsync("run", run.RunFile);
        byte[] before = File.ReadAllBytes(Cells);
        File.WriteAllBytes(Cells, before[..(before.Length / 2)]);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        Assert.Equal(before, File.ReadAllBytes(Cells));
    }

    /// <summary>Days of one set of regions never stand beside days of another; where no day is left, the cells follow the file.</summary>
    [Fact]
    public async Task Run_RegionFileChanged_RefusesTheOldDaysAndMakesTheCellsAgain()
    {
        run.WriteDay(First, Ice);
        await ProgramRun.OfAsync("run", run.RunFile);
        byte[] before = File.ReadAllBytes(Cells);
        WriteHalves(east: 170);

        ProgramRun refused = await ProgramRun.OfAsync("run", run.RunFile);
        byte[] kept = File.ReadAllBytes(Cells);
        Directory.Delete(run.PathOf("out", "daily"), recursive: true);
        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Configuration, refused.ExitCode);
        Assert.Contains("IE3001", refused.Messages, StringComparison.Ordinal);
        Assert.Equal(before, kept);
        Assert.Equal(ExitCode.Done, ended.ExitCode);
        Assert.NotEqual(before, File.ReadAllBytes(Cells));
    }

    /// <summary>Origin: independent, DuckDB 1.5: the cells of a region sum to the ocean of its rows.</summary>
    [Fact]
    public async Task RegionCells_ReadByDuckDb_SumToTheOceanOfTheRows()
    {
        run.WriteDay(First, Ice);
        await ProgramRun.OfAsync("run", run.RunFile);
        using DuckDBConnection connection = new("DataSource=:memory:");
        connection.Open();
        using DuckDBCommand command = connection.CreateCommand();
        command.CommandText = $"""
            SELECT c.region, any_value(c.title), any_value(c.region_set), count(*), sum(c.area_km2), any_value(d.ocean_km2), max(c."column"), min(c.share)
            FROM read_parquet('{run.PathOf("out")}/region_cells/**/*.parquet', hive_partitioning = true) c
            JOIN read_parquet('{run.PathOf("out")}/daily/**/*.parquet', hive_partitioning = true) d USING (region, hemisphere)
            GROUP BY c.region ORDER BY c.region
            """;
        using DuckDBDataReader reader = command.ExecuteReader();

        Assert.True(reader.Read());
        Assert.Equal(("east", "Eastern half", "halves"), (reader.GetString(0), reader.GetString(1), reader.GetString(2)));
        Assert.Equal(12, reader.GetInt64(3));
        Assert.Equal(6_250.0, reader.GetDouble(4), 1e-6);
        Assert.Equal(reader.GetDouble(5), reader.GetDouble(4), 1e-9);
        Assert.Equal(4, reader.GetInt32(6));
        Assert.Equal(0.5, reader.GetDouble(7), 1e-9);
        Assert.True(reader.Read());
        Assert.Equal(("west", "west"), (reader.GetString(0), reader.GetString(1))); // Without a title the name stands for it.
    }

    [Fact]
    public async Task Check_Regions_AreTold()
    {
        run.WriteDay(First, Ice);

        ProgramRun text = await ProgramRun.OfAsync("check", run.RunFile);
        ProgramRun json = await ProgramRun.OfAsync("check", run.RunFile, "--json");

        Assert.Matches("east +12 +6250  Eastern half", text.Results);
        Assert.Contains("\"area_km2\": 62", json.Results, StringComparison.Ordinal);
        Assert.False(Directory.Exists(run.PathOf("out")));
    }

    [Fact]
    public async Task Compare_Regions_HaveRowsOfTheirOwn()
    {
        run.WriteDay(First, Ice);
        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace("[\"nasa-team\"]", "[\"nasa-team\", \"bristol\"]", StringComparison.Ordinal));
        run.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + """

            [north.surface_points_k]
            open_water = { 19v = 184.9, 37v = 207.1, 37h = 145.0 }
            first_year = { 19v = 248.4, 37v = 242.3, 37h = 231.0 }
            multiyear = { 19v = 220.7, 37v = 188.5, 37h = 178.0 }
            """);

        ProgramRun ended = await ProgramRun.OfAsync("compare", run.RunFile, "--out", run.PathOf("comparison"));

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        StoredTable table = TableFile.Read(run.PathOf("comparison", "comparison.parquet"));
        Assert.Equal(["hemisphere", "hemisphere", "east", "east", "west", "west"], table.Column<string>("region"));
        Assert.Contains("      7500 ", ended.Results, StringComparison.Ordinal);
    }

    private static double Ice(int cell) => (cell % TinyRun.Columns) switch { 1 or 2 => 0.5, 3 => 0.9, _ => 0.0 };

    private string Cells => run.PathOf("out", "region_cells", "hemisphere=north", "region_cells.parquet");

    private RunSettings Load() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram);

    private void WriteHalves(int east = 180) => run.Write("halves.geojson", $$"""
        {
          "type": "FeatureCollection",
          "features": [
            { "type": "Feature", "properties": { "name": "west" }, "geometry": { "type": "Polygon",
              "coordinates": [[[0, 80], [0, 90], [-180, 90], [-180, 80], [-90, 80], [0, 80]]] } },
            { "type": "Feature", "properties": { "name": "east", "title": "Eastern half" }, "geometry": { "type": "Polygon",
              "coordinates": [[[0, 80], [90, 80, 5], [{{east}}, 80], [{{east}}, 90], [0, 90], [0, 80]]] } }
          ]
        }
        """);

    private StoredDailyTable Daily() =>
        DailyTable.Read(new ArchiveLayout(run.PathOf("out")).DailyFile("nasa-team", Grids.Hemisphere.North, 1990));
}
