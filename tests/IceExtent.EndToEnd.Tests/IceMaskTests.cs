using IceExtent.Grids;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Masks made of an archive, and used.</summary>
public sealed class IceMaskTests : IDisposable
{
    private const string Rules = "[ice_mask]\nmargin_km = 0.0\nleast_days = 2";
    private readonly TinyRun run = new();

    /// <summary>Two days in each month of 1990. Column 1 has ice always, column 2 until June, column 3 on one day in each month, column 4 never.</summary>
    public IceMaskTests()
    {
        for (int month = 1; month <= 12; month++)
        {
            for (int day = 1; day <= 2; day++)
            {
                (int number, int date) = (month, day);
                run.WriteDay(new(1990, number, date), cell => (cell % TinyRun.Columns) switch { 1 => 0.9, 2 => number <= 6 ? 0.5 : 0.0, 3 => date == 1 ? 0.5 : 0.0, _ => 0.0 });
            }
        }
    }

    public void Dispose() => run.Dispose();

    /// <summary>Origin: worked. Ice on two days makes the mask: column 1, until June column 2; column 0 is land, so nothing is known there.</summary>
    [Fact]
    public async Task IceMask_ARun_GivesTheMaskThatTheNextRunUses()
    {
        await RunAsync(Rules);

        ProgramRun made = await ProgramRun.OfAsync("ice-mask", run.RunFile, "--method", "nasa-team", "--out", run.PathOf("mask.nc"));

        Assert.Equal(ExitCode.Done, made.ExitCode);
        Assert.Contains("no basis for navigation", made.Results, StringComparison.Ordinal);
        bool[][] outside = IceMaskFile.ReadOutside(run.PathOf("mask.nc"), TinyRun.Grid);
        Assert.All(outside, (month, index) => Assert.Equal(
            Enumerable.Range(0, 20).Select(cell => (cell % TinyRun.Columns) switch { 0 or 1 => false, 2 => index >= 6, _ => true }), month));

        run.WriteRunFile(Rules + "\n[weather]\nice_mask_file = \"mask.nc\"");
        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace("\"out\"", "\"masked\"", StringComparison.Ordinal));
        ProgramRun masked = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Done, masked.ExitCode);
        var rows = DailyTable.Read(new ArchiveLayout(run.PathOf("masked")).DailyFile("nasa-team", Hemisphere.North, 1990)).Rows;
        Assert.All(rows, row => Assert.Equal((row.Date.Month <= 6 ? 8 : 4) * TinyRun.CellSquareKilometers, row.ExtentSquareKilometers!.Value, 1e-3));
    }

    /// <summary>Origin: worked. 25 km to each side of the two columns of January is column 3; of the one column of July it is column 2.</summary>
    [Fact]
    public async Task IceMask_Margin_TakesInTheNextCells()
    {
        await RunAsync(Rules.Replace("0.0", "25.0", StringComparison.Ordinal));

        ProgramRun made = await ProgramRun.OfAsync("ice-mask", run.RunFile, "--out", run.PathOf("mask.nc"), "--json");

        using System.Text.Json.JsonDocument answer = System.Text.Json.JsonDocument.Parse(made.Results);
        double[] ice = [.. answer.RootElement.GetProperty("months").EnumerateArray().Select(month => month.GetProperty("ice_can_be_km2").GetDouble() / TinyRun.CellSquareKilometers)];
        Assert.Equal([12, 12, 12, 12, 12, 12, 8, 8, 8, 8, 8, 8], ice.Select(cells => (int)Math.Round(cells)));
        bool[][] outside = IceMaskFile.ReadOutside(run.PathOf("mask.nc"), TinyRun.Grid);
        Assert.Equal((false, true), (outside[0][3], outside[0][4]));
    }

    [Fact]
    public async Task IceMask_AnyNumberOfWorkers_WritesTheSameBytes()
    {
        await RunAsync(Rules);
        await ProgramRun.OfAsync("ice-mask", run.RunFile, "--out", run.PathOf("one.nc"), "--workers", "1");
        await ProgramRun.OfAsync("ice-mask", run.RunFile, "--out", run.PathOf("four.nc"), "--workers", "4");

        Assert.Equal(await File.ReadAllBytesAsync(run.PathOf("one.nc")), await File.ReadAllBytesAsync(run.PathOf("four.nc")));
    }

    [Fact]
    public async Task IceMask_MonthsWithoutADay_AreRefusedByNumber()
    {
        await RunAsync(Rules);

        ProgramRun made = await ProgramRun.OfAsync("ice-mask", run.RunFile, "--to", "1990-10-31", "--out", run.PathOf("mask.nc"));

        Assert.Equal(ExitCode.Configuration, made.ExitCode);
        Assert.Contains("IE3140", made.Messages, StringComparison.Ordinal);
        Assert.Contains("in the months 11 (0), 12 (0)", made.Messages, StringComparison.Ordinal);
        Assert.False(File.Exists(run.PathOf("mask.nc")));
    }

    [Fact]
    public async Task IceMask_DamagedGrid_CostsItsDayAndIsTold()
    {
        await RunAsync(Rules.Replace("least_days = 2", "least_days = 1", StringComparison.Ordinal));
        await File.WriteAllTextAsync(new ArchiveLayout(run.PathOf("out")).GridFile("nasa-team", Hemisphere.North, new(1990, 3, 1)), "damaged");

        ProgramRun made = await ProgramRun.OfAsync("ice-mask", run.RunFile, "--out", run.PathOf("mask.nc"));

        Assert.Equal(ExitCode.DoneWithGaps, made.ExitCode);
        Assert.Contains("IE2102", made.Messages, StringComparison.Ordinal);
        bool[][] outside = IceMaskFile.ReadOutside(run.PathOf("mask.nc"), TinyRun.Grid);
        Assert.Equal((true, false), (outside[2][3], outside[3][3])); // Column 3 had ice on the damaged day alone.
    }

    /// <summary>One readable day of March where two are needed: a mask of it would have no ice anywhere, so there is none.</summary>
    [Fact]
    public async Task IceMask_FewerDaysThanACellNeeds_IsRefused()
    {
        await RunAsync(Rules);
        await File.WriteAllTextAsync(new ArchiveLayout(run.PathOf("out")).GridFile("nasa-team", Hemisphere.North, new(1990, 3, 2)), "damaged");

        ProgramRun made = await ProgramRun.OfAsync("ice-mask", run.RunFile, "--out", run.PathOf("mask.nc"));

        Assert.Equal(ExitCode.Configuration, made.ExitCode);
        Assert.Contains("in the months 3 (1)", made.Messages, StringComparison.Ordinal);
        Assert.False(File.Exists(run.PathOf("mask.nc")));
    }

    [Theory]
    [InlineData("", "nasa-taem", "IE1007")]
    [InlineData("[weather]\nice_mask_file = \"mask.nc\"", "nasa-team", "IE1011")]
    public async Task IceMask_OtherMethodOrMaskedRun_IsRefused(string table, string method, string code)
    {
        await RunAsync(Rules);
        await ProgramRun.OfAsync("ice-mask", run.RunFile, "--out", run.PathOf("mask.nc"));
        run.WriteRunFile(table);

        ProgramRun made = await ProgramRun.OfAsync("ice-mask", run.RunFile, "--method", method, "--out", run.PathOf("other.nc"));

        Assert.Equal(ExitCode.Configuration, made.ExitCode);
        Assert.Contains(code, made.Messages, StringComparison.Ordinal);
        Assert.False(File.Exists(run.PathOf("other.nc")));
    }

    private async Task RunAsync(string table)
    {
        run.WriteRunFile(table);
        Assert.Equal(ExitCode.Done, (await ProgramRun.OfAsync("run", run.RunFile)).ExitCode);
    }
}
