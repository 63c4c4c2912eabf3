using System.Numerics;
using System.Runtime.CompilerServices;
using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Statistics;

/// <summary>Sums quantities over all pairs of cells, weighted by how alike their errors are. One a grid; safe to share.</summary>
/// <remarks>
/// The errors of two cells at distance d correlate as exp(−d² / (2 L²)). The power k of that is the same form with
/// L/√k, so one class serves all terms. Cells are gathered in square blocks of at most L/3, and the pair sum over
/// blocks is a separable convolution. Accuracy: see <c>ErrorCorrelationTests</c>, against the sum over all pairs.
/// </remarks>
public sealed class ErrorCorrelation
{
    /// <summary>The most powers of the correlation that are prepared.</summary>
    public const int MostPowers = 5;

    private const double ReachInLengths = 3.5; // exp(−3.5²/2) = 0.2 %: what lies farther off is nothing.
    private const double BlocksPerLength = 3.0;

    private readonly int cellsPerBlock;
    private readonly int[] blockOfCell;
    private readonly double[][] taps = new double[MostPowers + 1][];

    /// <summary>Prepares a grid.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="lengthMeters">The correlation length L, in m.</param>
    /// <param name="footprintMeters">The side of the squares inside which local errors are alike, in m.</param>
    /// <param name="missedIceMeters">The side of the squares inside which cells alike hide ice that was not retrieved, in m.</param>
    /// <exception cref="ArgumentOutOfRangeException">A length is not positive.</exception>
    public ErrorCorrelation(Grid grid, double lengthMeters, double footprintMeters, double missedIceMeters)
    {
        ArgumentOutOfRangeException.ThrowIfLessThanOrEqual(footprintMeters, 0.0);
        ArgumentOutOfRangeException.ThrowIfLessThanOrEqual(missedIceMeters, 0.0);
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentOutOfRangeException.ThrowIfLessThanOrEqual(lengthMeters, 0.0);
        cellsPerBlock = Math.Max(1, (int)(lengthMeters / (BlocksPerLength * grid.Frame.CellMeters)));
        BlockColumns = ((grid.Columns - 1) / cellsPerBlock) + 1;
        BlockRows = ((grid.Rows - 1) / cellsPerBlock) + 1;
        blockOfCell = new int[grid.CellCount];
        for (int cell = 0; cell < blockOfCell.Length; cell++)
        {
            blockOfCell[cell] = (cell / grid.Columns / cellsPerBlock * BlockColumns) + (cell % grid.Columns / cellsPerBlock);
        }

        (Columns, Rows) = (grid.Columns, grid.Rows);
        Footprints = Squares(footprintMeters);
        MissedIce = Squares(missedIceMeters);
        double lengthInBlocks = lengthMeters / (cellsPerBlock * grid.Frame.CellMeters);
        for (int power = 1; power <= MostPowers; power++)
        {
            taps[power] = Taps(lengthInBlocks / Math.Sqrt(power));
        }

        CellSquares Squares(double sideMeters) => new(grid.Columns, grid.Rows, Math.Max(1, (int)Math.Round(sideMeters / grid.Frame.CellMeters)));
    }

    /// <summary>The number of columns of the grid.</summary>
    public int Columns { get; }

    /// <summary>The number of rows of the grid.</summary>
    public int Rows { get; }

    /// <summary>The squares inside which local errors are alike.</summary>
    internal CellSquares Footprints { get; }

    /// <summary>The squares inside which cells alike hide ice that was not retrieved.</summary>
    internal CellSquares MissedIce { get; }

    /// <summary>The number of blocks in a row of blocks.</summary>
    public int BlockColumns { get; }

    /// <summary>The number of rows of blocks.</summary>
    public int BlockRows { get; }

    /// <summary>The number of blocks.</summary>
    public int BlockCount => BlockColumns * BlockRows;

    /// <summary>The block of each cell.</summary>
    public ReadOnlySpan<int> BlockOfCell => blockOfCell;

    /// <summary>The blocks round a region.</summary>
    internal BlockWindow WindowOf(TotalsRegion region) => region.Cells.Length == 0
        ? new(0, -1, 0, -1)
        : new(
            region.Cells[0] / Columns / cellsPerBlock,
            region.Cells[^1] / Columns / cellsPerBlock,
            region.FirstColumn / cellsPerBlock,
            region.LastColumn / cellsPerBlock);

    /// <summary>Σ over all pairs of blocks of wᵢ·wⱼ·ρᵢⱼ^power.</summary>
    /// <param name="weights">One weight a block.</param>
    /// <param name="power">1 to <see cref="MostPowers"/>.</param>
    /// <param name="scratch">At least <see cref="BlockCount"/> long; overwritten.</param>
    public double PairSum(ReadOnlySpan<double> weights, int power, Span<double> scratch) =>
        PairSum(weights, power, scratch, new(0, BlockRows - 1, 0, BlockColumns - 1));

    /// <summary>The same where all weights outside a window are zero.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    internal double PairSum(ReadOnlySpan<double> weights, int power, Span<double> scratch, in BlockWindow window)
    {
        ReadOnlySpan<double> kernel = taps[power];
        double sum = 0.0;
        for (int row = window.FirstRow; row <= window.LastRow; row++)
        {
            int start = (row * BlockColumns) + window.FirstColumn;
            ReadOnlySpan<double> from = weights.Slice(start, window.Columns);
            Span<double> blurred = scratch.Slice(start, window.Columns);
            blurred.Clear();
            if (from.IndexOfAnyExcept(0.0) < 0)
            {
                continue;
            }

            Accumulate(from, kernel[0], blurred);
            for (int shift = 1; shift < kernel.Length && shift < window.Columns; shift++)
            {
                Accumulate(from[shift..], kernel[shift], blurred[..^shift]);
                Accumulate(from[..^shift], kernel[shift], blurred[shift..]);
            }

            // The blur is symmetric, so a pair of rows counts twice from one side.
            sum += kernel[0] * OrderedSum.OfProducts(from, blurred);
            for (int apart = 1; apart < kernel.Length && apart <= row - window.FirstRow; apart++)
            {
                sum += 2.0 * kernel[apart] * OrderedSum.OfProducts(from, scratch.Slice(start - (apart * BlockColumns), window.Columns));
            }
        }

        return sum;
    }

    private static double[] Taps(double lengthInBlocks)
    {
        double[] values = new double[1 + (int)Math.Ceiling(ReachInLengths * lengthInBlocks)];
        for (int distance = 0; distance < values.Length; distance++)
        {
            values[distance] = Math.Exp(-0.5 * distance * distance / (lengthInBlocks * lengthInBlocks));
        }

        return values;
    }

    private static void Accumulate(ReadOnlySpan<double> from, double factor, Span<double> to)
    {
        int index = 0;
        for (; index <= from.Length - Vector<double>.Count; index += Vector<double>.Count)
        {
            (new Vector<double>(to[index..]) + (new Vector<double>(from[index..]) * factor)).CopyTo(to[index..]);
        }

        for (; index < from.Length; index++)
        {
            to[index] += from[index] * factor;
        }
    }
}
