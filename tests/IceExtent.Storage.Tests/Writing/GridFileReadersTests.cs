using System.Globalization;
using System.Text.Json;
using IceExtent.Grids;
using IceExtent.TestKit;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>Writes the sample day once for all readers.</summary>
public sealed class SampleDayFile : IDisposable
{
    private readonly TemporaryFolder folder = new();

    public SampleDayFile()
    {
        Path = folder.PathOf("sample.nc");
        SampleDay.Write(Path, ConfigGrids.Get("north-25km"), SampleDay.Day);
        Header = ExternalProgram.Run("netcdf-bin", "ncdump", "-h", Path);
    }

    public string Path { get; }

    /// <summary>What ncdump says of it.</summary>
    public string Header { get; }

    public void Dispose() => folder.Dispose();
}

/// <summary>Other programs open a grid file and see what was written. Origin: independent, each program's own reading.</summary>
public sealed class GridFileReadersTests(SampleDayFile sample) : IClassFixture<SampleDayFile>
{
    private static readonly Grid Grid = ConfigGrids.Get("north-25km");

    /// <summary>The text was made by ncdump 4.9.0; see tests/data/README.md. Pinned as a whole; the types in it are asserted below.</summary>
    [Fact]
    public void Ncdump_Header_IsTheCommittedText()
    {
        string expected = File.ReadAllText(RepositoryFolder.PathOf("tests", "data", "grid-file-header.cdl"));

        Assert.Equal(expected, sample.Header);
    }

    /// <summary>Worked from [CF] 1.11: packing attributes in double, the rest in the type of the packed variable.</summary>
    [Theory]
    [InlineData("short sea_ice_concentration(time, y, x) ;")]
    [InlineData("sea_ice_concentration:_FillValue = -32768s ;")]
    [InlineData("sea_ice_concentration:valid_range = 0s, 10000s ;")]
    [InlineData("sea_ice_concentration:scale_factor = 0.0001 ;")]
    [InlineData("sea_ice_concentration:add_offset = 0. ;")]
    [InlineData("ubyte land_share(time, y, x) ;")]
    [InlineData("land_share:_FillValue = 255UB ;")]
    [InlineData("land_share:valid_range = 0UB, 250UB ;")]
    [InlineData("ushort conditions(time, y, x) ;")]
    [InlineData("conditions:flag_masks = 1US, 2US, 4US, 256US, 32768US ;")]
    [InlineData("conditions:flag_meanings = \"land polar_gap no_observation no_solution last_bit\" ;")]
    [InlineData("double time(time) ;")]
    [InlineData("time:bounds = \"time_bnds\" ;")]
    [InlineData("double time_bnds(time, nv) ;")]
    [InlineData(":Conventions = \"CF-1.11\" ;")]
    public void Ncdump_Header_HasTheTypesOfTheConventions(string line) =>
        Assert.Contains(line, sample.Header, StringComparison.Ordinal);

