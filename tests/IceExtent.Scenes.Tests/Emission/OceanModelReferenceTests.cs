using IceExtent.Retrieval;
using IceExtent.Scenes.Emission;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests.Emission;

[Trait("Reference", "Wentz2000")]
public sealed class OceanModelReferenceTests
{
    private const double Salinity = 33.0;

    /// <summary>
    /// Origin: independent. A table worked out from the same formulas before this program was written, printed to 0.01 K
    /// (18.7V, 18.7H, 23.8V, 23.8H, 36.5V, 36.5H) and 0.0001 (the three transmittances).
    /// </summary>
    public static TheoryData<double, OceanState, double[], double[]> Table() => new()
    {
        { 53.1, new(271.35, 0, 1, 0), [171.90, 89.13, 181.39, 98.26, 200.78, 120.18], [0.9743, 0.9622, 0.9234] },
        { 53.1, new(273.15, 6, 5, 0.05), [175.34, 100.47, 188.42, 118.05, 204.70, 136.96], [0.9569, 0.9205, 0.8901] },
        { 53.1, new(275.15, 7, 7, 0.08), [177.25, 104.44, 192.11, 125.88, 206.93, 142.96], [0.9481, 0.8998, 0.8728] },
        { 53.1, new(275.15, 15, 10, 0.15), [184.65, 120.76, 201.54, 147.50, 213.54, 162.86], [0.9318, 0.8655, 0.8370] },
        { 55.0, new(273.15, 6, 5, 0.05), [179.65, 98.70, 192.56, 116.86, 208.41, 135.94], [0.9550, 0.9169, 0.8852] },
        { 55.0, new(275.15, 7, 7, 0.08), [181.55, 102.91, 196.22, 125.13, 210.61, 142.31], [0.9457, 0.8954, 0.8673] },
        { 55.0, new(283.15, 10, 15, 0.10), [188.35, 115.38, 209.16, 150.72, 215.31, 154.00], [0.9238, 0.8332, 0.8446] },
    };

    [Theory]
    [MemberData(nameof(Table))]
    public void Brightness_ReferenceTable_Agrees(double incidence, OceanState state, double[] kelvins, double[] transmittances)
    {
        OceanModel ocean = new(incidence, Salinity);
        BandCoefficients[] bands = [OceanConstants.Near19, OceanConstants.Near22, OceanConstants.Near37];
        for (int band = 0; band < 3; band++)
        {
            Assert.Equal(kelvins[2 * band], ocean.BrightnessKelvins(bands[band], Polarization.Vertical, state), 0.0051);
            Assert.Equal(kelvins[(2 * band) + 1], ocean.BrightnessKelvins(bands[band], Polarization.Horizontal, state), 0.0051);
            Assert.Equal(
                transmittances[band],
                ocean.Column(bands[band], state.SeaKelvins, state.VaporMillimeters, state.CloudMillimeters).Transmittance,
                5.1e-5);
        }
    }

    // Origin: independent. tests/data/scenes/ocean_model.py (NumPy; see tests/data/README.md), printed to 1e-6 K.
    [Fact]
    public void Brightness_RandomStates_AgreeWithNumpy()
    {
        int rows = 0;
        foreach (string[] row in Shipped.Rows("ocean_model.csv"))
        {
            double[] numbers = [.. row.Where((_, index) => index != 1).Select(Shipped.Number)];
            BandCoefficients band = numbers[0] switch
            {
                18.7 => OceanConstants.Near19,
                23.8 => OceanConstants.Near22,
                _ => OceanConstants.Near37,
            };
            Polarization polarization = row[1] == "v" ? Polarization.Vertical : Polarization.Horizontal;
            double found = new OceanModel(numbers[1], Salinity)
                .BrightnessKelvins(band, polarization, new(numbers[2], numbers[3], numbers[4], numbers[5]));
            Assert.True(Math.Abs(found - numbers[6]) < 2e-6, $"{string.Join(',', row)}: got {found:F6} K.");
            rows++;
        }

        Assert.Equal(120, rows);
    }

    // Origin: published open-water tie points [Cavalieri1992] (values from memory), 19V 177.1, 19H 100.8, 37V 201.7 K. A
    // model cannot hit them: they are means over unknown weather. Within 6 K in usual polar weather is common practice.
    [Theory]
    [InlineData(Channel.V19, 177.1)]
    [InlineData(Channel.H19, 100.8)]
    [InlineData(Channel.V37, 201.7)]
    public void Brightness_UsualPolarWeather_IsNearPublishedTiePoints(Channel channel, double tieKelvins) =>
        Assert.Equal(tieKelvins, new OceanModel(53.1, Salinity).BrightnessKelvins(channel, new(273.15, 6, 5, 0.05)), 6.0);

    [Fact]
    public void Brightness_ChannelWithoutConstants_IsRefused() =>
        Assert.Throws<ArgumentException>(() => new OceanModel(53.1, Salinity).BrightnessKelvins(Channel.V89, new(273, 6, 5, 0)));
}
