using System.Globalization;
using System.Text.Json;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>Looks through the coordinates of one GeoJSON geometry before they are made into shapes.</summary>
/// <remarks>Positions and rings as [RFC7946] sections 3.1.1 and 3.1.6; rings may run either way, heights are passed over.</remarks>
internal sealed class CoordinateCheck(string where)
{
    private const double MostLongitudeDegrees = 360.0;
    private const int LeastRingPositions = 4;
    private const int LeastLinePositions = 2;

    private static readonly Dictionary<string, int> Depths = new(StringComparer.Ordinal)
    {
        ["Point"] = 0,
        ["LineString"] = 1,
        ["MultiLineString"] = 2,
        ["Polygon"] = 2,
        ["MultiPolygon"] = 3,
    };

    private Fault? outside; // The first number that is no position.
    private bool fitsSwapped = true;

    /// <summary>The first fault of a geometry, or null.</summary>
    /// <param name="geometry">An object with a <c>type</c> and <c>coordinates</c>.</param>
    /// <param name="type">The type, one that <see cref="Knows"/>.</param>
    public Fault? FirstFault(JsonElement geometry, string type)
    {
        if (!geometry.TryGetProperty("coordinates", out JsonElement coordinates))
        {
            return Malformed("no coordinates", "a list of positions");
        }

        Fault? fault = Check(coordinates, Depths[type], type.EndsWith("Polygon", StringComparison.Ordinal), string.Empty);
        return fault ?? (outside is null || !fitsSwapped
            ? outside
            : outside with { Remedy = "The file seems to hold latitude before longitude: in GeoJSON the longitude comes first." });
    }

    /// <summary>Whether coordinates of a type can be checked.</summary>
    public static bool Knows(string type) => Depths.ContainsKey(type);

    private Fault? Check(JsonElement level, int depth, bool rings, string at)
    {
        if (depth == 0)
        {
            return CheckPosition(level, at);
        }

        if (level.ValueKind != JsonValueKind.Array || level.GetArrayLength() == 0)
        {
            return Malformed($"no list of coordinates{at}", "lists in lists of positions, none of them empty");
        }

        int number = 0;
        foreach (JsonElement inner in level.EnumerateArray())
        {
            number++;
            string part = (depth, rings) switch
            {
                (1, _) => "position",
                (2, true) => "ring",
                (2, false) => "line",
                _ => "polygon",
            };
            if (Check(inner, depth - 1, rings, string.Create(CultureInfo.InvariantCulture, $"{at}, {part} {number}")) is { } fault)
            {
                return fault;
            }
        }

        return depth > 1 ? null : rings ? CheckRing(level, at) : CheckLine(level, at);
    }

    private Fault? CheckPosition(JsonElement position, string at)
    {
        if (position.ValueKind != JsonValueKind.Array || position.GetArrayLength() < 2
            || !TryNumber(position[0], out double longitude) || !TryNumber(position[1], out double latitude))
        {
            return Malformed($"no position{at}", "two numbers: longitude and latitude in degrees");
        }

        fitsSwapped &= Math.Abs(longitude) <= 90.0;
        if (outside is null && (Math.Abs(latitude) > 90.0 || Math.Abs(longitude) > MostLongitudeDegrees))
        {
            outside = new(
                "IE1506",
                where + at,
                string.Create(CultureInfo.InvariantCulture, $"longitude {longitude}, latitude {latitude}"),
                "longitudes from -360 to 360 and latitudes from -90 to 90 degrees",
                "Give the file in longitude and latitude, in degrees.");
        }

        return null;
    }

    private Fault? CheckRing(JsonElement ring, string at)
    {
        int positions = ring.GetArrayLength();
        (JsonElement first, JsonElement last) = (ring[0], ring[positions - 1]);
        if (first[0].GetDouble() != last[0].GetDouble() || first[1].GetDouble() != last[1].GetDouble())
        {
            return Malformed(
                string.Create(CultureInfo.InvariantCulture, $"an open ring{at}: it starts at longitude {first[0].GetDouble()}, latitude {first[1].GetDouble()} and ends at {last[0].GetDouble()}, {last[1].GetDouble()}"),
                "rings whose last position is the first one again");
        }

        return positions >= LeastRingPositions
            ? null
            : Malformed(string.Create(CultureInfo.InvariantCulture, $"a ring of {positions} positions{at}"), $"{LeastRingPositions} positions or more, the first one repeated at the end");
    }

    private Fault? CheckLine(JsonElement line, string at) => line.GetArrayLength() >= LeastLinePositions
        ? null
        : Malformed($"a line of one position{at}", $"{LeastLinePositions} positions or more");

    private Fault Malformed(string found, string allowed) => new("IE1505", where, found, allowed, "Correct the geometry.");

    // Numbers too large for a double are infinite.
    private static bool TryNumber(JsonElement element, out double number)
    {
        number = double.NaN;
        return element.ValueKind == JsonValueKind.Number && element.TryGetDouble(out number) && double.IsFinite(number);
    }
}
