using PureHDF;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Keeps a damaged shape from asking for memory that no honest file needs.</summary>
internal static class ChunkLimits
{
    // Deflate cannot shrink more than 1032 to 1; no other filter that is read here shrinks more.
    private const long MostInflation = 1032;
    private const long AlwaysAllowed = 1 << 22;
    private const long NeverAllowed = 1 << 30;

    /// <summary>The bytes of one chunk of a variable, or null where it is not stored in chunks.</summary>
    /// <exception cref="InvalidDataException">The chunks do not fit the variable or are larger than the file can fill.</exception>
    /// <exception cref="Faults.FaultException">IE2106: the numbers stand in other files.</exception>
    public static long? BytesOf(FileVariable variable)
    {
        switch (variable.Dataset.Layout.Class)
        {
            case H5DataLayoutClass.Chunked:
                break;
            case H5DataLayoutClass.VirtualStorage:
                throw NetCdfFaults.Type(variable, "a view of numbers in other files");
            default:
                return null;
        }

        ulong[] chunk = variable.Dataset.Layout.Chunks;
        if (chunk.Length != variable.Lengths.Length)
        {
            throw new InvalidDataException("The chunks have another number of axes than the variable.");
        }

        long most = Math.Clamp(variable.File.Stream.Length * MostInflation, AlwaysAllowed, NeverAllowed);
        long bytes = variable.Dataset.Type.Size;
        foreach (ulong length in chunk)
        {
            bytes = length >= 1 && length <= (ulong)(most / bytes)
                ? bytes * (long)length
                : throw new InvalidDataException("The chunks are larger than the file can fill, or empty.");
        }

        return bytes;
    }
}
