using System.Buffers;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>Count, centre and covariance of the brightness temperatures of one pure surface. All that samples leave behind.</summary>
/// <remarks>
/// Unit: K and K². Immutable. Merging days gives the same as taking all their samples at once, up to rounding, in the order in
/// which they are merged.
/// </remarks>
public sealed class SurfaceMoments
{
    private readonly Channel[] channels;
    private readonly double[] mean;
    private readonly double[] products; // Sums of products of deviations, channels by channels.

    private SurfaceMoments(Channel[] channels, long count, double[] mean, double[] products) =>
        (this.channels, Count, this.mean, this.products) = (channels, count, mean, products);

    /// <summary>The number of samples.</summary>
    public long Count { get; }

    /// <summary>The channels, in the order of the enumeration.</summary>
    public IReadOnlyList<Channel> Channels => channels;

    /// <summary>The centre.</summary>
    /// <exception cref="InvalidOperationException">There is no sample.</exception>
    public ChannelKelvins Center => Count > 0
        ? new(channels.Select((channel, index) => (channel, mean[index])).ToDictionary(pair => pair.channel, pair => pair.Item2))
        : throw new InvalidOperationException("There is no sample.");

    /// <summary>Sums some cells up.</summary>
    /// <param name="observed">Every channel has a value at each of the cells.</param>
    /// <param name="cells">The samples.</param>
    public static SurfaceMoments Of(BrightnessPlanes observed, ReadOnlySpan<int> cells)
    {
        ArgumentNullException.ThrowIfNull(observed);
        Channel[] channels = [.. observed.Channels];
        double[] mean = new double[channels.Length];
        double[] products = new double[channels.Length * channels.Length];
        double[] room = ArrayPool<double>.Shared.Rent(channels.Length * cells.Length);
        for (int first = 0; first < channels.Length; first++)
        {
            Span<double> deviations = room.AsSpan(first * cells.Length, cells.Length);
            mean[first] = Deviate(observed.Kelvins(channels[first]), cells, deviations);
            for (int second = 0; second <= first; second++)
            {
                double sum = OrderedSum.OfProducts(deviations, room.AsSpan(second * cells.Length, cells.Length));
                products[(first * channels.Length) + second] = sum;
                products[(second * channels.Length) + first] = sum;
            }
        }

        ArrayPool<double>.Shared.Return(room);
        return new(channels, cells.Length, mean, products);
    }

    /// <summary>Joins the samples of several days of one radiometer.</summary>
    /// <param name="days">At least one, all with the same channels.</param>
    /// <exception cref="ArgumentException">There is none, or their channels differ.</exception>
    public static SurfaceMoments Merge(IReadOnlyList<SurfaceMoments> days)
    {
        ArgumentNullException.ThrowIfNull(days);
        if (days.Count == 0 || !days.All(day => day.channels.AsSpan().SequenceEqual(days[0].channels)))
        {
            throw new ArgumentException("It takes one day or more, all with the same channels.", nameof(days));
        }

        SurfaceMoments joined = days[0];
        for (int day = 1; day < days.Count; day++)
        {
            joined = joined.With(days[day]);
        }

        return joined;
    }

    /// <summary>One channel's centre, in K.</summary>
    /// <exception cref="ArgumentException">The channel is not held.</exception>
    public double MeanKelvins(Channel channel) => mean[IndexOf(channel)];

    /// <summary>The covariance of two channels, or the variance of one, in K²; 0 for fewer than two samples.</summary>
    /// <exception cref="ArgumentException">A channel is not held.</exception>
    public double Covariance(Channel first, Channel second) =>
        Count > 1 ? products[(IndexOf(first) * channels.Length) + IndexOf(second)] / (Count - 1) : 0.0;

    /// <summary>The variance of a linear form over the samples, in the square of its unit.</summary>
    /// <exception cref="ArgumentException">A channel of the form is not held.</exception>
    public double VarianceOf(LinearForm form)
    {
        ArgumentNullException.ThrowIfNull(form);
        double sum = 0.0;
        foreach (Channel first in form.Channels)
        {
            foreach (Channel second in form.Channels)
            {
                sum += form.WeightOf(first) * form.WeightOf(second) * Covariance(first, second);
            }
        }

        return Math.Max(sum, 0.0);
    }

    // Gathers the samples of one channel and takes their mean off.
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private static double Deviate(ReadOnlySpan<float> kelvins, ReadOnlySpan<int> cells, Span<double> deviations)
    {
        double sum = 0.0;
        for (int sample = 0; sample < cells.Length; sample++)
        {
            deviations[sample] = kelvins[cells[sample]];
            sum += deviations[sample];
        }

        double mean = cells.Length > 0 ? sum / cells.Length : 0.0;
        for (int sample = 0; sample < deviations.Length; sample++)
        {
            deviations[sample] -= mean;
        }

        return mean;
    }

    // The sums of two sets about their common mean: [Chan1983].
    private SurfaceMoments With(SurfaceMoments other)
    {
        if (Count == 0 || other.Count == 0)
        {
            return Count == 0 ? other : this;
        }

        long count = Count + other.Count;
        double share = (double)other.Count / count;
        double[] joinedMean = new double[channels.Length];
        double[] joined = new double[products.Length];
        for (int first = 0; first < channels.Length; first++)
        {
            joinedMean[first] = mean[first] + (share * (other.mean[first] - mean[first]));
            for (int second = 0; second < channels.Length; second++)
            {
                int at = (first * channels.Length) + second;
                double apart = (other.mean[first] - mean[first]) * (other.mean[second] - mean[second]);
                joined[at] = products[at] + other.products[at] + (apart * Count * share);
            }
        }

        return new(channels, count, joinedMean, joined);
    }

    private int IndexOf(Channel channel)
    {
        int index = Array.IndexOf(channels, channel);
        return index >= 0 ? index : throw new ArgumentException($"The channel {ChannelNames.NameOf(channel)} is not held.", nameof(channel));
    }
}
