namespace IceExtent.Retrieval.Tests.Tuning;

/// <summary>Days of samples drawn about pure surfaces, with a seed.</summary>
internal static class PureDays
{
    public static IReadOnlyList<Channel> Channels { get; } = [Channel.V19, Channel.H19, Channel.V37, Channel.H37];

    /// <summary>F13 north with the linear methods' surfaces, both as in config/sensors.</summary>
    public static HemisphereTuning Own { get; } = new(TiePointSets.F13North, new(0.05, 0.045), LinearMethodTests.SsmiNorth);

    public static SampleRules Samples { get; } = new(0.15, 0.95, 50_000.0, 50_000.0, 50_000.0, 250_000.0, 4.0);

    public static TuningRules Rules { get; } = new(Samples, 7, 7, 100, 3, 2.0, new(0.7, 0.9));

    /// <summary>One surface of the sensor in every channel.</summary>
    public static double Kelvins(Channel channel, Func<TiePoints, TiePoint> point, Func<SurfacePoints, ChannelKelvins> surface) => channel switch
    {
        Channel.V19 => point(Own.TiePoints).V19Kelvins,
        Channel.H19 => point(Own.TiePoints).H19Kelvins,
        Channel.V37 => point(Own.TiePoints).V37Kelvins,
        _ => surface(Own.Surfaces!)[channel],
    };

    /// <summary>A day's samples: water and ice of two types, each with noise and an offset in every channel.</summary>
    public static DaySamples Day(int seed, int water = 200, int ice = 200, double offsetKelvins = 0.0, double noiseKelvins = 1.0, double multiyearShare = 0.3)
    {
        Random random = new(seed);
        BrightnessPlanes planes = new(Math.Max(water + ice, 1), Channels);
        for (int cell = 0; cell < water + ice; cell++)
        {
            double multiyear = random.NextDouble() < multiyearShare ? 1.0 : 0.0;
            foreach (Channel channel in Channels)
            {
                double pure = cell < water
                    ? Kelvins(channel, points => points.OpenWater, surfaces => surfaces.OpenWater)
                    : ((1.0 - multiyear) * Kelvins(channel, points => points.FirstYear, surfaces => surfaces.FirstYear))
                        + (multiyear * Kelvins(channel, points => points.Multiyear, surfaces => surfaces.Multiyear));
                planes.Kelvins(channel)[cell] = (float)(pure + offsetKelvins + (noiseKelvins * Normal(random)));
            }
        }

        return new(
            SurfaceMoments.Of(planes, [.. Enumerable.Range(0, water)]), SurfaceMoments.Of(planes, [.. Enumerable.Range(water, ice)]));
    }

    public static double Normal(Random random) =>
        Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
}
