namespace IceExtent.Retrieval;

/// <summary>A weighted sum of channels and a constant: what every method that is linear in brightness temperature comes down to.</summary>
/// <remarks>The weights are also the method's derivatives, so instrument noise passes straight through them.</remarks>
public sealed record LinearForm
{
    private readonly double[] weights = new double[ChannelNames.All.Count];

    /// <summary>Makes a form.</summary>
    /// <param name="offset">The constant.</param>
    /// <param name="terms">A weight a channel, in the form's unit per K; no channel twice.</param>
    public LinearForm(double offset, params ReadOnlySpan<(Channel Channel, double Weight)> terms)
    {
        Offset = offset;
        foreach ((Channel channel, double weight) in terms)
        {
            weights[(int)channel] += weight;
        }
    }

    /// <summary>Makes the form that has a value over a surface and given weights.</summary>
    /// <param name="value">What <see cref="At(ChannelKelvins)"/> gives for the surface.</param>
    /// <param name="surface">Holds every channel with a weight.</param>
    /// <param name="terms">A weight a channel, in the form's unit per K; no channel twice.</param>
    public static LinearForm Through(double value, ChannelKelvins surface, params ReadOnlySpan<(Channel Channel, double Weight)> terms)
    {
        LinearForm weighted = new(0.0, terms);
        return new(value - weighted.At(surface), weighted.weights);
    }

    private LinearForm(double offset, double[] weights) => (Offset, this.weights) = (offset, weights);

    /// <summary>The constant.</summary>
    public double Offset { get; }

    /// <summary>The channels with a weight, in the order of the enumeration.</summary>
    public IReadOnlyList<Channel> Channels => [.. ChannelNames.All.Where(channel => weights[(int)channel] != 0.0)];

    /// <summary>A channel's weight, in the form's unit per K; 0 for one that is not used.</summary>
    public double WeightOf(Channel channel) => weights[(int)channel];

    /// <summary>The form's value for one cell or surface: the plain twin of <see cref="LinearKernel"/>.</summary>
    public double At(Func<Channel, double> kelvins)
    {
        ArgumentNullException.ThrowIfNull(kelvins);
        double value = Offset;
        foreach (Channel channel in Channels)
        {
            value += weights[(int)channel] * kelvins(channel);
        }

        return value;
    }

    /// <summary>The form's value over a surface.</summary>
    public double At(ChannelKelvins surface)
    {
        ArgumentNullException.ThrowIfNull(surface);
        return At(channel => surface[channel]);
    }

    /// <summary>Adds a multiple of another form.</summary>
    public LinearForm Plus(double factor, LinearForm other)
    {
        ArgumentNullException.ThrowIfNull(other);
        double[] sum = new double[weights.Length];
        for (int channel = 0; channel < sum.Length; channel++)
        {
            sum[channel] = weights[channel] + (factor * other.weights[channel]);
        }

        return new(Offset + (factor * other.Offset), sum);
    }

    /// <summary>Multiplies by a number.</summary>
    public LinearForm Times(double factor) => new(Offset * factor, Array.ConvertAll(weights, weight => weight * factor));

    /// <inheritdoc/>
    public bool Equals(LinearForm? other) => other is not null && Offset == other.Offset && weights.AsSpan().SequenceEqual(other.weights);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(Offset, weights[0], weights[^1]);
}
