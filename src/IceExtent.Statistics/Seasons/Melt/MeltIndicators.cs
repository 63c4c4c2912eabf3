using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace IceExtent.Statistics.Seasons;

/// <summary>The indicators of melt of every day of a series, and their sum as z-scores.</summary>
/// <remarks>Positions in the workspace are those of the series and <see cref="Pad"/>.</remarks>
internal static class MeltIndicators
{
    public const int Pad = MeltIndicatorRules.MostJumpDays;

    private const float LevelShare37 = 0.8f; // [MarkusStroeve2009]: 19V + 0.8 · 37V stands for the surface's temperature.

    /// <summary>Whether a winter has a day with ice at all.</summary>
    public static bool HasIce(in MeltSeries series, SearchSpan winter, MeltRules rules)
    {
        Vector<float> least = new((float)rules.LeastIceFraction);
        int day = winter.First;
        for (; day <= winter.Last + 1 - Vector<float>.Count; day += Vector<float>.Count)
        {
            if (Vector.GreaterThanOrEqualAny(new Vector<float>(series.IceFraction[day..]), least))
            {
                return true;
            }
        }

        while (day <= winter.Last && !(series.IceFraction[day] >= least[0]))
        {
            day++;
        }

        return day <= winter.Last;
    }

    /// <summary>Writes jump, gradient, level and horizontal range; missing on days that are not usable.</summary>
    /// <param name="series">The cell.</param>
    /// <param name="begin">The first day.</param>
    /// <param name="end">The day after the last.</param>
    /// <param name="rules">The least ice and the days of a jump.</param>
    /// <param name="backward">Whether a jump is measured against the days after rather than before.</param>
    /// <param name="room">Receives them: jump, gradient, level and range in Count, High, Low and Range.</param>
    public static void Fill(in MeltSeries series, int begin, int end, MeltRules rules, bool backward, MeltWorkspace room)
    {
        Clear(room.Lagged, begin, end);
        Clear(room.Present, begin, end);
        Vector<float> leastIce = new((float)rules.LeastIceFraction);
        bool needsRange = rules.Indicators.HorizontalRange.Weight > 0.0;
        ref float ice = ref MemoryMarshal.GetReference(series.IceFraction), range = ref MemoryMarshal.GetReference(series.HorizontalRangeKelvins);
        ref float v19 = ref MemoryMarshal.GetReference(series.Vertical19Kelvins), v37 = ref MemoryMarshal.GetReference(series.Vertical37Kelvins);
        nuint day = (nuint)begin, last = (nuint)end;
        for (; day + (nuint)Vector<float>.Count <= last; day += (nuint)Vector<float>.Count)
        {
            Write(
                Vector.GreaterThanOrEqual(Vector.LoadUnsafe(ref ice, day), leastIce),
                needsRange ? Vector.LoadUnsafe(ref range, day) : Vector<float>.Zero,
                Vector.LoadUnsafe(ref v19, day), Vector.LoadUnsafe(ref v37, day), room, Pad + day);
        }

        if (day < last)
        {
            WriteRest(series, (int)day, end, leastIce, needsRange, room);
        }

        Jumps(begin, end, rules.Indicators.JumpDays, backward ? 1 : -1, room);
    }

    /// <summary>Writes the sum of z-scores against a winter; missing where an indicator is.</summary>
    public static void Sum(int begin, int end, MeltReference winter, MeltWorkspace room)
    {
        Vector<float> jump = new(winter.Jump.Factor), gradient = new(winter.Gradient.Factor), level = new(winter.Level.Factor), range = new(winter.HorizontalRange.Factor);
        Vector<float> shift = new(winter.Shift);
        ref float jumps = ref MemoryMarshal.GetArrayDataReference(room.Count);
        ref float gradients = ref MemoryMarshal.GetArrayDataReference(room.High);
        ref float levels = ref MemoryMarshal.GetArrayDataReference(room.Low);
        ref float ranges = ref MemoryMarshal.GetArrayDataReference(room.Range);
        ref float scores = ref MemoryMarshal.GetArrayDataReference(room.Score);
        for (nuint at = (nuint)(Pad + begin); at < (nuint)(Pad + end); at += (nuint)Vector<float>.Count)
        {
            Vector<float> sum = shift + (jump * Vector.LoadUnsafe(ref jumps, at)) + (gradient * Vector.LoadUnsafe(ref gradients, at))
                + (level * Vector.LoadUnsafe(ref levels, at)) + (range * Vector.LoadUnsafe(ref ranges, at));
            sum.StoreUnsafe(ref scores, at);
        }
    }

