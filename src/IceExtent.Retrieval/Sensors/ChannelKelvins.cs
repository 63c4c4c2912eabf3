namespace IceExtent.Retrieval;

/// <summary>Brightness temperatures of one pure surface in several channels. An instance is always valid.</summary>
public sealed record ChannelKelvins
{
    private readonly Dictionary<Channel, double> kelvins;

    /// <summary>Takes the temperatures.</summary>
    /// <param name="kelvins">In K, each above 0 and finite.</param>
    /// <exception cref="ArgumentException">A temperature is not a finite number above 0.</exception>
    public ChannelKelvins(IReadOnlyDictionary<Channel, double> kelvins)
    {
        ArgumentNullException.ThrowIfNull(kelvins);
        foreach ((Channel channel, double value) in kelvins)
        {
            if (!(value > 0.0) || !double.IsFinite(value))
            {
                throw new ArgumentException($"{ChannelNames.NameOf(channel)} is {value} K; it must be finite and above 0.", nameof(kelvins));
            }
        }

        this.kelvins = new(kelvins);
    }

    /// <summary>Whether a channel is known.</summary>
    public bool Has(Channel channel) => kelvins.ContainsKey(channel);

    /// <summary>One channel's temperature, in K.</summary>
    /// <exception cref="KeyNotFoundException">The channel is not known.</exception>
    public double this[Channel channel] => kelvins[channel];

    /// <inheritdoc/>
    public bool Equals(ChannelKelvins? other) =>
        other is not null && kelvins.Count == other.kelvins.Count
        && kelvins.All(pair => other.kelvins.TryGetValue(pair.Key, out double value) && value == pair.Value);

    /// <inheritdoc/>
    public override int GetHashCode() => kelvins.Count;
}
