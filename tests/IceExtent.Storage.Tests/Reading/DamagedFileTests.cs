using System.Globalization;
using System.Text;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>A file that is no good ends in a coded error with its name, and never in anything else.</summary>
public sealed class DamagedFileTests
{
    public static TheoryData<string, byte[], string, string> NotHdf5() => new()
    {
        { "empty.nc", [], "IE2102", "an empty file" },
        { "text.nc", [.. "date,region,extent\n2020-01-31,all,14.2\n"u8], "IE2102", "text" },
        { "page.nc", [.. "<html>not found</html>"u8], "IE2102", "text" },
        { "classic.nc", [.. "CDF"u8, 1, 0, 0, 0, 0], "IE2102", "a NetCDF-3 file" },
        { "packed.nc.gz", [0x1F, 0x8B, 8, 0, 0, 0, 0, 0], "IE2102", "a file packed with gzip" },
        { "noise.nc", [.. Enumerable.Range(0, 4096).Select(at => (byte)(at * at % 251))], "IE2103", "The file is not a valid HDF 5 file" },
    };

    [Theory]
    [MemberData(nameof(NotHdf5))]
    public void List_FileOfAnotherKind_IsRefusedWithWhatItIs(string name, byte[] bytes, string code, string found)
    {
        using TemporaryFolder folder = new();
        string path = folder.Write(name, bytes);

        Fault fault = SmallFiles.FaultOf(SmallFiles.Source([path], "tb"));

        Assert.Equal((code, path), (fault.Code, fault.Where));
        Assert.Contains(found, fault.Found, StringComparison.Ordinal);
    }

    [Fact]
    public void List_ClassicNetCdf_SaysHowToRewriteIt()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("classic.nc", [.. "CDF"u8, 2, 0, 0, 0, 0]);

