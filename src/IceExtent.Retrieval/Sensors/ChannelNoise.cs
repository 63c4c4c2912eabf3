namespace IceExtent.Retrieval;

/// <summary>The instrument noise of a sensor's channels, independent from channel to channel. An instance is always valid.</summary>
/// <remarks>Unit: K, standard deviation of one measurement. A channel whose noise is not known counts as free of it.</remarks>
public sealed record ChannelNoise
{
    private readonly double[] kelvins = new double[ChannelNames.All.Count];

    /// <summary>Takes the noise.</summary>
    /// <param name="kelvins">Standard deviations in K, each 0 or more and finite; a channel left out has none.</param>
    /// <exception cref="ArgumentException">A standard deviation is negative, infinite or NaN.</exception>
    public ChannelNoise(IReadOnlyDictionary<Channel, double> kelvins)
    {
        ArgumentNullException.ThrowIfNull(kelvins);
        foreach ((Channel channel, double value) in kelvins)
        {
            if (!(value >= 0.0) || !double.IsFinite(value))
            {
                throw new ArgumentException($"The noise of {ChannelNames.NameOf(channel)} is {value} K; it must be finite and 0 or more.", nameof(kelvins));
            }

            this.kelvins[(int)channel] = value;
        }
    }

    /// <summary>No noise in any channel.</summary>
    public static ChannelNoise None { get; } = new(new Dictionary<Channel, double>());

    /// <summary>One channel's standard deviation, in K; 0 where it is not known.</summary>
    public double this[Channel channel] => kelvins[(int)channel];

    /// <summary>This noise together with an independent error of each channel, in K.</summary>
    public ChannelNoise With(ChannelNoise other)
    {
        ArgumentNullException.ThrowIfNull(other);
        return new(ChannelNames.All.ToDictionary(channel => channel, channel => double.Hypot(this[channel], other[channel])));
    }

    /// <summary>The variance that noise gives a linear form, in the form's unit squared.</summary>
    public double VarianceOf(LinearForm form) => CovarianceOf(form, form);

    /// <summary>The covariance that noise gives two linear forms of the same temperatures, in the product of their units.</summary>
    public double CovarianceOf(LinearForm left, LinearForm right)
    {
        ArgumentNullException.ThrowIfNull(left);
        ArgumentNullException.ThrowIfNull(right);
        double sum = 0.0;
        for (int channel = 0; channel < kelvins.Length; channel++)
        {
            sum += left.WeightOf((Channel)channel) * right.WeightOf((Channel)channel) * kelvins[channel] * kelvins[channel];
        }

        return sum;
    }

    /// <inheritdoc/>
    public bool Equals(ChannelNoise? other) => other is not null && kelvins.AsSpan().SequenceEqual(other.kelvins);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(kelvins[0], kelvins[^1]);
}
