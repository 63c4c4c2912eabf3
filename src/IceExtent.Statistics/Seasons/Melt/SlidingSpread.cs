using System.Numerics;

namespace IceExtent.Statistics.Seasons;

/// <summary>The largest less the smallest value in a window that slides over a series.</summary>
internal static class SlidingSpread
{
    /// <summary>Fills <see cref="MeltWorkspace.Range"/> and <see cref="MeltWorkspace.Count"/> from <see cref="MeltWorkspace.Usable"/>.</summary>
    /// <param name="room">The window that starts at a position gets its spread, −∞ where it is empty, and its number of values there.</param>
    /// <param name="from">The first position.</param>
    /// <param name="to">The position after the last; the room holds 32 and a vector more.</param>
    /// <param name="width">The window, 1 to 32.</param>
    /// <remarks>Windows are put together from ones half as wide: a handful of passes, whatever the width.</remarks>
    public static void Fill(MeltWorkspace room, int from, int to, int width)
    {
        int end = to + width;
        Begin(room, from, end);
        int covered = 0;
        for (int part = 1; part <= width; part *= 2)
        {
            if ((width & part) != 0)
            {
                Join(room, from, to, covered);
                covered += part;
            }

            if (2 * part <= width)
            {
                end -= part;
                Double(room, from, end, part);
            }
        }

        for (int at = from; at < to; at += Vector<float>.Count)
        {
            (new Vector<float>(room.Lagged, at) - new Vector<float>(room.Range, at)).CopyTo(room.Range, at);
        }
    }

    private static void Begin(MeltWorkspace room, int from, int end)
    {
        Vector<float> most = new(float.PositiveInfinity), least = new(float.NegativeInfinity);
        for (int at = from; at < end; at += Vector<float>.Count)
        {
            Vector<float> value = new(room.Usable, at);
            Vector<int> there = Vector.Equals(value, value);
            Vector.ConditionalSelect(there, value, most).CopyTo(room.Low, at);
            Vector.ConditionalSelect(there, value, least).CopyTo(room.High, at);
            Vector.ConditionalSelect(there, Vector<float>.One, Vector<float>.Zero).CopyTo(room.Present, at);
        }
    }

    private static void Double(MeltWorkspace room, int from, int end, int part)
    {
        for (int at = from; at < end; at += Vector<float>.Count)
        {
            Vector.Min(new Vector<float>(room.Low, at), new Vector<float>(room.Low, at + part)).CopyTo(room.Low, at);
            Vector.Max(new Vector<float>(room.High, at), new Vector<float>(room.High, at + part)).CopyTo(room.High, at);
            (new Vector<float>(room.Present, at) + new Vector<float>(room.Present, at + part)).CopyTo(room.Present, at);
        }
    }

    private static void Join(MeltWorkspace room, int from, int to, int covered)
    {
        for (int at = from; at < to; at += Vector<float>.Count)
        {
            Vector<float> low = new(room.Low, at + covered), high = new(room.High, at + covered), count = new(room.Present, at + covered);
            (covered == 0 ? low : Vector.Min(low, new Vector<float>(room.Range, at))).CopyTo(room.Range, at);
            (covered == 0 ? high : Vector.Max(high, new Vector<float>(room.Lagged, at))).CopyTo(room.Lagged, at);
            (covered == 0 ? count : count + new Vector<float>(room.Count, at)).CopyTo(room.Count, at);
        }
    }
}
