using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Storage.Reading;

/// <summary>Where the files of a source are and how their content is named.</summary>
/// <param name="Files">Absolute paths, in ordinal order.</param>
/// <param name="Grid">The grid that the files must be on.</param>
/// <param name="Channels">The name of each channel in the files: a variable, or the channel's part of the file name.</param>
/// <param name="Raw">How headerless files are laid out, or null for NetCDF-4/HDF5.</param>
public sealed record SourceDescription(
    IReadOnlyList<string> Files,
    Grid Grid,
    IReadOnlyDictionary<Channel, string> Channels,
    RawLayout? Raw);

/// <summary>The number type of a headerless grid.</summary>
public enum RawNumber
{
    /// <summary>Signed, 16 bits.</summary>
    SignedTwoBytes,

    /// <summary>Unsigned, 16 bits.</summary>
    UnsignedTwoBytes,

    /// <summary>Signed, 32 bits.</summary>
    SignedFourBytes,

    /// <summary>IEEE 754, 32 bits.</summary>
    RealFourBytes,

    /// <summary>IEEE 754, 64 bits.</summary>
    RealEightBytes,
}

/// <summary>How a headerless grid is laid out: one day and one channel a file, row-major.</summary>
/// <param name="NamePattern">
/// The file's name with <c>{date:yyyyMMdd}</c> (any .NET date format of digits) and <c>{channel}</c> in it;
/// everything else is taken as it stands.
/// </param>
/// <param name="Number">The number type.</param>
/// <param name="BigEndian">Whether the most significant byte comes first.</param>
/// <param name="ScaleKelvins">K per unit of the stored number.</param>
/// <param name="OffsetKelvins">K added after scaling.</param>
/// <param name="MissingValue">The stored number that means missing, before scaling, or null; NaN always does.</param>
/// <param name="HeaderBytes">Bytes to skip at the start.</param>
/// <param name="TopRowFirst">Whether the first row stored is the top one.</param>
public sealed record RawLayout(
    string NamePattern,
    RawNumber Number,
    bool BigEndian,
    double ScaleKelvins,
    double OffsetKelvins,
    double? MissingValue,
    int HeaderBytes,
    bool TopRowFirst);
