using System.Collections.Concurrent;
using System.Reflection;
using System.Runtime.CompilerServices;
using PureHDF.VOL.Native;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Reaches the bytes of an attribute, which the library has read already but hands out only through reflection.</summary>
/// <remarks>
/// A file has some forty attributes that matter, and the library's own way takes 5 to 10 µs for each. This rests on
/// the inside of PureHDF 2.2.0; where that has changed, nothing is reached and the library's own way is taken. A
/// test holds that both ways give the same.
/// </remarks>
internal static class AttributeBytes
{
    private const string MessageType = "PureHDF.VOL.Native.AttributeMessage, PureHDF";
    private const string DatatypeType = "PureHDF.VOL.Native.DatatypeMessage, PureHDF";
    private const string BitFieldType = "PureHDF.VOL.Native.DatatypeBitFieldDescription, PureHDF";

    // Descriptions of number types, compared by value, that the library itself took for little-endian.
    private static readonly ConcurrentDictionary<object, bool> Proven = new();

    private static readonly Lazy<bool> Reachable = new(FindMembers);

    /// <summary>The bytes as they are stored, or null where they cannot be reached.</summary>
    public static ReadOnlyMemory<byte>? Of(NativeAttribute attribute) =>
        Reachable.Value ? InputDataOf(MessageOf(attribute)) : null;

    /// <summary>The bytes of numbers known to be little-endian; null where that is not known.</summary>
    public static ReadOnlyMemory<byte>? OfNumbers(NativeAttribute attribute) =>
        Reachable.Value && Proven.ContainsKey(BitFieldOf(DatatypeOf(MessageOf(attribute)))) ? Of(attribute) : null;

    /// <summary>Notes that the library read the attribute's numbers, which it does with little-endian ones only.</summary>
    public static void Prove(NativeAttribute attribute)
    {
        if (Reachable.Value)
        {
            Proven.TryAdd(BitFieldOf(DatatypeOf(MessageOf(attribute))), true);
        }
    }

    private static bool FindMembers()
    {
        const BindingFlags Any = BindingFlags.Instance | BindingFlags.Public | BindingFlags.NonPublic;
        PropertyInfo? message = typeof(NativeAttribute).GetProperty("Message", Any);
        PropertyInfo? datatype = message?.PropertyType.GetProperty("Datatype", Any);
        PropertyInfo? bitField = datatype?.PropertyType.GetProperty("BitField", Any);
        return message?.PropertyType.FullName == MessageType.Split(',')[0]
            && message.PropertyType.GetProperty("InputData", Any)?.PropertyType == typeof(Memory<byte>)
            && datatype?.PropertyType.FullName == DatatypeType.Split(',')[0]
            && bitField?.PropertyType.FullName == BitFieldType.Split(',')[0];
    }

    [UnsafeAccessor(UnsafeAccessorKind.Method, Name = "get_Message")]
    [return: UnsafeAccessorType(MessageType)]
    private static extern object MessageOf(NativeAttribute attribute);

    [UnsafeAccessor(UnsafeAccessorKind.Method, Name = "get_InputData")]
    private static extern Memory<byte> InputDataOf([UnsafeAccessorType(MessageType)] object message);

    [UnsafeAccessor(UnsafeAccessorKind.Method, Name = "get_Datatype")]
    [return: UnsafeAccessorType(DatatypeType)]
    private static extern object DatatypeOf([UnsafeAccessorType(MessageType)] object message);

    [UnsafeAccessor(UnsafeAccessorKind.Method, Name = "get_BitField")]
    [return: UnsafeAccessorType(BitFieldType)]
    private static extern object BitFieldOf([UnsafeAccessorType(DatatypeType)] object datatype);
}
