using System.Numerics;

namespace IceExtent.Scenes.Fields;

/// <summary>Loops over planes, several cells at a time. Lengths are the caller's duty.</summary>
internal static class PlaneMath
{
    /// <summary>The length of a plane that whole vectors fill.</summary>
    public static int PaddedLength(int count) =>
        (count + Vector<float>.Count - 1) / Vector<float>.Count * Vector<float>.Count;

    /// <summary>Adds <paramref name="factor"/> times one plane to another.</summary>
    public static void AddScaled(Span<float> into, ReadOnlySpan<float> from, float factor)
    {
        int cell = 0;
        for (; cell <= into.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            (new Vector<float>(into[cell..]) + (new Vector<float>(from[cell..]) * factor)).CopyTo(into[cell..]);
        }

        for (; cell < into.Length; cell++)
        {
            into[cell] += from[cell] * factor;
        }
    }

    /// <summary>Writes <paramref name="factor"/> times one plane over another.</summary>
    public static void WriteScaled(Span<float> into, ReadOnlySpan<float> from, float factor)
    {
        int cell = 0;
        for (; cell <= into.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            (new Vector<float>(from[cell..]) * factor).CopyTo(into[cell..]);
        }

        for (; cell < into.Length; cell++)
        {
            into[cell] = from[cell] * factor;
        }
    }

    /// <summary>Adds the sum of four planes, each times its factor.</summary>
    public static void AddFour(
        Span<float> into,
        ReadOnlySpan<float> first,
        ReadOnlySpan<float> second,
        ReadOnlySpan<float> third,
        ReadOnlySpan<float> fourth,
        ReadOnlySpan<float> factors)
    {
        float a = factors[0], b = factors[1], c = factors[2], d = factors[3];
        int cell = 0;
        for (; cell <= into.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Vector<float> sum = (new Vector<float>(first[cell..]) * a) + (new Vector<float>(second[cell..]) * b)
                + (new Vector<float>(third[cell..]) * c) + (new Vector<float>(fourth[cell..]) * d);
            (new Vector<float>(into[cell..]) + sum).CopyTo(into[cell..]);
        }

        for (; cell < into.Length; cell++)
        {
            into[cell] += (first[cell] * a) + (second[cell] * b) + (third[cell] * c) + (fourth[cell] * d);
        }
    }

    /// <summary>0 at and below 0, 1 at and above 1, smooth between.</summary>
    public static double SmoothStep(double x)
    {
        double t = Math.Clamp(x, 0.0, 1.0);
        return t * t * (3.0 - (2.0 * t));
    }

    /// <summary>0 at and below 0, 1 at and above 1, smooth between.</summary>
    public static Vector<float> SmoothStep(Vector<float> x)
    {
        Vector<float> t = Vector.Min(Vector.Max(x, Vector<float>.Zero), Vector<float>.One);
        return t * t * (new Vector<float>(3f) - (t + t));
    }
}
