using IceExtent.Retrieval;

namespace IceExtent.Worker.Configuration;

/// <summary>Where the limits of the gradient-ratio screens come from.</summary>
internal enum ScreenLimits
{
    /// <summary>From the sensor's file.</summary>
    Fixed,

    /// <summary>From the pure surfaces, so that they take away little ice.</summary>
    Retuned,
}

/// <summary>What a run does about weather that looks like ice.</summary>
/// <param name="Limits">Where the limits of the screens come from.</param>
/// <param name="RetunedIceFraction">The largest concentration that retuned limits may remove. Unit: 1.</param>
/// <param name="ScreenedErrorFraction">The standard error of a cell that a screen or a mask set to open water. Unit: 1.</param>
/// <param name="IceMaskPath">The file of the ice mask, absolute, or null.</param>
/// <param name="WarmWaterPath">The file of sea-surface temperatures, absolute, or null.</param>
/// <param name="WarmWaterKelvins">A sea warmer than this has no ice. Unit: K.</param>
/// <param name="Masks">Where ice cannot be in each month from January, or null where there is no file.</param>
internal sealed record WeatherSettings(
    ScreenLimits Limits,
    double RetunedIceFraction,
    double ScreenedErrorFraction,
    string? IceMaskPath,
    string? WarmWaterPath,
    double WarmWaterKelvins,
    IReadOnlyList<MonthMask>? Masks)
{
    /// <summary>The files that decide numbers.</summary>
    public IEnumerable<string> Paths => new[] { IceMaskPath, WarmWaterPath }.OfType<string>();

    /// <summary>What was chosen, in words that also tell one choice from every other.</summary>
    public string Text => string.Join("; ", Choices());

    /// <summary>The limits for pure surfaces: a sensor's fixed ones, or those of a day.</summary>
    public WeatherScreens ScreensFor(HemisphereTuning tuning) =>
        Limits == ScreenLimits.Retuned ? ScreenRetuning.ScreensFor(tuning, RetunedIceFraction) : tuning.Screens;

    /// <summary>Where ice cannot be on a day, or null.</summary>
    public MonthMask? MaskOf(DateOnly day) => Masks?[day.Month - 1];

    private IEnumerable<string> Choices()
    {
        yield return FormattableString.Invariant($"standard error of screened cells {ScreenedErrorFraction:R}");
        yield return Limits == ScreenLimits.Retuned ? FormattableString.Invariant($"limits retuned to {RetunedIceFraction:R} of ice") : "limits fixed";
        if (IceMaskPath is not null)
        {
            yield return "ice mask";
        }

        if (WarmWaterPath is not null)
        {
            yield return FormattableString.Invariant($"no ice in water above {WarmWaterKelvins:R} K");
        }
    }
}
