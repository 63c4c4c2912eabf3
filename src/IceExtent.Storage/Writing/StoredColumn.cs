using Parquet;
using Parquet.Schema;

namespace IceExtent.Storage.Writing;

/// <summary>Reads one column over all row groups, by the type it is stored with.</summary>
internal static class StoredColumn
{
    /// <summary>An array of <c>DateOnly</c>, <c>int</c>, <c>double</c> (each nullable where the column is) or <c>string</c>.</summary>
    public static async Task<Array> ReadAsync(ParquetReader reader, DataField field)
    {
        List<Array> parts = [];
        foreach (ParquetRowGroupReader group in reader.RowGroups)
        {
            parts.Add(await ReadAsync(group, field));
        }

        Array whole = Array.CreateInstance(ElementTypeOf(field), parts.Sum(part => part.Length));
        int at = 0;
        foreach (Array part in parts)
        {
            part.CopyTo(whole, at);
            at += part.Length;
        }

        return whole;
    }

    /// <summary>Whether a column holds text; the library's own type for it is a piece of characters.</summary>
    public static bool IsText(DataField field) => field.ClrType == typeof(ReadOnlyMemory<char>);

    private static Type ElementTypeOf(DataField field) => (IsText(field), field.IsNullable) switch
    {
        (true, _) => typeof(string),
        (false, true) => typeof(Nullable<>).MakeGenericType(field.ClrType),
        _ => field.ClrType,
    };

    private static Task<Array> ReadAsync(ParquetRowGroupReader group, DataField field) => field.ClrType switch
    {
        _ when IsText(field) => TextsAsync(group, field),
        Type type when type == typeof(DateOnly) => ValuesAsync<DateOnly>(group, field),
        Type type when type == typeof(int) => ValuesAsync<int>(group, field),
        Type type when type == typeof(double) => ValuesAsync<double>(group, field),
        _ => throw new InvalidDataException($"The column {field.Name} has the type {field.ClrType.Name}, which no table of this program has"),
    };

    private static async Task<Array> TextsAsync(ParquetRowGroupReader group, DataField field)
    {
        string?[] values = new string?[group.RowCount];
        await group.ReadAsync(field, values.AsMemory());
        return values;
    }

    private static async Task<Array> ValuesAsync<T>(ParquetRowGroupReader group, DataField field)
        where T : struct
    {
        if (field.IsNullable)
        {
            T?[] optional = new T?[group.RowCount];
            await group.ReadAsync(field, optional.AsMemory());
            return optional;
        }

        T[] values = new T[group.RowCount];
        await group.ReadAsync(field, values.AsMemory());
        return values;
    }
}
