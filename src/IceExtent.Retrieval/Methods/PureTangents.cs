namespace IceExtent.Retrieval;

/// <summary>A method's linearisations over its own pure surfaces.</summary>
/// <param name="OpenWater">Over open water.</param>
/// <param name="FirstYear">Over first-year ice (type A in the south); over closed ice for a method that knows one kind.</param>
/// <param name="Multiyear">Over multiyear ice (type B in the south); over closed ice for a method that knows one kind.</param>
public sealed record PureTangents(LinearForm OpenWater, LinearForm FirstYear, LinearForm Multiyear);
