using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>Drops samples that lie far from the others in one of several linear forms of their temperatures.</summary>
/// <remarks>
/// Far: more than some robust standard deviations (1.4826 times the median absolute deviation) from the median, form by form.
/// Common practice, no one source. Reused from day to day; not shared between threads.
/// </remarks>
public sealed class OutlierTrim
{
    private const double DeviationsPerNormal = 1.4826; // Makes the median absolute deviation of a normal its standard deviation.
    private const double SmallestDeviationKelvins = 0.1; // One bin: equal numbers have no spread, and no outliers either.

    private readonly LinearForm[] forms;
    private readonly double limit;
    private readonly KelvinHistogram histogram = new();
    private float[] values = [];

    /// <summary>Prepares.</summary>
    /// <param name="forms">In K; each is used with the days that have its channels.</param>
    /// <param name="limit">In robust standard deviations, above 0.</param>
    public OutlierTrim(IEnumerable<LinearForm> forms, double limit)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(limit);
        (this.forms, this.limit) = ([.. forms], limit);
    }

    /// <summary>Moves the samples that are no outliers to the front of a list of cells, in their order.</summary>
    /// <param name="observed">Every channel has a value at each of the cells.</param>
    /// <param name="cells">Changed in place.</param>
    /// <returns>How many are kept.</returns>
    public int Apply(BrightnessPlanes observed, Span<int> cells)
    {
        ArgumentNullException.ThrowIfNull(observed);
        int kept = cells.Length;
        foreach (LinearForm form in forms)
        {
            if (form.Channels.All(observed.Has))
            {
                kept = Keep(observed, form, cells[..kept]);
            }
        }

        return kept;
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private int Keep(BrightnessPlanes observed, LinearForm form, Span<int> cells)
    {
        Evaluate(observed, form, cells);
        histogram.Clear();
        for (int sample = 0; sample < cells.Length; sample++)
        {
            histogram.Add(values[sample]);
        }

        (double middle, double deviation) = histogram.Center();
        double reach = limit * DeviationsPerNormal * Math.Max(deviation, SmallestDeviationKelvins);
        int kept = 0;
        for (int sample = 0; sample < cells.Length; sample++)
        {
            if (Math.Abs(values[sample] - middle) <= reach)
            {
                cells[kept++] = cells[sample];
            }
        }

        return kept;
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private void Evaluate(BrightnessPlanes observed, LinearForm form, ReadOnlySpan<int> cells)
    {
        if (values.Length < cells.Length)
        {
            values = new float[Math.Max(cells.Length, 2 * values.Length)];
        }

        values.AsSpan(0, cells.Length).Fill((float)form.Offset);
        foreach (Channel channel in form.Channels)
        {
            ReadOnlySpan<float> kelvins = observed.Kelvins(channel);
            float weight = (float)form.WeightOf(channel);
            for (int sample = 0; sample < cells.Length; sample++)
            {
                values[sample] += weight * kelvins[cells[sample]];
            }
        }
    }
}
