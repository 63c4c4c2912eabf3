using IceExtent.Statistics;
using IceExtent.Retrieval;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Faults;
using IceExtent.TestKit;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Tests;

/// <summary>What a run file may say and how it is told when it may not.</summary>
public sealed class RunFileTests : IDisposable
{
    private readonly TinyRun run = new();

    public void Dispose() => run.Dispose();

    [Fact]
    public void Load_SmallestRunFile_TakesTheDefaults()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);

        RunSettings settings = RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram);

        Assert.True(settings.WriteGrids);
        Assert.Equal(0.15, settings.Rules.IceFraction);
        Assert.Equal(0.80, settings.Rules.PackFraction);
        Assert.Equal(CoastCorrection.Off, settings.Coast.Correction);
        Assert.Equal(run.PathOf("out"), settings.Output);
        Assert.Equal(5, settings.Sources[0].Description.Files.Count);
        Assert.Equal(16, settings.Ocean.Count(ocean => ocean));
        Assert.Equal(0, settings.LeastNeighbours);
        Assert.Null(settings.DayFilling);
        Assert.False(settings.FillMissingDays);
        Assert.Equal(PolarGapRule.CountAsIce, settings.Rules.PolarGap);
        Assert.Equal(0.5, settings.LeastRimShare);
    }

    [Fact]
    public void Load_FillingInTheRunFile_RulesOverTheDefaults()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.WriteRunFile("[filling]\nneighbours = 5\n[polar_gap]\nrule = \"laplace\"");

        RunSettings settings = RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram);

        Assert.Equal(5, settings.LeastNeighbours);
        Assert.Equal(PolarGapRule.Laplace, settings.Rules.PolarGap);
        Assert.Equal(0.5, settings.LeastRimShare);
    }

    [Theory]
    [InlineData("days_before = 3\ndays_after = 5\nmissing_days = true\nchange_per_day = 0.2", 3, 5, 0.2, true)]
    [InlineData("days_before = 15", 15, 0, 0.1, false)]
    [InlineData("days_after = 1", 0, 1, 0.1, false)]
    public void Load_FillingOverDays_RulesOverTheDefaults(string keys, int before, int after, double change, bool missingDays)
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.WriteRunFile("[filling]\n" + keys);

        RunSettings settings = RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram);

        Assert.Equal(new(before, after, change), settings.DayFilling);
        Assert.Equal(missingDays, settings.FillMissingDays);
    }

    public static TheoryData<string, string, string, string> Faults() => new()
    {
        // What stands before the source, what in it, the code, and words the message must hold.
        { "ice_limit = 0.15", "", "IE1003", "ice_limit" },
        { "[weather]\nretuned_ice_fraction = 10", "", "IE1006", "Write the fraction: 0.1, not 10" },
        { "[weather]\nwarm_water_north_k = 5.0", "", "IE1006", "270 to 300 K" },
        { "[weather]\nice_mask_fil = \"mask.nc\"", "", "IE1003", "Did you mean ice_mask_file?" },
        { "[ice_mask]\nleast_days = 0", "", "IE1006", "1 to 1000" },
        { "write_grid = true", "", "IE1003", "Did you mean write_grids?" },
        { "", "sensr = \"x\"", "IE1003", "Did you mean sensor?" },
        { "write_grids = \"yes\"", "", "IE1005", "true or false" },
        { "[totals]\nice_fraction = 15", "", "IE1006", "Write the fraction: 0.15, not 15." },
        { "[totals]\nice_fraction = 0.9", "", "IE1011", "not above ice_fraction = 0.9" },
        { "[land]\nlimit = 0.5", "", "IE1003", "limit_fraction" },
        { "[filling]\nneighbours = 9", "", "IE1006", "a whole number from 0 to 8" },
        { "[filling]\ndays_before = 16", "", "IE1006", "a whole number from 0 to 15" },
        { "[filling]\ndays_after = -1", "", "IE1006", "a whole number from 0 to 15" },
        { "[filling]\ndays_after = 1.5", "", "IE1005", "a whole number from 0 to 15" },
        { "[filling]\ndays_befor = 1", "", "IE1003", "Did you mean days_before?" },
        { "[filling]\nmissing_days = 1", "", "IE1005", "true or false" },
        { "[filling]\nchange_per_day = 3", "", "IE1006", "0 to 0.5" },
        { "[filling]\nmissing_days = true", "", "IE1011", "days_before = 0 and days_after = 0" },
        { "[filling]\nmissing_days = true\ndays_before = 2", "", "IE1011", "never carried on from one side" },
        { "[filling]\nneighbours = -1", "", "IE1006", "a whole number from 0 to 8" },
        { "[filling]\nneighbours = 2.5", "", "IE1005", "a whole number from 0 to 8" },
        { "[filling]\nneighbors = 4", "", "IE1003", "Did you mean neighbours?" },
        { "[polar_gap]\nrule = \"laplcae\"", "", "IE1007", "Did you mean laplace?" },
        { "[polar_gap]\nrule = \"leave_out\"", "", "IE1007", "Did you mean leave-out?" },
        { "[polar_gap]\nrule = 1", "", "IE1005", "a text in double quotes" },
        { "[polar_gap]\nleast_rim_share = 50", "", "IE1006", "Write the fraction: 0.5, not 50." },
        { "[polar_gap]\nleast_rim_share = 0", "", "IE1006", "0.01 to 1" },
        { "[coast]\ncorrection = \"brightnes\"", "", "IE1007", "Did you mean brightness?" },
        { "[coast]\ncorection = \"off\"", "", "IE1003", "Did you mean correction?" },
        { "[coast]\nminimum_file = \"m.nc\"", "", "IE1011", "a file with correction = \"off\"" },
        { "[coast]\nshore_box_cells = 4", "", "IE1011", "an even number" },
        { "[coast]\nmost_land_fraction = 0.3\nleast_land_fraction = 0.4", "", "IE1011", "not above least_land_fraction = 0.4" },
        { "[tie_points]\nmoving = \"on\"", "", "IE1005", "true or false" },
        { "[tie_points]\nmovin = true", "", "IE1003", "Did you mean moving?" },
        { "[tie_points]\ndays_behind = 0\ndays_ahead = 1", "", "IE1011", "3 in a window of 2 days" },
        { "[tie_points]\nwater_to_km = 80", "", "IE1011", "not above water_from_km = 100" },
        { "[tie_points]\nblend_to_fraction = 0.6", "", "IE1011", "not above blend_from_fraction = 0.7" },
        { "[tie_points]\nclosed_ice_fraction = 95", "", "IE1006", "Write the fraction: 0.95, not 95." },
        { "[melt]\nsignal = true", "", "IE1003", "Did you mean signals?" },
        { "[melt]\nsignals = 1", "", "IE1005", "true or false" },
        { "[melt]\nleast_ice_fraction = 50", "", "IE1006", "Write the fraction: 0.5, not 50." },
        { "[melt]\nnorth_melt = [\"03-11\"]", "", "IE1006", "two days" },
        { "[melt]\nnorth_melt = [\"03-11\", \"08-32\"]", "", "IE1006", "08-32" },
        { "[melt]\nhorizontal_range_wet_k = 5", "", "IE1011", "not below horizontal_range_dry_k = 4" },
        { "[melt]\nhorizontal_range_least_days = 12", "", "IE1011", "12 of horizontal_range_test_days = 10" },
        { "[melt]\nhorizontal_range_test_days = 5\nhorizontal_range_lead_days = 5", "", "IE1011", "fewer days than are tested" },
        { "[melt]\nindicator_interrupt_days = 9", "", "IE1011", "above indicator_persist_days = 5" },
        { "[melt]\nindicator_jump_weight = 0\nindicator_gradient_weight = 0\nindicator_level_weight = 0\nindicator_range_weight = 0", "", "IE1011", "a weight above 0" },
        { "", "status = \"finl\"", "IE1007", "Did you mean final?" },
        { "output = \"again\"", "", "IE1002", "already defined" },
        { "notice = ", "", "IE1002", "not TOML" },
    };

    [Theory]
    [MemberData(nameof(Faults))]
    public void Load_FaultyRunFile_SaysWhereAndWhat(string head, string source, string code, string words)
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.WriteRunFile(head, source);

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        Fault fault = Assert.Single(faulty.Faults, candidate => candidate.Code == code);
        Assert.Contains(words, fault.ToString(), StringComparison.Ordinal);
        Assert.Contains("run.toml, line ", fault.Where, StringComparison.Ordinal);
    }

    [Fact]
    public void Load_SeveralFaults_TellsAllAtOnce()
    {
        run.Write("run.toml", """
            outptu = "out"
            grid = "north-25"
            methods = ["nasa-taem"]
            [[source]]
            sensor = "smrm"
            files = "none/*.nc"
            channels = { 19v = "a", 19x = "b" }
            """);

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        string all = string.Join('\n', faulty.Faults);
        Assert.Contains("Did you mean output?", all, StringComparison.Ordinal);
        Assert.Contains("Did you mean north-25km?", all, StringComparison.Ordinal);
        Assert.Contains("Did you mean nasa-team?", all, StringComparison.Ordinal);
        Assert.Contains("Did you mean smmr?", all, StringComparison.Ordinal);
        Assert.Contains("IE1008", all, StringComparison.Ordinal);
        Assert.Contains("19x", all, StringComparison.Ordinal);
        Assert.Contains("IE1004", all, StringComparison.Ordinal);
    }

    [Fact]
    public void Load_MethodWithoutItsChannel_IsRefusedByName()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace("37v = \"v37\", ", string.Empty, StringComparison.Ordinal));

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        Fault fault = Assert.Single(faulty.Faults);
        Assert.Equal("IE1009", fault.Code);
        Assert.Contains("no 37v, which the method nasa-team needs", fault.Found, StringComparison.Ordinal);
    }

    [Fact]
    public void Load_SignalsWithoutTheirChannel_IsRefusedByName()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.WriteRunFile("[melt]\nsignals = true");
        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace(", 37h = \"h37\"", string.Empty, StringComparison.Ordinal));

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        Fault fault = Assert.Single(faulty.Faults);
        Assert.Equal("IE1009", fault.Code);
        Assert.Contains("no 37h of", fault.Found, StringComparison.Ordinal);
        Assert.Contains("melt signals", fault.Found, StringComparison.Ordinal);
    }

    [Fact]
    public void Load_Melt_TakesTheHemisphereOfTheGrid()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.WriteRunFile("[melt]\nnorth_melt = [\"04-01\", \"07-31\"]\nhorizontal_range_change_k = 9");

        RunSettings settings = RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram);

        Assert.False(settings.Melt.Signals);
        Assert.Equal(new CalendarWindow(new(4, 1), new(7, 31)), settings.Melt.Rules.Calendar.Melt);
        Assert.Equal((9.0, 4.0), (settings.Melt.Rules.HorizontalRange.LeastChangeKelvins, settings.Melt.Rules.HorizontalRange.DryAboveKelvins));
    }

    [Fact]
    public void Load_NoChannelAtAll_IsRefusedBeforeAnyFileIsRead()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace("{ 19v = \"v19\", 19h = \"h19\", 22v = \"v22\", 37v = \"v37\", 37h = \"h37\" }", "{}", StringComparison.Ordinal));

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        Assert.Equal(["IE1009", "IE1009", "IE1009"], faulty.Faults.Select(fault => fault.Code)); // 19v, 19h and 37v.
    }

    [Fact]
    public void Load_RawScaleOfZero_IsRefused()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace("scale_k = 0.1", "scale_k = 0.0", StringComparison.Ordinal));

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        Assert.Equal("IE1006", Assert.Single(faulty.Faults).Code);
    }

    [Fact]
    public void Load_SensorWithoutSurfacesForTheMethod_IsRefusedByName()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.Write("run.toml", File.ReadAllText(run.RunFile).Replace("\"nasa-team\"", "\"bristol\"", StringComparison.Ordinal));

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        Fault fault = Assert.Single(faulty.Faults);
        Assert.Equal("IE1013", fault.Code);
        Assert.Contains("[north.surface_points_k]", fault.Found, StringComparison.Ordinal);
    }

    [Fact]
    public void Load_SensorWithSingularTiePoints_IsRefused()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        string sensor = TinyRun.Sensor("1990-01-01", "1999-12-31");
        run.Write("tiny.toml", sensor.Replace("multiyear = { 19v = 220.7, 19h = 196.0, 37v = 188.5 }", "multiyear = { 19v = 216.65, 19h = 172.7, 37v = 224.7 }", StringComparison.Ordinal));

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        Assert.Equal("IE1011", Assert.Single(faulty.Faults).Code);
    }

    [Theory]
    [InlineData("89v = [15.0, 13.0]", "IE1011", "a channel that frequencies_ghz does not have")]
    [InlineData("19v = [69.0]", "IE1006", "a list of 2 numbers")]
    [InlineData("19v = [69.0, 0.0]", "IE1006", "from 1 to 300 km")]
    [InlineData("19x = [69.0, 43.0]", "IE1003", "19x")]
    public void Load_SensorWithWrongFootprints_IsRefused(string footprint, string code, string words)
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + "\n[footprints_km]\n" + footprint);

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        Fault fault = Assert.Single(faulty.Faults);
        Assert.Equal(code, fault.Code);
        Assert.Contains(words, fault.ToString(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("89v = 0.7", "IE1011", "a channel that frequencies_ghz does not have")]
    [InlineData("19v = -0.1", "IE1006", "from 0 to 10 K")]
    [InlineData("19v = 10.5", "IE1006", "from 0 to 10 K")]
    [InlineData("19v = nan", "IE1006", "from 0 to 10 K")]
    [InlineData("19v = \"0.45\"", "IE1005", "from 0 to 10 K")]
    [InlineData("19v = [0.45, 0.42]", "IE1005", "from 0 to 10 K")]
    [InlineData("19x = 0.45", "IE1003", "Did you mean 19")]
    public void Load_SensorWithWrongNoise_IsRefused(string noise, string code, string words)
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + "\n[noise_k]\n" + noise);

        ConfigurationException faulty = Assert.Throws<ConfigurationException>(() => RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram));

        Fault fault = Assert.Single(faulty.Faults);
        Assert.Equal(code, fault.Code);
        Assert.Contains(words, fault.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void Load_SensorWithNoise_HasItAndNoneElsewhere()
    {
        run.WriteDay(new(1990, 1, 1), _ => 0.5);
        run.Write("tiny.toml", TinyRun.Sensor("1990-01-01", "1999-12-31") + "\n[noise_k]\n19v = 0.45\n37v = 0\n");

        ChannelNoise noise = Assert.Single(RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram).Sources).Sensor.NoiseKelvins;

        Assert.Equal(new(new Dictionary<Channel, double> { [Channel.V19] = 0.45 }), noise);
    }

    [Theory]
    [InlineData("mehtods", "methods")]
    [InlineData("gridd", "grid")]
    [InlineData("outptu", "output")]
    public void NearestName_OneSlip_IsFound(string written, string meant) =>
        Assert.Equal(meant, NearestName.Of(written, ["output", "grid", "methods", "write_grids"]));

    [Fact]
    public void NearestName_NothingClose_IsNone() => Assert.Null(NearestName.Of("zebra", ["output", "grid", "methods"]));
}
