using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>What a sensor needs to know about one hemisphere.</summary>
/// <param name="TiePoints">The pure surfaces.</param>
/// <param name="Screens">The weather screens.</param>
/// <param name="Surfaces">The pure surfaces of methods that are linear in temperature, or null where none are known.</param>
/// <param name="Polarization89">The pure surfaces at 85 to 91 GHz, or null where none are known.</param>
/// <param name="Samples">The samples the surfaces come from, or null for the sensor's own.</param>
/// <param name="Blend">Where self-tuning changes its projection, or null where nothing says.</param>
public sealed record HemisphereTuning(
    TiePoints TiePoints,
    WeatherScreens Screens,
    SurfacePoints? Surfaces = null,
    PolarizationPoints? Polarization89 = null,
    PureSamples? Samples = null,
    ProjectionBlend? Blend = null);

/// <summary>Gradient ratios above which a cell is open water.</summary>
/// <param name="Gradient3719Limit">GR(37V/19V), without unit.</param>
/// <param name="Gradient2219Limit">GR(22V/19V), without unit, or null where the screen is not used.</param>
public sealed record WeatherScreens(double Gradient3719Limit, double? Gradient2219Limit);

/// <summary>The brightness temperatures that are believed. Both ends are allowed.</summary>
/// <param name="LowestKelvins">In K.</param>
/// <param name="HighestKelvins">In K.</param>
public sealed record KelvinRange(double LowestKelvins, double HighestKelvins);

/// <summary>How well a sensor and its tie points are known, for standard errors.</summary>
/// <param name="OpenWaterFraction">Standard deviation of concentration over open water. Unit: 1.</param>
/// <param name="ClosedIceFraction">Standard deviation of concentration over closed ice. Unit: 1.</param>
public sealed record RetrievalScatter(double OpenWaterFraction, double ClosedIceFraction)
{
    /// <summary>
    /// Standard deviation over closed ice of what the method does with loose ice: that of a cell at half cover is half of it. The same as
    /// <see cref="ClosedIceFraction"/> unless samples say otherwise. Unit: 1.
    /// </summary>
    public double LooseIceFraction { get; init; } = ClosedIceFraction;

    /// <summary>Where loose ice becomes closed, by a straight line; of no weight where both scatter alike.</summary>
    public ProjectionBlend Blend { get; init; } = ProjectionBlend.Whole;

    /// <summary>The standard deviation that the pure surfaces give a cell: the plain twin of <see cref="CellScatter"/>. Unit: 1.</summary>
    /// <param name="fraction">The cell's concentration, 0 to 1.</param>
    public double At(double fraction)
    {
        double ice = LooseIceFraction + (Blend.ShareAt(fraction) * (ClosedIceFraction - LooseIceFraction));
        double water = (1.0 - fraction) * OpenWaterFraction;
        return Math.Sqrt((water * water) + (fraction * fraction * ice * ice));
    }

    /// <summary>The scatter of a method over samples: their covariance through its derivatives at their centres, and half way between.</summary>
    /// <param name="method">The tuned method; the samples hold its channels.</param>
    /// <param name="samples">The samples of the day's window, instrument noise included.</param>
    /// <remarks>Source: [Tonboe2016], [Lavergne2019].</remarks>
    public static RetrievalScatter Of(IConcentrationMethod method, PureSamples samples)
    {
        ArgumentNullException.ThrowIfNull(method);
        ArgumentNullException.ThrowIfNull(samples);
        ChannelKelvins half = samples.HalfCover;
        return new(Scatter(samples.OpenWater, samples.OpenWater.Center), Scatter(samples.ClosedIce, samples.ClosedIce.Center))
        {
            LooseIceFraction = Scatter(samples.ClosedIce, half),
            Blend = samples.Blend,
        };

        double Scatter(SurfaceMoments surface, ChannelKelvins at) => Math.Sqrt(surface.VarianceOf(method.TangentAt(at)));
    }
}

/// <summary>A radiometer: what it measures, when it served and how it is tuned. Read from config/sensors.</summary>
public sealed record Sensor
{
    /// <summary>The name run files use, such as <c>ssmi-f13</c>.</summary>
    public required string Name { get; init; }

    /// <summary>The name people use.</summary>
    public required string Title { get; init; }

    /// <summary>The frequency of every channel the sensor has, in GHz.</summary>
    public required IReadOnlyDictionary<Channel, double> FrequenciesGigahertz { get; init; }

    /// <summary>
    /// The 3 dB width of the footprint of each channel for which it is known, in m: the geometric mean of its two axes, as
    /// daily grids mix passes of every direction.
    /// </summary>
    public IReadOnlyDictionary<Channel, double> FootprintsMeters { get; init; } = new Dictionary<Channel, double>();

    /// <summary>The noise of one measurement of each channel for which it is known; a daily mean of several has less.</summary>
    public ChannelNoise NoiseKelvins { get; init; } = ChannelNoise.None;

    /// <summary>The first day of service.</summary>
    public required DateOnly FirstDay { get; init; }

    /// <summary>The last day of service, or null while it serves.</summary>
    public required DateOnly? LastDay { get; init; }

    /// <summary>The range that is believed.</summary>
    public required KelvinRange Range { get; init; }

    /// <summary>The unseen circle round the pole begins at this latitude (absolute value, degrees), or null where there is none.</summary>
    public required double? PolarGapLatitudeDegrees { get; init; }

    /// <summary>Scatter of the retrieval over the two pure surfaces, noise included.</summary>
    public required RetrievalScatter Scatter { get; init; }

    /// <summary>Tie points and screens north of the equator.</summary>
    public required HemisphereTuning North { get; init; }

    /// <summary>Tie points and screens south of the equator.</summary>
    public required HemisphereTuning South { get; init; }

    /// <summary>Tie points and screens of one hemisphere.</summary>
    public HemisphereTuning In(Hemisphere hemisphere) => hemisphere == Hemisphere.North ? North : South;

    /// <summary>Whether a day lies in the period of service.</summary>
    public bool Serves(DateOnly day) => day >= FirstDay && (LastDay is not { } last || day <= last);
}
