using IceExtent.Grids;
using IceExtent.Statistics.Seasons;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads the table [melt] of a run file.</summary>
internal sealed class MeltLoader(LayeredScope layered)
{
    private const string Table = "melt";

    /// <summary>Checks the table.</summary>
    /// <param name="layered">The run file over the defaults.</param>
    /// <param name="grid">The grid of the run, whose hemisphere has its own windows; null where it could not be read.</param>
    /// <returns>The settings, or null after adding faults.</returns>
    public static MeltSettings? Load(LayeredScope layered, Grid? grid)
    {
        MeltLoader loader = new(layered);
        bool? signals = layered.Flag(Table, "signals");
        double? ice = layered.Number(Table, "least_ice_fraction", 0.15, 1.0, string.Empty);
        int? gap = layered.WholeNumber(Table, "gap_days", 0, 30);
        MeltCalendar? north = loader.Calendar("north"), south = loader.Calendar("south");
        HorizontalRangeRules? range = loader.HorizontalRange();
        MeltIndicatorRules? indicators = loader.Indicators();
        return signals is null || ice is null || gap is null || north is null || south is null || range is null || indicators is null || grid is null
            ? null
            : new(signals.Value, new(grid.Hemisphere == Hemisphere.North ? north : south, ice.Value, gap.Value, range, indicators));
    }

    private MeltCalendar? Calendar(string hemisphere)
    {
        CalendarWindow? melt = Window(hemisphere, "melt"), winter = Window(hemisphere, "winter");
        CalendarWindow? freeze = Window(hemisphere, "freeze"), next = Window(hemisphere, "next_winter");
        return melt is null || winter is null || freeze is null || next is null ? null : new(melt.Value, winter.Value, freeze.Value, next.Value);
    }

    private CalendarWindow? Window(string hemisphere, string name)
    {
        int? from = Whole($"{hemisphere}_{name}_from_day", 1, 365), to = Whole($"{hemisphere}_{name}_to_day", 1, 365);
        return from is null || to is null ? null : new(from.Value, to.Value);
    }

    private HorizontalRangeRules? HorizontalRange()
    {
        double? dry = Number("horizontal_range_dry_k", -20.0, 40.0, "K"), wet = Number("horizontal_range_wet_k", -60.0, 20.0, "K");
        int? test = Whole("horizontal_range_test_days", 2, HorizontalRangeRules.MostTestDays), least = Whole("horizontal_range_least_days", 2, HorizontalRangeRules.MostTestDays);
        double? change = Number("horizontal_range_change_k", 0.1, 60.0, "K"), error = Number("horizontal_range_error_k", 0.0, 20.0, "K");
        int? lead = Whole("horizontal_range_lead_days", 0, HorizontalRangeRules.MostLeadDays), spread = Whole("horizontal_range_spread_days", 0, 60);
        if (dry is null || wet is null || test is null || least is null || change is null || error is null || lead is null || spread is null)
        {
            return null;
        }

        if (wet >= dry)
        {
            return Refuse<HorizontalRangeRules>("horizontal_range_wet_k", FormattableString.Invariant($"{wet}, not below horizontal_range_dry_k = {dry}"), "a range below horizontal_range_dry_k");
        }

        if (least > test)
        {
            return Refuse<HorizontalRangeRules>("horizontal_range_least_days", FormattableString.Invariant($"{least} of horizontal_range_test_days = {test}"), "no more days than are tested");
        }

        return lead >= test
            ? Refuse<HorizontalRangeRules>("horizontal_range_lead_days", FormattableString.Invariant($"{lead} of horizontal_range_test_days = {test}"), "fewer days than are tested")
            : new(dry.Value, wet.Value, test.Value, least.Value, change.Value, lead.Value, error.Value, spread.Value);
    }

    private MeltIndicatorRules? Indicators()
    {
        MeltIndicator? jump = Indicator("jump", "_k"), gradient = Indicator("gradient", string.Empty), level = Indicator("level", "_k"), range = Indicator("range", "_k");
        int? jumpDays = Whole("indicator_jump_days", 1, MeltIndicatorRules.MostJumpDays), persist = Whole("indicator_persist_days", 1, 60);
        int? interrupt = Whole("indicator_interrupt_days", 1, 60), summer = Whole("indicator_summer_days", 0, 120), winter = Whole("indicator_winter_days", 3, 180);
        double? score = Number("indicator_score", 0.1, 1_000.0, string.Empty), error = Number("indicator_score_error", 0.0, 100.0, string.Empty);
        int? spread = Whole("indicator_spread_days", 0, 60), freezeSpread = Whole("indicator_freeze_spread_days", 0, 60);
        if (jump is null || gradient is null || level is null || range is null || jumpDays is null || persist is null || interrupt is null || summer is null
            || winter is null || score is null || error is null || spread is null || freezeSpread is null)
        {
            return null;
        }

        if (interrupt > persist)
        {
            return Refuse<MeltIndicatorRules>("indicator_interrupt_days", FormattableString.Invariant($"{interrupt}, above indicator_persist_days = {persist}"), "no more than indicator_persist_days");
        }

        return jump.Value.Weight + gradient.Value.Weight + level.Value.Weight + range.Value.Weight > 0.0
            ? new(jump.Value, gradient.Value, level.Value, range.Value, jumpDays.Value, score.Value, error.Value, persist.Value, interrupt.Value, summer.Value, winter.Value, spread.Value, freezeSpread.Value)
            : Refuse<MeltIndicatorRules>("indicator_jump_weight", "0 in all four indicators", "a weight above 0 in one of them");
    }

    private MeltIndicator? Indicator(string name, string unit)
    {
        double? weight = Number($"indicator_{name}_weight", 0.0, 100.0, string.Empty);
        double? scatter = Number($"indicator_{name}_scatter{unit}", 1e-6, 100.0, unit.Length == 0 ? string.Empty : "K");
        return weight is null || scatter is null ? null : new(weight.Value, scatter.Value);
    }

    private int? Whole(string key, int lowest, int highest) => layered.WholeNumber(Table, key, lowest, highest);

    private double? Number(string key, double lowest, double highest, string unit) => layered.Number(Table, key, lowest, highest, unit);

    private T? Refuse<T>(string key, string found, string allowed)
        where T : class
    {
        layered.Refuse(Table, key, found, allowed);
        return null;
    }
}
