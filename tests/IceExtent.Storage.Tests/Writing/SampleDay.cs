using IceExtent.Grids;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>A day with one variable of each kind on the 25 km north grid, from a formula that other programs can repeat.</summary>
internal static class SampleDay
{
    public const string Concentration = "sea_ice_concentration";
    public const string LandShare = "land_share";
    public const string Conditions = "conditions";

    public static readonly DateOnly Day = new(1988, 2, 29);

    public static readonly IReadOnlyList<(ushort Mask, string Meaning)> Meanings =
        [(1, "land"), (2, "polar_gap"), (4, "no_observation"), (256, "no_solution"), (32_768, "last_bit")];

    /// <summary>Cell number modulo 10,050, in steps of 1e-4, missing from 10,001 on: repeats nowhere in phase with the rows.</summary>
    public static float ConcentrationAt(int cell) => cell % 10_050 > 10_000 ? float.NaN : (cell % 10_050) * 1e-4f;

    /// <summary>Cell number modulo 251, in steps of 0.004.</summary>
    public static float LandShareAt(int cell) => cell % 251 * 0.004f;

    /// <summary>Cell number, its low 16 bits.</summary>
    public static ushort ConditionsAt(int cell) => (ushort)cell;

    public static IReadOnlyList<KeyValuePair<string, string>> Attributes { get; } =
    [
        new("title", "Sea-ice concentration of one day"),
        new("comment", "Öland: letters beyond ASCII"),
    ];

    public static IReadOnlyList<GridVariable> VariablesOn(Grid grid) =>
    [
        new PackedVariable(
            Concentration, "share of the cell that is covered by sea ice", "sea_ice_area_fraction",
            [new("cell_methods", "area: mean time: mean"), new("ancillary_variables", Conditions)],
            "1", Plane(grid, ConcentrationAt), Packing.Fraction),
        new BytePackedVariable(
            LandShare, "share of the cell that is land", "land_area_fraction", [], "1", Plane(grid, LandShareAt), BytePacking.Fraction),
        new MaskVariable(
            Conditions, "why the concentration is what it is", "sea_ice_area_fraction status_flag", [], Plane(grid, ConditionsAt), Meanings),
    ];

    public static void Write(string path, Grid grid, DateOnly day) =>
        GridFile.Write(path, grid, day, VariablesOn(grid), Attributes);

    private static T[] Plane<T>(Grid grid, Func<int, T> valueAt) => [.. Enumerable.Range(0, grid.CellCount).Select(valueAt)];
}
