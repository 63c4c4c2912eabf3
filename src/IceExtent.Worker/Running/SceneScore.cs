using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes;
using IceExtent.Statistics;
using IceExtent.Statistics.Scoring;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>One day of a scene by every method.</summary>
/// <param name="Date">The day.</param>
/// <param name="Methods">In the order asked for: the score, and the standard error of extent in m².</param>
internal sealed record ScoredDay(DateOnly Date, IReadOnlyList<(DayScore Score, double ExtentError)> Methods);

/// <summary>Runs methods on days of an invented scene and holds them against its truth, without writing anything.</summary>
internal sealed class SceneScore
{
    private readonly Scene scene;
    private readonly TotalsRules rules;
    private readonly RetrievalChoices choices;
    private readonly SourceRetrieval source;
    private readonly TotalsRegion region;
    private readonly ErrorCorrelation correlation;
    private readonly ErrorLengths lengths;

    /// <summary>Prepares the methods.</summary>
    /// <param name="scene">The scene.</param>
    /// <param name="land">The land of its grid.</param>
    /// <param name="methods">Their names; the sensor has the surfaces of each.</param>
    /// <param name="defaults">Limits, error length, coast correction, screens.</param>
    public SceneScore(Scene scene, LandShare land, IReadOnlyList<string> methods, SceneDefaults defaults)
    {
        (this.scene, rules) = (scene, defaults.Rules);
        bool[] ocean = land.OceanBelow(defaults.LandLimitFraction);
        choices = new(scene.Grid, ocean, land, methods, defaults.Coast, defaults.Smearing, defaults.TiePoints, defaults.Weather);
        CellMask mask = new(scene.Grid, ocean, scene.Sensor.PolarGapLatitudeDegrees);
        ICoastStep? step = defaults.Coast.InConcentrations
            ? new CoastSpillStep(scene.Grid, land, ocean, defaults.Coast.Spill)
            : null;
        source = new(choices, scene.Sensor, [.. scene.Channels], mask, step);
        region = TotalsRegion.Hemisphere(scene.Grid, ocean);
        lengths = defaults.ErrorLengths;
        correlation = new(scene.Grid, lengths.FarMeters, lengths.FootprintMeters, lengths.MissedIceMeters);
    }

    /// <summary>The ocean cells that are summed.</summary>
    public TotalsRegion Region => region;

    /// <summary>Scores days, several at a time; the result does not depend on how many.</summary>
    /// <param name="days">The days; missing ones are left out.</param>
    /// <param name="workers">How many at a time.</param>
    /// <param name="cancellation">Stops.</param>
    /// <param name="look">Shown each day by each method, on the thread that made it; keeps nothing of what it is shown.</param>
    public IReadOnlyList<ScoredDay> Run(
        IEnumerable<DateOnly> days, int workers, CancellationToken cancellation, Action<DateOnly, int, ConcentrationPlanes>? look = null)
    {
        DateOnly[] seen = [.. days.Where(day => !scene.IsMissing(day))];
        ScoredDay[] scored = new ScoredDay[seen.Length];
        using ThreadLocal<Bench> benches = new(() => new Bench(scene, source, correlation, lengths));
        ParallelOptions options = new() { MaxDegreeOfParallelism = workers, CancellationToken = cancellation };
        Dictionary<DateOnly, DaySamples> samples = Samples(seen, benches, options);
        Parallel.For(0, seen.Length, options, index => scored[index] = Score(seen[index], Tune(seen[index], samples), benches.Value!, look));
        return scored;
    }

