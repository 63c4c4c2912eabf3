using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;

namespace IceExtent.Storage.Reading;

/// <summary>Reads the smallest monthly mean concentration of each coastal cell ([Cavalieri1999]).</summary>
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
}
