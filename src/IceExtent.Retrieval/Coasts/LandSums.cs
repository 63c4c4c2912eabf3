namespace IceExtent.Retrieval;

/// <summary>Sums over the cells of one tile, for a straight line of temperature over land share, and over its pure land.</summary>
internal struct LandSums
{
    public double Count;
    public double Share;
    public double ShareSquares;
    public double Kelvins;
    public double Products;
    public double KelvinSquares;
    public double PureCount;
    public double PureKelvins;
    public double PureSquares;

    /// <summary>Adds one cell.</summary>
    public void Add(double share, double kelvins, bool pure)
    {
        Count += 1.0;
        Share += share;
        ShareSquares += share * share;
        Kelvins += kelvins;
        Products += share * kelvins;
        KelvinSquares += kelvins * kelvins;
        if (pure)
        {
            PureCount += 1.0;
            PureKelvins += kelvins;
            PureSquares += kelvins * kelvins;
        }
    }

    /// <summary>Adds another tile's line, but not its pure land.</summary>
    public void AddWeighted(in LandSums other, double weight)
    {
        Count += weight * other.Count;
        Share += weight * other.Share;
        ShareSquares += weight * other.ShareSquares;
        Kelvins += weight * other.Kelvins;
        Products += weight * other.Products;
        KelvinSquares += weight * other.KelvinSquares;
    }
}
