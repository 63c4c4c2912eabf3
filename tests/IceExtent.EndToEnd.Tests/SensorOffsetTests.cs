using System.Text.Json;
using IceExtent.TestKit;
using IceExtent.Worker;
using IceExtent.Worker.Configuration;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Offsets between two invented radiometers over one invented sea: what the scene file puts in must come out.</summary>
public sealed class SensorOffsetTests : IDisposable
{
    private static readonly (string Channel, double Kelvins)[] PutIn =
        [("19v", 1.5), ("19h", -1.0), ("22v", 0.7), ("37v", 2.0), ("37h", -0.3)];

    private readonly string folder = Path.Combine(Path.GetTempPath(), "iceextent-tests", Guid.NewGuid().ToString("N"));

    public void Dispose() => Directory.Delete(folder, recursive: true);

    /// <summary>
    /// Origin: worked. The second radiometer has the offsets above and drifts by 0.8 K a decade in 37v from its first day on,
    /// 1995-05-03: on the middle of 1 to 8 January 2000 that is 1,707.5 days, 0.3740 K, so 2.3740 K in 37v. Every offset comes
    /// back within three of its standard errors, over each surface. Pasted into the run file, the lines take away the step:
    /// extent was off by more than 100,000 km² and is then within its own 95 % limits of nothing, less than a tenth of it.
    /// </summary>
    [Fact]
    public async Task Compare_KnownOffsets_ComeBackAndTakeTheStepAway()
    {
        Directory.CreateDirectory(folder);
        await WriteScenesAsync();
        WriteRunFile(string.Empty);

        JsonElement before = await CompareAsync();

        Dictionary<string, double> expected = PutIn.ToDictionary(pair => pair.Channel, pair => pair.Kelvins + (pair.Channel == "37v" ? 0.3740 : 0.0));
        JsonElement[] offsets = [.. before.GetProperty("offsets").EnumerateArray()];
        Assert.Equal(15, offsets.Length); // Five channels over water, ice and both.
        Assert.All(offsets, offset =>
        {
            double error = offset.GetProperty("offset_se_k").GetDouble();
            Assert.InRange(error, 1e-4, 0.02);
            double known = expected[offset.GetProperty("channel").GetString()!];
            Assert.InRange(offset.GetProperty("offset_k").GetDouble(), known - (3.0 * error), known + (3.0 * error));
        });
        JsonElement step = ExtentOf(before);
        Assert.True(Math.Abs(step.GetProperty("mean_difference_km2").GetDouble()) > 100_000.0);

        string[] lines = [.. before.GetProperty("run_file_lines").EnumerateArray().Select(line => line.GetString()!)];
        WriteRunFile(string.Join('\n', lines));
        JsonElement after = await CompareAsync();

        JsonElement rest = ExtentOf(after);
        Assert.InRange(0.0, rest.GetProperty("lower95_km2").GetDouble(), rest.GetProperty("upper95_km2").GetDouble());
        Assert.InRange(rest.GetProperty("mean_difference_km2").GetDouble(), -10_000.0, 10_000.0);

        // What the run file says of the later source changes nothing in what it should say.
        Assert.All(offsets.Zip(after.GetProperty("offsets").EnumerateArray()), pair =>
            Assert.Equal(pair.First.GetProperty("offset_k").GetDouble(), pair.Second.GetProperty("offset_k").GetDouble(), 0.02));
    }

    private static JsonElement ExtentOf(JsonElement pair) => pair.GetProperty("differences").EnumerateArray().Single(row =>
        row.GetProperty("quantity").GetString() == "extent" && row.GetProperty("cells").GetString() == "common" && row.GetProperty("month").ValueKind == JsonValueKind.Null);

    private async Task WriteScenesAsync()
    {
        ConfigFolder config = ConfigFolder.BesideProgram;
        foreach (string name in new[] { "one.toml", "two.toml" })
        {
            File.Copy(Path.Combine(config.Sensors, "ssmi-f13.toml"), Path.Combine(folder, name));
        }

        string scene = await File.ReadAllTextAsync(Path.Combine(config.Scenes, "north.toml"));
        string offsets = string.Join('\n', PutIn.Select(pair => FormattableString.Invariant($"{pair.Channel} = {pair.Kelvins:F1}")));
        await File.WriteAllTextAsync(
            Path.Combine(folder, "off.toml"),
            scene.Replace("[instrument.offset_kelvins]", "[instrument.offset_kelvins]\n" + offsets, StringComparison.Ordinal)
                .Replace("[instrument.drift_kelvins_per_decade]", "[instrument.drift_kelvins_per_decade]\n37v = 0.8", StringComparison.Ordinal));
        await SceneAsync("one", "north");
        await SceneAsync("two", Path.Combine(folder, "off.toml"), "--radiometer", "2");
    }

    private async Task SceneAsync(string sensor, string scene, params string[] more)
    {
        ProgramRun ended = await ProgramRun.OfAsync([
            "scene", "--sensor", Path.Combine(folder, sensor + ".toml"), "--scene", scene, "--from", "2000-01-01", "--to", "2000-01-08", "--no-truth",
            "--out", Path.Combine(folder, sensor), .. more]);
        Assert.Equal(ExitCode.Done, ended.ExitCode);
    }

    private void WriteRunFile(string second)
    {
        const string Channels = "channels = { 19v = \"tb_19v\", 19h = \"tb_19h\", 22v = \"tb_22v\", 37v = \"tb_37v\", 37h = \"tb_37h\" }";
        File.WriteAllText(Path.Combine(folder, "run.toml"), $"""
            output = "archive"
            grid = "north-25km"
            methods = ["nasa-team"]
            [[source]]
            sensor = "one.toml"
            files = "one/brightness/*.nc"
            {Channels}
            [[source]]
            sensor = "two.toml"
            files = "two/brightness/*.nc"
            {Channels}
            {second}
            """);
    }

    private async Task<JsonElement> CompareAsync()
    {
        ProgramRun ended = await ProgramRun.OfAsync("compare", Path.Combine(folder, "run.toml"), "--sensors", "--json", "--out", Path.Combine(folder, "cmp"));
        Assert.Equal(ExitCode.Done, ended.ExitCode);
        using JsonDocument answer = JsonDocument.Parse(ended.Results);
        return Assert.Single(answer.RootElement.Clone().GetProperty("pairs").EnumerateArray().ToArray());
    }
}
