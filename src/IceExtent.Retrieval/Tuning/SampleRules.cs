namespace IceExtent.Retrieval;

/// <summary>Which cells of a day are samples of the two pure surfaces. Values and sources: config/defaults.toml, [tie_points].</summary>
/// <param name="IceFraction">From this concentration on a cell belongs to the ice cover whose edge is the yardstick. Unit: 1.</param>
/// <param name="ClosedIceFraction">From this NASA Team concentration on a cell may be closed ice. Unit: 1.</param>
/// <param name="CoastMeters">How far from land every sample lies, in m.</param>
/// <param name="EdgeMeters">How far inside the edge closed ice lies, in m.</param>
/// <param name="WaterFromMeters">How far outside the edge the belt of open water begins, in m.</param>
/// <param name="WaterToMeters">How far outside the edge it ends, in m.</param>
/// <param name="OutlierLimit">A sample farther from the median than so many robust standard deviations, in any channel, is dropped. Unit: 1.</param>
public sealed record SampleRules(
    double IceFraction,
    double ClosedIceFraction,
    double CoastMeters,
    double EdgeMeters,
    double WaterFromMeters,
    double WaterToMeters,
    double OutlierLimit);

/// <summary>What one day's samples came to.</summary>
/// <param name="OpenWater">Open water.</param>
/// <param name="ClosedIce">Closed ice of all types.</param>
public sealed record DaySamples(SurfaceMoments OpenWater, SurfaceMoments ClosedIce);
