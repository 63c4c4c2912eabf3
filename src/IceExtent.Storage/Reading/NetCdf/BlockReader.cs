using System.Buffers.Binary;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Reads blocks of a file's structure and verifies their checksums.</summary>
internal sealed class BlockReader(FilePages pages)
{
    // The largest block of a structure that any file has; heaps end at 64 kB, trees and headers long before.
    private const long MostBytes = 1 << 22;

    private byte[] buffer = new byte[4096];

    /// <summary>A block without a checksum. Valid until the next call.</summary>
    public ReadOnlySpan<byte> Plain(long start, long bytes) => Load(start, bytes);

    /// <summary>A block that ends in the checksum of all before it. Valid until the next call.</summary>
    public ReadOnlySpan<byte> Checked(long start, long bytes)
    {
        Span<byte> block = Load(start, bytes);
        Compare(block[..^sizeof(uint)], block[^sizeof(uint)..], start);
        return block;
    }

    /// <summary>Verifies a block with its checksum inside, which was zero when it was computed.</summary>
    public void CheckedInside(long start, long bytes, int checksumAt)
    {
        Span<byte> block = Load(start, bytes);
        if (block.Length < checksumAt + sizeof(uint))
        {
            throw new InvalidDataException($"The block at byte {start} is too short.");
        }

        Span<byte> checksum = stackalloc byte[sizeof(uint)];
        block.Slice(checksumAt, sizeof(uint)).CopyTo(checksum);
        block.Slice(checksumAt, sizeof(uint)).Clear();
        Compare(block, checksum, start);
    }

    /// <summary>Refuses a piece of the file that reaches beyond its end.</summary>
    public void MustHold(long start, long bytes)
    {
        if (start < 0 || bytes < 0 || start > pages.Length || bytes > pages.Length - start)
        {
            throw new InvalidDataException($"A piece of {bytes} bytes at byte {start} does not lie inside the file.");
        }
    }

    private Span<byte> Load(long start, long bytes)
    {
        MustHold(start, bytes);
        if (bytes < sizeof(uint) || bytes > MostBytes)
        {
            throw new InvalidDataException($"The block at byte {start} claims {bytes} bytes.");
        }

        if (buffer.Length < bytes)
        {
            buffer = new byte[bytes];
        }

        Span<byte> block = buffer.AsSpan(0, (int)bytes);
        return pages.Read(start, block) == block.Length
            ? block
            : throw new EndOfStreamException("The file grew shorter while it was read.");
    }

    private static void Compare(ReadOnlySpan<byte> block, ReadOnlySpan<byte> checksum, long start)
    {
        if (Lookup3.Of(block) != BinaryPrimitives.ReadUInt32LittleEndian(checksum))
        {
            throw new InvalidDataException($"The block at byte {start} does not have its checksum.");
        }
    }
}
