using IceExtent.Grids;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>What config/defaults.toml says of totals and coasts, for commands that have no run file.</summary>
internal sealed record SceneDefaults(TotalsRules Rules, double LandLimitFraction, double ErrorLengthMeters, double SmearingFactor, CoastSettings Coast, TiePointSettings TiePoints)
{
    /// <summary>Reads them.</summary>
    /// <param name="config">Where they stand.</param>
    /// <param name="grid">The grid of the scene.</param>
    /// <param name="coast">What the person asked for in place of <c>coast.correction</c>.</param>
    /// <exception cref="ConfigurationException">The file or the correction cannot be used.</exception>
    public static SceneDefaults Load(ConfigFolder config, Grid grid, string coast)
    {
        List<Fault> faults = [];
        ConfigTable? defaults = TomlFile.Read(config.Defaults, faults);
        ConfigTable? asked = TomlFile.Parse($"[coast]\ncorrection = \"{coast}\"\n", "--coast", faults);
        if (defaults is null || asked is null)
        {
            throw new ConfigurationException(faults);
        }

        LayeredScope layered = new(new(asked, string.Empty, faults), new(defaults, string.Empty, faults));
        double? ice = layered.Number("totals", "ice_fraction", 0.01, 0.99, string.Empty);
        double? pack = layered.Number("totals", "pack_fraction", 0.01, 1.0, string.Empty);
        double? land = layered.Number("land", "limit_fraction", 0.01, 1.0, string.Empty);
        double? length = layered.Number("standard_error", "correlation_length_km", 1.0, 3_000.0, "km");
        double? smearing = layered.Number("standard_error", "smearing_factor", 0.0, 1.0, string.Empty);
        CoastSettings? settings = CoastLoader.Load(layered, grid, config.Path, faults);
        TiePointSettings? tiePoints = TiePointLoader.Load(layered, ice ?? double.NaN);
        return faults.Count == 0
            ? new(new TotalsRules(ice!.Value, pack!.Value), land!.Value, length!.Value * 1_000.0, smearing!.Value, settings!, tiePoints!)
            : throw new ConfigurationException(faults);
    }
}
