using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Tests;

/// <summary>Every file of config/ that is shipped can be read, and says what it must.</summary>
public sealed class ShippedConfigurationTests
{
    public static TheoryData<string> Sensors() => [.. ConfigFolder.NamesIn(ConfigFolder.BesideProgram.Sensors)];

    public static TheoryData<string> Grids() => [.. ConfigFolder.NamesIn(ConfigFolder.BesideProgram.Grids)];

    [Fact]
    public void Folder_HoldsTheNamedSensorsAndGrids()
    {
        Assert.Equal(["smmr", "ssmi-f08", "ssmi-f11", "ssmi-f13", "ssmis-f17"], ConfigFolder.NamesIn(ConfigFolder.BesideProgram.Sensors));
        Assert.Equal(14, ConfigFolder.NamesIn(ConfigFolder.BesideProgram.Grids).Count);
    }

    [Theory]
    [MemberData(nameof(Sensors))]
    public void Sensor_Shipped_IsValidAndItsPureSurfacesAreTold(string name)
    {
        List<Fault> faults = [];

        Sensor? sensor = SensorLoader.Load(Path.Combine(ConfigFolder.BesideProgram.Sensors, name + ".toml"), faults);

        Assert.Empty(faults);
        Assert.Equal(sensor!.FrequenciesGigahertz.Keys.Order(), sensor.FootprintsMeters.Keys.Order());
        foreach (Hemisphere hemisphere in Enum.GetValues<Hemisphere>())
        {
            TiePoints points = sensor.In(hemisphere).TiePoints;
            NasaTeamCoefficients coefficients = NasaTeamCoefficients.From(points);
            (double first, double multi) = NasaTeamPlain.Solve(coefficients, points.FirstYear.V19Kelvins, points.FirstYear.H19Kelvins, points.FirstYear.V37Kelvins);
            Assert.Equal(1.0, first, 1e-9);
            Assert.Equal(0.0, multi, 1e-9);
        }
    }

    /// <summary>Origin: printed, [Hollinger1989]; F8 itself, and F11 and F13 as F8.</summary>
    [Theory]
    [InlineData("ssmi-f08")]
    [InlineData("ssmi-f11")]
    [InlineData("ssmi-f13")]
    [Trait("Reference", "Hollinger1989")]
    public void Sensor_SpecialSensorMicrowaveImager_HasThePrintedNoise(string name)
    {
        Sensor sensor = SensorLoader.Load(Path.Combine(ConfigFolder.BesideProgram.Sensors, name + ".toml"), [])!;

        Assert.Equal([0.45, 0.42, 0.74, 0.37, 0.38, 0.69, 0.73], ChannelNames.All.Select(channel => sensor.NoiseKelvins[channel]));
    }

    [Theory]
    [MemberData(nameof(Grids))]
    public void Grid_Shipped_IsValidAndHasLand(string name)
    {
        List<Fault> faults = [];

        LoadedGrid? grid = GridLoader.Load(Path.Combine(ConfigFolder.BesideProgram.Grids, name + ".toml"), faults);

        Assert.Empty(faults);
        Assert.StartsWith(grid!.Grid.Hemisphere == Hemisphere.North ? "north-" : "south-", name, StringComparison.Ordinal);
        Assert.True(File.Exists(grid.LandPath));
    }
}
