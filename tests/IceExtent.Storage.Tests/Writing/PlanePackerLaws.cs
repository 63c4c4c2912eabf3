using CsCheck;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>What holds for every plane and every packing.</summary>
public sealed class PlanePackerLaws
{
    private static readonly Gen<float> Values = Gen.Frequency(
        (8, Gen.Float[-0.5f, 1.5f]),
        (2, Gen.Float[-1e6f, 1e6f]),
        (1, OneOf(float.NaN, float.PositiveInfinity, float.NegativeInfinity, 0f, -0f, 1f, 0.15f, float.MaxValue)));

    private static readonly Gen<Packing> Packings = OneOf(
        Packing.Fraction, Packing.BrightnessKelvins, new Packing(0.5, -3.0, -10.0, 1000.0), new Packing(1e-4, 1.0, -2.0, 4.0));

    [Fact]
    public void Pack_AnyPlane_GivesWhatThePlainKernelGives() =>
        Gen.Select(Values.Array[0, 100], Packings).Sample((values, packing) =>
        {
            short[] fast = new short[values.Length];
            short[] plain = new short[values.Length];
            PlanePacker.Pack(values, packing.Range, fast.AsSpan());
            PlanePacker.PackPlainly(values, packing.Range, plain);
            return fast.AsSpan().SequenceEqual(plain);
        });

    [Fact]
    public void Pack_ValueInRange_ComesBackWithinHalfAStep() =>
        Gen.Select(Gen.Double[0.0, 1.0], Packings).Sample((share, packing) =>
        {
            float value = (float)(packing.Lowest + (share * (packing.Highest - packing.Lowest)));
            double back = Stored(value, packing) * packing.Scale + packing.Offset;

            // Single precision adds up to half a unit of its last digit of the largest number on the way.
            double slack = 1e-7 * (Math.Abs(value) + Math.Abs(packing.Offset));
            return Math.Abs(back - value) <= (0.5 * packing.Scale) + slack;
        });

    [Fact]
    public void Pack_StoredValue_ComesBackAsItself() =>
        Gen.Select(Gen.Short[0, 10_000], Gen.Const(Packing.Fraction)).Sample((stored, packing) =>
            Stored((float)(stored * packing.Scale), packing) == stored);

    // Worked: 0.15 is 1,500 steps of 1e-4; 0.00005 and 0.00015 are half steps, and ties go to even.
    [Theory]
    [InlineData(float.NaN, short.MinValue)]
    [InlineData(-0.01f, 0)]
    [InlineData(float.NegativeInfinity, 0)]
    [InlineData(0f, 0)]
    [InlineData(0.15f, 1_500)]
    [InlineData(1f, 10_000)]
    [InlineData(1.01f, 10_000)]
    [InlineData(float.PositiveInfinity, 10_000)]
    public void Pack_Fraction_StoresTheWorkedInteger(float value, short stored)
    {
        float[] plane = [.. Enumerable.Repeat(value, 33)]; // Two vectors of 16 and one left over.
        short[] packed = new short[33];

        PlanePacker.Pack(plane, Packing.Fraction.Range, packed.AsSpan());

        Assert.All(packed, one => Assert.Equal(stored, one));
    }

    // Worked: steps of 0.004, so 0.5 is 125, and 0.501 lies nearer to 125 (0.500) than to 126 (0.504).
    [Theory]
    [InlineData(float.NaN, byte.MaxValue)]
    [InlineData(-1f, 0)]
    [InlineData(0.5f, 125)]
    [InlineData(0.501f, 125)]
    [InlineData(1f, 250)]
    [InlineData(2f, 250)]
    public void Pack_ByteFraction_StoresTheWorkedByte(float value, byte stored)
    {
        byte[] packed = new byte[1];

        PlanePacker.Pack([value], BytePacking.Fraction.Range, packed);

        Assert.Equal(stored, packed[0]);
    }

    [Theory]
    [InlineData(1e-4, 0.0, 0.0, 4.0)] // 40,000 steps
    [InlineData(1e-4, 0.0, 1.0, 1.0)] // no range
    [InlineData(0.0, 0.0, 0.0, 1.0)]
    [InlineData(-1.0, 0.0, 0.0, 1.0)]
    [InlineData(1.0, 0.0, -32_768.0, 0.0)] // the lowest step is taken by the fill
    [InlineData(double.NaN, 0.0, 0.0, 1.0)]
    public void Packing_DoesNotFit_Refuses(double scale, double offset, double lowest, double highest) =>
        Assert.Throws<ArgumentException>(() => new Packing(scale, offset, lowest, highest));

    [Theory]
    [InlineData(1.0, 0.0, 0.0, 255.0)] // the highest byte is taken by the fill
    [InlineData(1.0, 0.0, -1.0, 1.0)]
    public void BytePacking_DoesNotFit_Refuses(double scale, double offset, double lowest, double highest) =>
        Assert.Throws<ArgumentException>(() => new BytePacking(scale, offset, lowest, highest));

    private static Gen<T> OneOf<T>(params T[] items) => Gen.Int[0, items.Length - 1].Select(item => items[item]);

    private static short Stored(float value, Packing packing)
    {
        short[] stored = new short[1];
        PlanePacker.Pack([value], packing.Range, stored.AsSpan());
        return stored[0];
    }
}
