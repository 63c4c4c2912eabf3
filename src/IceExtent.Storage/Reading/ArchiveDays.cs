using System.Globalization;

namespace IceExtent.Storage.Reading;

/// <summary>Finds the days that an archive holds as one file each.</summary>
internal static class ArchiveDays
{
    /// <summary>Lists the days of a period that have a file, in order.</summary>
    /// <param name="fileOf">Where the file of a day stands: in a folder of its year, named by the day.</param>
    /// <param name="from">The first day wanted, or null.</param>
    /// <param name="to">The last day wanted, or null.</param>
    public static IReadOnlyList<(DateOnly Day, string Path)> List(Func<DateOnly, string> fileOf, DateOnly? from, DateOnly? to)
    {
        string years = Path.GetDirectoryName(Path.GetDirectoryName(fileOf(DateOnly.MinValue)))!;
        if (!Directory.Exists(years))
        {
            return [];
        }

        List<(DateOnly Day, string Path)> found = [];
        foreach (string path in Directory.EnumerateFiles(years, "*.nc", SearchOption.AllDirectories))
        {
            if (DateOnly.TryParseExact(Path.GetFileNameWithoutExtension(path), "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out DateOnly day)
                && (from is not { } first || day >= first) && (to is not { } last || day <= last)
                && path == fileOf(day)) // Anything else is not the archive's.
            {
                found.Add((day, path));
            }
        }

        return [.. found.OrderBy(file => file.Day)];
    }
}
