using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>Tie points used by several tests. Values as in config/sensors, where their sources stand.</summary>
internal static class TiePointSets
{
    /// <summary>[Cavalieri1999], F13, north: value from memory (high).</summary>
    public static TiePoints F13North { get; } = new(new(185.2, 114.4, 205.2), new(251.2, 235.4, 241.1), new(222.4, 198.6, 186.2));

    /// <summary>[Cavalieri2012], F17, north: value from memory (high).</summary>
    public static TiePoints F17North { get; } = new(new(184.9, 113.4, 207.1), new(248.4, 232.0, 242.3), new(220.7, 196.0, 188.5));

    /// <summary>[Cavalieri1999], F13, south: value from memory (high).</summary>
    public static TiePoints F13South { get; } = new(new(186.0, 117.0, 206.9), new(256.0, 241.4, 245.6), new(246.6, 214.9, 211.1));

    /// <summary>[Cavalieri1992], north: value from memory (high); reproduces the published coefficients to 0.2 %.</summary>
    public static TiePoints Global1992North { get; } = new(new(177.1, 100.8, 201.7), new(258.2, 242.8, 252.8), new(223.2, 203.9, 186.3));

    /// <summary>[Gloersen1992], SMMR, north: value from memory (high).</summary>
    public static TiePoints SmmrNorth { get; } = new(new(168.7, 98.5, 199.4), new(242.2, 225.2, 239.8), new(210.2, 186.8, 180.8));

    /// <summary>The linear mixture of the three surfaces.</summary>
    public static (double V19, double H19, double V37) Mix(TiePoints points, double firstYear, double multiyear)
    {
        double water = 1.0 - firstYear - multiyear;
        return (
            (water * points.OpenWater.V19Kelvins) + (firstYear * points.FirstYear.V19Kelvins) + (multiyear * points.Multiyear.V19Kelvins),
            (water * points.OpenWater.H19Kelvins) + (firstYear * points.FirstYear.H19Kelvins) + (multiyear * points.Multiyear.H19Kelvins),
            (water * points.OpenWater.V37Kelvins) + (firstYear * points.FirstYear.V37Kelvins) + (multiyear * points.Multiyear.V37Kelvins));
    }
}
