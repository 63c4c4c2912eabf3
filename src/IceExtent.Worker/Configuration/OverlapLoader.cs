using IceExtent.Statistics;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads the table [overlap] of a run file.</summary>
internal static class OverlapLoader
{
    private const double MetersPerKilometer = 1_000.0;

    /// <summary>Checks the table.</summary>
    /// <param name="layered">The run file over the defaults.</param>
    /// <param name="rules">The run's ice limit, or null where it could not be read.</param>
    /// <returns>The settings, or null after adding faults.</returns>
    public static OverlapSettings? Load(LayeredScope layered, TotalsRules? rules)
    {
        int? days = layered.WholeNumber("overlap", "least_days", 4, 10_000);
        int? cells = layered.WholeNumber("overlap", "least_cells", 1, 1_000_000);
        double? land = layered.Number("overlap", "land_distance_km", 0.0, 1_000.0, "km");
        double? edge = layered.Number("overlap", "edge_distance_km", 0.0, 1_000.0, "km");
        double? water = layered.Number("overlap", "open_water_fraction", 0.001, 0.5, string.Empty);
        double? ice = layered.Number("overlap", "closed_ice_fraction", 0.5, 1.0, string.Empty);
        double? trim = layered.Number("overlap", "trim_fraction", 0.0, 0.49, string.Empty);
        return days is null || cells is null || land is null || edge is null || water is null || ice is null || trim is null || rules is null
            ? null
            : new(
                new(land.Value * MetersPerKilometer, edge.Value * MetersPerKilometer, water.Value, ice.Value, rules.IceFraction),
                days.Value,
                cells.Value,
                trim.Value);
    }
}
