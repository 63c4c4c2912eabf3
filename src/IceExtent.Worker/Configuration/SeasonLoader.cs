using IceExtent.Grids;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads the table [season] and the scheme it names.</summary>
internal static class SeasonLoader
{
    private const int MostDays = 60;

    private static readonly (string Name, CrossingPick Value)[] Picks = [("first", CrossingPick.First), ("last", CrossingPick.Last)];
    private static readonly (string Name, FallDay Value)[] FallDays = [("last-with", FallDay.LastWith), ("first-without", FallDay.FirstWithout)];

    private static readonly (string Name, SeasonSmoothing Value)[] Smoothings =
        [("none", SeasonSmoothing.None), ("mean", SeasonSmoothing.Mean), ("median", SeasonSmoothing.Median)];

    /// <summary>Checks the table and the scheme.</summary>
    /// <param name="run">The run file.</param>
    /// <param name="defaults">config/defaults.toml.</param>
    /// <param name="config">Where the schemes stand.</param>
    /// <param name="hemisphere">The hemisphere of the grid.</param>
    /// <param name="runFolder">Where the run file stands.</param>
    /// <param name="faults">Receives faults.</param>
    /// <returns>The settings, or null where the run file asks for none or there were faults.</returns>
    public static SeasonSettings? Load(ConfigScope run, ConfigScope defaults, ConfigFolder config, Hemisphere hemisphere, string runFolder, List<Fault> faults)
    {
        if (run.Table("season", required: false) is null)
        {
            return null;
        }

        if (run.Flag("write_grids", required: false) == false)
        {
            faults.Add(new(
                "IE1011", run.Where("write_grids", run.PositionOf("write_grids")), "write_grids = false with a table [season]",
                "season dates only with grids: they are found in them", "Set write_grids = true, or remove [season]."));
        }

        return LoadAnyway(run, defaults, config, hemisphere, runFolder, faults);
    }

    /// <summary>The same, whether or not the run file asks for dates.</summary>
    /// <param name="run">The run file.</param>
    /// <param name="defaults">config/defaults.toml.</param>
    /// <param name="config">Where the schemes stand.</param>
    /// <param name="hemisphere">The hemisphere of the grid.</param>
    /// <param name="runFolder">Where the run file stands.</param>
    /// <param name="faults">Receives faults.</param>
    /// <returns>The settings, or null after adding faults.</returns>
    public static SeasonSettings? LoadAnyway(ConfigScope run, ConfigScope defaults, ConfigFolder config, Hemisphere hemisphere, string runFolder, List<Fault> faults)
    {
        ConfigScope? shipped = defaults.Table("season");
        ConfigScope? own = run.Table("season", required: false) ?? run.Empty("season");
        if (shipped is null)
        {
            return null;
        }

        int before = faults.Count;
        string side = hemisphere == Hemisphere.North ? "north" : "south";
        string? northern = shipped.Text("north_scheme"), southern = shipped.Text("south_scheme");
        string? name = own.Text("scheme", required: false) ?? (hemisphere == Hemisphere.North ? northern : southern);
        string? path = name is null ? null : ConfigFolder.Resolve(own, "scheme", name, config.Seasons, runFolder);
        if (path is null || TomlFile.Read(path, faults) is not { } table)
        {
            return null;
        }

        ConfigScope file = new(table, string.Empty, faults);
        string? source = file.Text("source");
        ConfigScope? here = file.Table(side);
        ConfigScope? other = file.Table(hemisphere == Hemisphere.North ? "south" : "north", required: false);
        if (here is null || source is null)
        {
            return null;
        }

        SchemeScope scope = new(own, here, file, shipped);
        SeasonScheme scheme = Scheme(scope, Path.GetFileNameWithoutExtension(path), source);
        RegionSeasonRules regions = Regions(scope, side);
        int trendYears = scope.WholeNumber("least_trend_years", 3, 100);
        MeltOnsetMethod onset = scope.OneOf("melt_onset", ("horizontal-range", MeltOnsetMethod.HorizontalRange), ("indicators", MeltOnsetMethod.Indicators));
        double knownShare = scope.Number("least_known_share", 0.0, 1.0);
        double areaShare = scope.Number("least_area_share", 0.01, 1.0);
        double placeShare = scope.Number("least_place_share", 0.01, 1.0);
        if (other is not null)
        {
            Scheme(new(own, other, file, shipped), string.Empty, source); // So that its keys are checked too.
        }

        foreach (ConfigScope? layer in (ConfigScope?[])[own, here, other, file, shipped])
        {
            layer?.RefuseUnknown();
        }

        return faults.Count > before ? null : new(scheme, regions, trendYears, placeShare, areaShare, knownShare, [path], onset);
    }

