using CsCheck;
using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using PureHDF;
using PureHDF.VOL.Native;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>What a grid file holds and promises. Other programs' view of it: <see cref="GridFileReadersTests"/>.</summary>
public sealed class GridFileTests : IDisposable
{
    private static readonly Grid Small = new(
        "small", null, new PolarStereographic(Ellipsoid.Wgs84, -70, 0), new GridFrame(5, 3, 1000.0, -2000.0, 4000.0));

    private readonly TemporaryFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void Write_Twice_GivesTheSameBytes()
    {
        SampleDay.Write(folder.PathOf("a.nc"), Small, SampleDay.Day);
        SampleDay.Write(folder.PathOf("b", "b.nc"), Small, SampleDay.Day);

        Assert.Equal(File.ReadAllBytes(folder.PathOf("a.nc")), File.ReadAllBytes(folder.PathOf("b", "b.nc")));
    }

    [Fact]
    public void Write_ManyThreads_GivesTheBytesOfOne()
    {
        Grid grid = ConfigGrids.Get("north-25km");
        DateOnly[] days = [.. Enumerable.Range(0, 12).Select(SampleDay.Day.AddDays)];
        string PathOf(string way, DateOnly day) => folder.PathOf(way, $"{day:O}.nc");

        Array.ForEach(days, day => SampleDay.Write(PathOf("one", day), grid, day));
        Parallel.ForEach(days, new ParallelOptions { MaxDegreeOfParallelism = 4 }, day => SampleDay.Write(PathOf("many", day), grid, day));

        Assert.All(days, day => Assert.Equal(File.ReadAllBytes(PathOf("one", day)), File.ReadAllBytes(PathOf("many", day))));
    }

    [Fact]
    public void Write_LargerAndSmallerGridsInTurn_LeavesNoTraceOfEarlierFiles()
    {
        SampleDay.Write(folder.PathOf("first.nc"), Small, SampleDay.Day);
        SampleDay.Write(folder.PathOf("large.nc"), ConfigGrids.Get("south-25km"), SampleDay.Day);
        SampleDay.Write(folder.PathOf("again.nc"), Small, SampleDay.Day);

        Assert.Equal(File.ReadAllBytes(folder.PathOf("first.nc")), File.ReadAllBytes(folder.PathOf("again.nc")));
    }

    [Fact]
    public void Write_PlaneChangedAfterwards_LeavesTheFileAlone()
    {
        float[] plane = [.. Enumerable.Repeat(0.25f, Small.CellCount)];
        GridFile.Write(folder.PathOf("a.nc"), Small, SampleDay.Day, [Variable("v", plane)], []);
        byte[] before = File.ReadAllBytes(folder.PathOf("a.nc"));

        plane.AsSpan().Fill(0.75f);

        Assert.Equal(before, File.ReadAllBytes(folder.PathOf("a.nc")));
        Assert.All(Stored(folder.PathOf("a.nc"), "v"), stored => Assert.Equal(2_500, stored));
    }

    [Fact]
    public void Write_AnyPlane_StoresWhatThePackerGives() =>
        Gen.Float[-0.2f, 1.2f].Array[Small.CellCount].Sample(
            plane =>
            {
                short[] packed = new short[plane.Length];
                PlanePacker.PackPlainly(plane, Packing.Fraction.Range, packed);
                string path = folder.PathOf(Guid.NewGuid() + ".nc");
                GridFile.Write(path, Small, SampleDay.Day, [Variable("v", plane)], []);
                return Stored(path, "v").AsSpan().SequenceEqual(packed);
            },
            iter: 50);

    // Worked: columns 1 km wide from -2 km, so centers from -1.5 km; rows from 4 km down, so centers from 3.5 km.
    [Fact]
    public void Write_SmallGrid_HasTheWorkedCoordinates()
    {
        SampleDay.Write(folder.PathOf("a.nc"), Small, new DateOnly(1970, 1, 3));

        using NativeFile file = H5File.OpenRead(folder.PathOf("a.nc"));
        Assert.Equal([-1500.0, -500.0, 500.0, 1500.0, 2500.0], file.Dataset("x").Read<double[]>());
        Assert.Equal([3500.0, 2500.0, 1500.0], file.Dataset("y").Read<double[]>());
        Assert.Equal([2.0], file.Dataset("time").Read<double[]>());
        Assert.Equal([2.0, 3.0], file.Dataset("time_bnds").Read<double[]>());
        Assert.Equal([1UL, 3UL, 5UL], file.Dataset(SampleDay.Concentration).Space.Dimensions);
    }

    [Fact]
    public void Write_LastDayThereIs_StillHasBounds()
    {
        SampleDay.Write(folder.PathOf("a.nc"), Small, DateOnly.MaxValue);

        using NativeFile file = H5File.OpenRead(folder.PathOf("a.nc"));
        double[] bounds = file.Dataset("time_bnds").Read<double[]>();
        Assert.Equal(1.0, bounds[1] - bounds[0]);
    }

    [Theory]
    [InlineData(14)]
    [InlineData(16)]
    public void Write_PlaneOfAnotherSize_Refuses(int cells) =>
        Refuses([Variable("v", new float[cells])], []);

    [Theory]
    [InlineData("v")]
    [InlineData("x")]
    [InlineData("crs")]
    public void Write_NameTaken_Refuses(string name) =>
        Refuses([Variable("v", new float[15]), Variable(name, new float[15])], []);

    [Fact]
    public void Write_AttributeTwice_Refuses()
    {
        Refuses([], [new("Conventions", "CF-1.0")]);
        Refuses([Variable("v", new float[15]) with { Attributes = [new("units", "K")] }], []);
    }

    [Fact]
    public void Write_EmptyText_Refuses() => Refuses([], [new("title", string.Empty)]);

    [Fact]
    public void Write_FolderIsAFile_IsAFaultWithItsPath()
    {
        File.WriteAllText(folder.PathOf("grids"), string.Empty);

        Fault fault = Assert.Throws<FaultException>(() => SampleDay.Write(folder.PathOf("grids", "a.nc"), Small, SampleDay.Day)).Fault;

        Assert.Equal(("IE3104", folder.PathOf("grids", "a.nc")), (fault.Code, fault.Where));
    }

    private void Refuses(IReadOnlyList<GridVariable> variables, IReadOnlyList<KeyValuePair<string, string>> attributes)
    {
        Assert.Throws<ArgumentException>(() => GridFile.Write(folder.PathOf("a.nc"), Small, SampleDay.Day, variables, attributes));
        Assert.Empty(folder.Files());
    }

    private static PackedVariable Variable(string name, float[] plane) =>
        new(name, "a plane", null, [], "1", plane, Packing.Fraction);

    private static short[] Stored(string path, string name)
    {
        using NativeFile file = H5File.OpenRead(path);
        return file.Dataset(name).Read<short[]>();
    }
}
