using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.RawGrids;

/// <summary>The errors of reading headerless grids, each with its place and its remedy.</summary>
internal static class RawFaults
{
    /// <summary>IE2120: the name pattern cannot be used.</summary>
    public static FaultException Pattern(string pattern, string found) => new(new(
        "IE2120",
        $"name pattern {pattern}",
        found,
        "a {date:...} of yyyy or yy with MM and dd, or with DDD, and {channel} with a name of its own for each channel",
        "Correct the name pattern in the run file."));

    /// <summary>IE2121: a file's name does not fit the pattern.</summary>
    public static Fault Name(string path, string pattern) => new(
        "IE2121",
        path,
        "a name that does not fit",
        pattern,
        "Correct the pattern or the list of files in the run file, or move the file away.");

    /// <summary>IE2122: a channel has no file for a day.</summary>
    public static FaultException NoFile(string path, string channel) => new(new(
        "IE2122",
        path,
        $"no file for the channel {channel}",
        "one file for each channel of the day",
        "Fetch the missing file, or leave the day a gap."));

    /// <summary>IE2123: a file is too short or too long.</summary>
    public static FaultException Length(string path, long found, long expected, string shape) => new(new(
        "IE2123",
        path,
        $"{found} bytes",
        $"{expected} bytes ({shape})",
        found < expected
            ? "Fetch the file again; if all files are like this one, correct the grid, the number type or the header in the run file."
            : "Correct the grid, the number type or the header in the run file."));

    /// <summary>IE2101: a file is there and cannot be read.</summary>
    public static FaultException CannotOpen(string path, Exception cause) => new(
        new("IE2101", path, cause.Message.TrimEnd('.'), "a file that can be read", "Check that the file is there and may be read."), cause);
}
