using CsCheck;
using IceExtent.Grids;
using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>What holds for every method that is linear in brightness temperature.</summary>
public sealed class LinearMethodLaws
{
    private static readonly SurfacePoints Points = LinearMethodTests.SsmiNorth;

    private static readonly Gen<(double First, double Multi)> Shares =
        Gen.Select(Gen.Double[0, 1], Gen.Double[0, 1], (a, b) => a + b <= 1 ? (a, b) : (1 - a, 1 - b));

    public static TheoryData<string> Methods() => [Bootstrap.MethodName, Bristol.MethodName];

    /// <summary>A noise-free linear mixture comes back to 1e-5.</summary>
    [Theory]
    [MemberData(nameof(Methods))]
    public void Retrieve_LinearMixture_ReturnsItsTotal(string name) =>
        Shares.Array[1, 40].Sample(shares =>
        {
            IConcentrationMethod method = ConcentrationMethods.Create(name, new(TiePointSets.F13North, new(0.05, null), Points), Hemisphere.North);
            BrightnessPlanes observed = new(shares.Length, [Channel.V19, Channel.V37, Channel.H37]);
            foreach (Channel channel in observed.Channels)
            {
                for (int cell = 0; cell < shares.Length; cell++)
                {
                    (double first, double multi) = shares[cell];
                    observed.Kelvins(channel)[cell] = (float)(((1 - first - multi) * Points.OpenWater[channel])
                        + (first * Points.FirstYear[channel]) + (multi * Points.Multiyear[channel]));
                }
            }

            ConcentrationPlanes planes = new(shares.Length);
            method.Retrieve(observed, new(0, shares.Length), planes);
            return shares.Select((share, cell) => Math.Abs(planes.Total[cell] - share.First - share.Multi) <= 1e-5).All(right => right);
        });

    /// <summary>The fast kernel is within 1e-5 of the plain form wherever concentrations are plausible.</summary>
    [Fact]
    public void Evaluate_AnyPixels_AgreesWithThePlainTwin() =>
        Gen.Select(Gen.Double[150, 280], Gen.Double[150, 280], Gen.Double[100, 270]).Array[1, 40].Sample(pixels =>
        {
            LinearForm form = new Bristol(Points).Line.Concentration(Points.OpenWater);
            BrightnessPlanes observed = new(pixels.Length, form.Channels);
            for (int cell = 0; cell < pixels.Length; cell++)
            {
                observed.Kelvins(Channel.V19)[cell] = (float)pixels[cell].Item1;
                observed.Kelvins(Channel.V37)[cell] = (float)pixels[cell].Item2;
                observed.Kelvins(Channel.H37)[cell] = (float)pixels[cell].Item3;
            }

            float[] fast = new float[pixels.Length];
            new LinearKernel(form).Evaluate(observed, new(0, pixels.Length), fast);
            return fast.Select((value, cell) =>
            {
                int at = cell;
                double plain = form.At(channel => observed.Kelvins(channel)[at]);
                return plain is < -0.5 or > 1.5 || Math.Abs(value - plain) <= 1e-5;
            }).All(right => right);
        });

    [Theory]
    [MemberData(nameof(Methods))]
    public void Retrieve_MissingChannel_IsMissing(string name)
    {
        IConcentrationMethod method = ConcentrationMethods.Create(name, new(TiePointSets.F13North, new(0.05, null), Points), Hemisphere.North);
        foreach (Channel missing in method.Channels)
        {
            BrightnessPlanes observed = new(20, method.Channels);
            foreach (Channel channel in method.Channels)
            {
                observed.Kelvins(channel).Fill((float)Points.FirstYear[channel]);
            }

            observed.Kelvins(missing)[7] = float.NaN;
            observed.Kelvins(missing)[19] = float.NaN;
            ConcentrationPlanes planes = new(20);
            method.Retrieve(observed, new(0, 20), planes);

            Assert.Equal([7, 19], Enumerable.Range(0, 20).Where(cell => float.IsNaN(planes.Total[cell])));
        }
    }
}
