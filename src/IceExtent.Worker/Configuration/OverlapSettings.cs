using IceExtent.Statistics.Overlaps;

namespace IceExtent.Worker.Configuration;

/// <summary>How days that two sensors both saw are compared.</summary>
/// <param name="Cells">Which cells are pure surfaces.</param>
/// <param name="LeastDays">A surface needs so many days for an offset.</param>
/// <param name="LeastCells">A day needs so many cells of a surface.</param>
/// <param name="TrimFraction">The share of cells cut off at each end before their mean. Unit: 1.</param>
internal sealed record OverlapSettings(PureCellRules Cells, int LeastDays, int LeastCells, double TrimFraction);
