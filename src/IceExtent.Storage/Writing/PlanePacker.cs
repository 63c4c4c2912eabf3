using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace IceExtent.Storage.Writing;

/// <summary>Turns planes of real numbers into planes of scaled integers.</summary>
/// <remarks>
/// Both spans have the same length; nothing is checked. Ties go to the even integer. Each fast kernel gives the same
/// integers as the plain one, cell by cell (see <c>PlanePackerLaws</c>).
/// </remarks>
internal static class PlanePacker
{
    /// <summary>Packs into 16-bit integers.</summary>
    /// <param name="values">One value a cell; NaN is missing.</param>
    /// <param name="range">The packing.</param>
    /// <param name="stored">Receives one integer a cell; <see cref="Packing.Fill"/> is missing.</param>
    public static void Pack(ReadOnlySpan<float> values, StoredRange range, Span<short> stored)
    {
        Vectors constants = new(range, Packing.Fill);
        int width = Vector256<short>.Count;
        int cell = 0;
        ref float from = ref MemoryMarshal.GetReference(values);
        ref short to = ref MemoryMarshal.GetReference(stored);
        for (; cell <= values.Length - width; cell += width)
        {
            Vector256<int> left = constants.Apply(Vector256.LoadUnsafe(ref from, (nuint)cell));
            Vector256<int> right = constants.Apply(Vector256.LoadUnsafe(ref from, (nuint)(cell + Vector256<int>.Count)));
            Vector256.Narrow(left, right).StoreUnsafe(ref to, (nuint)cell);
        }

        PackPlainly(values[cell..], range, stored[cell..]);
    }

    /// <summary>Packs into bytes.</summary>
    /// <param name="values">One value a cell; NaN is missing.</param>
    /// <param name="range">The packing.</param>
    /// <param name="stored">Receives one byte a cell; <see cref="BytePacking.Fill"/> is missing.</param>
    public static void Pack(ReadOnlySpan<float> values, StoredRange range, Span<byte> stored)
    {
        for (int cell = 0; cell < values.Length; cell++)
        {
            stored[cell] = (byte)StoredOf(values[cell], range, BytePacking.Fill);
        }
    }

    /// <summary>Packs into 16-bit integers, one cell at a time.</summary>
    /// <param name="values">One value a cell; NaN is missing.</param>
    /// <param name="range">The packing.</param>
    /// <param name="stored">Receives one integer a cell; <see cref="Packing.Fill"/> is missing.</param>
    public static void PackPlainly(ReadOnlySpan<float> values, StoredRange range, Span<short> stored)
    {
        for (int cell = 0; cell < values.Length; cell++)
        {
            stored[cell] = (short)StoredOf(values[cell], range, Packing.Fill);
        }
    }

    private static int StoredOf(float value, StoredRange range, int fill) => float.IsNaN(value)
        ? fill
        : (int)MathF.Round(Math.Clamp((value - range.Offset) * range.StepsPerUnit, range.Lowest, range.Highest));

    private readonly struct Vectors(StoredRange range, int fill)
    {
        private readonly Vector256<float> offset = Vector256.Create(range.Offset);
        private readonly Vector256<float> stepsPerUnit = Vector256.Create(range.StepsPerUnit);
        private readonly Vector256<float> lowest = Vector256.Create((float)range.Lowest);
        private readonly Vector256<float> highest = Vector256.Create((float)range.Highest);
        private readonly Vector256<float> missing = Vector256.Create((float)fill);

        public Vector256<int> Apply(Vector256<float> values)
        {
            Vector256<float> steps = (values - offset) * stepsPerUnit;
            Vector256<float> held = Vector256.Round(Vector256.ClampNative(steps, lowest, highest));
            return Vector256.ConvertToInt32Native(Vector256.ConditionalSelect(Vector256.Equals(values, values), held, missing));
        }
    }
}
