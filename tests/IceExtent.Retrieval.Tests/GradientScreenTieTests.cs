using CsCheck;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>A cell whose ratio equals the limit stays ice; the decision is that of exact integers.</summary>
public sealed class GradientScreenTieTests
{
    /// <summary>
    /// Temperatures in tenths of a kelvin, limits in thousandths: 1000·(a − b) &gt; limit·(a + b) in integers is the
    /// exact answer. Origin: worked in integer arithmetic beside the call. Covers every pair within 60 K around
    /// each limit, about 1.3 million pairs a limit.
    /// </summary>
    [Theory]
    [InlineData(45)]
    [InlineData(50)]
    [InlineData(53)]
    [InlineData(70)]
    public void Apply_EveryPairOfTenths_DecidesAsIntegersDo(int limitThousandths)
    {
        List<float> upper = [];
        List<float> lower = [];
        List<bool> expected = [];
        int ties = 0;
        for (int b = 1200; b <= 2900; b++)
        {
            int center = (int)Math.Round(b * (1000.0 + limitThousandths) / (1000.0 - limitThousandths));
            for (int a = center - 40; a <= center + 40; a++)
            {
                long difference = (1000L * (a - b)) - (limitThousandths * (long)(a + b));
                ties += difference == 0 ? 1 : 0;
                upper.Add((float)(a * 0.1));
                lower.Add((float)(b * 0.1));
                expected.Add(difference > 0);
            }
        }

        float[] total = Enumerable.Repeat(0.4f, upper.Count).ToArray();
        CellConditions[] conditions = new CellConditions[upper.Count];
        int count = GradientScreen.Apply(
            upper.ToArray(), lower.ToArray(), limitThousandths / 1000.0, CellConditions.WeatherGradient3719, total, conditions);

        Assert.True(ties > 0, "The sweep must meet exact ties, or it proves nothing.");
        Assert.Equal(expected.Count(screened => screened), count);
        Assert.Equal(expected, conditions.Select(condition => condition == CellConditions.WeatherGradient3719));
        Assert.Equal(expected, total.Select(fraction => fraction == 0f));
    }

    [Fact]
    public void Apply_MissingTemperatureOrConcentration_ScreensNothing()
    {
        float[] upper = [float.NaN, 230f, 230f];
        float[] lower = [180f, float.NaN, 180f];
        float[] total = [0.5f, 0.5f, float.NaN];
        CellConditions[] conditions = new CellConditions[3];

        int count = GradientScreen.Apply(upper, lower, 0.05, CellConditions.WeatherGradient2219, total, conditions);

        Assert.Equal(0, count);
        Assert.Equal([0.5f, 0.5f, float.NaN], total);
        Assert.All(conditions, condition => Assert.Equal(CellConditions.None, condition));
    }

    /// <summary>Screening the whole at once or in two parts cut anywhere gives the same planes and counts.</summary>
    [Fact]
    public void Apply_CutInTwo_IsTheSameAsWhole() =>
        Gen.Select(Gen.Single[150, 280].Array[67], Gen.Single[150, 280].Array[67], Gen.Int[0, 67]).Sample((upper, lower, cut) =>
        {
            float[] whole = Enumerable.Repeat(0.5f, 67).ToArray();
            float[] parts = [.. whole];
            CellConditions[] wholeConditions = new CellConditions[67];
            CellConditions[] partConditions = new CellConditions[67];
            int one = GradientScreen.Apply(upper, lower, 0.05, CellConditions.WeatherGradient3719, whole, wholeConditions);
            int two = GradientScreen.Apply(upper.AsSpan(0, cut), lower.AsSpan(0, cut), 0.05, CellConditions.WeatherGradient3719, parts.AsSpan(0, cut), partConditions.AsSpan(0, cut))
                + GradientScreen.Apply(upper.AsSpan(cut), lower.AsSpan(cut), 0.05, CellConditions.WeatherGradient3719, parts.AsSpan(cut), partConditions.AsSpan(cut));
            return one == two && whole.SequenceEqual(parts) && wholeConditions.SequenceEqual(partConditions);
        });
}
