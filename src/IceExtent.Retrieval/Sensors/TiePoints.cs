namespace IceExtent.Retrieval;

/// <summary>One pure surface as a radiometer sees it.</summary>
/// <param name="V19Kelvins">19 GHz vertical, in K.</param>
/// <param name="H19Kelvins">19 GHz horizontal, in K.</param>
/// <param name="V37Kelvins">37 GHz vertical, in K.</param>
public sealed record TiePoint(double V19Kelvins, double H19Kelvins, double V37Kelvins)
{
    /// <summary>The same surface by channel.</summary>
    public ChannelKelvins Kelvins => new(new Dictionary<Channel, double>
    {
        [Channel.V19] = V19Kelvins, [Channel.H19] = H19Kelvins, [Channel.V37] = V37Kelvins,
    });
}

/// <summary>The three pure surfaces between which a cell is mixed.</summary>
/// <param name="OpenWater">No ice.</param>
/// <param name="FirstYear">First-year ice in the north, type A in the south.</param>
/// <param name="Multiyear">Multiyear ice in the north, type B in the south.</param>
public sealed record TiePoints(TiePoint OpenWater, TiePoint FirstYear, TiePoint Multiyear);
