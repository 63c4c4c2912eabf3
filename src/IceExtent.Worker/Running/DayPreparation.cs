using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Everything that days share and nobody changes: retrievals by source and method, filling, regions, error correlation.</summary>
internal sealed class DayPreparation
{
    private readonly DayRetrieval[][] retrievals;
    private readonly PolarGapSystem?[] gaps;

    public DayPreparation(RunSettings settings)
    {
        Settings = settings;
        Regions = [TotalsRegion.Hemisphere(settings.Grid, settings.Ocean)];
        Correlation = new(settings.Grid, settings.ErrorLengthMeters);
        Neighbours = settings.LeastNeighbours > 0 ? new(settings.Grid, settings.LeastNeighbours) : null;
        Dictionary<double, SharedMask> masks = [];
        SharedMask[] maskOfSource = [.. settings.Sources.Select(source => MaskOf(source.Sensor.PolarGapLatitudeDegrees, masks))];
        retrievals = [.. settings.Sources.Select((source, index) => Retrievals(source, maskOfSource[index].Mask))];
        gaps = [.. maskOfSource.Select(shared => shared.Gap)];
    }

    public RunSettings Settings { get; }

    public IReadOnlyList<TotalsRegion> Regions { get; }

    public ErrorCorrelation Correlation { get; }

    /// <summary>Fills isolated cells, or null where the run does not.</summary>
    public NeighbourFilling? Neighbours { get; }

    /// <summary>The gap of a source's sensor, or null where there is nothing to fill.</summary>
    public PolarGapSystem? PolarGapOf(int source) => gaps[source];

    /// <summary>One retrieval a method, in the run's order.</summary>
    public IReadOnlyList<DayRetrieval> RetrievalsOf(int source) => retrievals[source];

    private SharedMask MaskOf(double? gapLatitudeDegrees, Dictionary<double, SharedMask> masks)
    {
        double key = gapLatitudeDegrees ?? double.PositiveInfinity;
        if (!masks.TryGetValue(key, out SharedMask? shared))
        {
            CellMask mask = new(Settings.Grid, Settings.Ocean, gapLatitudeDegrees);
            PolarGapSystem? gap = Settings.Rules.PolarGap == PolarGapRule.Laplace ? new(Settings.Grid, mask) : null;
            shared = new(mask, gap is { Cells.Length: > 0 } ? gap : null);
            masks.Add(key, shared);
        }

        return shared;
    }

    private DayRetrieval[] Retrievals(RunSource source, CellMask mask)
    {
        HemisphereTuning tuning = source.Sensor.In(Settings.Grid.Hemisphere);
        return [.. Settings.Methods.Select(name =>
            new DayRetrieval(ConcentrationMethods.Create(name, tuning, Settings.Grid.Hemisphere), tuning.Screens, source.Sensor.Scatter, mask))];
    }

    private sealed record SharedMask(CellMask Mask, PolarGapSystem? Gap);
}
