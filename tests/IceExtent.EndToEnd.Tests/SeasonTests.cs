using System.Text.Json;
using IceExtent.TestKit;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Season tables, maps and answers of whole runs. Origin of every date: worked, from the steps of <see cref="SeasonRun"/>.</summary>
public sealed class SeasonTests : IDisposable
{
    private readonly SeasonRun run = new();

    public void Dispose() => run.Dispose();

    [Fact]
    public async Task Run_WholeYear_WritesTheDatesOfEveryCell()
    {
        run.WriteDays(-5, 380);

        ProgramRun ended = await run.RunAsync();

        Assert.Equal(0, ended.ExitCode);
        Assert.Equal(
            ["1990-05-19", "1990-06-19", "1990-11-06", "1990-11-26", "found", "140", "191", "final"], // Days 79, 110, 250 and 270.
            run.Query("season_cells", "opening, retreat, advance, closing, retreat_state, inner_ice_free_days, outer_ice_free_days, status", "ice_year = 1990 AND \"row\" = 1 AND \"column\" = 2"));
        Assert.Equal(
            ["null", "never_reached", "never_reached", "0"],
            run.Query("season_cells", "retreat, retreat_state, advance_state, open_water_days", "ice_year = 1990 AND \"row\" = 1 AND \"column\" = 3"));
        Assert.Equal(["0"], run.Query("season_cells", "count(*)", "\"row\" = 1 AND \"column\" = 4 AND ice_year = 1990")); // Never any ice: no season.
        Assert.Equal(["not_sought"], run.Query("season_cells", "min(melt_onset_state)", "ice_year = 1990"));
    }

    [Fact]
    public async Task Run_WholeYear_WritesTheRegionsDates()
    {
        run.WriteDays(-5, 380);

        await run.RunAsync();

        // March has 95 % and September 5 % in 14 cells, 98 % in one: the level lies in between, so it falls with the step of day 80
        // or 110 and rises with that of day 250 or 270. Ice below 15 % brings no area: (14 × 0.95 + 0.98 + 0.98) / 2 = 7.63 cells;
        // 50 % is 7.98 cells and 5 % is 0.98: falls on day 110. 40 % is 6.58 cells, 90 % 13.58: rises on day 270.
        Assert.Equal(
            ["1990-06-19", "1990-11-26", "1990-06-19", "1990-11-06", "final"],
            run.Query("season_regions", "area_fall, area_rise, retreat, advance, status", "ice_year = 1990 AND region = 'hemisphere'"));
    }

    [Fact]
    public async Task Run_AnyNumberOfWorkers_WritesTheSameBytes()
    {
        run.WriteDays(-5, 380, day => day % 7 == 0 ? double.NaN : SeasonRun.Usual(day));
        await run.RunAsync(SeasonRun.Plain, "--workers", "1");
        Dictionary<string, byte[]> one = Files();
        Directory.Delete(run.Tiny.PathOf("out"), recursive: true);

        await run.RunAsync(SeasonRun.Plain, "--workers", "4");

        Dictionary<string, byte[]> four = Files();
        Assert.Equal(7, one.Count); // Cells and maps of three ice years, one table of regions, none of places.
        Assert.Equal(one.Keys.Order(StringComparer.Ordinal), four.Keys.Order(StringComparer.Ordinal));
        Assert.All(one, file => Assert.Equal(file.Value, four[file.Key]));
    }

    [Fact]
    public async Task Run_NightByNight_EndsAsOneRun()
    {
        run.WriteDays(-5, 200);
        await run.RunAsync();
        run.WriteDays(201, 380);
        await run.RunAsync(SeasonRun.Plain, "--from", "1990-09-10");
        Dictionary<string, byte[]> nights = Files();
        Directory.Delete(run.Tiny.PathOf("out"), recursive: true);

        await run.RunAsync();

        Assert.All(Files(), file => Assert.Equal(file.Value, nights[file.Key]));
    }

