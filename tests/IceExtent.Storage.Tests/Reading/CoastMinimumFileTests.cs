using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Tests.Writing;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>Files of minima. What they share with land files is tested there: turning, grids, damage.</summary>
public sealed class CoastMinimumFileTests : IDisposable
{
    private static readonly Grid Small = new(
        "small", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(3, 2, 25_000.0, 0.0, 0.0));

    private readonly TemporaryFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>Origin: worked. Steps of 0.0001; a cell without a value counts as 0.</summary>
    [Fact]
    public void Read_FileWrittenByUs_GivesTheMinimaAndNothingWhereMissing()
    {
        Write([0f, 0.25f, float.NaN, 0.6f, 1f, float.NaN]);

        Assert.Equal([0f, 0.25f, 0f, 0.6f, 1f, 0f], CoastMinimumFile.Read(folder.PathOf("m.nc"), Small), (one, other) => Math.Abs(one - other) < 1e-6f);
    }

    [Fact]
    public void Read_Percent_SaysWhereTheFirstIs()
    {
        Write([0f, 0.5f, 0.2f, 0.1f, 40f, 60f]);

        Fault fault = Assert.Throws<FaultException>(() => CoastMinimumFile.Read(folder.PathOf("m.nc"), Small)).Fault;

        Assert.Equal("IE2206", fault.Code);
        Assert.StartsWith("a minimum of 40", fault.Found, StringComparison.Ordinal);
        Assert.EndsWith("in row 1, column 1", fault.Found, StringComparison.Ordinal);
    }

    private void Write(float[] minima) => GridFile.WriteUndated(
        folder.PathOf("m.nc"),
        Small,
        [new PackedVariable(CoastMinimumFile.VariableName, "minimum", null, [], "1", minima, minima.Max() > 1f ? new(0.01, 0.0, 0.0, 100.0) : Packing.Fraction)],
        [new("title", "Invented minima")]);
}
