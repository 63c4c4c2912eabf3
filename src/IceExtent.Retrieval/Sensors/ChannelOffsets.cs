using System.Numerics;

namespace IceExtent.Retrieval;

/// <summary>By how much a sensor reads above another one, channel by channel, and how well that is known. An instance is always valid.</summary>
/// <remarks>
/// Adjustments between sensors from days that both saw: [Cavalieri1999], [Cavalieri2012] publish them as regressions and tie
/// points; an offset a channel is the simplest form. The standard error is one and the same for every cell and day.
/// </remarks>
public sealed record ChannelOffsets
{
    private readonly (Channel Channel, float Kelvins)[] kelvins;

    /// <summary>Takes the offsets.</summary>
    /// <param name="kelvins">What is taken off each channel, in K, finite; other channels stay.</param>
    /// <param name="standardErrorKelvins">The standard errors that are known, in K, 0 or more; each of a channel with an offset.</param>
    /// <exception cref="ArgumentException">A number is not finite, an error is negative, or it has no offset.</exception>
    public ChannelOffsets(IReadOnlyDictionary<Channel, double> kelvins, IReadOnlyDictionary<Channel, double> standardErrorKelvins)
    {
        ArgumentNullException.ThrowIfNull(kelvins);
        ArgumentNullException.ThrowIfNull(standardErrorKelvins);
        if (kelvins.Values.Any(value => !double.IsFinite(value)))
        {
            throw new ArgumentException("An offset must be a finite number of K.", nameof(kelvins));
        }

        if (standardErrorKelvins.Any(pair => !(pair.Value >= 0.0) || !double.IsFinite(pair.Value) || !kelvins.ContainsKey(pair.Key)))
        {
            throw new ArgumentException("A standard error must be a finite number of K, 0 or more, of a channel with an offset.", nameof(standardErrorKelvins));
        }

        Kelvins = new SortedDictionary<Channel, double>(kelvins.ToDictionary());
        StandardErrorKelvins = new SortedDictionary<Channel, double>(standardErrorKelvins.ToDictionary());
        this.kelvins = [.. Kelvins.Where(pair => pair.Value != 0.0).Select(pair => (pair.Key, (float)pair.Value))];
    }

    /// <summary>What is taken off each channel, in K, in the order of channels.</summary>
    public IReadOnlyDictionary<Channel, double> Kelvins { get; }

    /// <summary>The standard errors that are known, in K, in the order of channels.</summary>
    public IReadOnlyDictionary<Channel, double> StandardErrorKelvins { get; }

    /// <summary>Takes the offsets off one day, after the range check and before anything else.</summary>
    /// <param name="observed">Changed in place; NaN stays NaN, and channels that it does not hold are passed over.</param>
    public void Subtract(BrightnessPlanes observed)
    {
        ArgumentNullException.ThrowIfNull(observed);
        foreach ((Channel channel, float offset) in kelvins)
        {
            if (observed.Has(channel))
            {
                Subtract(observed.Kelvins(channel), offset);
            }
        }
    }

    private static void Subtract(Span<float> plane, float offset)
    {
        Vector<float> all = new(offset);
        int cell = 0;
        for (; cell <= plane.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            (new Vector<float>(plane[cell..]) - all).CopyTo(plane[cell..]);
        }

        for (; cell < plane.Length; cell++)
        {
            plane[cell] -= offset;
        }
    }
}
