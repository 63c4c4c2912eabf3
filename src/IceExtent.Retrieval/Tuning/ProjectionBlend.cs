namespace IceExtent.Retrieval;

/// <summary>Where self-tuning goes from the projection that is best over open water to the one that is best over closed ice.</summary>
/// <param name="From">Up to this concentration the first alone. Unit: 1.</param>
/// <param name="To">From this one on the second alone; above <paramref name="From"/>. Unit: 1.</param>
public sealed record ProjectionBlend(double From, double To)
{
    /// <summary>All the way from no ice to closed ice: for a tuning that says nothing. A run's values stand in config/defaults.toml.</summary>
    public static ProjectionBlend Whole { get; } = new(0.0, 1.0);

    /// <summary>The share of the second at a concentration.</summary>
    public double ShareAt(double fraction) => Math.Clamp((fraction - From) / (To - From), 0.0, 1.0);
}
