using CsCheck;

namespace IceExtent.Retrieval.Tests.Tuning;

/// <summary>Tie points that follow samples.</summary>
public sealed class MovingTiePointTests
{
    private static IReadOnlyList<DaySamples> Window(double offset = 0.0, double noise = 1.0) =>
        [.. Enumerable.Range(1, 15).Select(seed => PureDays.Day(seed, offsetKelvins: offset, noiseKelvins: noise))];

    /// <summary>
    /// Origin: worked. Every sample is 2 K too warm: water moves by 2 K in each channel. Across the ice line the ice points move
    /// by as much: what is left of (FY + 2 K) is a step along the line, from first-year to multiyear ice.
    /// </summary>
    [Fact]
    public void Tune_OffsetInEverySample_MovesThePoints()
    {
        TunedDay tuned = MovingTiePoints.Tune(PureDays.Own, Window(offset: 2.0, noise: 0.2), PureDays.Rules);

        TiePoints own = PureDays.Own.TiePoints;
        Assert.Equal(TiePointState.Moving, tuned.State);
        Assert.Equal(own.OpenWater.V19Kelvins + 2.0, tuned.Tuning.TiePoints.OpenWater.V19Kelvins, 0.05);
        Assert.Equal(own.OpenWater.H19Kelvins + 2.0, tuned.Tuning.TiePoints.OpenWater.H19Kelvins, 0.05);
        double[] line = Vector(own.FirstYear, own.Multiyear);
        double[] step = Vector(tuned.Tuning.TiePoints.FirstYear, own.FirstYear);
        double[] left = [.. step.Select(kelvins => kelvins - 2.0)];
        double along = line.Zip(left, (a, b) => a * b).Sum() / Length(line);
        Assert.Equal(0.0, Math.Sqrt(Math.Max((Length(left) * Length(left)) - (along * along), 0.0)), 0.1);
    }

    /// <summary>A shift of every sample, water and ice, leaves every method's concentrations of shifted mixtures where they were.</summary>
    [Theory]
    [InlineData(NasaTeam.MethodName, 0.01)] // Ratios are not linear: a shift of 2 K in 200 leaves that much.
    [InlineData(Bootstrap.MethodName, 0.004)]
    [InlineData(Bristol.MethodName, 0.004)]
    [InlineData(SelfTuning.MethodName, 0.004)]
    public void Tune_ShiftedRadiometer_KeepsConcentrations(string name, double tolerance)
    {
        TunedDay tuned = MovingTiePoints.Tune(PureDays.Own, Window(offset: 2.0, noise: 0.2), PureDays.Rules);
        IConcentrationMethod method = ConcentrationMethods.Create(name, tuned.Tuning, Grids.Hemisphere.North);
        (double First, double Multi)[] mixtures = [(0.0, 0.0), (0.15, 0.0), (0.5, 0.2), (0.2, 0.7), (1.0, 0.0), (0.0, 1.0)];
        BrightnessPlanes observed = Mixtures(mixtures, 2.0);
        ConcentrationPlanes into = new(mixtures.Length);

        method.Retrieve(observed, new(0, mixtures.Length), into);

        for (int cell = 0; cell < mixtures.Length; cell++)
        {
            Assert.Equal(mixtures[cell].First + mixtures[cell].Multi, into.Total[cell], tolerance);
        }
    }

    [Theory]
    [InlineData(200, 0, TiePointState.MovingWater)]
    [InlineData(0, 200, TiePointState.MovingIce)]
    [InlineData(2, 2, TiePointState.TooFewSamples)]
    [InlineData(0, 0, TiePointState.TooFewSamples)]
    public void Tune_TooFewSamples_KeepsTheSensorsOwn(int water, int ice, TiePointState expected)
    {
        DaySamples[] window = [.. Enumerable.Range(1, 4).Select(seed => PureDays.Day(seed, water, ice, offsetKelvins: 5.0))];

        TunedDay tuned = MovingTiePoints.Tune(PureDays.Own, window, PureDays.Rules);

        Assert.Equal(expected, tuned.State);
        Assert.Null(tuned.Tuning.Samples);
        Assert.Equal(expected != TiePointState.MovingWater, tuned.Tuning.TiePoints.OpenWater == PureDays.Own.TiePoints.OpenWater);
        Assert.Equal(expected != TiePointState.MovingIce, tuned.Tuning.TiePoints.FirstYear == PureDays.Own.TiePoints.FirstYear);
        Assert.Equal(expected != TiePointState.MovingIce, tuned.Tuning.Surfaces!.Multiyear == PureDays.Own.Surfaces!.Multiyear);
        Assert.All(tuned.Estimates.Where(row => row.StandardErrorKelvins is null), row => Assert.Null(row.ScatterKelvins));
    }

    /// <summary>Water that looks like first-year ice leaves a triangle without area: the sensor's own points stand, and the day says why.</summary>
    [Fact]
    public void Tune_WaterLikeIce_HasNoSolutionAndKeepsTheSensorsOwn()
    {
        DaySamples[] window = [.. Enumerable.Range(1, 4).Select(seed => PureDays.Day(seed, noiseKelvins: 0.0, multiyearShare: 0.0)).Select(day => new DaySamples(day.ClosedIce, day.ClosedIce))];

        TunedDay tuned = MovingTiePoints.Tune(PureDays.Own, window, PureDays.Rules);

        Assert.Equal(TiePointState.NoSolution, tuned.State);
        Assert.Equal(PureDays.Own, tuned.Tuning);
        Assert.All(tuned.Estimates, row => Assert.Null(row.StandardErrorKelvins));
    }

