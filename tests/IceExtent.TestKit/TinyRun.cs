using System.Buffers.Binary;
using System.Globalization;
using IceExtent.Grids;
using IceExtent.Storage.Writing;

namespace IceExtent.TestKit;

/// <summary>A folder with a grid, a sensor, a run file and headerless days so small that every number can be worked by hand.</summary>
/// <remarks>
/// The grid has 4 rows and 5 columns of 25 km, equal-area round the north pole, so each cell is 625 km². Column 0 is
/// land. The days are tenths of a kelvin in 16-bit integers, one file a channel.
/// </remarks>
public sealed class TinyRun : IDisposable
{
    public const int Rows = 4;
    public const int Columns = 5;
    public const double CellSquareKilometers = 625.0;

    private static readonly string[] ChannelOrder = ["v19", "h19", "v22", "v37", "h37"];

    public TinyRun()
    {
        Folder = Path.Combine(Path.GetTempPath(), "iceextent-tests", Guid.NewGuid().ToString("N"));
        Directory.CreateDirectory(Path.Combine(Folder, "days"));
        Write("grid.toml", """
            title = "Invented small grid"
            projection = "polar-equal-area"
            semi_major_axis_m = 6378137.0
            inverse_flattening = 298.257223563
            hemisphere = "north"
            origin_longitude = 0.0
            columns = 5
            rows = 4
            cell_m = 25000.0
            left_m = -62500.0
            top_m = 50000.0
            land = "land.nc"
            """);
        Write("tiny.toml", Sensor("1990-01-01", "1999-12-31"));
        float[] land = new float[Rows * Columns];
        for (int row = 0; row < Rows; row++)
        {
            land[row * Columns] = 1f;
        }

        GridFile.WriteUndated(
            PathOf("land.nc"),
            Grid,
            [new BytePackedVariable("land_area_fraction", "share of land", "land_area_fraction", [], "1", land, BytePacking.Fraction)],
            [new("title", "Invented land")]);
        WriteRunFile();
    }

    /// <summary>The grid that grid.toml describes.</summary>
    public static Grid Grid { get; } = new(
        "grid", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(Columns, Rows, 25_000.0, -62_500.0, 50_000.0));

    public string Folder { get; }

    public string RunFile => PathOf("run.toml");

    public string PathOf(params string[] parts) => Path.Combine([Folder, .. parts]);

    public void Write(string name, string text) => File.WriteAllText(PathOf(name), text + "\n");

    /// <summary>The same sensor, blind from 89.8 degrees on: cells 7 and 12, the middle ones of column 2.</summary>
    public static string SensorWithPolarGap(string firstDay, string lastDay) => "polar_gap_latitude = 89.8\n" + Sensor(firstDay, lastDay);

    /// <summary>A sensor with the tie points of F17 north (value from memory, high) and a service period of one's own.</summary>
    public static string Sensor(string firstDay, string lastDay) => $$"""
        title = "Invented radiometer"
        first_day = {{firstDay}}
        last_day = {{lastDay}}
        range_k = [60.0, 320.0]
        [frequencies_ghz]
        19v = 19.0
        19h = 19.0
        22v = 22.0
        37v = 37.0
        37h = 37.0
        [scatter]
        open_water = 0.05
        closed_ice = 0.05
        [north.tie_points_k]
        open_water = { 19v = 184.9, 19h = 113.4, 37v = 207.1 }
        first_year = { 19v = 248.4, 19h = 232.0, 37v = 242.3 }
        multiyear = { 19v = 220.7, 19h = 196.0, 37v = 188.5 }
        [north.screens]
        gradient_37_19 = 0.07
        gradient_22_19 = 0.07
        [south.tie_points_k]
        open_water = { 19v = 184.9, 19h = 113.4, 37v = 207.1 }
        first_year = { 19v = 253.1, 19h = 237.8, 37v = 246.6 }
        multiyear = { 19v = 244.0, 19h = 211.9, 37v = 212.6 }
        [south.screens]
        gradient_37_19 = 0.07
        """;

    /// <summary>Writes run.toml; <paramref name="head"/> stands before the source and <paramref name="source"/> inside it.</summary>
    public void WriteRunFile(string head = "", string source = "", string sensor = "tiny.toml") => Write("run.toml", $$"""
        output = "out"
        grid = "grid.toml"
        methods = ["nasa-team"]
        {{head}}

        [[source]]
        sensor = "{{sensor}}"
        files = "days/*.bin"
        channels = { 19v = "v19", 19h = "h19", 22v = "v22", 37v = "v37", 37h = "h37" }
        raw = { name = "{date:yyyyMMdd}_{channel}.bin", number = "int16", byte_order = "little", scale_k = 0.1, missing = 0 }
        {{source}}
        """);

    /// <summary>Writes a day on which each cell mixes open water and first-year ice; NaN is missing.</summary>
    public void WriteDay(DateOnly day, Func<int, double> iceFraction)
    {
        ArgumentNullException.ThrowIfNull(iceFraction);
        double[] water = [184.9, 113.4, 200.0, 207.1, 145.0];
        double[] ice = [248.4, 232.0, 247.0, 242.3, 231.0];
        for (int channel = 0; channel < ChannelOrder.Length; channel++)
        {
            byte[] bytes = new byte[2 * Rows * Columns];
            for (int cell = 0; cell < Rows * Columns; cell++)
            {
                double fraction = iceFraction(cell);
                double kelvins = (fraction * ice[channel]) + ((1.0 - fraction) * water[channel]);
                BinaryPrimitives.WriteInt16LittleEndian(
                    bytes.AsSpan(2 * cell), double.IsNaN(fraction) ? (short)0 : (short)Math.Round(10.0 * kelvins));
            }

            File.WriteAllBytes(DayFile(day, ChannelOrder[channel]), bytes);
        }
    }

    public string DayFile(DateOnly day, string channel) =>
        PathOf("days", string.Create(CultureInfo.InvariantCulture, $"{day:yyyyMMdd}_{channel}.bin"));

    public void Dispose()
    {
        if (Directory.Exists(Folder))
        {
            Directory.Delete(Folder, recursive: true);
        }
    }
}
