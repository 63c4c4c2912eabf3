using CsCheck;
using IceExtent.Scenes.Fields;

namespace IceExtent.Scenes.Tests.Fields;

public sealed class SeparableBlurTests
{
    private const int Size = 41;

    private static float[] Smear(double deviation, float[] plane)
    {
        float[] result = new float[plane.Length];
        new SeparableBlur(deviation).Smear(plane, Size, new float[plane.Length], result);
        return result;
    }

    [Fact]
    public void Smear_EvenPlane_StaysEven() =>
        Gen.Select(Gen.Double[0, 4], Gen.Float[100f, 300f]).Sample((deviation, kelvins) =>
        {
            float[] plane = new float[Size * Size];
            Array.Fill(plane, kelvins);
            Assert.All(Smear(deviation, plane), value => Assert.Equal(kelvins, value, kelvins * 2e-6f));
        });

    // Origin: worked. One bright cell in the middle becomes a Gaussian: its sum stays 1 and its variance in each
    // direction is the square of the deviation, a little less because the tail beyond three deviations is cut off.
    [Theory]
    [InlineData(1.0)]
    [InlineData(1.7)]
    [InlineData(3.0)]
    public void Smear_OneCell_BecomesAGaussian(double deviation)
    {
        float[] plane = new float[Size * Size];
        plane[(20 * Size) + 20] = 1f;

        float[] smeared = Smear(deviation, plane);

        double variance = 0, across = 0;
        for (int cell = 0; cell < smeared.Length; cell++)
        {
            int row = (cell / Size) - 20, column = (cell % Size) - 20;
            variance += smeared[cell] * row * row;
            across += smeared[cell] * column * column;
        }

        Assert.Equal(1.0, smeared.Sum(), 1e-5);
        Assert.Equal(variance, across, 1e-5);
        Assert.InRange(variance, 0.95 * deviation * deviation, deviation * deviation);
    }

    [Fact]
    public void Smear_NoWidth_ChangesNothing() =>
        Gen.Float[0f, 300f].Array[Size * Size].Sample(plane => Assert.Equal(plane, Smear(0.0, plane)), iter: 5);
}
