using System.IO.Compression;
using CsCheck;
using IceExtent.Storage.Writing;
using PureHDF.Filters;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>Our filters write what the library's own filters read.</summary>
public sealed class PlaneFilterLaws
{
    [Fact]
    public void Words_AnyPlane_IsTheLibrarysShuffle() =>
        Gen.UShort.Array[0, 200].Sample(numbers =>
        {
            byte[] bytes = [.. numbers.SelectMany(BitConverter.GetBytes)];
            byte[] shuffled = new byte[bytes.Length];
            ByteShuffle.Words(bytes, shuffled);

            FilterInfo info = new(H5FilterFlags.None, [sizeof(ushort)], bytes.Length, bytes);
            return shuffled.AsSpan().SequenceEqual(new ShuffleFilter().Filter(info).Span);
        });

    // Worked: low bytes first, then high bytes.
    [Fact]
    public void Words_ThreeNumbers_PutsLowBytesBeforeHighBytes()
    {
        byte[] shuffled = new byte[6];

        ByteShuffle.Words([0x01, 0xA1, 0x02, 0xA2, 0x03, 0xA3], shuffled);

        Assert.Equal([0x01, 0x02, 0x03, 0xA1, 0xA2, 0xA3], shuffled);
    }

    [Fact]
    public void Deflate_AnyPlane_ComesBackThroughZlib() =>
        Gen.Select(Gen.Byte[0, 3].Array[0, 500], Gen.Byte.Array[0, 500]).Sample((runs, noise) =>
        {
            byte[] plane = [.. runs, .. noise];
            Memory<byte> deflated = PlaneFilters.Deflate(new(H5FilterFlags.None, [1], plane.Length, plane));

            using ZLibStream inflater = new(new MemoryStream(deflated.ToArray()), CompressionMode.Decompress);
            using MemoryStream back = new();
            inflater.CopyTo(back);
            return back.ToArray().AsSpan().SequenceEqual(plane);
        });

    // Another writer in this process may have planes of 32-bit numbers.
    [Fact]
    public void Shuffle_NumbersOfAnotherSize_IsTheLibrarysShuffle()
    {
        byte[] plane = [1, 2, 3, 4, 11, 12, 13, 14];
        FilterInfo info = new(H5FilterFlags.None, [sizeof(int)], plane.Length, plane);

        Assert.Equal([1, 11, 2, 12, 3, 13, 4, 14], PlaneFilters.Shuffle(info).ToArray()); // Worked.
    }
}
