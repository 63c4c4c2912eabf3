using IceExtent.Retrieval;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests.Parameters;

public sealed class SceneFilesTests
{
    // Reading refuses missing and unknown keys, so this holds the shipped files and the records together.
    [Theory]
    [InlineData("north")]
    [InlineData("south")]
    [InlineData("demo")]
    public void ShippedScene_Read_HasNoProblems(string name) =>
        Assert.Empty(SceneCheck.FindProblems(Shipped.Scene(name)));

    [Fact]
    public void FindProblems_SeveralFaults_NamesThemAll()
    {
        SceneParameters north = Shipped.Scene("north");
        SceneParameters wrong = north with
        {
            Season = north.Season with { MaximumDayOfYear = 0, SummerEdgeLatitudeDegrees = 50 },
            Weather = north.Weather with { FreezingKelvins = -1.8, Storms = north.Weather.Storms with { BirthsPerDay = 200 } },
            Surfaces = north.Surfaces with { LandEmissivity = new Dictionary<Channel, double> { [Channel.V19] = 0.9 } },
            Instrument = north.Instrument with { NoiseKelvins = new Dictionary<Channel, double> { [Channel.V37] = double.NaN } },
            Coverage = north.Coverage with { Outages = [new() { FirstDay = new(2000, 1, 2), LastDay = new(2000, 1, 1) }] },
        };

        Assert.Equal(
            [
                "season.maximum_day_of_year: found 0; allowed: 1 to 365, unit day.",
                "season.summer_edge_latitude_degrees: found 50; allowed: 61 to 95, unit degrees.",
                "weather.freezing_kelvins: found -1.8; allowed: 270 to 273.15, unit K.",
                "weather.storms.births_per_day: found 200; allowed: 0 to 20, unit storms a day.",
                "surfaces.land_emissivity.19h: found nothing; allowed: 0 to 1, unit 1.",
                "surfaces.land_emissivity.22v: found nothing; allowed: 0 to 1, unit 1.",
                "surfaces.land_emissivity.37v: found nothing; allowed: 0 to 1, unit 1.",
                "surfaces.land_emissivity.37h: found nothing; allowed: 0 to 1, unit 1.",
                "instrument.noise_kelvins.37v: found nothing; allowed: 0 to 20, unit K.",
                "coverage.outages.last_day: found 2000-01-01; allowed: 2000-01-02 (first_day) or later.",
            ],
            SceneCheck.FindProblems(wrong).Select(problem => problem.ToString()).Where(text => !text.Contains(" - ", StringComparison.Ordinal)));
    }
}
