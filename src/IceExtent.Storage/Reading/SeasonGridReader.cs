using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;

namespace IceExtent.Storage.Reading;

/// <summary>Reads the maps of one ice year.</summary>
/// <param name="path">A file that <see cref="Writing.SeasonGridFile"/> wrote.</param>
/// <param name="grid">The grid it is on.</param>
public sealed class SeasonGridReader(string path, Grid grid)
{
    private readonly GridPlaneReader planes = new(grid);

    /// <summary>Whether the file has a variable.</summary>
    /// <exception cref="FaultException">IE21xx: the file cannot be read.</exception>
    public bool Has(string name) => HdfFile.Read(path, file => file.Find(name) is not null);

    /// <summary>Reads one map.</summary>
    /// <param name="name">The variable.</param>
    /// <param name="values">Receives one value a cell, in the variable's unit; NaN where missing.</param>
    /// <exception cref="FaultException">IE21xx: the file cannot be read, is on another grid or has no such variable.</exception>
    public void Read(string name, Memory<float> values) => HdfFile.Read(path, file =>
    {
        planes.Read(file, name, values.Span);
        return true;
    });
}
