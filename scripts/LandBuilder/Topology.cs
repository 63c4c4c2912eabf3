using System.Text.Json;
using NetTopologySuite.Geometries;

namespace IceExtent.LandBuilder;

/// <summary>Decodes the polygons of a TopoJSON file.</summary>
/// <remarks>
/// Source: [TopoJSON] 1.0: arcs are shared lines; with a transform their points are whole numbers, each counted from
/// the one before; a ring is a list of arcs, and ~i means arc i backwards.
/// </remarks>
internal sealed class Topology
{
    private readonly Coordinate[][] arcs;
    private readonly JsonElement objects;

    /// <summary>Takes a parsed file.</summary>
    public Topology(JsonElement root)
    {
        objects = root.GetProperty("objects");
        bool quantized = root.TryGetProperty("transform", out JsonElement transform);
        double[] scale = quantized ? Numbers(transform.GetProperty("scale")) : [1.0, 1.0];
        double[] translate = quantized ? Numbers(transform.GetProperty("translate")) : [0.0, 0.0];
        arcs = [.. root.GetProperty("arcs").EnumerateArray().Select(arc => Decode(arc, quantized, scale, translate))];
    }

    /// <summary>The polygons of one object. x is the longitude and y the latitude, in degrees, as the file has them.</summary>
    public MultiPolygon Polygons(string name)
    {
        List<Polygon> polygons = [];
        Collect(objects.GetProperty(name), polygons);
        return GeometryFactory.Default.CreateMultiPolygon([.. polygons]);
    }

    private void Collect(JsonElement geometry, List<Polygon> polygons)
    {
        switch (geometry.GetProperty("type").GetString())
        {
            case "GeometryCollection":
                foreach (JsonElement part in geometry.GetProperty("geometries").EnumerateArray())
                {
                    Collect(part, polygons);
                }

                break;
            case "MultiPolygon":
                polygons.AddRange(geometry.GetProperty("arcs").EnumerateArray().Select(Polygon));
                break;
            case "Polygon":
                polygons.Add(Polygon(geometry.GetProperty("arcs")));
                break;
            default:
                break; // Points and lines cover nothing.
        }
    }

    private Polygon Polygon(JsonElement rings)
    {
        LinearRing[] all = [.. rings.EnumerateArray().Select(Ring)];
        return GeometryFactory.Default.CreatePolygon(all[0], all[1..]);
    }

    private LinearRing Ring(JsonElement references)
    {
        List<Coordinate> ring = [];
        foreach (JsonElement reference in references.EnumerateArray())
        {
            int index = reference.GetInt32();
            IEnumerable<Coordinate> arc = index >= 0 ? arcs[index] : arcs[~index].Reverse();
            ring.AddRange(ring.Count == 0 ? arc : arc.Skip(1)); // Each arc starts where the one before ends.
        }

        return GeometryFactory.Default.CreateLinearRing([.. ring]);
    }

    private static Coordinate[] Decode(JsonElement arc, bool quantized, double[] scale, double[] translate)
    {
        Coordinate[] points = new Coordinate[arc.GetArrayLength()];
        double x = 0.0, y = 0.0;
        int count = 0;
        foreach (JsonElement point in arc.EnumerateArray())
        {
            x = quantized ? x + point[0].GetDouble() : point[0].GetDouble();
            y = quantized ? y + point[1].GetDouble() : point[1].GetDouble();
            points[count++] = new((x * scale[0]) + translate[0], (y * scale[1]) + translate[1]);
        }

        return points;
    }

    private static double[] Numbers(JsonElement array) => [.. array.EnumerateArray().Select(number => number.GetDouble())];
}
