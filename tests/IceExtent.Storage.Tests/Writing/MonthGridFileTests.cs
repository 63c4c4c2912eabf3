using System.Text.Json;
using IceExtent.Grids;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>Files with twelve planes, read by other programs and by us.</summary>
public sealed class MonthGridFileTests : IDisposable
{
    private static readonly Grid Small = new(
        "small", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(3, 2, 25_000.0, 0.0, 0.0));

    // In month m, cells below m have no ice; the last cell has no value.
    private static readonly byte[] Values = [.. Enumerable.Range(0, 72).Select(at => at % 6 == 5 ? byte.MaxValue : at % 6 < (at / 6) + 1 ? (byte)0 : (byte)1)];
    private readonly TemporaryFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>Worked from [CF] 1.11, sections 2.5 and 3.5.</summary>
    [Theory]
    [InlineData("ubyte ice_possible(month, y, x) ;")]
    [InlineData("ice_possible:_FillValue = 255UB ;")]
    [InlineData("ice_possible:flag_values = 0UB, 1UB ;")]
    [InlineData("ice_possible:flag_meanings = \"no_ice ice_can_be\" ;")]
    [InlineData("double month(month) ;")]
    [InlineData("month = 12 ;")]
    public void Ncdump_Header_HasTheFlagsOfTheConventions(string line) =>
        Assert.Contains(line, ExternalProgram.Run("netcdf-bin", "ncdump", "-h", Write()), StringComparison.Ordinal);

    /// <summary>Origin: independent, xarray's own reading.</summary>
    [Fact]
    public void Xarray_Open_SeesTheMonths()
    {
        const string Script = """
            import json, sys
            import numpy, xarray
            mask = xarray.open_dataset(sys.argv[1]).ice_possible
            print(json.dumps([mask.month.values.tolist(), numpy.nan_to_num(mask.values, nan=255).ravel().astype(int).tolist()]))
            """;

        using JsonDocument seen = JsonDocument.Parse(ExternalProgram.Run("python3-netcdf4 and python3-xarray", "/usr/bin/python3", "-c", Script, Write()));

        Assert.Equal(Enumerable.Range(1, 12).Select(month => (double)month), seen.RootElement[0].EnumerateArray().Select(month => month.GetDouble()));
        Assert.Equal(Values.Select(value => (int)value), seen.RootElement[1].EnumerateArray().Select(value => value.GetInt32()));
    }

    [Fact]
    public void Read_WhatWasWritten_IsTheMask()
    {
        bool[][] outside = IceMaskFile.ReadOutside(Write(), Small);

        Assert.Equal(Values.Select(value => value == 0), outside.SelectMany(month => month));
    }

    [Fact]
    public void WriteMonths_OnePlane_IsRefused() =>
        Assert.Throws<ArgumentException>(() => GridFile.WriteMonths(folder.PathOf("m.nc"), Small, [Mask(new byte[6])], [new("title", "Invented")]));

    private static FlagVariable Mask(byte[] values) => new("ice_possible", "whether ice can be", null, [], values, [(0, "no_ice"), (1, "ice_can_be")]);

    private string Write()
    {
        string path = folder.PathOf("m.nc");
        GridFile.WriteMonths(path, Small, [Mask(Values)], [new("title", "Invented")]);
        return path;
    }
}
