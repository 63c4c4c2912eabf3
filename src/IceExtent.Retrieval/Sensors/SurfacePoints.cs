namespace IceExtent.Retrieval;

/// <summary>The pure surfaces of the methods that are linear in brightness temperature, in all their channels.</summary>
/// <param name="OpenWater">No ice.</param>
/// <param name="FirstYear">First-year ice in the north, its radiometric likeness in the south.</param>
/// <param name="Multiyear">Multiyear ice in the north, its radiometric likeness in the south.</param>
public sealed record SurfacePoints(ChannelKelvins OpenWater, ChannelKelvins FirstYear, ChannelKelvins Multiyear);
