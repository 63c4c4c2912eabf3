using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Statistics.Overlaps;
using IceExtent.Storage.Faults;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Retrieves the days that two sources both have with both, and collects how totals and temperatures differ. Fills nothing.</summary>
/// <remarks>
/// Totals are compared with the run file's offsets taken off both. Temperatures are compared with the offsets taken off the
/// earlier source alone, so that what comes out is what the run file should say of the later one, whatever it says now.
/// </remarks>
internal sealed class SensorComparison
{
    private static readonly Channel[] SurfaceChannels = [Channel.V19, Channel.H19, Channel.V37];

    private readonly RunSettings settings;
    private readonly DayPreparation preparation;
    private readonly PureCells pure;
    private readonly ComparedSurface[] surfaces;
    private readonly float[] differences;
    private readonly int surfaceMethod;
    private readonly Dictionary<int, Bench> benches = [];
    private readonly SampleSeries?[] samples;

    /// <summary>Prepares the comparison.</summary>
    /// <param name="settings">The run.</param>
    /// <param name="days">The days that will be compared, at least one, in date order.</param>
    /// <param name="cancellation">Stops the sampling of moving tie points.</param>
    /// <exception cref="ConfigurationException">A source cannot tell pure surfaces.</exception>
    public SensorComparison(RunSettings settings, IReadOnlyList<OverlapDay> days, CancellationToken cancellation)
    {
        this.settings = settings;
        CheckChannels(settings);
        bool named = settings.Methods.Contains(NasaTeam.MethodName);
        preparation = new(named ? settings : settings with { Methods = [.. settings.Methods, NasaTeam.MethodName] });
        surfaceMethod = preparation.Settings.Methods.ToList().IndexOf(NasaTeam.MethodName);
        samples = SamplesOf(days, cancellation);
        pure = new(settings.Grid, settings.Land, settings.Overlap.Cells);
        surfaces = new ComparedSurface[settings.Grid.CellCount];
        differences = new float[settings.Grid.CellCount];
    }

    /// <summary>Compares every pair of sources of one day.</summary>
    /// <param name="day">The day.</param>
    /// <param name="into">Receives the differences.</param>
    /// <param name="faults">Receives a fault for each input that cannot be read: it costs the day's pairs with that source.</param>
    public void Compare(OverlapDay day, SensorSeries into, List<Fault> faults)
    {
        List<Bench> read = [];
        foreach ((OpenedSource source, Storage.Reading.SourceDay input) in day.Inputs)
        {
            Bench bench = BenchOf(source);
            try
            {
                source.Reader.Read(input, bench.Observed);
                bench.Prepare(preparation.Of(source), samples[source.Index]?.Tune(new(0, source, input)));
                read.Add(bench);
            }
            catch (FaultException unreadable)
            {
                faults.Add(unreadable.Fault);
            }
        }

        for (int method = 0; method < preparation.Settings.Methods.Count; method++)
        {
            read.ForEach(bench => bench.Retrieve(method, settings.Weather.MaskOf(day.Date)));
            foreach ((Bench earlier, Bench later) in Pairs(read))
            {
                SensorPair pair = new(
                    earlier.Source.Index + 1, earlier.Source.Settings.Sensor.Name, later.Source.Index + 1, later.Source.Settings.Sensor.Name);
                if (method < settings.Methods.Count)
                {
                    CompareTotals(day.Date, settings.Methods[method], pair, earlier, later, into);
                }

                if (method == surfaceMethod)
                {
                    CompareTemperatures(day.Date, pair, earlier, later, into);
                }
            }
        }
    }

    private static IEnumerable<(Bench Earlier, Bench Later)> Pairs(List<Bench> read) =>
        read.SelectMany((_, index) => read.Skip(index + 1), (earlier, later) => (earlier, later));

    private void CompareTotals(DateOnly date, string method, SensorPair pair, Bench earlier, Bench later, SensorSeries into)
    {
        double limit = settings.Rules.IceFraction;
        foreach (TotalsRegion region in preparation.Regions)
        {
            CommonTotals common = CommonTotals.Sum(region, earlier.Concentration.Total, later.Concentration.Total, limit);
            DailyTotals one = DailyTotals.Sum(region, earlier.Concentration.Total, earlier.Concentration.Conditions, settings.Rules);
            DailyTotals other = DailyTotals.Sum(region, later.Concentration.Total, later.Concentration.Conditions, settings.Rules);
            if (common.Common > 0.0)
            {
                into.AddTotals(
                    new(pair, method, region.Name),
                    date,
                    (common.SecondExtent - common.FirstExtent, common.SecondIceArea - common.FirstIceArea),
                    (other.Extent - one.Extent, other.IceArea - one.IceArea));
            }
        }
    }

