using IceExtent.Retrieval;

namespace IceExtent.Scenes.Demo;

/// <summary>The radiometer of the demonstration. It was never built; its numbers are of the size that real ones have.</summary>
public static class InventedRadiometer
{
    /// <summary>The sensor, the same as config/demo/sensors/floe-1.toml (see <c>DemoFilesTests</c>).</summary>
    public static Sensor Sensor { get; } = new()
    {
        Name = "floe-1",
        Title = "Floe-1, an invented radiometer",
        FrequenciesGigahertz = new Dictionary<Channel, double>
        {
            [Channel.V19] = 18.9,
            [Channel.H19] = 18.9,
            [Channel.V22] = 22.5,
            [Channel.V37] = 36.7,
            [Channel.H37] = 36.7,
        },
        FirstDay = new(2019, 6, 1),
        LastDay = null,
        PolarGapLatitudeDegrees = 87.5,
        Range = new(50.0, 350.0),
        Scatter = new(OpenWaterFraction: 0.05, ClosedIceFraction: 0.05),
        North = new(
            new(new(181.6, 109.2, 204.0), new(250.4, 233.6, 242.8), new(223.0, 199.8, 187.4)),
            new(Gradient3719Limit: 0.055, Gradient2219Limit: 0.048)),
        South = new(
            new(new(181.6, 109.2, 204.0), new(253.0, 237.2, 245.0), new(243.8, 213.4, 212.0)),
            new(Gradient3719Limit: 0.055, Gradient2219Limit: 0.048)),
    };
}
