using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>Rows come from the top and columns from the left, whatever the file does. Origin worked: tenths, cell 1 missing.</summary>
public sealed class AxesTests
{
    [Theory]
    [InlineData("bottom-up.nc", "tb")]
    [InlineData("right-to-left.nc", "tb")]
    [InlineData("right-to-left.nc", "tb_transposed")]
    [InlineData("kilometers.nc", "tb")]
    [InlineData("kilometers.nc", "transposed")]
    [InlineData("kilometers.nc", "plane")]
    [InlineData("kilometers.nc", "banded")]
    [InlineData("kilometers.nc", "last_time")]
    [InlineData("scalar-time.nc", "tb")]
    public void Read_AxesInAnyOrderAndDirection_GivesRowsFromTheTop(string file, string variable)
    {
        float[] expected = [.. SmallFiles.Tenths];
        expected[1] = float.NaN;

        Assert.Equal(expected, SmallFiles.ReadOnlyDay(file, variable));
    }

    // Worked: the file has no coordinates and no names of axes; only the lengths 6 and 5 tell rows from columns.
    [Fact]
    public void Read_PlainHdf5InAGroup_IsTakenByItsShape()
    {
        IBrightnessSource source = SmallFiles.Source("plain-20200131.h5", "swath/tb");
        float[] expected = [.. SmallFiles.Tenths];
        expected[1] = float.NaN;

        Assert.Equal(expected, SmallFiles.Read(source, new(new(2020, 1, 31), [SmallFiles.PathOf("plain-20200131.h5")], 0)));
    }

    // Worked: stored 1000 to 2537 without a scale, across instead of down.
    [Fact]
    public void Read_PlainHdf5Transposed_IsTurned()
    {
        IBrightnessSource source = SmallFiles.Source("plain-20200131.h5", "transposed");
        float[] expected = [.. SmallFiles.Tenths.Select(tenths => MathF.Round(tenths * 10f))];

        Assert.Equal(expected, SmallFiles.Read(source, new(new(2020, 1, 31), [SmallFiles.PathOf("plain-20200131.h5")], 0)));
    }

    [Theory]
    [InlineData("lzf", "a compression that is not read")]
    [InlineData("lzf_skipped", "a chunk that skips some of its filters")]
    public void Read_CompressionThatIsNotRead_IsRefused(string variable, string found)
    {
        Fault fault = SmallFiles.FaultOf(SmallFiles.Source("plain-20200131.h5", variable));

        Assert.Equal(("IE2106", found), (fault.Code, fault.Found));
        Assert.EndsWith($"variable {variable}", fault.Where, StringComparison.Ordinal);
        Assert.Contains("nccopy -d 4 -s", fault.Remedy, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("grid-shifted.nc", "IE2108", "x is shifted by half a cell")]
    [InlineData("grid-spacing.nc", "IE2108", "column spacing 12500 m")]
    [InlineData("grid-degrees.nc", "IE2108", "the unit 'degrees'")]
    [InlineData("grid-map.nc", "IE2108", "standard_parallel 60 degrees")]
    [InlineData("grid-size.nc", "IE2107", "time 1, y 6, x 4")]
    public void Read_FileOnAnotherGrid_IsRefusedWithWhatDiffers(string file, string code, string found)
    {
        Fault fault = SmallFiles.FaultOf(SmallFiles.Source(file, "tb"));

        Assert.Equal(code, fault.Code);
        Assert.StartsWith(SmallFiles.PathOf(file), fault.Where, StringComparison.Ordinal);
        Assert.Contains(found, fault.Found, StringComparison.Ordinal);
        Assert.Contains("Name the grid that the files are on", fault.Remedy, StringComparison.Ordinal);
    }
}
