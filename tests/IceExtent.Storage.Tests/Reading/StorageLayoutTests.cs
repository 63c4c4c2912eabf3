using IceExtent.Retrieval;
using IceExtent.Storage.Reading;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>However numbers are laid out in a file, the same kelvins come out. Origin worked: stored + 7 a day, in tenths.</summary>
public sealed class StorageLayoutTests
{
    public static TheoryData<string, string> Layouts()
    {
        TheoryData<string, string> cases = [];
        foreach ((string file, string variable, int _) in SmallFiles.Independent.Keys.Where(key => key.Step == 1 && key.File.StartsWith("storage", StringComparison.Ordinal)))
        {
            cases.Add(file, variable);
        }

        return cases;
    }

    [Theory]
    [MemberData(nameof(Layouts))]
    public void Read_BothDays_GivesTheStoredTenths(string file, string variable)
    {
        IBrightnessSource source = SmallFiles.Source(file, variable);
        IReadOnlyList<SourceDay> days = SmallFiles.Days(source);

        Assert.Equal([new DateOnly(2020, 1, 31), new DateOnly(2020, 2, 1)], days.Select(day => day.Date));
        for (int step = 0; step < 2; step++)
        {
            float[] kelvins = SmallFiles.Read(source, days[step]);
            for (int cell = 0; cell < kelvins.Length; cell++)
            {
                int stored = 1000 + (53 * cell) + (7 * step);
                bool missing = stored == 1053 && variable != "checked_wide";
                Assert.Equal(missing ? float.NaN : stored / 10f, kelvins[cell]);
            }
        }
    }

    [Theory]
    [InlineData("storage-fixed.nc")]
    [InlineData("storage-unlimited.nc")]
    public void Read_NeverWritten_IsAllMissing(string file)
    {
        IBrightnessSource source = SmallFiles.Source(file, "never_written");

        Assert.All(SmallFiles.Read(source, SmallFiles.Days(source)[1]), kelvins => Assert.True(float.IsNaN(kelvins)));
    }

    // In NetCDF a growing axis is as long for all variables; what one of them has not written of it is missing.
    [Theory]
    [InlineData("storage-fixed.nc")]
    [InlineData("storage-unlimited.nc")]
    public void Read_OnlyTheFirstDayWritten_IsMissingOnTheSecond(string file)
    {
        IBrightnessSource source = SmallFiles.Source(file, "first_day_only");
        IReadOnlyList<SourceDay> days = SmallFiles.Days(source);

        Assert.Equal([1000f, float.NaN, 1106f], SmallFiles.Read(source, days[0])[..3]);
        Assert.All(SmallFiles.Read(source, days[1]), kelvins => Assert.True(float.IsNaN(kelvins)));
    }

    [Fact]
    public void Read_SeveralChannels_EachGetsItsOwnPlaneAndTheRestIsMissing()
    {
        IBrightnessSource source = SmallFiles.Source("storage-fixed.nc", "deflated", "contiguous", "small_chunks");
        BrightnessPlanes planes = new(SmallFiles.Grid.CellCount, [Channel.V19, Channel.V22, Channel.H89]);
        planes.Kelvins(Channel.H89).Fill(1f);

        source.Read(SmallFiles.Days(source)[0], planes);

        Assert.Equal(100f, planes.Kelvins(Channel.V19)[0]);
        Assert.Equal(100f, planes.Kelvins(Channel.V22)[0]);
        Assert.True(float.IsNaN(planes.Kelvins(Channel.H89)[0])); // The source has no such channel.
    }

    [Fact]
    public void Read_FromManyThreads_GivesTheSameEverywhere()
    {
        IBrightnessSource source = SmallFiles.Source("storage-unlimited.nc", "deflated");
        IReadOnlyList<SourceDay> days = SmallFiles.Days(source);
        float[][] alone = [SmallFiles.Read(source, days[0]), SmallFiles.Read(source, days[1])];

        Parallel.For(0, 200, new ParallelOptions { MaxDegreeOfParallelism = 8 }, round =>
            Assert.Equal(alone[round % 2], SmallFiles.Read(source, days[round % 2])));
    }

    // What is remembered of a file holds only while the file stays as it was. Worked: the rows of
    // the one file run up and those of the other down, so each needs its own turn to start with 100 K.
    [Fact]
    public void Read_FileReplacedByAnother_IsTakenApartAgain()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("tb.nc", File.ReadAllBytes(SmallFiles.PathOf("bottom-up.nc")));
        File.SetLastWriteTimeUtc(path, new(2020, 2, 1));
        IBrightnessSource source = SmallFiles.Source([path], "tb");
        SourceDay day = Assert.Single(SmallFiles.Days(source));
        float[] first = SmallFiles.Read(source, day);

        folder.Write("tb.nc", File.ReadAllBytes(SmallFiles.PathOf("kilometers.nc")));
        File.SetLastWriteTimeUtc(path, new(2020, 2, 2));
        float[] second = SmallFiles.Read(source, day);

        Assert.Equal(100f, first[0]);
        Assert.Equal(first, second);
    }

    [Fact]
    public void Read_PlanesOfAnotherGrid_AreRefused()
    {
        IBrightnessSource source = SmallFiles.Source("storage-fixed.nc", "deflated");

        Assert.Throws<ArgumentException>(() => source.Read(SmallFiles.Days(source)[0], new BrightnessPlanes(7, [Channel.V19])));
    }

    [Fact]
    public void Read_StepThatIsNotThereAnyMore_IsRefused()
    {
        IBrightnessSource source = SmallFiles.Source("storage-fixed.nc", "deflated");
        SourceDay gone = SmallFiles.Days(source)[1] with { Step = 2 };

        Assert.Equal("IE2112", Assert.Throws<Faults.FaultException>(() => SmallFiles.Read(source, gone)).Fault.Code);
    }
}
