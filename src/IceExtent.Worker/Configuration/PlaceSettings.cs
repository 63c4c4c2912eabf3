using IceExtent.Grids;

namespace IceExtent.Worker.Configuration;

/// <summary>The places of a run, found on its grid.</summary>
/// <param name="Paths">The files that name them.</param>
/// <param name="Places">In the order of their names; empty where the run has none.</param>
/// <param name="Digest">Of all that decides their cells.</param>
/// <param name="Stored">Whether the archive already holds their cells.</param>
internal sealed record PlaceSettings(IReadOnlyList<string> Paths, IReadOnlyList<GridPlace> Places, string Digest, bool Stored)
{
    /// <summary>No place.</summary>
    public static PlaceSettings None { get; } = new([], [], string.Empty, Stored: false);
}
