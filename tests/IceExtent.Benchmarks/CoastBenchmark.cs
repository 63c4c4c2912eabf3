using BenchmarkDotNet.Attributes;
using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Storage.Reading;
using IceExtent.TestKit;

namespace IceExtent.Benchmarks;

/// <summary>What the coast corrections of one day cost on a real coast. Figures: docs/PERFORMANCE.md.</summary>
[MemoryDiagnoser]
public class CoastBenchmark
{
    private static readonly Channel[] Channels = [Channel.V19, Channel.H19, Channel.V22, Channel.V37, Channel.H37];

    private Grid grid = null!;
    private LandShare land = null!;
    private bool[] ocean = [];
    private BrightnessPlanes observed = null!;
    private ConcentrationPlanes concentration = null!;
    private CellConditions[] conditions = [];
    private CoastBrightness brightness = null!;
    private CoastMinimumStep minimum = null!;
    private CoastSpillStep spill = null!;

    [Params("north-25km", "north-12.5km")]
    public string GridName { get; set; } = string.Empty;

    [GlobalSetup]
    public void Fill()
    {
        grid = ConfigGrids.Get(GridName);
        land = LandShareFile.Read(ConfigGrids.LandFile(GridName), grid);
        ocean = land.OceanBelow(0.5);
        observed = new(grid.CellCount, Channels);
        conditions = new CellConditions[grid.CellCount];
        concentration = new(grid.CellCount);
        foreach (Channel channel in Channels)
        {
            observed.Kelvins(channel).Fill(250f); // Sea like land: the correction changes no value, so each call does the same.
        }

        brightness = Prepare();
        CoastMinimumRules rules = new(new(0.6, 7), new(0.4, 5), new(0.2, 3), 0.15, 3);
        minimum = new(new(grid, ocean), Enumerable.Repeat(1e-9f, grid.CellCount).ToArray(), rules); // Too little to change a total.
        spill = new(grid, land, ocean, new(0.9, 7));
        for (int cell = 0; cell < grid.CellCount; cell++)
        {
            concentration.Total[cell] = ocean[cell] ? cell % 7 / 6f : float.NaN;
        }
    }

    /// <summary>Once a sensor and grid.</summary>
    [Benchmark]
    public CoastBrightness Prepare() => new(
        grid, land, ocean, Channels.ToDictionary(channel => channel, channel => channel is Channel.V37 or Channel.H37 ? 32_190.0 : 54_470.0), RangeScreen.Physical, new(0.01, 0.9, 0.2, new(100_000.0, 0.95, 1e6, 9, 5.0, 1e-5, 2.0, 4.0, 30.0)));

    [Benchmark]
    public int Brightness() => brightness.Correct(observed, conditions);

    [Benchmark]
    public int Minimum()
    {
        concentration.Conditions.Clear();
        return minimum.Correct(concentration);
    }

    /// <summary>After the first call nothing is left to lower: what is timed is the search.</summary>
    [Benchmark]
    public int Spill() => spill.Correct(concentration);
}