        Assert.Contains("nccopy -k nc4", SmallFiles.FaultOf(SmallFiles.Source([path], "tb")).Remedy, StringComparison.Ordinal);
    }

    [Fact]
    public void List_NoSuchFile_IsAFault()
    {
        using TemporaryFolder folder = new();

        Assert.Equal("IE2101", SmallFiles.FaultOf(SmallFiles.Source([folder.PathOf("gone.nc")], "tb")).Code);
    }

    [Fact]
    public void List_Folder_IsAFault()
    {
        using TemporaryFolder folder = new();
        Directory.CreateDirectory(folder.PathOf("folder.nc"));

        Assert.Equal("IE2101", SmallFiles.FaultOf(SmallFiles.Source([folder.PathOf("folder.nc")], "tb")).Code);
    }

    [Fact]
    public void Read_FileGoneSinceItWasListed_IsAFault()
    {
        using TemporaryFolder folder = new();
        IBrightnessSource source = SmallFiles.Source([folder.PathOf("gone.nc")], "tb");
        SourceDay day = new(new(2020, 1, 31), [folder.PathOf("gone.nc")], 0);

        Assert.Equal("IE2101", Assert.Throws<FaultException>(() => SmallFiles.Read(source, day)).Fault.Code);
    }

    [Theory]
    [InlineData(8, "IE2103", "8 bytes")]
    [InlineData(60, "IE2103", "60 bytes")]
    [InlineData(2_000, "IE2103", "2000 bytes")]
    [InlineData(16_000, "IE2103", "16000 bytes")]
    public void List_CutShort_SaysHowLongTheFileIsAndShouldBe(int bytes, string code, string found)
    {
        using TemporaryFolder folder = new();
        byte[] whole = File.ReadAllBytes(SmallFiles.PathOf("bottom-up.nc"));
        string path = folder.Write("short.nc", whole[..bytes]);

        Fault fault = SmallFiles.FaultOf(SmallFiles.Source([path], "tb"));

        Assert.Equal((code, path, found), (fault.Code, fault.Where, fault.Found));
        Assert.Contains(bytes < 96 ? "a whole header" : $"{whole.Length} bytes", fault.Allowed, StringComparison.Ordinal);
    }

    // The chunks of these variables carry a checksum (adler-32 in deflated data, fletcher-32 beside it), so every
    // changed bit that matters is seen; the few that fill up the last byte of deflated data do not matter.
    [Theory]
    [InlineData("deflated")]
    [InlineData("unshuffled")]
    [InlineData("checked")]
    [InlineData("checked_wide")]
    public void Read_AnyBitOfAChunkChanged_IsRefusedOrChangesNothing(string variable)
    {
        using TemporaryFolder folder = new();
        byte[] whole = File.ReadAllBytes(SmallFiles.PathOf("storage-fixed.nc"));
        IBrightnessSource good = SmallFiles.Source("storage-fixed.nc", variable);
        float[] expected = SmallFiles.Read(good, SmallFiles.Days(good)[0]);
        (int start, int bytes) = FirstChunkOf(variable);
        int refused = 0;

        for (int bit = 0; bit < 8 * bytes; bit++)
        {
            byte[] changed = [.. whole];
            changed[start + (bit / 8)] ^= (byte)(1 << (bit % 8));
            IBrightnessSource source = SmallFiles.Source([folder.Write("changed.nc", changed)], variable);
            SourceDay day = SmallFiles.Days(source)[0];
            try
            {
                Assert.Equal(expected, SmallFiles.Read(source, day));
            }
            catch (FaultException error)
            {
                Assert.Equal("IE2104", error.Fault.Code);
                Assert.EndsWith($"changed.nc, variable {variable}", error.Fault.Where, StringComparison.Ordinal);
                refused++;
            }
        }

        Assert.InRange(refused, (8 * bytes) - 20, 8 * bytes);
    }

    // The blocks of the structure of a NetCDF-4 file carry checksums: every changed bit of a scale or a name is seen.
    [Theory]
    [InlineData("scale_factor", "tenths")]
    [InlineData("add_offset", "hundredths")]
    [InlineData("days since", "tenths")]
    [InlineData("long_text", "long_text")]
    [InlineData("note_3", "long_text")]
    public void List_BitOfANameOrAnAttributeChanged_IsRefused(string near, string variable)
    {
        using TemporaryFolder folder = new();
        byte[] whole = File.ReadAllBytes(SmallFiles.PathOf("packing.nc"));
        int at = whole.AsSpan().IndexOf(Encoding.ASCII.GetBytes(near));

        for (int bit = 0; bit < 8 * near.Length; bit++)
        {
            byte[] changed = [.. whole];
            changed[at + (bit / 8)] ^= (byte)(1 << (bit % 8));
            IBrightnessSource source = SmallFiles.Source([folder.Write("changed.nc", changed)], variable);

            Assert.Equal("IE2103", SmallFiles.FaultOf(source).Code);
        }
    }

    [Theory]
    [InlineData("bottom-up.nc", "tb")]
    [InlineData("storage-unlimited.nc", "deflated,checked,small_chunks")]
    [InlineData("packing.nc", "long_text,hundredths")]
    [InlineData("plain-20200131.h5", "swath/tb,transposed")]
    public void Read_AnyChangeOfTheBytes_EndsInKelvinsOrInACodedError(string file, string variables)
    {
        const int Seed = 20_260_131;
        const int Changes = 150;
        using TemporaryFolder folder = new();
        byte[] whole = File.ReadAllBytes(SmallFiles.PathOf(file));
        Random random = new(Seed);
        int refused = 0;
        for (int change = 0; change < Changes; change++)
        {
            string path = folder.Write("changed-20200131.nc", Change(whole, random));
            try
            {
                refused += IsRefused(SmallFiles.Source([path], variables.Split(','))) ? 1 : 0;
            }
            catch (Exception other) when (other is not Xunit.Sdk.XunitException)
            {
                Assert.Fail($"Seed {Seed}, change {change} of {file}: {other}");
            }
        }

        // Most changes hit something; if none were refused, nothing was tried.
        Assert.InRange(refused, Changes / 10, Changes);
    }

    private static bool IsRefused(IBrightnessSource source)
    {
        SourceInventory inventory = source.List(CancellationToken.None);
        foreach (SourceDay day in inventory.Days.Take(3))
        {
            try
            {
                source.Read(day, new BrightnessPlanes(SmallFiles.Grid.CellCount, [Channel.V19, Channel.H19, Channel.V22]));
            }
            catch (FaultException)
            {
                return true;
            }
        }

        return inventory.Faults.Count > 0;
    }

    private static byte[] Change(byte[] whole, Random random)
    {
        byte[] changed = [.. whole];
        switch (random.Next(5))
        {
            case 0:
                return changed[..random.Next(changed.Length)];
            case 1:
                changed[random.Next(changed.Length)] ^= (byte)(1 << random.Next(8));
                return changed;
            case 2:
                random.NextBytes(changed.AsSpan(random.Next(changed.Length - 8), 8));
                return changed;
            case 3:
                changed.AsSpan(random.Next(changed.Length - 8), 8).Fill(0xFF);
                return changed;
            default:
                for (int count = random.Next(1, 40); count > 0; count--)
                {
                    changed[random.Next(changed.Length)] = (byte)random.Next(256);
                }

                return changed;
        }
    }

    // Origin independent: h5py, see tests/data/README.md.
    private static (int Start, int Bytes) FirstChunkOf(string variable)
    {
        string[] cells = File.ReadLines(SmallFiles.PathOf("chunks.csv")).Select(line => line.Split(',')).Single(line => line[1] == variable);
        return (int.Parse(cells[2], CultureInfo.InvariantCulture), int.Parse(cells[3], CultureInfo.InvariantCulture));
    }
}
