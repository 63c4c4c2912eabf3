using IceExtent.Grids;

namespace IceExtent.Worker.Configuration;

/// <summary>The regions of a run, laid over its grid.</summary>
/// <param name="Paths">The files that draw them.</param>
/// <param name="Regions">In the order of their names; empty where the run has none.</param>
/// <param name="Digest">Of all that decides their cells.</param>
/// <param name="Stored">Whether the archive already holds their cells.</param>
internal sealed record RegionSettings(IReadOnlyList<string> Paths, IReadOnlyList<GridRegion> Regions, string Digest, bool Stored)
{
    /// <summary>No region but the hemisphere.</summary>
    public static RegionSettings None { get; } = new([], [], string.Empty, Stored: false);
}
