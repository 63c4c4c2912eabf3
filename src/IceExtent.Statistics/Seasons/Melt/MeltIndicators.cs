using System.Numerics;

namespace IceExtent.Statistics.Seasons;

/// <summary>The indicators of melt of every day of a series, and their sum as z-scores.</summary>
/// <remarks>Positions in the workspace are those of the series and <see cref="Pad"/>.</remarks>
internal static class MeltIndicators
{
    public const int Pad = MeltIndicatorRules.MostJumpDays;

    private const float LevelShare37 = 0.8f; // [Markus2009]: 19V + 0.8 · 37V stands for the surface's temperature.

    /// <summary>Writes jump, gradient, level and horizontal range; missing on days that are not usable.</summary>
    /// <param name="series">The cell.</param>
    /// <param name="begin">The first day.</param>
    /// <param name="end">The day after the last.</param>
    /// <param name="rules">The least ice and the days of a jump.</param>
    /// <param name="backward">Whether a jump is measured against the days after rather than before.</param>
    /// <param name="room">Receives them: jump, gradient, level and range in Count, High, Low and Range.</param>
    public static void Fill(in MeltSeries series, int begin, int end, MeltRules rules, bool backward, MeltWorkspace room)
    {
        room.Lagged.AsSpan(begin, end - begin + (2 * Pad) + Vector<float>.Count).Clear();
        room.Present.AsSpan(begin, end - begin + (2 * Pad) + Vector<float>.Count).Clear();
        float leastIce = (float)rules.LeastIceFraction;
        bool needsRange = rules.Indicators.HorizontalRange.Weight > 0.0;
        int day = begin;
        for (; day <= end - Vector<float>.Count; day += Vector<float>.Count)
        {
            Vector<float> range = needsRange ? new(series.HorizontalRangeKelvins[day..]) : Vector<float>.Zero;
            Write(new(series.IceFraction[day..]), new(leastIce), range, new(series.Vertical19Kelvins[day..]), new(series.Vertical37Kelvins[day..]), room, Pad + day);
        }

        if (day < end)
        {
            WriteRest(series, day, end, leastIce, needsRange, room);
        }

        Jumps(begin, end, rules.Indicators.JumpDays, backward ? 1 : -1, room);
    }

    /// <summary>Writes the sum of z-scores against a winter; missing where an indicator is.</summary>
    public static void Sum(int begin, int end, MeltReference winter, MeltWorkspace room)
    {
        Vector<float> jump = new(winter.Jump.Factor), gradient = new(winter.Gradient.Factor), level = new(winter.Level.Factor), range = new(winter.HorizontalRange.Factor);
        Vector<float> shift = new(winter.Shift);
        for (int at = Pad + begin; at < Pad + end; at += Vector<float>.Count)
        {
            Vector<float> sum = shift + (jump * new Vector<float>(room.Count, at)) + (gradient * new Vector<float>(room.High, at))
                + (level * new Vector<float>(room.Low, at)) + (range * new Vector<float>(room.Range, at));
            sum.CopyTo(room.Score, at);
        }
    }

    private static void Write(
        Vector<float> ice, Vector<float> leastIce, Vector<float> range, Vector<float> v19, Vector<float> v37, MeltWorkspace room, int at)
    {
        Vector<float> missing = new(float.NaN), level = v19 + (v37 * LevelShare37);
        Vector<float> all = level + range;
        Vector<int> usable = Vector.GreaterThanOrEqual(ice, leastIce) & Vector.Equals(all, all);
        Vector.ConditionalSelect(usable, v37, missing).CopyTo(room.Usable, at);
        Vector.ConditionalSelect(usable, v37, Vector<float>.Zero).CopyTo(room.Lagged, at);
        Vector.ConditionalSelect(usable, Vector<float>.One, Vector<float>.Zero).CopyTo(room.Present, at);
        Vector.ConditionalSelect(usable, (v37 - v19) / (v37 + v19), missing).CopyTo(room.High, at);
        Vector.ConditionalSelect(usable, level, missing).CopyTo(room.Low, at);
        Vector.ConditionalSelect(usable, range, missing).CopyTo(room.Range, at);
    }

    // The days that do not fill a vector, through one that they fill in part.
    private static void WriteRest(in MeltSeries series, int day, int end, float leastIce, bool needsRange, MeltWorkspace room)
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

        Write(new(ice), new(leastIce), new(range), new(v19), new(v37), room, Pad + day);
    }

    // 0 where none of the days that it is measured against is usable: no jump is known there.
    private static void Jumps(int begin, int end, int jumpDays, int direction, MeltWorkspace room)
    {
        for (int at = Pad + begin; at < Pad + end; at += Vector<float>.Count)
        {
            Vector<float> sum = Vector<float>.Zero, count = Vector<float>.Zero;
            for (int lag = 1; lag <= jumpDays; lag++)
            {
                sum += new Vector<float>(room.Lagged, at + (direction * lag));
                count += new Vector<float>(room.Present, at + (direction * lag));
            }

            Vector<float> here = new(room.Usable, at);
            Vector<float> known = here - (sum / Vector.Max(count, Vector<float>.One));
            Vector<float> unknown = here - here; // 0, or missing where the day is.
            Vector.ConditionalSelect(Vector.GreaterThan(count, Vector<float>.Zero), known, unknown).CopyTo(room.Count, at);
        }
    }
}
