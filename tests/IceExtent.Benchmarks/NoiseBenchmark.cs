using BenchmarkDotNet.Attributes;
using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Benchmarks;

/// <summary>What instrument noise costs a day of one hemisphere in each method. Budget: docs/PERFORMANCE.md.</summary>
[MemoryDiagnoser]
public class NoiseBenchmark
{
    private const int Cells = 304 * 448;
    private const int RunCells = 8_192; // As a day is handled.

    private readonly BrightnessPlanes observed = new(Cells, ChannelNames.All);
    private readonly ChannelNoise noise = new(ChannelNames.All.ToDictionary(channel => channel, _ => 0.5));
    private readonly float[] variance = new float[RunCells];
    private IConcentrationMethod method = null!;

    [Params(NasaTeam.MethodName, Bootstrap.MethodName, Bristol.MethodName, Polynomial89.MethodName)]
    public string Name { get; set; } = string.Empty;

    [GlobalSetup]
    public void Fill()
    {
        // F17 north, as in config/sensors.
        TiePoints points = new(new(184.9, 113.4, 207.1), new(248.4, 232.0, 242.3), new(220.7, 196.0, 188.5));
        SurfacePoints surfaces = new(Point(185.04, 208.72, 149.39), Point(252.79, 244.68, 233.25), Point(223.64, 190.14, 179.68));
        method = ConcentrationMethods.Create(Name, new(points, new(0.05, 0.045), surfaces, new(47.0, 11.7)), Hemisphere.North);
        Random random = new(Seed: 20_26);
        for (int cell = 0; cell < Cells; cell++)
        {
            float ice = random.NextSingle();
            observed.Kelvins(Channel.V19)[cell] = 184.9f + (63.5f * ice);
            observed.Kelvins(Channel.H19)[cell] = 113.4f + (118.6f * ice);
            observed.Kelvins(Channel.V37)[cell] = 207.1f + (35.2f * ice);
            observed.Kelvins(Channel.H37)[cell] = 149.4f + (83.8f * ice);
            observed.Kelvins(Channel.V89)[cell] = 240f - (15f * ice);
            observed.Kelvins(Channel.H89)[cell] = 193f + (20.3f * ice);
        }
    }

    [Benchmark]
    public float Day()
    {
        for (int start = 0; start < Cells; start += RunCells)
        {
            CellRange run = new(start, Math.Min(RunCells, Cells - start));
            method.WriteNoiseVariance(observed, run, noise, variance.AsSpan(0, run.Length));
        }

        return variance[0]; // Returned so that the work cannot be removed.
    }

    private static ChannelKelvins Point(double v19, double v37, double h37) =>
        new(new Dictionary<Channel, double> { [Channel.V19] = v19, [Channel.V37] = v37, [Channel.H37] = h37 });
}
