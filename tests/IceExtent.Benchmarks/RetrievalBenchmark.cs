using BenchmarkDotNet.Attributes;
using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Benchmarks;

/// <summary>What one day of one hemisphere costs between reading and totals. Budget: docs/PERFORMANCE.md.</summary>
[MemoryDiagnoser]
public class RetrievalBenchmark
{
    private DayRetrieval retrieval = null!;
    private BrightnessPlanes observed = null!;
    private ConcentrationPlanes concentration = null!;
    private CellConditions[] conditions = [];

    [Params(304 * 448, 1_216 * 1_792)] // One grid that fits in the last-level cache and one that does not.
    public int Cells { get; set; }

    [Params(0.0, 0.4)] // Share of missing cells: a branch on NaN would show here.
    public double MissingShare { get; set; }

    [GlobalSetup]
    public void Fill()
    {
        // F17 north, as in config/sensors.
        TiePoints points = new(new(184.9, 113.4, 207.1), new(248.4, 232.0, 242.3), new(220.7, 196.0, 188.5));
        Grid grid = new("bench", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(Cells, 1, 1_000.0, 0.0, 0.0));
        bool[] ocean = new bool[Cells];
        Array.Fill(ocean, true);
        retrieval = new(new NasaTeam(points), new(0.05, 0.045), new(0.05, 0.05), new CellMask(grid, ocean, null));
        observed = new(Cells, [Channel.V19, Channel.H19, Channel.V22, Channel.V37, Channel.H37]);
        concentration = new(Cells);
        conditions = new CellConditions[Cells];
        Random random = new(Seed: 20_26);
        for (int cell = 0; cell < Cells; cell++)
        {
            float ice = random.NextDouble() < MissingShare ? float.NaN : random.NextSingle();
            observed.Kelvins(Channel.V19)[cell] = 184.9f + (63.5f * ice);
            observed.Kelvins(Channel.H19)[cell] = 113.4f + (118.6f * ice);
            observed.Kelvins(Channel.V22)[cell] = 200f + (47f * ice);
            observed.Kelvins(Channel.V37)[cell] = 207.1f + (35.2f * ice);
            observed.Kelvins(Channel.H37)[cell] = 145f + (86f * ice);
        }
    }

    [Benchmark]
    public float Day()
    {
        DayRetrieval.CheckRange(observed, RangeScreen.Physical, conditions);
        retrieval.Retrieve(observed, conditions, concentration);
        return concentration.Total[^1]; // Returned so that the work cannot be removed.
    }
}
