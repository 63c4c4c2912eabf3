using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>Headerless grids of 2 rows and 3 columns. Origin worked: the bytes stand in the tests.</summary>
public sealed class RawGridTests
{
    private static readonly Grid Grid = new(
        "tiny", null, new PolarStereographic(Ellipsoid.Wgs84, -70, 0), new GridFrame(3, 2, 25_000, 0, 0));

    private static readonly RawLayout Tenths = new(
        "{date:yyyyMMdd}_{channel}.bin", RawNumber.SignedTwoBytes, BigEndian: false, 0.1, 0.0, MissingValue: 0, HeaderBytes: 0, TopRowFirst: true);

    // 1000, 2431, 0, 2500, -1 and 256 as signed 16-bit numbers, low byte first.
    private static readonly byte[] SixNumbers = [0xE8, 0x03, 0x7F, 0x09, 0x00, 0x00, 0xC4, 0x09, 0xFF, 0xFF, 0x00, 0x01];

    [Fact]
    public void Read_SignedTenths_AreKelvins() =>
        Assert.Equal([100f, 243.1f, float.NaN, 250f, -0.1f, 25.6f], Read(Tenths, SixNumbers));

    [Fact]
    public void Read_Unsigned_HasNoNegativeNumbers() =>
        Assert.Equal(6553.5f, Read(Tenths with { Number = RawNumber.UnsignedTwoBytes }, SixNumbers)[4]);

    [Fact]
    public void Read_BottomRowFirst_IsTurned() =>
        Assert.Equal([250f, -0.1f, 25.6f, 100f, 243.1f, float.NaN], Read(Tenths with { TopRowFirst = false }, SixNumbers));

    // The same numbers, high byte first: 0x03E8 is 1000.
    [Fact]
    public void Read_BigEndian_IsTurned() =>
        Assert.Equal(
            [100f, 243.1f, float.NaN, 250f, -0.1f, 25.6f],
            Read(Tenths with { BigEndian = true }, [0x03, 0xE8, 0x09, 0x7F, 0x00, 0x00, 0x09, 0xC4, 0xFF, 0xFF, 0x01, 0x00]));

    [Fact]
    public void Read_Header_IsSkipped() =>
        Assert.Equal(243.1f, Read(Tenths with { HeaderBytes = 5 }, [1, 2, 3, 4, 5, .. SixNumbers])[1]);

    // 100000 is 0x000186A0; times 0.002 plus 50 is 250 K.
    [Fact]
    public void Read_FourBytes_AreScaled() =>
        Assert.Equal(
            250f,
            Read(Tenths with { Number = RawNumber.SignedFourBytes, ScaleKelvins = 0.002, OffsetKelvins = 50.0 }, [0xA0, 0x86, 0x01, 0x00, .. new byte[20]])[0]);

    // 243.5 is 0x43738000 as a 32-bit real; -999.9 is 0xC479F99A; 0x7FC00000 is NaN.
    [Fact]
    public void Read_BigEndianReals_KnowTheirMissingValue()
    {
        RawLayout reals = Tenths with { Number = RawNumber.RealFourBytes, BigEndian = true, ScaleKelvins = 1.0, MissingValue = -999.9 };

        float[] kelvins = Read(reals, [0x43, 0x73, 0x80, 0x00, 0xC4, 0x79, 0xF9, 0x9A, 0x7F, 0xC0, 0x00, 0x00, .. new byte[12]]);

        Assert.Equal([243.5f, float.NaN, float.NaN, 0f, 0f, 0f], kelvins);
    }

    // 243.5 is 0x406E700000000000 as a 64-bit real.
    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void Read_LongReals_InBothOrders(bool bigEndian)
    {
        byte[] number = [0x40, 0x6E, 0x70, 0, 0, 0, 0, 0];
        byte[] stored = bigEndian ? number : [.. number.Reverse()];

        Assert.Equal(243.5f, Read(Tenths with { Number = RawNumber.RealEightBytes, BigEndian = bigEndian, ScaleKelvins = 1.0, MissingValue = null }, [.. stored, .. new byte[40]])[0]);
    }

    [Theory]
    [InlineData(11, "11 bytes", "Fetch the file again")]
    [InlineData(14, "14 bytes", "Correct the grid")]
    [InlineData(0, "0 bytes", "Fetch the file again")]
    public void Read_WrongLength_SaysFoundAndExpected(int bytes, string found, string remedy)
    {
        Fault fault = Assert.Throws<FaultException>(() => Read(Tenths, new byte[bytes])).Fault;

        Assert.Equal(("IE2123", found), (fault.Code, fault.Found));
        Assert.StartsWith("12 bytes (a header of 0, then 2 rows of 3 numbers of 2 bytes)", fault.Allowed, StringComparison.Ordinal);
        Assert.StartsWith(remedy, fault.Remedy, StringComparison.Ordinal);
        Assert.EndsWith("20200131_19v.bin", fault.Where, StringComparison.Ordinal);
    }

    [Fact]
    public void List_TwoChannelsTwoDays_GivesFilesInTheOrderOfTheChannels()
    {
        IBrightnessSource source = Source(Tenths, "a/20200201_37h.bin", "a/20200201_19v.bin", "a/20200131_19v.bin", "a/20200131_37h.bin", "a/notes.txt", "a/20201331_19v.bin");

        SourceInventory inventory = source.List(CancellationToken.None);

        Assert.Equal([new DateOnly(2020, 1, 31), new DateOnly(2020, 2, 1)], inventory.Days.Select(day => day.Date));
        Assert.Equal(["a/20200131_19v.bin", "a/20200131_37h.bin"], inventory.Days[0].Files);
        Assert.Equal(["a/notes.txt", "a/20201331_19v.bin"], inventory.Faults.Select(fault => fault.Where));
        Assert.All(inventory.Faults, fault => Assert.Equal("IE2121", fault.Code));
    }

