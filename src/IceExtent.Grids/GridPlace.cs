namespace IceExtent.Grids;

/// <summary>The cells of a grid in reach of a place.</summary>
/// <param name="Name">The name in the <c>place</c> column.</param>
/// <param name="Title">The name for people.</param>
/// <param name="Cells">Indices of the cells, rising.</param>
/// <param name="DistancesKilometers">How far the center of each cell lies from the place, in km, in the order of <paramref name="Cells"/>.</param>
public sealed record GridPlace(string Name, string Title, IReadOnlyList<int> Cells, IReadOnlyList<double> DistancesKilometers)
{
    /// <summary>The distance of the nearest center, in km; 0 without cells.</summary>
    public double NearestKilometers => DistancesKilometers.DefaultIfEmpty(0.0).Min();

    /// <summary>The distance of the farthest center, in km; 0 without cells.</summary>
    public double FarthestKilometers => DistancesKilometers.DefaultIfEmpty(0.0).Max();
}
