using IceExtent.Retrieval;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads the table [tie_points] of a run file.</summary>
internal static class TiePointLoader
{
    private const string Table = "tie_points";

    /// <summary>Checks the table.</summary>
    /// <param name="layered">The run file over the defaults.</param>
    /// <param name="iceFraction">The limit of extent, which is also that of the edge; NaN where it cannot be used.</param>
    /// <returns>The settings, or null after adding faults.</returns>
    public static TiePointSettings? Load(LayeredScope layered, double iceFraction)
    {
        bool? moving = layered.Flag(Table, "moving");
        SampleRules? samples = Samples(layered, iceFraction);
        int? behind = layered.WholeNumber(Table, "days_behind", 0, 60);
        int? ahead = layered.WholeNumber(Table, "days_ahead", 0, 60);
        int? leastSamples = layered.WholeNumber(Table, "least_samples", 2, 1_000_000);
        int? leastDays = layered.WholeNumber(Table, "least_days", 1, 121);
        double? elongation = layered.Number(Table, "least_elongation", 1.0, 100.0, string.Empty);
        double? from = layered.Number(Table, "blend_from_fraction", 0.0, 1.0, string.Empty);
        double? to = layered.Number(Table, "blend_to_fraction", 0.0, 1.0, string.Empty);
        if (moving is null || samples is null || behind is null || ahead is null || leastSamples is null || leastDays is null
            || elongation is null || from is null || to is null)
        {
            return null;
        }

        if (leastDays > behind + ahead + 1)
        {
            layered.Refuse(Table, "least_days", FormattableString.Invariant($"{leastDays} in a window of {behind + ahead + 1} days"), "no more days than the window has");
            return null;
        }

        if (to <= from)
        {
            layered.Refuse(Table, "blend_to_fraction", FormattableString.Invariant($"{to}, not above blend_from_fraction = {from}"), "a fraction above blend_from_fraction");
            return null;
        }

        return new(moving.Value, new(samples, behind.Value, ahead.Value, leastSamples.Value, leastDays.Value, elongation.Value, new(from.Value, to.Value)));
    }

    private static SampleRules? Samples(LayeredScope layered, double iceFraction)
    {
        double? closed = layered.Number(Table, "closed_ice_fraction", 0.5, 1.0, string.Empty);
        double? coast = layered.Number(Table, "coast_distance_km", 0.0, 1_000.0, "km");
        double? edge = layered.Number(Table, "edge_distance_km", 0.0, 1_000.0, "km");
        double? from = layered.Number(Table, "water_from_km", 0.0, 2_000.0, "km");
        double? to = layered.Number(Table, "water_to_km", 1.0, 5_000.0, "km");
        double? outliers = layered.Number(Table, "outlier_limit", 2.0, 100.0, string.Empty);
        if (closed is null || coast is null || edge is null || from is null || to is null || outliers is null)
        {
            return null;
        }

        if (to <= from)
        {
            layered.Refuse(Table, "water_to_km", FormattableString.Invariant($"{to}, not above water_from_km = {from}"), "a distance above water_from_km");
            return null;
        }

        const double MetersPerKilometer = 1_000.0;
        return new(
            iceFraction, closed.Value, coast.Value * MetersPerKilometer, edge.Value * MetersPerKilometer, from.Value * MetersPerKilometer, to.Value * MetersPerKilometer, outliers.Value);
    }
}
