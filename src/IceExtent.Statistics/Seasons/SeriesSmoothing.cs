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
        for (int day = 0; day < series.Length; day++)
        {
            if (float.IsNaN(series[day]))
            {
                smooth[day] = float.NaN;
                continue;
            }

            float sum = 0f;
            int known = 0;
            int last = Math.Min(day + half, series.Length - 1);
            for (int near = Math.Max(day - half, 0); near <= last; near++)
            {
                float value = series[near];
                if (!float.IsNaN(value))
                {
                    sum += value;
                    known++;
                }
            }

            smooth[day] = sum / known;
        }
    }

    /// <summary>Running median of the known days of each window; of an even number, the mean of the middle two. Arguments as of <see cref="Mean"/>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void Median(ReadOnlySpan<float> series, int half, Span<float> smooth)
    {
        Span<float> sorted = stackalloc float[MostDays];
        for (int day = 0; day < series.Length; day++)
        {
            if (float.IsNaN(series[day]))
            {
                smooth[day] = float.NaN;
                continue;
            }

            int known = 0;
            int last = Math.Min(day + half, series.Length - 1);
            for (int near = Math.Max(day - half, 0); near <= last; near++)
            {
                float value = series[near];
                if (float.IsNaN(value))
                {
                    continue;
                }

                int at = known++;
                for (; at > 0 && sorted[at - 1] > value; at--)
                {
                    sorted[at] = sorted[at - 1];
                }

                sorted[at] = value;
            }

            int middle = known / 2;
            smooth[day] = (known & 1) == 1 ? sorted[middle] : 0.5f * (sorted[middle - 1] + sorted[middle]);
        }
    }
}
