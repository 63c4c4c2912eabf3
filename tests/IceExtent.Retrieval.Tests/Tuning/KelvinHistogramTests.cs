using CsCheck;

namespace IceExtent.Retrieval.Tests.Tuning;

/// <summary>Medians by counting.</summary>
public sealed class KelvinHistogramTests
{
    [Fact]
    public void Center_Nothing_IsNotANumber() => Assert.Equal((double.NaN, double.NaN), new KelvinHistogram().Center());

    /// <summary>Origin: worked. 180, 181, 182, 190, 250: median 182, deviations 2, 1, 0, 8, 68, whose median is 2.</summary>
    [Fact]
    public void Center_FiveValues_FindsMedianAndDeviation()
    {
        KelvinHistogram histogram = new();
        foreach (float kelvins in new[] { 250f, 181f, 180f, 190f, 182f })
        {
            histogram.Add(kelvins);
        }

        (double median, double deviation) = histogram.Center();

        Assert.Equal(182.0, median, 0.1);
        Assert.Equal(2.0, deviation, 0.11);
    }

    /// <summary>The same as by sorting, within a bin, for values of both signs; a cleared histogram has forgotten.</summary>
    [Fact]
    public void Center_AnyValues_AgreesWithSorting()
    {
        KelvinHistogram histogram = new();
        Gen.Single[-150f, 350f].Array[1, 99].Where(values => values.Length % 2 == 1).Sample(values =>
        {
            histogram.Clear();
            Array.ForEach(values, histogram.Add);
            double median = values.Order().ElementAt(values.Length / 2);
            double deviation = values.Select(value => Math.Abs(value - median)).Order().ElementAt(values.Length / 2);
            (double found, double foundDeviation) = histogram.Center();
            return Math.Abs(found - median) <= 0.051 && Math.Abs(foundDeviation - deviation) <= 0.201;
        }, threads: 1);
    }
}
