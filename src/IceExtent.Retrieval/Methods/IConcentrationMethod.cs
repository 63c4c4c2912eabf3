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

    /// <summary>Writes the unclipped concentrations of a run of cells.</summary>
    /// <param name="observed">Holds every channel of <see cref="Channels"/>, in K; NaN is missing.</param>
    /// <param name="cells">The cells to handle.</param>
    /// <param name="into">Receives fractions; NaN where a channel is missing or the method has no solution.</param>
    void Retrieve(BrightnessPlanes observed, CellRange cells, ConcentrationPlanes into);
}
