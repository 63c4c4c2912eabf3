using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;

namespace IceExtent.Storage.Reading;

/// <summary>Reads the concentration of one day from a grid file of an archive.</summary>
public static class ConcentrationGridFile
{
    /// <summary>The name of the plane.</summary>
    public const string VariableName = "concentration";

    private static readonly SharePlane Plane = new(
        VariableName,
        "concentration",
        $"one plane {VariableName} of fractions from 0 to 1",
        "Run the day again.",
        OtherGridCode: "IE2209",
        UnreadableCode: "IE2210",
        NoPlaneCode: "IE2211");

    /// <summary>Reads one file.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it must be on.</param>
    /// <returns>One fraction a cell; NaN where missing.</returns>
    /// <exception cref="FaultException">IE2209: another grid. IE2210: not readable. IE2211: no plane of fractions in it.</exception>
    public static float[] Read(string path, Grid grid) => Plane.Read(path, grid, missing: float.NaN);
}
