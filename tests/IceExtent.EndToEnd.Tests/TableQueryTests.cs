using DuckDB.NET.Data;
using IceExtent.TestKit;

namespace IceExtent.EndToEnd.Tests;

/// <summary>The tables of a run as another program sees them. Origin: independent, DuckDB 1.5.</summary>
public sealed class TableQueryTests : IDisposable
{
    private readonly TinyRun run = new();

    public void Dispose() => run.Dispose();

    [Fact]
    public async Task Daily_ReadByDuckDb_HasTheColumnsAndHiveKeys()
    {
        run.WriteDay(new(1990, 12, 31), _ => 0.5);
        run.WriteDay(new(1991, 1, 1), _ => double.NaN);
        await ProgramRun.OfAsync("run", run.RunFile);

        Dictionary<string, string> types = [];
        using DuckDBConnection connection = new("DataSource=:memory:");
        connection.Open();
        using DuckDBCommand command = connection.CreateCommand();
        string table = $"read_parquet('{run.PathOf("out")}/daily/**/*.parquet', hive_partitioning = true)";
        command.CommandText = $"DESCRIBE SELECT * FROM {table}";
        using (DuckDBDataReader reader = command.ExecuteReader())
        {
            while (reader.Read())
            {
                types.Add(reader.GetString(0), reader.GetString(1));
            }
        }

        Assert.Equal("DATE", types["date"]);
        Assert.All(
            ["extent_km2", "area_km2", "extent_se_km2", "area_se_km2", "marginal_zone_km2", "pack_km2", "ocean_km2", "observed_share", "filled_share", "polar_gap_km2"],
            column => Assert.Equal("DOUBLE", types[column]));
        Assert.All(["region", "sensor", "status", "method", "hemisphere"], column => Assert.Equal("VARCHAR", types[column]));
        Assert.Equal("BIGINT", types["year"]);

        command.CommandText = $"SELECT count(*), count(extent_km2), max(extent_km2), min(observed_share) FROM {table} WHERE method = 'nasa-team' AND hemisphere = 'north'";
        using DuckDBDataReader counts = command.ExecuteReader();
        Assert.True(counts.Read());
        Assert.Equal(2, counts.GetInt64(0));
        Assert.Equal(1, counts.GetInt64(1)); // A day without any observation has no extent, rather than an extent of zero.
        Assert.Equal(10_000.0, counts.GetDouble(2), 1e-6);
        Assert.Equal(0.0, counts.GetDouble(3));
    }
}
