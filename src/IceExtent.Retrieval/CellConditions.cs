namespace IceExtent.Retrieval;

/// <summary>Why a cell's concentration is what it is. Several may hold at once; none of them means a plain retrieval.</summary>
/// <remarks>Written to grid files as a CF flag variable with <c>flag_masks</c>; documented in docs/DATA.md.</remarks>
[Flags]
#pragma warning disable CA1028 // The storage type is the file's: one unsigned 16-bit mask a cell.
public enum CellConditions : ushort
#pragma warning restore CA1028
{
    /// <summary>Retrieved, nothing else to say.</summary>
    None = 0,

    /// <summary>The cell's land share is at or above the run's limit: not counted.</summary>
    Land = 1 << 0,

    /// <summary>Inside the circle round the pole that the sensor never sees.</summary>
    PolarGap = 1 << 1,

    /// <summary>A channel that the method needs is missing here.</summary>
    NoObservation = 1 << 2,

    /// <summary>A brightness temperature was outside the allowed range and was made missing.</summary>
    OutOfRange = 1 << 3,

    /// <summary>The 37/19 gradient-ratio screen set the cell to open water.</summary>
    WeatherGradient3719 = 1 << 4,

    /// <summary>The 22/19 gradient-ratio screen set the cell to open water.</summary>
    WeatherGradient2219 = 1 << 5,

    /// <summary>The retrieved concentration was below 0 and was clipped.</summary>
    ClippedBelow = 1 << 6,

    /// <summary>The retrieved concentration was above 1 and was clipped.</summary>
    ClippedAbove = 1 << 7,

    /// <summary>The method has no answer for these temperatures (the tie-point triangle degenerates).</summary>
    NoSolution = 1 << 8,

    /// <summary>The coast correction changed the cell: its temperatures, or its concentration, by the run's choice.</summary>
    CoastCorrected = 1 << 9,

    /// <summary>Empty, and given the mean of its observed neighbours; the bit that says why it was empty stays.</summary>
    FilledFromNeighbours = 1 << 10,

    /// <summary>In the polar gap, and given the solution of Laplace's equation there.</summary>
    FilledPolarGap = 1 << 11,

    /// <summary>Empty, and given a value from days before and after; the bit that says why it was empty stays.</summary>
    FilledFromDays = 1 << 12,

    /// <summary>The month's ice mask has no ice here: set to open water.</summary>
    OutsideIceMask = 1 << 13,

    /// <summary>The month's sea is too warm for ice here: set to open water.</summary>
    WarmWater = 1 << 14,
}