    private static SeasonScheme Scheme(SchemeScope scope, string name, string source)
    {
        CalendarDay start = scope.Day("year_start");
        IceYearStart yearStart = new(start.Month, start.Day);
        DateOnly lastDay = yearStart.Beginning(2001).LastDay;
        CalendarWindow whole = new(start, new(lastDay.Month, lastDay.Day));
        CalendarWindow? lowest = scope.Window("lowest_in");
        SeasonScheme scheme = new()
        {
            Name = name,
            Source = source,
            YearStart = yearStart,
            Begins = scope.OneOf("begins_with", ("ice", YearBeginning.Ice), ("water", YearBeginning.Water)),
            LowestIn = lowest,
            MeltingHalf = scope.Window("melting_half") ?? whole,
            FreezingHalf = scope.Window("freezing_half") ?? whole,
            Opening = Fall(scope, "opening"),
            Retreat = Fall(scope, "retreat"),
            Advance = Rise(scope, "advance"),
            Closing = Rise(scope, "closing"),
            OwnLevels = OwnLevels(scope),
            Smoothing = scope.OneOf("smoothing", Smoothings),
            SmoothingDays = scope.WholeNumber("smoothing_days", 1, 31),
            BridgedDays = scope.WholeNumber("bridged_days", 0, MostDays),
            HiddenByMelt = scope.Number("hidden_by_melt_fraction", 0.0, 0.5),
            LimitDeviations = scope.Number("limit_deviations", 0.0, 10.0),
        };
        Check(scope, scheme);
        return scheme;
    }

    private static void Check(SchemeScope scope, SeasonScheme scheme)
    {
        if (scheme.SmoothingDays % 2 == 0)
        {
            scope.Refuse("smoothing_days", FormattableString.Invariant($"{scheme.SmoothingDays}, an even number"), "an odd number, so that the day is in the middle");
        }

        if (scheme.Opening.Level < scheme.Retreat.Level)
        {
            scope.Refuse("opening_fraction", FormattableString.Invariant($"{scheme.Opening.Level}, below retreat_fraction = {scheme.Retreat.Level}"), "a fraction not below retreat_fraction");
        }

        if (scheme.Closing.Level < scheme.Advance.Level)
        {
            scope.Refuse("closing_fraction", FormattableString.Invariant($"{scheme.Closing.Level}, below advance_fraction = {scheme.Advance.Level}"), "a fraction not below advance_fraction");
        }

        if (scheme.LowestIn is not null && scheme.Begins == YearBeginning.Water)
        {
            scope.Refuse("lowest_in", "a window of least ice in years that begin with water", "lowest_in only with begins_with = \"ice\"");
        }
    }

    private static FallRule Fall(SchemeScope scope, string date) => new(
        scope.Number($"{date}_fraction", 0.01, 0.99),
        scope.WholeNumber($"{date}_days", 1, MostDays),
        scope.OneOf($"{date}_pick", Picks),
        scope.OneOf($"{date}_day", FallDays));

    private static RiseRule Rise(SchemeScope scope, string date) =>
        new(scope.Number($"{date}_fraction", 0.01, 0.99), scope.WholeNumber($"{date}_days", 1, MostDays));

    private static OwnLevelRules? OwnLevels(SchemeScope scope)
    {
        CalendarWindow? winter = scope.Window("winter"), summer = scope.Window("summer");
        if (winter is not { } cold || summer is not { } warm)
        {
            return null;
        }

        return new(
            cold,
            warm,
            scope.Number("winter_deviations", 0.0, 10.0),
            scope.Number("summer_deviations", 0.0, 10.0),
            scope.Number("closing_below_winter_fraction", 0.0, 1.0),
            scope.Number("highest_summer_fraction", 0.0, 1.0),
            scope.WholeNumber("least_own_days", 2, MostDays));
    }

    private static RegionSeasonRules Regions(SchemeScope scope, string side)
    {
        int[] winter = [scope.WholeNumber("north_winter_month", 1, 12), scope.WholeNumber("south_winter_month", 1, 12)];
        int[] summer = [scope.WholeNumber("north_summer_month", 1, 12), scope.WholeNumber("south_summer_month", 1, 12)];
        int here = side == "north" ? 0 : 1;
        int? first = scope.OptionalWholeNumber("reference_first_year", 1900, 2200), last = scope.OptionalWholeNumber("reference_last_year", 1900, 2200);
        if (first > last)
        {
            scope.Refuse("reference_first_year", FormattableString.Invariant($"{first}, after reference_last_year = {last}"), "a year not after reference_last_year");
        }

        return new(
            winter[here], summer[here], scope.WholeNumber("least_month_days", 1, 31), first, last, scope.Number("least_dated_share", 0.01, 1.0));
    }
}
