using DuckDB.NET.Data;
using IceExtent.Grids;
using IceExtent.Statistics;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>DuckDB reads an archive's daily tables. Origin: independent, DuckDB's own reading of hand-written rows.</summary>
public sealed class DailyTableQueryTests : IDisposable
{
    private readonly TemporaryFolder folder = new();
    private readonly string files;

    public DailyTableQueryTests()
    {
        ArchiveLayout layout = new(folder.Path);
        DailyTable.Write(
            layout.DailyFile("any", Hemisphere.North, 1988),
            [Row(new(1988, 2, 29), "hemisphere", 15_123_456.789, DayStatus.Final), Row(new(1988, 2, 29), "bay", null, DayStatus.Final)],
            [new("method", "any"), new("notice", "not for navigation")]);
        DailyTable.Write(
            layout.DailyFile("any", Hemisphere.South, 1989), [Row(new(1989, 1, 1), "hemisphere", 4e6, DayStatus.Provisional)], []);
        files = $"'{folder.Path}/daily/**/*.parquet'";
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void Describe_Columns_HaveTheirTypes() => Assert.Equal(
        [
            "date DATE", "region VARCHAR", "extent_km2 DOUBLE", "extent_se_km2 DOUBLE", "area_km2 DOUBLE", "area_se_km2 DOUBLE",
            "marginal_zone_km2 DOUBLE", "pack_km2 DOUBLE", "ocean_km2 DOUBLE", "observed_share DOUBLE", "filled_share DOUBLE",
            "polar_gap_km2 DOUBLE", "sensor VARCHAR", "status VARCHAR", "tie_points VARCHAR",
            "hemisphere VARCHAR", "method VARCHAR", "year BIGINT",
        ],
        Query($"SELECT column_name || ' ' || column_type FROM (DESCRIBE SELECT * FROM read_parquet({files}, hive_partitioning = true))"));

    [Fact]
    public void Select_Values_AreThoseOfTheRows() => Assert.Equal(
        [
            "1988-02-29|bay|NULL|final|north|any|1988",
            "1988-02-29|hemisphere|15123456.789|final|north|any|1988",
            "1989-01-01|hemisphere|4000000.0|provisional|south|any|1989",
        ],
        Query($"""
            SELECT concat_ws('|', date, region, coalesce(extent_km2::VARCHAR, 'NULL'), status, hemisphere, method, year)
            FROM read_parquet({files}, hive_partitioning = true) ORDER BY date, region
            """));

    [Fact]
    public void Select_RestOfARow_IsThatOfTheRow() => Assert.Equal(
        ["1.5|2.5|3.5|4.5|5.5|6.5|0.75|0.125|7.5|any-sensor"],
        Query($"""
            SELECT concat_ws('|', extent_se_km2, area_km2, area_se_km2, marginal_zone_km2, pack_km2, ocean_km2, observed_share, filled_share, polar_gap_km2, sensor)
            FROM read_parquet({files}, hive_partitioning = true) WHERE hemisphere = 'south'
            """));

    [Fact]
    public void Metadata_Pairs_AreThoseOfTheCallerAndTheUnits() => Assert.Equal(
        ["method=any", "notice=not for navigation", "unit:date=day, UTC", "unit:extent_km2=km2", "unit:filled_share=1"],
        Query($"""
            SELECT key::VARCHAR || '=' || value::VARCHAR FROM parquet_kv_metadata({files})
            WHERE file_name LIKE '%year=1988%'
              AND key::VARCHAR IN ('method', 'notice', 'unit:date', 'unit:extent_km2', 'unit:filled_share') ORDER BY 1
            """));

    [Fact]
    public void Metadata_Storage_IsZstandardWithNamesAsDictionaries()
    {
        string path = folder.PathOf("long.parquet");
        DailyTable.Write(path, Enumerable.Range(0, 100).Select(day => Row(new DateOnly(1990, 1, 1).AddDays(day), "hemisphere", day, DayStatus.Final)), []);

        Assert.Equal(
            ["extent_km2 ZSTD plain", "region ZSTD dictionary"],
            Query($"""
            SELECT path_in_schema || ' ' || compression || CASE WHEN encodings LIKE '%DICTIONARY%' THEN ' dictionary' ELSE ' plain' END
            FROM parquet_metadata('{path}') WHERE path_in_schema IN ('region', 'extent_km2') ORDER BY 1
            """));
    }

    private static List<string> Query(string sql)
    {
        using DuckDBConnection connection = new("DataSource=:memory:");
        connection.Open();
        using DuckDBCommand command = connection.CreateCommand();
#pragma warning disable CA2100 // The only text put in is the path of the test's own folder.
        command.CommandText = sql;
#pragma warning restore CA2100
        using DuckDBDataReader reader = command.ExecuteReader();
        List<string> lines = [];
        while (reader.Read())
        {
            lines.Add(reader.GetString(0));
        }

        return lines;
    }

    private static DailyRow Row(DateOnly date, string region, double? extent, DayStatus status) => new()
    {
        Date = date,
        Region = region,
        ExtentSquareKilometers = extent,
        ExtentStandardErrorSquareKilometers = 1.5,
        AreaSquareKilometers = 2.5,
        AreaStandardErrorSquareKilometers = 3.5,
        MarginalZoneSquareKilometers = 4.5,
        PackSquareKilometers = 5.5,
        OceanSquareKilometers = 6.5,
        ObservedShare = 0.75,
        FilledShare = 0.125,
        PolarGapSquareKilometers = 7.5,
        Sensor = "any-sensor",
        Status = status,
    };
}
