namespace IceExtent.Storage.Writing;

/// <summary>How real numbers become unsigned bytes: value = stored × scale + offset. An instance is always valid.</summary>
/// <remarks>Behaves as <see cref="Packing"/> does. Source: [CF] section 8.1.</remarks>
public sealed record BytePacking
{
    /// <summary>The stored byte that means missing.</summary>
    public const byte Fill = byte.MaxValue;

    /// <summary>Sets a packing up.</summary>
    /// <param name="scale">The step between two stored bytes, in the variable's unit; above zero.</param>
    /// <param name="offset">The value of stored 0, in the variable's unit.</param>
    /// <param name="lowest">The lowest value that may be stored (<c>valid_range</c>), in the variable's unit.</param>
    /// <param name="highest">The highest value that may be stored, in the variable's unit.</param>
    /// <exception cref="ArgumentException">The range is empty or does not fit into 0 to 254 steps.</exception>
    public BytePacking(double scale, double offset, double lowest, double highest)
    {
        (Scale, Offset, Lowest, Highest) = (scale, offset, lowest, highest);
        Range = StoredRange.Of(scale, offset, lowest, highest, byte.MinValue, Fill - 1);
    }

    /// <summary>For fractions from 0 to 1, in steps of 1/250.</summary>
    public static BytePacking Fraction { get; } = new(0.004, 0.0, 0.0, 1.0);

    /// <summary>The step between two stored bytes, in the variable's unit.</summary>
    public double Scale { get; }

    /// <summary>The value of stored 0, in the variable's unit.</summary>
    public double Offset { get; }

    /// <summary>The lowest value that may be stored, in the variable's unit.</summary>
    public double Lowest { get; }

    /// <summary>The highest value that may be stored, in the variable's unit.</summary>
    public double Highest { get; }

    internal StoredRange Range { get; }
}
