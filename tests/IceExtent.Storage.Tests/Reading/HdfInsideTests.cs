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
    // Origin printed: Jenkins, lookup3.c (2006), driver5: hashlittle of "" and of the text below, with seed 0.
    [Theory]
    [InlineData("", 0xDEADBEEFu)]
    [InlineData("Four score and seven years ago", 0x17770551u)]
    public void Of_TextsOfTheAuthor_HaveThePrintedChecksums(string text, uint expected) =>
        Assert.Equal(expected, Lookup3.Of(Encoding.ASCII.GetBytes(text)));

    [Fact]
    public void Join_LowAndHighBytes_GivesTheNumbers() =>
        Gen.UShort.Array[0, 100].Sample(numbers =>
        {
            byte[] low = [.. numbers.Select(number => (byte)number)];
            byte[] high = [.. numbers.Select(number => (byte)(number >> 8))];
            ushort[] joined = new ushort[numbers.Length];
            UnshuffleFilter.Join(low, high, joined);
            Assert.Equal(numbers, joined);
        });

    // The filters take the library's place for its other users too: both directions must be the library's own.
    [Fact]
    public void Filter_BothDirections_AgreesWithTheLibrary() =>
        Gen.Select(Gen.Byte.Array[0, 400], Gen.OneOf(1, 2, 4, 8)).Sample((bytes, width) =>
        {
            int whole = bytes.Length / width * width;
            byte[] chunk = bytes[..whole];
            uint[] widths = [(uint)width];
            foreach ((IH5Filter own, IH5Filter library) in new (IH5Filter, IH5Filter)[]
                { (new UnshuffleFilter(), new ShuffleFilter()), (new InflateFilter(), new DeflateFilter()) })
            {
                uint[] parameters = own is UnshuffleFilter ? widths : [6];
                Memory<byte> packed = own.Filter(new(H5FilterFlags.None, parameters, whole, chunk));
                Assert.True(packed.Span.SequenceEqual(library.Filter(new(H5FilterFlags.None, parameters, whole, chunk)).Span));
                Assert.True(own.Filter(new(H5FilterFlags.Decompress, parameters, whole, packed)).Span.SequenceEqual(chunk));
                Assert.Equal(library.FilterId, own.FilterId);
                Assert.Equal(library.Name, own.Name);
                Assert.Equal(library.GetParameters([(uint)whole], (uint)width, null), own.GetParameters([(uint)whole], (uint)width, null));
            }
        });

    [Fact]
    public void Filter_NothingLent_ReturnsMemoryOfItsOwn()
    {
        byte[] packed = Deflate(new byte[1000]);
        InflateFilter filter = new();

        Memory<byte> first = filter.Filter(new(H5FilterFlags.Decompress, [6], 1000, packed));
        Memory<byte> second = filter.Filter(new(H5FilterFlags.Decompress, [6], 1000, packed));

        first.Span.Fill(1);
        Assert.False(second.Span.Contains((byte)1));
    }

    [Fact]
    public void Filter_MoreThanAChunk_IsRefused() =>
        Assert.Throws<InvalidDataException>(() =>
            new InflateFilter().Filter(new(H5FilterFlags.Decompress, [6], 1000, Deflate(new byte[100_000]))));

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
