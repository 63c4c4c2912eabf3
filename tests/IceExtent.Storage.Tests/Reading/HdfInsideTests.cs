using System.IO.Compression;
using System.Runtime.InteropServices;
using System.Text;
using CsCheck;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;
using PureHDF;
using PureHDF.Filters;
using PureHDF.VOL.Native;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>What this reader does in the place of the HDF5 library.</summary>
public sealed class HdfInsideTests
{
    // Origin printed: [Jenkins2006], driver5: hashlittle of "" and of the text below, with seed 0.
    [Theory]
    [InlineData("", 0xDEADBEEFu)]
    [InlineData("Four score and seven years ago", 0x17770551u)]
    public void Of_TextsOfTheAuthor_HaveThePrintedChecksums(string text, uint expected) =>
        Assert.Equal(expected, Lookup3.Of(Encoding.ASCII.GetBytes(text)));

    // What is unpacked here was packed by the library, and must be what the library would unpack.
    [Fact]
    public void Unshuffle_WhatTheLibraryShuffled_ComesBack() =>
        Gen.Select(Gen.Byte.Array[0, 400], Gen.OneOf(1, 2, 4, 8)).Sample((bytes, width) =>
        {
            byte[] chunk = bytes[..(bytes.Length / width * width)];
            Memory<byte> shuffled = new ShuffleFilter().Filter(new(H5FilterFlags.None, [(uint)width], chunk.Length, chunk.ToArray()));
            return ChunkUnpacking.Unshuffle(new(H5FilterFlags.Decompress, [(uint)width], chunk.Length, shuffled)).Span.SequenceEqual(chunk);
        });

    [Fact]
    public void Inflate_WhatTheLibraryDeflated_ComesBack() =>
        Gen.Byte.Array[1, 400].Sample(chunk =>
        {
            Memory<byte> deflated = new DeflateFilter().Filter(new(H5FilterFlags.None, [6], chunk.Length, chunk.ToArray()));
            return ChunkUnpacking.Inflate(new(H5FilterFlags.Decompress, [6], chunk.Length, deflated)).Span.SequenceEqual(chunk);
        });

    [Fact]
    public void Inflate_NothingLent_ReturnsMemoryOfItsOwn()
    {
        byte[] packed = Deflate(new byte[1000]);

        Memory<byte> first = ChunkUnpacking.Inflate(new(H5FilterFlags.Decompress, [6], 1000, packed));
        Memory<byte> second = ChunkUnpacking.Inflate(new(H5FilterFlags.Decompress, [6], 1000, packed));

        first.Span.Fill(1);
        Assert.False(second.Span.Contains((byte)1));
    }

    [Fact]
    public void Inflate_MoreThanAChunk_IsRefused() =>
        Assert.Throws<InvalidDataException>(() => ChunkUnpacking.Inflate(new(H5FilterFlags.Decompress, [6], 1000, Deflate(new byte[100_000]))));

    [Fact]
    public void Inflate_CutShort_IsRefused() =>
        Assert.Throws<InvalidDataException>(() => ChunkUnpacking.Inflate(new(H5FilterFlags.Decompress, [6], 1000, Deflate(new byte[1000]).AsMemory()[..^1])));

    // The fast way to attributes rests on the inside of the library; the slow way is the library's own.
    [Theory]
    [InlineData("packing.nc")]
    [InlineData("bottom-up.nc")]
    [InlineData("plain-20200131.h5")]
    public void Of_EveryAttribute_HasTheBytesTheLibraryReads(string file)
    {
        int compared = 0;
        using NativeFile root = H5File.OpenRead(SmallFiles.PathOf(file));
        foreach (NativeAttribute attribute in root.Children().SelectMany(child => child.Attributes()).Cast<NativeAttribute>())
        {
            if (attribute.Type is { Class: H5DataTypeClass.FixedPoint or H5DataTypeClass.FloatingPoint, Size: 4 })
            {
                uint[] numbers = new uint[Math.Max(1, attribute.Space.Dimensions.Aggregate(1UL, (product, length) => product * length))];
                attribute.Read(numbers.AsSpan());
                AttributeBytes.Prove(attribute);
                Assert.Equal(MemoryMarshal.AsBytes(numbers.AsSpan()).ToArray(), AttributeBytes.OfNumbers(attribute)!.Value.ToArray());
                compared++;
            }
            else if (attribute.Type.Class == H5DataTypeClass.String)
            {
                string slow = attribute.Space.Rank == 0 ? attribute.Read<string>() : attribute.Read<string[]>()[0];
                string fast = Encoding.UTF8.GetString(AttributeBytes.Of(attribute)!.Value.Span).TrimEnd('\0', ' ');
                Assert.Equal(slow.TrimEnd('\0', ' '), fast);
                compared++;
            }
        }

        Assert.True(compared > 0);
    }

    // A soft link that leads to itself makes the library recurse without reading, until the process ends.
    [Fact]
    public void Read_SoftLinkToItself_IsRefused()
    {
        using TemporaryFolder folder = new();
        string path = folder.PathOf("circle-20200131.h5");
        new H5File { ["tb"] = new H5SoftLink("tb"), ["other"] = new[] { 1, 2 } }.Write(path);

        Fault fault = SmallFiles.FaultOf(SmallFiles.Source([path], "tb"));

        Assert.Equal("IE2103", fault.Code);
        Assert.Contains("A soft link leads to a soft link", fault.Found, StringComparison.Ordinal);
    }

    // Worked: 6 x 5 numbers from 1000 in steps of 53; a soft link to a variable is followed.
    [Fact]
    public void Read_SoftLinkToAVariable_IsFollowed()
    {
        using TemporaryFolder folder = new();
        string path = folder.PathOf("link-20200131.h5");
        ushort[] numbers = [.. Enumerable.Range(0, 30).Select(cell => (ushort)(1000 + (53 * cell)))];
        new H5File { ["stored"] = new H5Dataset(numbers, fileDims: [6, 5]), ["tb"] = new H5SoftLink("stored") }.Write(path);
        var source = SmallFiles.Source([path], "tb");

        Assert.Equal([1000f, 1053f, 1106f], SmallFiles.Read(source, Assert.Single(SmallFiles.Days(source)))[..3]);
    }

    private static byte[] Deflate(byte[] bytes)
    {
        MemoryStream packed = new();
        using (ZLibStream stream = new(packed, CompressionLevel.Optimal))
        {
            stream.Write(bytes);
        }

        return packed.ToArray();
    }
}
