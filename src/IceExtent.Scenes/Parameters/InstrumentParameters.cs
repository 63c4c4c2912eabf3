using IceExtent.Retrieval;

namespace IceExtent.Scenes.Parameters;

/// <summary>The radiometer, beyond what its sensor file says. A channel that a table leaves out has the value 0.</summary>
public sealed record InstrumentParameters
{
    /// <summary>The angle from the vertical at which it looks, in degrees.</summary>
    public required double IncidenceDegrees { get; init; }

    /// <summary>Noise of a cell of one day: standard deviation, in K.</summary>
    public required IReadOnlyDictionary<Channel, double> NoiseKelvins { get; init; }

    /// <summary>The width of the footprint at half power, in km; 0 smears nothing.</summary>
    public required IReadOnlyDictionary<Channel, double> FootprintKilometers { get; init; }

    /// <summary>A lasting error, in K.</summary>
    public required IReadOnlyDictionary<Channel, double> OffsetKelvins { get; init; }

    /// <summary>An error that grows, in K a decade from the sensor's first day on.</summary>
    public required IReadOnlyDictionary<Channel, double> DriftKelvinsPerDecade { get; init; }
}
