namespace IceExtent.Statistics.Seasons;

/// <summary>What one cell sent on each day of a series. All spans have one value a day, no day left out; NaN is missing.</summary>
public readonly ref struct MeltSeries
{
    /// <summary>Puts the spans together.</summary>
    /// <param name="horizontalRangeKelvins">19 GHz less 37 GHz, horizontal, in K.</param>
    /// <param name="vertical19Kelvins">19 GHz vertical, in K.</param>
    /// <param name="vertical37Kelvins">37 GHz vertical, in K.</param>
    /// <param name="iceFraction">Concentration, 0 to 1.</param>
    /// <exception cref="ArgumentException">The spans have different lengths.</exception>
    public MeltSeries(
        ReadOnlySpan<float> horizontalRangeKelvins, ReadOnlySpan<float> vertical19Kelvins, ReadOnlySpan<float> vertical37Kelvins, ReadOnlySpan<float> iceFraction)
    {
        if (vertical19Kelvins.Length != horizontalRangeKelvins.Length || vertical37Kelvins.Length != horizontalRangeKelvins.Length || iceFraction.Length != horizontalRangeKelvins.Length)
        {
            throw new ArgumentException("The four series must have the same days.", nameof(iceFraction));
        }

        HorizontalRangeKelvins = horizontalRangeKelvins;
        Vertical19Kelvins = vertical19Kelvins;
        Vertical37Kelvins = vertical37Kelvins;
        IceFraction = iceFraction;
    }

    /// <summary>19 GHz less 37 GHz, horizontal, in K.</summary>
    public ReadOnlySpan<float> HorizontalRangeKelvins { get; }

    /// <summary>19 GHz vertical, in K.</summary>
    public ReadOnlySpan<float> Vertical19Kelvins { get; }

    /// <summary>37 GHz vertical, in K.</summary>
    public ReadOnlySpan<float> Vertical37Kelvins { get; }

    /// <summary>Concentration, 0 to 1. Below the rules' least a day's temperatures tell of water and are not used.</summary>
    public ReadOnlySpan<float> IceFraction { get; }

    /// <summary>The number of days.</summary>
    public int Length => IceFraction.Length;
}
