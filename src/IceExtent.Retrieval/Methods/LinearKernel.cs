using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>Evaluates a linear form over planes, several cells at a time.</summary>
/// <remarks>Accuracy: 1e-5 against <see cref="LinearForm.At(Func{Channel, double})"/> for concentrations (see <c>LinearMethodLaws</c>).</remarks>
public sealed class LinearKernel
{
    private readonly Channel[] channels;
    private readonly float[] weights;
    private readonly float offset;

    /// <summary>Prepares a form.</summary>
    public LinearKernel(LinearForm form)
    {
        ArgumentNullException.ThrowIfNull(form);
        channels = [.. form.Channels];
        weights = Array.ConvertAll(channels, channel => (float)form.WeightOf(channel));
        offset = (float)form.Offset;
    }

    /// <summary>Writes the form's value for a run of cells; NaN where a channel is missing.</summary>
    /// <param name="observed">Holds every channel of the form, in K.</param>
    /// <param name="cells">The run.</param>
    /// <param name="values">Receives one value a cell of the run, in the form's unit.</param>
    public void Evaluate(BrightnessPlanes observed, CellRange cells, Span<float> values)
    {
        ArgumentNullException.ThrowIfNull(observed);
        values.Fill(offset);
        for (int term = 0; term < channels.Length; term++)
        {
            Accumulate(cells.Of(observed.Kelvins(channels[term])), weights[term], values);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private static void Accumulate(ReadOnlySpan<float> kelvins, float weight, Span<float> values)
    {
        int cell = 0;
        for (; cell <= values.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            (new Vector<float>(values[cell..]) + (new Vector<float>(kelvins[cell..]) * weight)).CopyTo(values[cell..]);
        }

        for (; cell < values.Length; cell++)
        {
            values[cell] += kelvins[cell] * weight;
        }
    }
}
