namespace IceExtent.Retrieval;

/// <summary>The samples behind a day's tie points.</summary>
/// <param name="OpenWater">Of all days of the window.</param>
/// <param name="ClosedIce">Of all days of the window.</param>
/// <param name="IceDirection">The unit vector of the ice line in 19V, 37V and 37H; empty where the radiometer lacks one of them.</param>
/// <param name="Blend">Where self-tuning changes its projection.</param>
public sealed record PureSamples(
    SurfaceMoments OpenWater, SurfaceMoments ClosedIce, IReadOnlyList<double> IceDirection, ProjectionBlend Blend)
{
    /// <summary>The mixture of both centres in equal parts.</summary>
    public ChannelKelvins HalfCover => new(OpenWater.Channels.ToDictionary(
        channel => channel, channel => 0.5 * (OpenWater.MeanKelvins(channel) + ClosedIce.MeanKelvins(channel))));
}
