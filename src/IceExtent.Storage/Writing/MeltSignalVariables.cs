namespace IceExtent.Storage.Writing;

/// <summary>The variables of a file of melt signals, and how they are packed. They belong to no method.</summary>
public static class MeltSignalVariables
{
    /// <summary>19 GHz less 37 GHz, horizontal.</summary>
    public const string HorizontalRange = "horizontal_range";

    /// <summary>19 GHz vertical.</summary>
    public const string Vertical19 = "brightness_19v";

    /// <summary>37 GHz vertical.</summary>
    public const string Vertical37 = "brightness_37v";

    /// <summary>For the horizontal range: steps of 0.1 K, -200 to 200 K.</summary>
    public static Packing RangePacking { get; } = new(0.1, 0.0, -200.0, 200.0);

    /// <summary>For brightness temperatures: steps of 0.1 K, 0 to 400 K.</summary>
    public static Packing BrightnessPacking { get; } = new(0.1, 0.0, 0.0, 400.0);

    /// <summary>The three variables of one day.</summary>
    /// <param name="horizontalRangeKelvins">One value a cell, row-major, in K; NaN is missing.</param>
    /// <param name="vertical19Kelvins">The same.</param>
    /// <param name="vertical37Kelvins">The same.</param>
    public static IReadOnlyList<GridVariable> Of(
        ReadOnlyMemory<float> horizontalRangeKelvins, ReadOnlyMemory<float> vertical19Kelvins, ReadOnlyMemory<float> vertical37Kelvins) =>
    [
        new PackedVariable(HorizontalRange, "brightness temperature at 19 GHz less that at 37 GHz, horizontal polarization, over ice", null, [], "K", horizontalRangeKelvins, RangePacking),
        new PackedVariable(Vertical19, "brightness temperature at 19 GHz, vertical polarization, over ice", "brightness_temperature", [], "K", vertical19Kelvins, BrightnessPacking),
        new PackedVariable(Vertical37, "brightness temperature at 37 GHz, vertical polarization, over ice", "brightness_temperature", [], "K", vertical37Kelvins, BrightnessPacking),
    ];
}
