namespace IceExtent.Statistics.Scoring;

/// <summary>What a cell truly holds, in the classes that totals know.</summary>
public enum TruthClass
{
    /// <summary>No ice at all.</summary>
    OpenWater,

    /// <summary>Some ice, below the ice limit.</summary>
    BelowLimit,

    /// <summary>From the ice limit to below the pack limit.</summary>
    MarginalZone,

    /// <summary>At or above the pack limit.</summary>
    Pack,

    /// <summary>Ice of any concentration whose surface melts: wet snow or ponds, which no method here sees as dry ice.</summary>
    Melting,
}
