using CsCheck;

namespace IceExtent.Retrieval.Tests;

/// <summary>Land taken out of brightness temperatures. Source: [Maass2010].</summary>
public sealed class CoastBrightnessTests
{
    private const float Land = 250f;
    private const float Sea = 160f;

    private static readonly CoastBrightnessRules Rules = new(
        0.01, 0.90, 0.20, new(100_000.0, 0.95, 1_000_000.0, 9, 5.0, 1e-5, 2.0, 4.0, 30.0)); // As config/defaults.toml.
    private static readonly KelvinRange Range = new(50.0, 350.0);
    private static readonly Dictionary<Channel, double> Footprints = new() { [Channel.V19] = 54_470.0, [Channel.V37] = 32_190.0 };

    // Land in columns 0 to 9, sea in 10 to 19.
    private static CoastGrid StraightCoast { get; } = new([.. Enumerable.Repeat("##########..........", 15)]);

    /// <summary>Origin: worked. (220 − 0.2·250)/(1 − 0.2) = 170/0.8 = 212.5 K.</summary>
    [Fact]
    public void SeaKelvins_WorkedCell_IsTheWorkedTemperature() => Assert.Equal(212.5f, CoastBrightness.SeaKelvins(220f, 250f, 0.2f), 1e-4f);

    /// <summary>
    /// Origin: worked. Land left of x = 0, sea right of it: a Gaussian antenna at x sees Φ(−x/σ) of land, and a cell holds
    /// the mean over its width. That is worked out here by sums of its own. The correction returns the sea to 0.3 K, where
    /// the land signal was up to 27 K; what is left is land that holds a little sea, and the cut of the pattern.
    /// </summary>
    [Fact]
    public void Correct_StraightCoastSeenByAGaussian_ReturnsTheSea()
    {
        BrightnessPlanes observed = Observed(StraightCoast, (channel, cell) => Sea + ((Land - Sea) * (float)SmearedLand((cell % 20) - 10, Footprints[channel])));
        CellConditions[] conditions = new CellConditions[observed.CellCount];
        float before = observed.Kelvins(Channel.V19)[(7 * 20) + 10];

        int corrected = Make(StraightCoast).Correct(observed, conditions);

        Assert.InRange(before, Sea + 20f, Sea + 30f);
        Assert.Equal(15 * 2, corrected); // In the third column the footprint holds Φ(−2.5/1.01) = 0.007 of land: below a hundredth.
        for (int cell = 0; cell < conditions.Length; cell++)
        {
            Assert.Equal(cell % 20 is 10 or 11, conditions[cell] == CellConditions.CoastCorrected);
            if (cell % 20 is 10 or 11)
            {
                Assert.Equal(Sea, observed.Kelvins(Channel.V19)[cell], 0.3f);
                Assert.Equal(Sea, observed.Kelvins(Channel.V37)[cell], 0.3f);
            }
        }
    }

    [Fact]
    public void Correct_AnyDay_TouchesOnlySeaWithinTheFootprint() =>
        Days().Sample(day =>
        {
            (BrightnessPlanes observed, BrightnessPlanes before) = (Observed(day.Coast, day.Kelvins), Observed(day.Coast, day.Kelvins));
            CellConditions[] conditions = new CellConditions[observed.CellCount];

            int corrected = Make(day.Coast).Correct(observed, conditions);

            Assert.Equal(conditions.Count(condition => condition == CellConditions.CoastCorrected), corrected);
            for (int cell = 0; cell < observed.CellCount; cell++)
            {
                bool marked = conditions[cell] != CellConditions.None;
                bool same = Same(observed, before, cell);
                Assert.True(marked ? day.Coast.Ocean[cell] && LandWithin(day.Coast, cell, 3) : same, $"cell {cell}");
                Assert.Equal(float.IsNaN(before.Kelvins(Channel.V19)[cell]), float.IsNaN(observed.Kelvins(Channel.V19)[cell]));
            }
        });

