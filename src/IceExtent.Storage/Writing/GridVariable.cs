namespace IceExtent.Storage.Writing;

/// <summary>One variable of a grid file: a plane on the file's grid.</summary>
/// <param name="Name">The variable's name.</param>
/// <param name="LongName">What it is, for people.</param>
/// <param name="StandardName">The [CF] standard name, or null.</param>
/// <param name="Attributes">Further text attributes, none empty, in the order they are written.</param>
public abstract record GridVariable(
    string Name, string LongName, string? StandardName, IReadOnlyList<KeyValuePair<string, string>> Attributes);

/// <summary>A plane of real numbers stored as scaled 16-bit integers; NaN becomes <c>_FillValue</c>.</summary>
/// <param name="Name">The variable's name.</param>
/// <param name="LongName">What it is, for people.</param>
/// <param name="StandardName">The [CF] standard name, or null.</param>
/// <param name="Attributes">Further text attributes.</param>
/// <param name="Units">The [CF] unit, such as <c>1</c> or <c>K</c>.</param>
/// <param name="Values">One value a cell, row-major. Read before the call returns, never kept.</param>
/// <param name="Packing">How values become integers.</param>
public sealed record PackedVariable(
    string Name,
    string LongName,
    string? StandardName,
    IReadOnlyList<KeyValuePair<string, string>> Attributes,
    string Units,
    ReadOnlyMemory<float> Values,
    Packing Packing)
    : GridVariable(Name, LongName, StandardName, Attributes)
{
    /// <summary>Limits that readers will compare with, in the variable's unit: a value below one is never rounded up to it.</summary>
    public IReadOnlyList<double> Limits { get; init; } = [];
}

/// <summary>A plane of real numbers stored as scaled unsigned bytes; NaN becomes <c>_FillValue</c>.</summary>
/// <param name="Name">The variable's name.</param>
/// <param name="LongName">What it is, for people.</param>
/// <param name="StandardName">The [CF] standard name, or null.</param>
/// <param name="Attributes">Further text attributes.</param>
/// <param name="Units">The [CF] unit, such as <c>1</c>.</param>
/// <param name="Values">One value a cell, row-major. Read before the call returns, never kept.</param>
/// <param name="Packing">How values become bytes.</param>
public sealed record BytePackedVariable(
    string Name,
    string LongName,
    string? StandardName,
    IReadOnlyList<KeyValuePair<string, string>> Attributes,
    string Units,
    ReadOnlyMemory<float> Values,
    BytePacking Packing)
    : GridVariable(Name, LongName, StandardName, Attributes);

/// <summary>A plane of bit masks, with the meaning of each bit.</summary>
/// <param name="Name">The variable's name.</param>
/// <param name="LongName">What it is, for people.</param>
/// <param name="StandardName">The [CF] standard name, or null.</param>
/// <param name="Attributes">Further text attributes.</param>
/// <param name="Values">One mask a cell, row-major. Read before the call returns, never kept.</param>
/// <param name="Meanings">The meaning of each mask, one word with underscores.</param>
public sealed record MaskVariable(
    string Name,
    string LongName,
    string? StandardName,
    IReadOnlyList<KeyValuePair<string, string>> Attributes,
    ReadOnlyMemory<ushort> Values,
    IReadOnlyList<(ushort Mask, string Meaning)> Meanings)
    : GridVariable(Name, LongName, StandardName, Attributes);

/// <summary>A plane of single bytes that each have a meaning.</summary>
/// <param name="Name">The variable's name.</param>
/// <param name="LongName">What it is, for people.</param>
/// <param name="StandardName">The [CF] standard name, or null.</param>
/// <param name="Attributes">Further text attributes.</param>
/// <param name="Values">One value a cell, row-major; 255 is missing. Read before the call returns, never kept.</param>
/// <param name="Meanings">The meaning of each value but 255, one word with underscores.</param>
public sealed record FlagVariable(
    string Name,
    string LongName,
    string? StandardName,
    IReadOnlyList<KeyValuePair<string, string>> Attributes,
    ReadOnlyMemory<byte> Values,
    IReadOnlyList<(byte Value, string Meaning)> Meanings)
    : GridVariable(Name, LongName, StandardName, Attributes);
