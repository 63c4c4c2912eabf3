namespace IceExtent.Retrieval;

/// <summary>A day near the one that is filled.</summary>
/// <param name="OffsetDays">Days from the one that is filled: below 0 is before, above 0 after; never 0.</param>
/// <param name="Planes">As they were retrieved: screened and clipped, nothing filled. Only read.</param>
public readonly record struct NearDay(int OffsetDays, ConcentrationPlanes Planes);