    /// <summary>The order of the cells does not matter: a day turned about gives the turned answer.</summary>
    [Fact]
    public void Correct_DayTurnedAbout_GivesTheAnswerTurnedAbout() =>
        Days().Sample(day =>
        {
            int last = day.Coast.Grid.CellCount - 1;
            CoastGrid turned = new(day.Coast.Grid.Columns, [.. day.Coast.Land.Fraction.ToArray().Reverse()]);
            BrightnessPlanes straight = Observed(day.Coast, day.Kelvins);
            BrightnessPlanes about = Observed(turned, (channel, cell) => day.Kelvins(channel, last - cell));

            Make(day.Coast).Correct(straight, new CellConditions[last + 1]);
            Make(turned).Correct(about, new CellConditions[last + 1]);

            for (int cell = 0; cell <= last; cell++)
            {
                Assert.Equal(straight.Kelvins(Channel.V19)[cell], about.Kelvins(Channel.V19)[last - cell], 0.01f);
            }
        });

    [Fact]
    public void Correct_NothingTellsOfLand_LeavesTheCellAlone()
    {
        BrightnessPlanes observed = Observed(StraightCoast, (_, cell) => cell == 10 ? Sea : float.NaN);

        Assert.Equal(0, Make(StraightCoast).Correct(observed, new CellConditions[observed.CellCount]));
        Assert.Equal(Sea, observed.Kelvins(Channel.V19)[10]);
    }

    /// <summary>
    /// Origin: worked. Even land and sea lie on one straight line of temperature over land share, whose end at 1 is land: no cell
    /// of pure land is needed. The shares are the product's own, so this tells of the fit and not of the pattern.
    /// </summary>
    [Fact]
    public void Correct_IslandWithoutPureLand_ReturnsTheSea()
    {
        CoastGrid island = new([.. Enumerable.Range(0, 16).Select(row => row is 7 or 8 ? ".......##......." : new string('.', 16))]);
        BrightnessPlanes observed = Observed(island, (channel, cell) => Sea + ((Land - Sea) * Share(island, channel)[cell]));

        int corrected = Make(island).Correct(observed, new CellConditions[observed.CellCount]);

        Assert.InRange(corrected, 12, 32);
        Assert.Equal(Sea, observed.Kelvins(Channel.V19)[(6 * 16) + 7], 0.05f);
        Assert.Equal(Sea, observed.Kelvins(Channel.V37)[(6 * 16) + 7], 0.05f);
    }

    /// <summary>
    /// Origin: worked. A belt of ice at 240 K lies along the coast, two cells wide, with open sea at 160 K beyond it, all seen
    /// through the pattern. What the sea's own share of the pattern holds is (T − a·250)/(1 − a). Land that took ice for land
    /// would make it colder.
    /// </summary>
    [Fact]
    public void Correct_BeltOfIceAlongTheCoast_IsNotTakenForLand()
    {
        float[] surface = [.. Enumerable.Range(0, 15 * 20).Select(cell => (cell % 20) switch { < 10 => Land, < 12 => 240f, _ => Sea })];
        Dictionary<Channel, float[]> seen = Footprints.ToDictionary(
            footprint => footprint.Key, footprint => FootprintShare.Of(surface, 20, FootprintShare.Weights(footprint.Value, CoastGrid.CellMeters)));
        BrightnessPlanes observed = Observed(StraightCoast, (channel, cell) => seen[channel][cell]);

        Make(StraightCoast).Correct(observed, new CellConditions[observed.CellCount]);

        int shore = (7 * 20) + 10;
        foreach (Channel channel in Footprints.Keys)
        {
            float share = Share(StraightCoast, channel)[shore];
            Assert.Equal((seen[channel][shore] - (share * Land)) / (1f - share), observed.Kelvins(channel)[shore], 2f);
        }
    }

    /// <summary>
    /// Origin: worked. With a the share of land in the widest footprint, 0.2·a/(1 − a) of concentration may be land; 0.05 was
    /// there before.
    /// </summary>
    [Fact]
    public void WidenErrors_CorrectedCell_HoldsWhatLandMayLeave()
    {
        ConcentrationPlanes planes = new(StraightCoast.Grid.CellCount);
        planes.StandardError.Fill(0.05f);
        planes.Conditions[10] = CellConditions.CoastCorrected;

        Make(StraightCoast).WidenErrors(planes);

        double share = Share(StraightCoast, Channel.V19)[10];
        Assert.Equal(Math.Sqrt(0.0025 + Math.Pow(0.2 * share / (1.0 - share), 2.0)), planes.StandardError[10], 1e-6);
        Assert.Equal(0.05f, planes.StandardError[11]); // Coastal too, but not corrected on this day.
    }

