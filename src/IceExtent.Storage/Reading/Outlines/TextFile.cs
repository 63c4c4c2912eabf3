using System.Text;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>Reads small text files whole.</summary>
internal static class TextFile
{
    private static readonly UTF8Encoding Strict = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>The text of a file in UTF-8, without a byte-order mark.</summary>
    /// <param name="path">The file.</param>
    /// <param name="kind">What it should be, such as <c>a GeoJSON file</c>.</param>
    /// <param name="faults">Receives IE1001.</param>
    /// <returns>The text, or null after adding a fault.</returns>
    public static string? Read(string path, string kind, ICollection<Fault> faults)
    {
        string found = "a folder";
        try
        {
            if (!Directory.Exists(path))
            {
                string text = Strict.GetString(File.ReadAllBytes(path));
                return text.StartsWith('\uFEFF') ? text[1..] : text;
            }
        }
        catch (ArgumentException)
        {
            found = "bytes that are not UTF-8";
        }
        catch (Exception cause) when (cause is IOException or UnauthorizedAccessException or NotSupportedException)
        {
            found = $"a file that cannot be read ({cause.Message.TrimEnd('.')})";
        }

        faults.Add(new("IE1001", path, found, $"{kind} in UTF-8", "Check the path, the permissions and the file."));
        return null;
    }
}
