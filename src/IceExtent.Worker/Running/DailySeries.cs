using IceExtent.Grids;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;

namespace IceExtent.Worker.Running;

/// <summary>Keeps the daily tables of an archive: one file a method and year, written when its year is over.</summary>
/// <remarks>
/// Days that a year's file already has and that this run did not touch stay as they are; days whose input turned out
/// to be unusable are taken out of it, so the archive always is what its inputs make. Not shared between threads.
/// </remarks>
internal sealed class DailySeries(
    ArchiveLayout layout,
    Hemisphere hemisphere,
    IReadOnlyList<string> methods,
    Func<string, IReadOnlyList<KeyValuePair<string, string>>> metadataOf)
{
    /// <summary>The key of the configuration's digest in a table's metadata.</summary>
    public const string DigestKey = "configuration_digest";

    private readonly Dictionary<string, List<DailyRow>> rowsByMethod = methods.ToDictionary(method => method, _ => new List<DailyRow>(), StringComparer.Ordinal);
    private readonly HashSet<(string Method, DateOnly Day)> lostDays = [];
    private int? year;

    /// <summary>How many days that stood in a table were taken out because their input can no longer be used.</summary>
    public int DaysRemoved { get; private set; }

    /// <summary>Refuses an archive that was made with another configuration, before anything is computed.</summary>
    /// <param name="years">The years the run touches.</param>
    /// <param name="digest">The configuration's digest.</param>
    /// <exception cref="FaultException">IE3001.</exception>
    public void CheckSameConfiguration(IEnumerable<int> years, string digest)
    {
        foreach (string path in methods.SelectMany(_ => years, (method, touched) => layout.DailyFile(method, hemisphere, touched)).Where(File.Exists))
        {
            string? found = DailyTable.Read(path).Metadata.GetValueOrDefault(DigestKey);
            if (!string.Equals(found, digest, StringComparison.Ordinal))
            {
                throw new FaultException(new(
                    "IE3001",
                    path,
                    $"days made with another configuration (digest {found?[..12] ?? "none"})",
                    $"the digest {digest[..12]} of this run file, sensor files, grid, land and program version",
                    "Choose another output folder, or move the old archive away and run again."));
            }
        }
    }

    /// <summary>Takes one day. Days come in date order.</summary>
    public void Add(DayResult result)
    {
        Open(result.Date);
        foreach (MethodResult method in result.Methods)
        {
            rowsByMethod[method.Method].AddRange(method.Rows);
        }

        lostDays.UnionWith(methods.Except(result.Methods.Select(method => method.Method)).Select(method => (method, result.Date)));
    }

    /// <summary>Writes the year in hand.</summary>
    /// <exception cref="FaultException">A table cannot be written.</exception>
    public void Flush()
    {
        if (year is { } open)
        {
            foreach (string method in methods)
            {
                Write(method, open);
                rowsByMethod[method].Clear();
            }
        }

        lostDays.Clear();
        year = null;
    }

    /// <summary>Takes days out of the tables of their years, apart from any run of days.</summary>
    /// <exception cref="FaultException">A table cannot be written.</exception>
    public void Remove(IEnumerable<DateOnly> days)
    {
        foreach (DateOnly day in days.Order())
        {
            Open(day);
            lostDays.UnionWith(methods.Select(method => (method, day)));
        }

        Flush();
    }

    private void Open(DateOnly day)
    {
        if (year is { } open && day.Year != open)
        {
            Flush();
        }

        year = day.Year;
    }

    private void Write(string method, int open)
    {
        string path = layout.DailyFile(method, hemisphere, open);
        List<DailyRow> rows = rowsByMethod[method];
        IReadOnlyList<KeyValuePair<string, string>> metadata = metadataOf(method);
        IReadOnlyList<DailyRow> before = File.Exists(path) ? DailyTable.Read(path).Rows : [];
        HashSet<DateOnly> touched = [.. rows.Select(row => row.Date), .. lostDays.Where(lost => lost.Method == method).Select(lost => lost.Day)];
        DailyRow[] kept = [.. before.Where(row => !touched.Contains(row.Date))];
        HashSet<DateOnly> gone = [.. before.Select(row => row.Date).Where(day => lostDays.Contains((method, day)))];
        DaysRemoved += method == methods[0] ? gone.Count : 0;
        if (rows.Count == 0 && kept.Length == 0)
        {
            PublishedFile.Delete(path); // A table without a row would say that the year was made.
        }
        else if (rows.Count > 0 || kept.Length < before.Count)
        {
            DailyTable.Write(path, kept.Concat(rows), metadata);
        }
    }
}
