using PureHDF.VOL.Native;

namespace IceExtent.Storage.Writing;

/// <summary>Hands the one chunk of a plane to the library without a copy.</summary>
/// <remarks>
/// The library asks its chunk cache for a buffer, copies the data into it cell by cell of a selection and takes it
/// back when it flushes. A plane that is one chunk needs none of that: the data set is made without data, and the
/// first flush hands over the plane as it lies.
/// </remarks>
/// <param name="bytes">The plane as stored, unfiltered.</param>
internal sealed class WholePlane(Memory<byte> bytes) : IWritingChunkCache
{
    private bool handedOver;

    /// <inheritdoc/>
    public Memory<byte> GetChunk(
        ulong chunkIndex, Func<Memory<byte>> chunkAllocator, Action<ulong, Memory<byte>> chunkWriter) =>
        throw new InvalidOperationException("A whole plane is handed over, not filled.");

    /// <inheritdoc/>
    public void Flush(Action<ulong, Memory<byte>> chunkWriter)
    {
        ArgumentNullException.ThrowIfNull(chunkWriter);
        if (!handedOver)
        {
            handedOver = true;
            chunkWriter(0, bytes);
        }
    }
}
