namespace IceExtent.Retrieval.Tests.Screens;

/// <summary>Limits drawn from pure surfaces.</summary>
public sealed class ScreenRetuningTests
{
    private static readonly WeatherScreens Fixed = new(0.05, 0.045);

    /// <summary>
    /// Origin: worked. F13 north, 10 % first-year ice: 19V 0.9·185.2 + 0.1·251.2 = 191.8, 37V 0.9·205.2 + 0.1·241.1 = 208.79,
    /// ratio 16.99/400.59 = 0.042412. Multiyear ice alone would give 14.38/392.22 = 0.036663, the smaller. No 22V is known.
    /// </summary>
    [Fact]
    public void ScreensFor_TiePointsAlone_IsTheMixtureWithFirstYearIce()
    {
        WeatherScreens screens = ScreenRetuning.ScreensFor(new(TiePointSets.F13North, Fixed), 0.10);

        Assert.Equal(0.042412, screens.Gradient3719Limit, 5e-7);
        Assert.Equal(0.045, screens.Gradient2219Limit);
    }

    /// <summary>
    /// Origin: printed intention, from memory (high): the fixed limit 0.07 of SMMR stands for 12 % first-year ice ([Gloersen1986]),
    /// to half of its last digit.
    /// </summary>
    [Fact]
    public void Limit_SmmrAndTwelvePercent_IsTheFixedLimit() =>
        Assert.Equal(0.07, ScreenRetuning.ScreensFor(new(TiePointSets.SmmrNorth, new(0.0, null)), 0.12).Gradient3719Limit, 0.0005);

    /// <summary>
    /// Origin: worked. Surfaces rule over tie points, and 22V is known of all: water 185.04, 200.19, 208.72 K, ice 252.79, 250.46,
    /// 244.68 K. At 10 %: 19V 191.815, 22V 205.217, 37V 212.316; (205.217 − 191.815)/397.032 = 0.033755, 20.501/404.131 = 0.050729.
    /// </summary>
    [Fact]
    public void ScreensFor_SurfacesWith22V_RetunesBothLimits()
    {
        ChannelKelvins ice = Kelvins(252.79, 250.46, 244.68);
        HemisphereTuning tuning = new(TiePointSets.F13North, Fixed, new(Kelvins(185.04, 200.19, 208.72), ice, ice));

        WeatherScreens screens = ScreenRetuning.ScreensFor(tuning, 0.10);

        Assert.Equal(0.050729, screens.Gradient3719Limit, 5e-7);
        Assert.Equal(0.033755, screens.Gradient2219Limit!.Value, 5e-7);
    }

    [Fact]
    public void Retuned_22VUnknownOfOneIce_KeepsThatLimit()
    {
        WeatherScreens screens = ScreenRetuning.Retuned(
            Fixed, Kelvins(185.04, 200.19, 208.72), [Kelvins(252.79, 250.46, 244.68), Kelvins(226.26, null, 196.91)], 0.10);

        Assert.NotEqual(0.05, screens.Gradient3719Limit);
        Assert.Equal(0.045, screens.Gradient2219Limit);
    }

    [Fact]
    public void Retuned_ScreenNotUsed_StaysUnused() =>
        Assert.Null(ScreenRetuning.Retuned(new(0.07, null), Kelvins(185, 200, 208), [Kelvins(252, 250, 244)], 0.10).Gradient2219Limit);

    /// <summary>Ice as steep as water cannot be told from it: a limit between them would remove all of it.</summary>
    [Fact]
    public void Retuned_WaterNotAboveAllIce_KeepsBothLimits() =>
        Assert.Equal(Fixed, ScreenRetuning.Retuned(Fixed, Kelvins(185, 200, 208), [Kelvins(252, 250, 244), Kelvins(185, 200, 208)], 0.10));

    [Theory]
    [InlineData(0.0)]
    [InlineData(1.0)]
    [InlineData(double.NaN)]
    public void Retuned_FractionOutside_IsRefused(double fraction) =>
        Assert.Throws<ArgumentException>(() => ScreenRetuning.Retuned(Fixed, Kelvins(185, 200, 208), [Kelvins(252, 250, 244)], fraction));

    [Fact]
    public void Retuned_NoIce_IsRefused() => Assert.Throws<ArgumentException>(() => ScreenRetuning.Retuned(Fixed, Kelvins(185, 200, 208), [], 0.10));

    private static ChannelKelvins Kelvins(double v19, double? v22, double v37)
    {
        Dictionary<Channel, double> kelvins = new() { [Channel.V19] = v19, [Channel.V37] = v37 };
        if (v22 is { } known)
        {
            kelvins.Add(Channel.V22, known);
        }

        return new(kelvins);
    }
}
