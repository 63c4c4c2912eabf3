namespace IceExtent.Statistics;

/// <summary>How far errors of cells are alike. Values and sources: config/defaults.toml, [standard_error].</summary>
/// <param name="FarMeters">Over this distance, in m, the scatter of the pure surfaces.</param>
/// <param name="FootprintMeters">Inside squares of this side, in m, the rest, in the standard error of area.</param>
public sealed record ErrorLengths(double FarMeters, double FootprintMeters);
