using IceExtent.Grids;
using IceExtent.Storage.Faults;
using PureHDF;

namespace IceExtent.Storage.Writing;

/// <summary>Writes CF NetCDF-4 files of one day on one grid.</summary>
/// <remarks>
/// Conventions: [CF] 1.11. Dimensions <c>time</c> (1), <c>y</c>, <c>x</c>; row 0 at the top, so <c>y</c> falls.
/// The time is the start of the UTC day, and <c>time_bnds</c> spans the day. Each plane is one chunk, shuffled and
/// deflated. The same arguments give the same bytes: there is no time stamp of any kind in the file.
/// Safe to use from several threads for different paths.
/// </remarks>
public static class GridFile
{
    // A file is put together in memory that the next file on the same thread uses again.
    [ThreadStatic]
    private static MemoryStream? encoded;

    /// <summary>Writes one file beside its place, flushes it and renames it.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="grid">The grid of every variable.</param>
    /// <param name="day">The day, UTC.</param>
    /// <param name="variables">
    /// The variables. Their planes are read before the call returns and never kept, so the caller may use the
    /// memory again.
    /// </param>
    /// <param name="attributes">Global text attributes, none empty, in the order they are written after <c>Conventions</c>.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    /// <exception cref="ArgumentException">A plane has another size than the grid, or a name is taken or empty.</exception>
    public static void Write(
        string path,
        Grid grid,
        DateOnly day,
        IReadOnlyList<GridVariable> variables,
        IReadOnlyList<KeyValuePair<string, string>> attributes) => Write(path, grid, day, months: false, variables, attributes);

    /// <summary>Writes one file of what holds for a row of days: the same, and <c>time_bnds</c> spans them.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="grid">The grid of every variable.</param>
    /// <param name="first">The first day, UTC.</param>
    /// <param name="days">How many days.</param>
    /// <param name="variables">The variables.</param>
    /// <param name="attributes">Global text attributes, none empty, in the order they are written after <c>Conventions</c>.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    /// <exception cref="ArgumentException">A plane has another size than the grid, or a name is taken or empty.</exception>
    public static void WriteSpan(
        string path,
        Grid grid,
        DateOnly first,
        int days,
        IReadOnlyList<GridVariable> variables,
        IReadOnlyList<KeyValuePair<string, string>> attributes) => Write(path, grid, first, months: false, variables, attributes, days);

    /// <summary>Writes one file of what holds on every day, such as land: the same but for <c>time</c>, which it has not.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="grid">The grid of every variable.</param>
    /// <param name="variables">The variables.</param>
    /// <param name="attributes">Global text attributes, none empty, in the order they are written after <c>Conventions</c>.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    /// <exception cref="ArgumentException">A plane has another size than the grid, or a name is taken or empty.</exception>
    public static void WriteUndated(
        string path,
        Grid grid,
        IReadOnlyList<GridVariable> variables,
        IReadOnlyList<KeyValuePair<string, string>> attributes) => Write(path, grid, null, months: false, variables, attributes);

    /// <summary>Writes one file of what holds in each month of every year: twelve planes a variable along <c>month</c>, January first.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="grid">The grid of every variable.</param>
    /// <param name="variables">The variables, each with twelve values a cell, month by month.</param>
    /// <param name="attributes">Global text attributes, none empty, in the order they are written after <c>Conventions</c>.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    /// <exception cref="ArgumentException">A variable has another size, or a name is taken or empty.</exception>
    public static void WriteMonths(
        string path,
        Grid grid,
        IReadOnlyList<GridVariable> variables,
        IReadOnlyList<KeyValuePair<string, string>> attributes) => Write(path, grid, null, months: true, variables, attributes);

    private static void Write(
        string path,
        Grid grid,
        DateOnly? day,
        bool months,
        IReadOnlyList<GridVariable> variables,
        IReadOnlyList<KeyValuePair<string, string>> attributes,
        int days = 1)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(variables);
        ArgumentNullException.ThrowIfNull(attributes);

        using GridDocument document = new(grid, day, months, days);
        foreach (KeyValuePair<string, string> attribute in attributes)
        {
            document.Describe(attribute.Key, attribute.Value);
        }

        foreach (GridVariable variable in variables)
        {
            document.Add(variable);
        }

        MemoryStream content = encoded ??= new MemoryStream();
        content.SetLength(0);
        document.Encode(content);
        PublishedFile.Write(path, content.GetBuffer().AsSpan(0, (int)content.Length));
    }
}
