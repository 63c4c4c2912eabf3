namespace IceExtent.Retrieval;

/// <summary>The mean concentration of every cell over the days of a month.</summary>
/// <remarks>Days are added in any order that is the same each time: then the same days give the same bytes. Not shared between threads.</remarks>
/// <param name="cellCount">The number of cells.</param>
public sealed class MonthlyMean(int cellCount)
{
    private readonly double[] sums = new double[cellCount];
    private readonly int[] counts = new int[cellCount];

    /// <summary>The days added so far.</summary>
    public int Days { get; private set; }

    /// <summary>Adds one day.</summary>
    /// <param name="totalFraction">Unit: 1. Missing: NaN. Shape: one value a cell.</param>
    /// <exception cref="ArgumentException">The plane has another number of cells.</exception>
    public void Add(ReadOnlySpan<float> totalFraction)
    {
        if (totalFraction.Length != sums.Length)
        {
            throw new ArgumentException($"The day has {totalFraction.Length} cells; the month has {sums.Length}.", nameof(totalFraction));
        }

        for (int cell = 0; cell < totalFraction.Length; cell++)
        {
            if (!float.IsNaN(totalFraction[cell]))
            {
                sums[cell] += totalFraction[cell];
                counts[cell]++;
            }
        }

        Days++;
    }

    /// <summary>The means.</summary>
    /// <param name="leastDays">A cell that was seen on fewer days has none.</param>
    /// <returns>Unit: 1. Missing: NaN. Shape: one value a cell.</returns>
    public float[] Of(int leastDays)
    {
        float[] means = new float[sums.Length];
        for (int cell = 0; cell < means.Length; cell++)
        {
            means[cell] = counts[cell] >= Math.Max(leastDays, 1) ? (float)(sums[cell] / counts[cell]) : float.NaN;
        }

        return means;
    }
}
