using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>What config/defaults.toml says of totals, for commands that have no run file.</summary>
internal sealed record SceneDefaults(TotalsRules Rules, double LandLimitFraction, double ErrorLengthMeters)
{
    /// <summary>Reads them.</summary>
    /// <exception cref="ConfigurationException">The file cannot be used.</exception>
    public static SceneDefaults Load(ConfigFolder config)
    {
        List<Fault> faults = [];
        ConfigTable? table = TomlFile.Read(config.Defaults, faults);
        ConfigScope? scope = table is null ? null : new(table, string.Empty, faults);
        ConfigScope? totals = scope?.Table("totals");
        double? ice = totals?.Number("ice_fraction", 0.01, 0.99, string.Empty);
        double? pack = totals?.Number("pack_fraction", 0.01, 1.0, string.Empty);
        double? land = scope?.Table("land")?.Number("limit_fraction", 0.01, 1.0, string.Empty);
        double? length = scope?.Table("standard_error")?.Number("correlation_length_km", 1.0, 3_000.0, "km");
        return faults.Count == 0 && ice is not null && pack is not null && land is not null && length is not null
            ? new(new TotalsRules(ice.Value, pack.Value), land.Value, length.Value * 1_000.0)
            : throw new ConfigurationException(faults);
    }
}
