using System.Text.Json;
using NetTopologySuite.Geometries;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>One named feature of a GeoJSON file, with coordinates that are positions on the Earth.</summary>
/// <param name="Where">The file, the number of the feature from 1 and its name, for messages.</param>
/// <param name="Name">The name that names files and rows.</param>
/// <param name="Title">The name for people.</param>
/// <param name="Properties">All properties.</param>
/// <param name="Geometry">x is the longitude, y the latitude, in degrees.</param>
internal sealed record GeoJsonFeature(string Where, string Name, string Title, JsonElement Properties, Geometry Geometry);
