namespace IceExtent.Retrieval;

/// <summary>How tie points follow the samples. Values and sources: config/defaults.toml, [tie_points].</summary>
/// <param name="Samples">What a sample is.</param>
/// <param name="DaysBehind">How many days before a day give samples for it.</param>
/// <param name="DaysAhead">How many days after it.</param>
/// <param name="LeastSamples">With fewer samples of a surface in the window its fixed tie points stand.</param>
/// <param name="LeastDays">With samples of it on fewer days in the window its fixed tie points stand.</param>
/// <param name="LeastElongation">
/// The ice line takes its direction from the samples where their standard deviation along it is at least so many times the one across it,
/// else from the fixed tie points. Unit: 1.
/// </param>
/// <param name="Blend">Where self-tuning changes its projection.</param>
public sealed record TuningRules(
    SampleRules Samples,
    int DaysBehind,
    int DaysAhead,
    int LeastSamples,
    int LeastDays,
    double LeastElongation,
    ProjectionBlend Blend)
{
    /// <summary>Whether a surface has samples enough.</summary>
    /// <param name="days">Its samples, one entry a day that has any.</param>
    public bool Suffice(IReadOnlyList<SurfaceMoments> days)
    {
        ArgumentNullException.ThrowIfNull(days);
        return days.Count >= LeastDays && days.Sum(day => day.Count) >= LeastSamples;
    }
}
