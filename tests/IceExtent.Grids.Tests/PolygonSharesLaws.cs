using CsCheck;
using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Utilities;

namespace IceExtent.Grids.Tests;

/// <summary>What holds for every polygon: stars of 3 to 24 points in and around a grid of 12 columns and 9 rows.</summary>
public sealed class PolygonSharesLaws
{
    private static readonly GridFrame Frame = new(Columns: 12, Rows: 9, CellMeters: 10, LeftMeters: -60, TopMeters: 45);

    private static readonly Polygon Extent = Box(-60, -45, 60, 45);

    private static readonly Gen<Polygon> Stars =
        Gen.Select(Gen.Double[-70, 70], Gen.Double[-60, 60], Gen.Double[2, 60].Array[3, 24], Star);

    /// <summary>Origin: independent, the overlay of NetTopologySuite.</summary>
    [Fact]
    public void Compute_AnyPolygon_IsTheIntersectionWithEachCell() => Stars.Sample(
        star =>
        {
            double[] shares = PolygonShares.Compute(Frame, star);
            for (int cell = 0; cell < shares.Length; cell++)
            {
                double left = Frame.LeftMeters + (cell % Frame.Columns * Frame.CellMeters);
                double top = Frame.TopMeters - (cell / Frame.Columns * Frame.CellMeters);
                double expected = Box(left, top - 10, left + 10, top).Intersection(star).Area / 100.0;
                if (Math.Abs(shares[cell] - expected) > 1e-8)
                {
                    return false;
                }
            }

            return true;
        },
        iter: 200);

    [Fact]
    public void Compute_AnyPolygon_StaysBetweenZeroAndOne() =>
        Stars.Sample(star => Array.TrueForAll(PolygonShares.Compute(Frame, star), share => share is >= 0.0 and <= 1.0));

    [Fact]
    public void Compute_AnyPolygon_AddsUpToItsPlanarAreaInTheGrid() => Stars.Sample(star =>
        Math.Abs((PolygonShares.Compute(Frame, star).Sum() * 100.0) - star.Intersection(Extent).Area) < 1e-5);

    [Fact]
    public void Compute_PolygonCutInTwo_SharesAddUpToTheWhole() => Gen.Select(Stars, Gen.Double[-50, 50]).Sample((star, cut) =>
    {
        double[] whole = PolygonShares.Compute(Frame, star);
        double[] left = PolygonShares.Compute(Frame, star.Intersection(Box(-200, -200, cut, 200)));
        double[] right = PolygonShares.Compute(Frame, star.Intersection(Box(cut, -200, 200, 200)));
        return Enumerable.Range(0, whole.Length).All(cell => Math.Abs(left[cell] + right[cell] - whole[cell]) < 1e-8);
    });

    [Fact]
    public void Compute_RestOfTheGrid_SharesAddUpToOne() => Stars.Sample(star =>
    {
        double[] inside = PolygonShares.Compute(Frame, star);
        double[] outside = PolygonShares.Compute(Frame, Extent.Difference(star));
        return Enumerable.Range(0, inside.Length).All(cell => Math.Abs(inside[cell] + outside[cell] - 1.0) < 1e-8);
    });

    [Fact]
    public void Compute_PolygonMirrored_MirrorsTheShares() => Stars.Sample(star =>
    {
        double[] shares = PolygonShares.Compute(Frame, star);
        double[] mirrored = PolygonShares.Compute(Frame, AffineTransformation.ScaleInstance(-1, 1).Transform(star));
        return Enumerable.Range(0, shares.Length).All(cell =>
        {
            int column = cell % Frame.Columns;
            return Math.Abs(mirrored[cell - column + Frame.Columns - 1 - column] - shares[cell]) < 1e-9;
        });
    });

    [Fact]
    public void Compute_RingTurnedRound_GivesTheSameShares() => Stars.Sample(star =>
    {
        double[] shares = PolygonShares.Compute(Frame, star);
        double[] turned = PolygonShares.Compute(Frame, star.Reverse());
        return Enumerable.Range(0, shares.Length).All(cell => Math.Abs(turned[cell] - shares[cell]) < 1e-12);
    });

    // Radii at even angles around a centre: such a ring never crosses itself.
    private static Polygon Star(double x, double y, double[] radii)
    {
        Coordinate[] ring = new Coordinate[radii.Length + 1];
        for (int point = 0; point < radii.Length; point++)
        {
            double angle = 2.0 * Math.PI * point / radii.Length;
            ring[point] = new(x + (radii[point] * Math.Cos(angle)), y + (radii[point] * Math.Sin(angle)));
        }

        ring[^1] = ring[0].Copy();
        return GeometryFactory.Default.CreatePolygon(ring);
    }

    private static Polygon Box(double left, double bottom, double right, double top) =>
        (Polygon)GeometryFactory.Default.ToGeometry(new Envelope(left, right, bottom, top));
}
