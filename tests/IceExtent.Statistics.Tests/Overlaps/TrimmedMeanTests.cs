using CsCheck;
using IceExtent.Statistics.Overlaps;

namespace IceExtent.Statistics.Tests.Overlaps;

/// <summary>The robust centre of a day's differences.</summary>
public sealed class TrimmedMeanTests
{
    /// <summary>Origin: worked. Of five values 1.25 are cut off at each end: 0.75·2 + 3 + 0.75·4 = 7.5, over 2.5 is 3.</summary>
    [Fact]
    public void Of_OneWildValue_IsNotMoved() => Assert.Equal(3.0, TrimmedMean.Of([100f, 2f, 4f, 1f, 3f], 0.25));

    /// <summary>Origin: worked. The middle half of 0, 0, 0.1, 0.1 is 0, 0.1: between two steps of storage, where a median picks one.</summary>
    [Fact]
    public void Of_PackedValues_LiesBetweenSteps() => Assert.Equal(0.05, TrimmedMean.Of([0.1f, 0f, 0f, 0.1f], 0.25), 1e-8);

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.25)]
    [InlineData(0.49)]
    public void Of_OneValue_IsThatValue(double trim) => Assert.Equal(7.0, TrimmedMean.Of([7f], trim), 1e-12);

    [Fact]
    public void Of_NoValue_IsMissing() => Assert.True(double.IsNaN(TrimmedMean.Of([], 0.25)));

    [Theory]
    [InlineData(-0.1)]
    [InlineData(0.5)]
    public void Of_ImpossibleShare_IsRefused(double trim) => Assert.Throws<ArgumentOutOfRangeException>(() => TrimmedMean.Of([1f], trim));

    /// <summary>Without a cut it is the mean; with one it stays between the ends and moves along when all values move.</summary>
    [Fact]
    public void Of_AnyValues_IsAMean() =>
        Gen.Int[-400, 400].Array[1, 60].Sample(tenths =>
        {
            float[] values = Array.ConvertAll(tenths, value => value / 8f);
            double mean = values.Average(value => (double)value);
            double plain = TrimmedMean.Of([.. values], 0.0);
            double cut = TrimmedMean.Of([.. values], 0.25);
            double moved = TrimmedMean.Of(Array.ConvertAll(values, value => value + 3f), 0.25);
            return Math.Abs(plain - mean) < 1e-9 && cut >= values.Min() - 1e-9 && cut <= values.Max() + 1e-9 && Math.Abs(moved - cut - 3.0) < 1e-9;
        });
}
