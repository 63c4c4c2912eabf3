using CsCheck;

namespace IceExtent.Retrieval.Tests;

/// <summary>The share of land in a footprint. Sources: [Maass2010] for the Gaussian, plain geometry for the rest.</summary>
public sealed class FootprintShareTests
{
    private const double Footprint = 54_470.0; // √(69·43) km, the 19 GHz footprint of [Hollinger1989].

    [Fact]
    public void Weights_AnyFootprint_FallAndSumToOne() =>
        Gen.Select(Gen.Double[1_000.0, 300_000.0], Gen.Double[3_000.0, 50_000.0]).Sample((footprint, cell) =>
        {
            double[] weights = FootprintShare.Weights(footprint, cell);
            Assert.Equal(1.0, weights[0] + (2.0 * weights.Skip(1).Sum()), 1e-12);
            Assert.Equal(weights.OrderDescending(), weights);
        });

    /// <summary>Origin: worked. A footprint that is tiny beside the cell sees that cell alone, but for its rim.</summary>
    [Fact]
    public void Weights_TinyFootprint_StayInTheCell() => Assert.InRange(FootprintShare.Weights(100.0, 25_000.0)[0], 0.998, 1.0);

    /// <summary>
    /// Origin: worked. The weights are those of a Gaussian and two boxes of one cell: their variance is
    /// σ² + 2/12 cells², with σ = 54.47/25/2.3548 = 0.9253 cells: 1.0228. Cut at three cells, 2 % of it may be lost.
    /// </summary>
    [Fact]
    public void Weights_WorkedFootprint_HaveTheWorkedVariance()
    {
        double[] weights = FootprintShare.Weights(Footprint, CoastGrid.CellMeters);

        double variance = 2.0 * weights.Select((weight, distance) => weight * distance * distance).Sum();

        Assert.Equal(4, weights.Length);
        Assert.InRange(variance, 0.98 * 1.0228, 1.0228);
    }

    [Fact]
    public void Of_EvenPlane_StaysEven() =>
        Gen.Select(Gen.Float[0f, 1f], Gen.Int[1, 9], Gen.Int[1, 9]).Sample((value, rows, columns) =>
        {
            float[] plane = Enumerable.Repeat(value, rows * columns).ToArray();
            float[] seen = FootprintShare.Of(plane, columns, FootprintShare.Weights(Footprint, CoastGrid.CellMeters));
            Assert.All(seen, share => Assert.Equal(value, share, 1e-6f));
        });

    /// <summary>Origin: worked. One land cell gives each neighbour the product of the weights along both axes.</summary>
    [Fact]
    public void Of_OneLandCell_SpreadsTheProductOfTheWeights()
    {
        float[] plane = new float[13 * 13];
        plane[(6 * 13) + 6] = 1f;
        double[] weights = FootprintShare.Weights(Footprint, CoastGrid.CellMeters);

        float[] seen = FootprintShare.Of(plane, 13, weights);

        Assert.Equal(weights[1] * weights[2], seen[(5 * 13) + 8], 1e-7);
        Assert.Equal(0f, seen[(6 * 13) + 10]);
        Assert.Equal(1f, seen.Sum(), 1e-5f);
    }

    [Fact]
    public void Of_PlaneWithoutWholeRows_IsRefused() =>
        Assert.Throws<ArgumentException>(() => FootprintShare.Of(new float[7], 3, [1.0]));
}
