using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>The errors of reading NetCDF-4 files, each with its place and its remedy.</summary>
internal static class NetCdfFaults
{
    private const int MostNamesShown = 12;
    private const string FetchAgain = "Fetch the file again, or remove it to leave the day out.";

    /// <summary>IE2102: the file is something else.</summary>
    public static FaultException NotHdf5(string path, string kind) => new(new(
        "IE2102",
        path,
        kind,
        "a NetCDF-4 or HDF5 file",
        kind.Contains("NetCDF-3", StringComparison.Ordinal)
            ? "Rewrite it as NetCDF-4, for instance with nccopy -k nc4."
            : "Point the source at the data files themselves; unpack packed ones; for headerless grids describe a raw layout."));

    /// <summary>IE2103: the file is shorter than it says.</summary>
    public static FaultException CutShort(string path, long bytes, ulong? expected) => new(new(
        "IE2103", path, $"{bytes} bytes", expected is null ? "a whole header" : $"{expected} bytes, as its header says", FetchAgain));

    /// <summary>IE2105: a channel's variable is not in the file.</summary>
    public static FaultException NoVariable(HdfFile file, string name)
    {
        IReadOnlyList<string> names = file.VariableNames();
        string shown = names.Count == 0 ? "no variable" : string.Join(", ", names.Take(MostNamesShown));
        string more = names.Count > MostNamesShown ? $" and {names.Count - MostNamesShown} more" : string.Empty;
        string guess = NearestName.Of(name, names) is { } nearest ? $" Perhaps {nearest} is meant." : string.Empty;
        return new(new(
            "IE2105", file.Path, $"no variable {name}", shown + more, $"Correct the channel's name in the run file.{guess}"));
    }

    /// <summary>IE2106: a variable's numbers are stored in a way that is not read.</summary>
    public static FaultException Type(FileVariable variable, string found) => new(new(
        "IE2106",
        variable.Where,
        found,
        "integers of 8 to 64 bits or reals of 32 or 64 bits, in the file itself",
        "Name another variable in the run file, or rewrite this one as plain numbers."));

    /// <summary>IE2107: a variable does not have the shape of the grid.</summary>
    public static FaultException Shape(FileVariable variable, string found, Grid grid) => new(new(
        "IE2107",
        variable.Where,
        found,
        $"{grid.Rows} rows and {grid.Columns} columns of the grid {grid.Name}, either way round, and at most a time axis beside them",
        "Name the grid that the files are on in the run file, or the variable that is on this grid."));

    /// <summary>IE2108: the file's own coordinates or map are not those of the grid.</summary>
    public static FaultException OtherGrid(string where, string found, string allowed) => new(new(
        "IE2108", where, found, allowed, "Name the grid that the files are on in the run file, or put the files on this grid first."));

    /// <summary>IE2109: nothing says which day the file is of.</summary>
    public static FaultException NoDay(string where, string found) => new(new(
        "IE2109",
        where,
        found,
        "a time coordinate, the attribute time_coverage_start, or one date in the file name (yyyyMMdd, yyyy-MM-dd or yyyyDDD)",
        "Add a time coordinate to the file, or put the date into its name."));

    /// <summary>IE2110: there is a time and it cannot be understood.</summary>
    public static Fault Time(string where, string found) => new(
        "IE2110",
        where,
        found,
        "whole or broken numbers of weeks, days, hours, minutes or seconds since a date, such as 'days since 1970-01-01'",
        "Correct the time coordinate or its units attribute in the file.");

    /// <summary>IE2111: the attributes that say how numbers are packed make no sense.</summary>
    public static FaultException Packing(FileVariable variable, string found, string allowed) => new(new(
        "IE2111", variable.Where, found, allowed, "Correct the attribute in the file."));

    /// <summary>IE2112: the file has changed since it was listed.</summary>
    public static FaultException NoStep(FileVariable variable, int step, int steps) => new(new(
        "IE2112",
        variable.Where,
        $"{steps} steps of time",
        $"at least {step + 1}, as there were when the files were listed",
        "Let the files rest while a run reads them, and start the run again."));

    /// <summary>IE2113: the calendar is not that of observations.</summary>
    public static Fault Calendar(string where, string calendar) => new(
        "IE2113",
        where,
        $"the calendar {calendar}",
        "standard, gregorian or proleptic_gregorian",
        "Observations have real dates: rewrite the time coordinate in a real calendar.");

    /// <summary>Turns what a library threw into the error that fits: IE2101, IE2103, IE2104 or IE2106.</summary>
    /// <param name="path">The file.</param>
    /// <param name="cells">The variable whose cells were being read, or null.</param>
    /// <param name="cause">What was thrown.</param>
    public static FaultException Explain(string path, string? cells, Exception cause)
    {
        Exception root = cause.GetBaseException();
        string where = cells is null ? path : $"{path}, variable {cells}";
        return root switch
        {
            EndOfStreamException => Damaged(cells, where, "an end before the end of what it describes", cause),
            IOException or UnauthorizedAccessException => new(
                new("IE2101", path, Sentence(root), "a file that can be read", "Check that the file is there and may be read."), cause),
            _ when root.Message.Contains("Byte order", StringComparison.Ordinal) => new(
                new("IE2106", where, "numbers in big-endian order", "numbers in little-endian order", "Rewrite the file in little-endian order."), cause),
            _ when root.Message.StartsWith("Could not find filter", StringComparison.Ordinal) => Packed(where, "a compression that is not read", cause),
            _ when root.Message == ChunkTreeCheck.SkipsFilters => Packed(where, root.Message, cause),
            _ => Damaged(cells, where, Sentence(root), cause),
        };
    }

    private static FaultException Packed(string where, string found, Exception cause) => new(
        new("IE2106", where, found, "deflate, shuffle and fletcher32 for all chunks, or none", "Rewrite the file, for instance with nccopy -d 4 -s."), cause);

    private static FaultException Damaged(string? cells, string where, string found, Exception cause) => cells is null
        ? new(new("IE2103", where, $"a damaged structure ({found})", "a whole NetCDF-4 file", FetchAgain), cause)
        : new(new("IE2104", where, $"damaged numbers ({found})", "numbers as they were written", FetchAgain), cause);

    private static string Sentence(Exception cause) => cause.Message.TrimEnd('.', ' ');
}
