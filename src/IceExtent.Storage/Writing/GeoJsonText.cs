using System.Buffers;
using System.Text;
using System.Text.Json;
using IceExtent.Grids;

namespace IceExtent.Storage.Writing;

/// <summary>Writes GeoJSON [RFC7946]: positions to a millionth of a degree, a tenth of a meter.</summary>
public static class GeoJsonText
{
    private const int Decimals = 6;

    private static readonly JsonWriterOptions Options = new() { Indented = false };

    /// <summary>A set of regions.</summary>
    /// <param name="description">What the file is, for people.</param>
    /// <param name="regions">Name, title and outline of each; the first corner is not repeated.</param>
    public static string Regions(string description, IEnumerable<(string Name, string Title, IReadOnlyList<GeoPosition> Ring)> regions) =>
        Collection(description, regions.Select(region => (
            region.Name, region.Title, (Action<Utf8JsonWriter>)(_ => { }), "Polygon", (Action<Utf8JsonWriter>)(writer => WriteRing(writer, region.Ring)))));

    /// <summary>Routes as places.</summary>
    /// <param name="description">What the file is, for people.</param>
    /// <param name="routes">Name, title, course of each, and how far round it cells belong to it, in km.</param>
    public static string Routes(string description, IEnumerable<(string Name, string Title, IReadOnlyList<GeoPosition> Course, double ReachKilometers)> routes) =>
        Collection(description, routes.Select(route => (
            route.Name,
            route.Title,
            (Action<Utf8JsonWriter>)(writer => writer.WriteNumber("reach_km", route.ReachKilometers)),
            "LineString",
            (Action<Utf8JsonWriter>)(writer => WriteLine(writer, route.Course)))));

    private static string Collection(
        string description, IEnumerable<(string Name, string Title, Action<Utf8JsonWriter> Properties, string Type, Action<Utf8JsonWriter> Coordinates)> features)
    {
        // One feature a line, so that people can read and compare.
        StringBuilder text = new();
        text.Append(Object(writer =>
        {
            writer.WriteString("type", "FeatureCollection");
            writer.WriteString("description", description);
        })[..^1]).Append(",\"features\":[\n");
        text.AppendJoin(",\n", features.Select(feature => Object(writer =>
        {
            writer.WriteString("type", "Feature");
            writer.WriteStartObject("properties");
            writer.WriteString("name", feature.Name);
            writer.WriteString("title", feature.Title);
            feature.Properties(writer);
            writer.WriteEndObject();
            writer.WriteStartObject("geometry");
            writer.WriteString("type", feature.Type);
            writer.WritePropertyName("coordinates");
            feature.Coordinates(writer);
            writer.WriteEndObject();
        })));
        return text.Append("\n]}\n").ToString();
    }

    private static string Object(Action<Utf8JsonWriter> members)
    {
        ArrayBufferWriter<byte> buffer = new();
        using (Utf8JsonWriter writer = new(buffer, Options))
        {
            writer.WriteStartObject();
            members(writer);
            writer.WriteEndObject();
        }

        return Encoding.UTF8.GetString(buffer.WrittenSpan);
    }

    private static void WriteRing(Utf8JsonWriter writer, IReadOnlyList<GeoPosition> ring)
    {
        writer.WriteStartArray();
        WriteLine(writer, [.. ring, ring[0]]);
        writer.WriteEndArray();
    }

    private static void WriteLine(Utf8JsonWriter writer, IReadOnlyList<GeoPosition> line)
    {
        writer.WriteStartArray();
        foreach (GeoPosition position in line)
        {
            writer.WriteStartArray();
            writer.WriteNumberValue(Math.Round(position.LongitudeDegrees, Decimals));
            writer.WriteNumberValue(Math.Round(position.LatitudeDegrees, Decimals));
            writer.WriteEndArray();
        }

        writer.WriteEndArray();
    }
}
