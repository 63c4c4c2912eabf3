using System.Text;
using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>
/// Whole runs with a polar gap and with empty cells. Cells are 625 km²; columns 1 to 4 are ocean, and the gap is cells 7 and
/// 12, in rows 1 and 2 of column 2. Temperatures are rounded to a tenth of a kelvin, which moves a concentration by under 0.2 %.
/// </summary>
public sealed class FillingTests : IDisposable
{
    private const double Cell = TinyRun.CellSquareKilometers;
    private static readonly DateOnly Day = new(1990, 3, 1);
    private readonly TinyRun run = new();

    public FillingTests() => run.Write("tiny.toml", TinyRun.SensorWithPolarGap("1990-01-01", "1999-12-31"));

    public void Dispose() => run.Dispose();

    /// <summary>
    /// Origin: worked. Rows of 0.2, 0.4, 0.6 and 0.8. Outside the gap 14 cells are ice, of area 4 · 0.2 + 3 · 0.4 + 3 · 0.6
    /// + 4 · 0.8 = 7 cells; inside, Laplace's equation gives 0.4 and 0.6, one cell of area more (see PolarGapFillingTests).
    /// </summary>
    [Theory]
    [InlineData("count-as-ice", 16, 7.0, 0)]
    [InlineData("leave-out", 14, 7.0, 0)]
    [InlineData("laplace", 16, 8.0, 2)]
    public async Task Run_EachRuleOfTheGap_GivesTheWorkedTotals(string rule, int extentCells, double areaCells, int filled)
    {
        DailyRow row = await RowAsync($"[polar_gap]\nrule = \"{rule}\"", cell => 0.2 * ((cell / TinyRun.Columns) + 1));

        Assert.Equal(extentCells * Cell, row.ExtentSquareKilometers!.Value, 1e-3);
        Assert.Equal(areaCells * Cell, row.AreaSquareKilometers!.Value, 15.0);
        Assert.Equal(2 * Cell, row.PolarGapSquareKilometers, 1e-3);
        Assert.Equal(1.0, row.ObservedShare);
        Assert.Equal(0.0, row.FilledShare);
        Assert.Equal(filled, Assert.Single(Assert.Single(Record().Days).Cells).PolarGapFilled);
        Assert.Equal(0, Record().Counts.PolarGapFallbacks);
        Assert.StartsWith(rule + ": ", Daily().Metadata["polar_gap_rule"], StringComparison.Ordinal);
        Assert.Contains(rule + ": ", File.ReadAllText(GridPath, Encoding.Latin1), StringComparison.Ordinal);
    }

    /// <summary>Origin: worked. Open water all round: a filled gap holds no ice, a counted one 2 cells.</summary>
    [Theory]
    [InlineData("count-as-ice", 2)]
    [InlineData("laplace", 0)]
    public async Task Run_OpenWaterRoundTheGap_CountsItOnlyByRule(string rule, int extentCells)
    {
        DailyRow row = await RowAsync($"[polar_gap]\nrule = \"{rule}\"", _ => 0.0);

        Assert.Equal(extentCells * Cell, row.ExtentSquareKilometers!.Value, 1e-3);
        Assert.Equal(0.0, row.AreaSquareKilometers!.Value);
    }

    /// <summary>Origin: worked. Rows 0 and 1 are empty, so half of the rim: 0.6 of it is asked for, and the gap counts as ice. 7 cells of 0.5 are left.</summary>
    [Fact]
    public async Task Run_RimTooEmpty_CountsTheGapAsIceAndSaysSo()
    {
        DailyRow row = await RowAsync("[polar_gap]\nrule = \"laplace\"\nleast_rim_share = 0.6", cell => cell < 10 ? double.NaN : 0.5);

        Assert.Equal(9 * Cell, row.ExtentSquareKilometers!.Value, 1e-3);
        Assert.Equal(3.5 * Cell, row.AreaSquareKilometers!.Value, 15.0);
        Assert.Equal(1, Record().Counts.PolarGapFallbacks);
        Assert.Equal(0, Assert.Single(Assert.Single(Record().Days).Cells).PolarGapFilled);
    }

