namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Memory that the filters of one thread use again and again while this reader reads.</summary>
/// <remarks>
/// The filters are registered for the whole process, and another user of them may keep what they return. So they
/// take this memory only while it is lent, and fresh memory at any other time.
/// </remarks>
internal sealed class ChunkBuffers : IDisposable
{
    [ThreadStatic]
    private static ChunkBuffers? kept;

    [ThreadStatic]
    private static ChunkBuffers? lent;

    private byte[] inflated = [];
    private byte[] unshuffled = [];

    private ChunkBuffers()
    {
    }

    /// <summary>Lends the thread's memory until the loan is disposed; loans do not nest.</summary>
    public static ChunkBuffers Lend() => lent = kept ??= new();

    /// <summary>Room for an inflated chunk, at least as long as asked for.</summary>
    public static byte[] ForInflated(int bytes) => lent is null ? new byte[bytes] : Grow(ref lent.inflated, bytes);

    /// <summary>Room for an unshuffled chunk, at least as long as asked for.</summary>
    public static byte[] ForUnshuffled(int bytes) => lent is null ? new byte[bytes] : Grow(ref lent.unshuffled, bytes);

    /// <summary>Ends the loan: from here on the filters take fresh memory.</summary>
    public void Dispose() => lent = null;

    private static byte[] Grow(ref byte[] buffer, int bytes)
    {
        if (buffer.Length < bytes)
        {
            buffer = GC.AllocateUninitializedArray<byte>(bytes);
        }

        return buffer;
    }
}
