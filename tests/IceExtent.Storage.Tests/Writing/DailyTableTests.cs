using CsCheck;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>What goes into the daily table comes out of it. Another program's view: <see cref="DailyTableQueryTests"/>.</summary>
public sealed class DailyTableTests : IDisposable
{
    private static readonly Gen<double> Areas = Gen.Double[0.0, 2e7];

    private static readonly Gen<DailyRow> RowGen =
        from day in Gen.Int[2_800, 20_000]
        from region in Gen.Int[0, 20]
        from areas in Areas.Nullable().Array[6]
        from shares in Gen.Double[0.0, 1.0].Array[2]
        from whole in Areas.Array[2]
        from provisional in Gen.Bool
        select new DailyRow
        {
            Date = new DateOnly(1970, 1, 1).AddDays(day),
            Region = $"region-{region}",
            ExtentSquareKilometers = areas[0],
            ExtentStandardErrorSquareKilometers = areas[1],
            AreaSquareKilometers = areas[2],
            AreaStandardErrorSquareKilometers = areas[3],
            MarginalZoneSquareKilometers = areas[4],
            PackSquareKilometers = areas[5],
            OceanSquareKilometers = whole[0],
            ObservedShare = shares[0],
            FilledShare = shares[1],
            PolarGapSquareKilometers = whole[1],
            Sensor = "any-sensor",
            Status = provisional ? DayStatus.Provisional : DayStatus.Final,
        };

    private static readonly Gen<DailyRow[]> Tables =
        RowGen.Array[0, 60].Select(rows => rows.DistinctBy(row => (row.Date, row.Region)).ToArray());

    private readonly TemporaryFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>
    /// Tables are written from several threads at once here. While the columns' fields were shared without a lock, three
    /// of seven runs on a busy machine failed.
    /// </summary>
    [Fact]
    public void Read_WhatWasWritten_IsTheSameInOrder() =>
        Tables.Sample(
            rows =>
            {
                string path = folder.PathOf(Guid.NewGuid() + ".parquet");
                DailyTable.Write(path, rows, []);
                return DailyTable.Read(path).Rows.SequenceEqual(
                    rows.OrderBy(row => row.Date).ThenBy(row => row.Region, StringComparer.Ordinal));
            },
            iter: 100);

    [Fact]
    public void Write_RowsShuffled_GivesTheSameBytes() =>
        Tables.SelectMany(rows => Gen.Shuffle(rows).Select(shuffled => (rows, shuffled))).Sample(
            pair =>
            {
                DailyTable.Write(folder.PathOf("a.parquet"), pair.rows, []);
                DailyTable.Write(folder.PathOf("b.parquet"), pair.shuffled, []);
                return File.ReadAllBytes(folder.PathOf("a.parquet")).AsSpan().SequenceEqual(File.ReadAllBytes(folder.PathOf("b.parquet")));
            },
            iter: 50,
            threads: 1);

    [Fact]
    public void Read_Metadata_HasTheCallersPairsThenEveryUnit()
    {
        DailyTable.Write(folder.PathOf("a.parquet"), [], [new("method", "any"), new("notice", "not for navigation — Öland")]);

        IReadOnlyDictionary<string, string> metadata = DailyTable.Read(folder.PathOf("a.parquet")).Metadata;

        Assert.Equal(
            ["method", "notice", .. DailyTable.Columns.Select(column => "unit:" + column.Name)],
            metadata.Keys);
        Assert.Equal("not for navigation — Öland", metadata["notice"]);
        Assert.Equal("km2", metadata["unit:extent_km2"]);
        Assert.Equal("1", metadata["unit:observed_share"]);
    }

    [Fact]
    public void Write_DayAndRegionTwice_Refuses()
    {
        DailyRow row = RowGen.Single();

        Assert.Throws<ArgumentException>(() => DailyTable.Write(folder.PathOf("a.parquet"), [row, row with { ObservedShare = 0 }], []));
        Assert.Empty(folder.Files());
    }

    [Fact]
    public void Write_NumberThatIsNone_Refuses()
    {
        DailyRow row = RowGen.Single() with { ExtentSquareKilometers = double.NaN };

        Assert.Throws<ArgumentException>(() => DailyTable.Write(folder.PathOf("a.parquet"), [row], []));
        Assert.Empty(folder.Files());
    }

    [Fact]
    public void Write_KeyOfAUnit_Refuses() =>
        Assert.Throws<ArgumentException>(() => DailyTable.Write(folder.PathOf("a.parquet"), [], [new("unit:date", "s")]));

    [Fact]
    public void Read_NoFile_SaysSo() => Assert.Equal("IE3120", FaultOf("none.parquet").Code);

    [Fact]
    public void Read_FileCutShort_SaysSo()
    {
        DailyTable.Write(folder.PathOf("a.parquet"), [RowGen.Single()], []);
        byte[] whole = File.ReadAllBytes(folder.PathOf("a.parquet"));
        File.WriteAllBytes(folder.PathOf("a.parquet"), whole[..(whole.Length / 2)]);

        Fault fault = FaultOf("a.parquet");

        Assert.Equal(("IE3120", folder.PathOf("a.parquet")), (fault.Code, fault.Where));
    }

    [Fact]
    public void Read_ColumnMissing_NamesIt()
    {
        TableFile.Write(folder.PathOf("a.parquet"), [.. DailyTable.Columns.Where(column => column.Name != "pack_km2")], [RowGen.Single()], []);

        Fault fault = FaultOf("a.parquet");

        Assert.Equal("IE3121", fault.Code);
        Assert.Contains("pack_km2", fault.Found, StringComparison.Ordinal);
    }

    [Fact]
    public void Read_ColumnOfAnotherType_NamesBothTypes()
    {
        List<TableColumn<DailyRow>> columns = [.. DailyTable.Columns];
        columns[7] = TableColumn.OptionalWhole<DailyRow>("pack_km2", "km2", _ => null);
        TableFile.Write(folder.PathOf("a.parquet"), columns, [RowGen.Single()], []);

        Fault fault = FaultOf("a.parquet");

        Assert.Equal("IE3121", fault.Code);
        Assert.Contains("Int32", fault.Found, StringComparison.Ordinal);
        Assert.Contains("Double", fault.Allowed, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("status")]
    [InlineData("tie_points")]
    public void Read_NameUnknown_NamesIt(string column)
    {
        List<TableColumn<DailyRow>> columns = [.. DailyTable.Columns];
        columns[columns.FindIndex(known => known.Name == column)] = TableColumn.Text<DailyRow>(column, _ => "hearsay");
        TableFile.Write(folder.PathOf("a.parquet"), columns, [RowGen.Single()], []);

        Fault fault = FaultOf("a.parquet");

        Assert.Equal("IE3122", fault.Code);
        Assert.Contains("hearsay", fault.Found, StringComparison.Ordinal);
    }

    private Fault FaultOf(string name) => Assert.Throws<FaultException>(() => DailyTable.Read(folder.PathOf(name))).Fault;
}
