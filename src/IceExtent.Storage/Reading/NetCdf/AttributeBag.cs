using System.Runtime.InteropServices;
using System.Text;
using PureHDF;
using PureHDF.VOL.Native;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>The numbers of an attribute with the type they are stored in.</summary>
internal sealed record AttributeNumbers(StoredNumber Number, double[] Values);

/// <summary>The attributes of one variable or of a file, read when they are asked for.</summary>
internal sealed class AttributeBag
{
    // An attribute is a few numbers or words; more than this is damage.
    private const ulong MostNumbers = 10_000;

    private readonly Dictionary<string, NativeAttribute> byName = new(StringComparer.Ordinal);

    /// <summary>Takes the attributes of a variable or of a file.</summary>
    public AttributeBag(NativeObject owner)
    {
        // One pass over all of them: looking names up one by one would walk the file's index for each.
        foreach (IH5Attribute attribute in owner.Attributes())
        {
            byName.TryAdd(attribute.Name, (NativeAttribute)attribute);
        }
    }

    /// <summary>Whether an attribute is there, of whatever type.</summary>
    public bool Has(string name) => byName.ContainsKey(name);

    /// <summary>The attribute as text without trailing blanks; null where it is not there or no text.</summary>
    public string? Text(string name)
    {
        if (!byName.TryGetValue(name, out NativeAttribute? attribute)
            || attribute.Type.Class is not (H5DataTypeClass.String or H5DataTypeClass.VariableLength)
            || CountOf(attribute) == 0)
        {
            return null;
        }

        if (attribute.Type.Class == H5DataTypeClass.String && AttributeBytes.Of(attribute) is { } bytes)
        {
            ReadOnlySpan<byte> first = bytes.Span[..attribute.Type.Size];
            int end = first.IndexOf((byte)0);
            return Encoding.UTF8.GetString(end < 0 ? first : first[..end]).TrimEnd(' ');
        }

        string? text = attribute.Space.Rank == 0 ? attribute.Read<string?>() : attribute.Read<string?[]>()[0];
        return text?.TrimEnd('\0', ' ');
    }

    /// <summary>The attribute as numbers; null where it is not there or holds none.</summary>
    public AttributeNumbers? Numbers(string name)
    {
        if (!byName.TryGetValue(name, out NativeAttribute? attribute)
            || NumberTypes.Of(attribute.Type) is not { } number
            || CountOf(attribute) is not (> 0 and var count))
        {
            return null;
        }

        return new(number, StoredNumbers.ToDoubles(number, Stored(attribute, count * StoredNumbers.BytesOf(number))));
    }

    /// <summary>The first of the attribute's numbers, or null.</summary>
    public double? Number(string name) => Numbers(name)?.Values[0];

    /// <summary>The references of an attribute that lists them axis by axis; null where it is not there.</summary>
    public NativeObjectReference1[][]? References(string name) =>
        byName.TryGetValue(name, out NativeAttribute? attribute) && attribute.Type.Class == H5DataTypeClass.VariableLength
            ? attribute.Read<NativeObjectReference1[][]>()
            : null;

    private static ReadOnlySpan<byte> Stored(NativeAttribute attribute, int bytes)
    {
        if (AttributeBytes.OfNumbers(attribute) is { } reached && reached.Length >= bytes)
        {
            return reached.Span[..bytes];
        }

        byte[] stored = new byte[bytes];
        switch (attribute.Type.Size)
        {
            case 1:
                attribute.Read(stored.AsSpan());
                break;
            case 2:
                attribute.Read(MemoryMarshal.Cast<byte, ushort>(stored.AsSpan()));
                break;
            case 4:
                attribute.Read(MemoryMarshal.Cast<byte, uint>(stored.AsSpan()));
                break;
            default:
                attribute.Read(MemoryMarshal.Cast<byte, ulong>(stored.AsSpan()));
                break;
        }

        AttributeBytes.Prove(attribute);
        return stored;
    }

    private static int CountOf(NativeAttribute attribute)
    {
        if (attribute.Space.Type == H5DataspaceType.Null)
        {
            return 0;
        }

        ulong count = 1;
        foreach (ulong length in attribute.Space.Dimensions)
        {
            count = checked(count * length);
        }

        return count <= MostNumbers
            ? (int)count
            : throw new InvalidDataException($"The attribute {attribute.Name} claims {count} values.");
    }
}