    [Fact]
    public async Task Run_RunningYear_SaysWhichDatesLaterNightsConfirmedMovedOrWithdrew()
    {
        run.WriteDays(-5, 115);
        await run.RunAsync();
        Assert.Equal(
            ["1990-06-19", "not_yet_reached", "provisional"],
            run.Query("season_cells", "retreat, advance_state, status", "ice_year = 1990 AND \"row\" = 1 AND \"column\" = 2"));

        // Ice of 60 % comes back from day 116 to 120. The longer row of open days is still the first: retreat stays, advance is new.
        run.WriteDays(116, 125, day => day <= 120 ? 0.60 : 0.05);
        await run.RunAsync(SeasonRun.Plain, "--from", "1990-06-25");
        JsonElement dates = run.Record().EnumerateArray().Last().GetProperty("provisional_dates");
        Assert.Equal((14, 0), (Count(dates, "retreat", "confirmed"), Count(dates, "retreat", "moved")));
        Assert.Equal(14, Count(dates, "advance", "new"));

        // With open water until day 140 the second row is the longer one: retreat moves to day 121, and advance is withdrawn.
        run.WriteDays(126, 140, _ => 0.05);
        await run.RunAsync(SeasonRun.Plain, "--from", "1990-07-05");
        JsonElement year = run.Record().EnumerateArray().Last();
        dates = year.GetProperty("provisional_dates");
        Assert.Equal((14, 14), (Count(dates, "retreat", "moved"), Count(dates, "advance", "withdrawn")));
        Assert.Equal(14, Count(dates, "opening", "confirmed"));
        string[] named = [.. year.GetProperty("named_changes").EnumerateArray().Select(change => change.GetString()!)];
        Assert.Contains("hemisphere 1990 retreat: moved from 1990-06-19 to 1990-06-30", named);
        Assert.Contains("hemisphere 1990 advance: 1990-06-25 withdrawn", named);
    }

    private static int Count(JsonElement dates, string date, string change) => dates.GetProperty(date).GetProperty(change).GetInt32();

    [Fact]
    public async Task Run_NothingNew_LeavesSeasonsAlone()
    {
        run.WriteDays(-5, 380);
        await run.RunAsync();

        await run.RunAsync(SeasonRun.Plain, "--from", "1991-03-10", "--to", "1991-03-10");

        Assert.Single(run.Record().EnumerateArray(), year => year.GetProperty("ice_year").GetInt32() == 1991); // Only the year that holds the day.
    }

    /// <summary>As a run leaves it that was stopped when the years were written and the regions were not.</summary>
    [Fact]
    public async Task Run_RegionsLeftBehind_AreMadeOfEveryYear()
    {
        run.WriteDays(-5, 380);
        await run.RunAsync();
        Dictionary<string, byte[]> whole = Files();
        Directory.Delete(run.Tiny.PathOf("out", "season_regions"), recursive: true);

        await run.RunAsync(SeasonRun.Plain, "--from", "1991-03-10", "--to", "1991-03-10");

        Assert.All(Files(), file => Assert.Equal(whole[file.Key], file.Value));
        Assert.Equal(["1990-06-19"], run.Query("season_regions", "retreat", "ice_year = 1990 AND region = 'hemisphere'"));
    }

    /// <summary>Days 105 to 109 show one row of cells: 4 × 0.5 = 2 cells of ice, below the level of 7.63, and not the region's ice.</summary>
    [Fact]
    public async Task Run_PartOfARegionSeen_IsNoFallOfItsArea()
    {
        run.WriteDays(-5, 380);
        for (int day = 105; day < 110; day++)
        {
            run.Tiny.WriteDay(SeasonRun.First.AddDays(day), cell => cell < TinyRun.Columns ? 0.50 : double.NaN);
        }

        await run.RunAsync();

        Assert.Equal(["hidden_by_gap"], run.Query("season_regions", "area_fall_state", "ice_year = 1990 AND region = 'hemisphere'"));
    }

