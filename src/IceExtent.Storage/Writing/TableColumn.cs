using Parquet;
using Parquet.Schema;

namespace IceExtent.Storage.Writing;

/// <summary>One column of a table: its name, its unit, and where a row holds its value.</summary>
/// <typeparam name="TRow">The row type.</typeparam>
public abstract class TableColumn<TRow>
{
    private protected TableColumn(string name, string unit, DataField field)
    {
        ArgumentException.ThrowIfNullOrEmpty(name);
        ArgumentException.ThrowIfNullOrEmpty(unit);
        (Name, Unit, Field) = (name, unit, field);
    }

    /// <summary>The column's name: snake case, with its unit where it has one.</summary>
    public string Name { get; }

    /// <summary>The unit, written to the file's metadata under <c>unit:</c> and the name.</summary>
    public string Unit { get; }

    internal DataField Field { get; }

    internal abstract Task WriteAsync(ParquetRowGroupWriter group, IReadOnlyList<TRow> rows);
}

/// <summary>Makes the columns of a table.</summary>
public static class TableColumn
{
    /// <summary>The unit of a share, a count or any other number without one.</summary>
    public const string NoUnit = "1";

    /// <summary>What stands for the unit of a column of names.</summary>
    public const string NameUnit = "name";

    /// <summary>What stands for the unit of a column of days.</summary>
    public const string DayUnit = "day, UTC";

    /// <summary>A column of days (DATE).</summary>
    /// <param name="name">The column's name.</param>
    /// <param name="value">Gets the value from a row.</param>
    public static TableColumn<TRow> Date<TRow>(string name, Func<TRow, DateOnly> value) =>
        new ValueColumn<TRow, DateOnly>(name, DayUnit, value);

    /// <summary>A column of days (DATE) that may be null.</summary>
    /// <param name="name">The column's name.</param>
    /// <param name="value">Gets the value from a row.</param>
    public static TableColumn<TRow> OptionalDate<TRow>(string name, Func<TRow, DateOnly?> value) =>
        new OptionalColumn<TRow, DateOnly>(name, DayUnit, value);

    /// <summary>A column of names (VARCHAR), kept as a dictionary.</summary>
    /// <param name="name">The column's name.</param>
    /// <param name="value">Gets the value from a row; never null.</param>
    public static TableColumn<TRow> Text<TRow>(string name, Func<TRow, string> value) =>
        new TextColumn<TRow>(name, NameUnit, value);

    /// <summary>A column of whole numbers (INTEGER).</summary>
    /// <param name="name">The column's name.</param>
    /// <param name="unit">The unit.</param>
    /// <param name="value">Gets the value from a row.</param>
    public static TableColumn<TRow> Whole<TRow>(string name, string unit, Func<TRow, int> value) =>
        new ValueColumn<TRow, int>(name, unit, value);

    /// <summary>A column of whole numbers (INTEGER) that may be null.</summary>
    /// <param name="name">The column's name.</param>
    /// <param name="unit">The unit.</param>
    /// <param name="value">Gets the value from a row.</param>
    public static TableColumn<TRow> OptionalWhole<TRow>(string name, string unit, Func<TRow, int?> value) =>
        new OptionalColumn<TRow, int>(name, unit, value);

    /// <summary>A column of real numbers (DOUBLE).</summary>
    /// <param name="name">The column's name.</param>
    /// <param name="unit">The unit.</param>
    /// <param name="value">Gets the value from a row; always finite.</param>
    public static TableColumn<TRow> Number<TRow>(string name, string unit, Func<TRow, double> value) =>
        new ValueColumn<TRow, double>(name, unit, row => Finite(name, value(row)));

    /// <summary>A column of real numbers (DOUBLE) that may be null.</summary>
    /// <param name="name">The column's name.</param>
    /// <param name="unit">The unit.</param>
    /// <param name="value">Gets the value from a row; null, or finite: a table has no NaN.</param>
    public static TableColumn<TRow> OptionalNumber<TRow>(string name, string unit, Func<TRow, double?> value) =>
        new OptionalColumn<TRow, double>(name, unit, row => value(row) is { } number ? Finite(name, number) : null);

    private static double Finite(string name, double number) => double.IsFinite(number)
        ? number
        : throw new ArgumentException($"The column {name} holds a number that is not finite.");

    private sealed class ValueColumn<TRow, TValue>(string name, string unit, Func<TRow, TValue> value)
        : TableColumn<TRow>(name, unit, new DataField<TValue>(name, nullable: false))
        where TValue : struct
    {
        internal override Task WriteAsync(ParquetRowGroupWriter group, IReadOnlyList<TRow> rows) =>
            group.WriteAsync(Field, new ReadOnlyMemory<TValue>([.. rows.Select(value)]));
    }

    private sealed class OptionalColumn<TRow, TValue>(string name, string unit, Func<TRow, TValue?> value)
        : TableColumn<TRow>(name, unit, new DataField<TValue>(name, nullable: true))
        where TValue : struct
    {
        internal override Task WriteAsync(ParquetRowGroupWriter group, IReadOnlyList<TRow> rows) =>
            group.WriteAsync(Field, new ReadOnlyMemory<TValue?>([.. rows.Select(value)]));
    }

    private sealed class TextColumn<TRow>(string name, string unit, Func<TRow, string> value)
        : TableColumn<TRow>(name, unit, new DataField<string>(name, nullable: false))
    {
        internal override Task WriteAsync(ParquetRowGroupWriter group, IReadOnlyList<TRow> rows) =>
            group.WriteAsync(Field, [.. rows.Select(value)]);
    }
}
