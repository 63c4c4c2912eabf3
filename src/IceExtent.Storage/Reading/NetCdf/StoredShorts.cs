using System.Runtime.InteropServices;
using IceExtent.Grids;
using IceExtent.Storage.Writing;
using PureHDF.Selections;
using PureHDF.VOL.Native;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Reads planes of 16-bit numbers as an archive of ours stores them, without decoding them.</summary>
internal static class StoredShorts
{
    /// <summary>Compares the file's own coordinates with the grid.</summary>
    /// <exception cref="Faults.FaultException">IE2107, IE2108: they are others, or run the other way.</exception>
    public static void CheckGrid(FileVariable variable, Grid grid)
    {
        if (new GridAgreement(grid).TurnOf(variable, GridAxes.Find(variable, grid)) != default)
        {
            throw NetCdfFaults.OtherGrid(variable.Where, "rows or columns that run against the grid's", $"those of the grid {grid.Name}");
        }
    }

    /// <summary>Compares what the stored numbers mean with what they should.</summary>
    /// <exception cref="Faults.FaultException">IE2106, IE2111: they mean something else.</exception>
    public static void CheckPacking(FileVariable variable, Packing packing)
    {
        KelvinEncoding encoding = PackingAttributes.Of(variable);
        if (encoding.Number != StoredNumber.SignedTwoBytes || !encoding.Scale.Equals(packing.Scale) || !encoding.Offset.Equals(packing.Offset) || !encoding.Missing.Contains(Packing.Fill))
        {
            throw NetCdfFaults.Packing(
                variable,
                FormattableString.Invariant($"scale_factor {encoding.Scale} and add_offset {encoding.Offset}"),
                FormattableString.Invariant($"signed numbers of 16 bits with scale_factor {packing.Scale}, add_offset {packing.Offset} and _FillValue {Packing.Fill}"));
        }
    }

    /// <summary>Reads one plane.</summary>
    /// <param name="variable">The variable.</param>
    /// <param name="grid">The grid.</param>
    /// <param name="stored">Receives one number a cell.</param>
    /// <exception cref="Faults.FaultException">IE2106, IE2107: it has other numbers or another shape.</exception>
    public static void Read(FileVariable variable, Grid grid, Span<short> stored)
    {
        if (variable.Lengths is not [1, var rows, var columns] || rows != (ulong)grid.Rows || columns != (ulong)grid.Columns)
        {
            throw NetCdfFaults.Shape(variable, $"the shape {string.Join(", ", variable.Lengths)}", grid);
        }

        if (variable.Number != StoredNumber.SignedTwoBytes)
        {
            throw NetCdfFaults.Type(variable, "other numbers than signed ones of 16 bits");
        }

        variable.File.ReadingCellsOf = variable.Name;
        if (ChunkLimits.BytesOf(variable) is { } bytes && bytes == sizeof(short) * (long)stored.Length)
        {
            ReadChunk(variable, bytes, stored);
        }
        else
        {
            variable.Read(default, MemoryMarshal.AsBytes(stored), null);
        }

        variable.File.ReadingCellsOf = null;
    }

    // The plane is one chunk: ask for one number and take the chunk that comes with it.
    private static void ReadChunk(FileVariable variable, long bytes, Span<short> stored)
    {
        variable.File.Stream.Guard.Chunks = (variable.Lengths, variable.Dataset.Layout.Chunks);
        ChunkShelf shelf = new(bytes);
        Span<byte> number = stackalloc byte[sizeof(short)];
        using ChunkBuffers loan = ChunkBuffers.Lend();
        variable.Read(new H5DatasetAccess(ChunkCache: shelf), number, new HyperslabSelection(3, [0UL, 0UL, 0UL], [1UL, 1UL, 1UL]));
        MemoryMarshal.Cast<byte, short>(shelf.Held).CopyTo(stored);
        variable.File.Stream.Guard.Chunks = null;
    }
}
