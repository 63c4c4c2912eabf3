using IceExtent.Grids;
using IceExtent.Storage.Writing;

namespace IceExtent.Worker.Running;

/// <summary>Gathers the tie points of days that come in date order and puts each year into its table, keeping the days it already has.</summary>
internal sealed class TiePointArchive(ArchiveLayout layout, Hemisphere hemisphere, IReadOnlyList<KeyValuePair<string, string>> metadata)
{
    private readonly List<TiePointRow> rows = [];
    private readonly HashSet<DateOnly> touched = [];
    private int? year;

    /// <summary>Takes one day; a day without tie points loses those it had.</summary>
    public void Add(DayResult result)
    {
        Open(result.Date);
        if (result is { Observed: true, Tuned: { } tuned })
        {
            rows.AddRange(TiePointRow.Of(result.Date, result.Sensor, tuned));
        }
    }

    /// <summary>Takes days out of the tables of their years, apart from any run of days.</summary>
    public void Remove(IEnumerable<DateOnly> days)
    {
        foreach (DateOnly day in days.Order())
        {
            Open(day);
        }

        Flush();
    }

    /// <summary>Writes the year in hand.</summary>
    public void Flush()
    {
        if (year is { } open)
        {
            Write(layout.TiePointFile(hemisphere, open));
        }

        rows.Clear();
        touched.Clear();
        year = null;
    }

    private void Open(DateOnly day)
    {
        if (year is { } open && day.Year != open)
        {
            Flush();
        }

        year = day.Year;
        touched.Add(day);
    }

    private void Write(string path)
    {
        IReadOnlyList<TiePointRow> before = File.Exists(path) ? TiePointTable.Read(path) : [];
        TiePointRow[] kept = [.. before.Where(row => !touched.Contains(row.Date))];
        if (rows.Count == 0 && kept.Length == 0)
        {
            PublishedFile.Delete(path);
        }
        else if (rows.Count > 0 || kept.Length < before.Count)
        {
            TiePointTable.Write(path, kept.Concat(rows), metadata);
        }
    }
}
