using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>Every method by its name in run files.</summary>
public static class ConcentrationMethods
{
    /// <summary>The names, in the order help texts list them.</summary>
    public static IReadOnlyList<string> Names { get; } = [NasaTeam.MethodName, Bootstrap.MethodName, Bristol.MethodName, Polynomial89.MethodName, SelfTuning.MethodName];

    /// <summary>Tunes a method for one sensor and hemisphere.</summary>
    /// <param name="name">One of <see cref="Names"/>.</param>
    /// <param name="tuning">The pure surfaces.</param>
    /// <param name="hemisphere">Where it is used.</param>
    /// <returns>The method, or null where the tuning lacks the surfaces it needs.</returns>
    /// <exception cref="ArgumentException">There is no such method, or the surfaces are singular.</exception>
    public static IConcentrationMethod? TryCreate(string name, HemisphereTuning tuning, Hemisphere hemisphere)
    {
        ArgumentNullException.ThrowIfNull(tuning);
        return name switch
        {
            NasaTeam.MethodName => new NasaTeam(tuning.TiePoints),
            Bootstrap.MethodName => tuning.Surfaces is { } surfaces ? new Bootstrap(surfaces, hemisphere) : null,
            Bristol.MethodName => tuning.Surfaces is { } surfaces ? new Bristol(surfaces) : null,
            SelfTuning.MethodName => tuning.Surfaces is { } surfaces ? SelfTuning.From(surfaces, tuning.Samples, tuning.Blend ?? ProjectionBlend.Whole) : null,
            Polynomial89.MethodName => tuning.Polarization89 is { } points ? new Polynomial89(points) : null,
            _ => throw new ArgumentException($"There is no method {name}.", nameof(name)),
        };
    }

    /// <summary>Tunes a method whose surfaces are known to be there.</summary>
    /// <inheritdoc cref="TryCreate"/>
    public static IConcentrationMethod Create(string name, HemisphereTuning tuning, Hemisphere hemisphere) =>
        TryCreate(name, tuning, hemisphere)
        ?? throw new ArgumentException($"The tuning holds no pure surfaces for {name}.", nameof(tuning));

    /// <summary>The sensor-file table that holds a method's pure surfaces.</summary>
    public static string TableOf(string name) => name switch
    {
        NasaTeam.MethodName => "tie_points_k",
        Polynomial89.MethodName => "polarization_89_k",
        _ => "surface_points_k",
    };
}
