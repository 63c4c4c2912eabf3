using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>Brings concentrations into 0 to 1 and counts what it moved.</summary>
public static class Clipping
{
    /// <summary>Clips a run of cells.</summary>
    /// <param name="totalFraction">All ice; becomes 0 to 1, NaN stays.</param>
    /// <param name="multiyearFraction">Multiyear ice; becomes 0 to the clipped total, so that first-year ice, the rest, is never negative.</param>
    /// <param name="firstYearFraction">Receives first-year ice: the clipped total less the clipped multiyear ice.</param>
    /// <param name="conditions">Receives <see cref="CellConditions.ClippedBelow"/> or <see cref="CellConditions.ClippedAbove"/> where the total was moved.</param>
    /// <returns>The numbers of totals raised to 0 and lowered to 1.</returns>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    public static (int Below, int Above) Apply(
        Span<float> totalFraction,
        Span<float> multiyearFraction,
        Span<float> firstYearFraction,
        Span<CellConditions> conditions)
    {
        int cells = totalFraction.Length;
        if (multiyearFraction.Length != cells || firstYearFraction.Length != cells || conditions.Length != cells)
        {
            throw new ArgumentException("All planes must have the same number of cells.", nameof(totalFraction));
        }

        Span<ushort> masks = CellMasks.AsNumbers(conditions);
        int below = 0;
        int above = 0;
        int cell = 0;
        for (; cell <= cells - Vector<ushort>.Count; cell += Vector<ushort>.Count)
        {
            int half = cell + Vector<float>.Count;
            (Vector<int> low1, Vector<int> high1) = Clip(totalFraction[cell..], multiyearFraction[cell..], firstYearFraction[cell..]);
            (Vector<int> low2, Vector<int> high2) = Clip(totalFraction[half..], multiyearFraction[half..], firstYearFraction[half..]);
            below -= CellMasks.Set(low1, low2, (ushort)CellConditions.ClippedBelow, masks[cell..]);
            above -= CellMasks.Set(high1, high2, (ushort)CellConditions.ClippedAbove, masks[cell..]);
        }

        for (; cell < cells; cell++)
        {
            float total = totalFraction[cell];
            if (total < 0f)
            {
                masks[cell] |= (ushort)CellConditions.ClippedBelow;
                below++;
            }
            else if (total > 1f)
            {
                masks[cell] |= (ushort)CellConditions.ClippedAbove;
                above++;
            }

            float clipped = total < 0f ? 0f : total > 1f ? 1f : total;
            float multi = multiyearFraction[cell];
            totalFraction[cell] = clipped;
            multi = float.IsNaN(clipped) ? float.NaN : multi < 0f ? 0f : multi > clipped ? clipped : multi;
            multiyearFraction[cell] = multi;
            firstYearFraction[cell] = clipped - multi;
        }

        return (below, above);
    }

    /// <summary>Writes clipped fractions without counting.</summary>
    /// <param name="fraction">Concentrations; NaN is missing.</param>
    /// <param name="clipped">Receives 0 to 1; NaN stays. As long as <paramref name="fraction"/>.</param>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    public static void Copy(ReadOnlySpan<float> fraction, Span<float> clipped)
    {
        if (clipped.Length != fraction.Length)
        {
            throw new ArgumentException("Both planes must have the same number of cells.", nameof(clipped));
        }

        int cell = 0;
        for (; cell <= fraction.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Vector<float> value = new(fraction[cell..]);
            Vector<float> held = Vector.ConditionalSelect(Vector.LessThan(value, Vector<float>.Zero), Vector<float>.Zero, value);
            Vector.ConditionalSelect(Vector.GreaterThan(held, Vector<float>.One), Vector<float>.One, held).CopyTo(clipped[cell..]);
        }

        for (; cell < fraction.Length; cell++)
        {
            clipped[cell] = fraction[cell] < 0f ? 0f : fraction[cell] > 1f ? 1f : fraction[cell];
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private static (Vector<int> Below, Vector<int> Above) Clip(Span<float> totals, Span<float> multiyears, Span<float> firstYears)
    {
        Vector<float> total = new(totals);
        Vector<float> multi = new(multiyears);
        Vector<int> below = Vector.LessThan(total, Vector<float>.Zero);
        Vector<int> above = Vector.GreaterThan(total, Vector<float>.One);
        Vector<float> clipped = Vector.ConditionalSelect(below, Vector<float>.Zero, Vector.ConditionalSelect(above, Vector<float>.One, total));
        clipped.CopyTo(totals);

        Vector<float> lifted = Vector.ConditionalSelect(Vector.LessThan(multi, Vector<float>.Zero), Vector<float>.Zero, multi);
        Vector<float> bounded = Vector.ConditionalSelect(Vector.GreaterThan(lifted, clipped), clipped, lifted);
        Vector<float> kept = Vector.ConditionalSelect(Vector.Equals(clipped, clipped), bounded, clipped);
        kept.CopyTo(multiyears);
        (clipped - kept).CopyTo(firstYears);
        return (below, above);
    }
}
