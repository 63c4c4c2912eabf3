using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>What a retrieval needs beside the sensor.</summary>
/// <param name="Grid">The grid.</param>
/// <param name="Ocean">Whether each cell counts as ocean.</param>
/// <param name="Land">How much of each cell is land.</param>
/// <param name="Methods">The methods, in the run's order.</param>
/// <param name="Coast">What is done about land in footprints.</param>
/// <param name="Smearing">How much a change from cell to cell widens a standard error.</param>
/// <param name="TiePoints">Whether and how tie points move.</param>
/// <param name="Weather">Where the limits of the screens come from.</param>
internal sealed record RetrievalChoices(
    Grid Grid,
    bool[] Ocean,
    LandShare Land,
    IReadOnlyList<string> Methods,
    CoastSettings Coast,
    SmearingFactors Smearing,
    TiePointSettings TiePoints,
    WeatherSettings Weather)
{
    /// <summary>Channels that are read and corrected beside those of the retrieval.</summary>
    public IReadOnlyList<Channel> Further { get; init; } = [];
}

/// <summary>Everything that the days of one sensor share and nobody changes: channels, coast correction, retrievals, sampling.</summary>
internal sealed class SourceRetrieval
{
    private readonly RetrievalChoices choices;
    private readonly Sensor sensor;
    private readonly CellMask mask;
    private readonly ICoastStep? step;
    private readonly ChannelNoise? offsetErrors;
    private readonly IReadOnlyList<DayRetrieval> withOwnPoints;

    /// <summary>Prepares.</summary>
    /// <param name="choices">What the run wants.</param>
    /// <param name="sensor">The sensor.</param>
    /// <param name="available">The channels that its days have.</param>
    /// <param name="mask">Land and polar gap.</param>
    /// <param name="step">The correction of concentrations near land, or null.</param>
    /// <param name="offsets">What is taken off the temperatures, or null.</param>
    public SourceRetrieval(
        RetrievalChoices choices, Sensor sensor, IReadOnlyCollection<Channel> available, CellMask mask, ICoastStep? step, ChannelOffsets? offsets = null)
    {
        (this.choices, this.sensor, this.mask, this.step) = (choices, sensor, mask, step);
        offsetErrors = offsets is { StandardErrorKelvins.Count: > 0 } ? new(offsets.StandardErrorKelvins) : null;
        Channels = Needed(available);
        ChannelsRead = [.. Channels.Concat(choices.Further.Where(available.Contains)).Distinct().Order()];
        Coast = choices.Coast.InTemperatures ? BrightnessStep() : null;
        withOwnPoints = [.. choices.Methods.Select(name => Make(name, Own, choices.Weather.ScreensFor(Own)))];
    }

    /// <summary>The channels that the retrieval uses, in order.</summary>
    public IReadOnlyList<Channel> Channels { get; }

    /// <summary>Those and the ones that are only written, in order: no other one is read.</summary>
    public IReadOnlyList<Channel> ChannelsRead { get; }

    /// <summary>The correction of brightness temperatures near land, or null where the run has none.</summary>
    public CoastBrightness? Coast { get; }

    /// <summary>The sensor's own surfaces.</summary>
    private HemisphereTuning Own => sensor.In(choices.Grid.Hemisphere) with { Blend = choices.TiePoints.Rules.Blend };

    /// <summary>One retrieval a method, in the run's order.</summary>
    /// <param name="tuned">The surfaces of the day, or null for the sensor's own.</param>
    /// <remarks>Retuned limits follow the surfaces of their method.</remarks>
    public IReadOnlyList<DayRetrieval> RetrievalsWith(TunedDay? tuned)
    {
        if (tuned is null)
        {
            return withOwnPoints;
        }

        WeatherScreens screens = choices.Weather.ScreensFor(MovedOnly(tuned.Tuning));
        return [.. choices.Methods.Select((name, index) => choices.TiePoints.Moves(name) ? Make(name, tuned.Tuning, screens) : withOwnPoints[index])];
    }

    // Without 37H the linear methods' surfaces have no samples and stand still: limits of the day then follow the tie points.
    private HemisphereTuning MovedOnly(HemisphereTuning day) =>
        day.TiePoints != Own.TiePoints && day.Surfaces == Own.Surfaces ? day with { Surfaces = null } : day;

    /// <summary>Makes a sampling of pure surfaces with memory of its own.</summary>
    public SurfaceSampling MakeSampling() =>
        new(choices.Grid, choices.Ocean, new(new NasaTeam(Own.TiePoints), Own.Screens, sensor.Scatter, mask, step), Own, Channels, choices.TiePoints.Rules.Samples);

    /// <summary>One day's surfaces.</summary>
    /// <param name="window">The samples of the days round it, in date order.</param>
    public TunedDay Tune(IReadOnlyList<DaySamples> window) => MovingTiePoints.Tune(Own, window, choices.TiePoints.Rules);

    private DayRetrieval Make(string name, HemisphereTuning tuning, WeatherScreens screens)
    {
        IConcentrationMethod method = ConcentrationMethods.Create(name, tuning, choices.Grid.Hemisphere);
        RetrievalScatter scatter = tuning.Samples is { } samples ? RetrievalScatter.Of(method, samples) : sensor.Scatter;
        return new(method, screens, scatter, mask, step, choices.Smearing, sensor.NoiseKelvins, offsetErrors, choices.Weather.ScreenedErrorFraction);
    }

    private Channel[] Needed(IReadOnlyCollection<Channel> available)
    {
        IEnumerable<Channel> methods = choices.Methods.SelectMany(name => ConcentrationMethods.Create(name, Own, choices.Grid.Hemisphere).Channels);
        IEnumerable<Channel> screens = Own.Screens.Gradient2219Limit is null ? [Channel.V19, Channel.V37] : [Channel.V19, Channel.V22, Channel.V37];
        IEnumerable<Channel> samples = choices.TiePoints.NeedsSamples(choices.Methods) ? TiePointSettings.SampleChannels : [];
        return [.. methods.Concat(screens).Concat(samples).Distinct().Where(available.Contains).Order()];
    }

    private CoastBrightness BrightnessStep() => new(
        choices.Grid,
        choices.Land,
        Array.ConvertAll(mask.Conditions.ToArray(), condition => condition == CellConditions.None),
        ChannelsRead.ToDictionary(channel => channel, channel => sensor.FootprintsMeters[channel]),
        sensor.Range,
        choices.Coast.Brightness);
}
