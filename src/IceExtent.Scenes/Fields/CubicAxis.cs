namespace IceExtent.Scenes.Fields;

/// <summary>How the columns (or rows) of a grid lie between the nodes of a coarser lattice, with cubic B-spline weights.</summary>
internal sealed class CubicAxis
{
    private readonly int[] first;
    private readonly float[] weights;

    /// <summary>Makes room for an axis.</summary>
    /// <param name="count">The number of columns (or rows) of the grid.</param>
    public CubicAxis(int count)
    {
        first = new int[count];
        weights = new float[4 * count];
    }

    /// <summary>The number of columns (or rows) of the grid.</summary>
    public int Count => first.Length;

    /// <summary>The lattice index of the first node that is used.</summary>
    public long FirstNode { get; private set; }

    /// <summary>How many nodes are used.</summary>
    public int NodeCount { get; private set; }

    /// <summary>For each column, which of the used nodes is the first of its four.</summary>
    public ReadOnlySpan<int> First => first;

    /// <summary>Four weights a column; they add up to 1.</summary>
    public ReadOnlySpan<float> Weights => weights;

    /// <summary>Places the axis.</summary>
    /// <param name="start">The position of the first column, in lattice steps.</param>
    /// <param name="step">From one column to the next, in lattice steps; may be negative.</param>
    public void Place(double start, double step)
    {
        double end = start + (step * (Count - 1));
        FirstNode = (long)Math.Floor(Math.Min(start, end)) - 1;
        NodeCount = (int)((long)Math.Floor(Math.Max(start, end)) + 3 - FirstNode);
        Span<double> four = stackalloc double[4];
        for (int index = 0; index < first.Length; index++)
        {
            double position = start + (step * index);
            double floor = Math.Floor(position);
            first[index] = (int)((long)floor - 1 - FirstNode);
            BlendWeights(position - floor, four);
            for (int node = 0; node < 4; node++)
            {
                weights[(4 * index) + node] = (float)four[node];
            }
        }
    }

    /// <summary>The weights of the cubic B-spline at a place between the second and the third of four nodes.</summary>
    /// <param name="between">0 at the second node, 1 at the third.</param>
    /// <param name="four">Receives the weights; they add up to 1.</param>
    public static void BlendWeights(double between, Span<double> four)
    {
        double rest = 1.0 - between;
        four[0] = rest * rest * rest / 6.0;
        four[1] = (4.0 + (3.0 * between * between * (between - 2.0))) / 6.0;
        four[2] = (4.0 + (3.0 * rest * rest * (rest - 2.0))) / 6.0;
        four[3] = between * between * between / 6.0;
    }
}
