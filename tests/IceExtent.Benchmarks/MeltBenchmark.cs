using BenchmarkDotNet.Attributes;
using IceExtent.Statistics.Seasons;

namespace IceExtent.Benchmarks;

/// <summary>What the melt dates of an ice year cost in cells that all have ice. Budget: docs/PERFORMANCE.md.</summary>
[MemoryDiagnoser]
public class MeltBenchmark
{
    private const int Cells = 256;
    private const int Days = 380;

    private readonly float[] range = new float[Cells * Days];
    private readonly float[] vertical19 = new float[Cells * Days];
    private readonly float[] vertical37 = new float[Cells * Days];
    private readonly float[] ice = new float[Cells * Days];
    private readonly MeltWorkspace room = new(Days);
    private readonly SeriesDays lie = new(12, 0, Days - 1);
    private MeltWindows windows;
    private MeltRules rules = null!;

    [Params(0.0, 0.4)] // Share of missing days.
    public double MissingShare { get; set; }

    [GlobalSetup]
    public void Fill()
    {
        // As in config/defaults.toml.
        MeltCalendar calendar = new(new(new(3, 11), new(8, 31)), new(new(3, 1), new(3, 31)), new(new(7, 1), new(12, 15)), new(new(1, 15), new(2, 28)));
        rules = new(
            calendar, 0.5, 3, new(4.0, -10.0, 10, 5, 7.5, 2, 2.0, 2),
            new(new(1.0, 3.0), new(1.0, 0.003), new(1.0, 5.0), new(1.0, 1.5), 5, 10.0, 1.5, 5, 3, 31, 10, 2, 14));
        windows = calendar.In(new IceYearStart(3, 1).Beginning(2003));
        Random random = new(Seed: 20_26);
        for (int cell = 0; cell < Cells; cell++)
        {
            // First-year ice, whose range is often near the limit, and multiyear ice; wet from June to September.
            (float dryRange, float dry37) = cell % 2 == 0 ? (5f, 241f) : (20f, 200f);
            int onset = 80 + random.Next(60), freeze = 180 + random.Next(30);
            for (int day = 0; day < Days; day++)
            {
                int at = (cell * Days) + day;
                bool wet = day >= onset && day < freeze;
                bool missing = random.NextDouble() < MissingShare;
                range[at] = (wet ? -8f : dryRange) + (2f * random.NextSingle());
                vertical19[at] = missing ? float.NaN : (wet ? 258f : 250f) + random.NextSingle();
                vertical37[at] = (wet ? 259f : dry37) + (3f * random.NextSingle());
                ice[at] = missing ? float.NaN : 0.95f;
            }
        }
    }

    [Benchmark(OperationsPerInvoke = Cells * Days)]
    public int HorizontalRange()
    {
        int sum = 0;
        for (int cell = 0; cell < Cells; cell++)
        {
            sum += HorizontalRangeMelt.Onset(Of(cell), lie, windows, rules, room).Day ?? 0;
        }

        return sum; // Returned so that the work cannot be removed.
    }

    [Benchmark(OperationsPerInvoke = Cells * Days)]
    public int Indicators()
    {
        int sum = 0;
        for (int cell = 0; cell < Cells; cell++)
        {
            sum += IndicatorMelt.Dates(Of(cell), lie, windows, rules, room).ContinuousMelt.Day ?? 0;
        }

        return sum;
    }

    private MeltSeries Of(int cell) => new(
        range.AsSpan(cell * Days, Days), vertical19.AsSpan(cell * Days, Days), vertical37.AsSpan(cell * Days, Days), ice.AsSpan(cell * Days, Days));
}
