using System.Globalization;
using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.TestKit;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>The small files of tests/data/netcdf and the grid they are on.</summary>
internal static class SmallFiles
{
    private const int Channels = 7;

    /// <summary>6 rows of 5 columns of 25 km around the pole.</summary>
    public static Grid Grid { get; } = new(
        "small", 3411, new PolarStereographic(Ellipsoid.Hughes1980, 70, -45), new GridFrame(5, 6, 25_000, -62_500, 75_000));

    /// <summary>The numbers from which the files were made: 1000, 1053, … 2537 from the top left.</summary>
    public static float[] Tenths { get; } = [.. Enumerable.Range(0, 30).Select(cell => (1000 + (53 * cell)) / 10f)];

    /// <summary>A file's path.</summary>
    public static string PathOf(string name) => RepositoryFolder.PathOf("tests", "data", "netcdf", name);

    /// <summary>A source of some files with one or more variables, the first as 19v, the next as 19h and so on.</summary>
    public static IBrightnessSource Source(IEnumerable<string> paths, params string[] variables) =>
        BrightnessSources.Open(new(
            [.. paths],
            Grid,
            variables.Take(Channels).Select((name, at) => ((Channel)at, name)).ToDictionary(pair => pair.Item1, pair => pair.name),
            null));

    /// <summary>A source of one small file.</summary>
    public static IBrightnessSource Source(string file, params string[] variables) => Source([PathOf(file)], variables);

    /// <summary>The days of a source, which must have no faults.</summary>
    public static IReadOnlyList<SourceDay> Days(IBrightnessSource source)
    {
        SourceInventory inventory = source.List(CancellationToken.None);
        Assert.Empty(inventory.Faults);
        return inventory.Days;
    }

    /// <summary>The kelvins of the first channel on one day.</summary>
    public static float[] Read(IBrightnessSource source, SourceDay day) => Read(source, day, Grid);

    /// <summary>The kelvins of the first channel on one day, on another grid.</summary>
    public static float[] Read(IBrightnessSource source, SourceDay day, Grid grid)
    {
        BrightnessPlanes planes = new(grid.CellCount, [Channel.V19]);
        source.Read(day, planes);
        return planes.Kelvins(Channel.V19).ToArray();
    }

    /// <summary>The kelvins of one variable of a file with a single day.</summary>
    public static float[] ReadOnlyDay(string file, string variable)
    {
        IBrightnessSource source = Source(file, variable);
        return Read(source, Assert.Single(Days(source)));
    }

    /// <summary>The fault that listing or reading ends in.</summary>
    public static Fault FaultOf(IBrightnessSource source)
    {
        SourceInventory inventory = source.List(CancellationToken.None);
        return inventory.Days.Count == 0
            ? Assert.Single(inventory.Faults)
            : Assert.Throws<FaultException>(() => Read(source, inventory.Days[0])).Fault;
    }

    /// <summary>What netCDF4-python reads, turned to the grid: origin independent, see tests/data/README.md.</summary>
    public static Dictionary<(string File, string Variable, int Step), double[]> Independent { get; } = File
        .ReadLines(PathOf("kelvins.csv"))
        .Skip(1)
        .Select(line => line.Split(','))
        .GroupBy(cells => (cells[0], cells[1], int.Parse(cells[2], CultureInfo.InvariantCulture)))
        .ToDictionary(
            group => group.Key,
            group => group.Select(cells => double.Parse(cells[4], CultureInfo.InvariantCulture)).ToArray());
}
