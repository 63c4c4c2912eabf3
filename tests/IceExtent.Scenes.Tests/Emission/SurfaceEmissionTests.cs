using CsCheck;
using IceExtent.Retrieval;
using IceExtent.Scenes.Emission;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests.Emission;

public sealed class SurfaceEmissionTests
{
    private static readonly SurfaceParameters Surfaces = Shipped.Scene("north").Surfaces;

    private static readonly Gen<TiePoints> AnyTiePoints =
        Gen.Select(
            Gen.Select(Gen.Double[160, 190], Gen.Double[90, 120], Gen.Double[195, 212]),
            Gen.Select(Gen.Double[235, 258], Gen.Double[220, 245], Gen.Double[235, 252]),
            Gen.Select(Gen.Double[205, 248], Gen.Double[180, 220], Gen.Double[178, 215]),
            (water, first, multi) => new TiePoints(
                new(water.Item1, water.Item2, water.Item3),
                new(first.Item1, first.Item2, first.Item3),
                new(multi.Item1, multi.Item2, multi.Item3)));

    private static SurfaceEmission Make(TiePoints ties) => new(Surfaces, 53.1, TestWorld.Sensor, ties);

    private static CellState AtReference(double firstYear, double multiyear) => new()
    {
        FirstYear = firstYear,
        Multiyear = multiyear,
        SeaKelvins = Surfaces.Reference.SeaKelvins,
        IceKelvins = Surfaces.Reference.IceKelvins,
        LandKelvins = 270,
        WindMetersPerSecond = Surfaces.Reference.WindMetersPerSecond,
        VaporMillimeters = Surfaces.Reference.VaporMillimeters,
        CloudMillimeters = Surfaces.Reference.CloudMillimeters,
    };

    [Fact]
    public void Brightness_PureSurfacesAtTheReferenceState_GiveTheTiePoints() =>
        AnyTiePoints.Sample(ties =>
        {
            SurfaceEmission emission = Make(ties);
            foreach ((TiePoint tie, SurfaceDifferences more, CellState cell) in new[]
            {
                (ties.OpenWater, Surfaces.OpenWater, AtReference(0, 0)),
                (ties.FirstYear, Surfaces.FirstYear, AtReference(1, 0)),
                (ties.Multiyear, Surfaces.Multiyear, AtReference(0, 1)),
            })
            {
                Assert.Equal(tie.V19Kelvins, emission.BrightnessKelvins(Channel.V19, cell), 1e-9);
                Assert.Equal(tie.H19Kelvins, emission.BrightnessKelvins(Channel.H19, cell), 1e-9);
                Assert.Equal(tie.V37Kelvins, emission.BrightnessKelvins(Channel.V37, cell), 1e-9);
                Assert.Equal(tie.V19Kelvins + more.V22AboveV19Kelvins, emission.BrightnessKelvins(Channel.V22, cell), 1e-9);
                Assert.Equal(tie.V37Kelvins + more.H37AboveV37Kelvins, emission.BrightnessKelvins(Channel.H37, cell), 1e-9);
            }
        });

    [Fact]
    public void Brightness_MixedCell_IsTheMeanOfItsPureParts() =>
        Gen.Select(States.Any, Gen.Double.Unit, Gen.Double.Unit).Sample((state, ice, oldShare) =>
        {
            SurfaceEmission emission = Make(TestWorld.TiePoints);
            double multiyear = ice * oldShare, firstYear = ice - multiyear;
            foreach (Channel channel in emission.Channels)
            {
                double Of(double first, double multi) =>
                    emission.BrightnessKelvins(channel, state with { FirstYear = first, Multiyear = multi });
                double parts = ((1 - ice) * Of(0, 0)) + (firstYear * Of(1, 0)) + (multiyear * Of(0, 1));
                Assert.Equal(parts, Of(firstYear, multiyear), 1e-9);
            }
        });

    // Laws of the mixture: ponds emit like water, wet snow hides the kind of ice, land hides the sea.
    [Fact]
    public void Brightness_PondsWetSnowAndLand_HideWhatIsBelow() =>
        States.Any.Sample(state =>
        {
            SurfaceEmission emission = Make(TestWorld.TiePoints);
            foreach (Channel channel in emission.Channels)
            {
                double Of(CellState cell) => emission.BrightnessKelvins(channel, cell);
                Assert.Equal(Of(state with { FirstYear = 0, Multiyear = 0 }), Of(state with { PondShare = 1 }), 1e-9);
                Assert.Equal(
                    Of(state with { Wetness = 1, FirstYear = 0.8, Multiyear = 0 }),
                    Of(state with { Wetness = 1, FirstYear = 0, Multiyear = 0.8 }),
                    1e-9);
                Assert.Equal(
                    Of(state with { LandShare = 1, FirstYear = 0, Multiyear = 0 }),
                    Of(state with { LandShare = 1, FirstYear = 0.3, Multiyear = 0.7 }),
                    1e-9);
            }
        });

    // Law: dry ice in clear air gets brighter by its emissivity times the warming times the transmittance, so more in
    // first-year than in multiyear ice.
    [Fact]
    public void Brightness_WarmerIce_RisesWithItsEmissivity()
    {
        SurfaceEmission emission = Make(TestWorld.TiePoints);
        double Rise(double firstYear, double multiyear)
        {
            CellState cell = AtReference(firstYear, multiyear);
            return emission.BrightnessKelvins(Channel.V37, cell with { IceKelvins = cell.IceKelvins + 1.0 })
                - emission.BrightnessKelvins(Channel.V37, cell);
        }

        ChannelSurfaces surfaces = emission.SurfacesIn(Channel.V37);
        Assert.Equal(surfaces.FirstYear / surfaces.Multiyear, Rise(1, 0) / Rise(0, 1), 1e-9);
        Assert.InRange(Rise(1, 0), 0.8, 1.0);
    }

    [Fact]
    public void Channels_SensorWith89_LeavesThemOut()
    {
        Dictionary<Channel, double> frequencies = new(TestWorld.Sensor.FrequenciesGigahertz) { [Channel.V89] = 85.5 };
        SurfaceEmission emission = new(Surfaces, 53.1, TestWorld.Sensor with { FrequenciesGigahertz = frequencies }, TestWorld.TiePoints);

        Assert.Equal([Channel.V19, Channel.H19, Channel.V22, Channel.V37, Channel.H37], emission.Channels);
        Assert.Throws<ArgumentException>(() => emission.BrightnessKelvins(Channel.V89, default));
    }

    [Fact]
    public void Constructor_TiePointWarmerThanTheIce_IsRefused()
    {
        TiePoints impossible = TestWorld.TiePoints with { FirstYear = new(280, 235, 241) };

        ArgumentException fault = Assert.Throws<ArgumentException>(() => Make(impossible));
        Assert.Contains("280 K in 19v", fault.Message, StringComparison.Ordinal);
    }
}
