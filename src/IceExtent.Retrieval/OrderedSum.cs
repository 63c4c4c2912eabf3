using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace IceExtent.Retrieval;

/// <summary>Sums of many products in one order on every machine.</summary>
public static class OrderedSum
{
    /// <summary>Σ of products, in four lanes whatever the processor has.</summary>
    /// <param name="left">The one factor.</param>
    /// <param name="right">The other, at least as long.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    public static double OfProducts(ReadOnlySpan<double> left, ReadOnlySpan<double> right)
    {
        Vector256<double> lanes = Vector256<double>.Zero;
        int index = 0;
        for (; index <= left.Length - Vector256<double>.Count; index += Vector256<double>.Count)
        {
            lanes += Vector256.Create(left[index..]) * Vector256.Create(right[index..]);
        }

        double sum = Vector256.Sum(lanes);
        for (; index < left.Length; index++)
        {
            sum += left[index] * right[index];
        }

        return sum;
    }
}
