using IceExtent.Retrieval;

namespace IceExtent.Worker.Configuration;

/// <summary>What a run file says of filling over days.</summary>
/// <param name="Rules">The limits, or null where nothing is filled over days.</param>
/// <param name="MissingDays">Whether days without usable input are made wholly from days near them.</param>
internal sealed record DayFillingSettings(DayFillingRules? Rules, bool MissingDays)
{
    /// <summary>Reads and checks them.</summary>
    /// <returns>The settings, or null after adding faults.</returns>
    public static DayFillingSettings? Load(LayeredScope scope)
    {
        int? before = scope.WholeNumber("filling", "days_before", 0, DayFillingRules.MostDays);
        int? after = scope.WholeNumber("filling", "days_after", 0, DayFillingRules.MostDays);
        double? change = scope.Number("filling", "change_per_day", 0.0, 0.5, string.Empty);
        bool? missingDays = scope.Flag("filling", "missing_days");
        if (before is null || after is null || change is null || missingDays is null)
        {
            return null;
        }

        if (missingDays.Value && (before == 0 || after == 0))
        {
            scope.Refuse(
                "filling",
                "missing_days",
                FormattableString.Invariant($"true with days_before = {before} and days_after = {after}"),
                "true where both limits are 1 or more: a day without input is never carried on from one side");
            return null;
        }

        return new(before + after > 0 ? new(before.Value, after.Value, change.Value) : null, missingDays.Value);
    }
}
