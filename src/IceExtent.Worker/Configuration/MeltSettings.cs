using IceExtent.Retrieval;
using IceExtent.Statistics.Seasons;

namespace IceExtent.Worker.Configuration;

/// <summary>Whether a run writes what melt is found by, and how melt is found.</summary>
/// <param name="Signals">Whether the archive gets files of melt signals.</param>
/// <param name="Rules">How melt onset and freeze-up are found, in the hemisphere of the run; decides no file of the day span.</param>
internal sealed record MeltSettings(bool Signals, MeltRules Rules)
{
    /// <summary>The channels that the signals are made of.</summary>
    public static IReadOnlyList<Channel> SignalChannels { get; } = [Channel.V19, Channel.H19, Channel.V37, Channel.H37];
}
