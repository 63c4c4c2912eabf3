using System.Buffers;
using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>Estimates the brightness temperature of land in squares of the map, from one day's own temperatures.</summary>
/// <remarks>
/// Two estimates are weighted by their inverse variances. The fit: near a coast T = T_sea + a·(T_land − T_sea), a being the share
/// of land in the footprint, so a straight line through the cells of a tile and its neighbours, read off at a = 1, is land;
/// cells one tile away count e^(−1/2), two tiles away e^(−2). Pure land: the mean of the nearest cells whose footprints hold
/// nothing else. Beside a mainland both say the same; a small island has no pure land near, and ice in patches spoils the fit.
/// Own construction. Immutable and safe to use from several threads. The sums do not depend on the number of threads.
/// </remarks>
internal sealed class LandTemperature
{
    private const int FitReach = 2; // Tiles.
    private const double LeastFitCells = 8.0;
    private const double LeastShareVariance = 1e-3; // Shares that hardly differ tell nothing.

    private readonly LandTemperatureRules rules;
    private readonly int tileColumns;
    private readonly int tileRows;
    private readonly int[] wanted; // Tiles, rising.
    private readonly (int Cell, int Tile, bool Pure)[] cells;
    private readonly float[][] shares; // One array a channel, one share a cell of the list above.
    private readonly TileOffset[] fitOffsets;
    private readonly TileOffset[] pureOffsets; // The nearest first.

    /// <summary>Lays the tiles.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="coast">The cells whose land is wanted, rising.</param>
    /// <param name="tells">Whether each cell tells something about land or the sea beside it. Shape: one value a cell.</param>
    /// <param name="pure">Whether each cell holds nothing but land.</param>
    /// <param name="channelShares">The share of land in the footprint, for each channel one value a cell.</param>
    /// <param name="rules">The limits.</param>
    public LandTemperature(Grid grid, int[] coast, bool[] tells, bool[] pure, float[][] channelShares, LandTemperatureRules rules)
    {
        this.rules = rules;
        int side = Math.Max(1, (int)Math.Round(rules.TileMeters / grid.Frame.CellMeters));
        (tileColumns, tileRows) = ((grid.Columns + side - 1) / side, (grid.Rows + side - 1) / side);
        wanted = [.. coast.Select(TileOf).Distinct().Order()];
        TilesOfCoast = Array.ConvertAll(coast, cell => Array.BinarySearch(wanted, TileOf(cell)));
        fitOffsets = Offsets(FitReach, (down, right) => Math.Max(Math.Abs(down), Math.Abs(right)) <= FitReach);
        bool[] near = Near();
        cells = [.. Enumerable.Range(0, grid.CellCount)
            .Where(cell => pure[cell] || (tells[cell] && near[TileOf(cell)])) // Mixed land far inland is in no fit.
            .Select(cell => (cell, TileOf(cell), pure[cell]))];
        shares = Array.ConvertAll(channelShares, share => Array.ConvertAll(cells, cell => share[cell.Cell]));
        double reach = rules.SearchMeters / (side * grid.Frame.CellMeters);
        pureOffsets = Offsets((int)reach, (down, right) => (down * down) + (right * right) <= reach * reach);
        TileMeters = side * grid.Frame.CellMeters;

        int TileOf(int cell) => (cell / grid.Columns / side * tileColumns) + (cell % grid.Columns / side);
    }

    /// <summary>The number of temperatures that <see cref="Estimate"/> gives.</summary>
    public int Count => wanted.Length;

    /// <summary>Which of them holds for each cell of the coast.</summary>
    public int[] TilesOfCoast { get; }

    private double TileMeters { get; }

    /// <summary>Estimates the land of one channel.</summary>
    /// <param name="channel">The channel's place in the list of shares.</param>
    /// <param name="kelvins">Observed temperatures, in K; NaN is missing. Shape: one value a cell.</param>
    /// <param name="landKelvins">Receives <see cref="Count"/> temperatures, in K; NaN where nothing is known well enough.</param>
    public void Estimate(int channel, ReadOnlySpan<float> kelvins, Span<float> landKelvins)
    {
        int tileCount = tileColumns * tileRows;
        LandSums[] rented = ArrayPool<LandSums>.Shared.Rent(tileCount);
        Span<LandSums> sums = rented.AsSpan(0, tileCount);
        sums.Clear();
        ReadOnlySpan<float> share = shares[channel];
        for (int index = 0; index < cells.Length; index++)
        {
            (int cell, int tile, bool pure) = cells[index];
            if (kelvins[cell] is var value && !float.IsNaN(value))
            {
                sums[tile].Add(share[index], value, pure);
            }
        }

        for (int index = 0; index < wanted.Length; index++)
        {
            (int row, int column) = (wanted[index] / tileColumns, wanted[index] % tileColumns);
            landKelvins[index] = Weighted(Fit(sums, row, column), PureLand(sums, row, column));
        }

        ArrayPool<LandSums>.Shared.Return(rented);
    }

