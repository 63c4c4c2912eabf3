namespace IceExtent.Storage.Writing;

/// <summary>Keeps values that lie below a limit below it after rounding to stored integers.</summary>
/// <remarks>
/// Without it a concentration of 0.14996 would be stored as 0.1500, and whoever counts cells of 15 % in the file would
/// count one more than the program did. It moves a value by one step at most.
/// </remarks>
internal static class KeptLimits
{
    /// <summary>Mends a packed plane.</summary>
    /// <param name="values">What was packed.</param>
    /// <param name="limits">Limits in the unit of the values.</param>
    /// <param name="range">The packing.</param>
    /// <param name="stored">The packed plane; changed in place.</param>
    public static void Apply(ReadOnlySpan<float> values, IReadOnlyList<double> limits, StoredRange range, Span<short> stored)
    {
        foreach (double limit in limits)
        {
            float exact = (float)limit;
            short at = (short)Math.Ceiling(Math.Round((limit - range.Offset) * range.StepsPerUnit, 3)); // 0.15 is 1,500 steps, not 1,501.
            for (int from = 0, hit; (hit = stored[from..].IndexOf(at)) >= 0; from += hit + 1)
            {
                if (values[from + hit] < exact)
                {
                    stored[from + hit]--;
                }
            }
        }
    }
}
