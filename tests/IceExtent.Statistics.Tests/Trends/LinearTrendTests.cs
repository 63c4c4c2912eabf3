using CsCheck;
using IceExtent.Statistics.Trends;
using Xunit;

namespace IceExtent.Statistics.Tests.Trends;

/// <summary>The straight line and its limits.</summary>
public sealed class LinearTrendTests
{
    /// <summary>
    /// Origin: worked. Values 1, 3, 2, 5, 4 in years 2001 to 2005: means 2003 and 3, Σ(t − t̄)² = 10, Σ(t − t̄)(y − ȳ) = 8, slope 0.8.
    /// Residuals −0.4, 0.8, −1.0, 1.2, −0.6: squares 3.6, products of neighbours −3.04, so r &lt; 0 counts as 0 and five years stay five:
    /// s = √(3.6 / 3 / 10) = 0.34641; t of 3 degrees of freedom at 97.5 % is 3.18245 (handbook tables), so ± 1.10244.
    /// </summary>
    [Fact]
    public void Fit_FiveYears_GivesSlopeAndLimits()
    {
        LinearTrend.Fitted trend = Assert.IsType<LinearTrend.Fitted>(LinearTrend.Fit([2001, 2002, 2003, 2004, 2005], [1, 3, 2, 5, 4], leastYears: 5));

        Assert.Equal(0.8, trend.SlopePerYear, tolerance: 1e-12);
        Assert.Equal(0.34641, trend.StandardErrorPerYear, tolerance: 5e-6);
        Assert.Equal(0.8 - 1.10244, trend.LowerPerYear, tolerance: 1e-5);
        Assert.Equal(0.8 + 1.10244, trend.UpperPerYear, tolerance: 1e-5);
        Assert.Equal(-3.04 / 3.6, trend.LagOne, tolerance: 1e-12);
        Assert.Equal(5.0, trend.EffectiveYears);
    }

    /// <summary>
    /// Origin: worked. The values are symmetric about the middle, so the line is level; of the products of neighbours five are 1 and
    /// two −1, r = 3/8, n = 8 · (5/8) / (11/8).
    /// </summary>
    [Fact]
    public void Fit_YearsAlike_CountFewer()
    {
        double[] values = [1, 1, -1, -1, -1, -1, 1, 1];

        LinearTrend.Fitted trend = Assert.IsType<LinearTrend.Fitted>(LinearTrend.Fit([1, 2, 3, 4, 5, 6, 7, 8], values, leastYears: 5));

        Assert.Equal(0.0, trend.SlopePerYear, tolerance: 1e-12);
        Assert.Equal(3.0 / 8.0, trend.LagOne, tolerance: 1e-12);
        Assert.Equal(8.0 * 0.625 / 1.375, trend.EffectiveYears, tolerance: 1e-12);
    }

    [Fact]
    public void Fit_MissingYear_JoinsNoNeighbours()
    {
        // Origin: worked. Symmetric about year 3, so the line is level and the values are the residuals. Neighbours are (1, 2) and (4, 5):
        // products −1 and −1 over squares of 4. Were years 2 and 4 neighbours too, it would be −1/4.
        LinearTrend.Fitted trend = Assert.IsType<LinearTrend.Fitted>(LinearTrend.Fit([1, 2, 4, 5], [1, -1, -1, 1], leastYears: 4));

        Assert.Equal(0.0, trend.SlopePerYear, tolerance: 1e-12);
        Assert.Equal(-0.5, trend.LagOne, tolerance: 1e-12);
    }

    [Fact]
    public void Fit_TooFewYears_SaysSo() => Assert.Contains(
        "4 years", Assert.IsType<LinearTrend.Untestable>(LinearTrend.Fit([1, 2, 3, 4], [1, 2, 3, 4], leastYears: 10)).Reason, StringComparison.Ordinal);

    [Fact]
    public void Fit_YearsNearlyOne_SaysSo()
    {
        int[] years = [.. Enumerable.Range(1, 12)];
        double[] wave = Array.ConvertAll(years, year => Math.Sin(2.0 * Math.PI * year / 11.0)); // One slow wave: neighbours are alike.

        Assert.Contains("alike", Assert.IsType<LinearTrend.Untestable>(LinearTrend.Fit(years, wave, leastYears: 10)).Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void Fit_ValuesScaledAndShifted_ScaleSlopeAndLimits() =>
        Gen.Select(Gen.Double[-10, 10].Array[12], Gen.Double[0.1, 5], Gen.Double[-100, 100]).Sample((values, scale, shift) =>
        {
            int[] years = [.. Enumerable.Range(1990, 12)];
            return (LinearTrend.Fit(years, values, 10), LinearTrend.Fit(years, [.. values.Select(value => (scale * value) + shift)], 10)) switch
            {
                (LinearTrend.Fitted plain, LinearTrend.Fitted scaled) =>
                    Math.Abs(scaled.SlopePerYear - (scale * plain.SlopePerYear)) < 1e-9 && Math.Abs(scaled.UpperPerYear - (scale * plain.UpperPerYear)) < 1e-6,
                (LinearTrend.Untestable, LinearTrend.Untestable) => true,
                _ => false,
            };
        });
}
