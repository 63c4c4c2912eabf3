namespace IceExtent.Grids.Outlines;

/// <summary>What is wrong with the outline of a polygon.</summary>
public enum OutlineFaultKind
{
    /// <summary>It crosses or touches itself.</summary>
    CrossesItself,

    /// <summary>An edge leaves open which way round the Earth it goes.</summary>
    UnclearEdge,

    /// <summary>A ring goes round no area.</summary>
    NoArea,
}

/// <summary>Why an outline cannot stand for an area.</summary>
/// <param name="Kind">What is wrong.</param>
/// <param name="What">The same in words, such as <c>an edge of 120 degrees of longitude</c>.</param>
/// <param name="At">Where.</param>
public sealed record OutlineFault(OutlineFaultKind Kind, string What, GeoPosition At);
