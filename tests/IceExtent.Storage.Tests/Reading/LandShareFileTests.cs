using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Tests.Writing;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;

namespace IceExtent.Storage.Tests.Reading;

public sealed class LandShareFileTests
{
    private static readonly Grid Small = GridOf("small", columns: 4, rows: 3);

    /// <summary>Origin: worked. Steps of 1/250; a cell without a value counts as land.</summary>
    [Fact]
    public void Read_FileWrittenByUs_GivesTheSharesToHalfAStep()
    {
        using TemporaryFolder folder = new();
        string path = folder.PathOf("land.nc");
        Write(path, Small, [0f, 0.001f, 0.0019f, 0.5f, 0.9981f, 1f, float.NaN, 0.25f, 0.003f, 0f, 1f, 0.75f]);

        float[] shares = LandShareFile.Read(path, Small).Fraction.ToArray();

        Assert.Equal([0f, 0f, 0f, 0.5f, 1f, 1f, 1f, 0.248f, 0.004f, 0f, 1f, 0.752f], shares, (one, other) => Math.Abs(one - other) < 1e-6f);
        Assert.Equal([0f, 1f], [shares[0], shares[5]]); // Exactly: a limit of 1 must still tell land from sea.
    }

    /// <summary>
    /// Origin: independent; tests/data/land-sample.nc was written by netCDF-C with both axes turned round, as
    /// tests/data/README.md says. Values count up in sixteenths along the rows; the second cell has none.
    /// </summary>
    [Fact]
    public void Read_FileOfAnotherProgramTurnedRound_IsTurnedBack()
    {
        float[] shares = LandShareFile.Read(RepositoryFolder.PathOf("tests", "data", "land-sample.nc"), Small).Fraction.ToArray();

        Assert.Equal([0f, 1f, 2 / 16f, 3 / 16f, 4 / 16f, 5 / 16f, 6 / 16f, 7 / 16f, 8 / 16f, 9 / 16f, 10 / 16f, 11 / 16f], shares);
    }

    [Fact]
    public void Read_OtherSize_SaysBothSizes()
    {
        using TemporaryFolder folder = new();
        string path = folder.PathOf("land.nc");
        Write(path, GridOf("other", columns: 3, rows: 5), new float[15]);

        Fault fault = FaultOf(path);

        Assert.Equal("IE2201", fault.Code);
        Assert.Equal("the shape y 5, x 3", fault.Found);
        Assert.StartsWith("3 rows and 4 columns of the grid small", fault.Allowed, StringComparison.Ordinal);
        Assert.Equal($"{path}, variable land_area_fraction", fault.Where);
    }

    [Fact]
    public void Read_OtherEllipsoid_SaysTheAxes()
    {
        using TemporaryFolder folder = new();
        string path = folder.PathOf("land.nc");
        Write(path, GridOf("other", columns: 4, rows: 3, Ellipsoid.Hughes1980), new float[12]);

        Fault fault = FaultOf(path);

        Assert.Equal("IE2201", fault.Code);
        Assert.StartsWith("semi_major_axis 6378273 m, grid small has 6378137 m; inverse_flattening", fault.Found, StringComparison.Ordinal);
    }

    [Fact]
    public void Read_NoFile_SaysThePath()
    {
        using TemporaryFolder folder = new();

        Fault fault = FaultOf(folder.PathOf("none.nc"));

        Assert.Equal(("IE2202", folder.PathOf("none.nc")), (fault.Code, fault.Where));
    }

    [Theory]
    [InlineData(0)]
    [InlineData(100)]
    [InlineData(2000)]
    public void Read_FileCutOff_IsOneCodedFault(int bytes)
    {
        using TemporaryFolder folder = new();
        string path = folder.PathOf("land.nc");
        Write(path, Small, new float[12]);
        using (FileStream stream = File.OpenWrite(path))
        {
            stream.SetLength(bytes);
        }

        Assert.Equal("IE2202", FaultOf(path).Code);
    }

    [Fact]
    public void Read_NoPlaneOfShares_SaysWhatIsWanted()
    {
        using TemporaryFolder folder = new();
        string path = folder.PathOf("land.nc");
        GridFile.WriteUndated(path, Small, [Plane("height", new float[12])], []);

        Fault fault = FaultOf(path);

        Assert.Equal(("IE2203", "no variable land_area_fraction"), (fault.Code, fault.Found));
    }

    /// <summary>A plane packed into other numbers, and with a time of one day, is as good.</summary>
    [Fact]
    public void Read_OtherPackingOnOneDay_GivesTheShares()
    {
        using TemporaryFolder folder = new();
        string path = folder.PathOf("land.nc");
        float[] shares = [0f, 0.0001f, 0.5f, 1f, 0f, 0f, 0f, 0f, 0f, 0f, 0f, 1f];
        GridFile.Write(
            path, Small, new(2020, 3, 1), [new PackedVariable("land_area_fraction", "land", null, [], "1", shares, Packing.Fraction)], []);

        Assert.Equal(shares, LandShareFile.Read(path, Small).Fraction.ToArray());
    }

    [Fact]
    public void Read_SharesInPercent_SaysTheCell()
    {
        using TemporaryFolder folder = new();
        string path = folder.PathOf("land.nc");
        float[] percent = new float[12];
        percent[7] = 40f;
        GridFile.WriteUndated(
            path,
            Small,
            [new BytePackedVariable("land_area_fraction", "land", null, [], "percent", percent, new BytePacking(0.5, 0, 0, 100))],
            []);

        Fault fault = FaultOf(path);

        Assert.Equal(("IE2203", "a land share of 40 in row 1, column 3"), (fault.Code, fault.Found));
    }

    private static Grid GridOf(string name, int columns, int rows, Ellipsoid? ellipsoid = null) => new(
        name,
        null,
        new PolarStereographic(ellipsoid ?? Ellipsoid.Wgs84, -70, 0),
        new(columns, rows, CellMeters: 100_000, LeftMeters: 0, TopMeters: 400_000));

    private static void Write(string path, Grid grid, float[] shares) =>
        GridFile.WriteUndated(path, grid, [Plane(LandShareFile.VariableName, shares)], [new("title", "test")]);

    private static BytePackedVariable Plane(string name, float[] values) =>
        new(name, "land", null, [], "1", values, BytePacking.Fraction);

    private static Fault FaultOf(string path) =>
        Assert.Throws<FaultException>(() => LandShareFile.Read(path, Small)).Fault;
}
