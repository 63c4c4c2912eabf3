using IceExtent.Retrieval;
using IceExtent.Scenes.Observation;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests.Observation;

public sealed class InstrumentTests
{
    // Origin: worked. A footprint of 54.5 km at half power is a Gaussian whose value half a footprint away from the middle
    // is one half. With cells of 54.5 / 6 km that is three cells away.
    [Fact]
    public void Observe_OneWarmCell_FallsToOneHalfAtHalfAFootprint()
    {
        const int Size = 31;
        InstrumentParameters parameters = Shipped.Scene("north").Clean().Instrument with
        {
            FootprintKilometers = new Dictionary<Channel, double> { [Channel.V19] = 54.5 },
        };
        float[] plane = new float[Size * Size], observed = new float[Size * Size];
        plane[(15 * Size) + 15] = 100f;

        new Instrument(parameters, new(2000, 1, 1), 54_500.0 / 6.0, 1)
            .Observe(new(2000, 1, 1), Channel.V19, plane, Size, new float[plane.Length], observed);

        float middle = observed[(15 * Size) + 15];
        Assert.Equal(0.5, observed[(15 * Size) + 18] / middle, 1e-4);
        Assert.Equal(0.5, observed[(12 * Size) + 15] / middle, 1e-4);
    }
}
