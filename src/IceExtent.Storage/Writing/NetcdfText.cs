using System.Collections;
using System.Runtime.CompilerServices;
using System.Text;
using PureHDF;

namespace IceExtent.Storage.Writing;

/// <summary>Text attributes of one HDF5 file, each a fixed-length string of its own length, as netCDF writes them.</summary>
/// <remarks>
/// The library has one string width for the whole file, and variable-length strings are not what a netCDF reader
/// expects of <c>CLASS</c>. It asks for a text's elements just before it asks for the width, so the enumerator
/// sets the width. That rests on version 2.2.0: the version is pinned, and a test compares what
/// <c>ncdump -h</c> shows. One instance serves one file, so files can be written side by side.
/// </remarks>
internal sealed class NetcdfText
{
    /// <summary>The options to write the file with.</summary>
    public H5WriteOptions Options { get; } = new();

    /// <summary>A scalar text attribute as long as its bytes.</summary>
    /// <param name="text">Not empty: netCDF has no text of length 0 that every reader takes.</param>
    public H5Attribute Of(string text)
    {
        ArgumentException.ThrowIfNullOrEmpty(text);
        return Of(text, Encoding.UTF8.GetByteCount(text));
    }

    /// <summary>A scalar text attribute with a NUL after its last character, as the HDF5 dimension-scale convention wants.</summary>
    /// <param name="text">Any text.</param>
    public H5Attribute TerminatedOf(string text) => Of(text, Encoding.UTF8.GetByteCount(text) + 1);

    private H5Attribute<IEnumerable<string>> Of(string text, int width) =>
        new(new SizedText(Options, text, width), dimensions: []);

    [UnsafeAccessor(UnsafeAccessorKind.Method, Name = "set_DefaultStringLength")]
    private static extern void SetWidth(H5WriteOptions options, int width);

    private sealed class SizedText(H5WriteOptions options, string text, int width) : IEnumerable<string>
    {
        public IEnumerator<string> GetEnumerator()
        {
            SetWidth(options, width);
            yield return text;
        }

        IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();
    }
}
