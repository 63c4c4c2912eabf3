using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>Makes brightness temperatures that no surface can have missing.</summary>
public static class RangeScreen
{
    /// <summary>What any radiometer may see of the Earth; a sensor's own range is never wider. Unit: K.</summary>
    /// <remarks>Common practice with no source: cold sky reflected by calm water stays above 50 K, land below 350 K.</remarks>
    public static KelvinRange Physical { get; } = new(50.0, 350.0);

    /// <summary>Screens a run of cells.</summary>
    /// <param name="kelvins">In K; values outside the range become NaN, NaN stays.</param>
    /// <param name="range">The values that are believed, both ends included.</param>
    /// <param name="conditions">Receives <see cref="CellConditions.OutOfRange"/> where a value was made missing.</param>
    /// <returns>The number of values made missing; NaN is not counted.</returns>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    public static int Apply(Span<float> kelvins, KelvinRange range, Span<CellConditions> conditions)
    {
        ArgumentNullException.ThrowIfNull(range);
        if (conditions.Length != kelvins.Length)
        {
            throw new ArgumentException("Both planes must have the same number of cells.", nameof(conditions));
        }

        Span<ushort> masks = CellMasks.AsNumbers(conditions);
        float lowest = (float)range.LowestKelvins;
        float highest = (float)range.HighestKelvins;
        int counted = 0;
        int cell = 0;
        for (; cell <= kelvins.Length - Vector<ushort>.Count; cell += Vector<ushort>.Count)
        {
            Vector<int> first = Outside(kelvins[cell..], lowest, highest);
            Vector<int> second = Outside(kelvins[(cell + Vector<float>.Count)..], lowest, highest);
            if (first != Vector<int>.Zero || second != Vector<int>.Zero)
            {
                counted -= CellMasks.Set(first, second, (ushort)CellConditions.OutOfRange, masks[cell..]);
            }
        }

        for (; cell < kelvins.Length; cell++)
        {
            if (kelvins[cell] < lowest || kelvins[cell] > highest)
            {
                kelvins[cell] = float.NaN;
                masks[cell] |= (ushort)CellConditions.OutOfRange;
                counted++;
            }
        }

        return counted;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private static Vector<int> Outside(Span<float> kelvins, float lowest, float highest)
    {
        Vector<float> value = new(kelvins);
        Vector<int> outside = Vector.LessThan(value, new Vector<float>(lowest)) | Vector.GreaterThan(value, new Vector<float>(highest));
        if (outside != Vector<int>.Zero)
        {
            Vector.ConditionalSelect(outside, new Vector<float>(float.NaN), value).CopyTo(kelvins);
        }

        return outside;
    }
}