    // A jump reads so many positions before and after the days that are written.
    private static void Clear(float[] plane, int begin, int end)
    {
        plane.AsSpan(begin, Pad).Clear();
        plane.AsSpan(Pad + end, Pad + Vector<float>.Count).Clear();
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static void Write(Vector<int> enough, Vector<float> range, Vector<float> v19, Vector<float> v37, MeltWorkspace room, nuint at)
    {
        Vector<float> missing = new(float.NaN), level = v19 + (v37 * LevelShare37);
        Vector<float> all = level + range;
        Vector<int> usable = enough & Vector.Equals(all, all);
        Put(room.Usable, at, Vector.ConditionalSelect(usable, v37, missing));
        Put(room.Lagged, at, Vector.ConditionalSelect(usable, v37, Vector<float>.Zero));
        Put(room.Present, at, Vector.ConditionalSelect(usable, Vector<float>.One, Vector<float>.Zero));
        Put(room.High, at, Vector.ConditionalSelect(usable, (v37 - v19) / (v37 + v19), missing));
        Put(room.Low, at, Vector.ConditionalSelect(usable, level, missing));
        Put(room.Range, at, Vector.ConditionalSelect(usable, range, missing));
    }

    private static void Put(float[] plane, nuint at, Vector<float> values) =>
        values.StoreUnsafe(ref MemoryMarshal.GetArrayDataReference(plane), at);

    // The days that do not fill a vector, through one that they fill in part.
    private static void WriteRest(in MeltSeries series, int day, int end, Vector<float> leastIce, bool needsRange, MeltWorkspace room)
    {
        int count = end - day;
        Span<float> ice = stackalloc float[Vector<float>.Count], range = stackalloc float[Vector<float>.Count];
        Span<float> v19 = stackalloc float[Vector<float>.Count], v37 = stackalloc float[Vector<float>.Count];
        ice.Fill(float.NaN);
        series.IceFraction.Slice(day, count).CopyTo(ice);
        series.Vertical19Kelvins.Slice(day, count).CopyTo(v19);
        series.Vertical37Kelvins.Slice(day, count).CopyTo(v37);
        if (needsRange)
        {
            series.HorizontalRangeKelvins.Slice(day, count).CopyTo(range);
        }

        Write(Vector.GreaterThanOrEqual(new Vector<float>(ice), leastIce), new(range), new(v19), new(v37), room, Pad + (nuint)day);
    }

    // 0 where none of the days that it is measured against is usable: no jump is known there.
    private static void Jumps(int begin, int end, int jumpDays, int direction, MeltWorkspace room)
    {
        ref float kelvins = ref MemoryMarshal.GetArrayDataReference(room.Lagged);
        ref float present = ref MemoryMarshal.GetArrayDataReference(room.Present);
        ref float usable = ref MemoryMarshal.GetArrayDataReference(room.Usable);
        ref float jumps = ref MemoryMarshal.GetArrayDataReference(room.Count);
        for (int at = Pad + begin; at < Pad + end; at += Vector<float>.Count)
        {
            Vector<float> sum = Vector<float>.Zero, count = Vector<float>.Zero;
            for (int lag = 1; lag <= jumpDays; lag++)
            {
                nuint other = (nuint)(at + (direction * lag));
                sum += Vector.LoadUnsafe(ref kelvins, other);
                count += Vector.LoadUnsafe(ref present, other);
            }

            Vector<float> here = Vector.LoadUnsafe(ref usable, (nuint)at);
            Vector<float> known = here - (sum / Vector.Max(count, Vector<float>.One));
            Vector<float> unknown = here - here; // 0, or missing where the day is.
            Vector.ConditionalSelect(Vector.GreaterThan(count, Vector<float>.Zero), known, unknown).StoreUnsafe(ref jumps, (nuint)at);
        }
    }
}
