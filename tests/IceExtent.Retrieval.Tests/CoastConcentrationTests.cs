using CsCheck;

namespace IceExtent.Retrieval.Tests;

/// <summary>Ice that land feigns, taken out of concentrations. Sources: [Cavalieri1999], [Markus2009].</summary>
public sealed class CoastConcentrationTests
{
    private static readonly CoastMinimumRules Rules = new(new(0.60, 7), new(0.40, 5), new(0.20, 3), 0.15, 3); // As config/defaults.toml.
    private static readonly CoastSpillRules Spill = new(0.90, 7);

    // Column 0 is land; columns 1 to 3 are shore, near-shore and offshore.
    private static CoastGrid Coast { get; } = new([.. Enumerable.Repeat("#.......", 9)]);

    /// <summary>Origin: worked by counting cells, corners included.</summary>
    [Fact]
    public void Zones_SmallIsland_AreRings()
    {
        CoastGrid island = new(".........", ".........", ".........", "...#.....", ".........");

        Assert.Equal(
            "333333300" + "322222300" + "321112300" + "321012300" + "321112300",
            string.Concat(island.Zones.Zones.ToArray().Select(zone => (int)zone)));
    }

    /// <summary>Origin: worked. The smallest month, then the caps 60, 40 and 20 %; the fourth cell has no zone.</summary>
    [Theory]
    [InlineData(0.70f, 0.90f, 0.60f, 0.40f, 0.20f)]
    [InlineData(0.30f, 0.90f, 0.30f, 0.30f, 0.20f)]
    [InlineData(0.90f, 0.05f, 0.05f, 0.05f, 0.05f)]
    [InlineData(float.NaN, 0.25f, 0.25f, 0.25f, 0.20f)]
    [InlineData(float.NaN, float.NaN, 0f, 0f, 0f)]
    public void Build_TwoMonths_TakesTheSmallestAndCapsIt(float january, float july, float shore, float nearShore, float offshore)
    {
        float[] minimum = CoastMinimum.Build([Plane(january), Plane(july)], Coast.Zones, Rules);

        Assert.Equal([0f, shore, nearShore, offshore, 0f, 0f, 0f, 0f], minimum[..8]);

        static ReadOnlyMemory<float> Plane(float fraction) => Enumerable.Repeat(fraction, 72).ToArray();
    }

    /// <summary>
    /// Origin: worked. Minima 0.30, 0.20, 0.10. Three columns of ice of 50 % with open water beyond:
    /// each cell loses its minimum where its square reaches three open cells: the shore cell's 7 cells wide, the near-shore
    /// cell's 5, the offshore cell's 3.
    /// </summary>
    [Fact]
    public void Minimum_OpenWaterBesideTheCoast_IsSubtractedInEachZone()
    {
        ConcentrationPlanes day = Coast.Day(cell => cell % 8 <= 3 ? 0.5f : 0f);
        CoastMinimumStep step = new(Coast.Zones, Minima(0.30f, 0.20f, 0.10f), Rules);

        int corrected = step.Correct(day);

        // Column 4 is the first open one: in each square it gives as many open cells as the square has rows. Those of the
        // offshore cells in the top and bottom row have but two.
        Assert.Equal(27 - 2, corrected);
        Assert.Equal([0.2f, 0.3f, 0.4f, 0f], day.Total[33..37].ToArray().Select(value => MathF.Round(value, 6)));
        Assert.Equal(CellConditions.CoastCorrected, day.Conditions[33]);
        Assert.Equal(CellConditions.None, day.Conditions[36]);
        Assert.Equal(0.2f / 3f, day.Multiyear[33], 1e-6f);
        Assert.Equal(0.4f / 3f, day.FirstYear[33], 1e-6f);
    }

    /// <summary>Origin: worked. 0.05 less 0.30 is below 0 and becomes 0; 0 has nothing to lose and is not marked.</summary>
    [Fact]
    public void Minimum_LessIceThanTheMinimum_BecomesOpenWater()
    {
        ConcentrationPlanes day = Coast.Day(cell => cell % 8 == 1 ? 0.05f : 0f);

        int corrected = new CoastMinimumStep(Coast.Zones, Minima(0.30f, 0.20f, 0.10f), Rules).Correct(day);

        Assert.Equal(9, corrected);
        Assert.Equal((0f, 0f, 0f), (day.Total[33], day.Multiyear[33], day.FirstYear[33]));
        Assert.Equal(CellConditions.None, day.Conditions[34]);
    }

