using System.Collections.ObjectModel;
using System.IO.Compression;
using IceExtent.Storage.Faults;
using Parquet;
using Parquet.Schema;

namespace IceExtent.Storage.Writing;

/// <summary>Writes and reads Parquet tables.</summary>
/// <remarks>
/// Zstandard, one row group a file, names as dictionaries. The key-value metadata holds the caller's pairs in their
/// order, then <c>unit:column</c> for every column. The same rows give the same bytes.
/// </remarks>
public static class TableFile
{
    /// <summary>The start of the metadata keys that hold units.</summary>
    public const string UnitPrefix = "unit:";

    private static readonly Lock Encoding = new();

    /// <summary>Writes a table beside its place, flushes it and renames it.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="columns">The columns in their order.</param>
    /// <param name="rows">The rows in their order; there may be none.</param>
    /// <param name="metadata">Key-value metadata in its order; no key twice, none starting with <c>unit:</c>.</param>
    /// <param name="beforePublishing">Called when the table is encoded and not yet in its place, or null.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    public static void Write<TRow>(
        string path,
        IReadOnlyList<TableColumn<TRow>> columns,
        IReadOnlyList<TRow> rows,
        IReadOnlyList<KeyValuePair<string, string>> metadata,
        Action? beforePublishing = null)
    {
        ArgumentNullException.ThrowIfNull(columns);
        ArgumentNullException.ThrowIfNull(rows);
        ArgumentNullException.ThrowIfNull(metadata);

        byte[] encoded = Encode(columns, rows, metadata);
        beforePublishing?.Invoke();
        PublishedFile.Write(path, encoded);
    }

    /// <summary>Encodes a table and drops it, so that the library is loaded before the first table is due.</summary>
    internal static void Rehearse<TRow>(IReadOnlyList<TableColumn<TRow>> columns, IReadOnlyList<TRow> rows) =>
        _ = Encode(columns, rows, []);

    /// <summary>Reads a whole table.</summary>
    /// <param name="path">A file that <see cref="Write{TRow}"/> wrote.</param>
    /// <exception cref="FaultException">IE3120: the file is missing, damaged or no Parquet file.</exception>
    public static StoredTable Read(string path)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        return Decoded(path, async () => await DecodeAsync(path, await File.ReadAllBytesAsync(path)));
    }

    /// <summary>Reads the metadata of a table and none of its rows.</summary>
    /// <param name="path">A file that <see cref="Write{TRow}"/> wrote.</param>
    /// <exception cref="FaultException">IE3120: the file is missing, damaged or no Parquet file.</exception>
    public static IReadOnlyDictionary<string, string> ReadMetadata(string path)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        return Decoded(path, async () =>
        {
            await using FileStream content = File.OpenRead(path);
            await using ParquetReader reader = await ParquetReader.CreateAsync(content);
            return new ReadOnlyDictionary<string, string>(reader.CustomMetadata);
        });
    }

    private static T Decoded<T>(string path, Func<Task<T>> decode)
    {
        try
        {
            return decode().GetAwaiter().GetResult();
        }
#pragma warning disable CA1031 // The library throws exceptions of many types on damaged files.
        catch (Exception cause)
#pragma warning restore CA1031
        {
            throw new FaultException(
                new(
                    "IE3120", path, $"something that cannot be read ({cause.Message.TrimEnd('.')})",
                    "a Parquet table that this program wrote",
                    "Move the file away and run its days anew."),
                cause);
        }
    }

    // The library writes nesting levels into the columns' own fields whenever it makes a schema of them, and the columns of
    // a table are shared: two tables at once would meet half-written levels. It is asynchronous only; over memory it never waits.
    private static byte[] Encode<TRow>(
        IReadOnlyList<TableColumn<TRow>> columns,
        IReadOnlyList<TRow> rows,
        IReadOnlyList<KeyValuePair<string, string>> metadata)
    {
        lock (Encoding)
        {
            return EncodeAsync(columns, rows, metadata).GetAwaiter().GetResult();
        }
    }

    private static async Task<byte[]> EncodeAsync<TRow>(
        IReadOnlyList<TableColumn<TRow>> columns,
        IReadOnlyList<TRow> rows,
        IReadOnlyList<KeyValuePair<string, string>> metadata)
    {
        using MemoryStream content = new();
        ParquetSchema schema = new(columns.Select(column => column.Field).ToArray());
        await using (ParquetWriter writer = await ParquetWriter.CreateAsync(schema, content, OptionsFor(columns)))
        {
            writer.CustomMetadata = MetadataOf(columns, metadata);
            if (rows.Count > 0) // A table without row groups is a valid empty one.
            {
                using ParquetRowGroupWriter group = writer.CreateRowGroup();
                foreach (TableColumn<TRow> column in columns)
                {
                    await column.WriteAsync(group, rows);
                }
            }
        }

        return content.ToArray();
    }

    private static ParquetOptions OptionsFor<TRow>(IReadOnlyList<TableColumn<TRow>> columns)
    {
        // The library's own default level takes minutes for what this one does in a second.
        ParquetOptions options = new()
        {
            CompressionMethod = CompressionMethod.Zstd,
            CompressionLevel = CompressionLevel.Optimal,
            UseDateOnlyTypeForDates = true,
        };
        foreach (TableColumn<TRow> column in columns.Where(column => StoredColumn.IsText(column.Field)))
        {
            options.ColumnEncodingHints[column.Name] = EncodingHint.Dictionary;
        }

        return options;
    }

    private static Dictionary<string, string> MetadataOf<TRow>(
        IReadOnlyList<TableColumn<TRow>> columns, IReadOnlyList<KeyValuePair<string, string>> metadata)
    {
        if (metadata.Any(pair => pair.Key.StartsWith(UnitPrefix, StringComparison.Ordinal)))
        {
            throw new ArgumentException($"Keys that start with {UnitPrefix} are the table's own.", nameof(metadata));
        }

        return new(metadata.Concat(columns.Select(column => KeyValuePair.Create(UnitPrefix + column.Name, column.Unit))));
    }

    private static async Task<StoredTable> DecodeAsync(string path, byte[] bytes)
    {
        using MemoryStream content = new(bytes);
        await using ParquetReader reader = await ParquetReader.CreateAsync(
            content, new ParquetOptions { UseDateOnlyTypeForDates = true });
        Dictionary<string, Array> columns = [];
        foreach (DataField field in reader.Schema.DataFields)
        {
            columns[field.Name] = await StoredColumn.ReadAsync(reader, field);
        }

        int rows = checked((int)reader.RowGroups.Sum(group => group.RowCount));
        return new(path, rows, columns, new ReadOnlyDictionary<string, string>(reader.CustomMetadata));
    }
}
