using System.Globalization;
using IceExtent.Statistics;
using IceExtent.Storage.Writing;
using IceExtent.TestKit;
using IceExtent.Worker.Running;

namespace IceExtent.EndToEnd.Tests;

/// <summary>A small run that fills over days, and what it wrote.</summary>
internal sealed class FillingRun : IDisposable
{
    /// <summary>Day 0.</summary>
    public static DateOnly First { get; } = new(1990, 3, 1);

    public TinyRun Tiny { get; } = new();

    public void Dispose() => Tiny.Dispose();

    public static string Text(int day) => First.AddDays(day).ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);

    public void WriteDays(int count, Func<int, double> iceFraction)
    {
        for (int day = 0; day < count; day++)
        {
            Tiny.WriteDay(First.AddDays(day), iceFraction);
        }
    }

    /// <summary>Writes days with random cells lost, leaves some out and cuts some short.</summary>
    public void WriteHoles(int seed, int days)
    {
        ulong state = (ulong)seed;
        for (int day = 0; day < days; day++)
        {
            int kind = Next(8);
            if (kind == 0)
            {
                continue;
            }

            Tiny.WriteDay(First.AddDays(day), cell => Next(3) == 0 ? double.NaN : Math.Abs(Math.Sin(cell + (0.1 * day))));
            if (kind == 1)
            {
                File.WriteAllBytes(Tiny.DayFile(First.AddDays(day), "v37"), [1]);
            }
        }

        // The generator of Knuth's MMIX; its high bits.
        int Next(int below)
        {
            state = unchecked((state * 6_364_136_223_846_793_005UL) + 1_442_695_040_888_963_407UL);
            return (int)((state >> 33) % (ulong)below);
        }
    }

    /// <summary>Runs with these keys of filling.</summary>
    public async Task<ProgramRun> RunAsync(string filling, params string[] options)
    {
        Tiny.WriteRunFile("[filling]\n" + filling);
        return await ProgramRun.OfAsync(["run", Tiny.RunFile, .. options]);
    }

    public string Grid(int day) => Tiny.PathOf("out", "grids", "method=nasa-team", "hemisphere=north", "year=1990", Text(day) + ".nc");

    public IReadOnlyList<DailyRow> Rows() => Table().Rows;

    public string Metadata(string key) => Table().Metadata[key];

    /// <summary>The record of the last run.</summary>
    public RunRecord Record() => RunRecordFile.Read(Directory.EnumerateFiles(Tiny.PathOf("out", "runs")).Order(StringComparer.Ordinal).Last());

    private StoredDailyTable Table() =>
        DailyTable.Read(new ArchiveLayout(Tiny.PathOf("out")).DailyFile("nasa-team", Grids.Hemisphere.North, 1990));
}
