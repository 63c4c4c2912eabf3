using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>Laplace's equation inside the polar gap of one grid and mask, factored. Immutable and safe to share.</summary>
/// <remarks>
/// Five-point stencil: each gap cell is the mean of its neighbours at its four sides. A side to an ocean cell outside is
/// a side of the rim and gives that cell's value; a side to land or the edge of the grid lets nothing through. A piece
/// of the gap without any rim is not part of the system and is never filled. Source: [StrongGolden2016], the harmonic
/// part of it; they add random texture, which is left out here. Days are filled by <see cref="PolarGapFilling"/>.
/// </remarks>
public sealed class PolarGapSystem
{
    private readonly int[] cells;
    private readonly double[] factor;
    private readonly int[] border;
    private readonly double[] response;
    private readonly RimSide[] sides;
    private readonly int[] rim;
    private readonly int[] sidesOfPiece;

    /// <summary>Sets up and factors the system.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="mask">Land and polar gap on it.</param>
    /// <exception cref="ArgumentException">The mask is of another grid.</exception>
    public PolarGapSystem(Grid grid, CellMask mask)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(mask);
        if (mask.Conditions.Length != grid.CellCount)
        {
            throw new ArgumentException($"The mask has {mask.Conditions.Length} cells; the grid has {grid.CellCount}.", nameof(mask));
        }

        CellCount = grid.CellCount;
        PolarGapPieces pieces = new(grid.Rows, grid.Columns, mask.Conditions);
        cells = pieces.CellsWithRim();
        int[] unknownOf = new int[grid.CellCount];
        unknownOf.AsSpan().Fill(-1);
        for (int unknown = 0; unknown < cells.Length; unknown++)
        {
            unknownOf[cells[unknown]] = unknown;
        }

        List<int> borderUnknowns = [];
        List<RimSide> rimSides = [];
        for (int unknown = 0; unknown < cells.Length; unknown++)
        {
            int before = rimSides.Count;
            foreach (int near in pieces.NeighboursOf(cells[unknown]))
            {
                if (mask.Conditions[near] == CellConditions.None)
                {
                    rimSides.Add(new(near, borderUnknowns.Count, pieces.PieceOf(cells[unknown])));
                }
            }

            if (rimSides.Count > before)
            {
                borderUnknowns.Add(unknown);
            }
        }

        (border, sides) = ([.. borderUnknowns], [.. rimSides]);
        rim = [.. rimSides.Select(side => side.RimCell).Distinct().Order()];
        sidesOfPiece = new int[pieces.Count];
        foreach (RimSide side in sides)
        {
            sidesOfPiece[side.Piece]++;
        }

        (factor, Bandwidth) = Factored(pieces, mask.Conditions, unknownOf);
        response = Response();
    }

    /// <summary>The number of cells of the grid.</summary>
    public int CellCount { get; }

    /// <summary>The gap cells that can be filled, rising.</summary>
    public ReadOnlySpan<int> Cells => cells;

    /// <summary>The ocean cells outside that touch them at a side, rising.</summary>
    public ReadOnlySpan<int> Rim => rim;

    /// <summary>The sides between gap cells and rim cells.</summary>
    internal ReadOnlySpan<RimSide> Sides => sides;

    /// <summary>The sides of the rim of each piece of the gap.</summary>
    internal ReadOnlySpan<int> SidesOfPiece => sidesOfPiece;

    /// <summary>The places in <see cref="Cells"/> of the cells that have a side on the rim.</summary>
    internal ReadOnlySpan<int> Border => border;

    /// <summary>The inverse of the matrix of the whole rim, between border cells. Shape: border by border.</summary>
    internal ReadOnlySpan<double> BorderResponse => response;

    /// <summary>The factor for the whole rim; see <see cref="BandedCholesky"/>.</summary>
    internal ReadOnlySpan<double> Factor => factor;

    /// <summary>The bandwidth of <see cref="Factor"/>.</summary>
    internal int Bandwidth { get; }

    // The matrix: on the diagonal the open sides of a cell, −1 for each side between two gap cells.
    private (double[] Factor, int Bandwidth) Factored(PolarGapPieces pieces, ReadOnlySpan<CellConditions> mask, int[] unknownOf)
    {
        int bandwidth = 0;
        for (int unknown = 0; unknown < cells.Length; unknown++)
        {
            foreach (int near in pieces.NeighboursOf(cells[unknown]))
            {
                bandwidth = Math.Max(bandwidth, unknown - (unknownOf[near] < 0 ? unknown : unknownOf[near]));
            }
        }

        double[] matrix = new double[cells.Length * (bandwidth + 1)];
        for (int unknown = 0; unknown < cells.Length; unknown++)
        {
            int diagonal = (unknown * (bandwidth + 1)) + bandwidth;
            foreach (int near in pieces.NeighboursOf(cells[unknown]))
            {
                matrix[diagonal] += mask[near] == CellConditions.Land ? 0.0 : 1.0;
                if (unknownOf[near] >= 0 && unknownOf[near] < unknown)
                {
                    matrix[diagonal - unknown + unknownOf[near]] = -1.0;
                }
            }
        }

        BandedCholesky.Factor(matrix, cells.Length, bandwidth);
        return (matrix, bandwidth);
    }

    private double[] Response()
    {
        double[] inverse = new double[border.Length * border.Length];
        double[] column = new double[cells.Length];
        for (int from = 0; from < border.Length; from++)
        {
            column.AsSpan().Clear();
            column[border[from]] = 1.0;
            BandedCholesky.Solve(factor, cells.Length, Bandwidth, column);
            for (int to = 0; to < border.Length; to++)
            {
                inverse[(from * border.Length) + to] = column[border[to]];
            }
        }

        return inverse;
    }
}

/// <summary>One side between a gap cell and an ocean cell outside the gap.</summary>
/// <param name="RimCell">The cell outside, in the grid.</param>
/// <param name="BorderCell">The cell inside, its place in <see cref="PolarGapSystem.Border"/>.</param>
/// <param name="Piece">The piece of the gap that the cell inside belongs to.</param>
internal readonly record struct RimSide(int RimCell, int BorderCell, int Piece);
