using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Everything that days share and nobody changes: retrievals by source, filling, regions, error correlation.</summary>
internal sealed class DayPreparation
{
    private readonly Dictionary<double, SharedMask> masks = [];
    private readonly SourceRetrieval[] sources;
    private readonly PolarGapSystem?[] gaps;
    private readonly CellMask[] cellMasks;

    public DayPreparation(RunSettings settings)
    {
        Settings = settings;
        Regions = [TotalsRegion.Hemisphere(settings.Grid, settings.Ocean), .. settings.Regions.Regions.Select(region => TotalsRegion.Part(settings.Grid, region))];
        Places = [.. settings.Places.Places.Select(place => (place, TotalsRegion.Around(settings.Grid, place)))];
        Correlation = new(settings.Grid, settings.ErrorLengths.FarMeters, settings.ErrorLengths.FootprintMeters, settings.ErrorLengths.MissedIceMeters);
        Neighbours = settings.LeastNeighbours > 0 ? new(settings.Grid, settings.LeastNeighbours) : null;
        Days = settings.DayFilling is { } rules ? new(rules) : null;
        ICoastStep? coast = settings.Coast.InConcentrations ? ConcentrationStep() : null;
        RetrievalChoices choices = new(
            settings.Grid, settings.Ocean, settings.Land, settings.Methods, settings.Coast, settings.Smearing, settings.TiePoints, settings.Weather)
        {
            Further = settings.Melt.Signals ? MeltSettings.SignalChannels : [],
        };
        sources = [.. settings.Sources.Select(source => new SourceRetrieval(choices, source.Sensor, [.. source.Description.Channels.Keys], MaskOf(source).Mask, coast, source.Offsets))];
        cellMasks = [.. settings.Sources.Select(source => MaskOf(source).Mask)];
        gaps = [.. settings.Sources.Select(source => MaskOf(source).Gap)];
    }

    public RunSettings Settings { get; }

    /// <summary>The whole hemisphere, then the regions of the run.</summary>
    public IReadOnlyList<TotalsRegion> Regions { get; }

    /// <summary>The places of the run, each with the areas of its cells.</summary>
    public IReadOnlyList<(GridPlace Place, TotalsRegion Cells)> Places { get; }

    public ErrorCorrelation Correlation { get; }

    /// <summary>Fills isolated cells, or null where the run does not.</summary>
    public NeighbourFilling? Neighbours { get; }

    /// <summary>Fills cells from days before and after, or null where the run does not.</summary>
    public DayFilling? Days { get; }

    /// <summary>Land and polar gap of a source.</summary>
    public CellMask MaskOf(int source) => cellMasks[source];

    /// <summary>The gap of a source's sensor, or null where there is nothing to fill.</summary>
    public PolarGapSystem? PolarGapOf(int source) => gaps[source];

    /// <summary>What the days of a source share.</summary>
    public SourceRetrieval Of(OpenedSource source) => sources[source.Index];

    private ICoastStep ConcentrationStep() => Settings.Coast.MinimumFraction is { } minima
        ? new CoastMinimumStep(new(Settings.Grid, Settings.Ocean), minima, Settings.Coast.Minimum)
        : new CoastSpillStep(Settings.Grid, Settings.Land, Settings.Ocean, Settings.Coast.Spill);

    // Sensors with the same gap share a mask.
    private SharedMask MaskOf(RunSource source)
    {
        double? gapLatitudeDegrees = source.Sensor.PolarGapLatitudeDegrees;
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

    private sealed record SharedMask(CellMask Mask, PolarGapSystem? Gap);
}
