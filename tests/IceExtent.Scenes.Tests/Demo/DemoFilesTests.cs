using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes.Demo;
using IceExtent.Scenes.Tests.Kit;
using Tomlyn;
using Tomlyn.Model;

namespace IceExtent.Scenes.Tests.Demo;

/// <summary>The files that the demonstration copies say the same as the code that draws its scenes.</summary>
public sealed class DemoFilesTests
{
    private static TomlTable Read(string folder, string name) =>
        TomlSerializer.Deserialize<TomlTable>(File.ReadAllText(Shipped.PathOf("config", "demo", folder, name + ".toml")))!;

    private static double Number(TomlTable table, string key) =>
        Convert.ToDouble(table[key], System.Globalization.CultureInfo.InvariantCulture);

    [Fact]
    public void GridFile_Numbers_AreThoseOfTheGrid()
    {
        TomlTable file = Read("grids", InventedSea.Grid.Name);
        Grid grid = InventedSea.Grid;

        Assert.Equal(grid.Projection.Ellipsoid, new(Number(file, "semi_major_axis_m"), Number(file, "inverse_flattening")));
        Assert.Equal(
            grid.Frame,
            new GridFrame(
                (int)Number(file, "columns"), (int)Number(file, "rows"), Number(file, "cell_m"), Number(file, "left_m"), Number(file, "top_m")));
        Assert.Equal("polar-stereographic", file["projection"]);
        Assert.Equal("north", file["hemisphere"]);

        // The map itself: the same position lands on the same spot.
        PolarStereographic map = new(grid.Projection.Ellipsoid, Number(file, "true_scale_latitude"), Number(file, "origin_longitude"));
        Assert.Equal(grid.Projection.Forward(new(71.5, 33.0)), map.Forward(new(71.5, 33.0)));
        Assert.Contains("invented", (string)file["title"], StringComparison.Ordinal);
    }

    [Fact]
    public void SensorFile_Numbers_AreThoseOfTheSensor()
    {
        Sensor sensor = InventedRadiometer.Sensor;
        TomlTable file = Read("sensors", sensor.Name);

        Assert.Equal(sensor.Title, file["title"]);
        Assert.Contains("invented", sensor.Title, StringComparison.Ordinal);
        Assert.Equal(sensor.FirstDay, DateOnly.FromDateTime(((TomlDateTime)file["first_day"]).DateTime.DateTime));
        Assert.False(file.ContainsKey("last_day"));
        Assert.Null(sensor.LastDay);
        Assert.Equal(sensor.PolarGapLatitudeDegrees, Number(file, "polar_gap_latitude"));
        Assert.Equal([sensor.Range.LowestKelvins, sensor.Range.HighestKelvins], ((TomlArray)file["range_k"]).Cast<double>());
        TomlTable frequencies = (TomlTable)file["frequencies_ghz"];
        Assert.Equal(
            sensor.FrequenciesGigahertz.OrderBy(pair => pair.Key).Select(pair => (ChannelNames.NameOf(pair.Key), pair.Value)),
            frequencies.Keys.Select(key => (key, Number(frequencies, key))).OrderBy(pair => ChannelNames.Parse(pair.key)));
        TomlTable scatter = (TomlTable)file["scatter"];
        Assert.Equal(sensor.Scatter, new(Number(scatter, "open_water"), Number(scatter, "closed_ice")));
        Assert.Equal(ChannelNoise.None, sensor.NoiseKelvins);
        Assert.False(file.ContainsKey("noise_k"));
        Assert.Equal(sensor.North, Tuning((TomlTable)file["north"]));
        Assert.Equal(sensor.South, Tuning((TomlTable)file["south"]));
    }

    private static HemisphereTuning Tuning(TomlTable table)
    {
        TomlTable ties = (TomlTable)table["tie_points_k"], screens = (TomlTable)table["screens"];
        TiePoint Point(string surface)
        {
            TomlTable point = (TomlTable)ties[surface];
            return new(Number(point, "19v"), Number(point, "19h"), Number(point, "37v"));
        }

        return new(
            new(Point("open_water"), Point("first_year"), Point("multiyear")),
            new(Number(screens, "gradient_37_19"), Number(screens, "gradient_22_19")));
    }
}
