using CsCheck;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>Every kind of column comes back as it went in.</summary>
public sealed class TableFileTests : IDisposable
{
    private static readonly IReadOnlyList<TableColumn<Row>> Columns =
    [
        TableColumn.Date<Row>("day", row => row.Day),
        TableColumn.OptionalDate<Row>("perhaps_day", row => row.PerhapsDay),
        TableColumn.Text<Row>("name", row => row.Name),
        TableColumn.Whole<Row>("count", TableColumn.NoUnit, row => row.Count),
        TableColumn.OptionalWhole<Row>("perhaps_count", TableColumn.NoUnit, row => row.PerhapsCount),
        TableColumn.Number<Row>("number", "m", row => row.Number),
        TableColumn.OptionalNumber<Row>("perhaps_number", "m", row => row.PerhapsNumber),
    ];

    private static readonly Gen<DateOnly> Days = Gen.Int[0, DateOnly.MaxValue.DayNumber].Select(DateOnly.FromDayNumber);

    private static readonly Gen<Row> Rows = Gen.Select(
        Days, Days.Nullable(), Gen.String, Gen.Int, Gen.Int.Nullable(), Gen.Double[-1e300, 1e300], Gen.Double[-1.0, 1.0].Nullable(),
        (day, perhapsDay, name, count, perhapsCount, number, perhapsNumber) =>
            new Row(day, perhapsDay, name, count, perhapsCount, number, perhapsNumber));

    private readonly TemporaryFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void Read_AnyRows_AreThoseThatWereWritten() =>
        Rows.Array[0, 50].Sample(
            rows =>
            {
                string path = folder.PathOf(Guid.NewGuid() + ".parquet");
                TableFile.Write(path, Columns, rows, []);
                return RowsOf(TableFile.Read(path)).SequenceEqual(rows);
            },
            iter: 100);

    [Fact]
    public void Read_Columns_KeepTheirOrder()
    {
        TableFile.Write<Row>(folder.PathOf("a.parquet"), Columns, [], []);

        StoredTable table = TableFile.Read(folder.PathOf("a.parquet"));

        Assert.Equal(0, table.Rows);
        Assert.Equal(Columns.Select(column => column.Name), table.ColumnNames);
    }

    private static IEnumerable<Row> RowsOf(StoredTable table) => Enumerable.Range(0, table.Rows).Select(row => new Row(
        table.Column<DateOnly>("day")[row],
        table.Column<DateOnly?>("perhaps_day")[row],
        table.Column<string>("name")[row],
        table.Column<int>("count")[row],
        table.Column<int?>("perhaps_count")[row],
        table.Column<double>("number")[row],
        table.Column<double?>("perhaps_number")[row]));

    private sealed record Row(
        DateOnly Day, DateOnly? PerhapsDay, string Name, int Count, int? PerhapsCount, double Number, double? PerhapsNumber);
}
