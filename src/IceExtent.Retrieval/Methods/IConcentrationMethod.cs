namespace IceExtent.Retrieval;

/// <summary>A published way from brightness temperatures to sea-ice concentration, tuned for one sensor and hemisphere.</summary>
/// <remarks>Immutable and safe to use from several threads.</remarks>
public interface IConcentrationMethod
{
    /// <summary>The name run files use, such as <c>nasa-team</c>.</summary>
    string Name { get; }

    /// <summary>Where it was published, as keys of docs/REFERENCES.md.</summary>
    string Source { get; }

    /// <summary>The channels without which a cell has no concentration.</summary>
    IReadOnlyList<Channel> Channels { get; }

    /// <summary>Whether the method tells first-year from multiyear ice.</summary>
    bool SeparatesIceTypes { get; }

    /// <summary>The linearisations over the pure surfaces that tune it.</summary>
    PureTangents PureTangents { get; }

    /// <summary>Writes the unclipped concentrations of a run of cells.</summary>
    /// <param name="observed">Holds every channel of <see cref="Channels"/>, in K; NaN is missing.</param>
    /// <param name="cells">The cells to handle.</param>
    /// <param name="into">Receives fractions; NaN where a channel is missing or the method has no solution.</param>
    void Retrieve(BrightnessPlanes observed, CellRange cells, ConcentrationPlanes into);

    /// <summary>The unclipped concentration and its derivatives at one surface, in double precision.</summary>
    /// <param name="surface">Holds every channel of <see cref="Channels"/>.</param>
    /// <returns>
    /// A form whose weights are the derivatives, per K, and whose value over <paramref name="surface"/> is the concentration: exact
    /// everywhere for a linear method. NaN where the method has no solution.
    /// </returns>
    LinearForm TangentAt(ChannelKelvins surface);

    /// <summary>Writes the variance that instrument noise gives the unclipped total: the squares of the derivatives times those of the noise.</summary>
    /// <param name="observed">Holds every channel of <see cref="Channels"/>, in K; NaN is missing.</param>
    /// <param name="cells">The cells to handle.</param>
    /// <param name="noise">The noise of the channels, in K.</param>
    /// <param name="variance">Receives one variance a cell of the run, without unit; no meaning where the total is NaN.</param>
    void WriteNoiseVariance(BrightnessPlanes observed, CellRange cells, ChannelNoise noise, Span<float> variance);
}
