namespace IceExtent.Retrieval.Tests.Filling;

/// <summary>Cells filled from days before and after, with numbers worked by hand.</summary>
public sealed class DayFillingTests
{
    private static readonly DayFillingRules Both = new(daysBefore: 3, daysAfter: 3, changePerDay: 0.1);

    /// <summary>
    /// Origin: worked. 0.2 one day before, 0.8 two days after: 0.2 + 0.6/3 = 0.4. Error: both cells have 0.05, so their mean is
    /// 0.05 and its square 0.0025; 0.6² · 2/9 = 0.08; 0.1² · 4 · 0.4 · 0.6 · (1 · 2/3) = 0.0064; the root of 0.0889 is 0.298161.
    /// </summary>
    [Fact]
    public void Fill_OneDayBeforeAndTwoAfter_IsLinearInTime()
    {
        DayStack days = new(Both, (-1, 0.2), (0, double.NaN), (2, 0.8));

        Assert.Equal(1, days.Fill());

        Assert.Equal(0.4, days.Today.Total[0], 1e-6);
        Assert.Equal(0.2, days.Today.Multiyear[0], 1e-6);
        Assert.Equal(0.2, days.Today.FirstYear[0], 1e-6);
        Assert.Equal(0.298161, days.Today.StandardError[0], 1e-6);
        Assert.Equal(CellConditions.NoObservation | CellConditions.FilledFromDays, days.Today.Conditions[0]);
        Assert.Equal((1f, 2f), (days.Sources.Before.Span[0], days.Sources.After.Span[0]));
    }

    /// <summary>Origin: worked. Of 0.1 two days back and 0.3 one day back the nearer gives; 0.5 lies one day ahead: 0.4.</summary>
    [Fact]
    public void Fill_SeveralDaysOnASide_TakesTheNearestObserved()
    {
        DayStack days = new(Both, (-3, 0.9), (-2, 0.1), (-1, 0.3), (0, double.NaN), (1, 0.5), (2, 0.9));
        DayStack hole = new(Both, (-2, 0.1), (-1, double.NaN), (0, double.NaN), (2, 0.5));

        days.Fill();
        hole.Fill();

        Assert.Equal(0.4, days.Today.Total[0], 1e-6);
        Assert.Equal(0.3, hole.Today.Total[0], 1e-6); // 0.1 two days back, 0.5 two ahead.
        Assert.Equal((2f, 2f), (hole.Sources.Before.Span[0], hole.Sources.After.Span[0]));
    }

    [Theory]
    [InlineData(-3, 3, true)]
    [InlineData(-4, 3, false)]
    [InlineData(-3, 4, false)]
    [InlineData(-1, null, false)]
    [InlineData(null, 1, false)]
    public void Fill_BothLimitsSet_NeedsADayWithinEach(int? before, int? after, bool filled)
    {
        List<(int Offset, double Total)> around = [(0, double.NaN)];
        around.AddRange(new[] { before, after }.OfType<int>().Select(offset => (offset, 0.5)));
        DayStack days = new(Both, [.. around]);

        Assert.Equal(filled ? 1 : 0, days.Fill());

        Assert.Equal(filled, !float.IsNaN(days.Today.Total[0]));
        Assert.Equal(filled, !float.IsNaN(days.Sources.Before.Span[0]) && !float.IsNaN(days.Sources.After.Span[0]));
    }

    /// <summary>Origin: worked. 0.7 carried over 2 days: √(0.05² + 2 · 0.1² · 4 · 0.7 · 0.3) = √0.0193 = 0.138924.</summary>
    [Theory]
    [InlineData(3, 0, -2, 2f, float.NaN)]
    [InlineData(0, 3, 2, float.NaN, 2f)]
    public void Fill_OneLimitZero_CarriesTheOtherSide(int limitBefore, int limitAfter, int offset, float before, float after)
    {
        DayStack days = new(new(limitBefore, limitAfter, 0.1), (0, double.NaN), (offset, 0.7));

        Assert.Equal(1, days.Fill());

        Assert.Equal(0.7, days.Today.Total[0], 1e-6);
        Assert.Equal(0.138924, days.Today.StandardError[0], 1e-6);
        Assert.Equal((before, after), (days.Sources.Before.Span[0], days.Sources.After.Span[0]));
    }

    [Fact]
    public void Fill_LimitZero_NeverUsesThatSide()
    {
        DayStack days = new(new(0, 3, 0.1), (-1, 0.1), (0, double.NaN));

        Assert.Equal(0, days.Fill());
    }

    [Fact]
    public void Fill_CellFilledOnItsOwnDay_NeverGives()
    {
        DayStack days = new(Both, (-1, 0.2), (0, double.NaN), (1, 0.8));
        foreach (CellConditions kind in new[] { CellConditions.FilledFromNeighbours, CellConditions.FilledPolarGap, CellConditions.FilledFromDays })
        {
            days.At(-1).Conditions[0] = kind;
            Assert.Equal(0, days.Fill());
        }
    }

