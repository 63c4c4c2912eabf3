using System.Text.Json;
using IceExtent.Grids;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;
using IceExtent.Worker.Configuration;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Coastal minima from an archive's own grids. Column 0 of the small grid is land.</summary>
public sealed class CoastMinimumTests : IDisposable
{
    private const string OneDayWillDo = "[coast]\nleast_days_per_month = 1";

    private readonly TinyRun run = new();

    public CoastMinimumTests() => run.WriteDay(new(1990, 1, 1), _ => 0.0); // Without any day the run file itself would be at fault.

    public void Dispose() => run.Dispose();

    /// <summary>
    /// Origin: worked. Two days a month, one with 5 % more and one with 5 % less than the mean. The shore column has 30 % and in
    /// August 20 %, the next ones 50 and 30 % all year: the caps of 40 and 20 % cut them. The last column is no coast. Temperatures
    /// are tenths of a kelvin, hence 0.002.
    /// </summary>
    [Fact]
    public async Task CoastMinimum_YearOfGrids_IsTheSmallestMonthlyMeanUnderTheCaps()
    {
        await RunYearAsync(_ => true, "[coast]\nleast_days_per_month = 2");

        ProgramRun ended = await MinimumAsync();

        Assert.Equal((ExitCode.Done, string.Empty), (ended.ExitCode, ended.Messages));
        float[] minima = CoastMinimumFile.Read(run.PathOf("minima.nc"), TinyRun.Grid);
        for (int cell = 0; cell < minima.Length; cell++)
        {
            Assert.Equal((cell % TinyRun.Columns) switch { 1 => 0.20f, 2 => 0.40f, 3 => 0.20f, _ => 0f }, minima[cell], 0.002f);
        }
    }

    [Fact]
    public async Task CoastMinimum_SameGrids_GivesTheSameBytes()
    {
        await RunYearAsync(_ => true, OneDayWillDo);
        await MinimumAsync();
        byte[] first = await File.ReadAllBytesAsync(run.PathOf("minima.nc"));

        await MinimumAsync();

        Assert.Equal(first, await File.ReadAllBytesAsync(run.PathOf("minima.nc")));
        Assert.Empty(Directory.EnumerateFiles(run.Folder, ".*.part"));
    }

    [Fact]
    public async Task CoastMinimum_NoGridsOfTheYear_IsTold() => await AssertNothingAsync("1991", "IE2207", "no grid file");

    [Fact]
    public async Task CoastMinimum_MonthsWithTooFewDays_AreNamed()
    {
        await RunYearAsync(month => month is not (3 or 8), OneDayWillDo);

        await AssertNothingAsync("1990", "IE2208", "1990-03 with 0 days, 1990-08 with 0 days");
    }

