using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>Writes and reads run records as JSON with snake-case names.</summary>
public static class RunRecordFile
{
    private static readonly RunRecordJson Json = new(new JsonSerializerOptions(RunRecordJson.Default.Options)
    {
        // The file is read by people and programs, never put into a page: paths may keep their letters.
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    });

    /// <summary>Writes a record beside its place, flushes it and renames it.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="record">The record.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    public static void Write(string path, RunRecord record) =>
        PublishedFile.WriteText(path, JsonSerializer.Serialize(record, Json.RunRecord) + "\n");

    /// <summary>Reads a record back.</summary>
    /// <param name="path">A file that <see cref="Write"/> wrote.</param>
    /// <exception cref="FaultException">IE3130: it cannot be read, or it is of a later version of the program.</exception>
    public static RunRecord Read(string path)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        try
        {
            RunRecord? record = JsonSerializer.Deserialize(File.ReadAllBytes(path), Json.RunRecord);
            return record is { SchemaVersion: >= 1 and <= RunRecord.CurrentSchemaVersion }
                ? record
                : throw Unreadable(path, $"schema_version {record?.SchemaVersion}", null);
        }
        catch (Exception cause) when (cause is JsonException or IOException or UnauthorizedAccessException)
        {
            throw Unreadable(path, $"something that cannot be read ({cause.Message.TrimEnd('.')})", cause);
        }
    }

    private static FaultException Unreadable(string path, string found, Exception? cause) => new(
        new(
            "IE3130", path, found, $"a run record of schema_version 1 to {RunRecord.CurrentSchemaVersion}",
            "Read it with the program that wrote it, or move it away: run records are not needed for later runs."),
        cause);
}

/// <summary>How run records become JSON.</summary>
[JsonSourceGenerationOptions(
    PropertyNamingPolicy = JsonKnownNamingPolicy.SnakeCaseLower,
    WriteIndented = true,
    NewLine = "\n",
    RespectNullableAnnotations = true,
    RespectRequiredConstructorParameters = true,
    Converters = [typeof(HemisphereJson), typeof(DayOutcomeJson)])]
[JsonSerializable(typeof(RunRecord))]
internal sealed partial class RunRecordJson : JsonSerializerContext;

/// <summary>Hemispheres as <c>north</c> and <c>south</c>.</summary>
internal sealed class HemisphereJson()
    : JsonStringEnumConverter<Hemisphere>(JsonNamingPolicy.SnakeCaseLower, allowIntegerValues: false);

/// <summary>Outcomes as <c>done</c>, <c>gap</c> and <c>rejected</c>.</summary>
internal sealed class DayOutcomeJson()
    : JsonStringEnumConverter<DayOutcome>(JsonNamingPolicy.SnakeCaseLower, allowIntegerValues: false);
