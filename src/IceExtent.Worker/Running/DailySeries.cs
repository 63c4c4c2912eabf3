using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;

namespace IceExtent.Worker.Running;

/// <summary>Keeps daily tables of an archive: one file a method and year, written when its year is over.</summary>
/// <typeparam name="TRow">A row of the table.</typeparam>
/// <remarks>
/// Days that a year's file already has and that this run did not touch stay as they are; days whose input turned out
/// to be unusable are taken out of it, so the archive always is what its inputs make. Not shared between threads.
/// </remarks>
internal sealed class DailySeries<TRow>(
    DailyKind<TRow> kind,
    IReadOnlyList<string> methods,
    Func<string, IReadOnlyList<KeyValuePair<string, string>>> metadataOf)
{
    private readonly Dictionary<string, List<TRow>> rowsByMethod = methods.ToDictionary(method => method, _ => new List<TRow>(), StringComparer.Ordinal);
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
        foreach (string path in methods.SelectMany(_ => years, (method, touched) => kind.FileOf(method, touched)).Where(File.Exists))
        {
            string? found = kind.Read(path).Metadata.GetValueOrDefault(DailySeries.DigestKey);
            if (!string.Equals(found, digest, StringComparison.Ordinal))
            {
                throw new FaultException(new(
                    "IE3001",
                    path,
                    $"days made with another configuration (digest {found?[..12] ?? "none"})",
                    $"the digest {digest[..12]} of this run file, sensor files, grid, land, regions, places and program version",
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
            rowsByMethod[method.Method].AddRange(kind.RowsOf(method));
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
        string path = kind.FileOf(method, open);
        List<TRow> rows = rowsByMethod[method];
        IReadOnlyList<TRow> before = File.Exists(path) ? kind.Read(path).Rows : [];
        HashSet<DateOnly> touched = [.. rows.Select(kind.DateOf), .. lostDays.Where(lost => lost.Method == method).Select(lost => lost.Day)];
        TRow[] kept = [.. before.Where(row => !touched.Contains(kind.DateOf(row)))];
        HashSet<DateOnly> gone = [.. before.Select(kind.DateOf).Where(day => lostDays.Contains((method, day)))];
        DaysRemoved += method == methods[0] ? gone.Count : 0;
        if (rows.Count == 0 && kept.Length == 0)
        {
            PublishedFile.Delete(path); // A table without a row would say that the year was made.
        }
        else if (rows.Count > 0 || kept.Length < before.Count)
        {
            kind.Write(path, kept.Concat(rows), metadataOf(method));
        }
    }
}