    [Theory]
    [InlineData("bootstrap", "the unknown name bootstrap")]
    [InlineData("nasa-taem", "Did you mean nasa-team?")]
    public async Task CoastMinimum_MethodOfNoGrids_IsRefused(string method, string told)
    {
        run.WriteRunFile(OneDayWillDo);

        ProgramRun ended = await MinimumAsync("1990", method);

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE1007", ended.Messages, StringComparison.Ordinal);
        Assert.Contains(told, ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task CoastMinimum_GridsThatWereCorrected_AreRefused()
    {
        run.WriteRunFile("[coast]\ncorrection = \"concentration\"");

        ProgramRun ended = await MinimumAsync();

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains("IE1011", ended.Messages, StringComparison.Ordinal);
    }

    /// <summary>A bad grid costs its day: here there are two days a month and one is enough.</summary>
    [Theory]
    [InlineData("IE2210", "no grid at all")]
    [InlineData("IE2211", "no such plane")]
    [InlineData("IE2209", "another")]
    public async Task CoastMinimum_BadGrid_CostsItsDay(string code, string kind)
    {
        await RunYearAsync(_ => true, OneDayWillDo);
        string path = new ArchiveLayout(run.PathOf("out")).GridFile("nasa-team", Hemisphere.North, new(1990, 5, 4));
        Grid grid = kind == "another" ? new("other", null, TinyRun.Grid.Projection, TinyRun.Grid.Frame with { LeftMeters = -50_000.0 }) : TinyRun.Grid;
        if (kind == "no grid at all")
        {
            await File.WriteAllTextAsync(path, kind);
        }
        else
        {
            GridFile.WriteUndated(
                path,
                grid,
                [new PackedVariable(kind == "another" ? "concentration" : "concentrations", "not what it should be", null, [], "1", new float[grid.CellCount], Packing.Fraction)],
                [new("title", "Invented")]);
        }

        ProgramRun ended = await MinimumAsync();

        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Contains(code, ended.Messages, StringComparison.Ordinal);
        Assert.True(File.Exists(run.PathOf("minima.nc")));
    }

    /// <summary>
    /// The whole way, on an invented sea of which every tenth day was observed: with minima of the year 2002 the second
    /// run must show less than half of the false ice of September 2003 at coasts, and lose next to no true ice.
    /// </summary>
    [Fact]
    public async Task CoastMinimum_OfAScene_TakesFalseIceFromTheNextYear()
    {
        string scene = await File.ReadAllTextAsync(Path.Combine(ConfigFolder.BesideProgram.Scenes, "north.toml"));
        run.Write("sparse.toml", scene.Replace("day_step = 1 ", "day_step = 10 ", StringComparison.Ordinal));
        foreach ((string from, string to) in new[] { ("2002-01-01", "2002-12-31"), ("2003-09-01", "2003-09-30") })
        {
            await ProgramRun.OfAsync("scene", "--scene", run.PathOf("sparse.toml"), "--sensor", "ssmi-f13", "--from", from, "--to", to, "--out", run.Folder);
        }

        string plain = await File.ReadAllTextAsync(run.RunFile);
        run.Write("plain.toml", plain + "\n[coast]\nleast_days_per_month = 2\n");
        run.Write("corrected.toml", plain.Replace("\"archive\"", "\"corrected\"", StringComparison.Ordinal) + "\n[coast]\ncorrection = \"concentration\"\nminimum_file = \"minima.nc\"\n");

        await ProgramRun.OfAsync("run", run.PathOf("plain.toml"));
        ProgramRun made = await ProgramRun.OfAsync("coast-minimum", run.PathOf("plain.toml"), "--year", "2002", "--out", run.PathOf("minima.nc"), "--json");
        await ProgramRun.OfAsync("run", run.PathOf("corrected.toml"), "--from", "2003-09-01");

        Assert.Equal(ExitCode.Done, made.ExitCode);
        Assert.True(JsonDocument.Parse(made.Results).RootElement.GetProperty("cells").GetInt32() > 1_000);
        (int falseBefore, int trueBefore) = IceOfSeptember("archive");
        (int falseAfter, int trueAfter) = IceOfSeptember("corrected");
        Assert.InRange(falseAfter, 0, falseBefore / 2);
        Assert.InRange(trueAfter, 0.98 * trueBefore, trueBefore);
    }

    // Cells of 15 % and more in a month of the scene: where there truly is no ice at all, and where there is.
    private (int False, int True) IceOfSeptember(string archive)
    {
        Grid grid = GridLoader.Load(Path.Combine(ConfigFolder.BesideProgram.Grids, "north-25km.toml"), [])!.Grid;
        (int falseIce, int trueIce) = (0, 0);
        for (DateOnly day = new(2003, 9, 1); day.Month == 9; day = day.AddDays(1))
        {
            string path = new ArchiveLayout(run.PathOf(archive)).GridFile("nasa-team", Hemisphere.North, day);
            if (File.Exists(path))
            {
                float[] truth = ConcentrationGridFile.Read(run.PathOf("truth", Path.GetFileName(path)), grid);
                float[] found = ConcentrationGridFile.Read(path, grid);
                falseIce += Enumerable.Range(0, truth.Length).Count(cell => truth[cell] == 0f && found[cell] >= 0.15f);
                trueIce += Enumerable.Range(0, truth.Length).Count(cell => truth[cell] >= 0.15f && found[cell] >= 0.15f);
            }
        }

        return (falseIce, trueIce);
    }

    private async Task RunYearAsync(Func<int, bool> wanted, string table)
    {
        for (int month = 1; month <= 12; month++)
        {
            double shore = month == 8 ? 0.20 : 0.30;
            foreach ((int day, double more) in wanted(month) ? [(4, -0.05), (5, 0.05)] : Array.Empty<(int, double)>())
            {
                run.WriteDay(new(1990, month, day), cell => (cell % TinyRun.Columns) switch { 1 => shore + more, 2 => 0.50 + more, 3 => 0.30 + more, _ => 0.0 });
            }
        }

        run.WriteRunFile(table);
        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile, "--from", "1990-01-02");
        Assert.Equal(ExitCode.Done, ended.ExitCode);
    }

    private Task<ProgramRun> MinimumAsync(string year = "1990", string method = "nasa-team") =>
        ProgramRun.OfAsync("coast-minimum", run.RunFile, "--year", year, "--method", method, "--out", run.PathOf("minima.nc"));

    private async Task AssertNothingAsync(string year, string code, string told)
    {
        ProgramRun ended = await MinimumAsync(year);

        Assert.Equal(ExitCode.NoUsableInput, ended.ExitCode);
        Assert.Contains(code, ended.Messages, StringComparison.Ordinal);
        Assert.Contains(told, ended.Messages, StringComparison.Ordinal);
        Assert.False(File.Exists(run.PathOf("minima.nc")));
    }
}
