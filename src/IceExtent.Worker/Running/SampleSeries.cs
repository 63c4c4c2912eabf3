using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>The samples of every day of a period, and the tie points they give each day.</summary>
/// <remarks>A first pass over the days, before any is retrieved. It keeps counts, centres and covariances alone: about a kilobyte a day.</remarks>
internal sealed class SampleSeries
{
    private readonly DayPreparation preparation;
    private readonly Dictionary<DateOnly, (int Source, DaySamples Samples)> byDate = [];

    private SampleSeries(DayPreparation preparation) => this.preparation = preparation;

    /// <summary>Takes the samples that a run needs: of its days and of those round them.</summary>
    /// <param name="preparation">What days share.</param>
    /// <param name="plan">The days of the run.</param>
    /// <param name="wanted">The period asked for.</param>
    /// <param name="workers">How many days are read at a time.</param>
    /// <param name="cancellation">Stops after the days in hand.</param>
    /// <returns>The samples, or null where no tie point moves.</returns>
    public static SampleSeries? For(
        DayPreparation preparation, RunPlan plan, (DateOnly? From, DateOnly? To) wanted, int workers, CancellationToken cancellation)
    {
        RunSettings settings = preparation.Settings;
        IReadOnlyList<PlannedDay> reads = plan.Reads;
        if (!settings.TiePoints.NeedsSamples(settings.Methods) || reads.Count == 0)
        {
            return null;
        }

        // A day's tie points must not depend on the period asked for, or a night's numbers would not be those of the whole record.
        TuningRules rules = settings.TiePoints.Rules;
        RunPlan wide = wanted == (null, null)
            ? plan
            : RunPlanner.Plan(settings, reads[0].Date.AddDays(-rules.DaysBehind), reads[^1].Date.AddDays(rules.DaysAhead), cancellation);
        return Take(preparation, wide.Days, workers, cancellation);
    }

    /// <summary>Takes the samples of some days, several at a time; the result does not depend on how many.</summary>
    /// <param name="preparation">What days share.</param>
    /// <param name="days">The days, those round the period asked for included.</param>
    /// <param name="workers">How many days are read at a time.</param>
    /// <param name="cancellation">Stops after the days in hand.</param>
    /// <remarks>A day that cannot be read gives no samples: the retrieval says why.</remarks>
    public static SampleSeries Take(DayPreparation preparation, IReadOnlyList<PlannedDay> days, int workers, CancellationToken cancellation)
    {
        DaySamples?[] taken = new DaySamples?[days.Count];
        using ThreadLocal<Sampler> samplers = new(() => new Sampler(preparation));
        Parallel.For(0, days.Count, new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = cancellation }, index =>
            taken[index] = samplers.Value!.Take(days[index]));
        SampleSeries series = new(preparation);
        for (int index = 0; index < taken.Length; index++)
        {
            if (taken[index] is { } samples)
            {
                series.byDate.Add(days[index].Date, (days[index].Source.Index, samples));
            }
        }

        return series;
    }

    /// <summary>The tie points of a day, from the days round it that the same source rules.</summary>
    public TunedDay Tune(PlannedDay day)
    {
        TuningRules rules = preparation.Settings.TiePoints.Rules;
        List<DaySamples> window = [];
        for (int apart = -rules.DaysBehind; apart <= rules.DaysAhead; apart++)
        {
            if (byDate.TryGetValue(day.Date.AddDays(apart), out (int Source, DaySamples Samples) near) && near.Source == day.Source.Index)
            {
                window.Add(near.Samples);
            }
        }

        return preparation.Of(day.Source).Tune(window);
    }

    private sealed class Sampler(DayPreparation preparation)
    {
        private readonly DayReader reader = new(preparation);
        private readonly Dictionary<int, SurfaceSampling> samplings = [];

        public DaySamples? Take(PlannedDay day)
        {
            if (!samplings.TryGetValue(day.Source.Index, out SurfaceSampling? sampling))
            {
                sampling = preparation.Of(day.Source).MakeSampling();
                samplings.Add(day.Source.Index, sampling);
            }

            try
            {
                ObservedDay observed = reader.Read(day);
                return sampling.Take(observed.Planes, observed.Conditions);
            }
            catch (FaultException)
            {
                return null;
            }
        }
    }
}