    /// <summary>Origin: worked. Two open cells in the square are not three.</summary>
    [Theory]
    [InlineData(2, 0)]
    [InlineData(3, 1)]
    public void Minimum_FewOpenCells_NeedThree(int open, int corrected)
    {
        CoastGrid inlet = new("#...", "####", "####", "####");
        ConcentrationPlanes day = inlet.Day(cell => cell >= 4 - open ? 0.1f : 0.9f);
        float[] minima = new float[16];
        minima[1] = 0.3f;

        Assert.Equal(corrected, new CoastMinimumStep(inlet.Zones, minima, Rules).Correct(day));
    }

    [Fact]
    public void Minimum_ClosedIce_IsLeftAlone()
    {
        ConcentrationPlanes day = Coast.Day(_ => 0.95f);

        Assert.Equal(0, new CoastMinimumStep(Coast.Zones, Minima(0.60f, 0.40f, 0.20f), Rules).Correct(day));
        Assert.Equal(0.95f, day.Total[33]);
    }

    /// <summary>
    /// Origin: worked. Beside a straight coast of land without end the 7 × 7 square of the shore cell holds 3 columns of
    /// land: 0.9·3/7 = 0.3857; of the next cells 2 and 1: 0.2571 and 0.1286. Not above it is open water.
    /// </summary>
    [Theory]
    [InlineData(0.38f, 0.25f, 0.12f, 0f, 0f, 0f)]
    [InlineData(0.39f, 0.26f, 0.13f, 0.39f, 0.26f, 0.13f)]
    public void Spill_StraightCoast_EmptiesWhatLandAloneWouldFeign(
        float shore, float second, float third, float shoreKept, float secondKept, float thirdKept)
    {
        CoastGrid coast = new([.. Enumerable.Repeat("###......", 9)]);
        ConcentrationPlanes day = coast.Day(cell => (cell % 9) switch { 3 => shore, 4 => second, 5 => third, _ => 0.01f });

        new CoastSpillStep(coast.Grid, coast.Land, coast.Ocean, Spill).Correct(day);

        Assert.Equal([shoreKept, secondKept, thirdKept, 0.01f], day.Total[39..43].ToArray());
        Assert.Equal(shoreKept == 0f ? CellConditions.CoastCorrected : CellConditions.None, day.Conditions[39]);
    }

    [Fact]
    public void Steps_AnyDay_NeverAddIceAndStayNearLand() =>
        Days().Sample(values =>
        {
            foreach (ICoastStep step in Steps())
            {
                ConcentrationPlanes day = Coast.Day(cell => values[cell]);
                float[] before = day.Total.ToArray();

                int corrected = step.Correct(day);

                Assert.Equal(corrected, day.Conditions.ToArray().Count(condition => condition == CellConditions.CoastCorrected));
                for (int cell = 0; cell < before.Length; cell++)
                {
                    bool marked = day.Conditions[cell] != CellConditions.None;
                    Assert.True(marked ? day.Total[cell] <= before[cell] && cell % 8 is >= 1 and <= 3 : day.Total[cell].Equals(before[cell]), $"cell {cell}");
                    Assert.True(float.IsNaN(before[cell]) || (day.Multiyear[cell] >= 0f && day.FirstYear[cell] >= 0f), $"types of cell {cell}");
                    Assert.Equal(float.IsNaN(before[cell]), float.IsNaN(day.Total[cell]));
                }
            }
        });

    /// <summary>The order of the cells does not matter: a day upside down gives the answer upside down, to the last bit.</summary>
    [Fact]
    public void Steps_DayUpsideDown_GivesTheAnswerUpsideDown() =>
        Days().Sample(values =>
        {
            foreach (ICoastStep step in Steps())
            {
                ConcentrationPlanes upright = Coast.Day(cell => values[cell]);
                ConcentrationPlanes flipped = Coast.Day(cell => values[Flip(cell)]);

                step.Correct(upright);
                step.Correct(flipped);

                Assert.Equal(upright.Total.ToArray(), Enumerable.Range(0, 72).Select(cell => flipped.Total[Flip(cell)]));
            }

            static int Flip(int cell) => ((8 - (cell / 8)) * 8) + (cell % 8);
        });

    private static IEnumerable<ICoastStep> Steps() =>
    [
        new CoastMinimumStep(Coast.Zones, Minima(0.30f, 0.20f, 0.10f), Rules),
        new CoastSpillStep(Coast.Grid, Coast.Land, Coast.Ocean, Spill),
    ];

    private static Gen<float[]> Days() =>
        Gen.Select(Gen.Float[-0.3f, 1f].Array[72], Gen.Float[0f, 1f].Array[72]).Select((values, chance) =>
            values.Zip(chance, (value, missing) => missing < 0.1f ? float.NaN : Math.Max(value, 0f)).ToArray());

    private static float[] Minima(float shore, float nearShore, float offshore) =>
        [.. Enumerable.Range(0, 72).Select(cell => (cell % 8) switch { 1 => shore, 2 => nearShore, 3 => offshore, _ => 0f })];
}
