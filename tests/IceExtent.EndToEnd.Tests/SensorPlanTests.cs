using System.Text.Json;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>What <c>plan</c> and <c>run</c> make of a change-over.</summary>
public sealed class SensorPlanTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 5, 1);
    private readonly TwoSensors sensors = new();

    /// <summary>Both sensors have days 1 to 4; the second rules from day 3 on.</summary>
    public SensorPlanTests()
    {
        for (int day = 0; day < 4; day++)
        {
            sensors.WriteSecond(First.AddDays(day), _ => 0.9);
            sensors.WriteFirst(First.AddDays(day), _ => 0.5);
        }

        sensors.WriteRunFile("last_day = 1990-05-02", "first_day = 1990-05-03");
    }

    public void Dispose() => sensors.Dispose();

    [Fact]
    public async Task Plan_ChangeOver_PrintsWhoRulesWhenAndWhy()
    {
        ProgramRun ended = await ProgramRun.OfAsync("plan", sensors.Run.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        Assert.Contains("2 days, 1990-05-01 to 1990-05-02: change-over on 1990-05-03", ended.Results, StringComparison.Ordinal);
        Assert.Contains("2 days, 1990-05-03 to 1990-05-04: change-over on 1990-05-03", ended.Results, StringComparison.Ordinal);
        Assert.Contains("Overlap: tiny (source 1) and second (source 2)     4 days, 1990-05-01 to 1990-05-04", ended.Results, StringComparison.Ordinal);
    }

    [Fact]
    public async Task PlanJson_ChangeOver_HasSpansAndOverlaps()
    {
        ProgramRun ended = await ProgramRun.OfAsync("plan", sensors.Run.RunFile, "--json");

        using JsonDocument answer = JsonDocument.Parse(ended.Results);
        JsonElement[] ruling = [.. answer.RootElement.GetProperty("ruling").EnumerateArray()];
        Assert.Equal([(1, "1990-05-02"), (2, "1990-05-04")], ruling.Select(span => (span.GetProperty("source").GetInt32(), span.GetProperty("last").GetString()!)));
        Assert.Equal("change-over on 1990-05-03", ruling[0].GetProperty("why")[0].GetProperty("reason").GetString());
        Assert.Equal(4, Assert.Single(answer.RootElement.GetProperty("overlaps").EnumerateArray().ToArray()).GetProperty("days").GetInt32());
        Assert.Equal(0, answer.RootElement.GetProperty("held_back").GetArrayLength());
    }

    [Fact]
    public async Task Run_ChangeOver_TakesEachDayFromItsSensor()
    {
        await ProgramRun.OfAsync("run", sensors.Run.RunFile);

        string daily = new Storage.Writing.ArchiveLayout(sensors.Run.PathOf("out")).DailyFile("nasa-team", Grids.Hemisphere.North, 1990);
        Assert.Equal(["tiny", "tiny", "second", "second"], Storage.Writing.DailyTable.Read(daily).Rows.Select(row => row.Sensor));
    }
}