    // Of every day that a window reaches, those before and after the period included.
    private Dictionary<DateOnly, DaySamples> Samples(DateOnly[] days, ThreadLocal<Bench> benches, ParallelOptions options)
    {
        if (!choices.TiePoints.NeedsSamples(choices.Methods))
        {
            return [];
        }

        TuningRules tuning = choices.TiePoints.Rules;
        DateOnly[] reached =
        [
            .. days.SelectMany(day => Enumerable.Range(-tuning.DaysBehind, tuning.DaysBehind + tuning.DaysAhead + 1).Select(day.AddDays))
                .Distinct()
                .Where(day => !scene.IsMissing(day))
                .Order(),
        ];
        DaySamples[] taken = new DaySamples[reached.Length];
        Parallel.For(0, reached.Length, options, index => taken[index] = benches.Value!.Sample(reached[index]));
        return reached.Zip(taken).ToDictionary(pair => pair.First, pair => pair.Second);
    }

    private TunedDay? Tune(DateOnly day, Dictionary<DateOnly, DaySamples> samples)
    {
        TuningRules tuning = choices.TiePoints.Rules;
        return samples.Count == 0 ? null : source.Tune(
            [.. Enumerable.Range(-tuning.DaysBehind, tuning.DaysBehind + tuning.DaysAhead + 1).Select(day.AddDays).Where(samples.ContainsKey).Select(near => samples[near])]);
    }

    private ScoredDay Score(DateOnly day, TunedDay? tuned, Bench bench, Action<DateOnly, int, ConcentrationPlanes>? look)
    {
        bench.Observe(day);
        scene.Melt(day, bench.Workspace, bench.Melting);
        scene.Truth(day, bench.Workspace, bench.Truth);
        IReadOnlyList<DayRetrieval> retrievals = source.RetrievalsWith(tuned);
        (DayScore, double)[] methods = new (DayScore, double)[retrievals.Count];
        for (int method = 0; method < methods.Length; method++)
        {
            retrievals[method].Retrieve(bench.Observed, bench.Conditions, bench.Concentration, choices.Weather.MaskOf(day));
            source.Coast?.WidenErrors(bench.Concentration);
            look?.Invoke(day, method, bench.Concentration);
            bench.Edge.Smear(bench.Concentration.Total, bench.Concentration.Unscreened, rules.IceFraction);
            methods[method] = (
                DayScore.Of(scene.Grid, region, bench.Concentration.Total, bench.Concentration.StandardError, bench.Truth.Concentration, rules, bench.Melting),
                bench.Uncertainty.StandardErrorsSquareMeters(
                    region,
                    bench.Concentration.Total,
                    bench.Concentration.StandardError,
                    rules.IceFraction,
                    retrievals[method].SurfaceScatter,
                    lengths.EdgeFactor * bench.Edge.ExtentSquareMeters(region)).Extent);
        }

        return new(day, methods);
    }

    // What one thread needs for a day.
    private sealed class Bench(Scene scene, SourceRetrieval source, ErrorCorrelation correlation, ErrorLengths lengths)
    {
        private readonly Lazy<SurfaceSampling> sampling = new(source.MakeSampling);

        public SceneWorkspace Workspace { get; } = scene.CreateWorkspace();

        public SceneTruth Truth { get; } = new(scene.Grid.CellCount);

        public float[] Melting { get; } = new float[scene.Grid.CellCount];

        public BrightnessPlanes Observed { get; } = new(scene.Grid.CellCount, source.Channels);

        public CellConditions[] Conditions { get; } = new CellConditions[scene.Grid.CellCount];

        public ConcentrationPlanes Concentration { get; } = new(scene.Grid.CellCount);

        public TotalsUncertainty Uncertainty { get; } = new(correlation);

        public EdgeShift Edge { get; } = new(scene.Grid, lengths.FootprintMeters);

        public void Observe(DateOnly day)
        {
            scene.Observe(day, Workspace, Observed);
            DayRetrieval.CheckRange(Observed, scene.Sensor.Range, Conditions);
            source.Coast?.Correct(Observed, Conditions);
        }

        public DaySamples Sample(DateOnly day)
        {
            Observe(day);
            return sampling.Value.Take(Observed, Conditions);
        }
    }
}