    [Fact]
    public void Python_NetcdfAndXarray_ReadTheValuesThatWereWritten()
    {
        const string script = """
            import json, sys
            import netCDF4, numpy, xarray
            raw = netCDF4.Dataset(sys.argv[1])
            raw.set_auto_maskandscale(False)
            day = xarray.open_dataset(sys.argv[1])
            cell = numpy.arange(304 * 448)
            stored = raw["sea_ice_concentration"][0].ravel()
            wanted = numpy.where(cell % 10050 > 10000, -32768, cell % 10050)
            share = day["sea_ice_concentration"].isel(time=0).values.ravel()
            seen = numpy.where(cell % 10050 > 10000, numpy.nan, (cell % 10050) * 1e-4)
            bits = raw["conditions"]
            print(json.dumps({
                "stored": bool((stored == wanted).all()),
                "scaled": float(numpy.nanmax(numpy.abs(share - seen))),
                "missing": bool((numpy.isnan(share) == numpy.isnan(seen)).all()),
                "bytes": bool((raw["land_share"][0].ravel() == cell % 251).all()),
                "masks": bool((bits[0].ravel() == cell % 65536).all()),
                "flagged": int(((bits[0] & bits.flag_masks[3]) != 0).sum()),
                "dimensions": list(raw["conditions"].dimensions),
                "time": str(day["time"].values[0]),
                "bounds": [str(end) for end in day["time_bnds"].values[0]],
                "x": [float(day["x"][0]), float(day["x"][-1])],
                "y": [float(day["y"][0]), float(day["y"][-1])],
                "comment": day.attrs["comment"],
                "first": list(day.attrs)[0],
            }))
            """;

        using JsonDocument answer = JsonDocument.Parse(ExternalProgram.Run(
            "python3-netcdf4 and python3-xarray", "/usr/bin/python3", "-c", script, sample.Path));
        JsonElement seen = answer.RootElement;

        Assert.True(seen.GetProperty("stored").GetBoolean());
        Assert.True(seen.GetProperty("missing").GetBoolean());
        Assert.True(seen.GetProperty("bytes").GetBoolean());
        Assert.True(seen.GetProperty("masks").GetBoolean());
        Assert.InRange(seen.GetProperty("scaled").GetDouble(), 0.0, 1e-7); // xarray unpacks into single precision.
        Assert.Equal(Enumerable.Range(0, Grid.CellCount).Count(cell => (cell & 256) != 0), seen.GetProperty("flagged").GetInt32());
        Assert.Equal(["time", "y", "x"], Texts(seen, "dimensions"));
        Assert.Equal("1988-02-29T00:00:00.000000000", seen.GetProperty("time").GetString());
        Assert.Equal(["1988-02-29T00:00:00.000000000", "1988-03-01T00:00:00.000000000"], Texts(seen, "bounds"));
        Assert.Equal([-3_837_500.0, 3_737_500.0], Numbers(seen, "x")); // Worked: half a cell inside the printed corners.
        Assert.Equal([5_837_500.0, -5_337_500.0], Numbers(seen, "y"));
        Assert.Equal("Öland: letters beyond ASCII", seen.GetProperty("comment").GetString());
        Assert.Equal("Conventions", seen.GetProperty("first").GetString());
    }

    [Fact]
    public void Gdal_Raster_IsPlacedScaledAndNamedAsTheGrid()
    {
        using JsonDocument answer = JsonDocument.Parse(ExternalProgram.Run(
            "gdal-bin", "gdalinfo", "-json", $"NETCDF:{sample.Path}:{SampleDay.Concentration}"));
        JsonElement raster = answer.RootElement;
        JsonElement band = raster.GetProperty("bands")[0];

        Assert.Equal([304.0, 448.0], Numbers(raster, "size"));
        Assert.Equal([-3_850_000.0, 25_000.0, 0.0, 5_850_000.0, 0.0, -25_000.0], Numbers(raster, "geoTransform"));
        Assert.EndsWith("ID[\"EPSG\",3411]]", raster.GetProperty("coordinateSystem").GetProperty("wkt").GetString(), StringComparison.Ordinal);
        Assert.Equal("Int16", band.GetProperty("type").GetString());
        Assert.Equal(-32_768.0, band.GetProperty("noDataValue").GetDouble());
        Assert.Equal(1e-4, band.GetProperty("scale").GetDouble());
    }

    [Fact]
    public void Gdal_ValueAtAPlace_IsThatOfTheCellThere()
    {
        MapPosition place = Grid.CenterOf(100_000);

        string stored = ExternalProgram.Run(
            "gdal-bin", "gdallocationinfo", "-valonly", "-geoloc", $"NETCDF:{sample.Path}:{SampleDay.Concentration}",
            place.XMeters.ToString(CultureInfo.InvariantCulture), place.YMeters.ToString(CultureInfo.InvariantCulture));

        Assert.Equal("9550", stored.Trim()); // Worked: 100,000 modulo 10,050.
    }

    [Fact]
    public void Cdo_GridAndTime_AreThoseOfTheFile()
    {
        string seen = ExternalProgram.Run("cdo", "cdo", "-s", "sinfo", sample.Path);

        Assert.Contains("mapping : polar_stereographic", seen, StringComparison.Ordinal);
        Assert.Contains("-3837500 to 3737500 by 25000 m", seen, StringComparison.Ordinal);
        Assert.Contains("5837500 to -5337500 by -25000 m", seen, StringComparison.Ordinal);
        Assert.Contains("1988-02-29 00:00:00", seen, StringComparison.Ordinal);
        Assert.Contains("Bounds = true", seen, StringComparison.Ordinal);
    }

    private static IEnumerable<string?> Texts(JsonElement element, string name) =>
        element.GetProperty(name).EnumerateArray().Select(item => item.GetString());

    private static IEnumerable<double> Numbers(JsonElement element, string name) =>
        element.GetProperty(name).EnumerateArray().Select(item => item.GetDouble());
}