    [Fact]
    public void Tune_SamplesOnTooFewDays_KeepsTheSensorsOwn() =>
        Assert.Equal(
            TiePointState.TooFewSamples,
            MovingTiePoints.Tune(PureDays.Own, [PureDays.Day(1, 5_000, 5_000), PureDays.Day(2, 5_000, 5_000)], PureDays.Rules).State);

    /// <summary>One heap of ice has no direction of its own: both ice points move by the same step, straight off the fixed line.</summary>
    [Fact]
    public void Tune_OneIceType_KeepsTheDirectionOfTheFixedLine()
    {
        DaySamples[] window = [.. Enumerable.Range(1, 15).Select(seed => PureDays.Day(seed, offsetKelvins: 3.0, multiyearShare: 0.0))];

        TiePoints moved = MovingTiePoints.Tune(PureDays.Own, window, PureDays.Rules).Tuning.TiePoints;

        double[] before = Vector(PureDays.Own.TiePoints.FirstYear, PureDays.Own.TiePoints.Multiyear);
        double[] after = Vector(moved.FirstYear, moved.Multiyear);
        Assert.All(before.Zip(after), pair => Assert.Equal(pair.First, pair.Second, 1e-6));
    }

    /// <summary>
    /// The standard error of the centre holds what it says: over 400 windows of independent days the centre of water misses the truth by
    /// as much as it says, within 10 % (the error of a standard deviation of 400 draws is 3.5 %). Seeds 1000 and up.
    /// </summary>
    [Fact]
    public void Tune_IndependentDays_StandardErrorIsThatOfTheCentre()
    {
        double truth = PureDays.Own.TiePoints.OpenWater.V19Kelvins;
        Random offsets = new(Seed: 77); // One stream: streams of neighbouring seeds are not independent.
        List<double> misses = [];
        List<double> said = [];
        for (int window = 0; window < 400; window++)
        {
            DaySamples[] days =
            [
                .. Enumerable.Range(0, 15).Select(day => PureDays.Day(1_000 + (window * 15) + day, 20, 20, 1.5 * PureDays.Normal(offsets))),
            ];
            TiePointEstimate water = MovingTiePoints.Tune(PureDays.Own, days, PureDays.Rules).Estimates
                .Single(row => row is { Surface: PureSurface.OpenWater, Channel: Channel.V19 });
            misses.Add(water.Kelvins - truth);
            said.Add(water.StandardErrorKelvins!.Value);
        }

        double real = Math.Sqrt(misses.Average(miss => miss * miss));
        Assert.InRange(Math.Sqrt(said.Average(error => error * error)) / real, 0.90, 1.25); // Upwards: a correlation below 0 counts as none.
    }

    /// <summary>Noise-free linear mixtures of what was sampled come back to 1e-5 (law over any mixture).</summary>
    [Fact]
    public void Tune_NoiseFreeMixtures_SelfTuningReturnsThem()
    {
        SelfTuning method = (SelfTuning)ConcentrationMethods.Create(
            SelfTuning.MethodName, MovingTiePoints.Tune(PureDays.Own, Window(noise: 0.0), PureDays.Rules).Tuning, Grids.Hemisphere.North);

        Gen.Select(Gen.Double[0, 1], Gen.Double[0, 1], (a, b) => a + b <= 1 ? (a, b) : (1 - a, 1 - b)).Array[1, 40].Sample(mixtures =>
        {
            ConcentrationPlanes into = new(mixtures.Length);
            method.Retrieve(Mixtures(mixtures, 0.0), new(0, mixtures.Length), into);
            return mixtures.Select((mixture, cell) => Math.Abs(into.Total[cell] - mixture.Item1 - mixture.Item2) <= 1e-5).All(right => right);
        });
    }

    private static BrightnessPlanes Mixtures((double First, double Multi)[] mixtures, double offset)
    {
        BrightnessPlanes observed = new(mixtures.Length, PureDays.Channels);
        foreach (Channel channel in PureDays.Channels)
        {
            for (int cell = 0; cell < mixtures.Length; cell++)
            {
                (double first, double multi) = mixtures[cell];
                observed.Kelvins(channel)[cell] = (float)(offset
                    + ((1 - first - multi) * PureDays.Kelvins(channel, points => points.OpenWater, surfaces => surfaces.OpenWater))
                    + (first * PureDays.Kelvins(channel, points => points.FirstYear, surfaces => surfaces.FirstYear))
                    + (multi * PureDays.Kelvins(channel, points => points.Multiyear, surfaces => surfaces.Multiyear)));
            }
        }

        return observed;
    }

    private static double[] Vector(TiePoint from, TiePoint to) =>
        [from.V19Kelvins - to.V19Kelvins, from.H19Kelvins - to.H19Kelvins, from.V37Kelvins - to.V37Kelvins];

    private static double Length(double[] vector) => Math.Sqrt(vector.Sum(value => value * value));
}
