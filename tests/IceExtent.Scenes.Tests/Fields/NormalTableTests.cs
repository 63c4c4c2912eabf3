using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests.Fields;

public sealed class NormalTableTests
{
    // Origin: independent. SciPy (tests/data/README.md), printed to 1e-12.
    [Fact]
    public void Quantile_Shares_AgreeWithScipy()
    {
        foreach (string[] row in Shipped.Rows("normal_quantiles.csv"))
        {
            Assert.Equal(Shipped.Number(row[1]), NormalTable.Quantile(Shipped.Number(row[0])), 1e-9);
        }
    }

    [Fact]
    public void Pick_AllBits_HaveMeanZeroAndVarianceOne()
    {
        double sum = 0, squares = 0;
        for (int bits = 0; bits <= ushort.MaxValue; bits++)
        {
            double value = NormalTable.Pick((ushort)bits);
            sum += value;
            squares += value * value;
        }

        Assert.Equal(0.0, sum / 65_536, 1e-6);
        Assert.Equal(1.0, squares / 65_536, 1e-6);
    }
}
