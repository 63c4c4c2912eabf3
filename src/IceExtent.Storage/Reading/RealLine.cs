using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Storage.Reading;

/// <summary>Copies kelvins that are stored as 32-bit reals, without a scale, and marks the missing ones; several cells at a time.</summary>
/// <remarks>The same as <see cref="KelvinEncoding.ToKelvins"/> cell by cell (see <c>KelvinDecoderTests</c>).</remarks>
internal static class RealLine
{
    /// <summary>Whether an encoding is of this simple kind.</summary>
    public static bool Suits(KelvinEncoding encoding) =>
        encoding.Number == StoredNumber.RealFourBytes
        && encoding.Scale.Equals(1.0)
        && encoding.Offset.Equals(0.0)
        && encoding.Missing.Length <= 2
        && LimitOf(encoding.Lowest).Equals((double)(float)LimitOf(encoding.Lowest))
        && LimitOf(encoding.Highest).Equals((double)(float)LimitOf(encoding.Highest))
        && Array.TrueForAll(encoding.Missing, mark => mark.Equals((double)(float)mark));

    /// <summary>Writes the kelvins of some cells; both spans have one length.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // As in KelvinDecoder.
    public static void Decode(ReadOnlySpan<float> stored, KelvinEncoding encoding, Span<float> kelvins)
    {
        float lowest = (float)LimitOf(encoding.Lowest);
        float highest = (float)LimitOf(encoding.Highest);
        float first = encoding.Missing.Length > 0 ? (float)encoding.Missing[0] : float.NaN;
        float second = encoding.Missing.Length > 1 ? (float)encoding.Missing[1] : float.NaN;
        Vector<float> missing = new(float.NaN);

        int cell = 0;
        for (; cell <= stored.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Vector<float> number = new(stored[cell..]);
            Vector<int> isThere = Vector.GreaterThanOrEqual(number, new Vector<float>(lowest))
                & Vector.LessThanOrEqual(number, new Vector<float>(highest))
                & ~Vector.Equals(number, new Vector<float>(first))
                & ~Vector.Equals(number, new Vector<float>(second));
            Vector.ConditionalSelect(isThere, number, missing).CopyTo(kelvins[cell..]);
        }

        for (; cell < stored.Length; cell++)
        {
            float number = stored[cell];
            kelvins[cell] = number >= lowest && number <= highest && number != first && number != second ? number : float.NaN;
        }
    }

    // No 32-bit real but an infinity lies beyond these.
    private static double LimitOf(double limit) => Math.Clamp(limit, float.MinValue, float.MaxValue);
}