    [Theory]
    [InlineData(CellConditions.Land)]
    [InlineData(CellConditions.PolarGap)]
    public void Fill_LandAndPolarGap_StayAsTheyAre(CellConditions masked)
    {
        DayStack days = new(Both, (-1, 0.2), (0, double.NaN), (1, 0.8));
        days.Today.Conditions[0] = masked;

        Assert.Equal(0, days.Fill());

        Assert.True(float.IsNaN(days.Today.Total[0]));
        Assert.Equal(masked, days.Today.Conditions[0]);
    }

    [Fact]
    public void Fill_CellFilledFromNeighboursBefore_KeepsThatValue()
    {
        DayStack days = new(Both, (-1, 0.2), (0, 0.5), (1, 0.8));
        days.Today.Conditions[0] = CellConditions.NoObservation | CellConditions.FilledFromNeighbours;

        Assert.Equal(0, days.Fill());

        Assert.Equal(0.5f, days.Today.Total[0]);
        Assert.True(float.IsNaN(days.Sources.Before.Span[0]));
    }

    [Fact]
    public void Fill_NextDay_ForgetsTheSourcesOfTheLast()
    {
        DayStack days = new(Both, (-1, 0.2), (0, double.NaN), (1, 0.8));
        days.Fill();

        Assert.Equal(0, days.Fill()); // Its cell is no longer empty.

        Assert.True(float.IsNaN(days.Sources.Before.Span[0]) && float.IsNaN(days.Sources.After.Span[0]));
    }

    [Fact]
    public void Fill_MethodWithoutIceTypes_LeavesThemMissing()
    {
        DayStack days = new(Both, (-1, 0.2), (0, double.NaN), (1, 0.8));
        days.At(-1).Multiyear[0] = float.NaN;
        days.At(1).Multiyear[0] = float.NaN;

        Assert.Equal(1, days.Fill());

        Assert.Equal(0.5f, days.Today.Total[0]);
        Assert.True(float.IsNaN(days.Today.Multiyear[0]) && float.IsNaN(days.Today.FirstYear[0]));
    }

    [Fact]
    public void Fill_DaysOutOfOrderOrOfAnotherGrid_AreRefused()
    {
        ConcentrationPlanes one = new(1), two = new(2);
        DayFilling filling = new(Both);
        SourceDays sources = new(1);

        Assert.Throws<ArgumentException>(() => filling.Fill(one, [new(1, new(1)), new(-1, new(1))], sources));
        Assert.Throws<ArgumentException>(() => filling.Fill(one, [new(0, new(1))], sources));
        Assert.Throws<ArgumentException>(() => filling.Fill(one, [new(1, two)], sources));
        Assert.Throws<ArgumentException>(() => filling.Fill(two, [], sources));
        Assert.Throws<ArgumentException>(() => one.CopyFrom(two));
    }

    [Theory]
    [InlineData(-1, 0, 0.0)]
    [InlineData(16, 0, 0.0)]
    [InlineData(0, 16, 0.0)]
    [InlineData(0, 0, 0.0)]
    [InlineData(1, 1, -0.1)]
    public void Rules_ImpossibleLimits_AreRefused(int before, int after, double change) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new DayFillingRules(before, after, change));

    /// <summary>
    /// The gap's equations are linear in the rim, so a gap whose whole rim was interpolated in time is the gap between those of
    /// both days. Origin of the numbers: the two days solved on their own.
    /// </summary>
    [Fact]
    public void Fill_RimFilledFromDays_GivesTheGapBetweenBothDays()
    {
        FillingDay before = new(7, 7, (row, column) => (row + (2 * column)) / 20.0, gapRadiusCells: 1.6);
        FillingDay after = new(7, 7, (row, column) => (column * column) / 40.0, gapRadiusCells: 1.6);
        ConcentrationPlanes today = new(before.Grid.CellCount);
        today.MakeUnobserved(before.Mask);
        DayFilling filling = new(Both);

        int filled = filling.Fill(today, [new(-1, before.Planes), new(3, after.Planes)], new(before.Grid.CellCount));
        PolarGapSystem system = new(before.Grid, before.Mask);
        int gap = new PolarGapFilling(system, 1.0).Fill(today);
        before.FillGap();
        after.FillGap();

        Assert.Equal(before.Grid.CellCount - system.Cells.Length, filled);
        Assert.True(gap > 0);
        for (int cell = 0; cell < before.Grid.CellCount; cell++)
        {
            Assert.Equal((0.75 * before.Planes.Total[cell]) + (0.25 * after.Planes.Total[cell]), today.Total[cell], 1e-6);
        }
    }
}
