using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace IceExtent.Retrieval;

/// <summary>Factors and solves symmetric positive definite systems whose entries lie near the diagonal.</summary>
/// <remarks>
/// Layout: the lower triangle in rows of bandwidth + 1, so entry (i, j) stands at i·(bandwidth + 1) + j − i + bandwidth
/// and the diagonal is last in its row. Entries left of column 0 are never read. A full matrix has a bandwidth of its
/// size less 1. Always four lanes, added up in one order: the result is the same on every processor.
/// </remarks>
internal static class BandedCholesky
{
    /// <summary>Replaces a matrix by its lower factor; the diagonal becomes the inverse of the factor's.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void Factor(Span<double> matrix, int size, int bandwidth)
    {
        int width = bandwidth + 1;
        for (int row = 0; row < size; row++)
        {
            int first = Math.Max(0, row - bandwidth);
            Span<double> entries = matrix.Slice((row * width) + first - row + bandwidth, row - first + 1);
            for (int column = first; column < row; column++)
            {
                ReadOnlySpan<double> above = matrix.Slice((column * width) + first - column + bandwidth, column - first + 1);
                entries[column - first] = (entries[column - first] - Dot(entries[..(column - first)], above)) * above[^1];
            }

            entries[^1] = 1.0 / Math.Sqrt(entries[^1] - Dot(entries[..^1], entries));
        }
    }

    /// <summary>Replaces a right-hand side by the solution.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void Solve(ReadOnlySpan<double> factor, int size, int bandwidth, Span<double> values)
    {
        int width = bandwidth + 1;
        for (int row = 0; row < size; row++)
        {
            int first = Math.Max(0, row - bandwidth);
            ReadOnlySpan<double> entries = factor.Slice((row * width) + first - row + bandwidth, row - first + 1);
            values[row] = (values[row] - Dot(entries[..^1], values[first..])) * entries[^1];
        }

        for (int row = size - 1; row >= 0; row--)
        {
            int first = Math.Max(0, row - bandwidth);
            ReadOnlySpan<double> entries = factor.Slice((row * width) + first - row + bandwidth, row - first + 1);
            double value = values[row] * entries[^1];
            values[row] = value;
            Subtract(entries[..^1], value, values[first..]);
        }
    }

    // The sum of products over the length of left.
    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once an entry or row.
    private static double Dot(ReadOnlySpan<double> left, ReadOnlySpan<double> right)
    {
        right = right[..left.Length];
        Vector256<double> sums = Vector256<double>.Zero;
        int index = 0;
        for (; index <= left.Length - Vector256<double>.Count; index += Vector256<double>.Count)
        {
            sums += Load(left, index) * Load(right, index);
        }

        double sum = sums[0] + sums[1] + (sums[2] + sums[3]);
        for (; index < left.Length; index++)
        {
            sum += left[index] * right[index];
        }

        return sum;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a row.
    private static void Subtract(ReadOnlySpan<double> from, double factor, Span<double> to)
    {
        to = to[..from.Length];
        Vector256<double> factors = Vector256.Create(factor);
        int index = 0;
        for (; index <= from.Length - Vector256<double>.Count; index += Vector256<double>.Count)
        {
            (Load(to, index) - (Load(from, index) * factors)).CopyTo(to[index..]);
        }

        for (; index < from.Length; index++)
        {
            to[index] -= from[index] * factor;
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)] // One load.
    private static Vector256<double> Load(ReadOnlySpan<double> values, int index) =>
        Vector256.LoadUnsafe(ref MemoryMarshal.GetReference(values), (nuint)index);
}
