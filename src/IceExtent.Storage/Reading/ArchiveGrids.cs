using System.Globalization;
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

    private readonly KelvinRules rules = new(); // The rules of packing are the same for every unit.

    /// <summary>Lists the days of a period that have a file, in order.</summary>
    /// <param name="from">The first day wanted, or null.</param>
    /// <param name="to">The last day wanted, or null.</param>
    /// <exception cref="FaultException">IE3110: the method's name cannot be used.</exception>
    public IReadOnlyList<(DateOnly Day, string Path)> List(DateOnly? from, DateOnly? to)
    {
        string years = Path.GetDirectoryName(Path.GetDirectoryName(layout.GridFile(method, grid.Hemisphere, DateOnly.MinValue)))!;
        if (!Directory.Exists(years))
        {
            return [];
        }

        List<(DateOnly Day, string Path)> found = [];
        foreach (string path in Directory.EnumerateFiles(years, "*.nc", SearchOption.AllDirectories))
        {
            if (DateOnly.TryParseExact(Path.GetFileNameWithoutExtension(path), "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out DateOnly day)
                && (from is not { } first || day >= first) && (to is not { } last || day <= last)
                && path == layout.GridFile(method, grid.Hemisphere, day)) // Anything else is not the archive's.
            {
                found.Add((day, path));
            }
        }

        return [.. found.OrderBy(file => file.Day)];
    }

    /// <summary>Reads the concentration of one day.</summary>
    /// <param name="path">One of the files listed.</param>
    /// <param name="fraction">Receives one value a cell. Unit: 1. Missing: NaN.</param>
    /// <exception cref="FaultException">IE21xx: the file cannot be read, is on another grid or holds no concentration.</exception>
    public void ReadConcentration(string path, Memory<float> fraction) => HdfFile.Read(path, file =>
    {
        FileVariable variable = file.Variable(Concentration);
        GridAxes axes = GridAxes.Find(variable, grid);
        ulong[]? chunk = ChunkLimits.BytesOf(variable) is null ? null : variable.Dataset.Layout.Chunks;
        KelvinRule rule = rules.For(default, PackingAttributes.Of(variable));
        ChannelStructure structure = new(default, Concentration, axes.Shape, new GridAgreement(grid).TurnOf(variable, axes), rule, chunk);
        CellReader.Read(file, structure, 0, grid, fraction.Span);
        return true;
    });
}
