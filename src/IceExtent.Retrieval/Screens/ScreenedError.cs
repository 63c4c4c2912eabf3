using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>The standard error of cells that a screen or a mask set to open water.</summary>
/// <remarks>
/// What such a cell may hide is bounded: the screens let all ice above a few percent pass. The scatter of unscreened open water says
/// nothing of it, since weather is what the screens take away. Own choice.
/// </remarks>
public static class ScreenedError
{
    /// <summary>The conditions that set a cell to open water.</summary>
    public const CellConditions SetToWater =
        CellConditions.WeatherGradient3719 | CellConditions.WeatherGradient2219 | CellConditions.OutsideIceMask | CellConditions.WarmWater;

    /// <summary>Writes the error of screened cells.</summary>
    /// <param name="conditions">What happened to each cell.</param>
    /// <param name="errorFraction">The standard error. Unit: 1.</param>
    /// <param name="standardErrorFraction">Receives it where a condition of <see cref="SetToWater"/> holds; NaN stays.</param>
    /// <exception cref="ArgumentException">The spans differ in length.</exception>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    public static void Apply(ReadOnlySpan<CellConditions> conditions, float errorFraction, Span<float> standardErrorFraction)
    {
        if (conditions.Length != standardErrorFraction.Length)
        {
            throw new ArgumentException("Both planes must have the same number of cells.", nameof(standardErrorFraction));
        }

        for (int cell = 0; cell < conditions.Length; cell++)
        {
            bool screened = (conditions[cell] & SetToWater) != CellConditions.None && !float.IsNaN(standardErrorFraction[cell]);
            standardErrorFraction[cell] = screened ? errorFraction : standardErrorFraction[cell];
        }
    }
}
