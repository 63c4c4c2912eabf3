using CsCheck;

namespace IceExtent.Grids.Tests;

/// <summary>What holds for every polar map at every position.</summary>
public sealed class ProjectionLaws
{
    private static readonly Gen<IMapProjection> Maps = Gen.Select(
        Gen.OneOf(Gen.Const(Ellipsoid.Wgs84), Gen.Const(Ellipsoid.Hughes1980), Gen.Const(Ellipsoid.International1924)),
        Gen.Bool,
        Gen.Double[40, 89],
        Gen.Double[-180, 180],
        Gen.Bool,
        (ellipsoid, north, parallel, origin, equalArea) => equalArea
            ? (IMapProjection)new PolarEqualArea(ellipsoid, north ? Hemisphere.North : Hemisphere.South, origin)
            : new PolarStereographic(ellipsoid, north ? parallel : -parallel, origin));

    [Fact]
    public void Inverse_OfForward_IsThePosition() => Gen.Select(Maps, Gen.Double[-30, 90], Gen.Double[-180, 180])
        .Sample((map, poleward, longitude) =>
        {
            GeoPosition position = new(map.Hemisphere == Hemisphere.North ? poleward : -poleward, longitude);
            GeoPosition back = map.Inverse(map.Forward(position));
            double east = Math.IEEERemainder(back.LongitudeDegrees - longitude, 360.0)
                * Math.Cos(double.DegreesToRadians(poleward));
            return Math.Abs(back.LatitudeDegrees - position.LatitudeDegrees) < 1e-12 && Math.Abs(east) < 1e-12;
        });

    [Fact]
    public void Forward_OfInverse_IsThePlace() => Gen.Select(Maps, Gen.Double[-8e6, 8e6], Gen.Double[-8e6, 8e6])
        .Sample((map, x, y) =>
        {
            MapPosition back = map.Forward(map.Inverse(new(x, y)));
            return Math.Abs(back.XMeters - x) < 1e-6 && Math.Abs(back.YMeters - y) < 1e-6;
        });

    /// <summary>Next to the pole the digits must not cancel: 1e-8 m at any distance from 10 km down to 1 mm.</summary>
    [Fact]
    public void Forward_OfInverseNextToThePole_IsThePlace() => Gen.Select(Maps, Gen.Double[-3, 4], Gen.Double[-3, 3])
        .Sample((map, exponent, angle) =>
        {
            double distance = Math.Pow(10, exponent);
            double x = distance * Math.Cos(angle);
            double y = distance * Math.Sin(angle);
            MapPosition back = map.Forward(map.Inverse(new(x, y)));
            return Math.Abs(back.XMeters - x) < 1e-8 && Math.Abs(back.YMeters - y) < 1e-8;
        });

    /// <summary>The areal scale is what the map does to a small square on the ground.</summary>
    [Fact]
    public void ArealScale_SmallQuadrangle_IsItsAreaOnTheMapOverItsAreaOnTheGround() =>
        Gen.Select(Maps, Gen.Double[20, 89], Gen.Double[-180, 180]).Sample((map, poleward, longitude) =>
        {
            const double step = 1e-3;
            double latitude = map.Hemisphere == Hemisphere.North ? poleward : -poleward;
            MapPosition south = map.Forward(new(latitude - step, longitude));
            MapPosition north = map.Forward(new(latitude + step, longitude));
            MapPosition west = map.Forward(new(latitude, longitude - step));
            MapPosition east = map.Forward(new(latitude, longitude + step));
            double mapArea = Math.Abs(
                ((north.XMeters - south.XMeters) * (east.YMeters - west.YMeters))
                - ((north.YMeters - south.YMeters) * (east.XMeters - west.XMeters)));

            // Radii of curvature along the meridian and of the parallel: [Snyder1987] eqs. 4-18 and 4-21.
            double squared = map.Ellipsoid.SquaredEccentricity;
            double sine = Math.Sin(double.DegreesToRadians(latitude));
            double root = Math.Sqrt(1.0 - (squared * sine * sine));
            double a = map.Ellipsoid.SemiMajorAxisMeters;
            double meridian = a * (1.0 - squared) / (root * root * root);
            double parallel = a * Math.Cos(double.DegreesToRadians(latitude)) / root;
            double angle = double.DegreesToRadians(2.0 * step);
            double groundArea = meridian * angle * parallel * angle;
            return Math.Abs((mapArea / groundArea / map.ArealScale(latitude)) - 1.0) < 1e-6;
        });

    [Fact]
    public void Forward_LongitudeInAnotherTurn_IsTheSamePlace() =>
        Gen.Select(Maps, Gen.Double[0, 90], Gen.Double[-180, 180], Gen.Int[-2, 2]).Sample((map, poleward, longitude, turns) =>
        {
            double latitude = map.Hemisphere == Hemisphere.North ? poleward : -poleward;
            MapPosition one = map.Forward(new(latitude, longitude));
            MapPosition other = map.Forward(new(latitude, longitude + (360.0 * turns)));
            return Math.Abs(one.XMeters - other.XMeters) < 1e-7 && Math.Abs(one.YMeters - other.YMeters) < 1e-7;
        });
}
