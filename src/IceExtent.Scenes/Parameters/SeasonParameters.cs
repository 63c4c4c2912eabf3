namespace IceExtent.Scenes.Parameters;

/// <summary>The yearly march of the ice edge. Latitudes count towards the pole of the grid, so they are positive in the south too.</summary>
public sealed record SeasonParameters
{
    /// <summary>The usual day of year of the largest extent, 1 to 365.</summary>
    public required int MaximumDayOfYear { get; init; }

    /// <summary>The usual day of year of the smallest extent, 1 to 365.</summary>
    public required int MinimumDayOfYear { get; init; }

    /// <summary>How much those days vary from year to year: standard deviation, in days. Never by more than three times this.</summary>
    public required double TimingSpreadDays { get; init; }

    /// <summary>The mean latitude of the edge at the maximum of the reference year, in degrees.</summary>
    public required double WinterEdgeLatitudeDegrees { get; init; }

    /// <summary>The mean latitude of the edge at the minimum of the reference year, in degrees.</summary>
    public required double SummerEdgeLatitudeDegrees { get; init; }

    /// <summary>How much the winter edge varies from year to year: standard deviation, in degrees of latitude.</summary>
    public required double WinterSpreadDegrees { get; init; }

    /// <summary>How much the summer edge varies from year to year: standard deviation, in degrees of latitude.</summary>
    public required double SummerSpreadDegrees { get; init; }

    /// <summary>How fast the winter edge moves towards the pole, in degrees of latitude a decade.</summary>
    public required double WinterRetreatDegreesPerDecade { get; init; }

    /// <summary>How fast the summer edge moves towards the pole, in degrees of latitude a decade.</summary>
    public required double SummerRetreatDegreesPerDecade { get; init; }

    /// <summary>The year from which the retreat counts.</summary>
    public required int ReferenceYear { get; init; }

    /// <summary>Shape of the melting half-year: 1 is a cosine, more melts later and faster. Unit: 1.</summary>
    public required double MeltExponent { get; init; }

    /// <summary>Shape of the freezing half-year: 1 is a cosine, less freezes sooner and faster. Unit: 1.</summary>
    public required double FreezeExponent { get; init; }
}
