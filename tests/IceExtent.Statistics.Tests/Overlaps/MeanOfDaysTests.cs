using IceExtent.Statistics.Overlaps;

namespace IceExtent.Statistics.Tests.Overlaps;

/// <summary>Means of days that are alike.</summary>
public sealed class MeanOfDaysTests
{
    private static readonly DateOnly First = new(1987, 7, 10);

    /// <summary>
    /// Origin: worked. Days that turn about have r = -1, which counts as none: six effective days, Σe² = 6, standard error
    /// √(6/(6·5)) = 0.44721; t of 5 degrees of freedom is 2.5706 (SciPy 1.10.1): limits at 10 ± 1.14960.
    /// </summary>
    [Fact]
    public void Of_DaysThatTurnAbout_AreAllCounted()
    {
        MeanOfDays mean = Daily(9, 11, 9, 11, 9, 11);

        Assert.Equal((6, 10.0, MeanLimits.Given), (mean.Days, mean.Mean, mean.Limits));
        Assert.Equal(Math.Sqrt(1.2), mean.StandardDeviation!.Value, 1e-12);
        Assert.Equal(0.0, mean.Lag1Correlation);
        Assert.Equal(6.0, mean.EffectiveDays);
        Assert.Equal(0.44721, mean.StandardError!.Value, 1e-5);
        Assert.Equal(8.85040, mean.Lower95!.Value, 1e-5);
        Assert.Equal(11.14960, mean.Upper95!.Value, 1e-5);
    }

    /// <summary>
    /// Origin: worked. Σe² = 8, the seven products sum to 1: raw r = (1/7)/(8/8), corrected (8/7 + 1)/5 = 0.428571, so n_eff =
    /// 8·0.571429/1.428571 = 3.2 and the standard error is √(8/(8·2.2)) = 0.674200. t of 2.2 degrees of freedom is
    /// 3.9487207 (SciPy 1.10.1): limits at ±2.662227.
    /// </summary>
    [Fact]
    public void Of_DaysInPairs_CountForFewer()
    {
        MeanOfDays mean = Daily(1, 1, -1, -1, 1, 1, -1, -1);

        Assert.Equal(0.428571, mean.Lag1Correlation!.Value, 1e-6);
        Assert.Equal(3.2, mean.EffectiveDays!.Value, 1e-12);
        Assert.Equal(0.674200, mean.StandardError!.Value, 1e-6);
        Assert.Equal(-2.662227, mean.Lower95!.Value, 1e-6);
        Assert.Equal(2.662227, mean.Upper95!.Value, 1e-6);
    }

    /// <summary>Every other day, with one longer pause: the same series gives the same answer but for the pair across the pause.</summary>
    [Fact]
    public void Of_SensorThatLooksEveryOtherDay_TakesItsOwnStep()
    {
        double[] values = [1, 1, -1, -1, 1, 1, -1, -1];
        DateOnly[] everyOther = [.. Enumerable.Range(0, 8).Select(day => First.AddDays(2 * day))];
        DateOnly[] paused = [.. everyOther.Select((day, index) => index < 4 ? day : day.AddDays(300))];

        Assert.Equal(Daily(values), MeanOfDays.Of(everyOther, values));

        // Origin: worked. Without the product of days 4 and 5, -1, six products sum to 2: raw r = 1/3, corrected (8/3 + 1)/5.
        Assert.Equal(11.0 / 15.0, MeanOfDays.Of(paused, values).Lag1Correlation!.Value, 1e-12);
    }

    [Theory]
    [InlineData(1, MeanLimits.OneDay)]
    [InlineData(2, MeanLimits.FewDays)]
    [InlineData(3, MeanLimits.FewDays)]
    public void Of_TooFewDays_HasNoLimitsAndSaysWhy(int days, MeanLimits reason)
    {
        MeanOfDays mean = Daily([.. Enumerable.Range(0, days).Select(day => (double)day)]);

        Assert.Equal(reason, mean.Limits);
        Assert.Equal((days - 1) / 2.0, mean.Mean);
        Assert.Equal(days == 1, mean.StandardDeviation is null);
        Assert.Equal((null, null, null), (mean.StandardError, mean.Lower95, mean.Upper95));
    }

    /// <summary>Origin: worked. A steady rise has r near 1: no number of its days is worth more than two.</summary>
    [Fact]
    public void Of_SteadyRise_HasNoLimitsAndSaysWhy()
    {
        MeanOfDays mean = Daily(1, 2, 3, 4, 5, 6, 7, 8);

        Assert.Equal(MeanLimits.FewEffectiveDays, mean.Limits);
        Assert.InRange(mean.EffectiveDays!.Value, 0.0, 2.0);
        Assert.Null(mean.Upper95);
    }

    [Fact]
    public void Of_EqualDays_HasLimitsOfNoWidth()
    {
        MeanOfDays mean = Daily(5, 5, 5, 5, 5);

        Assert.Equal((MeanLimits.Given, 5.0, 5.0, 0.0), (mean.Limits, mean.Lower95, mean.Upper95, mean.StandardError));
    }

    [Fact]
    public void Of_NoDay_IsRefused() => Assert.Throws<ArgumentException>(() => MeanOfDays.Of([], []));

    /// <summary>
    /// Origin: worked. The true mean of the autoregressive days is 0, and 95 % limits should hold it in 95 of 100 series. Two
    /// thousand series tell that to 0.5 %; it does not prove the limits for errors of another kind than these.
    /// </summary>
    [Theory]
    [InlineData(0.0, 30)]
    [InlineData(0.5, 30)]
    [InlineData(0.5, 150)]
    [InlineData(0.8, 150)]
    public void Of_AutoregressiveDays_HoldsTheTrueMeanAsOftenAsItSays(double correlation, int days)
    {
        const int Series = 2_000;
        Random random = new(19_870_709);
        int held = 0;
        int withLimits = 0;
        for (int series = 0; series < Series; series++)
        {
            double[] values = new double[days];
            double state = Normal(random);
            for (int day = 0; day < days; day++)
            {
                values[day] = state;
                state = (correlation * state) + (Math.Sqrt(1.0 - (correlation * correlation)) * Normal(random));
            }

            MeanOfDays mean = Daily(values);
            withLimits += mean.Limits == MeanLimits.Given ? 1 : 0;
            held += mean.Lower95 <= 0.0 && mean.Upper95 >= 0.0 ? 1 : 0;
        }

        Assert.InRange((double)withLimits / Series, 0.98, 1.0);
        Assert.InRange((double)held / withLimits, 0.93, 0.975);
    }

    private static MeanOfDays Daily(params double[] values) =>
        MeanOfDays.Of([.. Enumerable.Range(0, values.Length).Select(day => First.AddDays(day))], values);

    private static double Normal(Random random) =>
        Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
}
