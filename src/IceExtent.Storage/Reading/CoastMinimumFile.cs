using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Reading;

/// <summary>Reads and writes the smallest monthly mean concentration of each coastal cell ([Cavalieri1999]).</summary>
/// <remarks>
/// The file is a [CF] NetCDF-4 file with coordinates in m or km, a grid mapping and a plane
/// <c>minimum_concentration</c> of numbers, packed or plain. A cell without a value counts as 0: nothing is known to be
/// feigned there.
/// </remarks>
public static class CoastMinimumFile
{
    /// <summary>The name of the plane.</summary>
    public const string VariableName = "minimum_concentration";

    private static readonly SharePlane Plane = new(
        VariableName,
        "minimum",
        $"one plane {VariableName} of fractions from 0 to 1",
        "Write the file on the run's grid, or leave minimum_file out.",
        OtherGridCode: "IE2204",
        UnreadableCode: "IE2205",
        NoPlaneCode: "IE2206");

    /// <summary>Reads one file.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it must be on.</param>
    /// <returns>One fraction a cell, none missing.</returns>
    /// <exception cref="FaultException">IE2204: another grid. IE2205: not readable. IE2206: no plane of fractions in it.</exception>
    public static float[] Read(string path, Grid grid) => Plane.Read(path, grid, missing: 0f);

    /// <summary>Writes one file beside its place, flushes it and renames it.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="grid">The grid.</param>
    /// <param name="minimumFraction">One fraction a cell; kept in steps of 0.0001. Read before the call returns, never kept.</param>
    /// <param name="attributes">Global text attributes, none empty.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: the file cannot be written.</exception>
    public static void Write(
        string path, Grid grid, ReadOnlyMemory<float> minimumFraction, IReadOnlyList<KeyValuePair<string, string>> attributes) =>
        GridFile.WriteUndated(
            path,
            grid,
            [new PackedVariable(VariableName, "smallest monthly mean concentration, cut at the caps of the coastal zones", null, [], "1", minimumFraction, Packing.Fraction)],
            attributes);
}
