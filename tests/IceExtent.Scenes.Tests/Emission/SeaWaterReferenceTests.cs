using System.Numerics;
using IceExtent.Scenes.Emission;

namespace IceExtent.Scenes.Tests.Emission;

public sealed class SeaWaterReferenceTests
{
    // Origin: independent. NumPy working of the same formulas (tests/data/README.md), printed to 0.001. It shows that
    // the formula is coded as written down, not that its constants, which are from memory, are right.
    [Theory]
    [Trait("Reference", "Wentz2000")]
    [InlineData(18.7, 0.0, 33.0, 20.787, -32.763)]
    [InlineData(36.5, 0.0, 33.0, 9.818, -19.936)]
    [InlineData(18.7, 20.0, 35.0, 37.141, -37.819)]
    public void Permittivity_ReferenceState_Agrees(double gigahertz, double celsius, double salinity, double real, double imaginary)
    {
        Complex found = SeaWater.Permittivity(gigahertz, celsius + 273.15, salinity);

        Assert.Equal(real, found.Real, 5.1e-4);
        Assert.Equal(imaginary, found.Imaginary, 5.1e-4);
    }

    // Origin: worked. At vertical incidence both polarizations reflect ((n − 1)/(n + 1))²; n = 3 gives 1/4.
    [Theory]
    [InlineData(Polarization.Vertical)]
    [InlineData(Polarization.Horizontal)]
    public void Reflectivity_VerticalIncidence_IsTheSquareOfTheIndexRatio(Polarization polarization) =>
        Assert.Equal(0.25, SeaWater.Reflectivity(new Complex(9, 0), 0.0, polarization), 1e-12);

    // Origin: worked. At Brewster's angle, tan θ = n, nothing is reflected in vertical polarization; n² = 3 gives 60°.
    [Fact]
    public void Reflectivity_BrewstersAngle_VanishesInVerticalPolarization() =>
        Assert.Equal(0.0, SeaWater.Reflectivity(new Complex(3, 0), 60.0, Polarization.Vertical), 1e-12);
}
