using PureHDF;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Translates the number types of HDF5.</summary>
internal static class NumberTypes
{
    /// <summary>The coding of an HDF5 type, or null for one that is no number this program reads.</summary>
    public static StoredNumber? Of(IH5DataType type) => (type.Class, type.Size) switch
    {
        (H5DataTypeClass.FixedPoint, 1) => StoredNumbers.WithSign(StoredNumber.UnsignedOneByte, type.FixedPoint.IsSigned),
        (H5DataTypeClass.FixedPoint, 2) => StoredNumbers.WithSign(StoredNumber.UnsignedTwoBytes, type.FixedPoint.IsSigned),
        (H5DataTypeClass.FixedPoint, 4) => StoredNumbers.WithSign(StoredNumber.UnsignedFourBytes, type.FixedPoint.IsSigned),
        (H5DataTypeClass.FixedPoint, 8) => StoredNumbers.WithSign(StoredNumber.UnsignedEightBytes, type.FixedPoint.IsSigned),
        (H5DataTypeClass.FloatingPoint, 4) => StoredNumber.RealFourBytes,
        (H5DataTypeClass.FloatingPoint, 8) => StoredNumber.RealEightBytes,
        _ => null,
    };

    /// <summary>The type as messages name it.</summary>
    public static string NameOf(IH5DataType type) => Of(type) is { } number
        ? StoredNumbers.NameOf(number)
        : type.Class switch
        {
            H5DataTypeClass.FixedPoint => $"{type.Size * 8}-bit integer",
            H5DataTypeClass.FloatingPoint => $"{type.Size * 8}-bit real",
            H5DataTypeClass.String or H5DataTypeClass.VariableLength => "text or lists of varying length",
            H5DataTypeClass.Compound => "records of several fields",
            H5DataTypeClass.Enumerated => "an enumeration",
            _ => $"HDF5 class {type.Class}",
        };
}
