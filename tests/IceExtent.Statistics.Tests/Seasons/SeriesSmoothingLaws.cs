using CsCheck;
using IceExtent.Statistics.Seasons;
using Xunit;

namespace IceExtent.Statistics.Tests.Seasons;

/// <summary>The running median that moves a sorted window is the one that sorts every window anew.</summary>
public sealed class SeriesSmoothingLaws
{
    private static readonly Gen<float[]> Series =
        Gen.Select(Gen.Int[0, 9], Gen.Bool, (value, missing) => missing && value < 4 ? float.NaN : value / 10f).Array[1, 60]; // Few values: many are equal.

    [Fact]
    public void Median_AnySeries_IsTheMedianOfEachWindow() => Gen.Select(Series, Gen.Int[0, 15]).Sample((series, half) =>
    {
        float[] smooth = new float[series.Length];
        SeriesSmoothing.Median(series, half, smooth);
        return Enumerable.Range(0, series.Length).All(day => smooth[day].Equals(Plain(series, day, half)));
    });

    [Fact]
    public void Mean_AnySeries_IsTheMeanOfEachWindow() => Gen.Select(Series, Gen.Int[0, 15]).Sample((series, half) =>
    {
        float[] smooth = new float[series.Length];
        SeriesSmoothing.Mean(series, half, smooth);
        return Enumerable.Range(0, series.Length).All(day => float.IsNaN(series[day])
            ? float.IsNaN(smooth[day])
            : Math.Abs(smooth[day] - series[Math.Max(0, day - half)..Math.Min(series.Length, day + half + 1)].Where(value => !float.IsNaN(value)).Average(value => (double)value)) < 1e-6);
    });

    private static float Plain(float[] series, int day, int half)
    {
        if (float.IsNaN(series[day]))
        {
            return float.NaN;
        }

        float[] known = [.. series[Math.Max(0, day - half)..Math.Min(series.Length, day + half + 1)].Where(value => !float.IsNaN(value)).Order()];
        return known.Length % 2 == 1 ? known[known.Length / 2] : 0.5f * (known[(known.Length / 2) - 1] + known[known.Length / 2]);
    }
}
