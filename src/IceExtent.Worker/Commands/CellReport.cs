using System.Globalization;
using IceExtent.Grids;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Commands;

/// <summary>What the regions of a run file come to on its grid.</summary>
internal static class CellReport
{
    /// <summary>A region as JSON has it.</summary>
    internal sealed record Region(string Name, string Title, string RegionSet, int Cells, double AreaKm2);

    /// <summary>The regions, in the order of their names.</summary>
    public static IReadOnlyList<Region> RegionsOf(RunSettings settings) =>
        [.. settings.Regions.Regions.Select(region => new Region(
            region.Name, region.Title, region.Set, region.Cells.Count, region.AreaSquareMeters(settings.Grid) / 1e6))];

    /// <summary>Prints a line a region; nothing where there is none.</summary>
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
    }
}
