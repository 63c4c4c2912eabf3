using IceExtent.Grids;
using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>A NetCDF-4 file that is damaged or foreign costs its day, is told with its name, and changes no other day.</summary>
public sealed class DamagedNetCdfTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 3, 1);
    private static readonly string[] Channels = ["19v", "19h", "22v", "37v", "37h"];
    private static readonly double[] Water = [184.9, 113.4, 200.0, 207.1, 145.0];
    private static readonly double[] Ice = [248.4, 232.0, 247.0, 242.3, 231.0];
    private readonly TinyRun run = new();

    public DamagedNetCdfTests()
    {
        run.Write("run.toml", $$"""
            output = "out"
            grid = "grid.toml"
            methods = ["nasa-team"]
            [[source]]
            sensor = "tiny.toml"
            files = "nc/*.nc"
            channels = { {{string.Join(", ", Channels.Select(channel => $"{channel} = \"tb_{channel}\""))}} }
            """);
        for (int day = 0; day < 3; day++)
        {
            WriteDay(PathOf(day), First.AddDays(day), TinyRun.Grid, Channels);
        }
    }

    public void Dispose() => run.Dispose();

    public static TheoryData<string> Damages() =>
        ["empty", "text", "cut short", "bits flipped", "channel missing", "wrong grid", "same day twice", "out of service"];

    [Theory]
    [MemberData(nameof(Damages))]
    public async Task Run_OneDamagedFile_CostsItsDayOnly(string damage)
    {
        await ProgramRun.OfAsync("run", run.RunFile);
        IReadOnlyList<DailyRow> good = Rows();
        Directory.Delete(run.PathOf("out"), recursive: true);
        string file = Damage(damage);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(3, good.Count);
        Assert.Equal(ExitCode.DoneWithGaps, ended.ExitCode);
        Assert.Matches($"IE2[0-9]{{3}} [^\n]*{Path.GetFileName(file)}[^\n]*: found [^\n]+; allowed: [^\n]+\\. ", ended.Messages);
        Assert.Equal(good.Where(row => row.Date != First.AddDays(1)), Rows());
    }

    // Damages the second day, or makes it ambiguous; gives the file that the message must name.
    private string Damage(string damage)
    {
        string file = PathOf(1);
        byte[] bytes = File.ReadAllBytes(file);
        switch (damage)
        {
            case "empty":
                File.WriteAllBytes(file, []);
                break;
            case "text":
                File.WriteAllText(file, "<html>Not found</html>");
                break;
            case "cut short":
                File.WriteAllBytes(file, bytes[..(bytes.Length * 2 / 3)]);
                break;
            case "bits flipped":
                for (int at = 48; at < bytes.Length; at += 97)
                {
                    bytes[at] ^= 0x55;
                }

                File.WriteAllBytes(file, bytes);
                break;
            case "channel missing":
                WriteDay(file, First.AddDays(1), TinyRun.Grid, Channels[..3]);
                break;
            case "wrong grid":
                Grid other = new("other", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(TinyRun.Columns, TinyRun.Rows, 12_500.0, -31_250.0, 25_000.0));
                WriteDay(file, First.AddDays(1), other, Channels);
                break;
            case "same day twice":
                WriteDay(file, First.AddDays(1), TinyRun.Grid, Channels);
                File.Copy(file, file + ".copy.nc");
                break;
            case "out of service":
                WriteDay(file, new DateOnly(2001, 1, 1), TinyRun.Grid, Channels);
                break;
            default:
                throw new ArgumentException($"There is no damage {damage}.", nameof(damage));
        }

        return file;
    }

    private string PathOf(int day) => run.PathOf("nc", $"{First.AddDays(day):yyyy-MM-dd}.nc");

    private IReadOnlyList<DailyRow> Rows() =>
        DailyTable.Read(new ArchiveLayout(run.PathOf("out")).DailyFile("nasa-team", Hemisphere.North, 1990)).Rows;

    private static void WriteDay(string path, DateOnly day, Grid grid, string[] channels) => GridFile.Write(
        path,
        grid,
        day,
        [.. channels.Select(channel =>
        {
            int index = Array.IndexOf(Channels, channel);
            float[] kelvins = [.. Enumerable.Range(0, grid.CellCount).Select(cell => (float)(Water[index] + ((Ice[index] - Water[index]) * Math.Abs(Math.Sin(cell + day.Day)))))];
            return new PackedVariable($"tb_{channel}", channel, "brightness_temperature", [], "K", kelvins, Packing.BrightnessKelvins);
        })],
        [new("title", "Invented")]);
}
