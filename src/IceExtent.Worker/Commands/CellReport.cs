using System.Globalization;
using IceExtent.Grids;
using IceExtent.Statistics;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Commands;

/// <summary>What the regions and places of a run file come to on its grid.</summary>
internal static class CellReport
{
    /// <summary>A region as JSON has it.</summary>
    internal sealed record Region(string Name, string Title, string RegionSet, int Cells, double AreaKm2);

    /// <summary>A place as JSON has it.</summary>
    internal sealed record Place(string Name, string Title, int Cells, double AreaKm2, double NearestKm, double FarthestKm);

    /// <summary>The regions, in the order of their names.</summary>
    public static IReadOnlyList<Region> RegionsOf(RunSettings settings) =>
        [.. settings.Regions.Regions.Select(region => new Region(
            region.Name, region.Title, region.Set, region.Cells.Count, SquareKilometers(TotalsRegion.Part(settings.Grid, region))))];

    /// <summary>The places, in the order of their names.</summary>
    public static IReadOnlyList<Place> PlacesOf(RunSettings settings) =>
        [.. settings.Places.Places.Select(place => new Place(
            place.Name, place.Title, place.Cells.Count, SquareKilometers(TotalsRegion.Around(settings.Grid, place)), place.NearestKilometers, place.FarthestKilometers))];

    /// <summary>Prints a line a region and a line a place; nothing where there is none.</summary>
    public static void Print(RunSettings settings, CommandConsole console)
    {
        IReadOnlyList<Region> regions = RegionsOf(settings);
        if (regions.Count > 0)
        {
            console.Print($"Regions on {settings.Grid.Name}: name, ocean cells, km² of ocean, title");
        }

        foreach (Region region in regions)
        {
            console.Print(string.Create(CultureInfo.InvariantCulture, $"  {region.Name,-32} {region.Cells,7} {region.AreaKm2,9:F0}  {region.Title}"));
        }

        IReadOnlyList<Place> places = PlacesOf(settings);
        if (places.Count > 0)
        {
            console.Print($"Places on {settings.Grid.Name}: name, ocean cells, km², nearest and farthest center in km, title");
        }

        foreach (Place place in places)
        {
            console.Print(string.Create(CultureInfo.InvariantCulture, $"  {place.Name,-32} {place.Cells,7} {place.AreaKm2,9:F0} {place.NearestKm,6:F1} {place.FarthestKm,6:F1}  {place.Title}"));
        }
    }

    private static double SquareKilometers(TotalsRegion cells)
    {
        double sum = 0.0;
        foreach (double area in cells.AreasSquareMeters)
        {
            sum += area;
        }

        return sum / 1e6;
    }
}
