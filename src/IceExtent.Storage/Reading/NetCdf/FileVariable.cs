using System.Runtime.InteropServices;
using PureHDF;
using PureHDF.Selections;
using PureHDF.VOL.Native;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>One variable of a file: its shape, its attributes and the way to its numbers.</summary>
internal sealed class FileVariable
{
    private const string DimensionWithoutVariable = "This is a netCDF dimension but not a netCDF variable";

    private readonly Lazy<AttributeBag> attributes;

    /// <summary>Takes a dataset as a variable; its numbers are read later.</summary>
    public FileVariable(HdfFile file, NativeDataset dataset)
    {
        (File, Dataset) = (file, dataset);
        attributes = new(() => new AttributeBag(dataset), LazyThreadSafetyMode.None);
    }

    /// <summary>The file that holds it.</summary>
    public HdfFile File { get; }

    /// <summary>The variable's name.</summary>
    public string Name => Dataset.Name;

    /// <summary>The dataset behind it.</summary>
    public NativeDataset Dataset { get; }

    /// <summary>Where messages point: the file and the variable.</summary>
    public string Where => $"{File.Path}, variable {Name}";

    /// <summary>The length of every axis; empty for a single number.</summary>
    public ulong[] Lengths => Dataset.Space.Dimensions;

    /// <summary>The variable's attributes.</summary>
    public AttributeBag Attributes => attributes.Value;

    /// <summary>How the numbers are coded, or null where they are none.</summary>
    public StoredNumber? Number => NumberTypes.Of(Dataset.Type);

    /// <summary>Whether this stands for a dimension that has a name and a length but no numbers.</summary>
    public bool IsDimensionOnly =>
        Attributes.Text("NAME")?.StartsWith(DimensionWithoutVariable, StringComparison.Ordinal) == true;

    /// <summary>All numbers of a short variable, such as a coordinate; null where it has none or more than allowed.</summary>
    public double[]? ReadAll(int most)
    {
        ulong count = 1;
        foreach (ulong length in Lengths)
        {
            count = length <= (ulong)most ? count * length : ulong.MaxValue;
            if (count > (ulong)most)
            {
                return null;
            }
        }

        if (count == 0 || Number is not { } number || IsDimensionOnly || Dataset.Space.Type == H5DataspaceType.Null)
        {
            return null;
        }

        bool isChunked = ChunkLimits.BytesOf(this) is not null;
        File.Stream.Guard.Chunks = isChunked ? (Lengths, Dataset.Layout.Chunks) : null;
        byte[] stored = new byte[(int)count * StoredNumbers.BytesOf(number)];
        Read(default, stored, null);
        File.Stream.Guard.Chunks = null;
        return StoredNumbers.ToDoubles(number, stored);
    }

    /// <summary>Reads numbers as they are stored. Other than little-endian ones end in an error of the library.</summary>
    public void Read(H5DatasetAccess access, Span<byte> stored, Selection? selection)
    {
        switch (Dataset.Type.Size)
        {
            case 1:
                Dataset.Read(access, stored, selection);
                break;
            case 2:
                Dataset.Read(access, MemoryMarshal.Cast<byte, ushort>(stored), selection);
                break;
            case 4:
                Dataset.Read(access, MemoryMarshal.Cast<byte, uint>(stored), selection);
                break;
            default:
                Dataset.Read(access, MemoryMarshal.Cast<byte, ulong>(stored), selection);
                break;
        }
    }
}
