namespace IceExtent.Retrieval;

/// <summary>Counts brightness temperatures, or their differences, in narrow bins: medians without sorting.</summary>
/// <remarks>Unit: K. Accuracy: half a bin, 0.05 K. Values outside -200 to 400 K count in the end bins.</remarks>
public sealed class KelvinHistogram
{
    private const float BinsPerKelvin = 10f;
    private const float LowestKelvins = -200f;
    private const int Bins = 6_000;

    private readonly int[] counts = new int[Bins];
    private int total;

    /// <summary>Forgets every value.</summary>
    public void Clear()
    {
        counts.AsSpan().Clear();
        total = 0;
    }

    /// <summary>Counts a value, in K; not NaN.</summary>
    public void Add(float kelvins)
    {
        counts[Math.Clamp((int)((kelvins - LowestKelvins) * BinsPerKelvin), 0, Bins - 1)]++;
        total++;
    }

    /// <summary>The median and the median absolute deviation from it, in K.</summary>
    /// <returns>NaN twice where nothing was counted.</returns>
    public (double MedianKelvins, double DeviationKelvins) Center()
    {
        if (total == 0)
        {
            return (double.NaN, double.NaN);
        }

        int half = (total + 1) / 2;
        int middle = 0;
        for (int below = counts[0]; below < half; below += counts[middle])
        {
            middle++;
        }

        int reach = 0;
        for (int inside = counts[middle]; inside < half;)
        {
            reach++;
            inside += middle - reach >= 0 ? counts[middle - reach] : 0;
            inside += middle + reach < Bins ? counts[middle + reach] : 0;
        }

        return (((middle + 0.5) / BinsPerKelvin) + LowestKelvins, reach / (double)BinsPerKelvin);
    }
}
