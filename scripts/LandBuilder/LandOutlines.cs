using IceExtent.Grids;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Utilities;

namespace IceExtent.LandBuilder;

/// <summary>Turns outlines of land into the shares and the text of a land file.</summary>
internal static class LandOutlines
{
    private const double StoppedShortDegrees = -89.99;

    /// <summary>Moves vertices next to the south pole onto it: the file's maker stopped at −89.999 degrees, which leaves a pinhole.</summary>
    public static MultiPolygon WithPolesInPlace(MultiPolygon land)
    {
        land.Apply(new PoleFilter());
        return land;
    }

    /// <summary>The share of land in each cell; NaN beyond the equator.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="land">Grounded land, everywhere.</param>
    /// <param name="iceFronts">Antarctica with its ice shelves, which count as land: they are no sea ice and do not melt away.</param>
    public static float[] Shares(Grid grid, MultiPolygon land, MultiPolygon iceFronts)
    {
        Geometry all = GeometryFactory.Default.CreateGeometryCollection([land, iceFronts]);
        double[] shares = PolygonShares.Compute(grid.Frame, MapPlanePolygons.Project(grid, all));
        float[] fraction = new float[shares.Length];
        double side = grid.Hemisphere == Hemisphere.North ? 1.0 : -1.0;
        for (int cell = 0; cell < shares.Length; cell++)
        {
            fraction[cell] = side * grid.LatitudesDegrees[cell] >= 0.0 ? (float)shares[cell] : float.NaN;
        }

        return fraction;
    }

    /// <summary>The plane as it is stored: bytes in steps of 1/250, nearest, so that sea stays 0 and land 1.</summary>
    public static GridVariable Variable(float[] shares) => new BytePackedVariable(
        LandShareFile.VariableName,
        "share of the cell that is land or ice shelf",
        "land_area_fraction",
        [new("comment", "Lakes count as land, but for the Caspian Sea. A cell without a value lies beyond the equator and counts as land.")],
        "1",
        shares,
        BytePacking.Fraction);

    /// <summary>Where the outlines come from.</summary>
    public static IReadOnlyList<KeyValuePair<string, string>> Attributes(Grid grid)
    {
        List<KeyValuePair<string, string>> attributes =
        [
            new("title", $"Land share of the grid {grid.Name}"),
            new("source", "Natural Earth 1:50m land (public domain), through world-atlas 2.0.2"),
        ];
        if (grid.Hemisphere == Hemisphere.South)
        {
            attributes.Add(new("source_ice_shelves", "Antarctic ice front of GSHHG 2.3.7, intermediate resolution (Wessel and Smith 1996)"));
            attributes.Add(new("license_ice_shelves", "GSHHG is licensed under the GNU LGPL, version 3 or later"));
        }

        attributes.Add(new("history", "scripts/build-land.sh"));
        return attributes;
    }

    private sealed class PoleFilter : ICoordinateFilter
    {
        public void Filter(Coordinate coord)
        {
            if (coord.Y < StoppedShortDegrees)
            {
                coord.Y = -90.0;
            }
        }
    }
}
