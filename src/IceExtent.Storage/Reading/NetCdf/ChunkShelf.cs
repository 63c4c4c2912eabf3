using PureHDF.VOL.Native;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Holds the chunk read last, so that its numbers can be decoded where they are.</summary>
/// <param name="chunkBytes">What a whole chunk takes; a shorter one is damaged.</param>
internal sealed class ChunkShelf(long chunkBytes) : IReadingChunkCache
{
    private ulong index;
    private Memory<byte>? held;

    /// <summary>The chunk read last.</summary>
    public ReadOnlySpan<byte> Held => held is { } chunk ? chunk.Span : default;

    /// <inheritdoc/>
    public Memory<byte> GetChunk(ulong chunkIndex, Func<Memory<byte>> chunkReader)
    {
        if (held is { } known && index == chunkIndex)
        {
            return known;
        }

        held = null;
        Memory<byte> chunk = chunkReader();
        if (chunk.Length != chunkBytes)
        {
            throw new InvalidDataException($"A chunk holds {chunk.Length} bytes and should hold {chunkBytes}.");
        }

        (index, held) = (chunkIndex, chunk);
        return chunk;
    }
}
