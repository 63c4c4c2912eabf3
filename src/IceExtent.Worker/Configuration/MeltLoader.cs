using IceExtent.Grids;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads the table [melt].</summary>
internal static class MeltLoader
{
    private const int MostDays = 60;

    /// <summary>Checks the table.</summary>
    /// <param name="run">The run file.</param>
    /// <param name="defaults">config/defaults.toml.</param>
    /// <param name="hemisphere">The hemisphere of the grid.</param>
    /// <param name="faults">Receives faults.</param>
    /// <returns>The settings, or null after adding faults.</returns>
    public static MeltSettings? Load(ConfigScope run, ConfigScope defaults, Hemisphere hemisphere, List<Fault> faults)
    {
        int before = faults.Count;
        ConfigScope? own = run.Table("melt", required: false) ?? run.Empty("melt");
        if (defaults.Table("melt") is not { } shipped)
        {
            return null;
        }

        SchemeScope scope = new(own, shipped);
        bool signals = scope.Flag("signals");
        double ice = scope.Number("least_ice_fraction", 0.15, 1.0);
        int gap = scope.WholeNumber("gap_days", 0, 30);
        MeltCalendar?[] calendars = [Calendar(scope, "north"), Calendar(scope, "south")];
        HorizontalRangeRules? range = HorizontalRange(scope, faults);
        MeltIndicatorRules? indicators = Indicators(scope, faults);
        own.RefuseUnknown();
        shipped.RefuseUnknown();
        return faults.Count > before || calendars[hemisphere == Hemisphere.North ? 0 : 1] is not { } calendar
            ? null
            : new(signals, new(calendar, ice, gap, range!, indicators!));
    }

    private static MeltCalendar? Calendar(SchemeScope scope, string hemisphere)
    {
        CalendarWindow? melt = scope.Window($"{hemisphere}_melt"), winter = scope.Window($"{hemisphere}_winter");
        CalendarWindow? freeze = scope.Window($"{hemisphere}_freeze"), next = scope.Window($"{hemisphere}_next_winter");
        return melt is null || winter is null || freeze is null || next is null ? null : new(melt.Value, winter.Value, freeze.Value, next.Value);
    }

    private static HorizontalRangeRules? HorizontalRange(SchemeScope scope, List<Fault> faults)
    {
        int before = faults.Count;
        double dry = scope.Number("horizontal_range_dry_k", -20.0, 40.0), wet = scope.Number("horizontal_range_wet_k", -60.0, 20.0);
        int test = scope.WholeNumber("horizontal_range_test_days", 2, HorizontalRangeRules.MostTestDays);
        int least = scope.WholeNumber("horizontal_range_least_days", 2, HorizontalRangeRules.MostTestDays);
        double change = scope.Number("horizontal_range_change_k", 0.1, 60.0), error = scope.Number("horizontal_range_error_k", 0.0, 20.0);
        int lead = scope.WholeNumber("horizontal_range_lead_days", 0, HorizontalRangeRules.MostLeadDays);
        int spread = scope.WholeNumber("horizontal_range_spread_days", 0, MostDays);
        if (faults.Count == before && wet >= dry)
        {
            scope.Refuse("horizontal_range_wet_k", FormattableString.Invariant($"{wet}, not below horizontal_range_dry_k = {dry}"), "a range below horizontal_range_dry_k");
        }

        if (faults.Count == before && least > test)
        {
            scope.Refuse("horizontal_range_least_days", FormattableString.Invariant($"{least} of horizontal_range_test_days = {test}"), "no more days than are tested");
        }

        if (faults.Count == before && lead >= test)
        {
            scope.Refuse("horizontal_range_lead_days", FormattableString.Invariant($"{lead} of horizontal_range_test_days = {test}"), "fewer days than are tested");
        }

        return faults.Count > before ? null : new(dry, wet, test, least, change, lead, error, spread);
    }

    private static MeltIndicatorRules? Indicators(SchemeScope scope, List<Fault> faults)
    {
        int before = faults.Count;
        double[] weights = [.. ((string[])["jump", "gradient", "level", "range"]).Select(name => scope.Number($"indicator_{name}_weight", 0.0, 100.0))];
        double[] scatter = [.. ((string[])["jump_scatter_k", "gradient_scatter", "level_scatter_k", "range_scatter_k"]).Select(name => scope.Number($"indicator_{name}", 1e-6, 100.0))];
        int jumpDays = scope.WholeNumber("indicator_jump_days", 1, MeltIndicatorRules.MostJumpDays);
        double score = scope.Number("indicator_score", 0.1, 1_000.0), error = scope.Number("indicator_score_error", 0.0, 100.0);
        int persist = scope.WholeNumber("indicator_persist_days", 1, MostDays), interrupt = scope.WholeNumber("indicator_interrupt_days", 1, MostDays);
        int summer = scope.WholeNumber("indicator_summer_days", 0, 120), winter = scope.WholeNumber("indicator_winter_days", 3, 180);
        int spread = scope.WholeNumber("indicator_spread_days", 0, MostDays), freezeSpread = scope.WholeNumber("indicator_freeze_spread_days", 0, MostDays);
        if (faults.Count == before && interrupt > persist)
        {
            scope.Refuse("indicator_interrupt_days", FormattableString.Invariant($"{interrupt}, above indicator_persist_days = {persist}"), "no more than indicator_persist_days");
        }

        if (faults.Count == before && weights.Sum() == 0.0)
        {
            scope.Refuse("indicator_jump_weight", "0, as in all four indicators", "a weight above 0 in one of them");
        }

        MeltIndicator Indicator(int index) => new(weights[index], scatter[index]);
        return faults.Count > before
            ? null
            : new(Indicator(0), Indicator(1), Indicator(2), Indicator(3), jumpDays, score, error, persist, interrupt, summer, winter, spread, freezeSpread);
    }
}
