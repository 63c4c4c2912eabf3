using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace IceExtent.Statistics.Seasons;

/// <summary>How the frozen cell looks: mean and scatter of its indicators over a winter, ready for the sum of z-scores.</summary>
internal readonly record struct MeltReference(MeltReference.Scaled Jump, MeltReference.Scaled Gradient, MeltReference.Scaled Level, MeltReference.Scaled HorizontalRange)
{
    /// <summary>What the factors leave to be added.</summary>
    public float Shift => (float)(Jump.Shift + Gradient.Shift + Level.Shift + HorizontalRange.Shift);

    /// <summary>Measures a winter, or null with too few usable days.</summary>
    /// <param name="winter">Its days.</param>
    /// <param name="rules">Weights and least scatter.</param>
    /// <param name="room">The indicators, as <see cref="MeltIndicators.Fill"/> wrote them.</param>
    public static MeltReference? Measure(SearchSpan winter, MeltIndicatorRules rules, MeltWorkspace room)
    {
        int from = MeltIndicators.Pad + winter.First, length = winter.Last - winter.First + 1;
        int count = length > 0 ? (int)Sums(room.Present.AsSpan(from, length)).Sum : 0;
        return count < rules.LeastWinterDays ? null : new(
            Scale(room.Count.AsSpan(from, length), count, rules.Jump, 1.0),
            Scale(room.High.AsSpan(from, length), count, rules.Gradient, 1.0),
            Scale(room.Low.AsSpan(from, length), count, rules.Level, 1.0),
            Scale(room.Range.AsSpan(from, length), count, rules.HorizontalRange, -1.0));
    }

    private static Scaled Scale(ReadOnlySpan<float> values, int count, MeltIndicator indicator, double sign)
    {
        if (indicator.Weight == 0.0)
        {
            return default;
        }

        (double sum, double squares) = Sums(values);
        double mean = sum / count;
        double scatter = Math.Sqrt(Math.Max(0.0, (squares - (sum * mean)) / (count - 1)));
        double factor = sign * indicator.Weight / Math.Max(scatter, indicator.LeastScatter);
        return new((float)factor, -factor * mean);
    }

    // Four sums side by side, the same on every machine, of the values that are there.
    private static (double Sum, double Squares) Sums(ReadOnlySpan<float> values)
    {
        Vector256<double> sums = Vector256<double>.Zero, squares = Vector256<double>.Zero;
        ref float start = ref MemoryMarshal.GetReference(values);
        int at = 0;
        for (; at <= values.Length - Vector128<float>.Count; at += Vector128<float>.Count)
        {
            Vector128<float> four = Vector128.LoadUnsafe(ref start, (nuint)at);
            four = Vector128.ConditionalSelect(Vector128.Equals(four, four), four, Vector128<float>.Zero);
            Vector256<double> wide = Vector256.Create(Vector128.WidenLower(four), Vector128.WidenUpper(four));
            sums += wide;
            squares += wide * wide;
        }

        (double sum, double square) = (Vector256.Sum(sums), Vector256.Sum(squares));
        for (; at < values.Length; at++)
        {
            double value = float.IsNaN(values[at]) ? 0.0 : values[at];
            sum += value;
            square += value * value;
        }

        return (sum, square);
    }

    /// <summary>One indicator's part of the sum: value times factor, and shift.</summary>
    internal readonly record struct Scaled(float Factor, double Shift);
}
