using System.Globalization;

namespace IceExtent.Storage.Writing;

/// <summary>A packing as the kernel needs it: in single precision, the ends counted in stored integers.</summary>
/// <param name="Offset">The value of stored 0, in the variable's unit.</param>
/// <param name="StepsPerUnit">One over the scale.</param>
/// <param name="Lowest">The lowest stored integer.</param>
/// <param name="Highest">The highest stored integer.</param>
internal readonly record struct StoredRange(float Offset, float StepsPerUnit, int Lowest, int Highest)
{
    /// <summary>Checks a packing against the integers it may use.</summary>
    /// <exception cref="ArgumentException">It does not fit.</exception>
    public static StoredRange Of(double scale, double offset, double lowest, double highest, int smallest, int largest)
    {
        double low = Math.Round((lowest - offset) / scale);
        double high = Math.Round((highest - offset) / scale);
        bool fits = scale > 0.0 && double.IsFinite(scale) && double.IsFinite(offset) && low < high && low >= smallest && high <= largest;
        return fits
            ? new((float)offset, (float)(1.0 / scale), (int)low, (int)high)
            : throw new ArgumentException(string.Create(
                CultureInfo.InvariantCulture,
                $"The range {lowest} to {highest} in steps of {scale} from {offset} does not fit into {smallest} to {largest} steps."));
    }
}
