using BenchmarkDotNet.Attributes;
using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Statistics;

namespace IceExtent.Benchmarks;

/// <summary>What the totals of one day of one hemisphere cost, and their standard errors. Budget: docs/PERFORMANCE.md.</summary>
[MemoryDiagnoser]
public class TotalsBenchmark
{
    private const int Rows = 448;
    private const int Columns = 304;
    private TotalsRegion region = null!;
    private TotalsUncertainty uncertainty = null!;
    private float[] fraction = [];
    private float[] error = [];
    private CellConditions[] conditions = [];

    [GlobalSetup]
    public void Fill()
    {
        Grid grid = new(
            "bench", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(Columns, Rows, 25_000.0, -3_850_000.0, 5_850_000.0));
        bool[] ocean = new bool[grid.CellCount];
        fraction = new float[grid.CellCount];
        error = new float[grid.CellCount];
        conditions = new CellConditions[grid.CellCount];
        for (int cell = 0; cell < grid.CellCount; cell++)
        {
            ocean[cell] = cell / Columns % 3 > 0; // About the share of ocean of the northern grid.
            double ice = Math.Clamp((grid.LatitudesDegrees[cell] - 70.0) / 4.0, 0.0, 1.0); // Open water, a belt of mixed ice, pack.
            fraction[cell] = ocean[cell] ? (float)ice : float.NaN;
            error[cell] = ocean[cell] ? 0.05f : float.NaN;
        }

        region = TotalsRegion.Hemisphere(grid, ocean);
        uncertainty = new(new ErrorCorrelation(grid, 300_000.0, 54_500.0, 100_000.0));
    }

    [Benchmark]
    public double Sums() => DailyTotals.Sum(region, fraction, conditions, new(0.15, 0.8)).Extent;

    [Benchmark]
    public double StandardErrors() => uncertainty.StandardErrorsSquareMeters(region, fraction, error, 0.15).Extent;
}
