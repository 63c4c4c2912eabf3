using CsCheck;
using IceExtent.Grids;

namespace IceExtent.Retrieval.Tests.Screens;

/// <summary>Months in which cells cannot hold ice.</summary>
public sealed class MonthMaskTests
{
    private const CellConditions Outside = CellConditions.OutsideIceMask;
    private const CellConditions Warm = CellConditions.WarmWater;
    private static readonly Channel[] Channels = [Channel.V19, Channel.H19, Channel.V37];

    /// <summary>
    /// Origin: worked. Ice of 0.6 in cells 0 to 3 with the masks none, outside, warm, both; pure water (tie point, 0 or a rounding
    /// below) outside in cell 4; nothing observed in cell 5. Counted: ice outside in 1 and 3, warm in 2 and 3.
    /// </summary>
    [Fact]
    public void Retrieve_OneCellOfEachKind_MasksMarksAndCounts()
    {
        double[] ice = [0.6, 0.6, 0.6, 0.6, -0.05, double.NaN];
        MonthMask month = new([false, true, false, true, true, true], [false, false, true, true, false, false]);

        (ConcentrationPlanes planes, RetrievalCounts counts) = Retrieve(ice, month);

        Assert.Equal([0.6f, 0f, 0f, 0f, 0f, float.NaN], planes.Total.ToArray(), (one, other) => one.Equals(other) || Math.Abs(one - other) < 1e-5f);
        Assert.Equal([CellConditions.None, Outside, Warm, Outside | Warm, Outside, CellConditions.NoObservation], planes.Conditions.ToArray());
        Assert.Equal((2, 2), (counts.OutsideIceMask, counts.WarmWater));
        Assert.All(Enumerable.Range(0, 4), cell => Assert.Equal(0.6f, planes.Unscreened[cell], 1e-5f));
        Assert.Equal([0f, 0f], new[] { planes.FirstYear[1], planes.Multiyear[1] });
        Assert.Equal(0.05f, planes.StandardError[1], 1e-6f); // That of open water.
        Assert.Equal(0, counts.ClippedBelow); // A masked cell is 0 before it is clipped.
    }

    /// <summary>Origin: worked. 1 % first-year ice has a 37/19 ratio of 0.0503: the screen at 0.05 takes it, and the mask marks it and takes nothing.</summary>
    [Fact]
    public void Retrieve_CellThatAScreenTook_CountsThereAlone()
    {
        (ConcentrationPlanes planes, RetrievalCounts counts) = Retrieve([0.01, 0.6], new([true, true], null), gradient3719Limit: 0.05);

        Assert.Equal((1, 1), (counts.Gradient3719, counts.OutsideIceMask));
        Assert.Equal(CellConditions.WeatherGradient3719 | Outside, planes.Conditions[0]);
        Assert.Equal(0.01f, planes.Unscreened[0], 1e-5f);
    }

    /// <summary>Cells that no mask holds are those of the retrieval without one, bit by bit; across runs of cells too.</summary>
    [Fact]
    public void Retrieve_AnyMask_LeavesOtherCellsAlone() =>
        Gen.Select(Gen.Double[-0.1, 1.1].Array[9_000, 9_100], Gen.Int[2, 9]).Sample(
            (ice, every) =>
            {
                MonthMask month = new([.. ice.Select((_, cell) => cell % every == 0)], null);
                (ConcentrationPlanes plain, _) = Retrieve(ice, null);
                (ConcentrationPlanes masked, RetrievalCounts counts) = Retrieve(ice, month);
                return ice.Select((_, cell) => cell).All(cell => cell % every == 0
                        ? masked.Total[cell] == 0f && (masked.Conditions[cell] & Outside) != 0
                        : masked.Total[cell].Equals(plain.Total[cell]) && masked.Conditions[cell] == plain.Conditions[cell])
                    && masked.Unscreened.SequenceEqual(plain.Unscreened)
                    && counts.OutsideIceMask == ice.Select((_, cell) => cell).Count(cell => cell % every == 0 && plain.Unscreened[cell] > 0f);
            },
            iter: 20);

    /// <summary>Origin: worked. A filled cell outside is set to 0 and marked; one inside, an empty one and one of 0 stay.</summary>
    [Fact]
    public void ClearFilled_IceOutside_BecomesOpenWater()
    {
        ConcentrationPlanes planes = new(4);
        float[] filled = [0.4f, 0.4f, float.NaN, 0f];
        filled.CopyTo(planes.Total);
        planes.Multiyear.Fill(0.1f);
        planes.Conditions.Fill(CellConditions.FilledFromNeighbours);

        int cleared = new MonthMask([true, false, true, true], null).ClearFilled(planes);

        Assert.Equal(1, cleared);
        Assert.Equal([0f, 0.4f, float.NaN, 0f], planes.Total.ToArray());
        Assert.Equal((0f, 0f), (planes.Multiyear[0], planes.FirstYear[0]));
        Assert.Equal(CellConditions.FilledFromNeighbours | Outside, planes.Conditions[0]);
        Assert.Equal(CellConditions.FilledFromNeighbours, planes.Conditions[1]);
    }

    [Fact]
    public void MonthMask_NoMaskOrTwoSizes_IsRefused()
    {
        Assert.Throws<ArgumentException>(() => new MonthMask(null, null));
        Assert.Throws<ArgumentException>(() => new MonthMask(new bool[3], new bool[4]));
        Assert.Throws<ArgumentException>(() => new MonthMask(new bool[3], null).ClearFilled(new(4)));
    }

    private static (ConcentrationPlanes Planes, RetrievalCounts Counts) Retrieve(double[] firstYear, MonthMask? month, double gradient3719Limit = 0.2)
    {
        Grid grid = new("row", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(firstYear.Length, 1, 100.0, 0.0, 50.0));
        CellMask mask = new(grid, Enumerable.Repeat(true, firstYear.Length).ToArray(), null);
        BrightnessPlanes observed = new(firstYear.Length, Channels);
        for (int cell = 0; cell < firstYear.Length; cell++)
        {
            (double v19, double h19, double v37) = TiePointSets.Mix(TiePointSets.F13North, firstYear[cell], 0.0);
            observed.Kelvins(Channel.V19)[cell] = (float)v19;
            observed.Kelvins(Channel.H19)[cell] = (float)h19;
            observed.Kelvins(Channel.V37)[cell] = (float)v37;
        }

        ConcentrationPlanes planes = new(firstYear.Length);
        RetrievalCounts counts = new DayRetrieval(new NasaTeam(TiePointSets.F13North), new(gradient3719Limit, null), new(0.05, 0.05), mask)
            .Retrieve(observed, new CellConditions[firstYear.Length], planes, month);
        return (planes, counts);
    }
}
