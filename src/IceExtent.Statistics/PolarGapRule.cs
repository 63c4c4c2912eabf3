namespace IceExtent.Statistics;

/// <summary>How the polar gap enters totals.</summary>
public enum PolarGapRule
{
    /// <summary>As ice in extent; not in area, marginal zone and pack.</summary>
    CountAsIce,

    /// <summary>In no total.</summary>
    LeaveOut,

    /// <summary>Filled by Laplace's equation and counted like other cells; as <see cref="CountAsIce"/> where a day could not be filled.</summary>
    Laplace,
}
