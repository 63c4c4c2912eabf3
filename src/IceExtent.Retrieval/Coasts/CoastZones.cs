using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>How near to land an ocean cell lies.</summary>
public enum CoastZone
{
    /// <summary>Land, or ocean too far away to hold any of its signal.</summary>
    None,

    /// <summary>Ocean that touches a land cell, also by a corner.</summary>
    Shore,

    /// <summary>The second cell from land.</summary>
    NearShore,

    /// <summary>The third cell from land.</summary>
    Offshore,
}

/// <summary>The zone of every cell of a grid.</summary>
/// <remarks>Source: [Cavalieri1999]; the three classes are from memory (medium).</remarks>
public sealed class CoastZones
{
    private readonly CoastZone[] zones;

    /// <summary>Measures the distance to land in cells.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="ocean">Whether each cell counts as ocean; every other cell is land. Shape: one value a cell.</param>
    /// <exception cref="ArgumentException">The ocean plane does not fit the grid.</exception>
    public CoastZones(Grid grid, ReadOnlySpan<bool> ocean)
    {
        ArgumentNullException.ThrowIfNull(grid);
        if (ocean.Length != grid.CellCount)
        {
            throw new ArgumentException($"The ocean plane has {ocean.Length} cells; the grid has {grid.CellCount}.", nameof(ocean));
        }

        Grid = grid;
        zones = new CoastZone[grid.CellCount];
        for (int cell = 0; cell < zones.Length; cell++)
        {
            for (int distance = 1; ocean[cell] && distance <= (int)CoastZone.Offshore && zones[cell] == CoastZone.None; distance++)
            {
                zones[cell] = AnyLand(CellBox.Around(grid, cell, distance), grid.Columns, ocean) ? (CoastZone)distance : CoastZone.None;
            }
        }
    }

    /// <summary>The grid.</summary>
    public Grid Grid { get; }

    /// <summary>The zone of every cell. Shape: one value a cell.</summary>
    public ReadOnlySpan<CoastZone> Zones => zones;

    private static bool AnyLand(CellBox box, int columns, ReadOnlySpan<bool> ocean)
    {
        for (int row = box.Top; row <= box.Bottom; row++)
        {
            if (ocean[((row * columns) + box.Left)..((row * columns) + box.Right + 1)].Contains(false))
            {
                return true;
            }
        }

        return false;
    }
}