    /// <summary>Origin: worked. With a 0.3 and land at 250 K, 80 K would become 7 K, which no surface has.</summary>
    [Fact]
    public void Correct_TemperatureBeyondBelief_LeavesAllChannelsOfTheCellAlone()
    {
        BrightnessPlanes observed = Observed(StraightCoast, (channel, cell) => cell % 20 < 10 ? Land : channel == Channel.V19 ? 80f : 200f);

        Make(StraightCoast).Correct(observed, new CellConditions[observed.CellCount]);

        Assert.Equal((80f, 200f), (observed.Kelvins(Channel.V19)[10], observed.Kelvins(Channel.V37)[10]));
    }

    [Fact]
    public void Cells_SeaRingedByLandOrFarFromIt_AreNotAmongThem()
    {
        CoastGrid coast = new("###########......", "###########......", "###########......", "#####.#####......", "###########......", "###########......", "###########......");

        CoastBrightness correction = Make(coast, Rules with { MostLandFraction = 0.7 });

        Assert.DoesNotContain((3 * 17) + 5, correction.Cells.ToArray());
        Assert.DoesNotContain((3 * 17) + 16, correction.Cells.ToArray());
        Assert.Contains((3 * 17) + 11, correction.Cells.ToArray());
    }

    private static CoastBrightness Make(CoastGrid coast, CoastBrightnessRules? rules = null) =>
        new(coast.Grid, coast.Land, coast.Ocean, Footprints, Range, rules ?? Rules);

    private static float[] Share(CoastGrid coast, Channel channel) =>
        FootprintShare.Of(coast.Land.Fraction, coast.Grid.Columns, FootprintShare.Weights(Footprints[channel], CoastGrid.CellMeters));

    private static BrightnessPlanes Observed(CoastGrid coast, Func<Channel, int, float> kelvins)
    {
        BrightnessPlanes observed = new(coast.Grid.CellCount, Footprints.Keys);
        foreach (Channel channel in Footprints.Keys)
        {
            for (int cell = 0; cell < coast.Grid.CellCount; cell++)
            {
                observed.Kelvins(channel)[cell] = kelvins(channel, cell);
            }
        }

        return observed;
    }

    // Land left of a line, any temperatures, some missing.
    private static Gen<(CoastGrid Coast, Func<Channel, int, float> Kelvins)> Days() =>
        Gen.Select(Gen.Int[2, 14].Array[12], Gen.Float[150f, 260f].Array[12 * 20], Gen.Float[0f, 1f].Array[12 * 20]).Select((edges, values, chance) =>
        {
            CoastGrid coast = new([.. edges.Select(edge => new string('#', edge) + new string('.', 20 - edge))]);
            return (coast, (Func<Channel, int, float>)((channel, cell) =>
                chance[cell] < 0.1f ? float.NaN : values[cell] + (channel == Channel.V37 ? 5f : 0f)));
        });

    private static bool Same(BrightnessPlanes left, BrightnessPlanes right, int cell) =>
        Footprints.Keys.All(channel => left.Kelvins(channel)[cell].Equals(right.Kelvins(channel)[cell]));

    private static bool LandWithin(CoastGrid coast, int cell, int reach) =>
        Enumerable.Range(0, coast.Grid.CellCount).Any(other =>
            !coast.Ocean[other]
            && Math.Abs((other % coast.Grid.Columns) - (cell % coast.Grid.Columns)) <= reach
            && Math.Abs((other / coast.Grid.Columns) - (cell / coast.Grid.Columns)) <= reach);

    // The mean of Φ(−x/σ) over a cell that starts so many cells right of the coast.
    private static double SmearedLand(int cellsFromCoast, double footprintMeters)
    {
        const int Steps = 100;
        double deviationCells = footprintMeters / CoastGrid.CellMeters / 2.354820045;
        double sum = 0.0;
        for (int step = 0; step < Steps; step++)
        {
            sum += UpperTail((cellsFromCoast + ((step + 0.5) / Steps)) / deviationCells) / Steps;
        }

        return sum;
    }

    // The probability that a normal number exceeds a value, by the midpoint rule up to nine deviations.
    private static double UpperTail(double value)
    {
        const int Steps = 2_000;
        double width = (9.0 - Math.Max(value, -9.0)) / Steps;
        double sum = 0.0;
        for (int step = 0; step < Steps && width > 0.0; step++)
        {
            double at = Math.Max(value, -9.0) + ((step + 0.5) * width);
            sum += Math.Exp(-0.5 * at * at) * width;
        }

        return sum / Math.Sqrt(2.0 * Math.PI);
    }
}
