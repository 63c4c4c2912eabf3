using IceExtent.Retrieval;

namespace IceExtent.Retrieval.Tests;

/// <summary>Compares the NASA Team equations with print and with worked pixels. Keys: docs/REFERENCES.md.</summary>
public sealed class NasaTeamReferenceTests
{
    /// <summary>
    /// Origin: printed, [Cavalieri1992] reprinted in [Steffen1992] (value from memory, high). The printed set rests on
    /// tie points with more digits than the printed ones, so 0.2 % is what rounding to 0.1 K leaves.
    /// </summary>
    [Fact]
    [Trait("Reference", "Steffen1992")]
    public void From_TiePointsOf1992_GivesThePublishedCoefficients()
    {
        double[] printed =
        [
            3286.56, -20764.9, 23893.1, 47944.5,
            -790.321, 13825.8, -33155.8, -47720.8,
            2032.20, 9241.50, -5655.62, -12864.9,
        ];

        NasaTeamCoefficients computed = NasaTeamCoefficients.From(TiePointSets.Global1992North);

        double[] values = [.. Terms(computed.FirstYear), .. Terms(computed.Multiyear), .. Terms(computed.Denominator)];
        Assert.All(printed.Zip(values), pair => Assert.InRange(pair.Second / pair.First, 0.998, 1.002));
    }

    /// <summary>Origin: worked from the tie points with the closed form, e.g. c0 of F13 north = 1676.300 exactly in tenths.</summary>
    [Fact]
    public void From_F13North_GivesTheWorkedCoefficients()
    {
        NasaTeamCoefficients computed = NasaTeamCoefficients.From(TiePointSets.F13North);

        Assert.Equal([3038.960, -19265.520, 19637.360, 41941.840], Terms(computed.FirstYear), Within(5e-4));
        Assert.Equal([-1031.080, 12757.960, -28686.520, -42475.560], Terms(computed.Multiyear), Within(5e-4));
        Assert.Equal([1676.300, 6855.260, -3788.300, -8967.260], Terms(computed.Denominator), Within(5e-4));
    }

    public static TheoryData<string, double, double> FreePixels() => new()
    {
        // Tie points; first-year and multiyear shares over T19H 190, T19V 225, T37V 222 K.
        // Origin: independent, NumPy 1.24 solving the three-by-three mixing system of each set.
        { nameof(TiePointSets.F13North), 0.550830, 0.114427 },
        { nameof(TiePointSets.F17North), 0.490224, 0.207836 },
        { nameof(TiePointSets.F13South), 0.513396, 0.140126 },
        { nameof(TiePointSets.Global1992North), 0.472503, 0.218397 },
    };

    [Theory]
    [MemberData(nameof(FreePixels))]
    public void Solve_FreePixel_AgreesToTheLastDigit(string set, double firstYear, double multiyear)
    {
        NasaTeamCoefficients coefficients = NasaTeamCoefficients.From(SetNamed(set));

        (double first, double multi) = NasaTeamPlain.Solve(coefficients, 225, 190, 222);

        Assert.Equal(firstYear, first, 6e-7);
        Assert.Equal(multiyear, multi, 6e-7);
    }

    public static TheoryData<double, double, double, double, double> Mixtures() => new()
    {
        // T19H, T19V, T37V in K, then first-year and multiyear shares of F13 north. Origin: worked,
        // e.g. T19V = 0.3·185.2 + 0.5·251.2 + 0.2·222.4 = 225.64.
        { 191.74, 225.64, 219.35, 0.5, 0.2 },
        { 132.55, 195.10, 210.585, 0.15, 0.0 },
        { 197.54, 224.44, 199.08, 0.2, 0.7 },
    };

    [Theory]
    [MemberData(nameof(Mixtures))]
    public void Solve_WorkedMixture_ReturnsItsShares(double h19, double v19, double v37, double firstYear, double multiyear)
    {
        NasaTeamCoefficients coefficients = NasaTeamCoefficients.From(TiePointSets.F13North);

        (double first, double multi) = NasaTeamPlain.Solve(coefficients, v19, h19, v37);

        Assert.Equal(firstYear, first, 1e-9);
        Assert.Equal(multiyear, multi, 1e-9);
    }

    [Theory]
    [InlineData(nameof(TiePointSets.F13North))]
    [InlineData(nameof(TiePointSets.F17North))]
    [InlineData(nameof(TiePointSets.F13South))]
    [InlineData(nameof(TiePointSets.SmmrNorth))]
    public void Solve_TiePointsThemselves_ArePureSurfaces(string set)
    {
        TiePoints points = SetNamed(set);
        NasaTeamCoefficients coefficients = NasaTeamCoefficients.From(points);

        AssertShares(0.0, 0.0, points.OpenWater);
        AssertShares(1.0, 0.0, points.FirstYear);
        AssertShares(0.0, 1.0, points.Multiyear);

        void AssertShares(double firstYear, double multiyear, TiePoint at)
        {
            (double first, double multi) = NasaTeamPlain.Solve(coefficients, at.V19Kelvins, at.H19Kelvins, at.V37Kelvins);
            Assert.Equal(firstYear, first, 1e-10);
            Assert.Equal(multiyear, multi, 1e-10);
        }
    }

    [Fact]
    public void From_ThreeSurfacesOnOneLine_IsRefused()
    {
        TiePoint water = new(180, 110, 200);
        TiePoint ice = new(250, 235, 240);
        TiePoint between = new(215, 172.5, 220); // Halfway in every channel.

        Assert.Throws<ArgumentException>(() => NasaTeamCoefficients.From(new(water, ice, between)));
    }

    private static TiePoints SetNamed(string name) =>
        (TiePoints)typeof(TiePointSets).GetProperty(name)!.GetValue(null)!;

    private static double[] Terms(RatioPolynomial row) => [row.Constant, row.Polarization, row.Gradient, row.Product];

    private static Func<double, double, bool> Within(double tolerance) => (left, right) => Math.Abs(left - right) <= tolerance;
}
