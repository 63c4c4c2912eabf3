using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>Sets cells to open water where a gradient ratio says that weather, not ice, makes the signal.</summary>
/// <remarks>
/// Rule: open water where GR = (upper − lower)/(upper + lower) exceeds its limit. Sources: [Gloersen1986] for
/// 37/19, [Cavalieri1995] for 22/19. A ratio equal to the limit stays ice. Temperatures stored in tenths of a
/// kelvin often sit exactly on a limit given in thousandths; then (upper − lower) − limit·(upper + lower) is a
/// multiple of 1e-4 K, so comparing it with half that step decides as exact integers would
/// (see <c>GradientScreenTieTests</c>).
/// </remarks>
public static class GradientScreen
{
    /// <summary>Half the smallest step by which tenths of a kelvin can miss a limit in thousandths. Unit: K.</summary>
    public const float TieKelvins = 5e-5f;

    /// <summary>Screens a run of cells.</summary>
    /// <param name="upperKelvins">The channel of higher frequency, in K; a missing one screens nothing.</param>
    /// <param name="lowerKelvins">The 19 GHz vertical channel, in K; a missing one screens nothing.</param>
    /// <param name="limit">The largest gradient ratio that may be ice, without unit.</param>
    /// <param name="screened">The condition to set where the ratio exceeds the limit.</param>
    /// <param name="totalFraction">Becomes 0 where the ratio exceeds the limit; NaN stays NaN.</param>
    /// <param name="conditions">Receives <paramref name="screened"/> where the ratio exceeds the limit and the total is not missing.</param>
    /// <returns>The number of cells screened.</returns>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    public static int Apply(
        ReadOnlySpan<float> upperKelvins,
        ReadOnlySpan<float> lowerKelvins,
        double limit,
        CellConditions screened,
        Span<float> totalFraction,
        Span<CellConditions> conditions)
    {
        int cells = upperKelvins.Length;
        if (lowerKelvins.Length != cells || totalFraction.Length != cells || conditions.Length != cells)
        {
            throw new ArgumentException("All planes must have the same number of cells.", nameof(totalFraction));
        }

        Span<ushort> masks = CellMasks.AsNumbers(conditions);
        float ratio = (float)limit;
        int counted = 0;
        int cell = 0;
        for (; cell <= cells - Vector<ushort>.Count; cell += Vector<ushort>.Count)
        {
            Vector<int> first = Exceeds(upperKelvins[cell..], lowerKelvins[cell..], ratio, totalFraction[cell..]);
            int half = cell + Vector<float>.Count;
            Vector<int> second = Exceeds(upperKelvins[half..], lowerKelvins[half..], ratio, totalFraction[half..]);
            counted -= CellMasks.Set(first, second, (ushort)screened, masks[cell..]);
        }

        for (; cell < cells; cell++)
        {
            float sum = upperKelvins[cell] + lowerKelvins[cell];
            float difference = upperKelvins[cell] - lowerKelvins[cell];
            if (difference - (ratio * sum) > TieKelvins && !float.IsNaN(totalFraction[cell]))
            {
                totalFraction[cell] = 0f;
                masks[cell] |= (ushort)screened;
                counted++;
            }
        }

        return counted;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    private static Vector<int> Exceeds(ReadOnlySpan<float> upper, ReadOnlySpan<float> lower, float limit, Span<float> total)
    {
        Vector<float> high = new(upper);
        Vector<float> low = new(lower);
        Vector<float> fraction = new(total);
        Vector<int> exceeds = Vector.GreaterThan((high - low) - ((high + low) * limit), new Vector<float>(TieKelvins));
        exceeds &= Vector.Equals(fraction, fraction); // NaN stays missing.
        Vector.ConditionalSelect(exceeds, Vector<float>.Zero, fraction).CopyTo(total);
        return exceeds;
    }
}
