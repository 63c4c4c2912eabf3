using System.Text.Json;
using DuckDB.NET.Data;
using IceExtent.TestKit;

namespace IceExtent.EndToEnd.Tests;

/// <summary>A small run of one ice year whose dates are known from the steps of its ice.</summary>
/// <remarks>
/// Day 0 is 1 March 1990. Cell 7 has 95 % until day 79, 50 % from day 80, 5 % from day 110, 40 % from day 250 and 90 % from day 270;
/// cell 8 has ice all year, cell 9 none; other cells of the sea are as cell 7.
/// </remarks>
internal sealed class SeasonRun : IDisposable
{
    /// <summary>Neither smoothed nor bridged.</summary>
    public const string Plain = "[season]\nscheme = \"peng-2018\"\nsmoothing = \"none\"\nsmoothing_days = 1\nbridged_days = 0\n";

    public static DateOnly First { get; } = new(1990, 3, 1);

    public TinyRun Tiny { get; } = new();

    public void Dispose() => Tiny.Dispose();

    public static double Usual(int day) => day < 80 ? 0.95 : day < 110 ? 0.50 : day < 250 ? 0.05 : day < 270 ? 0.40 : 0.90;

    /// <summary>Writes days, both ends within.</summary>
    public void WriteDays(int from, int to, Func<int, double>? iceOf = null)
    {
        for (int day = from; day <= to; day++)
        {
            Tiny.WriteDay(First.AddDays(day), cell => cell switch { 8 => 0.98, 9 => 0.0, _ => (iceOf ?? Usual)(day) });
        }
    }

    public async Task<ProgramRun> RunAsync(string season = Plain, params string[] options)
    {
        Tiny.WriteRunFile(source: "\n" + season);
        return await ProgramRun.OfAsync(["run", Tiny.RunFile, .. options]);
    }

    /// <summary>One row of a query over a season table, as text.</summary>
    public string[] Query(string table, string columns, string where)
    {
        using DuckDBConnection connection = new("DataSource=:memory:");
        connection.Open();
        using DuckDBCommand command = connection.CreateCommand();
        command.CommandText = $"SELECT {columns} FROM read_parquet('{Tiny.PathOf("out")}/{table}/**/*.parquet', hive_partitioning = true) WHERE {where}";
        using DuckDBDataReader reader = command.ExecuteReader();
        Assert.True(reader.Read(), command.CommandText);
        return [.. Enumerable.Range(0, reader.FieldCount).Select(column => reader.IsDBNull(column) ? "null"
            : reader.GetValue(column) is DateOnly day ? day.ToString("yyyy-MM-dd", null)
            : Convert.ToString(reader.GetValue(column), System.Globalization.CultureInfo.InvariantCulture)!)];
    }

    /// <summary>The ice years of the newest run record.</summary>
    public JsonElement Record()
    {
        string newest = Directory.EnumerateFiles(Tiny.PathOf("out", "runs"), "*.json").Order(StringComparer.Ordinal).Last();
        return JsonDocument.Parse(File.ReadAllText(newest)).RootElement.GetProperty("seasons");
    }
}
