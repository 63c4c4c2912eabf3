using IceExtent.Retrieval;

namespace IceExtent.Worker.Configuration;

/// <summary>Whether and how a run's tie points follow samples.</summary>
/// <param name="Moving">Whether those of every method do; those of self-tuning always do.</param>
/// <param name="Rules">How.</param>
internal sealed record TiePointSettings(bool Moving, TuningRules Rules)
{
    /// <summary>The channels that samples are chosen by.</summary>
    public static IReadOnlyList<Channel> SampleChannels { get; } = [Channel.V19, Channel.H19, Channel.V37];

    /// <summary>Whether a method's tie points move.</summary>
    public bool Moves(string method) => Moving || method == SelfTuning.MethodName;

    /// <summary>Whether a run must take samples before it retrieves.</summary>
    public bool NeedsSamples(IReadOnlyList<string> methods) => methods.Any(Moves);
}
