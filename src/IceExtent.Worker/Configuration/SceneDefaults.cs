using IceExtent.Grids;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>What config/defaults.toml says of totals, coasts and weather, for commands that have no run file.</summary>
internal sealed record SceneDefaults(TotalsRules Rules, double LandLimitFraction, double ErrorLengthMeters, double SmearingFactor, CoastSettings Coast, TiePointSettings TiePoints, WeatherSettings Weather)
{
    /// <summary>Reads them.</summary>
    /// <param name="config">Where they stand.</param>
    /// <param name="grid">The grid of the scene.</param>
    /// <param name="coast">What the person asked for in place of <c>coast.correction</c>.</param>
    /// <param name="limits">What the person asked for in place of <c>weather.limits</c>.</param>
    /// <exception cref="ConfigurationException">The file or one of the two cannot be used.</exception>
    public static SceneDefaults Load(ConfigFolder config, Grid grid, string coast, string limits)
    {
        List<Fault> faults = [];
        ConfigTable? defaults = TomlFile.Read(config.Defaults, faults);
        ConfigTable? asked = TomlFile.Parse($"[coast]\ncorrection = \"{coast}\"\n", "--coast", faults);
        ConfigTable? askedLimits = TomlFile.Parse($"[weather]\nlimits = \"{limits}\"\n", "--limits", faults);
        if (defaults is null || asked is null || askedLimits is null)
        {
            throw new ConfigurationException(faults);
        }

        ConfigScope shipped = new(defaults, string.Empty, faults);
        LayeredScope layered = new(new(asked, string.Empty, faults), shipped);
        double? ice = layered.Number("totals", "ice_fraction", 0.01, 0.99, string.Empty);
        double? pack = layered.Number("totals", "pack_fraction", 0.01, 1.0, string.Empty);
        double? land = layered.Number("land", "limit_fraction", 0.01, 1.0, string.Empty);
        double? length = layered.Number("standard_error", "correlation_length_km", 1.0, 3_000.0, "km");
        double? smearing = layered.Number("standard_error", "smearing_factor", 0.0, 1.0, string.Empty);
        CoastSettings? settings = CoastLoader.Load(layered, grid, config.Path, faults);
        TiePointSettings? tiePoints = TiePointLoader.Load(layered, ice ?? double.NaN);
        WeatherSettings? weather = WeatherLoader.Load(new(new(askedLimits, string.Empty, faults), shipped), grid, config.Path, faults);
        return faults.Count == 0
            ? new(new TotalsRules(ice!.Value, pack!.Value), land!.Value, length!.Value * 1_000.0, smearing!.Value, settings!, tiePoints!, weather!)
            : throw new ConfigurationException(faults);
    }
}
