namespace IceExtent.Storage.Writing;

/// <summary>One variable of a grid file: a plane on the file's grid.</summary>
/// <param name="Name">The variable's name.</param>
/// <param name="LongName">What it is, for people.</param>
/// <param name="StandardName">The [CF] standard name, or null.</param>
/// <param name="Attributes">Further text attributes, in the order they are written.</param>
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

/// <summary>How real numbers become signed 16-bit integers: value = stored × scale + offset.</summary>
/// <param name="Scale">The step between two stored integers, in the variable's unit.</param>
/// <param name="Offset">The value of stored 0, in the variable's unit.</param>
/// <param name="Lowest">The lowest value that may be stored (<c>valid_range</c>), in the variable's unit; lower ones are stored as this.</param>
/// <param name="Highest">The highest value that may be stored, in the variable's unit; higher ones are stored as this.</param>
public sealed record Packing(double Scale, double Offset, double Lowest, double Highest)
{
    /// <summary>The stored integer that means missing.</summary>
    public const short Fill = short.MinValue;

    /// <summary>For fractions from 0 to 1, in steps of 1e-4.</summary>
    public static Packing Fraction { get; } = new(1e-4, 0.0, 0.0, 1.0);

    /// <summary>For brightness temperatures, in steps of 0.01 K, 0 to 327 K.</summary>
    public static Packing BrightnessKelvins { get; } = new(0.01, 0.0, 0.0, 327.0);
}
