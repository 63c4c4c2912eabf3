using System.Runtime.CompilerServices;

namespace IceExtent.Statistics.Seasons;

/// <summary>Bridges short gaps of a daily series and smooths it. Missing: NaN. Kernels: no checks, nothing allocated.</summary>
internal static class SeriesSmoothing
{
    /// <summary>The longest window of a running median.</summary>
    public const int MostDays = 31;

    /// <summary>Fills gaps of at most so many days with a straight line between their ends.</summary>
    /// <param name="series">Filled in place. Any unit.</param>
    /// <param name="days">The longest gap that is bridged.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void Bridge(Span<float> series, int days)
    {
        int known = -1;
        for (int day = 0; day < series.Length; day++)
        {
            if (float.IsNaN(series[day]))
            {
                continue;
            }

            int gap = day - known - 1;
            if (gap > 0 && gap <= days && known >= 0)
            {
                float step = (series[day] - series[known]) / (gap + 1);
                for (int filled = 1; filled <= gap; filled++)
                {
                    series[known + filled] = series[known] + (filled * step);
                }
            }

            known = day;
        }
    }

    /// <summary>Running mean of the known days of each window; a missing day stays missing.</summary>
    /// <param name="series">Any unit.</param>
    /// <param name="half">Days on either side.</param>
    /// <param name="smooth">Receives the means; as long as the series, and not the same memory.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void Mean(ReadOnlySpan<float> series, int half, Span<float> smooth)
    {
        // A sum that moves on by a day: in double precision what it gathers is far below a float's own step.
        double sum = 0.0;
        int known = 0;
        for (int day = -half; day < series.Length; day++)
        {
            int come = day + half, gone = day - half - 1;
            if (come < series.Length && !float.IsNaN(series[come]))
            {
                (sum, known) = (sum + series[come], known + 1);
            }

            if (gone >= 0 && !float.IsNaN(series[gone]))
            {
                (sum, known) = (sum - series[gone], known - 1);
            }

            if (day >= 0)
            {
                smooth[day] = float.IsNaN(series[day]) ? float.NaN : (float)(sum / known);
            }
        }
    }

    /// <summary>Running median of the known days of each window; of an even number, the mean of the middle two. Arguments as of <see cref="Mean"/>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void Median(ReadOnlySpan<float> series, int half, Span<float> smooth)
    {
        Span<float> sorted = stackalloc float[MostDays];
        int known = 0;
        for (int day = 0; day < Math.Min(half, series.Length); day++)
        {
            known = Insert(sorted, known, series[day]);
        }

        for (int day = 0; day < series.Length; day++)
        {
            // The window moves on by a day: one value goes, one comes.
            float gone = day > half ? series[day - half - 1] : float.NaN;
            float come = day + half < series.Length ? series[day + half] : float.NaN;
            if (gone != come) // Also where either is missing.
            {
                known = Remove(sorted, known, gone);
                known = Insert(sorted, known, come);
            }

            int middle = known / 2;
            smooth[day] = float.IsNaN(series[day]) ? float.NaN
                : (known & 1) == 1 ? sorted[middle]
                : 0.5f * (sorted[middle - 1] + sorted[middle]);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static int Insert(Span<float> sorted, int known, float value)
    {
        if (float.IsNaN(value))
        {
            return known;
        }

        int at = known;
        for (; at > 0 && sorted[at - 1] > value; at--)
        {
            sorted[at] = sorted[at - 1];
        }

        sorted[at] = value;
        return known + 1;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static int Remove(Span<float> sorted, int known, float value)
    {
        if (float.IsNaN(value))
        {
            return known;
        }

        int at = 0;
        while (sorted[at] != value)
        {
            at++;
        }

        for (; at < known - 1; at++)
        {
            sorted[at] = sorted[at + 1];
        }

        return known - 1;
    }
}
