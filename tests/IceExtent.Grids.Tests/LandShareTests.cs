namespace IceExtent.Grids.Tests;

public sealed class LandShareTests
{
    /// <summary>Origin: worked. A cell at the limit counts as land.</summary>
    [Fact]
    public void OceanBelow_ShareAtTheLimit_IsLand() =>
        Assert.Equal([true, true, false, false], new LandShare([0f, 0.49f, 0.5f, 1f]).OceanBelow(0.5));

    [Theory]
    [InlineData(-0.01f)]
    [InlineData(1.01f)]
    [InlineData(float.NaN)]
    public void Constructor_ShareOutsideZeroToOne_IsRefused(float share) =>
        Assert.Throws<ArgumentException>(() => new LandShare([0f, share]));
}
