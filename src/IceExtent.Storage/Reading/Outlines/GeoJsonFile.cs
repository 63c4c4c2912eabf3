using System.Globalization;
using System.Text.Json;
using IceExtent.Storage.Faults;
using NetTopologySuite.Geometries;
using NetTopologySuite.IO.Converters;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>Reads GeoJSON as [RFC7946] has it: a collection of features, or one feature.</summary>
internal static class GeoJsonFile
{
    private static readonly JsonSerializerOptions Options = new() { Converters = { new GeoJsonConverterFactory() } };

    /// <summary>Reads every feature.</summary>
    /// <param name="path">The file.</param>
    /// <param name="types">The types of geometry that can be used.</param>
    /// <param name="faults">Receives every fault: IE1001, IE1501 to IE1503, IE1505, IE1506.</param>
    /// <returns>The features without faults, in the order of the file.</returns>
    public static IReadOnlyList<GeoJsonFeature> Read(string path, IReadOnlyList<string> types, ICollection<Fault> faults)
    {
        if (TextFile.Read(path, "a GeoJSON file", faults) is not { } text || Parse(text, path, faults) is not { } root)
        {
            return [];
        }

        List<GeoJsonFeature> features = [];
        int number = 0;
        foreach (JsonElement feature in Members(root, path, faults))
        {
            number++;
            if (ReadFeature(feature, string.Create(CultureInfo.InvariantCulture, $"{path}, feature {number}"), types, faults) is { } read)
            {
                features.Add(read);
            }
        }

        return features;
    }

    private static JsonElement? Parse(string text, string path, ICollection<Fault> faults)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(text);
            return document.RootElement.Clone();
        }
        catch (JsonException broken)
        {
            faults.Add(new(
                "IE1501",
                string.Create(CultureInfo.InvariantCulture, $"{path}, line {broken.LineNumber + 1}, column {broken.BytePositionInLine + 1}"),
                "text that is not JSON",
                "a GeoJSON file [RFC7946]",
                "Correct the file at that place."));
            return null;
        }
    }

    private static JsonElement[] Members(JsonElement root, string path, ICollection<Fault> faults)
    {
        string? type = TypeOf(root);
        if (type == "Feature")
        {
            return [root];
        }

        if (type != "FeatureCollection" || !root.TryGetProperty("features", out JsonElement features) || features.ValueKind != JsonValueKind.Array)
        {
            faults.Add(new(
                "IE1501", path, type is null ? "JSON without a type" : $"the type {type}{(type == "FeatureCollection" ? " without features" : string.Empty)}",
                "a FeatureCollection, or one Feature", "Save the shapes as GeoJSON features with properties."));
            return [];
        }

        if (features.GetArrayLength() == 0)
        {
            faults.Add(new("IE1502", path, "no feature", "one feature or more", "Leave the file out of the run file, or put something into it."));
        }

        return [.. features.EnumerateArray()];
    }

    private static GeoJsonFeature? ReadFeature(JsonElement feature, string where, IReadOnlyList<string> types, ICollection<Fault> faults)
    {
        int before = faults.Count;
        if (TypeOf(feature) != "Feature" || !feature.TryGetProperty("properties", out JsonElement properties) || properties.ValueKind != JsonValueKind.Object)
        {
            faults.Add(new("IE1501", where, "no feature with properties", "a Feature with properties and a geometry", "Save the shapes as GeoJSON features with properties."));
            return null;
        }

        string? name = TextOf(properties, "name");
        string named = name is { Length: > 0 and <= 60 } ? $"{where} ({name})" : where;
        if (name is null)
        {
            faults.Add(new("IE1503", where, properties.TryGetProperty("name", out _) ? "a name that is no text" : "no property name", "a text in the property name", "Give the feature a name."));
        }
        else if (PlainNames.FaultOf(name, named) is { } badName)
        {
            faults.Add(badName);
        }

        Geometry? geometry = ReadGeometry(feature, named, types, faults);
        return faults.Count > before ? null : new(named, name!, TextOf(properties, "title") ?? name!, properties, geometry!);
    }

    private static Geometry? ReadGeometry(JsonElement feature, string where, IReadOnlyList<string> types, ICollection<Fault> faults)
    {
        string? type = feature.TryGetProperty("geometry", out JsonElement geometry) ? TypeOf(geometry) : null;
        if (type is null || !types.Contains(type) || !CoordinateCheck.Knows(type))
        {
            faults.Add(new("IE1505", where, type is null ? "no geometry" : $"the geometry {type}", string.Join(", ", types), "Draw the feature as one of these."));
            return null;
        }

        if (new CoordinateCheck(where).FirstFault(geometry, type) is { } fault)
        {
            faults.Add(fault);
            return null;
        }

        return geometry.Deserialize<Geometry>(Options);
    }

    private static string? TypeOf(JsonElement element) =>
        element.ValueKind == JsonValueKind.Object ? TextOf(element, "type") : null;

    private static string? TextOf(JsonElement element, string key) =>
        element.TryGetProperty(key, out JsonElement value) && value.ValueKind == JsonValueKind.String ? value.GetString() : null;
}