    private float Weighted(Estimated fit, Estimated pure)
    {
        double weight = (1.0 / fit.Variance) + (1.0 / pure.Variance);
        return weight * rules.MostErrorKelvins * rules.MostErrorKelvins >= 1.0
            ? (float)(((fit.Kelvins / fit.Variance) + (pure.Kelvins / pure.Variance)) / weight)
            : float.NaN;
    }

    private Estimated Fit(ReadOnlySpan<LandSums> sums, int row, int column)
    {
        LandSums all = default;
        foreach (TileOffset offset in fitOffsets)
        {
            if (Inside(row + offset.Down, column + offset.Right))
            {
                all.AddWeighted(sums[TileAt(row + offset.Down, column + offset.Right)], offset.FitWeight);
            }
        }

        double meanShare = all.Share / all.Count;
        double shareSquares = all.ShareSquares - (all.Share * meanShare);
        if (!(all.Count >= LeastFitCells && shareSquares >= LeastShareVariance * all.Count))
        {
            return Estimated.Unknown;
        }

        double mean = all.Kelvins / all.Count;
        double products = all.Products - (all.Share * mean);
        double slope = products / shareSquares;
        double residual = (all.KelvinSquares - (all.Kelvins * mean) - (slope * products)) / all.Count;
        double variance = Math.Max(residual, rules.LeastResidualKelvins * rules.LeastResidualKelvins) * rules.CellsPerLook;
        return new(
            mean + ((1.0 - meanShare) * slope),
            variance * ((1.0 / all.Count) + ((1.0 - meanShare) * (1.0 - meanShare) / shareSquares)));
    }

    // Tiles as near as the last one needed count too, so that the answer does not depend on their order.
    private Estimated PureLand(ReadOnlySpan<LandSums> sums, int row, int column)
    {
        (double count, double kelvins, double squares, double distances) = (0.0, 0.0, 0.0, 0.0);
        double farthest = double.PositiveInfinity;
        foreach (TileOffset offset in pureOffsets)
        {
            if (offset.DistanceTiles > farthest)
            {
                break;
            }

            if (Inside(row + offset.Down, column + offset.Right))
            {
                ref readonly LandSums tile = ref sums[TileAt(row + offset.Down, column + offset.Right)];
                count += tile.PureCount;
                kelvins += tile.PureKelvins;
                squares += tile.PureSquares;
                distances += tile.PureCount * offset.DistanceTiles;
                farthest = count >= rules.Cells ? offset.DistanceTiles : farthest;
            }
        }

        if (count == 0.0)
        {
            return Estimated.Unknown;
        }

        double mean = kelvins / count;
        double spread = rules.SpreadKelvins + (rules.SpreadKelvinsPerMeter * TileMeters * distances / count);
        return new(mean, Math.Max((squares / count) - (mean * mean), 0.0) + (spread * spread));
    }

    // The tiles whose cells enter a fit.
    private bool[] Near()
    {
        bool[] near = new bool[tileColumns * tileRows];
        foreach (int tile in wanted)
        {
            (int row, int column) = (tile / tileColumns, tile % tileColumns);
            foreach (TileOffset offset in fitOffsets)
            {
                if (Inside(row + offset.Down, column + offset.Right))
                {
                    near[TileAt(row + offset.Down, column + offset.Right)] = true;
                }
            }
        }

        return near;
    }

    private bool Inside(int row, int column) => (uint)row < (uint)tileRows && (uint)column < (uint)tileColumns;

    private int TileAt(int row, int column) => (row * tileColumns) + column;

    private static TileOffset[] Offsets(int reach, Func<int, int, bool> wanted)
    {
        IEnumerable<int> steps = Enumerable.Range(-reach, (2 * reach) + 1);
        return [.. steps
            .SelectMany(_ => steps, (down, right) => (Down: down, Right: right))
            .Where(step => wanted(step.Down, step.Right))
            .Select(step => (step.Down, step.Right, Squares: (step.Down * step.Down) + (step.Right * step.Right)))
            .OrderBy(step => step.Squares)
            .Select(step => new TileOffset(step.Down, step.Right, Math.Sqrt(step.Squares), Math.Exp(-0.5 * step.Squares)))];
    }

    private readonly record struct TileOffset(int Down, int Right, double DistanceTiles, double FitWeight);

    private readonly record struct Estimated(double Kelvins, double Variance)
    {
        public static Estimated Unknown => new(0.0, double.PositiveInfinity);
    }
}