    [Fact]
    public async Task Run_OtherScheme_MakesSeasonsAnewAndLeavesTheDays()
    {
        run.WriteDays(-5, 380);
        await run.RunAsync();

        ProgramRun ended = await run.RunAsync(SeasonRun.Plain + "opening_fraction = 0.45\n", "--from", "1991-03-10", "--to", "1991-03-10");

        Assert.Equal(0, ended.ExitCode);
        Assert.Equal(["1990-06-18"], run.Query("season_cells", "opening", "ice_year = 1990 AND \"row\" = 1 AND \"column\" = 2")); // 50 % until day 109.
    }

    [Fact]
    public async Task Season_Region_TellsDatesAsTextAndJson()
    {
        run.WriteDays(-5, 380);
        await run.RunAsync();

        ProgramRun text = await ProgramRun.OfAsync("season", run.Tiny.RunFile, "hemisphere");
        ProgramRun json = await ProgramRun.OfAsync("season", run.Tiny.RunFile, "hemisphere", "--json");

        Assert.Equal(0, text.ExitCode);
        Assert.Contains("19 Jun 1990", text.Results, StringComparison.Ordinal);
        Assert.Contains("cannot be tested: 1 year", text.Results, StringComparison.Ordinal);
        Assert.Contains("no basis for navigation", text.Results, StringComparison.Ordinal);
        JsonElement year = JsonDocument.Parse(json.Results).RootElement.GetProperty("years").EnumerateArray().Single(year => year.GetProperty("ice_year").GetInt32() == 1990);
        Assert.Equal("1990-06-19", year.GetProperty("dates").GetProperty("retreat").GetProperty("day").GetString());
    }

    [Theory]
    [InlineData("[season]\nscheme = \"peng-2081\"\n", "IE1007", "peng-2018")]
    [InlineData("[season]\nsmoothing_days = 4\n", "IE1011", "odd")]
    [InlineData("[season]\nopening_fraction = 0.10\n", "IE1011", "retreat_fraction")]
    [InlineData("[season]\nyear_start = \"02-30\"\n", "IE1006", "03-01")]
    [InlineData("[season]\nopening_day = \"sometime\"\n", "IE1007", "last-with")]
    [InlineData("[season]\nopeningfraction = 0.8\n", "IE1003", "opening_fraction")]
    [InlineData("[season]\nlowest_in = [\"06-01\"]\n", "IE1006", "two days")]
    public async Task Run_BadScheme_SaysWhatIsAllowed(string season, string code, string hint)
    {
        run.WriteDays(0, 1);

        ProgramRun ended = await run.RunAsync(season);

        Assert.Equal(2, ended.ExitCode);
        Assert.Contains(code, ended.Messages, StringComparison.Ordinal);
        Assert.Contains(hint, ended.Messages, StringComparison.Ordinal);
        Assert.False(Directory.Exists(run.Tiny.PathOf("out")));
    }

    [Fact]
    public async Task Season_UnknownNameOrNoTables_SaysSo()
    {
        run.WriteDays(0, 30);
        await run.RunAsync();

        ProgramRun unknown = await ProgramRun.OfAsync("season", run.Tiny.RunFile, "hemisfere");
        Directory.Delete(run.Tiny.PathOf("out"), recursive: true);
        ProgramRun empty = await ProgramRun.OfAsync("season", run.Tiny.RunFile, "hemisphere");

        Assert.Contains("IE3142", unknown.Messages, StringComparison.Ordinal);
        Assert.Contains("hemisphere", unknown.Messages, StringComparison.Ordinal);
        Assert.Contains("IE3141", empty.Messages, StringComparison.Ordinal);
    }

    private Dictionary<string, byte[]> Files() => Directory
        .EnumerateDirectories(run.Tiny.PathOf("out"), "season_*")
        .SelectMany(folder => Directory.EnumerateFiles(folder, "*", SearchOption.AllDirectories))
        .ToDictionary(file => Path.GetRelativePath(run.Tiny.PathOf("out"), file), File.ReadAllBytes);
}
