using CsCheck;
using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>Folders as docs/DATA.md promises them, and no way out of the archive.</summary>
public sealed class ArchiveLayoutTests
{
    private static readonly ArchiveLayout Layout = new(Path.Join(Path.GetTempPath(), "archive"));

    [Fact]
    public void Files_NameAndPlace_AreAsPromised()
    {
        Assert.Equal("daily/method=nasa-team/hemisphere=north/year=1988/daily.parquet", Relative(Layout.DailyFile("nasa-team", Hemisphere.North, 1988)));
        Assert.Equal("grids/method=nasa-team/hemisphere=south/year=0987/0987-06-05.nc", Relative(Layout.GridFile("nasa-team", Hemisphere.South, new(987, 6, 5))));
        Assert.Equal("trends/method=m.2/hemisphere=north/trends.parquet", Relative(Layout.TableFile("trends", "m.2", Hemisphere.North)));
        Assert.Equal("runs/20240102T030405Z.json", Relative(Layout.RunFile("20240102T030405Z")));
    }

    [Theory]
    [InlineData("")]
    [InlineData(".")]
    [InlineData("..")]
    [InlineData("../up")]
    [InlineData("a/b")]
    [InlineData("a\\b")]
    [InlineData("/etc")]
    [InlineData(".hidden")]
    [InlineData("a=b")]
    [InlineData("a b")]
    [InlineData("a\n")]
    [InlineData("a\0")]
    [InlineData("é")]
    [InlineData("%2e%2e")]
    [InlineData(null)]
    public void Files_NameThatIsNone_Refuses(string? name)
    {
        Assert.Equal("IE3110", FaultOf(() => Layout.DailyFile(name!, Hemisphere.North, 1988)).Code);
        Assert.Equal("IE3110", FaultOf(() => Layout.TableFile(name!, "m", Hemisphere.North)).Code);
        Assert.Equal("IE3110", FaultOf(() => Layout.RunFile(name!)).Code);
    }

    [Fact]
    public void Files_NameTooLong_Refuses() =>
        Assert.Equal("IE3110", FaultOf(() => Layout.RunFile(new string('a', 101))).Code);

    [Fact]
    public void Files_AnyText_StayInsideOrAreRefused() => Gen.String.Sample(name =>
    {
        try
        {
            string path = Layout.GridFile(name, Hemisphere.North, new(1988, 2, 29));
            return Path.GetFullPath(path) == path && Relative(path).Split('/').Length == 5 && !Relative(path).StartsWith("..", StringComparison.Ordinal);
        }
        catch (FaultException)
        {
            return true;
        }
    });

    [Theory]
    [InlineData(0)]
    [InlineData(10_000)]
    public void Files_YearThatIsNone_Refuses(int year) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => Layout.DailyFile("m", Hemisphere.North, year));

    private static string Relative(string path) => Path.GetRelativePath(Layout.Root, path).Replace(Path.DirectorySeparatorChar, '/');

    private static Fault FaultOf(Func<string> call) => Assert.Throws<FaultException>(call).Fault;
}
