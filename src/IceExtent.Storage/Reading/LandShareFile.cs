using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;

namespace IceExtent.Storage.Reading;

/// <summary>Reads how much of every cell is land.</summary>
/// <remarks>
/// The file is a [CF] NetCDF-4 file with coordinates in m or km, a grid mapping and a plane
/// <c>land_area_fraction</c> of numbers, packed or plain. Rows and columns may run either way and in either order. A
/// cell without a value counts as land: no ocean is known to be there.
/// </remarks>
public static class LandShareFile
{
    /// <summary>The name of the plane; also its [CF] standard name.</summary>
    public const string VariableName = "land_area_fraction";

    private static readonly SharePlane Plane = new(
        VariableName,
        "land share",
        $"one plane {VariableName} of shares from 0 (sea) to 1 (land)",
        "Write the file for this grid with scripts/build-land.sh, or name the right one as land in the grid file.",
        OtherGridCode: "IE2201",
        UnreadableCode: "IE2202",
        NoPlaneCode: "IE2203");

    /// <summary>Reads one file.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it must be on.</param>
    /// <exception cref="FaultException">IE2201: another grid. IE2202: not readable. IE2203: no plane of shares in it.</exception>
    public static LandShare Read(string path, Grid grid) => new(Plane.Read(path, grid, missing: 1f));
}
