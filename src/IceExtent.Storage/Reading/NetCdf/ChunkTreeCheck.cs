using System.Buffers.Binary;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Checks a node of the older kind of tree that says where the chunks of a variable are. Source: [HDF5] section III.A.1.</summary>
/// <remarks>
/// These trees have no checksum, and a wrong bit in one makes a chunk look as if it had never been written. But each
/// entry must name a place where a chunk can start, after that of the entry before, and a piece of the file.
/// </remarks>
internal static class ChunkTreeCheck
{
    /// <summary>What the error says of a chunk that skips filters.</summary>
    public const string SkipsFilters = "a chunk that skips some of its filters";

    private const int HeadBytes = 24;

    /// <summary>Verifies a node.</summary>
    /// <param name="blocks">The file.</param>
    /// <param name="start">Where the node starts.</param>
    /// <param name="lengths">The length of the variable along every axis.</param>
    /// <param name="chunk">The length of a chunk along every axis.</param>
    /// <exception cref="InvalidDataException">The node is damaged.</exception>
    public static void Verify(BlockReader blocks, long start, ulong[] lengths, ulong[] chunk)
    {
        ReadOnlySpan<byte> head = blocks.Plain(start, HeadBytes);
        const byte OfChunks = 1;
        if (head[4] != OfChunks)
        {
            throw new InvalidDataException("A tree of chunks is a tree of something else.");
        }

        bool isLeaf = head[5] == 0;
        int entries = BinaryPrimitives.ReadUInt16LittleEndian(head[6..]);
        int keyBytes = 8 + (8 * (chunk.Length + 1));
        ulong[]? before = null;
        for (int entry = 0; entry < entries; entry++)
        {
            ReadOnlySpan<byte> key = blocks.Plain(start + HeadBytes + (entry * (long)(keyBytes + sizeof(long))), keyBytes + sizeof(long));
            ulong[] place = PlaceOf(key[8..], chunk.Length);
            if (!CanStart(key[8..], place, lengths, chunk) || (before is not null && before.AsSpan().SequenceCompareTo(place) >= 0))
            {
                throw new InvalidDataException("A tree of chunks names a place where no chunk can be.");
            }

            before = place;
            if (isLeaf)
            {
                VerifyPiece(blocks, key, keyBytes);
            }
        }
    }

    private static void VerifyPiece(BlockReader blocks, ReadOnlySpan<byte> key, int keyBytes)
    {
        // The library takes the mask of skipped filters one bit off, and would put bytes together wrongly.
        if (BinaryPrimitives.ReadUInt32LittleEndian(key[4..]) != 0)
        {
            throw new InvalidDataException(SkipsFilters);
        }

        blocks.MustHold(BinaryPrimitives.ReadInt64LittleEndian(key[keyBytes..]), BinaryPrimitives.ReadUInt32LittleEndian(key));
    }

    private static ulong[] PlaceOf(ReadOnlySpan<byte> offsets, int rank)
    {
        ulong[] place = new ulong[rank];
        for (int axis = 0; axis < rank; axis++)
        {
            place[axis] = BinaryPrimitives.ReadUInt64LittleEndian(offsets[(8 * axis)..]);
        }

        return place;
    }

    // One more offset follows, inside a number; it is always 0.
    private static bool CanStart(ReadOnlySpan<byte> offsets, ulong[] place, ulong[] lengths, ulong[] chunk)
    {
        bool can = BinaryPrimitives.ReadUInt64LittleEndian(offsets[(8 * place.Length)..]) == 0;
        for (int axis = 0; axis < place.Length; axis++)
        {
            can &= place[axis] % chunk[axis] == 0 && place[axis] < lengths[axis];
        }

        return can;
    }
}
