using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Everything that days share and nobody changes: retrievals by source and method, regions, error correlation.</summary>
internal sealed class DayPreparation
{
    private readonly DayRetrieval[][] retrievals;

    public DayPreparation(RunSettings settings)
    {
        Settings = settings;
        Regions = [TotalsRegion.Hemisphere(settings.Grid, settings.Ocean)];
        Correlation = new(settings.Grid, settings.ErrorLengthMeters);
        Dictionary<double, CellMask> masks = [];
        retrievals = [.. settings.Sources.Select(source => Retrievals(source, masks))];
    }

    public RunSettings Settings { get; }

    public IReadOnlyList<TotalsRegion> Regions { get; }

    public ErrorCorrelation Correlation { get; }

    /// <summary>One retrieval a method, in the run's order.</summary>
    public IReadOnlyList<DayRetrieval> RetrievalsOf(int source) => retrievals[source];

    private DayRetrieval[] Retrievals(RunSource source, Dictionary<double, CellMask> masks)
    {
        double gap = source.Sensor.PolarGapLatitudeDegrees ?? double.PositiveInfinity;
        if (!masks.TryGetValue(gap, out CellMask? mask))
        {
            mask = new(Settings.Grid, Settings.Ocean, source.Sensor.PolarGapLatitudeDegrees);
            masks.Add(gap, mask);
        }

        HemisphereTuning tuning = source.Sensor.In(Settings.Grid.Hemisphere);
        return [.. Settings.Methods.Select(name =>
            new DayRetrieval(ConcentrationMethods.Create(name, tuning, Settings.Grid.Hemisphere), tuning.Screens, source.Sensor.Scatter, mask))];
    }
}
