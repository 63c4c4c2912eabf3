using System.Globalization;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Reading.NetCdf;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>Which day a file is of.</summary>
public sealed class DayTests
{
    public static TheoryData<string, string, double, DateOnly> Times()
    {
        TheoryData<string, string, double, DateOnly> cases = [];
        foreach (string[] cells in File.ReadLines(SmallFiles.PathOf("times.csv")).Skip(1).Select(line => line.Split(',')))
        {
            cases.Add(
                cells[0],
                cells[1],
                double.Parse(cells[2], CultureInfo.InvariantCulture),
                DateOnly.ParseExact(cells[3], "yyyy-MM-dd", CultureInfo.InvariantCulture));
        }

        return cases;
    }

    // Origin independent: cftime, see tests/data/README.md.
    [Theory]
    [MemberData(nameof(Times))]
    public void DayOf_TimeInAnyUnit_AgreesWithCftime(string units, string calendar, double value, DateOnly expected) =>
        Assert.Equal(expected, TimeUnits.Parse(units, calendar)?.DayOf(value));

    [Theory]
    [InlineData("months since 1970-01-01")]
    [InlineData("years since 1970-01-01")]
    [InlineData("days")]
    [InlineData("days since yesterday")]
    [InlineData("days since 1970-13-01")]
    [InlineData("days since 1970-02-30")]
    [InlineData("days since 1582-10-10")] // Left out between the two calendars.
    [InlineData("days since 0000-01-01")]
    [InlineData("days since 1970-01-01 25:00")]
    [InlineData("")]
    public void Parse_UnitWithoutSense_GivesNothing(string units) => Assert.Null(TimeUnits.Parse(units, null));

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(1e30)]
    [InlineData(-1e7)]
    public void DayOf_TimeOutsideTheCalendar_GivesNothing(double value) =>
        Assert.Null(TimeUnits.Parse("days since 1970-01-01", null)!.DayOf(value));

    // Worked: 1582-10-04 in the Julian calendar is the day before 1582-10-15 in the Gregorian one.
    [Fact]
    public void Since1970_TurnOfTheCalendars_LeavesOutTenDays() =>
        Assert.Equal(
            CalendarDays.Since1970(1582, 10, 15, mixed: true),
            CalendarDays.Since1970(1582, 10, 4, mixed: true) + 1);

    // Worked: Julian leap years are all those divisible by four; 1500-02-29 (Julian) is 1500-03-10 (Gregorian).
    [Fact]
    public void Since1970_JulianLeapDay_IsCountedInItsOwnCalendar()
    {
        Assert.Equal(CalendarDays.Since1970(1500, 3, 10, mixed: false), CalendarDays.Since1970(1500, 2, 29, mixed: true));
        Assert.Null(CalendarDays.Since1970(1500, 2, 29, mixed: false));
    }

    // Worked: 61.5 and 36 hours after 2020-01-30 00:00, in the order of dates; the third time is no date. The date in
    // the name is another one, and the file's time rules.
    [Fact]
    public void List_ThreeTimesOneOfThemBad_ListsTwoDaysAndAFault()
    {
        SourceInventory inventory = SmallFiles.Source("three-days-19990101.nc", "tb").List(CancellationToken.None);

        Assert.Equal([(new DateOnly(2020, 1, 31), 1), (new DateOnly(2020, 2, 1), 0)], inventory.Days.Select(day => (day.Date, day.Step)));
        Fault fault = Assert.Single(inventory.Faults);
        Assert.Equal("IE2110", fault.Code);
        Assert.Contains("1 steps without a day, the first at index 2", fault.Found, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("scalar-time.nc", 2020, 2, 1)] // 23:59:59 one hour west of Greenwich is the next day there.
    [InlineData("attribute-20200202.nc", 2020, 1, 31)] // The attribute rules over the name.
    [InlineData("bottom-up.nc", 2020, 1, 31)]
    public void List_OneDay_HasItsDate(string file, int year, int month, int day) =>
        Assert.Equal(new DateOnly(year, month, day), Assert.Single(SmallFiles.Days(SmallFiles.Source(file, "tb"))).Date);

    // Worked: the times are the ends of 31 January and 1 February, and the bounds say so.
    [Fact]
    public void List_TimesAtTheEndOfTheirDays_AreTakenByTheirBounds() =>
        Assert.Equal(
            [new DateOnly(2020, 1, 31), new DateOnly(2020, 2, 1)],
            SmallFiles.Days(SmallFiles.Source("bounds.nc", "tb")).Select(day => day.Date));

    [Fact]
    public void List_PlainHdf5Stack_TakesTheTimeVariableOfTheSameLength() =>
        Assert.Equal(
            [new DateOnly(2020, 1, 31), new DateOnly(2020, 2, 1)],
            SmallFiles.Days(SmallFiles.Source("plain-20200131.h5", "stack")).Select(day => day.Date));

    [Theory]
    [InlineData("tb_20200131.nc", 2020, 1, 31)]
    [InlineData("tb-2020-01-31-v2.nc", 2020, 1, 31)]
    [InlineData("20200131T0600.nc", 2020, 1, 31)]
    [InlineData("tb_2020031_f17.nc", 2020, 1, 31)]
    [InlineData("1234567_20200131.nc", 2020, 1, 31)]
    [InlineData("20200131_20200131.nc", 2020, 1, 31)]
    public void List_NoTimeInTheFile_TakesTheDateOfTheName(string name, int year, int month, int day)
    {
        using TemporaryFolder folder = new();
        string path = folder.Write(name, File.ReadAllBytes(SmallFiles.PathOf("name.nc")));

        Assert.Equal(new DateOnly(year, month, day), Assert.Single(SmallFiles.Days(SmallFiles.Source([path], "tb"))).Date);
    }

    [Theory]
    [InlineData("tb.nc", "no date")]
    [InlineData("tb_20201301.nc", "no date")]
    [InlineData("tb_2020366.nc", null)] // 2020 has 366 days.
    [InlineData("tb_2021366.nc", "no date")]
    [InlineData("tb_120200131.nc", "no date")]
    [InlineData("20200131_20200202.nc", "2 different dates")]
    public void List_NameWithoutOneDate_IsRefused(string name, string? found)
    {
        using TemporaryFolder folder = new();
        string path = folder.Write(name, File.ReadAllBytes(SmallFiles.PathOf("name.nc")));

        SourceInventory inventory = SmallFiles.Source([path], "tb").List(CancellationToken.None);

        Assert.Equal(found is null ? 1 : 0, inventory.Days.Count);
        Assert.Equal(found is not null, inventory.Faults is [{ Code: "IE2109" } fault] && fault.Found.Contains(found!, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("time-noleap.nc", "IE2113", "noleap")]
    [InlineData("time-months.nc", "IE2110", "months since 1970-01-01")]
    [InlineData("time-no-units.nc", "IE2110", "units ''")]
    [InlineData("time-no-date.nc", "IE2110", "1000000000")]
    [InlineData("attribute-wrong-20200202.nc", "IE2110", "yesterday")]
    [InlineData("no-coordinate.nc", "IE2109", "2 steps without a time coordinate")]
    public void List_TimeThatCannotBeUnderstood_IsRefused(string file, string code, string found)
    {
        Fault fault = SmallFiles.FaultOf(SmallFiles.Source(file, "tb"));

        Assert.Equal(code, fault.Code);
        Assert.StartsWith(SmallFiles.PathOf(file), fault.Where, StringComparison.Ordinal);
        Assert.Contains(found, fault.Found, StringComparison.Ordinal);
    }

    [Fact]
    public void List_SeveralFiles_IsInOrderOfDateThenName()
    {
        using TemporaryFolder folder = new();
        byte[] bytes = File.ReadAllBytes(SmallFiles.PathOf("name.nc"));
        string[] paths = [.. new[] { "b_20200131.nc", "a_20200202.nc", "a_20200131.nc" }.Select(name => folder.Write(name, bytes))];
        string text = folder.Write("c_20200101.nc", "no NetCDF"u8.ToArray());

        SourceInventory inventory = SmallFiles.Source(paths.Append(text), "tb").List(CancellationToken.None);

        Assert.Equal([paths[2], paths[0], paths[1]], inventory.Days.Select(day => day.Files[0]));
        Assert.Equal(text, Assert.Single(inventory.Faults).Where);
    }

    [Fact]
    public void List_Cancelled_Stops()
    {
        using CancellationTokenSource stop = new();
        stop.Cancel();

        Assert.ThrowsAny<OperationCanceledException>(() => SmallFiles.Source("name.nc", "tb").List(stop.Token));
    }
}