    [Fact]
    public void List_SameDayTwice_IsListedTwice()
    {
        IBrightnessSource source = Source(Tenths, "b/20200131_37h.bin", "a/20200131_19v.bin", "b/20200131_19v.bin", "a/20200131_37h.bin");

        Assert.Equal(
            [["a/20200131_19v.bin", "a/20200131_37h.bin"], ["b/20200131_19v.bin", "b/20200131_37h.bin"]],
            source.List(CancellationToken.None).Days.Select(day => day.Files));
    }

    // The day stands in the list with the file that should be there, so that reading it says what is missing.
    [Fact]
    public void Read_ChannelWithoutFile_IsRefusedUnlessItIsNotAskedFor()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("20200131_19v.bin", SixNumbers);
        IBrightnessSource source = Source(Tenths, path);
        SourceDay day = Assert.Single(source.List(CancellationToken.None).Days);

        Assert.Equal([path, folder.PathOf("20200131_37h.bin")], day.Files);
        Fault fault = Assert.Throws<FaultException>(() => source.Read(day, new BrightnessPlanes(6, [Channel.V19, Channel.H37]))).Fault;
        Assert.Equal(("IE2122", folder.PathOf("20200131_37h.bin")), (fault.Code, fault.Where));
        Assert.Contains("37h", fault.Found, StringComparison.Ordinal);

        BrightnessPlanes planes = new(6, [Channel.V19, Channel.V89]);
        planes.Kelvins(Channel.V89).Fill(1f);
        source.Read(day, planes);
        Assert.Equal(100f, planes.Kelvins(Channel.V19)[0]);
        Assert.True(float.IsNaN(planes.Kelvins(Channel.V89)[0]));
    }

    [Theory]
    [InlineData("{channel}-{date:yyyy-MM-dd}.dat", "19v-2020-01-31.dat")]
    [InlineData("{date:yyyyDDD}.{channel}", "2020031.37h")]
    [InlineData("{date:yyMMdd}{channel}", "20013137h")]
    [InlineData("x{date}x{channel}", "x20200131x37h")]
    [InlineData("{channel}_{date:yyyyMMddHHmmss}_{date:yyyy}", "37h_20200131235959_2020")]
    [InlineData("tb.({channel})+{date:yyyyMMdd}", "tb.(37h)+20200131")]
    public void List_NameThatFitsThePattern_HasTheDate(string pattern, string name) =>
        Assert.Equal(new DateOnly(2020, 1, 31), Assert.Single(Source(Tenths with { NamePattern = pattern }, name).List(CancellationToken.None).Days).Date);

    [Theory]
    [InlineData("{date:yyyyMMdd}_{channel}.bin", "20200131_19V.bin")]
    [InlineData("{date:yyyyMMdd}_{channel}.bin", "20200131_19v.bin.old")]
    [InlineData("{date:yyyyMMdd}_{channel}.bin", "20200230_19v.bin")]
    [InlineData("{date:yyyyDDD}_{channel}.bin", "2021366_19v.bin")]
    [InlineData("{date:yyyyMMdd}_{channel}_{date:yyyy}", "20200131_19v_2021")]
    [InlineData("{date:yyyyMMdd}_{channel}.bin", "٢٠٢٠٠١٣١_19v.bin")]
    public void List_NameThatDoesNotFit_IsAFault(string pattern, string name) =>
        Assert.Equal("IE2121", Assert.Single(Source(Tenths with { NamePattern = pattern }, name).List(CancellationToken.None).Faults).Code);

    [Theory]
    [InlineData("{channel}.bin", "no whole date")]
    [InlineData("{date:yyyyMM}_{channel}.bin", "no whole date")]
    [InlineData("{date:yyyyMMdd}.bin", "no {channel} for 2 channels")]
    [InlineData("{date:yyyyMMMdd}_{channel}.bin", "M in the date format")]
    public void Open_PatternThatCannotTell_IsRefused(string pattern, string found)
    {
        Fault fault = Assert.Throws<FaultException>(() => Source(Tenths with { NamePattern = pattern }, "x")).Fault;

        Assert.Equal("IE2120", fault.Code);
        Assert.Contains(found, fault.Found, StringComparison.Ordinal);
    }

    [Fact]
    public void Open_OneNameForTwoChannels_IsRefused()
    {
        SourceDescription twice = new([], Grid, new Dictionary<Channel, string> { [Channel.V19] = "a", [Channel.H19] = "a" }, Tenths);

        Assert.Equal("IE2120", Assert.Throws<FaultException>(() => BrightnessSources.Open(twice)).Fault.Code);
    }

    private static IBrightnessSource Source(RawLayout layout, params string[] paths) =>
        BrightnessSources.Open(new(paths, Grid, new Dictionary<Channel, string> { [Channel.V19] = "19v", [Channel.H37] = "37h" }, layout));

    private static float[] Read(RawLayout layout, byte[] bytes)
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("20200131_19v.bin", bytes);
        IBrightnessSource source = Source(layout, path);
        return SmallFiles.Read(source, source.List(CancellationToken.None).Days[0], Grid);
    }
}
