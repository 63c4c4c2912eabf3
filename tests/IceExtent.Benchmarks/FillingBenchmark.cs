using BenchmarkDotNet.Attributes;
using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Benchmarks;

/// <summary>What filling one day of the northern 25 km grid costs, with the largest polar gap (84.5 degrees, SMMR). Budget: docs/PERFORMANCE.md.</summary>
[MemoryDiagnoser]
public class FillingBenchmark
{
    private const int Rows = 448;
    private const int Columns = 304;
    private const int LeastNeighbours = 4;
    private readonly ConcentrationPlanes planes = new(Rows * Columns);
    private float[] totals = [];
    private CellConditions[] conditions = [];
    private Grid grid = null!;
    private CellMask mask = null!;
    private PolarGapFilling gap = null!;
    private NeighbourFilling neighbours = null!;

    /// <summary>The share of cells that are empty, scattered.</summary>
    [Params(0.0, 0.02, 0.2)]
    public double EmptyShare { get; set; }

    [GlobalSetup]
    public void Fill()
    {
        grid = new(
            "bench", null, new PolarStereographic(Ellipsoid.Hughes1980, 70.0, -45.0), new GridFrame(Columns, Rows, 25_000.0, -3_850_000.0, 5_850_000.0));
        bool[] ocean = new bool[grid.CellCount];
        ocean.AsSpan().Fill(true);
        mask = new(grid, ocean, 84.5);
        Random random = new(1);
        for (int cell = 0; cell < grid.CellCount; cell++)
        {
            bool observed = mask.Conditions[cell] == CellConditions.None && random.NextDouble() >= EmptyShare;
            planes.Total[cell] = observed ? random.NextSingle() : float.NaN;
            planes.Multiyear[cell] = planes.Total[cell] / 2f;
            planes.StandardError[cell] = observed ? 0.05f : float.NaN;
            planes.Conditions[cell] = observed || mask.Conditions[cell] != CellConditions.None ? mask.Conditions[cell] : CellConditions.NoObservation;
        }

        gap = new(new PolarGapSystem(grid, mask), 0.5);
        neighbours = new(grid, LeastNeighbours);
        (totals, conditions) = (planes.Total.ToArray(), planes.Conditions.ToArray());
    }

    /// <summary>Both planes of a method that tells ice types apart: 1,788 cells.</summary>
    [Benchmark]
    public int PolarGap() => gap.Fill(planes);

    /// <summary>Finds and fills empty cells; setting the day back, two copies, is in it.</summary>
    [Benchmark]
    public int Neighbours()
    {
        totals.CopyTo(planes.Total);
        conditions.CopyTo(planes.Conditions);
        return neighbours.Fill(planes);
    }

    /// <summary>What a run pays once a sensor.</summary>
    [Benchmark]
    public int Prepare() => new PolarGapSystem(grid, mask).Cells.Length;
}
