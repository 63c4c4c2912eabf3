using CsCheck;

namespace IceExtent.Retrieval.Tests;

/// <summary>Means of a month, cell by cell.</summary>
public sealed class MonthlyMeanTests
{
    /// <summary>Origin: worked. Cell 0: (0.2 + 0.4)/2; cell 1: 0.5 on one day alone; cell 2: never.</summary>
    [Fact]
    public void Of_DaysWithGaps_AveragesWhatWasSeen()
    {
        MonthlyMean mean = new(3);
        mean.Add([0.2f, float.NaN, float.NaN]);
        mean.Add([0.4f, 0.5f, float.NaN]);

        Assert.Equal(2, mean.Days);
        Assert.Equal([0.3f, 0.5f, float.NaN], mean.Of(1));
        Assert.Equal([0.3f, float.NaN, float.NaN], mean.Of(2));
    }

    [Fact]
    public void Of_AnyDays_LiesBetweenTheLeastAndTheGreatest() =>
        Gen.Float[0f, 1f].Array[1, 30].Sample(days =>
        {
            MonthlyMean mean = new(1);
            foreach (float day in days)
            {
                mean.Add([day]);
            }

            Assert.InRange(mean.Of(days.Length)[0], days.Min() - 1e-6f, days.Max() + 1e-6f);
        });

    [Fact]
    public void Add_PlaneOfAnotherSize_IsRefused() => Assert.Throws<ArgumentException>(() => new MonthlyMean(3).Add([0.2f]));
}
