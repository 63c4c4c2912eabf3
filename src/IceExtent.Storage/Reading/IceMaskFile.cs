using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;

namespace IceExtent.Storage.Reading;

/// <summary>Reads where ice can be in each month of the year.</summary>
/// <remarks>
/// The file is a [CF] NetCDF-4 file with coordinates in m or km, a grid mapping and twelve planes <c>ice_possible</c>, January
/// first: 0 where ice cannot be, 1 where it can. A cell without a value masks nothing.
/// </remarks>
public static class IceMaskFile
{
    /// <summary>The name of the variable.</summary>
    public const string VariableName = "ice_possible";

    private static readonly MonthPlanes Planes = new(
        VariableName,
        $"twelve planes {VariableName} of 0 (no ice) and 1 (ice can be)",
        "Make the mask on the run's grid, for instance with iceextent ice-mask, or leave ice_mask_file out.",
        OtherGridCode: "IE2221",
        UnreadableCode: "IE2222",
        NoPlanesCode: "IE2223");

    /// <summary>Reads one file.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it must be on.</param>
    /// <returns>For each month from January whether a cell lies outside its mask. Shape: one value a cell.</returns>
    /// <exception cref="FaultException">
    /// IE2221: another grid. IE2222: not readable. IE2223: no mask in it. IE2224: not twelve months, or an empty one.
    /// </exception>
    public static bool[][] ReadOutside(string path, Grid grid) => Planes.Read(path, grid, (variable, values) =>
    {
        bool[] outside = new bool[values.Length];
        for (int cell = 0; cell < outside.Length; cell++)
        {
            outside[cell] = values[cell] switch
            {
                0f => true,
                1f or float.NaN => false,
                var other => throw Planes.NoPlanes(
                    variable, FormattableString.Invariant($"a mask of {other} in row {cell / grid.Columns}, column {cell % grid.Columns}")),
            };
        }

        return outside;
    });
}
