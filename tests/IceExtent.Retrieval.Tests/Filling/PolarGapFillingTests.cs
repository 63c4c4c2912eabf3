namespace IceExtent.Retrieval.Tests.Filling;

/// <summary>Laplace's equation in the polar gap: fields known beforehand, cells worked by hand, days that cannot be filled.</summary>
public sealed class PolarGapFillingTests
{
    private const int Side = 24;
    private const double Middle = (Side - 1) / 2.0;

    public static TheoryData<string, Func<double, double, double>> HarmonicFields() => new()
    {
        { "x", (x, _) => 0.5 + (0.04 * x) },
        { "y", (_, y) => 0.5 + (0.04 * y) },
        { "x^2 - y^2", (x, y) => 0.5 + (0.003 * ((x * x) - (y * y))) },
        { "x y", (x, y) => 0.5 + (0.003 * x * y) },
        { "a constant", (_, _) => 0.7 },
    };

    /// <summary>Origin: worked. The stencil's second differences of these fields add up to 0 exactly, so the disc gets them back.</summary>
    [Theory]
    [MemberData(nameof(HarmonicFields))]
    public void Fill_RimOfAHarmonicField_GivesTheField(string name, Func<double, double, double> field)
    {
        double At(int row, int column) => field(column - Middle, Middle - row);
        FillingDay day = new(Side, Side, At, gapRadiusCells: 8.2);

        int filled = day.FillGap();

        Assert.True(filled > 150, $"The gap of {name} has only {filled} cells.");
        for (int cell = 0; cell < Side * Side; cell++)
        {
            Assert.Equal(At(cell / Side, cell % Side), day.Planes.Total[cell], 1e-6);
            Assert.Equal(At(cell / Side, cell % Side) / 2.0, day.Planes.Multiyear[cell], 1e-6);
        }
    }

    /// <summary>
    /// Origin: worked. Two gap cells, one above the other; the rows hold 0.2, 0.4, 0.6, 0.8. 4u − v = 0.2 + 0.4 + 0.4 and
    /// 4v − u = 0.6 + 0.6 + 0.8 give u = 0.4, v = 0.6. Rim: mean 0.5, variance 0.22/6 = 0.036667; √(0.05² + 0.036667) = 0.197906.
    /// </summary>
    [Fact]
    public void Fill_TwoCells_GivesTheWorkedValues()
    {
        FillingDay day = TwoCells((row, _) => 0.2 * (row + 1));

        Assert.Equal(2, day.FillGap());

        Assert.Equal(0.4, day.Planes.Total[7], 1e-6);
        Assert.Equal(0.6, day.Planes.Total[12], 1e-6);
        Assert.Equal(0.197906, day.Planes.StandardError[7], 1e-6);
        Assert.Equal(0.2, day.Planes.Multiyear[7], 1e-6);
        Assert.Equal(0.2, day.Planes.FirstYear[7], 1e-6);
        Assert.Equal(CellConditions.PolarGap | CellConditions.FilledPolarGap, day.Planes.Conditions[12]);
    }

    /// <summary>
    /// Origin: worked. The upper cell lost all its rim, so nothing but the lower one touches it: u = v, and 4v − u =
    /// 0.1 + 0.2 + 0.6 gives 0.3 for both. Half of the six sides are left.
    /// </summary>
    [Fact]
    public void Fill_HalfOfTheRimEmpty_LetsNothingThroughThere()
    {
        FillingDay day = TwoCells((row, column) => row < 2 ? double.NaN : (row, column) switch { (2, 1) => 0.1, (2, 3) => 0.2, _ => 0.6 });

        Assert.Equal(2, day.FillGap(0.5));

        Assert.Equal(0.3, day.Planes.Total[7], 1e-6);
        Assert.Equal(0.3, day.Planes.Total[12], 1e-6);
    }

    [Fact]
    public void Fill_TooLittleOfTheRim_LeavesTheGapAsItIs()
    {
        FillingDay day = TwoCells((row, _) => row < 2 ? double.NaN : 0.5);

        Assert.Equal(0, day.FillGap(0.51));

        Assert.True(float.IsNaN(day.Planes.Total[7]) && float.IsNaN(day.Planes.Total[12]));
        Assert.Equal(CellConditions.PolarGap, day.Planes.Conditions[7]);
    }

    [Fact]
    public void Fill_NothingObserved_LeavesTheGapAsItIs() =>
        Assert.Equal(0, TwoCells((_, _) => double.NaN).FillGap(0.01));

    /// <summary>A rim cell that was itself filled in counts as empty.</summary>
    [Fact]
    public void Fill_RimFilledFromNeighbours_DoesNotCount()
    {
        FillingDay day = TwoCells((row, _) => row < 2 ? double.NaN : 0.5);
        Assert.True(day.FillNeighbours(1) > 0);

        Assert.Equal(0, day.FillGap(0.51));
    }

    /// <summary>Land parts the gap; one part's rim is empty, so the day is not filled at all.</summary>
    [Fact]
    public void Fill_OnePieceWithoutObservedRim_LeavesTheGapAsItIs()
    {
        FillingDay day = new(8, 9, (_, column) => column < 4 ? double.NaN : 0.5, gapRadiusCells: 2.2, land: (_, column) => column == 4);

        Assert.Equal(0, day.FillGap(0.01));

        day.Observe((_, column) => column < 4 ? 0.2 : 0.8);
        int filled = day.FillGap(0.01);

        Assert.Equal(Gap(day).Count(), filled);
        Assert.All(Gap(day), cell => Assert.Equal(cell % 9 < 4 ? 0.2 : 0.8, day.Planes.Total[cell], 1e-6));
    }

    /// <summary>The middle cell is locked in by land: no rim ever says anything of it.</summary>
    [Fact]
    public void Fill_CellLockedInByLand_StaysEmpty()
    {
        FillingDay day = new(7, 7, (_, _) => 0.6, gapRadiusCells: 1.6, land: (row, column) => Math.Abs(row - 3) + Math.Abs(column - 3) == 1);

        Assert.Equal(4, day.FillGap()); // The corners of the three by three.

        Assert.True(float.IsNaN(day.Planes.Total[24]));
        Assert.Equal(CellConditions.PolarGap, day.Planes.Conditions[24]);
    }

    [Fact]
    public void System_NoGap_HasNoCells()
    {
        FillingDay day = new(4, 5, (_, _) => 0.5);

        Assert.True(new PolarGapSystem(day.Grid, day.Mask).Cells.IsEmpty);
        Assert.Equal(0, day.FillGap());
    }

    [Fact]
    public void Fill_SecondDay_AllocatesNothing()
    {
        FillingDay day = new(Side, Side, (row, column) => row == 5 ? double.NaN : (row + column) / 60.0, gapRadiusCells: 8.2);
        PolarGapFilling filling = new(new PolarGapSystem(day.Grid, day.Mask), 0.5);
        filling.Fill(day.Planes);
        long before = GC.GetAllocatedBytesForCurrentThread();

        int filled = filling.Fill(day.Planes);

        Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
        Assert.True(filled > 0);
    }

    private static FillingDay TwoCells(Func<int, int, double> total) => new(4, 5, total, gapRadiusCells: 0.9);

    private static IEnumerable<int> Gap(FillingDay day)
    {
        CellConditions[] mask = day.Mask.Conditions.ToArray();
        return Enumerable.Range(0, mask.Length).Where(cell => mask[cell] == CellConditions.PolarGap);
    }
}
