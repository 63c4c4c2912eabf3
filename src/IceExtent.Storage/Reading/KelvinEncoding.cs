namespace IceExtent.Storage.Reading;

/// <summary>What a stored number means in K, and which stored numbers mean missing.</summary>
/// <param name="Number">How the number is coded.</param>
/// <param name="Scale">K per unit of the stored number; finite and not zero.</param>
/// <param name="Offset">K added after scaling; finite.</param>
internal sealed record KelvinEncoding(StoredNumber Number, double Scale, double Offset)
{
    /// <summary>Stored numbers below this are missing. Infinities are missing unless a file says otherwise.</summary>
    public double Lowest { get; init; } = double.MinValue;

    /// <summary>Stored numbers above this are missing.</summary>
    public double Highest { get; init; } = double.MaxValue;

    /// <summary>Stored numbers that mean missing; NaN always does and is not among them.</summary>
    public double[] Missing { get; init; } = [];

    /// <summary>The brightness temperature of a stored number, in K; NaN where it means missing.</summary>
    /// <remarks>Scaled in double precision and rounded once, so that tenths of a kelvin become the nearest float.</remarks>
    public float ToKelvins(double stored) =>
        stored >= Lowest && stored <= Highest && !Missing.AsSpan().Contains(stored)
            ? (float)((stored * Scale) + Offset)
            : float.NaN;

    /// <summary>Whether two encodings give the same kelvins for every stored number.</summary>
    public bool Equals(KelvinEncoding? other) =>
        other is not null
        && Number == other.Number
        && Scale.Equals(other.Scale)
        && Offset.Equals(other.Offset)
        && Lowest.Equals(other.Lowest)
        && Highest.Equals(other.Highest)
        && Missing.AsSpan().SequenceEqual(other.Missing);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(Number, Scale, Offset, Lowest, Highest, Missing.Length);
}