    private void CompareTemperatures(DateOnly date, SensorPair pair, Bench earlier, Bench later, SensorSeries into)
    {
        pure.Find(earlier.Concentration.Total, later.Concentration.Total, surfaces);
        foreach (Channel channel in earlier.Observed.Channels.Where(later.Observed.Has))
        {
            double removed = later.Source.Settings.Offsets?.Kelvins.GetValueOrDefault(channel) ?? 0.0;
            foreach (ComparedSurface surface in SensorSeries.Surfaces)
            {
                int cells = Gather(surface, earlier.Observed.Kelvins(channel), later.Observed.Kelvins(channel));
                if (cells >= settings.Overlap.LeastCells)
                {
                    double centre = TrimmedMean.Of(differences.AsSpan(0, cells), settings.Overlap.TrimFraction);
                    into.AddTemperatures(new(pair, channel, surface), date, centre + removed, cells);
                }
            }
        }
    }

    private int Gather(ComparedSurface surface, ReadOnlySpan<float> earlier, ReadOnlySpan<float> later)
    {
        int cells = 0;
        for (int cell = 0; cell < surfaces.Length; cell++)
        {
            float difference = later[cell] - earlier[cell];
            if (surfaces[cell] == surface && !float.IsNaN(difference))
            {
                differences[cells++] = difference;
            }
        }

        return cells;
    }

    // Where tie points move, each source has those that its own days give, as if it ruled them all.
    private SampleSeries?[] SamplesOf(IReadOnlyList<OverlapDay> days, CancellationToken cancellation)
    {
        RunSettings all = preparation.Settings;
        if (!all.TiePoints.NeedsSamples(all.Methods))
        {
            return new SampleSeries?[all.Sources.Count];
        }

        RunPlan wide = RunPlanner.Plan(
            all, days[0].Date.AddDays(-all.TiePoints.Rules.DaysBehind), days[^1].Date.AddDays(all.TiePoints.Rules.DaysAhead), cancellation);
        return
        [
            .. wide.Offers.Select(offer => SampleSeries.Take(
                preparation, [.. offer.Days.Select((day, order) => new PlannedDay(order, offer.Source, day))], Environment.ProcessorCount, cancellation)),
        ];
    }

    private Bench BenchOf(OpenedSource source)
    {
        if (!benches.TryGetValue(source.Index, out Bench? bench))
        {
            bench = new(source, settings.Grid.CellCount);
            benches.Add(source.Index, bench);
        }

        return bench;
    }

    private static void CheckChannels(RunSettings settings)
    {
        Fault[] faults =
        [
            .. settings.Sources.SelectMany((source, index) => SurfaceChannels
                .Where(channel => !source.Description.Channels.ContainsKey(channel))
                .Select(channel => new Fault(
                    "IE1009",
                    $"{settings.RunFile} (source[{index + 1}].channels)",
                    $"no {ChannelNames.NameOf(channel)}, by which sensors are compared over pure surfaces",
                    string.Join(", ", SurfaceChannels.Select(ChannelNames.NameOf)),
                    "Map the channel to its variable."))),
        ];
        if (faults.Length > 0)
        {
            throw new ConfigurationException(faults);
        }
    }

    // One source's planes of the day in hand.
    private sealed class Bench(OpenedSource source, int cellCount)
    {
        private readonly CellConditions[] conditions = new CellConditions[cellCount];
        private IReadOnlyList<DayRetrieval> retrievals = [];

        public OpenedSource Source => source;

        public BrightnessPlanes Observed { get; } = new(cellCount, source.Settings.Description.Channels.Keys);

        public ConcentrationPlanes Concentration { get; } = new(cellCount);

        public void Prepare(SourceRetrieval shared, TunedDay? tuned)
        {
            DayRetrieval.CheckRange(Observed, source.Settings.Sensor.Range, conditions);
            source.Settings.Offsets?.Subtract(Observed);
            shared.Coast?.Correct(Observed, conditions);
            retrievals = shared.RetrievalsWith(tuned);
        }

        public void Retrieve(int method, MonthMask? month) => retrievals[method].Retrieve(Observed, conditions, Concentration, month);
    }
}
