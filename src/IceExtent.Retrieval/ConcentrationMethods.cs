namespace IceExtent.Retrieval;

/// <summary>Every method by its name in run files.</summary>
public static class ConcentrationMethods
{
    /// <summary>The names, in the order help texts list them.</summary>
    public static IReadOnlyList<string> Names { get; } = [NasaTeam.MethodName];

    /// <summary>Tunes a method for one sensor and hemisphere.</summary>
    /// <param name="name">One of <see cref="Names"/>.</param>
    /// <param name="tuning">Tie points and screens.</param>
    /// <exception cref="ArgumentException">There is no such method, or the tie points are singular.</exception>
    public static IConcentrationMethod Create(string name, HemisphereTuning tuning)
    {
        ArgumentNullException.ThrowIfNull(tuning);
        return name switch
        {
            NasaTeam.MethodName => new NasaTeam(tuning.TiePoints),
            _ => throw new ArgumentException($"There is no method {name}.", nameof(name)),
        };
    }
}
