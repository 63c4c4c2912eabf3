using IceExtent.Storage.Faults;
using IceExtent.TestKit;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Tests;

/// <summary>Which of two sensors rules which days, and why.</summary>
public sealed class SensorSpansTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 5, 1);
    private readonly TwoSensors sensors = new();

    /// <summary>The first sensor has days 1 to 6, the second 4 to 9.</summary>
    public SensorSpansTests()
    {
        for (int day = 4; day <= 9; day++)
        {
            sensors.WriteSecond(Day(day), _ => 0.5);
        }

        for (int day = 1; day <= 6; day++)
        {
            sensors.WriteFirst(Day(day), _ => 0.5);
        }
    }

    public void Dispose() => sensors.Dispose();

    /// <summary>Origin: worked. Three days are common: the order of the run file decides them, and the second sensor leaves them.</summary>
    [Fact]
    public void Of_NoPeriods_OrderDecides()
    {
        SensorSpans spans = Spans(Plan(string.Empty, string.Empty));

        Assert.Equal(
            ["tiny 1-6: only source with input (3), first in the run file (3)", "second 7-9: only source with input (3)"],
            spans.Ruling.Select(Text));
        Assert.Equal(new PairSpan(1, "tiny", 2, "second", Day(4), Day(6), 3), Assert.Single(spans.Overlaps));
        Assert.Equal(new PairSpan(1, "tiny", 2, "second", Day(4), Day(6), 3), Assert.Single(spans.LeftToEarlier));
        Assert.Empty(spans.HeldBack);
    }

    /// <summary>Origin: worked. The change-over of day 5 shows on both sides of it; the overlap is that of the input and stays.</summary>
    [Fact]
    public void Of_ChangeOver_SaysItsDayOnBothSides()
    {
        RunPlan plan = Plan("last_day = 1990-05-04", "first_day = 1990-05-05");
        SensorSpans spans = Spans(plan);

        Assert.Equal(
            [
                "tiny 1-4: only source with input (3), change-over on 1990-05-05 (1)",
                "second 5-9: change-over on 1990-05-05 (2), only source with input (3)",
            ],
            spans.Ruling.Select(Text));
        Assert.Equal(3, Assert.Single(spans.Overlaps).Days);
        Assert.Empty(spans.LeftToEarlier);
        Assert.Equal(0, plan.Superseded);
    }

    /// <summary>Origin: worked. A period that ends before the other begins leaves day 5, which has input, to nobody.</summary>
    [Fact]
    public void Of_HoleBetweenPeriods_IsShown()
    {
        RunPlan plan = Plan("last_day = 1990-05-04", "first_day = 1990-05-06");

        Assert.Equal(new DaySpan(Day(5), Day(5), 1), Assert.Single(Spans(plan).HeldBack));
        Assert.Equal([Day(5)], plan.DatesWithoutInput);
    }

    /// <summary>Origin: worked. Periods overlap on days 4 and 5: there the order decides.</summary>
    [Fact]
    public void Of_OverlappingPeriods_OrderDecidesThere()
    {
        SensorSpans spans = Spans(Plan("last_day = 1990-05-05", "first_day = 1990-05-04"));

        Assert.Equal(
            [
                "tiny 1-5: only source with input (3), first in the run file (2)",
                "second 6-9: change-over on 1990-05-06 (1), only source with input (3)",
            ],
            spans.Ruling.Select(Text));
        Assert.Equal(2, Assert.Single(spans.LeftToEarlier).Days);
    }

    [Fact]
    public void Plan_SpoiledDayOutsideThePeriod_CostsNothing()
    {
        Directory.CreateDirectory(sensors.Run.PathOf("days", "again"));
        foreach (string file in Directory.GetFiles(sensors.Run.PathOf("days"), "19900506_*"))
        {
            File.Copy(file, sensors.Run.PathOf("days", "again", Path.GetFileName(file)));
        }

        Assert.Equal("IE2301", Assert.Single(PlanWithAll(string.Empty).Gaps).Fault.Code); // Two files for day 6.
        Assert.Empty(PlanWithAll("last_day = 1990-05-04").Gaps);

        RunPlan PlanWithAll(string first)
        {
            sensors.WriteRunFile(first);
            sensors.Run.Write("run.toml", File.ReadAllText(sensors.Run.RunFile).Replace("days/*.bin", "days/**/*.bin", StringComparison.Ordinal));
            return PlanNow();
        }
    }

    public static TheoryData<string, string, string> Faults() => new()
    {
        { "first_day = 1990-05-05\nlast_day = 1990-05-04", "IE1011", "1990-05-04, before first_day = 1990-05-05" },
        { "first_day = 1989-12-31", "IE1011", "outside the service of tiny; allowed: 1990-01-01 to 1999-12-31" },
        { "last_day = 2000-01-01", "IE1011", "outside the service of tiny" },
        { "last_day = \"1990-05-05\"", "IE1005", "a date such as 1984-12-25" },
        { "last_dya = 1990-05-05", "IE1003", "Did you mean last_day?" },
        { "offset_k = { 19v = 0.4, 19x = 0.1 }", "IE1003", "19x" },
        { "offset_k = { 19v = 60.0 }", "IE1006", "-50 to 50 K" },
        { "offset_k = { 89v = 0.4 }", "IE1011", "a channel that the source does not map" },
        { "offset_k = { 19v = 0.4 }\noffset_se_k = { 37v = 0.1 }", "IE1011", "a standard error of 37v, which has no offset" },
        { "offset_k = { 19v = 0.4 }\noffset_se_k = { 19v = -0.1 }", "IE1006", "0 to 50 K" },
        { "offset_k = 0.4", "IE1005", "a table" },
    };

    [Theory]
    [MemberData(nameof(Faults))]
    public void Load_FaultySource_SaysWhereAndWhat(string source, string code, string words)
    {
        sensors.WriteRunFile(source);

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(sensors.Run.RunFile, ConfigFolder.BesideProgram));

        Fault fault = Assert.Single(faulty.Faults);
        Assert.Equal(code, fault.Code);
        Assert.Contains(words, fault.ToString(), StringComparison.Ordinal);
        Assert.Contains("run.toml, line ", fault.Where, StringComparison.Ordinal);
    }

    [Fact]
    public void Load_TwoFaultsInOnePeriod_TellsBoth()
    {
        sensors.WriteRunFile("first_day = 2001-05-05\nlast_day = 1989-05-04");

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(sensors.Run.RunFile, ConfigFolder.BesideProgram));

        Assert.Equal(3, faulty.Faults.Count); // Last before first, and each of them outside the service.
    }

    [Theory]
    [InlineData("least_days = 3", "4 to 10000")]
    [InlineData("trim_fraction = 0.5", "0 to 0.49")]
    [InlineData("closed_ice_fraction = 95.0", "Write the fraction: 0.95, not 95.")]
    [InlineData("land_distance_km = -1.0", "0 to 1000 km")]
    public void Load_FaultyOverlapRule_IsRefused(string key, string words)
    {
        sensors.WriteRunFile(head: "[overlap]\n" + key);

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(sensors.Run.RunFile, ConfigFolder.BesideProgram));

        Assert.Contains(words, Assert.Single(faulty.Faults).ToString(), StringComparison.Ordinal);
    }

    private static DateOnly Day(int day) => First.AddDays(day - 1);

    private static string Text(RulingSpan span) =>
        $"{span.Sensor} {span.First.Day}-{span.Last.Day}: {string.Join(", ", span.Why.Select(reason => $"{reason.Reason} ({reason.Days})"))}";

    private static SensorSpans Spans(RunPlan plan) => SensorSpans.Of(plan);

    private RunPlan Plan(string first, string second)
    {
        sensors.WriteRunFile(first, second);
        return PlanNow();
    }

    private RunPlan PlanNow() => RunPlanner.Plan(RunFileLoader.Load(sensors.Run.RunFile, ConfigFolder.BesideProgram), null, null, CancellationToken.None);
}
