using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>One day through all steps: what stands in each plane, why, and what was counted.</summary>
public sealed class DayRetrievalTests
{
    private static readonly Channel[] Channels = [Channel.V19, Channel.H19, Channel.V22, Channel.V37];

    /// <summary>
    /// Origin: worked. Cells: land; polar gap; 37V missing; 19V out of range; open water with 37/19 = 20/390.4 = 0.0512,
    /// above 0.05, and 22/19 = 18.8/389.2 = 0.0483, above 0.045; thin ice with 37/19 = 10/390 = 0.0256 and 22/19 = 20/400 =
    /// 0.05; pure first-year ice; first-year ice less a tenth of water, 110 %.
    /// </summary>
    [Fact]
    public void Retrieve_OneCellOfEachKind_SaysWhyAndCounts()
    {
        Grid grid = new("row", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(8, 1, 100_000.0, 0.0, 50_000.0));
        bool[] ocean = [false, true, true, true, true, true, true, true];
        CellMask mask = new(grid, ocean, grid.LatitudesDegrees[1]); // The row leads away from the pole: cells 0 and 1 are in the gap.
        TiePoints points = TiePointSets.F13North;
        BrightnessPlanes observed = new(8, Channels);
        (double V19, double H19, double V22, double V37)[] cells =
        [
            (250, 230, 250, 240), (250, 230, 250, 240),
            (251.2, 235.4, 250, double.NaN), (400, 235.4, 250, 241.1),
            (185.2, 114.4, 204, 205.2), (190, 140, 210, 200),
            (251.2, 235.4, 250, 241.1), (257.8, 247.5, 250, 244.69),
        ];
        for (int cell = 0; cell < cells.Length; cell++)
        {
            observed.Kelvins(Channel.V19)[cell] = (float)cells[cell].V19;
            observed.Kelvins(Channel.H19)[cell] = (float)cells[cell].H19;
            observed.Kelvins(Channel.V22)[cell] = (float)cells[cell].V22;
            observed.Kelvins(Channel.V37)[cell] = (float)cells[cell].V37;
        }

        CellConditions[] range = new CellConditions[8];
        ConcentrationPlanes planes = new(8);
        int outOfRange = DayRetrieval.CheckRange(observed, RangeScreen.Physical, range);
        RetrievalCounts counts = new DayRetrieval(new NasaTeam(points), new(0.05, 0.045), new(0.05, 0.05), mask).Retrieve(observed, range, planes);

        Assert.Equal(1, outOfRange);
        Assert.True(float.IsNaN(planes.Total[0]) && planes.Conditions[0] == CellConditions.Land);
        Assert.True(float.IsNaN(planes.Total[1]) && planes.Conditions[1] == CellConditions.PolarGap);
        Assert.Equal(CellConditions.NoObservation, planes.Conditions[2]);
        Assert.Equal(CellConditions.NoObservation | CellConditions.OutOfRange, planes.Conditions[3]);
        Assert.Equal(0f, planes.Total[4]);
        Assert.Equal(CellConditions.WeatherGradient3719 | CellConditions.WeatherGradient2219, planes.Conditions[4]);
        Assert.Equal(0f, planes.Total[5]);
        Assert.Equal(CellConditions.WeatherGradient2219, planes.Conditions[5]);
        Assert.Equal((1, 2), (counts.Gradient3719, counts.Gradient2219));
        Assert.True(planes.Unscreened[5] > 0.05f, "The unscreened total keeps what the screen took.");
        Assert.Equal(1f, planes.Total[6], 1e-5f);
        Assert.Equal(1f, planes.Total[7]);
        Assert.True((planes.Conditions[7] & CellConditions.ClippedAbove) != 0);
        Assert.Equal(2, counts.NoObservation);
        Assert.Equal(0, counts.NoSolution);
        Assert.All(Enumerable.Range(4, 4), cell => Assert.InRange(planes.StandardError[cell], 0.03f, 0.06f));
    }
}
