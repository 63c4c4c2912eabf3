using System.Buffers;
using System.Buffers.Binary;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Looks at the first bytes of a file before any library does.</summary>
internal static class FileSignature
{
    private const int HeadBytes = 96;
    private const string Unknown = "bytes of another kind";

    // How other files start, and what such a file is.
    private static readonly (byte[] Start, string What)[] OtherKinds =
    [
        ("CDF"u8.ToArray(), "a NetCDF-3 file"),
        ([0x0E, 0x03, 0x13, 0x01], "an HDF4 file"),
        ([0x1F, 0x8B], "a file packed with gzip"),
        ("PK"u8.ToArray(), "a zip archive"),
        ("BZh"u8.ToArray(), "a file packed with bzip2"),
        ("GRIB"u8.ToArray(), "a GRIB file"),
    ];

    private static readonly SearchValues<byte> Printable = SearchValues.Create(
        [.. Enumerable.Range(' ', '~' - ' ' + 1).Select(code => (byte)code), (byte)'\t', (byte)'\r', (byte)'\n']);

    private static ReadOnlySpan<byte> Hdf5 => [0x89, (byte)'H', (byte)'D', (byte)'F', 0x0D, 0x0A, 0x1A, 0x0A];

    /// <summary>Refuses what is no HDF5 file, and one that is shorter than its own header says; puts the guard on.</summary>
    /// <exception cref="Faults.FaultException">IE2102 or IE2103.</exception>
    public static void Check(string path, GuardedStream stream)
    {
        Span<byte> head = Head(stream, stackalloc byte[HeadBytes]);
        if (!head.StartsWith(Hdf5))
        {
            // A block of the user's own may stand before the header, which the library then looks for.
            if (stream.Length < 1024 || KindOf(head) != Unknown)
            {
                throw NetCdfFaults.NotHdf5(path, KindOf(head));
            }
        }
        else if (head.Length < HeadBytes)
        {
            throw NetCdfFaults.CutShort(path, stream.Length, null);
        }
        else if (Fields(head) is { } at)
        {
            if (at.Checksum is { } checksum && Lookup3.Of(head[..checksum]) != BinaryPrimitives.ReadUInt32LittleEndian(head[checksum..]))
            {
                throw new InvalidDataException("The header does not have its checksum.");
            }

            ulong end = BinaryPrimitives.ReadUInt64LittleEndian(head[at.Base..]) + BinaryPrimitives.ReadUInt64LittleEndian(head[at.End..]);
            if (end > (ulong)stream.Length)
            {
                throw NetCdfFaults.CutShort(path, stream.Length, end);
            }

            stream.Guard.IsOn = BinaryPrimitives.ReadUInt64LittleEndian(head[at.Base..]) == 0;
            if (at.Checksum is null)
            {
                // The entry of the topmost group follows three more offsets; the name's offset comes first in it.
                stream.Guard.CheckRoot(BinaryPrimitives.ReadInt64LittleEndian(head[(at.End + 24)..]));
            }
        }
    }

    // Where the fields of the superblock stand, in each of its versions, if offsets and lengths take 8 bytes as they nearly always do.
    private static (int Base, int End, int? Checksum)? Fields(ReadOnlySpan<byte> head) => (head[8], head[9], head[10], head[13], head[14]) switch
    {
        (0, _, _, sizeof(ulong), sizeof(ulong)) => (24, 40, null),
        (1, _, _, sizeof(ulong), sizeof(ulong)) => (28, 44, null),
        (2 or 3, sizeof(ulong), sizeof(ulong), _, _) => (12, 28, 44),
        _ => null,
    };

    private static Span<byte> Head(GuardedStream stream, Span<byte> head)
    {
        stream.Seek(0, SeekOrigin.Begin);
        head = head[..stream.ReadAtLeast(head, head.Length, throwOnEndOfStream: false)];
        stream.Seek(0, SeekOrigin.Begin);
        return head;
    }

    private static string KindOf(ReadOnlySpan<byte> head)
    {
        if (head.IsEmpty)
        {
            return "an empty file";
        }

        foreach ((byte[] start, string what) in OtherKinds)
        {
            if (head.StartsWith(start))
            {
                return what;
            }
        }

        return head.ContainsAnyExcept(Printable) ? Unknown : "text";
    }
}
