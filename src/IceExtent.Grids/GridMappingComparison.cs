using System.Globalization;

namespace IceExtent.Grids;

/// <summary>Compares the map that a file states with the map of a grid.</summary>
internal static class GridMappingComparison
{
    private const double AxisMeters = 1.0;
    private const double AngleDegrees = 1e-6;
    private const double Scale = 1e-6;

    /// <summary>Adds a phrase for each attribute that the file states and that differs.</summary>
    public static void Compare(Grid grid, GridMapping found, List<string> differences)
    {
        IMapProjection map = grid.Projection;
        GridMapping own = CoordinateSystemText.Mapping(grid);
        if (found.Name != own.Name)
        {
            differences.Add($"grid_mapping_name {found.Name}, grid {grid.Name} has {own.Name}");
            return; // The same attribute means another thing on another projection.
        }

        Phrases phrases = new(grid.Name, found.Numbers, differences);
        double origin = map.OriginLongitudeDegrees;
        phrases.Add(GridMapping.OriginLatitude, grid.Hemisphere == Hemisphere.North ? 90.0 : -90.0, AngleDegrees, "degrees");
        phrases.AddLongitude(GridMapping.OriginLongitude, origin);
        phrases.AddLongitude(GridMapping.VerticalLongitude, origin);
        if (map is PolarStereographic stereographic)
        {
            phrases.Add(GridMapping.StandardParallel, stereographic.TrueScaleLatitudeDegrees, AngleDegrees, "degrees");
            phrases.Add(GridMapping.OriginScale, stereographic.ScaleFactor(grid.Hemisphere == Hemisphere.North ? 90.0 : -90.0), Scale, "(no unit)");
        }

        phrases.Add(GridMapping.FalseEasting, 0.0, AxisMeters, "m");
        phrases.Add(GridMapping.FalseNorthing, 0.0, AxisMeters, "m");
        CompareEllipsoid(map.Ellipsoid, phrases);
    }

    private static void CompareEllipsoid(Ellipsoid own, Phrases phrases)
    {
        phrases.Add(GridMapping.SemiMajorAxis, own.SemiMajorAxisMeters, AxisMeters, "m");
        phrases.Add(GridMapping.SemiMinorAxis, own.SemiMinorAxisMeters, AxisMeters, "m");
        phrases.Add(GridMapping.EarthRadius, own.SemiMajorAxisMeters, AxisMeters, "m");

        // 1 m of polar radius is this much of 1/f: b = a (1 - f), so d(1/f) = db / (a f²).
        double flattening = 1.0 / own.InverseFlattening;
        phrases.Add(
            GridMapping.InverseFlattening,
            own.InverseFlattening,
            AxisMeters / (own.SemiMajorAxisMeters * flattening * flattening),
            "(no unit)");
    }

    private readonly record struct Phrases(
        string Grid, IReadOnlyDictionary<string, double> Found, List<string> Differences)
    {
        public void Add(string attribute, double own, double tolerance, string unit)
        {
            if (Found.TryGetValue(attribute, out double value) && !(Math.Abs(value - own) <= tolerance))
            {
                Differences.Add(Phrase(attribute, value, own, unit));
            }
        }

        public void AddLongitude(string attribute, double own)
        {
            if (Found.TryGetValue(attribute, out double value)
                && !(Math.Abs(Math.IEEERemainder(value - own, 360.0)) <= AngleDegrees))
            {
                Differences.Add(Phrase(attribute, value, own, "degrees"));
            }
        }

        private string Phrase(string attribute, double value, double own, string unit) =>
            string.Create(CultureInfo.InvariantCulture, $"{attribute} {value} {unit}, grid {Grid} has {own} {unit}");
    }
}
