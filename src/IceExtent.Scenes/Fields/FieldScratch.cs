using System.Numerics;

namespace IceExtent.Scenes.Fields;

/// <summary>Room for stretching lattices onto one grid. One thread at a time.</summary>
internal sealed class FieldScratch
{
    private float[] lattice = [];
    private float[] widened = [];

    /// <summary>Makes room for a grid of some size.</summary>
    public FieldScratch(int rows, int columns) => (Rows, Columns) = (new(rows), new(columns));

    /// <summary>The rows between the lattice's nodes.</summary>
    public CubicAxis Rows { get; }

    /// <summary>The columns between the lattice's nodes.</summary>
    public CubicAxis Columns { get; }

    /// <summary>One value a node, row-major, for the nodes that the two axes use.</summary>
    public Span<float> Lattice()
    {
        int count = Rows.NodeCount * Columns.NodeCount;
        if (lattice.Length < count)
        {
            lattice = new float[count];
        }

        return lattice.AsSpan(0, count);
    }

    /// <summary>Adds the lattice, stretched smoothly over the grid, to a plane.</summary>
    /// <param name="plane">One value a cell, row-major; may be longer.</param>
    public void AddStretched(Span<float> plane)
    {
        int width = Columns.Count;
        Widen();
        ReadOnlySpan<float> rows = widened;
        for (int row = 0; row < Rows.Count; row++)
        {
            int from = Rows.First[row] * width;
            PlaneMath.AddFour(
                plane.Slice(row * width, width),
                rows.Slice(from, width),
                rows.Slice(from + width, width),
                rows.Slice(from + (2 * width), width),
                rows.Slice(from + (3 * width), width),
                Rows.Weights.Slice(4 * row, 4));
        }
    }

    // Every lattice row at the grid's columns.
    private void Widen()
    {
        int width = Columns.Count;
        int nodes = Columns.NodeCount;
        if (widened.Length < Rows.NodeCount * width)
        {
            widened = new float[Rows.NodeCount * width];
        }

        ReadOnlySpan<int> first = Columns.First;
        ReadOnlySpan<Vector4> weights = System.Runtime.InteropServices.MemoryMarshal.Cast<float, Vector4>(Columns.Weights);
        for (int latticeRow = 0; latticeRow < Rows.NodeCount; latticeRow++)
        {
            ReadOnlySpan<float> from = lattice.AsSpan(latticeRow * nodes, nodes);
            Span<float> to = widened.AsSpan(latticeRow * width, width);
            for (int column = 0; column < to.Length; column++)
            {
                to[column] = Vector4.Dot(new Vector4(from.Slice(first[column], 4)), weights[column]);
            }
        }
    }
}