    /// <summary>
    /// Origin: worked. Cells 9 and 18 are empty. Cell 9 has five observed neighbours (3, 4, 8, 13, 14), cell 18 four (13, 14,
    /// 17, 19; cell 12 is in the gap). Everything is 0.5: with 4 both are filled, with 5 one.
    /// </summary>
    [Theory]
    [InlineData(0, 12, 0)]
    [InlineData(4, 14, 2)]
    [InlineData(5, 13, 1)]
    public async Task Run_EmptyCells_AreFilledFromEnoughNeighbours(int neighbours, int iceCells, int filled)
    {
        DailyRow row = await RowAsync($"[filling]\nneighbours = {neighbours}\n[polar_gap]\nrule = \"leave-out\"", cell => cell is 9 or 18 ? double.NaN : 0.5);

        Assert.Equal(iceCells * Cell, row.ExtentSquareKilometers!.Value, 1e-3);
        Assert.Equal(0.5 * iceCells * Cell, row.AreaSquareKilometers!.Value, 15.0);
        Assert.Equal(12.0 / 14.0, row.ObservedShare, 1e-6);
        Assert.Equal(filled / 14.0, row.FilledShare, 1e-6);
        Assert.Equal(filled, Assert.Single(Assert.Single(Record().Days).Cells).Filled);
        Assert.Equal($"{neighbours}", Daily().Metadata["filling_neighbours"]);
    }

    [Fact]
    public async Task Run_NothingObserved_FillsNothing()
    {
        DailyRow row = await RowAsync("[filling]\nneighbours = 1\n[polar_gap]\nrule = \"laplace\"", _ => double.NaN);

        Assert.Null(row.ExtentSquareKilometers);
        Assert.Equal(0.0, row.FilledShare);
        Assert.Equal(2 * Cell, row.PolarGapSquareKilometers, 1e-3);
    }

    [Fact]
    public async Task Run_OtherRuleOverTheSameArchive_IsRefused()
    {
        await RowAsync(string.Empty, _ => 0.5);
        run.WriteRunFile("[polar_gap]\nrule = \"laplace\"");

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.NotEqual(ExitCode.Done, ended.ExitCode);
        Assert.Contains("IE3001", ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_FilledDaysWithAnyNumberOfWorkers_WriteTheSameBytes()
    {
        for (int day = 0; day < 20; day++)
        {
            run.WriteDay(Day.AddDays(day), cell => (cell + day) % 7 == 0 ? double.NaN : Math.Abs(Math.Sin(cell + day)));
        }

        run.WriteRunFile("[filling]\nneighbours = 3\n[polar_gap]\nrule = \"laplace\"");
        List<SortedDictionary<string, byte[]>> archives = [];
        foreach (string workers in new[] { "1", "4" })
        {
            Assert.Equal(ExitCode.Done, (await ProgramRun.OfAsync("run", run.RunFile, "--workers", workers)).ExitCode);
            archives.Add(ArchiveFiles.Of(run.PathOf("out")));
            Directory.Delete(run.PathOf("out"), recursive: true);
        }

        ArchiveFiles.AssertSame(archives[0], archives[1]);
    }

    private string GridPath => run.PathOf("out", "grids", "method=nasa-team", "hemisphere=north", "year=1990", "1990-03-01.nc");

    private async Task<DailyRow> RowAsync(string head, Func<int, double> iceFraction)
    {
        run.WriteDay(Day, iceFraction);
        run.WriteRunFile(head);
        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);
        Assert.Equal(ExitCode.Done, ended.ExitCode);
        return Assert.Single(Daily().Rows);
    }

    private StoredDailyTable Daily() =>
        DailyTable.Read(new ArchiveLayout(run.PathOf("out")).DailyFile("nasa-team", Grids.Hemisphere.North, 1990));

    private RunRecord Record() => RunRecordFile.Read(Assert.Single(Directory.EnumerateFiles(run.PathOf("out", "runs"))));
}
