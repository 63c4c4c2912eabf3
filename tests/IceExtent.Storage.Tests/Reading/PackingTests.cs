namespace IceExtent.Storage.Tests.Reading;

/// <summary>Every way of packing: against netCDF4-python (origin independent) and by hand (origin worked).</summary>
public sealed class PackingTests
{
    public static TheoryData<string, string, int> ReadElsewhere()
    {
        TheoryData<string, string, int> cases = [];
        foreach ((string file, string variable, int step) in SmallFiles.Independent.Keys)
        {
            cases.Add(file, variable, step);
        }

        return cases;
    }

    // Tolerance: the other program scales some variables in single precision; 2e-5 K is about one step of a float.
    [Theory]
    [MemberData(nameof(ReadElsewhere))]
    public void Read_VariableOfSmallFile_AgreesWithNetCdf4Python(string file, string variable, int step)
    {
        var source = SmallFiles.Source(file, variable);
        double[] expected = SmallFiles.Independent[(file, variable, step)];

        float[] kelvins = SmallFiles.Read(source, SmallFiles.Days(source)[step]);

        for (int cell = 0; cell < expected.Length; cell++)
        {
            Assert.True(
                double.IsNaN(expected[cell]) ? float.IsNaN(kelvins[cell]) : Math.Abs(kelvins[cell] - expected[cell]) <= 2e-5,
                $"{file} {variable} step {step} cell {cell}: got {kelvins[cell]}, netCDF4-python reads {expected[cell]}.");
        }
    }

    // Worked: stored 1000 + 53 c times the 32-bit scale 0.1, which stands for a tenth; 1053 is the fill value. The
    // floats must be those nearest to the tenths, bit for bit.
    [Fact]
    public void Read_TenthsWithSinglePrecisionScale_AreTheNearestFloats()
    {
        float[] expected = [.. SmallFiles.Tenths];
        expected[1] = float.NaN;

        Assert.Equal(expected, SmallFiles.ReadOnlyDay("packing.nc", "tenths"));
    }

    // Worked: stored 10 (1000 + 53 c) - 20000, times 0.01, plus 200; -10000 is 1000, the first cell, and missing.
    [Fact]
    public void Read_ScaleAndOffset_AreApplied()
    {
        float[] kelvins = SmallFiles.ReadOnlyDay("packing.nc", "hundredths");

        Assert.Equal([float.NaN, 105.3f, 110.6f], kelvins[..3]);
        Assert.Equal(253.7f, kelvins[29]);
    }

    // Worked: stored 100, 105, 110 and 253 (the tens of 1000 + 53 c), plus 20; 100 is missing. Scale and offset are integers.
    [Fact]
    public void Read_IntegerScaleAndOffset_AreApplied()
    {
        float[] kelvins = SmallFiles.ReadOnlyDay("packing.nc", "unsigned_bytes");

        Assert.Equal([float.NaN, 125f, 130f], kelvins[..3]);
        Assert.Equal(273f, kelvins[29]);
    }

    // Worked: the bits of -1 and -30536 are 65535 (the fill value) and 35000 as unsigned numbers, times 0.01.
    [Fact]
    public void Read_UnsignedAttribute_TurnsTheSignBit() =>
        Assert.Equal([float.NaN, 350f, 11.06f], SmallFiles.ReadOnlyDay("packing.nc", "unsigned_attribute")[..3]);

    // Worked: 1053 is the lowest and 2484 the highest valid number, so the first and the last cell are missing.
    [Theory]
    [InlineData("valid_range")]
    [InlineData("valid_min_max")]
    [InlineData("valid_kelvins")] // 105.29 to 248.41 K, as reals beside stored integers count in K.
    public void Read_ValidLimits_MakeTheRestMissing(string variable)
    {
        float[] expected = [.. SmallFiles.Tenths];
        (expected[0], expected[29]) = (float.NaN, float.NaN);

        Assert.Equal(expected, SmallFiles.ReadOnlyDay("packing.nc", variable));
    }

    // Worked: 1000 is the fill value; 1053, 1106 and 2537 are missing values.
    [Fact]
    public void Read_SeveralMissingValues_AreAllMissing()
    {
        float[] expected = [.. SmallFiles.Tenths];
        (expected[0], expected[1], expected[2], expected[29]) = (float.NaN, float.NaN, float.NaN, float.NaN);

        Assert.Equal(expected, SmallFiles.ReadOnlyDay("packing.nc", "missing_values"));
    }

    // Worked: without _FillValue the default one of 16-bit integers, -32767, stands for cells never written.
    [Fact]
    public void Read_NoFillValue_TakesTheDefaultOne() =>
        Assert.Equal([100f, float.NaN, 110.6f], SmallFiles.ReadOnlyDay("packing.nc", "no_fill_value")[..3]);

    [Theory]
    [InlineData("no_scale", "IE2111", "scale_factor 0")]
    [InlineData("word_scale", "IE2111", "scale_factor that is no number")]
    [InlineData("two_scales", "IE2111", "scale_factor 0.1, 0.2")]
    [InlineData("word_fill", "IE2111", "missing_value that is no number")]
    [InlineData("one_limit", "IE2111", "valid_range 1")]
    [InlineData("big_endian", "IE2106", "big-endian")]
    [InlineData("letters", "IE2106", "text")]
    [InlineData("words", "IE2106", "text")]
    [InlineData("column", "IE2107", "time 1, y 6")]
    [InlineData("number", "IE2107", "a single number")]
    [InlineData("two_bands", "IE2107", "band 2, y 6, x 5")]
    public void Read_UnusableVariable_IsRefusedWithItsNameAndWhatWasFound(string variable, string code, string found)
    {
        var fault = SmallFiles.FaultOf(SmallFiles.Source("packing.nc", variable));

        Assert.Equal(code, fault.Code);
        Assert.Equal($"{SmallFiles.PathOf("packing.nc")}, variable {variable}", fault.Where);
        Assert.Contains(found, fault.Found, StringComparison.Ordinal);
        Assert.EndsWith(".", fault.Remedy, StringComparison.Ordinal);
    }

    [Fact]
    public void List_VariableMissing_NamesTheOnesThereAreAndTheNearest()
    {
        var fault = SmallFiles.FaultOf(SmallFiles.Source("packing.nc", "Tenth"));

        Assert.Equal("IE2105", fault.Code);
        Assert.Equal(SmallFiles.PathOf("packing.nc"), fault.Where);
        Assert.Contains("big_endian, bytes, column, crs", fault.Allowed, StringComparison.Ordinal);
        Assert.Contains("more", fault.Allowed, StringComparison.Ordinal);
        Assert.Contains("Perhaps tenths is meant.", fault.Remedy, StringComparison.Ordinal);
    }
}
