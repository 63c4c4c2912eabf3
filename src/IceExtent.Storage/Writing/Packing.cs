namespace IceExtent.Storage.Writing;

/// <summary>How real numbers become signed 16-bit integers: value = stored × scale + offset. An instance is always valid.</summary>
/// <remarks>
/// Missing is stored as <see cref="Fill"/>. A value outside the valid range is stored as the nearer end of it;
/// infinities too. Accuracy: within half a <see cref="Scale"/> inside the range (see <c>PlanePackerLaws</c>).
/// Source: [CF] section 8.1.
/// </remarks>
public sealed record Packing
{
    /// <summary>The stored integer that means missing.</summary>
    public const short Fill = short.MinValue;

    /// <summary>Sets a packing up.</summary>
    /// <param name="scale">The step between two stored integers, in the variable's unit; above zero.</param>
    /// <param name="offset">The value of stored 0, in the variable's unit.</param>
    /// <param name="lowest">The lowest value that may be stored (<c>valid_range</c>), in the variable's unit.</param>
    /// <param name="highest">The highest value that may be stored, in the variable's unit.</param>
    /// <exception cref="ArgumentException">The range is empty or does not fit into −32767 to 32767 steps.</exception>
    public Packing(double scale, double offset, double lowest, double highest)
    {
        (Scale, Offset, Lowest, Highest) = (scale, offset, lowest, highest);
        Range = StoredRange.Of(scale, offset, lowest, highest, Fill + 1, short.MaxValue);
    }

    /// <summary>For fractions from 0 to 1, in steps of 1e-4.</summary>
    public static Packing Fraction { get; } = new(1e-4, 0.0, 0.0, 1.0);

    /// <summary>For brightness temperatures, in steps of 0.01 K, 0 to 327 K.</summary>
    public static Packing BrightnessKelvins { get; } = new(0.01, 0.0, 0.0, 327.0);

    /// <summary>The step between two stored integers, in the variable's unit.</summary>
    public double Scale { get; }

    /// <summary>The value of stored 0, in the variable's unit.</summary>
    public double Offset { get; }

    /// <summary>The lowest value that may be stored, in the variable's unit.</summary>
    public double Lowest { get; }

    /// <summary>The highest value that may be stored, in the variable's unit.</summary>
    public double Highest { get; }

    internal StoredRange Range { get; }
}
