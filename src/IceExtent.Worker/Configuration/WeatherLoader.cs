using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads the tables [weather] and [ice_mask].</summary>
internal static class WeatherLoader
{
    private static readonly string[] LimitNames = ["fixed", "retuned"]; // In the order of the enumeration.

    /// <summary>Checks the table [weather] and reads the files it names.</summary>
    /// <returns>The settings, or null after adding faults.</returns>
    public static WeatherSettings? Load(LayeredScope layered, Grid? grid, string runFolder, List<Fault> faults)
    {
        int before = faults.Count;
        string? limits = layered.Name("weather", "limits", LimitNames);
        double? fraction = layered.Number("weather", "retuned_ice_fraction", 0.01, 0.50, string.Empty);
        double? screened = layered.Number("weather", "screened_error_fraction", 0.001, 0.50, string.Empty);
        double? north = layered.Number("weather", "warm_water_north_k", 270.0, 300.0, "K");
        double? south = layered.Number("weather", "warm_water_south_k", 270.0, 300.0, "K");
        string? iceMask = layered.Text("weather", "ice_mask_file");
        string? warmWater = layered.Text("weather", "warm_water_file");
        if (faults.Count > before || grid is null)
        {
            return null;
        }

        double warmKelvins = (grid.Hemisphere == Hemisphere.North ? north : south)!.Value;
        string? icePath = iceMask is null ? null : Path.GetFullPath(iceMask, runFolder);
        string? warmPath = warmWater is null ? null : Path.GetFullPath(warmWater, runFolder);
        bool[][]? outside = Months(icePath, path => IceMaskFile.ReadOutside(path, grid), faults);
        bool[][]? warm = Months(warmPath, path => SeaTemperatureFile.ReadWarmerThan(path, grid, warmKelvins), faults);
        return faults.Count > before
            ? null
            : new(
                (ScreenLimits)Array.IndexOf(LimitNames, limits),
                fraction!.Value,
                screened!.Value,
                icePath,
                warmPath,
                warmKelvins,
                (outside ?? warm)?.Select((_, month) => new MonthMask(outside?[month], warm?[month])).ToArray());
    }

    /// <summary>Checks the table [ice_mask].</summary>
    /// <returns>The rules, or null after adding faults.</returns>
    public static IceMaskRules? IceMask(LayeredScope layered)
    {
        double? ice = layered.Number("ice_mask", "ice_fraction", 0.01, 0.99, string.Empty);
        int? days = layered.WholeNumber("ice_mask", "least_days", 1, 1_000);
        double? share = layered.Number("ice_mask", "least_share", 0.0, 1.0, string.Empty);
        double? margin = layered.Number("ice_mask", "margin_km", 0.0, 1_000.0, "km");
        return ice is null || days is null || share is null || margin is null
            ? null
            : new(ice.Value, days.Value, share.Value, margin.Value * 1_000.0);
    }

    private static bool[][]? Months(string? path, Func<string, bool[][]> read, List<Fault> faults)
    {
        try
        {
            return path is null ? null : read(path);
        }
        catch (FaultException fault)
        {
            faults.Add(fault.Fault);
            return null;
        }
    }
}
