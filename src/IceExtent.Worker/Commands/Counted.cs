using System.Globalization;

namespace IceExtent.Worker.Commands;

/// <summary>Numbers with their nouns.</summary>
internal static class Counted
{
    public static string Days(int count) => Of(count, "day");

    public static string Years(int count) => Of(count, "ice year");

    public static string Of(int count, string noun) => string.Create(CultureInfo.InvariantCulture, $"{count} {noun}{(count == 1 ? string.Empty : "s")}");
}
