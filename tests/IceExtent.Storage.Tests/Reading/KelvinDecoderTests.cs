using System.Buffers.Binary;
using System.Runtime.InteropServices;
using CsCheck;
using IceExtent.Storage.Reading;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>The fast ways of decoding against the plain one, number by number.</summary>
public sealed class KelvinDecoderTests
{
    private static readonly CellOrder Row = new(1, 1 << 16, 0, 1 << 16, 1);

    [Theory]
    [InlineData(0.1, 0.0)]
    [InlineData(0.01, 200.0)]
    [InlineData(-0.005, 150.0)]
    public void Decode_EveryShortNumber_IsWhatToKelvinsGives(double scale, double offset)
    {
        ushort[] stored = [.. Enumerable.Range(0, 1 << 16).Select(pattern => (ushort)pattern)];
        foreach (StoredNumber number in new[] { StoredNumber.SignedTwoBytes, StoredNumber.UnsignedTwoBytes })
        {
            KelvinEncoding encoding = new(number, scale, offset) { Lowest = -30_000, Highest = 60_000, Missing = [0, 1234] };
            float[] kelvins = new float[stored.Length];

            KelvinDecoder.Decode(MemoryMarshal.AsBytes(stored.AsSpan()), Row, new KelvinRule(encoding), kelvins);

            float[] expected = [.. stored.Select(pattern =>
                encoding.ToKelvins(number == StoredNumber.SignedTwoBytes ? (short)pattern : pattern))];
            Assert.Equal(expected, kelvins);
        }
    }

    // Worked: stored tenths must become the floats nearest to the tenths, which is what the compiler makes of 243.1f.
    [Fact]
    public void ToKelvins_Tenths_AreTheNearestFloats()
    {
        KelvinEncoding encoding = new(StoredNumber.UnsignedTwoBytes, 0.1, 0.0);

        for (int tenths = 0; tenths < 10_000; tenths++)
        {
            Assert.Equal((float)(tenths / 10m), encoding.ToKelvins(tenths));
        }
    }

    [Fact]
    public void Decode_PlainReals_IsWhatToKelvinsGives() =>
        Gen.Select(
                Gen.OneOf(Gen.Single, Gen.OneOf(float.NaN, float.NegativeInfinity, float.PositiveInfinity, -999.9f, 0f, -0f, 9.96921e36f, 100f, 300f)).Array[0, 70],
                Gen.OneOf<double[]>([], [-999.9f], [-999.9f, 9.96921e36f], [0.0]),
                Gen.OneOf((double.MinValue, double.MaxValue), (100.0, 300.0)))
            .Sample((stored, missing, limits) =>
            {
                KelvinEncoding encoding = new(StoredNumber.RealFourBytes, 1.0, 0.0)
                {
                    Missing = missing,
                    Lowest = limits.Item1,
                    Highest = limits.Item2,
                };
                float[] kelvins = new float[stored.Length];
                KelvinDecoder.Decode(
                    MemoryMarshal.AsBytes(stored.AsSpan()), new(1, stored.Length, 0, stored.Length, 1), new KelvinRule(encoding), kelvins);
                Assert.True(RealLine.Suits(encoding));
                Assert.Equal(stored.Select(number => encoding.ToKelvins(number)), kelvins);
            });

    [Fact]
    public void Decode_CellsInAnyOrder_TakesEachFromItsPlace() =>
        Gen.Select(Gen.Int[1, 7], Gen.Int[1, 7], Gen.Bool, Gen.Bool, Gen.Bool).Sample((rows, columns, flipRows, flipColumns, transposed) =>
        {
            int[] stored = [.. Enumerable.Range(0, rows * columns)];
            CellOrder order = transposed ? new(rows, columns, 0, 1, rows) : new(rows, columns, 0, columns, 1);
            float[] kelvins = new float[stored.Length];

            KelvinDecoder.Decode(
                MemoryMarshal.AsBytes(stored.AsSpan()),
                order.Turned(flipRows, flipColumns),
                new KelvinRule(new(StoredNumber.SignedFourBytes, 1.0, 0.0)),
                kelvins);

            for (int cell = 0; cell < kelvins.Length; cell++)
            {
                int row = flipRows ? rows - 1 - (cell / columns) : cell / columns;
                int column = flipColumns ? columns - 1 - (cell % columns) : cell % columns;
                Assert.Equal(transposed ? (column * rows) + row : (row * columns) + column, kelvins[cell]);
            }
        });

    [Fact]
    public void Decode_AnotherNumberOfCells_IsRefused() =>
        Assert.Throws<ArgumentException>(() => KelvinDecoder.Decode(
            new byte[8], new(2, 2, 0, 2, 1), new KelvinRule(new(StoredNumber.UnsignedTwoBytes, 1.0, 0.0)), new float[3]));

    // Worked: -2 and 254 have the same byte.
    [Fact]
    public void Decode_SingleBytes_MindTheSign()
    {
        float[] kelvins = new float[2];
        KelvinDecoder.Decode([254, 1], new(1, 2, 0, 2, 1), new KelvinRule(new(StoredNumber.SignedOneByte, 1.0, 0.0)), kelvins);
        Assert.Equal([-2f, 1f], kelvins);

        KelvinDecoder.Decode([254, 1], new(1, 2, 0, 2, 1), new KelvinRule(new(StoredNumber.UnsignedOneByte, 1.0, 0.0)), kelvins);
        Assert.Equal([254f, 1f], kelvins);
    }

    // Worked: 2^63 and 10^15 as 64-bit integers.
    [Fact]
    public void Decode_LongIntegers_KeepTheirSize()
    {
        byte[] stored = new byte[16];
        BinaryPrimitives.WriteUInt64LittleEndian(stored, 1UL << 63);
        BinaryPrimitives.WriteUInt64LittleEndian(stored.AsSpan(8), 1_000_000_000_000_000);
        float[] kelvins = new float[2];

        KelvinDecoder.Decode(stored, new(1, 2, 0, 2, 1), new KelvinRule(new(StoredNumber.UnsignedEightBytes, 1.0, 0.0)), kelvins);
        Assert.Equal([9.223372e18f, 1e15f], kelvins);

        KelvinDecoder.Decode(stored, new(1, 2, 0, 2, 1), new KelvinRule(new(StoredNumber.SignedEightBytes, 1.0, 0.0)), kelvins);
        Assert.Equal([-9.223372e18f, 1e15f], kelvins);
    }
}
