using System.Collections.Concurrent;
using IceExtent.Retrieval;

namespace IceExtent.Storage.Reading;

/// <summary>Keeps the last rule of each channel, as the files of a source nearly always agree. Safe from several threads.</summary>
internal sealed class KelvinRules
{
    private readonly ConcurrentDictionary<Channel, KelvinRule> last = new();

    /// <summary>The rule of an encoding; made anew only where it differs from the channel's last one.</summary>
    public KelvinRule For(Channel channel, KelvinEncoding encoding)
    {
        if (last.TryGetValue(channel, out KelvinRule? rule) && rule.Encoding.Equals(encoding))
        {
            return rule;
        }

        rule = new(encoding);
        last[channel] = rule;
        return rule;
    }
}
