using System.Globalization;
using IceExtent.Grids;
using IceExtent.Scenes.Demo;
using IceExtent.Storage.Writing;

namespace IceExtent.Worker.Commands;

/// <summary>The regions and places of the demonstration, as files that people can change.</summary>
internal static class DemoAreas
{
    private const string RegionFile = "regions/tessivar-sea.geojson";
    private const string HarborFile = "places/harbors.csv";
    private const string RouteFile = "places/routes.geojson";
    private const double HarborKilometers = 60.0; // Reaches past the cell in front of the harbor to those beside it.
    private const double RouteKilometers = 40.0;

    /// <summary>What the run file says of them.</summary>
    public const string RunFileLines = $"regions = \"{RegionFile}\"\nplaces  = [\"{HarborFile}\", \"{RouteFile}\"]\n";

    /// <summary>Writes the files.</summary>
    public static void Write(string folder, string notice)
    {
        PublishedFile.WriteText(Path.Combine(folder, RegionFile), GeoJsonText.Regions(
            notice, InventedRegions.All.Select(region => (region.Key, region.Name, region.Outline()))));
        PublishedFile.WriteText(Path.Combine(folder, HarborFile), Harbors());
        PublishedFile.WriteText(Path.Combine(folder, RouteFile), GeoJsonText.Routes(
            notice, InventedRoutes.All.Select(route => (route.Key, route.Name, route.Course, RouteKilometers))));
    }

    private static string Harbors()
    {
        IEnumerable<string> lines = InventedPlaces.All.Where(place => place.Kind == PlaceKind.Harbor).Select(Line);
        return string.Join('\n', lines.Prepend("name,title,latitude,longitude,radius_km")) + "\n";
    }

    private static string Line(InventedPlace harbor)
    {
        GeoPosition at = harbor.Position;
        return string.Create(CultureInfo.InvariantCulture, $"{harbor.Key},{harbor.Name},{at.LatitudeDegrees:F4},{at.LongitudeDegrees:F4},{HarborKilometers}");
    }
}
