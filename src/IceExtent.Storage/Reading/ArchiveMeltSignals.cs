using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Reading;

/// <summary>The daily melt signals that an archive holds. Safe to use from several threads.</summary>
/// <param name="layout">Where they stand.</param>
/// <param name="grid">The grid of every file.</param>
public sealed class ArchiveMeltSignals(ArchiveLayout layout, Grid grid)
{
    private volatile bool agreed; // All files of an archive are of one kind: the first one read is looked at in full.

    /// <summary>Lists the days of a period that have a file, in order.</summary>
    /// <param name="from">The first day wanted, or null.</param>
    /// <param name="to">The last day wanted, or null.</param>
    public IReadOnlyList<(DateOnly Day, string Path)> List(DateOnly? from, DateOnly? to) =>
        ArchiveDays.List(day => layout.MeltSignalFile(grid.Hemisphere, day), from, to);

    /// <summary>Reads the stored numbers of one day.</summary>
    /// <param name="path">One of the files listed.</param>
    /// <param name="horizontalRange">Receives one number a cell: tenths of K, <see cref="Packing.Fill"/> is missing.</param>
    /// <param name="vertical19">The same.</param>
    /// <param name="vertical37">The same.</param>
    /// <exception cref="FaultException">IE21xx: the file cannot be read, is on another grid or does not hold such planes.</exception>
    /// <exception cref="ArgumentException">A plane has another size than the grid.</exception>
    public void Read(string path, Memory<short> horizontalRange, Memory<short> vertical19, Memory<short> vertical37)
    {
        if (horizontalRange.Length != grid.CellCount || vertical19.Length != grid.CellCount || vertical37.Length != grid.CellCount)
        {
            throw new ArgumentException($"Every plane must have the {grid.CellCount} cells of the grid {grid.Name}.", nameof(horizontalRange));
        }

        HdfFile.Read(path, file =>
        {
            FileVariable range = file.Variable(MeltSignalVariables.HorizontalRange), first = file.Variable(MeltSignalVariables.Vertical19);
            FileVariable second = file.Variable(MeltSignalVariables.Vertical37);
            StoredShorts.CheckPacking(range, MeltSignalVariables.RangePacking); // Each look at attributes takes time, and a file is packed as a whole.
            if (!agreed)
            {
                StoredShorts.CheckGrid(range, grid);
                StoredShorts.CheckPacking(first, MeltSignalVariables.BrightnessPacking);
                StoredShorts.CheckPacking(second, MeltSignalVariables.BrightnessPacking);
                agreed = true;
            }

            StoredShorts.Read(range, grid, horizontalRange.Span);
            StoredShorts.Read(first, grid, vertical19.Span);
            StoredShorts.Read(second, grid, vertical37.Span);
            return true;
        });
    }

    /// <summary>Turns stored numbers into K.</summary>
    /// <param name="stored">Numbers as <see cref="Read"/> gave them, of any of the three planes.</param>
    /// <param name="kelvins">Receives as many values; NaN is missing.</param>
    public static void Unpack(ReadOnlySpan<short> stored, Span<float> kelvins)
    {
        ArgumentOutOfRangeException.ThrowIfNotEqual(kelvins.Length, stored.Length);
        for (int at = 0; at < stored.Length; at++)
        {
            kelvins[at] = stored[at] == Packing.Fill ? float.NaN : stored[at] / 10f; // Divided, so that tenths become the nearest float.
        }
    }
}
