namespace IceExtent.Retrieval;

/// <summary>A pure surface as the table of tie points names it.</summary>
public enum PureSurface
{
    /// <summary>No ice.</summary>
    OpenWater,

    /// <summary>The centre of all closed ice.</summary>
    ClosedIce,

    /// <summary>First-year ice in the north, type A in the south.</summary>
    FirstYear,

    /// <summary>Multiyear ice in the north, type B in the south.</summary>
    Multiyear,
}

/// <summary>One tie point in one channel on one day.</summary>
/// <param name="Surface">The surface.</param>
/// <param name="Channel">The channel.</param>
/// <param name="Kelvins">The tie point in use, in K.</param>
/// <param name="StandardErrorKelvins">Its standard error, in K, or null where it is a fixed one.</param>
/// <param name="ScatterKelvins">The standard deviation of single samples, in K, or null where the tie point is a fixed one.</param>
/// <param name="Samples">The samples in the window, used or not.</param>
/// <param name="Days">The days of the window that had any.</param>
public sealed record TiePointEstimate(
    PureSurface Surface, Channel Channel, double Kelvins, double? StandardErrorKelvins, double? ScatterKelvins, long Samples, int Days);

/// <summary>Which of a day's tie points come from samples.</summary>
public enum TiePointState
{
    /// <summary>None: the run asks for the sensor's own.</summary>
    Fixed,

    /// <summary>All.</summary>
    Moving,

    /// <summary>Those of open water; closed ice had too few samples.</summary>
    MovingWater,

    /// <summary>Those of ice; open water had too few samples.</summary>
    MovingIce,

    /// <summary>None, though the run asks for it: both surfaces had too few samples.</summary>
    TooFewSamples,

    /// <summary>None: those of the samples leave methods without a solution, such as water on the line of ice.</summary>
    NoSolution,
}
