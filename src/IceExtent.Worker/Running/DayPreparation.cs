using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Everything that days share and nobody changes: retrievals by source and method, filling, regions, error correlation.</summary>
internal sealed class DayPreparation
{
    private readonly Dictionary<double, SharedMask> masks = [];
    private readonly Channel[][] channels;
    private readonly DayRetrieval[][] retrievals;
    private readonly PolarGapSystem?[] gaps;
    private readonly CoastBrightness?[] coasts;

    public DayPreparation(RunSettings settings)
    {
        Settings = settings;
        Regions = [TotalsRegion.Hemisphere(settings.Grid, settings.Ocean)];
        Correlation = new(settings.Grid, settings.ErrorLengthMeters);
        Neighbours = settings.LeastNeighbours > 0 ? new(settings.Grid, settings.LeastNeighbours) : null;
        channels = [.. settings.Sources.Select(Needed)];
        ICoastStep? coast = settings.Coast.Correction == CoastCorrection.Concentration ? ConcentrationStep() : null;
        retrievals = [.. settings.Sources.Select(source => Retrievals(source, coast))];
        coasts = [.. settings.Sources.Select(source => settings.Coast.Correction == CoastCorrection.Brightness ? BrightnessStep(source) : null)];
        gaps = [.. settings.Sources.Select(source => MaskOf(source).Gap)];
    }

    public RunSettings Settings { get; }

    public IReadOnlyList<TotalsRegion> Regions { get; }

    public ErrorCorrelation Correlation { get; }

    /// <summary>Fills isolated cells, or null where the run does not.</summary>
    public NeighbourFilling? Neighbours { get; }

    /// <summary>The gap of a source's sensor, or null where there is nothing to fill.</summary>
    public PolarGapSystem? PolarGapOf(int source) => gaps[source];

    /// <summary>The channels of a source that the run uses, in order: no other one is read.</summary>
    public IReadOnlyList<Channel> ChannelsOf(int source) => channels[source];

    /// <summary>One retrieval a method, in the run's order.</summary>
    public IReadOnlyList<DayRetrieval> RetrievalsOf(int source) => retrievals[source];

    /// <summary>The correction of brightness temperatures near land, or null where the run has none.</summary>
    public CoastBrightness? CoastOf(int source) => coasts[source];

    private Channel[] Needed(RunSource source)
    {
        HemisphereTuning tuning = source.Sensor.In(Settings.Grid.Hemisphere);
        IEnumerable<Channel> methods = Settings.Methods.SelectMany(name => ConcentrationMethods.Create(name, tuning, Settings.Grid.Hemisphere).Channels);
        IEnumerable<Channel> screens = tuning.Screens.Gradient2219Limit is null ? [Channel.V19, Channel.V37] : [Channel.V19, Channel.V22, Channel.V37];
        return [.. methods.Concat(screens).Distinct().Where(source.Description.Channels.ContainsKey).Order()];
    }

    private ICoastStep ConcentrationStep() => Settings.Coast.MinimumFraction is { } minima
        ? new CoastMinimumStep(new(Settings.Grid, Settings.Ocean), minima, Settings.Coast.Minimum)
        : new CoastSpillStep(Settings.Grid, Settings.Land, Settings.Ocean, Settings.Coast.Spill);

    private CoastBrightness BrightnessStep(RunSource source) => new(
        Settings.Grid,
        Settings.Land,
        Array.ConvertAll(MaskOf(source).Mask.Conditions.ToArray(), condition => condition == CellConditions.None),
        Needed(source).ToDictionary(channel => channel, channel => source.Sensor.FootprintsMeters[channel]),
        source.Sensor.Range,
        Settings.Coast.Brightness);

    private DayRetrieval[] Retrievals(RunSource source, ICoastStep? coast)
    {
        HemisphereTuning tuning = source.Sensor.In(Settings.Grid.Hemisphere);
        return [.. Settings.Methods.Select(name => new DayRetrieval(
            ConcentrationMethods.Create(name, tuning, Settings.Grid.Hemisphere), tuning.Screens, source.Sensor.Scatter, MaskOf(source).Mask, coast, Settings.SmearingFactor, source.Sensor.NoiseKelvins))];
    }

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
