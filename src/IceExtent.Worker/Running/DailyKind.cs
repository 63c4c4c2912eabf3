using IceExtent.Grids;
using IceExtent.Statistics;
using IceExtent.Storage.Writing;

namespace IceExtent.Worker.Running;

/// <summary>A table that has rows of days.</summary>
/// <param name="FileOf">Its file for a method and year.</param>
/// <param name="Read">Reads it.</param>
/// <param name="Write">Writes it, whatever the order of the rows.</param>
/// <param name="DateOf">The day of a row.</param>
/// <param name="RowsOf">The rows of a day's result.</param>
internal sealed record DailyKind<TRow>(
    Func<string, int, string> FileOf,
    Func<string, (IReadOnlyList<TRow> Rows, IReadOnlyDictionary<string, string> Metadata)> Read,
    Action<string, IEnumerable<TRow>, IReadOnlyList<KeyValuePair<string, string>>> Write,
    Func<TRow, DateOnly> DateOf,
    Func<MethodResult, IReadOnlyList<TRow>> RowsOf);

/// <summary>The daily tables there are.</summary>
internal static class DailySeries
{
    /// <summary>The key of the configuration's digest in a table's metadata.</summary>
    public const string DigestKey = "configuration_digest";

    /// <summary>Totals of regions.</summary>
    public static DailyKind<DailyRow> Regions(ArchiveLayout layout, Hemisphere hemisphere) => new(
        (method, year) => layout.DailyFile(method, hemisphere, year),
        path => DailyTable.Read(path) is var table ? (table.Rows, table.Metadata) : default,
        DailyTable.Write,
        row => row.Date,
        result => result.Rows);

    /// <summary>Means of places.</summary>
    public static DailyKind<DailyPlaceRow> Places(ArchiveLayout layout, Hemisphere hemisphere) => new(
        (method, year) => layout.DailyPlaceFile(method, hemisphere, year),
        path => DailyPlaceTable.Read(path) is var table ? (table.Rows, table.Metadata) : default,
        DailyPlaceTable.Write,
        row => row.Date,
        result => result.PlaceRows);
}
