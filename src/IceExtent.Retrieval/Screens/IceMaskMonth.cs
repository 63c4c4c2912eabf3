using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>What makes a cell part of an ice mask.</summary>
/// <param name="IceFraction">A cell has ice on a day from this concentration on. Unit: 1.</param>
/// <param name="LeastDays">On so many days at least it must have had ice, 1 or more.</param>
/// <param name="LeastShare">On so large a share of its observed days at least. Unit: 1.</param>
/// <param name="MarginMeters">Cells with their centre no farther than this from such a cell belong to the mask too. Unit: m on the map.</param>
public sealed record IceMaskRules(double IceFraction, int LeastDays, double LeastShare, double MarginMeters);

/// <summary>Counts the days with ice of one calendar month, over all its years, and makes that month's ice mask of them.</summary>
/// <remarks>
/// The idea of a mask a month is [Cavalieri1999]; how it is made of a record is our own choice. Not shared between threads. Nothing
/// depends on the order of the days.
/// </remarks>
public sealed class IceMaskMonth
{
    /// <summary>No ice: the mask sets the cell to open water.</summary>
    public const byte NoIce = 0;

    /// <summary>Ice can be here.</summary>
    public const byte Ice = 1;

    /// <summary>Never observed, such as land or the polar gap: masks nothing.</summary>
    public const byte Unknown = byte.MaxValue;

    private readonly Grid grid;
    private readonly IceMaskRules rules;
    private readonly ushort[] seenDays;
    private readonly ushort[] iceDays;

    /// <summary>Starts without a day.</summary>
    /// <param name="grid">The grid of every day.</param>
    /// <param name="rules">What makes a cell part of the mask.</param>
    public IceMaskMonth(Grid grid, IceMaskRules rules)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(rules);
        (this.grid, this.rules) = (grid, rules);
        seenDays = new ushort[grid.CellCount];
        iceDays = new ushort[grid.CellCount];
    }

    /// <summary>The number of days taken.</summary>
    public int Days { get; private set; }

    /// <summary>Takes one day.</summary>
    /// <param name="totalFraction">Concentration after screens and clipping. Unit: 1. Missing: NaN. Shape: one value a cell.</param>
    /// <exception cref="ArgumentException">The plane does not fit the grid.</exception>
    /// <exception cref="InvalidOperationException">There are more days than a count can hold: 65,535, two thousand years of a month.</exception>
    public void Add(ReadOnlySpan<float> totalFraction)
    {
        if (totalFraction.Length != iceDays.Length)
        {
            throw new ArgumentException($"The day has {totalFraction.Length} cells; the grid has {iceDays.Length}.", nameof(totalFraction));
        }

        if (Days == ushort.MaxValue)
        {
            throw new InvalidOperationException("No more days can be counted.");
        }

        Days++;
        float limit = (float)rules.IceFraction;
        for (int cell = 0; cell < iceDays.Length; cell++)
        {
            seenDays[cell] += float.IsNaN(totalFraction[cell]) ? (ushort)0 : (ushort)1;
            iceDays[cell] += totalFraction[cell] >= limit ? (ushort)1 : (ushort)0;
        }
    }

    /// <summary>Makes the mask.</summary>
    /// <returns><see cref="NoIce"/>, <see cref="Ice"/> or <see cref="Unknown"/>. Shape: one value a cell.</returns>
    public byte[] Build()
    {
        bool[] held = new bool[iceDays.Length];
        for (int cell = 0; cell < held.Length; cell++)
        {
            held[cell] = iceDays[cell] >= Math.Max(1, rules.LeastDays) && iceDays[cell] >= rules.LeastShare * seenDays[cell];
        }

        byte[] mask = new byte[held.Length];
        for (int cell = 0; cell < mask.Length; cell++)
        {
            mask[cell] = seenDays[cell] == 0 ? Unknown : held[cell] ? Ice : NoIce;
        }

        Grow(held, mask);
        return mask;
    }

    // Only a cell at the rim of the ice reaches a cell without ice first.
    private void Grow(bool[] held, byte[] mask)
    {
        double radius = rules.MarginMeters / grid.Frame.CellMeters;
        int reach = (int)radius;
        for (int cell = 0; cell < held.Length; cell++)
        {
            if (!held[cell] || IsInside(held, cell))
            {
                continue;
            }

            (int row, int column) = (cell / grid.Columns, cell % grid.Columns);
            CellBox box = CellBox.Around(grid, cell, reach);
            for (int near = box.Top; near <= box.Bottom; near++)
            {
                int down = near - row;
                int width = (int)Math.Sqrt(Math.Max((radius * radius) - (down * down), 0.0));
                for (int at = Math.Max(box.Left, column - width); at <= Math.Min(box.Right, column + width); at++)
                {
                    ref byte value = ref mask[(near * grid.Columns) + at];
                    value = value == NoIce ? Ice : value;
                }
            }
        }
    }

    private bool IsInside(bool[] held, int cell)
    {
        (int row, int column) = (cell / grid.Columns, cell % grid.Columns);
        return row > 0 && row < grid.Rows - 1 && column > 0 && column < grid.Columns - 1
            && held[cell - 1] && held[cell + 1] && held[cell - grid.Columns] && held[cell + grid.Columns];
    }
}
