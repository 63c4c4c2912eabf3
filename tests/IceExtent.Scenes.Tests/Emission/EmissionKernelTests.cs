using CsCheck;
using IceExtent.Retrieval;
using IceExtent.Scenes.Emission;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests.Emission;

public sealed class EmissionKernelTests
{
    private const double ToleranceKelvins = 0.002;

    // The law behind the fast version: it may not differ from the plain one by more than its docstring says.
    [Fact]
    public void Paint_AnyCells_EqualsThePlainVersion()
    {
        SurfaceEmission plain = new(Shipped.Scene("north").Surfaces, 53.1, TestWorld.Sensor, TestWorld.TiePoints);
        EmissionKernel[] kernels = [.. new[] { OceanConstants.Near19, OceanConstants.Near22, OceanConstants.Near37 }
            .Select(band => new EmissionKernel(plain, band, 271.35, 296.0))];

        States.Any.Array[1, 200].Sample(
            states =>
            {
                CellPlanes cells = new(states.Length);
                float[] land = new float[cells.Length];
                Array.Fill(cells.Vapor, 1f);
                for (int cell = 0; cell < states.Length; cell++)
                {
                    Put(states[cell], cell, cells, land);
                }

                Dictionary<Channel, float[]> planes = plain.Channels.ToDictionary(channel => channel, _ => new float[cells.Length]);
                foreach (EmissionKernel kernel in kernels)
                {
                    kernel.Paint(cells, land, channel => planes[channel]);
                }

                foreach (Channel channel in plain.Channels)
                {
                    for (int cell = 0; cell < states.Length; cell++)
                    {
                        Assert.Equal(plain.BrightnessKelvins(channel, states[cell]), planes[channel][cell], ToleranceKelvins);
                    }
                }
            },
            iter: 300);
    }

    private static void Put(CellState state, int cell, CellPlanes cells, float[] land)
    {
        land[cell] = (float)state.LandShare;
        cells.FirstYear[cell] = (float)state.FirstYear;
        cells.Multiyear[cell] = (float)state.Multiyear;
        cells.PondShare[cell] = (float)state.PondShare;
        cells.Wetness[cell] = (float)state.Wetness;
        cells.SeaKelvins[cell] = (float)state.SeaKelvins;
        cells.IceKelvins[cell] = (float)state.IceKelvins;
        cells.LandKelvins[cell] = (float)state.LandKelvins;
        cells.Wind[cell] = (float)state.WindMetersPerSecond;
        cells.Vapor[cell] = (float)state.VaporMillimeters;
        cells.Cloud[cell] = (float)state.CloudMillimeters;
    }
}
