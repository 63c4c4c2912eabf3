using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace IceExtent.Retrieval;

/// <summary>Sets bits of the condition plane for several cells at a time.</summary>
internal static class CellMasks
{
    /// <summary>The same memory, as numbers.</summary>
    public static Span<ushort> AsNumbers(Span<CellConditions> conditions) => MemoryMarshal.Cast<CellConditions, ushort>(conditions);

    /// <summary>Sets one bit where a lane is all ones.</summary>
    /// <param name="first">Lanes of −1 or 0 for the first half of the cells.</param>
    /// <param name="second">Lanes of −1 or 0 for the second half.</param>
    /// <param name="bit">The bit to set.</param>
    /// <param name="masks">Changed in place; at least <c>Vector&lt;ushort&gt;.Count</c> long.</param>
    /// <returns>Minus the number of cells set.</returns>
    [MethodImpl(MethodImplOptions.AggressiveInlining)] // Called once a vector.
    public static int Set(Vector<int> first, Vector<int> second, ushort bit, Span<ushort> masks)
    {
        Vector<ushort> lanes = Vector.AsVectorUInt16(Vector.Narrow(first, second));
        (new Vector<ushort>(masks) | (lanes & new Vector<ushort>(bit))).CopyTo(masks);
        return Vector.Sum(first + second);
    }
}
