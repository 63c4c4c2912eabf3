using System.Text.Json;

namespace IceExtent.Worker.Commands;

/// <summary>Answers of commands as JSON: indented, keys in snake_case.</summary>
internal static class JsonText
{
    private static readonly JsonSerializerOptions Indented = new() { WriteIndented = true, PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower };

    public static string Of<T>(T answer) => JsonSerializer.Serialize(answer, Indented);
}
