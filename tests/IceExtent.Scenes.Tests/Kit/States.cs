using CsCheck;
using IceExtent.Scenes.Emission;

namespace IceExtent.Scenes.Tests.Kit;

/// <summary>Cells in every state that a scene can hold.</summary>
internal static class States
{
    public static Gen<CellState> Any { get; } = Gen.Select(
        Gen.Select(Gen.Double.Unit, Gen.Double.Unit, Gen.Double.Unit, Gen.Double.Unit, Gen.Double.Unit),
        Gen.Select(Gen.Double[271.35, 296], Gen.Double[240, 273.15], Gen.Double[235, 295]),
        Gen.Select(Gen.Double[0, 32], Gen.Double[0.2, 40], Gen.Double[0, 1.2]),
        (share, kelvins, air) => new CellState
        {
            LandShare = share.Item1 < 0.5 ? 0.0 : (2.0 * share.Item1) - 1.0,
            FirstYear = share.Item2 * (1.0 - share.Item3),
            Multiyear = share.Item2 * share.Item3,
            PondShare = 0.3 * share.Item4,
            Wetness = share.Item5,
            SeaKelvins = kelvins.Item1,
            IceKelvins = kelvins.Item2,
            LandKelvins = kelvins.Item3,
            WindMetersPerSecond = air.Item1,
            VaporMillimeters = air.Item2,
            CloudMillimeters = air.Item3,
        });
}
