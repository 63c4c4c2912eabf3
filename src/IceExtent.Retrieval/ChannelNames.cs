namespace IceExtent.Retrieval;

/// <summary>The channels as run files and sensor files write them: <c>19v</c>, <c>19h</c>, <c>22v</c> and so on.</summary>
public static class ChannelNames
{
    /// <summary>Every channel, in order.</summary>
    public static IReadOnlyList<Channel> All { get; } = Enum.GetValues<Channel>();

    /// <summary>A channel's name in files.</summary>
    public static string NameOf(Channel channel) => channel switch
    {
        Channel.V19 => "19v",
        Channel.H19 => "19h",
        Channel.V22 => "22v",
        Channel.V37 => "37v",
        Channel.H37 => "37h",
        Channel.V89 => "89v",
        Channel.H89 => "89h",
        _ => throw new ArgumentOutOfRangeException(nameof(channel), channel, "There is no such channel."),
    };

    /// <summary>The channel of a name in a file, or null.</summary>
    public static Channel? Parse(string name)
    {
        foreach (Channel channel in All)
        {
            if (string.Equals(NameOf(channel), name, StringComparison.Ordinal))
            {
                return channel;
            }
        }

        return null;
    }
}
