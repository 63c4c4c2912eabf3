using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads the table [coast] of a run file.</summary>
internal static class CoastLoader
{
    private const string Table = "coast";
    private const int WidestBoxCells = 101;
    private const double MetersPerKilometer = 1_000.0;

    private static readonly string[] Corrections = ["off", "brightness", "concentration", "both"]; // In the order of the enumeration.

    /// <summary>Checks the table and reads the file it names.</summary>
    /// <returns>The settings, or null after adding faults.</returns>
    public static CoastSettings? Load(LayeredScope layered, Grid? grid, string runFolder, List<Fault> faults)
    {
        int before = faults.Count;
        string? name = layered.Name("coast", "correction", Corrections);
        string? file = layered.Text("coast", "minimum_file");
        CoastBrightnessRules? brightness = Brightness(layered);
        CoastMinimumRules? minimum = Minimum(layered);
        CoastSpillRules? spill = Spill(layered);
        int? leastDays = layered.WholeNumber("coast", "least_days_per_month", 1, 28);
        if (file is not null && name is "off" or "brightness")
        {
            layered.Refuse(Table, "minimum_file", $"a file with correction = \"{name}\"", "a file with correction = \"concentration\" or \"both\"");
        }

        if (faults.Count > before || grid is null)
        {
            return null;
        }

        string? path = file is null ? null : Path.GetFullPath(file, runFolder);
        float[]? minima = path is null ? null : Minima(path, grid, faults);
        return faults.Count > before
            ? null
            : new((CoastCorrection)Array.IndexOf(Corrections, name), brightness!, minimum!, spill!, path, minima, leastDays!.Value);
    }

    private static CoastBrightnessRules? Brightness(LayeredScope layered)
    {
        double? least = layered.Number("coast", "least_land_fraction", 0.001, 0.5, string.Empty);
        double? most = layered.Number("coast", "most_land_fraction", 0.01, 0.99, string.Empty);
        double? error = layered.Number("coast", "land_error_fraction", 0.0, 1.0, string.Empty);
        LandTemperatureRules? land = LandTemperature(layered);
        if (least is null || most is null || error is null || land is null)
        {
            return null;
        }

        if (most <= least)
        {
            layered.Refuse(Table, "most_land_fraction", FormattableString.Invariant($"{most}, not above least_land_fraction = {least}"), "a fraction above least_land_fraction");
            return null;
        }

        return new(least.Value, most.Value, error.Value, land);
    }

    private static LandTemperatureRules? LandTemperature(LayeredScope layered)
    {
        double? tile = layered.Number("coast", "land_tile_km", 1.0, 1_000.0, "km");
        double? pure = layered.Number("coast", "pure_land_fraction", 0.5, 1.0, string.Empty);
        double? search = layered.Number("coast", "land_search_km", 1.0, 2_000.0, "km");
        int? cells = layered.WholeNumber("coast", "land_cells", 1, 1_000);
        double? spread = layered.Number("coast", "land_spread_k", 0.1, 100.0, "K");
        double? growth = layered.Number("coast", "land_spread_k_per_km", 0.0, 1.0, "K/km");
        double? residual = layered.Number("coast", "fit_residual_k", 0.1, 100.0, "K");
        double? perLook = layered.Number("coast", "fit_cells_per_look", 1.0, 100.0, string.Empty);
        double? most = layered.Number("coast", "most_land_error_k", 1.0, 100.0, "K");
        return tile is null || pure is null || search is null || cells is null || spread is null
            || growth is null || residual is null || perLook is null || most is null
                ? null
                : new(
                    tile.Value * MetersPerKilometer,
                    pure.Value,
                    search.Value * MetersPerKilometer,
                    cells.Value,
                    spread.Value,
                    growth.Value / MetersPerKilometer,
                    residual.Value,
                    perLook.Value,
                    most.Value);
    }

    private static CoastMinimumRules? Minimum(LayeredScope layered)
    {
        double? shoreCap = layered.Number("coast", "shore_cap_fraction", 0.0, 1.0, string.Empty);
        double? nearShoreCap = layered.Number("coast", "near_shore_cap_fraction", 0.0, 1.0, string.Empty);
        double? offshoreCap = layered.Number("coast", "offshore_cap_fraction", 0.0, 1.0, string.Empty);
        int? shoreBox = Box(layered, "shore_box_cells", layered.WholeNumber("coast", "shore_box_cells", 3, WidestBoxCells));
        int? nearShoreBox = Box(layered, "near_shore_box_cells", layered.WholeNumber("coast", "near_shore_box_cells", 3, WidestBoxCells));
        int? offshoreBox = Box(layered, "offshore_box_cells", layered.WholeNumber("coast", "offshore_box_cells", 3, WidestBoxCells));
        double? water = layered.Number("coast", "open_water_fraction", 0.01, 0.99, string.Empty);
        int? waterCells = layered.WholeNumber("coast", "open_water_cells", 1, WidestBoxCells);
        return shoreCap is null || nearShoreCap is null || offshoreCap is null || shoreBox is null || nearShoreBox is null
            || offshoreBox is null || water is null || waterCells is null
                ? null
                : new(
                    new(shoreCap.Value, shoreBox.Value),
                    new(nearShoreCap.Value, nearShoreBox.Value),
                    new(offshoreCap.Value, offshoreBox.Value),
                    water.Value,
                    waterCells.Value);
    }

    private static CoastSpillRules? Spill(LayeredScope layered)
    {
        double? ice = layered.Number("coast", "land_ice_fraction", 0.01, 1.0, string.Empty);
        int? box = Box(layered, "land_box_cells", layered.WholeNumber("coast", "land_box_cells", 3, WidestBoxCells));
        return ice is null || box is null ? null : new(ice.Value, box.Value);
    }

    // A square round a cell has an odd side.
    private static int? Box(LayeredScope layered, string key, int? cells)
    {
        if (cells is { } side && side % 2 == 0)
        {
            layered.Refuse(Table, key, FormattableString.Invariant($"{side}, an even number"), "an odd number, so that the cell is in the middle");
            return null;
        }

        return cells;
    }

    private static float[]? Minima(string path, Grid grid, List<Fault> faults)
    {
        try
        {
            return CoastMinimumFile.Read(path, grid);
        }
        catch (FaultException fault)
        {
            faults.Add(fault.Fault);
            return null;
        }
    }
}
