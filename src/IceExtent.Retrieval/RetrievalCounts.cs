namespace IceExtent.Retrieval;

/// <summary>What happened to the ocean cells of one day in one method.</summary>
/// <param name="OutOfRange">Brightness temperatures made missing, land included: they tell of the sensor, not of the ice.</param>
/// <param name="Gradient3719">Cells set to open water by the 37/19 screen.</param>
/// <param name="Gradient2219">Cells set to open water by the 22/19 screen.</param>
/// <param name="ClippedBelow">Concentrations raised to 0.</param>
/// <param name="ClippedAbove">Concentrations lowered to 1.</param>
/// <param name="NoObservation">Cells without a channel the method needs.</param>
/// <param name="NoSolution">Cells whose temperatures the method cannot explain.</param>
/// <param name="CoastCorrected">Cells that the coast correction changed.</param>
/// <param name="OutsideIceMask">Cells with ice left by the screens that lie outside the month's ice mask.</param>
/// <param name="WarmWater">Cells with ice left by the screens in a sea that is too warm in the month.</param>
public readonly record struct RetrievalCounts(
    int OutOfRange,
    int Gradient3719,
    int Gradient2219,
    int ClippedBelow,
    int ClippedAbove,
    int NoObservation,
    int NoSolution,
    int CoastCorrected = 0,
    int OutsideIceMask = 0,
    int WarmWater = 0)
{
    /// <summary>Adds count by count.</summary>
    public static RetrievalCounts operator +(RetrievalCounts left, RetrievalCounts right) => left.Add(right);

    /// <summary>Adds count by count.</summary>
    public RetrievalCounts Add(RetrievalCounts other) => new(
        OutOfRange + other.OutOfRange,
        Gradient3719 + other.Gradient3719,
        Gradient2219 + other.Gradient2219,
        ClippedBelow + other.ClippedBelow,
        ClippedAbove + other.ClippedAbove,
        NoObservation + other.NoObservation,
        NoSolution + other.NoSolution,
        CoastCorrected + other.CoastCorrected,
        OutsideIceMask + other.OutsideIceMask,
        WarmWater + other.WarmWater);
}
