using System.Globalization;
using System.Text.RegularExpressions;
using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>Where the files of an archive stand: hive folders, so that a query reads only the folders it needs.</summary>
/// <remarks>Names become folders, so they are held to letters, digits, <c>-</c>, <c>_</c> and <c>.</c>; none can lead out of the archive.</remarks>
public sealed partial class ArchiveLayout
{
    private const int LongestName = 100;

    /// <summary>Takes a root; no folder is touched.</summary>
    /// <param name="root">The output folder of the run file.</param>
    public ArchiveLayout(string root)
    {
        ArgumentException.ThrowIfNullOrEmpty(root);
        Root = Path.GetFullPath(root);
    }

    /// <summary>The output folder, as a full path.</summary>
    public string Root { get; }

    /// <summary>The folder of run records.</summary>
    public string RunFolder => Path.Join(Root, "runs");

    /// <summary>The name of a hemisphere in folders and run records.</summary>
    public static string NameOf(Hemisphere hemisphere) => hemisphere == Hemisphere.North ? "north" : "south";

    /// <summary>The <c>daily</c> table of one year.</summary>
    /// <exception cref="FaultException">IE3110: the method's name cannot be used.</exception>
    public string DailyFile(string method, Hemisphere hemisphere, int year) => TableFile("daily", method, hemisphere, year);

    /// <summary>A table of one year, or one that spans the record.</summary>
    /// <param name="table">The table's name: its top folder and its file.</param>
    /// <param name="method">The method's name.</param>
    /// <param name="hemisphere">The hemisphere.</param>
    /// <param name="year">1 to 9999, or null for a table that is not split by year.</param>
    /// <exception cref="FaultException">IE3110: a name cannot be used.</exception>
    public string TableFile(string table, string method, Hemisphere hemisphere, int? year = null) =>
        Path.Join(Folder(table, method, hemisphere, year), $"{table}.parquet");

    /// <summary>A table or grid file of one ice year.</summary>
    /// <param name="table">The table's name: its top folder and its file.</param>
    /// <param name="method">The method's name.</param>
    /// <param name="hemisphere">The hemisphere.</param>
    /// <param name="iceYear">The ice year's name: the calendar year of its first day.</param>
    /// <param name="extension">With its dot.</param>
    /// <exception cref="FaultException">IE3110: a name cannot be used.</exception>
    public string IceYearFile(string table, string method, Hemisphere hemisphere, int iceYear, string extension) => Path.Join(
        Folder(table, method, hemisphere, null), string.Create(CultureInfo.InvariantCulture, $"ice_year={iceYear:D4}"), table + extension);

    /// <summary>The tie points of one year; they belong to no single method.</summary>
    public string TiePointFile(Hemisphere hemisphere, int year) => Path.Join(
        Path.Join(Root, "tie_points"), $"hemisphere={NameOf(hemisphere)}", YearFolder(year), "tie_points.parquet");

    /// <summary>The <c>daily_places</c> table of one year.</summary>
    /// <exception cref="FaultException">IE3110: the method's name cannot be used.</exception>
    public string DailyPlaceFile(string method, Hemisphere hemisphere, int year) => TableFile("daily_places", method, hemisphere, year);

    /// <summary>The cells of places; they belong to no method and no year.</summary>
    public string PlaceCellFile(Hemisphere hemisphere) => CellFile("place_cells", hemisphere);

    /// <summary>The cells of regions; they belong to no method and no year.</summary>
    public string RegionCellFile(Hemisphere hemisphere) => CellFile("region_cells", hemisphere);

    /// <summary>The grid file of one day.</summary>
    /// <exception cref="FaultException">IE3110: the method's name cannot be used.</exception>
    public string GridFile(string method, Hemisphere hemisphere, DateOnly day) => Path.Join(
        Folder("grids", method, hemisphere, day.Year), day.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) + ".nc");

    /// <summary>The melt signals of one day; they belong to no single method.</summary>
    public string MeltSignalFile(Hemisphere hemisphere, DateOnly day) => Path.Join(
        Path.Join(Root, "melt_signals"), $"hemisphere={NameOf(hemisphere)}", YearFolder(day.Year), day.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) + ".nc");

    /// <summary>The record of one run.</summary>
    /// <param name="name">The run's name.</param>
    /// <exception cref="FaultException">IE3110: the name cannot be used.</exception>
    public string RunFile(string name) => Path.Join(RunFolder, Checked(name) + ".json");

    private string CellFile(string table, Hemisphere hemisphere) => Path.Join(
        Path.Join(Root, table), $"hemisphere={NameOf(hemisphere)}", $"{table}.parquet");

    private string Folder(string table, string method, Hemisphere hemisphere, int? year)
    {
        string folder = Path.Join(
            Path.Join(Root, Checked(table)), $"method={Checked(method)}", $"hemisphere={NameOf(hemisphere)}");
        if (year is not { } number)
        {
            return folder;
        }

        return Path.Join(folder, YearFolder(number));
    }

    private static string YearFolder(int year)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(year, DateOnly.MinValue.Year);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(year, DateOnly.MaxValue.Year);
        return string.Create(CultureInfo.InvariantCulture, $"year={year:D4}");
    }

    private string Checked(string name) => name is { Length: <= LongestName } && PlainName.IsMatch(name)
        ? name
        : throw new FaultException(new(
            "IE3110", Root, $"the name \"{name}\" for a folder or file of the archive",
            $"1 to {LongestName} letters (a to z), digits, '-', '_' and '.', starting with a letter or digit",
            "Choose another name in the run file or in config."));

    [GeneratedRegex(@"\A[A-Za-z0-9][A-Za-z0-9._-]*\z", RegexOptions.CultureInvariant)]
    private static partial Regex PlainName { get; }
}
