using CsCheck;

namespace IceExtent.Retrieval.Tests;

/// <summary>Offsets taken off a sensor's temperatures.</summary>
public sealed class ChannelOffsetsTests
{
    private static readonly Dictionary<Channel, double> Nothing = [];

    /// <summary>Whole vectors and the tail do the same; other channels and missing cells stay.</summary>
    [Fact]
    public void Subtract_AnyLength_MovesItsChannelsAlone() =>
        Gen.Select(Gen.Single[100, 300].Array[1, 70], Gen.Double[-5, 5]).Sample((values, offset) =>
        {
            BrightnessPlanes planes = new(values.Length, [Channel.V19, Channel.V37]);
            values.CopyTo(planes.Kelvins(Channel.V19));
            values.CopyTo(planes.Kelvins(Channel.V37));
            planes.Kelvins(Channel.V19)[0] = float.NaN;

            new ChannelOffsets(new Dictionary<Channel, double> { [Channel.V19] = offset, [Channel.H19] = 1.0 }, Nothing).Subtract(planes);

            return float.IsNaN(planes.Kelvins(Channel.V19)[0])
                && planes.Kelvins(Channel.V19)[1..].SequenceEqual(Array.ConvertAll(values[1..], value => value - (float)offset))
                && planes.Kelvins(Channel.V37).SequenceEqual(values);
        });

    [Theory]
    [InlineData(double.NaN, 0.1)]
    [InlineData(double.PositiveInfinity, 0.1)]
    [InlineData(1.0, -0.1)]
    [InlineData(1.0, double.NaN)]
    public void ChannelOffsets_ImpossibleNumbers_AreRefused(double kelvins, double error) =>
        Assert.Throws<ArgumentException>(() => new ChannelOffsets(
            new Dictionary<Channel, double> { [Channel.V19] = kelvins }, new Dictionary<Channel, double> { [Channel.V19] = error }));

    [Fact]
    public void ChannelOffsets_ErrorWithoutOffset_IsRefused() =>
        Assert.Throws<ArgumentException>(() => new ChannelOffsets(Nothing, new Dictionary<Channel, double> { [Channel.V19] = 0.1 }));
}
