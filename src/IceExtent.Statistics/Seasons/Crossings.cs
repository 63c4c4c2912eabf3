using System.Runtime.CompilerServices;

namespace IceExtent.Statistics.Seasons;

/// <summary>Runs of days at or above, or below, a level. A missing day (NaN) neither makes nor breaks a run.</summary>
/// <remarks>Every function answers with an index, or <see cref="None"/>. Kernels: no checks, nothing allocated.</remarks>
internal static class Crossings
{
    /// <summary>There is no such run.</summary>
    public const int None = -1;

    /// <summary>The first day of the first run at or above a level.</summary>
    /// <param name="series">Any unit.</param>
    /// <param name="first">The run begins here or later …</param>
    /// <param name="last">… and not after this day; it may go on beyond it.</param>
    /// <param name="level">In the unit of the series.</param>
    /// <param name="days">How many known days make a run.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static int FirstAtLeast(ReadOnlySpan<float> series, int first, int last, float level, int days)
    {
        int run = 0, start = None;
        for (int day = first; day < series.Length; day++)
        {
            float value = series[day];
            if (value >= level)
            {
                start = run == 0 ? day : start;
                if (start > last)
                {
                    return None;
                }

                if (++run >= days)
                {
                    return start;
                }
            }
            else if (value < level)
            {
                if (day >= last)
                {
                    return None;
                }

                run = 0;
            }
        }

        return None;
    }

    /// <summary>The first day of the first run below a level. Arguments as of <see cref="FirstAtLeast"/>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static int FirstBelow(ReadOnlySpan<float> series, int first, int last, float level, int days)
    {
        int run = 0, start = None;
        for (int day = first; day < series.Length; day++)
        {
            float value = series[day];
            if (value < level)
            {
                start = run == 0 ? day : start;
                if (start > last)
                {
                    return None;
                }

                if (++run >= days)
                {
                    return start;
                }
            }
            else if (value >= level)
            {
                if (day >= last)
                {
                    return None;
                }

                run = 0;
            }
        }

        return None;
    }

    /// <summary>The last day of the last run at or above a level.</summary>
    /// <param name="series">Any unit.</param>
    /// <param name="first">The run ends here or later; it may have begun before …</param>
    /// <param name="last">… and not after this day.</param>
    /// <param name="level">In the unit of the series.</param>
    /// <param name="days">How many known days make a run.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static int LastAtLeast(ReadOnlySpan<float> series, int first, int last, float level, int days)
    {
        int run = 0, end = None;
        for (int day = Math.Min(last, series.Length - 1); day >= 0; day--)
        {
            float value = series[day];
            if (value >= level)
            {
                end = run == 0 ? day : end;
                if (end < first)
                {
                    return None;
                }

                if (++run >= days)
                {
                    return end;
                }
            }
            else if (value < level)
            {
                if (day <= first)
                {
                    return None;
                }

                run = 0;
            }
        }

        return None;
    }

    /// <summary>The nearest known day before one.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static int KnownBefore(ReadOnlySpan<float> series, int day)
    {
        for (int before = Math.Min(day, series.Length) - 1; before >= 0; before--)
        {
            if (!float.IsNaN(series[before]))
            {
                return before;
            }
        }

        return None;
    }

    /// <summary>The nearest known day after one.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static int KnownAfter(ReadOnlySpan<float> series, int day)
    {
        for (int after = day + 1; after < series.Length; after++)
        {
            if (!float.IsNaN(series[after]))
            {
                return after;
            }
        }

        return None;
    }

    /// <summary>The day of the lowest value; of several, the middle one of the longest row of them.</summary>
    /// <param name="series">Any unit.</param>
    /// <param name="first">The first day that may be it.</param>
    /// <param name="last">The last.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static int Lowest(ReadOnlySpan<float> series, int first, int last)
    {
        last = Math.Min(last, series.Length - 1);
        float lowest = float.PositiveInfinity;
        for (int day = Math.Max(first, 0); day <= last; day++)
        {
            lowest = series[day] < lowest ? series[day] : lowest;
        }

        int longest = 0, middle = None, start = None, end = None;
        for (int day = Math.Max(first, 0); day <= last + 1; day++)
        {
            if (day <= last && (series[day] == lowest || (float.IsNaN(series[day]) && start != None)))
            {
                start = start == None ? day : start;
                end = float.IsNaN(series[day]) ? end : day;
                continue;
            }

            if (start != None && end - start + 1 > longest)
            {
                (longest, middle) = (end - start + 1, start + ((end - start) / 2));
                middle = float.IsNaN(series[middle]) ? start : middle;
            }

            start = None;
        }

        return middle;
    }
}
