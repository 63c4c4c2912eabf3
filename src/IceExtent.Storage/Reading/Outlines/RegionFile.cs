using System.Globalization;
using IceExtent.Grids.Outlines;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>A region as it stands in a file.</summary>
/// <param name="Where">The file and the feature, for messages.</param>
/// <param name="Outline">Its shape, without faults.</param>
public sealed record DrawnRegion(string Where, RegionOutline Outline);

/// <summary>Reads sets of regions: GeoJSON polygons with a property <c>name</c> and, if wanted, <c>title</c>.</summary>
public static class RegionFile
{
    private static readonly string[] Types = ["Polygon", "MultiPolygon"];

    /// <summary>Reads every region of a file.</summary>
    /// <param name="path">The file; its name without the ending names the set.</param>
    /// <param name="faults">Receives every fault: IE1001, IE1501 to IE1503, IE1505 to IE1508.</param>
    /// <returns>The regions without faults, in the order of the file.</returns>
    public static IReadOnlyList<DrawnRegion> Read(string path, ICollection<Fault> faults)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        ArgumentNullException.ThrowIfNull(faults);
        string set = Path.GetFileNameWithoutExtension(path);
        List<DrawnRegion> regions = [];
        foreach (GeoJsonFeature feature in GeoJsonFile.Read(path, Types, faults))
        {
            if (OutlineCheck.FirstFault(feature.Geometry) is { } fault)
            {
                faults.Add(Describe(fault, feature.Where));
                continue;
            }

            regions.Add(new(feature.Where, new(feature.Name, feature.Title, set, feature.Geometry)));
        }

        return regions;
    }

    private static Fault Describe(OutlineFault fault, string where)
    {
        string at = string.Create(CultureInfo.InvariantCulture, $"{fault.What} at longitude {fault.At.LongitudeDegrees:0.######}, latitude {fault.At.LatitudeDegrees:0.######}");
        return fault.Kind switch
        {
            OutlineFaultKind.CrossesItself => new("IE1507", where, at, "rings that meet themselves only where they close", "Move a vertex, or cut the shape in two."),
            OutlineFaultKind.UnclearEdge => new("IE1508", where, at, "edges of at most 90 degrees of longitude", "Put more vertices into the edge: they say which way round the Earth it goes."),
            _ => new("IE1505", where, at, "rings round an area", "Correct the geometry."),
        };
    }
}
