using NetTopologySuite.Geometries;
using PureHDF;
using PureHDF.VOL.Native;

namespace IceExtent.LandBuilder;

/// <summary>Reads the outline of Antarctica along the fronts of its ice shelves from a binned GSHHG file.</summary>
/// <remarks>
/// Source: [GSHHG] 2.3.7. The file cuts every coast into bins of a few degrees, counted from the north-west corner
/// eastward, and gives points in 65,535ths of a bin from its south-west corner. A segment either is a whole island or
/// runs from one side of its bin to another, where the next one goes on. One flag marks the segments of the ice front.
/// </remarks>
internal static class IceFronts
{
    private const double StepsPerBin = 65_535.0;
    private const int PointCountShift = 9;
    private const sbyte IceFrontFlag = 1;

    /// <summary>The rings of the ice front as polygons. x is the longitude, 0 to 360, and y the latitude, in degrees.</summary>
    public static MultiPolygon Read(string path)
    {
        using NativeFile file = H5File.OpenRead(path);
        List<Coordinate[]> segments = Segments(file);
        return GeometryFactory.Default.CreateMultiPolygon(
            [.. Rings(segments).Select(ring => GeometryFactory.Default.CreatePolygon([.. ring]))]);
    }

    private static List<Coordinate[]> Segments(NativeFile file)
    {
        double binDegrees = file.Dataset("Bin_size_in_minutes").Read<int[]>()[0] / 60.0;
        int binsAround = file.Dataset("N_bins_in_360_longitude_range").Read<int[]>()[0];
        int[] firstSegment = file.Dataset("Id_of_first_segment_in_a_bin").Read<int[]>();
        short[] segmentCount = file.Dataset("N_segments_in_a_bin").Read<short[]>();
        int[] packed = file.Dataset("Embedded_npts_levels_exit_entry_for_a_segment").Read<int[]>();
        int[] firstPoint = file.Dataset("Id_of_first_point_in_a_segment").Read<int[]>();
        sbyte[] flags = file.Dataset("Embedded_ANT_flag").Read<sbyte[]>();
        short[] east = file.Dataset("Relative_longitude_from_SW_corner_of_bin").Read<short[]>();
        short[] north = file.Dataset("Relative_latitude_from_SW_corner_of_bin").Read<short[]>();

        List<Coordinate[]> segments = [];
        for (int bin = 0; bin < firstSegment.Length; bin++)
        {
            double west = bin % binsAround * binDegrees;
            double south = 90.0 - (((bin / binsAround) + 1) * binDegrees);
            for (int segment = firstSegment[bin]; segment < firstSegment[bin] + segmentCount[bin]; segment++)
            {
                if (flags[segment] == IceFrontFlag)
                {
                    segments.Add([.. Enumerable.Range(firstPoint[segment], packed[segment] >> PointCountShift).Select(point =>
                        new Coordinate(Degrees(west, east[point], binDegrees), Degrees(south, north[point], binDegrees)))]);
                }
            }
        }

        return segments;
    }

    // The 16 bits are unsigned, though the file calls them signed.
    private static double Degrees(double corner, short steps, double binDegrees) =>
        corner + (unchecked((ushort)steps) / StepsPerBin * binDegrees);

    private static IEnumerable<List<Coordinate>> Rings(List<Coordinate[]> segments)
    {
        foreach (Coordinate[] island in segments.Where(segment => Key(segment[0]) == Key(segment[^1])))
        {
            yield return [.. island];
        }

        Dictionary<(long, long), Coordinate[]> open = segments
            .Where(segment => Key(segment[0]) != Key(segment[^1]))
            .ToDictionary(segment => Key(segment[0]));
        while (open.Count > 0)
        {
            (long, long) start = open.Keys.First();
            List<Coordinate> ring = [open[start][0]];
            for ((long, long) at = start; open.Remove(at, out Coordinate[]? next); at = Key(ring[^1]))
            {
                ring.AddRange(next.Skip(1));
            }

            if (Key(ring[^1]) != start)
            {
                throw new InvalidDataException($"The ice front is broken at longitude {ring[^1].X}, latitude {ring[^1].Y}.");
            }

            ring[^1] = ring[0].Copy(); // The start may be written in another turn.
            yield return ring;
        }
    }

    // The side of a bin is written the same way from both bins, but for rounding and the turn of its longitude.
    private static (long, long) Key(Coordinate point) =>
        ((long)Math.Round(point.X % 360.0 * 1e7), (long)Math.Round(point.Y * 1e7));
}
