using System.Buffers;
using IceExtent.Grids;
using PureHDF.Selections;
using PureHDF.VOL.Native;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Reads one step of time of one variable into a plane of kelvins.</summary>
internal static class CellReader
{
    private const ulong MostCachedBytes = 1 << 28;

    /// <summary>Reads and decodes the cells.</summary>
    /// <param name="file">The open file.</param>
    /// <param name="structure">What is known of the channel's variable.</param>
    /// <param name="step">The step on its time axis; 0 where it has none.</param>
    /// <param name="grid">The grid.</param>
    /// <param name="kelvins">Receives one value a cell, row-major, row 0 at the top, in K; NaN is missing.</param>
    /// <exception cref="Faults.FaultException">IE2112: the variable has no such step.</exception>
    public static void Read(HdfFile file, ChannelStructure structure, int step, Grid grid, Span<float> kelvins)
    {
        FileVariable variable = file.Variable(structure.Name);
        PlaneShape shape = structure.Shape;
        if (step < 0 || step >= shape.Steps)
        {
            throw NetCdfFaults.NoStep(variable, step, shape.Steps);
        }

        if (!shape.IsWritten(step))
        {
            kelvins.Fill(float.NaN);
            return;
        }

        file.ReadingCellsOf = structure.Name;
        file.Stream.Guard.Chunks = structure.Chunk is { } whole ? (shape.Lengths, whole) : null;
        ulong[] start = shape.StartOf(step);
        long? chunkBytes = ChunkLimits.BytesOf(variable);
        if (chunkBytes is { } bytes && structure.Chunk is { } chunk && shape.IsHeldBy(chunk))
        {
            CellOrder order = shape.OrderIn(grid, chunk, start);
            ReadInChunk(variable, structure, start, bytes, order, kelvins);
        }
        else
        {
            ulong[] block = shape.BlockOfStep();
            CellOrder order = shape.OrderIn(grid, block, new ulong[block.Length]);
            ReadBlock(variable, structure, start, block, order, kelvins);
        }

        file.ReadingCellsOf = null;
        file.Stream.Guard.Chunks = null;
    }

    // The plane lies in one chunk: ask for one number, keep the chunk that comes with it and decode it where it is.
    private static void ReadInChunk(
        FileVariable variable, ChannelStructure structure, ulong[] start, long chunkBytes, CellOrder order, Span<float> kelvins)
    {
        ChunkShelf shelf = new(chunkBytes);
        Span<byte> number = stackalloc byte[StoredNumbers.BytesOf(structure.Rule.Encoding.Number)];
        using ChunkBuffers loan = ChunkBuffers.Lend();
        variable.Read(
            new H5DatasetAccess(ChunkCache: shelf),
            number,
            new HyperslabSelection(start.Length, start, structure.Shape.OneCell()));
        Decode(shelf.Held, structure, order, kelvins);
    }

    private static void ReadBlock(
        FileVariable variable, ChannelStructure structure, ulong[] start, ulong[] block, CellOrder order, Span<float> kelvins)
    {
        int bytes = checked(kelvins.Length * StoredNumbers.BytesOf(structure.Rule.Encoding.Number));
        byte[] stored = ArrayPool<byte>.Shared.Rent(bytes);
        try
        {
            // Rows run across several chunks, so these stay in memory until the block is read.
            SimpleReadingChunkCache chunks = new(chunkSlotCount: kelvins.Length, byteCount: MostCachedBytes);
            variable.Read(
                new H5DatasetAccess(ChunkCache: chunks),
                stored.AsSpan(0, bytes),
                new HyperslabSelection(start.Length, start, block));
            Decode(stored.AsSpan(0, bytes), structure, order, kelvins);
        }
        finally
        {
            ArrayPool<byte>.Shared.Return(stored);
        }
    }

    private static void Decode(ReadOnlySpan<byte> stored, ChannelStructure structure, CellOrder order, Span<float> kelvins) =>
        KelvinDecoder.Decode(stored, order.Turned(structure.Turn.Rows, structure.Turn.Columns), structure.Rule, kelvins);
}
