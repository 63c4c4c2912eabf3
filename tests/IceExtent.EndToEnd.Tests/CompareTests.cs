using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Methods side by side on invented days.</summary>
public sealed class CompareTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 1, 1);
    private readonly TinyRun run = new();

    public CompareTests()
    {
        run.WriteDay(First, cell => cell % TinyRun.Columns < 3 ? 0.5 : 0.9);
        run.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + "\n" + """
            [north.surface_points_k]
            open_water = { 19v = 184.9, 37v = 207.1, 37h = 145.0 }
            first_year = { 19v = 248.4, 37v = 242.3, 37h = 231.0 }
            multiyear = { 19v = 220.7, 37v = 188.5, 37h = 177.0 }
            """);
        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace("[\"nasa-team\"]", "[\"nasa-team\", \"bristol\", \"bootstrap\"]", StringComparison.Ordinal));
    }

    public void Dispose() => run.Dispose();

    /// <summary>
    /// Origin: worked. Every method returns a linear mixture's own shares, so all three agree on 8 cells of 50 % and 8 of
    /// 90 %: 16 · 625 = 10,000 km² of extent and no difference beyond what rounding to tenths of a kelvin makes (0.3 %).
    /// </summary>
    [Fact]
    public async Task Compare_LinearMixture_FindsTheMethodsAlike()
    {
        ProgramRun ended = await ProgramRun.OfAsync("compare", run.RunFile, "--out", run.PathOf("cmp"), "--json");

        Assert.Equal(ExitCode.Done, ended.ExitCode);
        using System.Text.Json.JsonDocument answer = System.Text.Json.JsonDocument.Parse(ended.Results);
        System.Text.Json.JsonElement[] methods = [.. answer.RootElement.GetProperty("means").EnumerateArray()];
        Assert.Equal(["nasa-team", "bristol", "bootstrap"], methods.Select(method => method.GetProperty("method").GetString()));
        Assert.All(methods, method => Assert.Equal(10_000.0, method.GetProperty("extent_km2").GetDouble(), 1e-3));
        Assert.All(methods, method => Assert.InRange(method.GetProperty("mean_difference").GetDouble(), -0.003, 0.003));
        Assert.True(File.Exists(run.PathOf("cmp", "comparison.parquet")));
        Assert.True(File.Exists(run.PathOf("cmp", "1990-01-01.nc")));
    }

    [Fact]
    public async Task Compare_OneMethod_IsRefused()
    {
        run.WriteRunFile();

        ProgramRun ended = await ProgramRun.OfAsync("compare", run.RunFile, "--out", run.PathOf("cmp"));

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE1014", ended.Messages, StringComparison.Ordinal);
    }
}
