using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>
/// Files of twelve months that netCDF4-python wrote: origin worked, from the formulas at the top of
/// tests/data/netcdf/make_months.py. What they share with other files is tested there: packing, storage, damage.
/// </summary>
public sealed class MonthFileTests
{
    private const int WithoutValue = 29;

    /// <summary>In month m, cells below m lie outside; with numbers along the axis and without.</summary>
    [Theory]
    [InlineData("months-mask.nc")]
    [InlineData("months-bare.nc")]
    public void ReadOutside_Mask_HasTwelveMonthsFromJanuary(string file)
    {
        bool[][] outside = IceMaskFile.ReadOutside(SmallFiles.PathOf(file), SmallFiles.Grid);

        Assert.Equal(12, outside.Length);
        Assert.All(outside, (month, index) => Assert.Equal(Enumerable.Range(0, 30).Select(cell => cell < index + 1 && cell != WithoutValue), month));
    }

    /// <summary>
    /// In month m cell c has 270 + m + c/10 K; above 275.05 K is c &gt; 50.5 − 10m. Rows from the bottom with dates of a real year, and
    /// degrees Celsius in double precision with a time in no calendar.
    /// </summary>
    [Theory]
    [InlineData("months-kelvin.nc")]
    [InlineData("months-celsius.nc")]
    public void ReadWarmerThan_EitherUnit_ComparesInKelvins(string file)
    {
        bool[][] warm = SeaTemperatureFile.ReadWarmerThan(SmallFiles.PathOf(file), SmallFiles.Grid, 275.05);

        Assert.Equal(12, warm.Length);
        Assert.All(warm, (month, index) => Assert.Equal(
            Enumerable.Range(0, 30).Select(cell => cell > 50.5 - (10 * (index + 1)) && cell != WithoutValue), month));
    }

    /// <summary>A sea exactly at the limit may have ice: in month 5 that is cell 0.</summary>
    [Fact]
    public void ReadWarmerThan_CellAtTheLimit_IsNotWarmer()
    {
        bool[][] warm = SeaTemperatureFile.ReadWarmerThan(SmallFiles.PathOf("months-kelvin.nc"), SmallFiles.Grid, 275.0);

        Assert.Equal((false, true), (warm[4][0], warm[4][1]));
    }

    [Theory]
    [InlineData("months-shifted.nc", "IE2221", "12500")]
    [InlineData("no-such-file.nc", "IE2222", "no-such-file.nc")]
    [InlineData("months-name.nc", "IE2223", "no variable ice_possible")]
    [InlineData("months-two.nc", "IE2223", "a mask of 2 in row 1, column 2")]
    [InlineData("months-eleven.nc", "IE2224", "11 planes")]
    [InlineData("months-one.nc", "IE2224", "one plane")]
    [InlineData("months-order.nc", "IE2224", "the months 1, 2, 4, 3, 5")]
    [InlineData("months-from-0.nc", "IE2224", "the months 0, 1, 2")]
    [InlineData("months-empty.nc", "IE2224", "no value in month 7")]
    public void ReadOutside_OtherFile_IsRefusedByName(string file, string code, string found) =>
        AssertFault(code, found, file, () => IceMaskFile.ReadOutside(SmallFiles.PathOf(file), SmallFiles.Grid));

    [Theory]
    [InlineData("months-mask.nc", "IE2233", "no variable sea_surface_temperature")]
    [InlineData("no-such-file.nc", "IE2232", "no-such-file.nc")]
    [InlineData("months-no-units.nc", "IE2233", "no attribute units")]
    [InlineData("months-fahrenheit.nc", "IE2233", "the unit 'degF'")]
    [InlineData("months-mislabelled.nc", "IE2233", "a temperature of -2.15 K in row 0, column 0")]
    [InlineData("months-winter.nc", "IE2224", "the months 7, 8, 9, 10, 11, 12, 1")]
    public void ReadWarmerThan_OtherFile_IsRefusedByName(string file, string code, string found) =>
        AssertFault(code, found, file, () => SeaTemperatureFile.ReadWarmerThan(SmallFiles.PathOf(file), SmallFiles.Grid, 278.0));

    private static void AssertFault(string code, string found, string file, Action read)
    {
        Fault fault = Assert.Throws<FaultException>(read).Fault;

        Assert.Equal(code, fault.Code);
        Assert.Contains(found, fault.ToString(), StringComparison.Ordinal);
        Assert.Contains(file, fault.Where, StringComparison.Ordinal);
    }
}
