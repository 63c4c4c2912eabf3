using System.Text.Json;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Two sensors on the same days, small enough to work by hand.</summary>
public sealed class SensorComparisonTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 1, 29);
    private readonly TwoSensors sensors = new();

    public void Dispose() => sensors.Dispose();

    /// <summary>
    /// Origin: worked. On six days in January and February the second sensor sees ice in one more column of 4 cells than the
    /// first: 4 · 625 = 2,500 km² every day, so neither scatter nor width of limits. It misses cell 19, which the first
    /// calls water: that changes nothing in its extent either. Concentration is 0.9 within what tenths of a kelvin allow.
    /// </summary>
    [Fact]
    public async Task Compare_OneColumnMore_IsTheDifferenceOfEveryMonth()
    {
        WriteDays(6);
        sensors.WriteRunFile();

        (ProgramRun ended, JsonElement pair) = await CompareAsync();

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode); // No offsets from 16 cells of ocean, all near land.
        Assert.Contains("IE2401", ended.Messages, StringComparison.Ordinal);
        JsonElement[] extents = [.. pair.GetProperty("differences").EnumerateArray().Where(row => row.GetProperty("quantity").GetString() == "extent")];
        Assert.Equal(6, extents.Length); // January, February and all, for common and own cells.
        Assert.All(extents, row => Assert.Equal(2_500.0, row.GetProperty("mean_difference_km2").GetDouble(), 1e-3));
        JsonElement all = extents[2];
        Assert.Equal((JsonValueKind.Null, 6, "given"), (all.GetProperty("month").ValueKind, all.GetProperty("days").GetInt32(), all.GetProperty("limits").GetString()));
        Assert.Equal(2_500.0, all.GetProperty("upper95_km2").GetDouble(), 1e-3);
        Assert.Equal([1, 2], extents[..2].Select(row => row.GetProperty("month").GetInt32()));
        Assert.All(extents[..2], row => Assert.Equal("none: two or three days", row.GetProperty("limits").GetString()));
        JsonElement area = pair.GetProperty("differences").EnumerateArray().First(row => row.GetProperty("quantity").GetString() == "area");
        Assert.InRange(area.GetProperty("mean_difference_km2").GetDouble(), 2_500.0 * 0.895, 2_500.0 * 0.905);
    }

    [Fact]
    public async Task Compare_TwoSensors_WritesBothTables()
    {
        WriteDays(6);
        sensors.WriteRunFile();

        await CompareAsync();

        StoredTable differences = TableFile.Read(sensors.Run.PathOf("cmp", "sensor_differences.parquet"));
        Assert.Equal(12, differences.Rows);
        Assert.Equal("tiny", differences.Column<string>("earlier_sensor")[0]);
        Assert.Equal("second", differences.Column<string>("later_sensor")[0]);
        Assert.Equal(2_500.0, differences.Column<double>("mean_difference_km2")[0], 1e-3);
        Assert.Null(differences.Column<double?>("lower_95_km2")[0]);
        Assert.Equal("km2", differences.Metadata["unit:mean_difference_km2"]);
        Assert.Equal(0, TableFile.Read(sensors.Run.PathOf("cmp", "offsets.parquet")).Rows);
    }

    [Fact]
    public async Task Compare_OneCommonDay_GivesTheDifferenceAndSaysWhyNoMore()
    {
        WriteDays(1);
        sensors.WriteRunFile();

        (ProgramRun ended, JsonElement pair) = await CompareAsync();

        Assert.DoesNotContain("NaN", ended.Results, StringComparison.Ordinal);
        Assert.All(pair.GetProperty("differences").EnumerateArray(), row => Assert.Equal("none: one day", row.GetProperty("limits").GetString()));
        Assert.Contains("5 days or more for an offset", ended.Messages, StringComparison.Ordinal);
        ProgramRun printed = await ProgramRun.OfAsync("compare", sensors.Run.RunFile, "--sensors", "--out", sensors.Run.PathOf("cmp"));
        Assert.Contains("none: one day", printed.Results, StringComparison.Ordinal);
        Assert.DoesNotContain("NaN", printed.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Compare_NoCommonDay_IsRefused()
    {
        sensors.WriteSecond(First.AddDays(1), _ => 0.9);
        sensors.WriteFirst(First, _ => 0.9);
        sensors.WriteRunFile();

        ProgramRun ended = await ProgramRun.OfAsync("compare", sensors.Run.RunFile, "--sensors", "--out", sensors.Run.PathOf("cmp"));

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE1014", ended.Messages, StringComparison.Ordinal);
        Assert.Contains("tiny: 1 day, second: 1 day", ended.Messages, StringComparison.Ordinal);
        Assert.False(Directory.Exists(sensors.Run.PathOf("cmp")));
    }

    /// <summary>Own periods rule the run, not the comparison: it is what change-over days are chosen by.</summary>
    [Fact]
    public async Task Compare_PeriodsThatDoNotOverlap_ComparesTheInputAllTheSame()
    {
        WriteDays(6);
        sensors.WriteRunFile("last_day = 1990-01-29", "first_day = 1990-01-30");

        (_, JsonElement pair) = await CompareAsync();

        Assert.Equal(6, pair.GetProperty("differences").EnumerateArray().Last().GetProperty("days").GetInt32());
    }

    [Fact]
    public async Task Compare_DamagedFile_CostsItsDay()
    {
        WriteDays(6);
        sensors.WriteRunFile();
        File.WriteAllBytes(sensors.Run.PathOf("others", "19900130_v37.bin"), [1, 2, 3]);

        (ProgramRun ended, JsonElement pair) = await CompareAsync();

        Assert.Contains("IE2123", ended.Messages, StringComparison.Ordinal);
        Assert.Equal(5, pair.GetProperty("differences").EnumerateArray().Last().GetProperty("days").GetInt32());
    }

    /// <summary>
    /// Origin: worked. Days of 60 % ice read 2 K too high in 37v; with offset_k the run's bytes of concentration are those of the
    /// right days: the row is the same to 1e-6 of the extent, and the metadata says what was taken off.
    /// </summary>
    [Fact]
    public async Task Run_OffsetInTheRunFile_IsTakenOffEveryDay()
    {
        DateOnly day = new(1990, 1, 1);
        sensors.Run.WriteDay(day, _ => 0.6);
        ProgramRun right = await ProgramRun.OfAsync("run", sensors.Run.RunFile);
        Assert.Equal(ExitCode.Done, right.ExitCode);
        double expected = Area();
        double sure = AreaError();
        Directory.Delete(sensors.Run.PathOf("out"), recursive: true);
        string file = sensors.Run.DayFile(day, "v37");
        File.WriteAllBytes(file, Raised(File.ReadAllBytes(file), 20)); // Tenths of a kelvin.
        await ProgramRun.OfAsync("run", sensors.Run.RunFile);
        double wrong = Area();
        Directory.Delete(sensors.Run.PathOf("out"), recursive: true);
        sensors.Run.WriteRunFile(source: "offset_k = { 37v = 2.0 }\noffset_se_k = { 37v = 0.1 }");

        await ProgramRun.OfAsync("run", sensors.Run.RunFile);

        Assert.True(Math.Abs(wrong - expected) > 1.0, "2 K must show, or the test proves nothing.");
        Assert.Equal(expected, Area(), 0.05);
        Assert.True(AreaError() > sure, "An offset that is known to 0.1 K makes the area less sure.");
        Assert.Equal("tiny: 37v=2(0.1)", DailyTable.Read(DailyFile()).Metadata["sensor_offsets_k"]);
    }

    [Fact]
    public async Task Run_OffsetChanged_IsAnotherConfiguration()
    {
        sensors.Run.WriteDay(new(1990, 1, 1), _ => 0.6);
        await ProgramRun.OfAsync("run", sensors.Run.RunFile);
        sensors.Run.WriteRunFile(source: "offset_k = { 37v = 2.0 }");

        ProgramRun ended = await ProgramRun.OfAsync("run", sensors.Run.RunFile);

        Assert.Contains("IE3001", ended.Messages, StringComparison.Ordinal);
    }

    private static byte[] Raised(byte[] words, short by)
    {
        for (int at = 0; at < words.Length; at += 2)
        {
            BitConverter.TryWriteBytes(words.AsSpan(at), (short)(BitConverter.ToInt16(words, at) + by));
        }

        return words;
    }

    private string DailyFile() => new ArchiveLayout(sensors.Run.PathOf("out")).DailyFile("nasa-team", Grids.Hemisphere.North, 1990);

    private double Area() => DailyTable.Read(DailyFile()).Rows[0].AreaSquareKilometers!.Value;

    private double AreaError() => DailyTable.Read(DailyFile()).Rows[0].AreaStandardErrorSquareKilometers!.Value;

    private void WriteDays(int count)
    {
        for (int day = 0; day < count; day++)
        {
            sensors.WriteSecond(First.AddDays(day), cell => cell == 19 ? double.NaN : cell % TinyRun.Columns <= 3 ? 0.9 : 0.0);
            sensors.WriteFirst(First.AddDays(day), cell => cell % TinyRun.Columns <= 2 ? 0.9 : 0.0);
        }
    }

    private async Task<(ProgramRun Ended, JsonElement Pair)> CompareAsync()
    {
        ProgramRun ended = await ProgramRun.OfAsync("compare", sensors.Run.RunFile, "--sensors", "--json", "--out", sensors.Run.PathOf("cmp"));
        using JsonDocument answer = JsonDocument.Parse(ended.Results);
        return (ended, Assert.Single(answer.RootElement.Clone().GetProperty("pairs").EnumerateArray().ToArray()));
    }
}
