namespace IceExtent.Scenes.Parameters;

/// <summary>What the ice looks like inside and at its edge.</summary>
/// <remarks>
/// The edge is where a field, the latitude plus the bumps below, passes the latitude of the season. Bumps are in
/// degrees of latitude: a cell with a bump of 2 freezes as if it lay 2 degrees nearer the pole.
/// </remarks>
public sealed record IceParameters
{
    /// <summary>Bumps that never change (currents, shelves): standard deviation, in degrees of latitude.</summary>
    public required double StandingSpreadDegrees { get; init; }

    /// <summary>Their lattice spacing, in km.</summary>
    public required double StandingNodeKilometers { get; init; }

    /// <summary>Bumps that change from year to year: standard deviation, in degrees of latitude.</summary>
    public required double YearlySpreadDegrees { get; init; }

    /// <summary>Their lattice spacing, in km.</summary>
    public required double YearlyNodeKilometers { get; init; }

    /// <summary>Bumps that wander from week to week: standard deviation, in degrees of latitude.</summary>
    public required double WanderSpreadDegrees { get; init; }

    /// <summary>Their widest lattice spacing, in km; three finer ones are added.</summary>
    public required double WanderNodeKilometers { get; init; }

    /// <summary>How long the widest of them last, in days.</summary>
    public required double WanderLifeDays { get; init; }

    /// <summary>From no ice to full pack at the maximum, in degrees of latitude.</summary>
    public required double WinterEdgeWidthDegrees { get; init; }

    /// <summary>From no ice to full pack at the minimum, in degrees of latitude.</summary>
    public required double SummerEdgeWidthDegrees { get; init; }

    /// <summary>How far the effect of a coast reaches (standard deviation of a Gaussian), in km.</summary>
    public required double CoastReachKilometers { get; init; }

    /// <summary>The bump at a straight coast in winter, in degrees of latitude: water freezes early there.</summary>
    public required double CoastWinterDegrees { get; init; }

    /// <summary>The bump at a straight coast in summer, in degrees of latitude.</summary>
    public required double CoastSummerDegrees { get; init; }

    /// <summary>The mean share of open leads in the pack at the maximum. Unit: 1.</summary>
    public required double WinterLeadShare { get; init; }

    /// <summary>The mean share of open leads in the pack at the minimum. Unit: 1.</summary>
    public required double SummerLeadShare { get; init; }

    /// <summary>Their lattice spacing, in km.</summary>
    public required double LeadNodeKilometers { get; init; }

    /// <summary>How long leads last, in days.</summary>
    public required double LeadLifeDays { get; init; }

    /// <summary>The largest share of the ice that is multiyear, in the middle of the old pack. Unit: 1.</summary>
    public required double HighestMultiyearShare { get; init; }

    /// <summary>From the rim of the old pack to its middle, in degrees of latitude.</summary>
    public required double MultiyearWidthDegrees { get; init; }

    /// <summary>How far drift has stirred the rim of the old pack: standard deviation, in degrees of latitude.</summary>
    public required double MultiyearStirDegrees { get; init; }

    /// <summary>Warm inflows that keep water open. May be empty.</summary>
    public required IReadOnlyList<WarmInflow> WarmInflows { get; init; }
}

/// <summary>A place where warm water keeps ice away; with a negative strength, one where cold water favors it.</summary>
public sealed record WarmInflow
{
    /// <summary>Its middle, degrees north.</summary>
    public required double LatitudeDegrees { get; init; }

    /// <summary>Its middle, degrees east.</summary>
    public required double LongitudeDegrees { get; init; }

    /// <summary>How far it reaches (standard deviation of a Gaussian), in km.</summary>
    public required double ReachKilometers { get; init; }

    /// <summary>How far it pushes the edge back in its middle, in degrees of latitude.</summary>
    public required double StrengthDegrees { get; init; }
}
