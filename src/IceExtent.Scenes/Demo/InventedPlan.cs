namespace IceExtent.Scenes.Demo;

/// <summary>The plan of the invented sea: where land and water lie before the shores are roughened.</summary>
/// <remarks>Map coordinates in km from the pole, x to the right, y up. Everything in it is invented.</remarks>
internal static class InventedPlan
{
    // Lands: capsules from one point to another with a radius, in km.
    private static readonly Capsule[] Lands =
    [
        new(-2300, 2300, -1950, 500, 600),       // The western mainland, upper part.
        new(-1950, 500, -2250, -700, 560),       // Its waist.
        new(-1600, 1150, -900, 1330, 170),       // A long cape.
        new(-2350, -1100, -1900, -2300, 560),    // The south-western mainland.
        new(-1900, -2200, -100, -2150, 520),     // The southern shore.
        new(-640, -1010, -170, -900, 225),       // A large island off it.
        new(-1500, 2350, 500, 2350, 520),        // The upper shore.
        new(2350, 1900, 2150, 250, 560),         // The eastern mainland.
        new(2150, 250, 1720, -220, 260),         // Its southern cape.
        new(420, -420, 500, -330, 45),              // A lone island.
    ];

    // Waters cut out of the lands afterwards.
    private static readonly Capsule[] Waters =
    [
        new(-1150, -300, -1690, -130, 205),      // The gulf.
        new(-1150, -1420, -60, -1400, 120),     // The strait south of the large island.
        new(900, 1800, 1250, 2300, 130),         // An opening at the top.
    ];

    // A shelf with many islands: height there is only a little below the surface.
    private const double ShelfX = 820.0;
    private const double ShelfY = 930.0;
    private const double ShelfRadius = 400.0;
    private const double ShelfDepth = 2.0;

    /// <summary>The distance to the nearest planned shore in km: positive on land, negative on water.</summary>
    public static double Height(double x, double y)
    {
        double height = double.NegativeInfinity;
        foreach (Capsule land in Lands)
        {
            height = Math.Max(height, land.Inside(x, y));
        }

        double fromShelf = Math.Sqrt(((x - ShelfX) * (x - ShelfX)) + ((y - ShelfY) * (y - ShelfY)));
        height = Math.Max(height, -ShelfDepth - Math.Max(0.0, fromShelf - ShelfRadius));
        foreach (Capsule water in Waters)
        {
            height = Math.Min(height, -water.Inside(x, y));
        }

        return height;
    }

    private readonly record struct Capsule(double FromX, double FromY, double ToX, double ToY, double Radius)
    {
        public double Inside(double x, double y)
        {
            double alongX = ToX - FromX, alongY = ToY - FromY;
            double share = Math.Clamp(
                (((x - FromX) * alongX) + ((y - FromY) * alongY)) / ((alongX * alongX) + (alongY * alongY)), 0.0, 1.0);
            double offX = x - FromX - (share * alongX), offY = y - FromY - (share * alongY);
            return Radius - Math.Sqrt((offX * offX) + (offY * offY));
        }
    }
}
