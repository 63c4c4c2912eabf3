using IceExtent.Grids.Outlines;
using NetTopologySuite.IO;

namespace IceExtent.Grids.Tests.Outlines;

/// <summary>Which outlines are refused. Origin: worked, from a sketch of each ring.</summary>
public sealed class OutlineCheckTests
{
    public static TheoryData<string, string> Sound() => new()
    {
        { "a box", "POLYGON ((0 70, 10 70, 10 80, 0 80, 0 70))" },
        { "a box over the date line", "POLYGON ((170 70, -170 70, -170 80, 170 80, 170 70))" },
        { "a box that touches 180 degrees", "POLYGON ((170 70, 180 70, 180 80, 170 80, 170 70))" },
        { "a ring round the pole", "POLYGON ((0 70, 90 70, 180 70, -90 70, 0 70))" },
        { "a ring round the pole from the date line on", "POLYGON ((180 70, -90 72, 0 70, 90 71, 180 70))" },
        { "a ring with a cut down to the pole", "POLYGON ((-180 70, -90 70, 0 70, 90 70, 180 70, 180 90, -180 90, -180 70))" },
        { "the same, begun at the pole", "POLYGON ((-180 90, -180 70, -90 70, 0 70, 90 70, 180 70, 180 90, -180 90))" },
        { "a sector to the pole", "POLYGON ((-60 -40, -60 -90, 20 -90, 20 -40, -60 -40))" },
        { "a sector over the date line", "POLYGON ((160 -40, 160 -90, -130 -90, -130 -40, 160 -40))" },
        { "a sector with one corner at the pole", "POLYGON ((0 70, 45 70, 0 90, 0 70))" },
        { "a wide sector", "POLYGON ((20 -40, 20 -90, -60 -90, -60 -40, -140 -40, 140 -40, 80 -40, 20 -40))" },
        { "a hole", "POLYGON ((0 60, 40 60, 40 80, 0 80, 0 60), (10 65, 20 65, 20 70, 10 70, 10 65))" },
    };

    public static TheoryData<string, double, double> Crossing() => new()
    {
        // A bow tie; its ends cross half-way.
        { "POLYGON ((0 70, 10 80, 10 70, 0 80, 0 70))", 5.0, 75.0 },

        // The same over the date line.
        { "POLYGON ((175 70, -175 80, -175 70, 175 80, 175 70))", 180.0, 75.0 },

        // A ring round the pole whose last edge cuts its first: (0 70 to 90 80) and (-20 74 to 20 74), one over the other where 70 + x/9 = 74.
        { "POLYGON ((0 70, 90 80, 180 70, -90 70, -20 74, 20 70, 0 70))", 0.0, 0.0 },

        // A spur out and back.
        { "POLYGON ((0 70, 10 70, 10 80, 10 85, 10 80, 0 80, 0 70))", 10.0, 85.0 },

        // The hole crosses itself, the shell does not.
        { "POLYGON ((0 60, 40 60, 40 80, 0 80, 0 60), (10 65, 20 75, 20 65, 10 75, 10 65))", 15.0, 70.0 },
    };

    [Theory]
    [MemberData(nameof(Sound))]
    public void FirstFault_SoundOutline_IsNone(string what, string text) =>
        Assert.True(OutlineCheck.FirstFault(new WKTReader().Read(text)) is null, what);

    [Theory]
    [MemberData(nameof(Crossing))]
    public void FirstFault_RingThatMeetsItself_SaysWhere(string text, double longitude, double latitude)
    {
        OutlineFault? fault = OutlineCheck.FirstFault(new WKTReader().Read(text));

        Assert.Equal(OutlineFaultKind.CrossesItself, fault!.Kind);
        if (latitude > 0.0) // Where two places would do, the position is left open.
        {
            Assert.Equal(longitude, Math.Abs(fault.At.LongitudeDegrees), 1e-9);
            Assert.InRange(fault.At.LatitudeDegrees, latitude - 5.0, latitude);
        }
    }

    [Theory]
    [InlineData("POLYGON ((0 70, 120 70, 60 80, 0 70))", OutlineFaultKind.UnclearEdge)]
    [InlineData("POLYGON ((-180 60, 180 60, 180 70, -180 70, -180 60))", OutlineFaultKind.UnclearEdge)]
    [InlineData("POLYGON ((5 70, 5 70, 5 70, 5 70))", OutlineFaultKind.NoArea)]
    [InlineData("POLYGON ((0 90, 40 90, 80 90, 0 90))", OutlineFaultKind.NoArea)]
    public void FirstFault_OutlineWithoutAMeaning_IsTold(string text, OutlineFaultKind kind) =>
        Assert.Equal(kind, OutlineCheck.FirstFault(new WKTReader().Read(text))?.Kind);
}
