using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>What config/defaults.toml says of totals, coasts and weather, for commands that have no run file.</summary>
internal sealed record SceneDefaults(TotalsRules Rules, double LandLimitFraction, ErrorLengths ErrorLengths, SmearingFactors Smearing, CoastSettings Coast, TiePointSettings TiePoints, WeatherSettings Weather, SeasonSettings Season, RegionLoader Regions, MeltSettings Melt)
{
    /// <summary>Reads them.</summary>
    /// <param name="config">Where they stand.</param>
    /// <param name="grid">The grid of the scene.</param>
    /// <param name="coast">What the person asked for in place of <c>coast.correction</c>, or null.</param>
    /// <param name="settings">A file with tables of a run file, or null.</param>
    /// <exception cref="ConfigurationException">A file or the correction cannot be used.</exception>
    public static SceneDefaults Load(ConfigFolder config, Grid grid, string? coast, string? settings)
    {
        List<Fault> faults = [];
        ConfigTable? defaults = TomlFile.Read(config.Defaults, faults);
        ConfigTable? asked = settings is null ? TomlFile.Parse(string.Empty, "--settings", faults) : TomlFile.Read(settings, faults);
        ConfigTable? askedCoast = coast is null ? asked : TomlFile.Parse($"[coast]\ncorrection = \"{coast}\"\n", "--coast", faults);
        if (defaults is null || asked is null || askedCoast is null)
        {
            throw new ConfigurationException(faults);
        }

        string folder = settings is null ? config.Path : Path.GetDirectoryName(Path.GetFullPath(settings))!;
        ConfigScope shipped = new(defaults, string.Empty, faults);
        ConfigScope own = new(asked, string.Empty, faults);
        LayeredScope layered = new(own, shipped);
        LayeredScope coastal = coast is null ? layered : new(new(askedCoast, string.Empty, faults), shipped);
        double? ice = layered.Number("totals", "ice_fraction", 0.01, 0.99, string.Empty);
        double? pack = layered.Number("totals", "pack_fraction", 0.01, 1.0, string.Empty);
        double? land = layered.Number("land", "limit_fraction", 0.01, 1.0, string.Empty);
        double? length = layered.Number("standard_error", "correlation_length_km", 1.0, 3_000.0, "km");
        double? footprint = layered.Number("standard_error", "footprint_km", 1.0, 500.0, "km");
        double? missedIce = layered.Number("standard_error", "missed_ice_km", 1.0, 1_000.0, "km");
        double? edge = layered.Number("standard_error", "edge_factor", 0.0, 10.0, string.Empty);
        double? smearing = layered.Number("standard_error", "smearing_factor", 0.0, 1.0, string.Empty);
        double? curvature = layered.Number("standard_error", "curvature_factor", 0.0, 10.0, string.Empty);
        CoastSettings? correction = CoastLoader.Load(coastal, grid, folder, faults);
        TiePointSettings? tiePoints = TiePointLoader.Load(layered, ice ?? double.NaN);
        WeatherSettings? weather = WeatherLoader.Load(layered, grid, folder, faults);
        SeasonSettings? season = SeasonLoader.LoadAnyway(own, shipped, config, grid.Hemisphere, folder, faults);
        MeltSettings? melt = MeltLoader.Load(own, shipped, grid.Hemisphere, faults);
        RegionLoader regions = new(own, config, folder);
        layered.RefuseUnknown();
        own.RefuseUnknown();
        return faults.Count == 0
            ? new(new TotalsRules(ice!.Value, pack!.Value), land!.Value, new(length!.Value * 1_000.0, footprint!.Value * 1_000.0, missedIce!.Value * 1_000.0, edge!.Value), new(smearing!.Value, curvature!.Value), correction!, tiePoints!, weather!, season!, regions, melt!)
            : throw new ConfigurationException(faults);
    }
}
