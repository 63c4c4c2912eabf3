using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>A table as it was read: whole columns by name, and the metadata.</summary>
public sealed class StoredTable
{
    private readonly string path;
    private readonly IReadOnlyDictionary<string, Array> columns;

    internal StoredTable(
        string path, int rows, IReadOnlyDictionary<string, Array> columns, IReadOnlyDictionary<string, string> metadata) =>
        (this.path, Rows, this.columns, Metadata) = (path, rows, columns, metadata);

    /// <summary>The number of rows.</summary>
    public int Rows { get; }

    /// <summary>The key-value metadata, units included.</summary>
    public IReadOnlyDictionary<string, string> Metadata { get; }

    /// <summary>The names of the columns, in the order of the file.</summary>
    public IEnumerable<string> ColumnNames => columns.Keys;

    /// <summary>A column, one value a row.</summary>
    /// <typeparam name="T"><c>DateOnly</c>, <c>int</c>, <c>double</c>, one of these nullable, or <c>string</c>: as the column was written.</typeparam>
    /// <param name="name">The column's name.</param>
    /// <exception cref="FaultException">IE3121: there is no such column, or it has another type.</exception>
    public IReadOnlyList<T> Column<T>(string name) => columns.GetValueOrDefault(name) is T[] values
        ? values
        : throw new FaultException(new(
            "IE3121", path,
            columns.TryGetValue(name, out Array? other) ? $"the column {name} as {NameOf(other.GetType().GetElementType()!)}" : $"no column {name}",
            $"{name} as {NameOf(typeof(T))}",
            "The file is from another version of the program: move the table's folder away and run those years anew."));

    private static string NameOf(Type type) => Nullable.GetUnderlyingType(type) is { } inner ? $"{inner.Name}, or null" : type.Name;
}
