using System.Buffers.Binary;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Checks the blocks of an HDF5 file's structure before the library follows them. Source: [HDF5].</summary>
/// <remarks>
/// The library checks no checksums and takes sizes and pointers as they stand, so that one wrong bit can change a
/// scale, ask for gigabytes or end the process. Here every block with a checksum (object headers, heaps and trees
/// of the newer kind) is verified, and of the older kinds, which have none, the sizes must lie inside the file.
/// Covers files with offsets and lengths of 8 bytes that start at 0, as they nearly all do; others are not checked.
/// </remarks>
internal sealed class StructureGuard
{
    private readonly BlockReader blocks;
    private readonly HashSet<long> known = [];

    /// <summary>Watches over a file.</summary>
    public StructureGuard(FilePages pages) => blocks = new(pages);

    /// <summary>Whether the file is of the kind that is checked; set once its header has been read.</summary>
    public bool IsOn { get; set; }

    /// <summary>The lengths of the variable whose chunks are looked up now, and those of a chunk; null at other times.</summary>
    public (ulong[] Lengths, ulong[] Chunk)? Chunks { get; set; }

    /// <summary>Checks the header of the topmost group in a file of the older kind.</summary>
    public void CheckRoot(long header)
    {
        if (IsOn)
        {
            OldHeaderCheck.Verify(blocks, header);
        }
    }

    /// <summary>Notes what was read and checks the block that starts there, if a block does.</summary>
    /// <exception cref="InvalidDataException">The block is damaged.</exception>
    public void Seen(long start, ReadOnlySpan<byte> bytes)
    {
        // The library reads the signature of an object header as one byte and three, all others in one go.
        if (!IsOn || bytes.Length is not (3 or 4))
        {
            return;
        }

        if (bytes.Length == 3)
        {
            if (bytes.SequenceEqual("HDR"u8))
            {
                Once(start - 1, header => ObjectHeaderCheck.Verify(blocks, header));
            }

            return;
        }

        Action<long>? check = BinaryPrimitives.ReadUInt32BigEndian(bytes) switch
        {
            0x46524850 => FractalHeap, // FRHP
            0x42544844 => NewTree, // BTHD
            0x54524545 => OldTree, // TREE
            0x534E4F44 => Symbols, // SNOD
            0x48454150 => LocalHeap, // HEAP
            0x47434F4C => GlobalHeap, // GCOL
            _ => null,
        };
        if (check is not null)
        {
            Once(start, check);
        }
    }

    // The library reads some blocks again and again. A damaged one is refused each time.
    private void Once(long start, Action<long> check)
    {
        if (!known.Contains(start))
        {
            check(start);
            known.Add(start);
        }
    }

    // The header of a tree and, where the tree is one leaf, that leaf.
    private void NewTree(long start)
    {
        ReadOnlySpan<byte> header = blocks.Checked(start, 38);
        int recordBytes = BinaryPrimitives.ReadUInt16LittleEndian(header[10..]);
        int depth = BinaryPrimitives.ReadUInt16LittleEndian(header[12..]);
        long root = BinaryPrimitives.ReadInt64LittleEndian(header[16..]);
        int records = BinaryPrimitives.ReadUInt16LittleEndian(header[24..]);
        if (depth == 0 && records > 0)
        {
            blocks.Checked(root, 6 + (records * recordBytes) + sizeof(uint));
        }
    }

    // The header of a heap and its blocks, two levels deep.
    private void FractalHeap(long start)
    {
        int filterBytes = BinaryPrimitives.ReadUInt16LittleEndian(blocks.Plain(start, 9)[7..]);
        if (filterBytes > 0)
        {
            return; // NetCDF filters no heaps.
        }

        ReadOnlySpan<byte> header = blocks.Checked(start, 146);
        bool hasChecksums = (header[9] & 2) != 0;
        int width = BinaryPrimitives.ReadUInt16LittleEndian(header[110..]);
        long firstBlock = BinaryPrimitives.ReadInt64LittleEndian(header[112..]);
        long largestBlock = BinaryPrimitives.ReadInt64LittleEndian(header[120..]);
        int offsetBytes = (BinaryPrimitives.ReadUInt16LittleEndian(header[128..]) + 7) / 8;
        long root = BinaryPrimitives.ReadInt64LittleEndian(header[132..]);
        int rows = BinaryPrimitives.ReadUInt16LittleEndian(header[140..]);
        if (!hasChecksums || root == -1)
        {
            return;
        }

        if (rows == 0)
        {
            blocks.CheckedInside(root, firstBlock, 13 + offsetBytes);
            return;
        }

        // An indirect block points at blocks of the first size in its first two rows and of twice the size in each further one.
        byte[] indirect = blocks.Checked(root, 13 + offsetBytes + (rows * width * sizeof(long)) + sizeof(uint)).ToArray();
        long size = firstBlock;
        for (int row = 0; row < rows && size <= largestBlock; row++)
        {
            for (int column = 0; column < width; column++)
            {
                int at = 13 + offsetBytes + (((row * width) + column) * sizeof(long));
                long child = BinaryPrimitives.ReadInt64LittleEndian(indirect.AsSpan(at));
                if (child != -1)
                {
                    blocks.CheckedInside(child, size, 13 + offsetBytes);
                }
            }

            size = row == 0 ? size : size * 2;
        }
    }

    // The members of a group of the older kind, whose headers carry no signature of their own.
    private void Symbols(long start)
    {
        const int EntryBytes = 40;
        int entries = BinaryPrimitives.ReadUInt16LittleEndian(blocks.Plain(start, 8)[6..]);
        for (int entry = 0; entry < entries; entry++)
        {
            long header = BinaryPrimitives.ReadInt64LittleEndian(blocks.Plain(start + 8 + (entry * (long)EntryBytes), EntryBytes)[8..]);
            Once(header, old => OldHeaderCheck.Verify(blocks, old));
        }
    }

    private void OldTree(long start)
    {
        if (Chunks is var (lengths, chunk))
        {
            ChunkTreeCheck.Verify(blocks, start, lengths, chunk);
        }
    }

    private void LocalHeap(long start)
    {
        ReadOnlySpan<byte> header = blocks.Plain(start, 32);
        blocks.MustHold(BinaryPrimitives.ReadInt64LittleEndian(header[24..]), BinaryPrimitives.ReadInt64LittleEndian(header[8..]));
    }

    private void GlobalHeap(long start)
    {
        const int HeadBytes = 16;
        long size = BinaryPrimitives.ReadInt64LittleEndian(blocks.Plain(start, HeadBytes)[8..]);
        blocks.MustHold(start, size);
        long at = start + HeadBytes;
        long end = start + size;
        while (end - at >= HeadBytes)
        {
            ReadOnlySpan<byte> head = blocks.Plain(at, HeadBytes);
            long bytes = BinaryPrimitives.ReadInt64LittleEndian(head[8..]);
            if (BinaryPrimitives.ReadUInt16LittleEndian(head) == 0)
            {
                return; // The rest is free.
            }

            if (bytes < 0 || bytes > end - at - HeadBytes)
            {
                throw new InvalidDataException("An object is larger than the heap that holds it.");
            }

            at += HeadBytes + ((bytes + 7) / 8 * 8);
        }
    }
}
