using CsCheck;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>The steps around the method: range, clipping, scatter.</summary>
public sealed class CellStepTests
{
    [Fact]
    public void RangeScreen_BothEndsIncluded_CountsOnlyWhatIsOutside()
    {
        float[] kelvins = [49.9f, 50f, 200f, 350f, 350.1f, float.NaN];
        CellConditions[] conditions = new CellConditions[6];

        int count = RangeScreen.Apply(kelvins, RangeScreen.Physical, conditions);

        Assert.Equal(2, count);
        Assert.Equal([float.NaN, 50f, 200f, 350f, float.NaN, float.NaN], kelvins);
        Assert.Equal([CellConditions.OutOfRange, 0, 0, 0, CellConditions.OutOfRange, 0], conditions);
    }

    /// <summary>Long and short runs go through the vector loop and the tail; both must do the same.</summary>
    [Fact]
    public void RangeScreen_AnyLength_DoesWhatEachCellAloneDoes() =>
        Gen.Single[0, 400].Array[0, 70].Sample(values =>
        {
            float[] together = [.. values];
            CellConditions[] conditions = new CellConditions[values.Length];
            int count = RangeScreen.Apply(together, RangeScreen.Physical, conditions);
            int expected = values.Count(value => value is < 50f or > 350f);
            return count == expected
                && values.Select((value, cell) => value is < 50f or > 350f
                    ? float.IsNaN(together[cell]) && conditions[cell] == CellConditions.OutOfRange
                    : together[cell] == value && conditions[cell] == CellConditions.None).All(right => right);
        });

    /// <summary>Origin: worked. First-year ice is always the clipped total less the clipped multiyear ice.</summary>
    [Fact]
    public void Clipping_WorkedCells_StayInsideAndAreCounted()
    {
        float[] total = [-0.1f, 0f, 0.5f, 1f, 1.3f, float.NaN, 0.9f];
        float[] multi = [-0.2f, 0.1f, 0.7f, -0.1f, 0.4f, 0.2f, 0.3f];
        float[] first = new float[7];
        CellConditions[] conditions = new CellConditions[7];

        (int below, int above) = Clipping.Apply(total, multi, first, conditions);

        Assert.Equal((1, 1), (below, above));
        Assert.Equal([0f, 0f, 0.5f, 1f, 1f, float.NaN, 0.9f], total);
        Assert.Equal([0f, 0f, 0.5f, 0f, 0.4f, float.NaN, 0.3f], multi);
        Assert.Equal([0f, 0f, 0f, 1f, 0.6f, float.NaN, 0.9f - 0.3f], first);
        Assert.Equal(CellConditions.ClippedBelow, conditions[0]);
        Assert.Equal(CellConditions.ClippedAbove, conditions[4]);
    }

    [Fact]
    public void Clipping_AnyLength_DoesWhatEachCellAloneDoes() =>
        Gen.Select(Gen.Single[-1, 2].Array[0, 70], Gen.Single[-1, 2]).Sample((values, seed) =>
        {
            float[] total = [.. values];
            float[] multi = Array.ConvertAll(values, value => value * seed);
            float[] first = new float[values.Length];
            CellConditions[] conditions = new CellConditions[values.Length];
            (int below, int above) = Clipping.Apply(total, multi, first, conditions);
            return below == values.Count(value => value < 0) && above == values.Count(value => value > 1)
                && values.Select((value, cell) =>
                    total[cell] == Math.Clamp(value, 0f, 1f)
                    && multi[cell] == Math.Clamp(value * seed, 0f, total[cell])
                    && first[cell] == total[cell] - multi[cell]).All(right => right);
        });

    [Fact]
    public void Copy_AnyLength_ClipsEachCellAlone() =>
        Gen.Single[-1, 2].Array[0, 40].Sample(values =>
        {
            float[] clipped = new float[values.Length];
            Clipping.Copy(values, clipped);
            return values.Select((value, cell) => clipped[cell] == Math.Clamp(value, 0f, 1f)).All(right => right);
        });

    [Fact]
    public void Copy_Missing_StaysMissing()
    {
        float[] clipped = new float[20];

        Clipping.Copy(Enumerable.Repeat(float.NaN, 20).ToArray(), clipped);

        Assert.All(clipped, value => Assert.True(float.IsNaN(value)));
    }

    /// <summary>
    /// Origin: worked, σ² = (1 − C)²σ_w² + C²σ_i² with 2 % and 3 %: at C = 0.2, sqrt(0.8²·4 + 0.2²·9) = 1.709 %.
    /// Formula: [Lavergne2019].
    /// </summary>
    [Theory]
    [InlineData(0.0f, 0.02000)]
    [InlineData(0.2f, 0.01709)]
    [InlineData(0.5f, 0.01803)]
    [InlineData(0.8f, 0.02433)]
    [InlineData(1.0f, 0.03000)]
    public void CellScatter_WorkedConcentrations_GiveTheStandardError(float fraction, double expected)
    {
        float[] error = new float[1];

        CellScatter.Apply([fraction], new(0.02, 0.03), error);

        Assert.Equal(expected, error[0], 5e-6);
    }
}
