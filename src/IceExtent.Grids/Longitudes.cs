namespace IceExtent.Grids;

/// <summary>Keeps longitudes in one turn.</summary>
public static class Longitudes
{
    /// <summary>The same meridian, from −180 (excluded) to 180 degrees east.</summary>
    public static double Normalize(double longitudeDegrees)
    {
        double turned = Math.IEEERemainder(longitudeDegrees, 360.0);
        return turned <= -180.0 ? turned + 360.0 : turned;
    }
}
