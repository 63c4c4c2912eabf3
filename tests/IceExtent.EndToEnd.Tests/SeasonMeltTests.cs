using IceExtent.Storage.Reading;
using IceExtent.TestKit;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Melt onset of a whole run, from the signals that it keeps. Origin of every date: worked, from the steps of <see cref="SeasonRun"/>.</summary>
public sealed class SeasonMeltTests : IDisposable
{
    private const string WithMelt = SeasonRun.Plain + "[melt]\nsignals = true\n";

    private readonly SeasonRun run = new();

    public void Dispose() => run.Dispose();

    /// <summary>
    /// Ice has a horizontal range of 232.0 − 231.0 = 1 K, water one of 113.4 − 145.0 = −31.6 K: 95 % of ice give −0.6 K, 55 % give
    /// −13.7 K, below the −10 K that are certainly wet. So the step of day 80 is the onset, 20 May 1990.
    /// </summary>
    [Fact]
    public async Task Run_WithSignals_WritesMeltOnsetInTablesAndMaps()
    {
        run.WriteDays(-5, 400, day => day is >= 80 and < 110 ? 0.55 : SeasonRun.Usual(day));

        ProgramRun ended = await run.RunAsync(WithMelt);

        Assert.Equal(0, ended.ExitCode);
        Assert.Equal(
            ["1990-05-20", "found", "1990-05-20", "1990-06-19"],
            run.Query("season_cells", "melt_onset, melt_onset_state, horizontal_range_melt, retreat", "ice_year = 1990 AND \"row\" = 1 AND \"column\" = 2"));
        Assert.Equal(["never_reached"], run.Query("season_cells", "melt_onset_state", "ice_year = 1990 AND \"row\" = 1 AND \"column\" = 3")); // Ice of 98 %, dry all year.
        Assert.Equal(["1990-05-20"], run.Query("season_regions", "melt_onset", "ice_year = 1990 AND region = 'hemisphere'"));
        float[] map = new float[TinyRun.Rows * TinyRun.Columns];
        new SeasonGridReader(run.Tiny.PathOf("out", "season_grids", "method=nasa-team", "hemisphere=north", "ice_year=1990", "season_grids.nc"), TinyRun.Grid).Read("melt_onset", map);
        Assert.Equal(80f, map[7]);
        Assert.True(float.IsNaN(map[5]), "Land has no date.");
    }

    [Fact]
    public async Task Run_WithSignals_AnyNumberOfWorkers_WritesTheSameBytes()
    {
        run.WriteDays(-5, 200);
        await run.RunAsync(WithMelt, "--workers", "1");
        SortedDictionary<string, byte[]> one = ArchiveFiles.Of(run.Tiny.PathOf("out"));
        Directory.Delete(run.Tiny.PathOf("out"), recursive: true);

        await run.RunAsync(WithMelt, "--workers", "3");

        ArchiveFiles.AssertSame(one, ArchiveFiles.Of(run.Tiny.PathOf("out")));
    }
}
