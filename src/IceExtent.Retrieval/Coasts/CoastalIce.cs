namespace IceExtent.Retrieval;

/// <summary>Lowers the ice of single cells.</summary>
internal static class CoastalIce
{
    /// <summary>Gives a cell a lower total; the ice types keep their proportion, on which no source says a word.</summary>
    public static void Lower(ConcentrationPlanes planes, int cell, float fraction)
    {
        float kept = fraction / planes.Total[cell];
        planes.Multiyear[cell] = Math.Min(planes.Multiyear[cell] * kept, fraction);
        planes.FirstYear[cell] = fraction - planes.Multiyear[cell];
        planes.Total[cell] = fraction;
    }
}
