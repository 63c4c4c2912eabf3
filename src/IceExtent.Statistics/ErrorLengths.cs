namespace IceExtent.Statistics;

/// <summary>How far errors of cells are alike. Values and sources: config/defaults.toml, [standard_error].</summary>
/// <param name="FarMeters">Over this distance, in m, the scatter of the pure surfaces.</param>
/// <param name="FootprintMeters">Inside squares of this side, in m, the rest, in the standard error of area.</param>
/// <param name="MissedIceMeters">Inside squares of this side, in m, ice in cells where none was retrieved, in the standard error of extent.</param>
/// <param name="EdgeFactor">All of the edge together, in the standard error of extent: so much of what <see cref="EdgeShift"/> tells. Unit: 1.</param>
public sealed record ErrorLengths(double FarMeters, double FootprintMeters, double MissedIceMeters, double EdgeFactor);
