using System.Text.Json;
using IceExtent.Grids;
using IceExtent.Grids.Outlines;
using IceExtent.Storage.Faults;
using NetTopologySuite.Geometries;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>A place as it stands in a file.</summary>
/// <param name="Where">The file and the line or feature, for messages.</param>
/// <param name="Outline">Its shape, without faults.</param>
public sealed record DrawnPlace(string Where, PlaceOutline Outline);

/// <summary>Reads places: tables of points in comma-separated text, or points and routes in GeoJSON.</summary>
public static class PlaceFile
{
    private const string RadiusKey = "radius_km";
    private const string ReachKey = "reach_km";

    private static readonly string[] Types = ["Point", "LineString", "MultiLineString"];

    /// <summary>The endings of files that can be read.</summary>
    public static IReadOnlyList<string> Endings { get; } = [".csv", ".geojson", ".json"];

    /// <summary>Reads every place of a file.</summary>
    /// <param name="path">The file; one that ends in .csv is a table.</param>
    /// <param name="faults">Receives every fault: IE1001, IE1501 to IE1503, IE1505, IE1506, IE1508, IE1512, IE1513.</param>
    /// <returns>The places without faults, in the order of the file.</returns>
    public static IReadOnlyList<DrawnPlace> Read(string path, ICollection<Fault> faults)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        ArgumentNullException.ThrowIfNull(faults);
        return path.EndsWith(Endings[0], StringComparison.OrdinalIgnoreCase)
            ? PlaceTable.Read(path, faults)
            : [.. GeoJsonFile.Read(path, Types, faults).Select(feature => Place(feature, faults)).OfType<DrawnPlace>()];
    }

    private static DrawnPlace? Place(GeoJsonFeature feature, ICollection<Fault> faults)
    {
        int before = faults.Count;
        GeoPosition[][] lines = [.. Parts(feature.Geometry).Select(part => Array.ConvertAll(part.Coordinates, at => new GeoPosition(at.Y, at.X)))];
        string key = feature.Geometry is Point ? RadiusKey : ReachKey;
        double? kilometers = feature.Properties.TryGetProperty(key, out JsonElement value) && value.ValueKind == JsonValueKind.Number ? value.GetDouble() : null;
        if (kilometers is null)
        {
            faults.Add(new("IE1513", feature.Where, $"no number in the property {key}", "a distance in km", $"Say in {key} how far round it cells belong to it."));
        }
        else if (PlaceRules.FaultOfReach(kilometers.Value, feature.Where, key) is { } reach)
        {
            faults.Add(reach);
        }

        if (lines.Select(line => PlaceRules.FaultOfEdges(line, feature.Where)).FirstOrDefault(fault => fault is not null) is { } edge)
        {
            faults.Add(edge);
        }

        return faults.Count > before ? null : new(feature.Where, new(feature.Name, feature.Title, lines, 1_000.0 * kilometers!.Value));
    }

    private static IEnumerable<Geometry> Parts(Geometry geometry) =>
        Enumerable.Range(0, geometry.NumGeometries).Select(geometry.GetGeometryN);
}
