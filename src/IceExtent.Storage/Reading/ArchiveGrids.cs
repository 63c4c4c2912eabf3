using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Reading;

/// <summary>The daily concentration grids that an archive holds of one method. Safe to use from several threads.</summary>
/// <param name="layout">Where they stand.</param>
/// <param name="method">The method.</param>
/// <param name="grid">The grid of every file.</param>
public sealed class ArchiveGrids(ArchiveLayout layout, string method, Grid grid)
{
    private const string Concentration = "concentration";
    private const string ConcentrationError = "concentration_se";

    private readonly GridPlaneReader planes = new(grid);

    /// <summary>Lists the days of a period that have a file, in order.</summary>
    /// <param name="from">The first day wanted, or null.</param>
    /// <param name="to">The last day wanted, or null.</param>
    /// <exception cref="FaultException">IE3110: the method's name cannot be used.</exception>
    public IReadOnlyList<(DateOnly Day, string Path)> List(DateOnly? from, DateOnly? to) =>
        ArchiveDays.List(day => layout.GridFile(method, grid.Hemisphere, day), from, to);

    /// <summary>Reads the concentration of one day.</summary>
    /// <param name="path">One of the files listed.</param>
    /// <param name="fraction">Receives one value a cell. Unit: 1. Missing: NaN.</param>
    /// <exception cref="FaultException">IE21xx: the file cannot be read, is on another grid or holds no concentration.</exception>
    public void ReadConcentration(string path, Memory<float> fraction) => HdfFile.Read(path, file =>
    {
        planes.Read(file, Concentration, fraction.Span);
        return true;
    });

    /// <summary>Reads the concentration of one day and its standard error.</summary>
    /// <param name="path">One of the files listed.</param>
    /// <param name="fraction">Receives one value a cell. Unit: 1. Missing: NaN.</param>
    /// <param name="standardError">Receives its standard error, likewise.</param>
    /// <exception cref="FaultException">IE21xx: the file cannot be read, is on another grid or lacks one of the two.</exception>
    public void ReadConcentration(string path, Memory<float> fraction, Memory<float> standardError) => HdfFile.Read(path, file =>
    {
        planes.Read(file, Concentration, fraction.Span);
        planes.Read(file, ConcentrationError, standardError.Span);
        return true;
    });
}
