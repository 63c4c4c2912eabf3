using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads run files.</summary>
internal static class RunFileLoader
{
    /// <summary>Reads and checks a run file and every file it names.</summary>
    /// <exception cref="ConfigurationException">There are faults; all of them are in it.</exception>
    public static RunSettings Load(string runFile, ConfigFolder config)
    {
        List<Fault> faults = [];
        string path = Path.GetFullPath(runFile);
        string folder = Path.GetDirectoryName(path)!;
        ConfigTable? defaults = TomlFile.Read(config.Defaults, faults);
        ConfigTable? table = TomlFile.Read(path, faults);
        if (defaults is null || table is null)
        {
            throw new ConfigurationException(faults);
        }

        ConfigScope scope = new(table, string.Empty, faults);
        string? output = scope.Text("output");
        LoadedGrid? grid = scope.Text("grid") is { } gridName
            && ConfigFolder.Resolve(scope, "grid", gridName, config.Grids, folder) is { } gridPath
                ? GridLoader.Load(gridPath, faults)
                : null;
        List<string> methods = Methods(scope);
        bool? writeGrids = scope.Flag("write_grids", required: false);
        string? notice = scope.Text("notice", required: false);
        RegionLoader regions = new(scope, config, folder);
        ConfigScope shipped = new(defaults, string.Empty, faults);
        LayeredScope layered = new(scope, shipped);
        SeasonSettings? season = grid is null ? null : SeasonLoader.Load(scope, shipped, config, grid.Grid.Hemisphere, folder, faults);
        TotalsRules? rules = Rules(layered);
        double? landLimit = layered.Number("land", "limit_fraction", 0.01, 1.0, string.Empty);
        double? errorLength = layered.Number("standard_error", "correlation_length_km", 1.0, 3_000.0, "km");
        double? footprint = layered.Number("standard_error", "footprint_km", 1.0, 500.0, "km");
        double? missedIce = layered.Number("standard_error", "missed_ice_km", 1.0, 1_000.0, "km");
        double? edge = layered.Number("standard_error", "edge_factor", 0.0, 10.0, string.Empty);
        double? smearing = layered.Number("standard_error", "smearing_factor", 0.0, 1.0, string.Empty);
        double? curvature = layered.Number("standard_error", "curvature_factor", 0.0, 10.0, string.Empty);
        int? neighbours = layered.WholeNumber("filling", "neighbours", 0, NeighbourFilling.MostNeighbours);
        DayFillingSettings? overDays = DayFillingSettings.Load(layered);
        double? rimShare = layered.Number("polar_gap", "least_rim_share", 0.01, 1.0, string.Empty);
        CoastSettings? coast = CoastLoader.Load(layered, grid?.Grid, folder, faults);
        TiePointSettings? tiePoints = TiePointLoader.Load(layered, rules?.IceFraction ?? double.NaN);
        WeatherSettings? weather = WeatherLoader.Load(layered, grid?.Grid, folder, faults);
        IceMaskRules? iceMask = WeatherLoader.IceMask(layered);
        OverlapSettings? overlap = OverlapLoader.Load(layered, rules);
        PlaceLoader places = new(scope, layered, folder);
        MeltSettings? melt = MeltLoader.Load(scope, shipped, grid?.Grid.Hemisphere ?? Hemisphere.North, faults);
        layered.RefuseUnknown();
        SourceLoader sources = new(folder, config, methods, needsFootprints: coast?.InTemperatures == true, needsSamples: tiePoints?.NeedsSamples(methods) ?? false, needsSignals: melt?.Signals ?? false);
        List<RunSource?> loaded = [.. scope.Tables("source").Select(source => sources.Load(source, grid?.Grid))];
        scope.RefuseUnknown();
        LandShare? land = grid is null ? null : Land(grid, faults);
        bool[]? ocean = landLimit is { } limit ? land?.OceanBelow(limit) : null;
        GridLand? under = ocean is null || output is null ? null : new(grid!, ocean, landLimit!.Value, Path.GetFullPath(output, folder));
        RegionSettings laid = under is null ? RegionSettings.None : regions.LayOver(under, faults);
        PlaceSettings found = under is null ? PlaceSettings.None : places.FindOn(under, faults);
        if (faults.Count > 0)
        {
            throw new ConfigurationException(faults);
        }

        return new()
        {
            RunFile = path,
            Output = Path.GetFullPath(output!, folder),
            Grid = grid!.Grid,
            ConfigPaths = [config.Defaults, grid.ConfigPath, grid.LandPath, .. coast!.MinimumPath is { } minimum ? [minimum] : Array.Empty<string>(), .. weather!.Paths, .. laid.Paths, .. found.Paths],
            Regions = laid,
            Places = found,
            Ocean = ocean!,
            Land = land!,
            Coast = coast,
            TiePoints = tiePoints!,
            Weather = weather,
            IceMask = iceMask!,
            Melt = melt!,
            Methods = methods,
            WriteGrids = writeGrids ?? true,
            Rules = rules!,
            LeastNeighbours = neighbours!.Value,
            DayFilling = overDays!.Rules,
            FillMissingDays = overDays.MissingDays,
            LeastRimShare = rimShare!.Value,
            LandLimitFraction = landLimit!.Value,
            ErrorLengths = new(errorLength!.Value * 1_000.0, footprint!.Value * 1_000.0, missedIce!.Value * 1_000.0, edge!.Value),
            Smearing = new(smearing!.Value, curvature!.Value),
            Overlap = overlap!,
            Season = season is null ? null : season with { Melt = melt!.Signals ? new(melt.Rules, season.MeltOnset) : null },
            Notice = notice,
            Sources = [.. loaded.OfType<RunSource>()],
        };
    }

    private static List<string> Methods(ConfigScope scope)
    {
        List<string> methods = [];
        foreach ((string name, ConfigPosition at) in scope.Texts("methods") ?? [])
        {
            if (!ConcentrationMethods.Names.Contains(name))
            {
                scope.UnknownName("methods", at, name, [.. ConcentrationMethods.Names]);
            }
            else if (methods.Contains(name))
            {
                scope.Faults.Add(new("IE1003", scope.Where("methods", at), $"the method {name} a second time", "each method once", "Remove one of the two."));
            }
            else
            {
                methods.Add(name);
            }
        }

        return methods;
    }

    private static TotalsRules? Rules(LayeredScope scope)
    {
        double? ice = scope.Number("totals", "ice_fraction", 0.01, 0.99, string.Empty);
        double? pack = scope.Number("totals", "pack_fraction", 0.01, 1.0, string.Empty);
        string? gap = scope.Name("polar_gap", "rule", PolarGapRules.Names);
        if (ice is null || pack is null || gap is null)
        {
            return null;
        }

        if (pack <= ice)
        {
            scope.Refuse("totals", "pack_fraction", FormattableString.Invariant($"{pack}, not above ice_fraction = {ice}"), "a fraction above ice_fraction");
            return null;
        }

        return new(ice.Value, pack.Value, PolarGapRules.Of(gap));
    }

    private static LandShare? Land(LoadedGrid grid, List<Fault> faults)
    {
        try
        {
            return LandShareFile.Read(grid.LandPath, grid.Grid);
        }
        catch (FaultException fault)
        {
            faults.Add(fault.Fault);
            return null;
        }
    }
}
