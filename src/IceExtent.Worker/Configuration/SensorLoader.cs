using IceExtent.Retrieval;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads sensor files: config/sensors or a run's own.</summary>
internal static class SensorLoader
{
    private static readonly Channel[] TiePointChannels = [Channel.V19, Channel.H19, Channel.V37];
    private static readonly Channel[] SurfaceChannels = [Channel.V19, Channel.V37, Channel.H37];

    /// <summary>Reads and checks one sensor.</summary>
    /// <returns>The sensor, or null after adding to <paramref name="faults"/>.</returns>
    public static Sensor? Load(string path, ICollection<Fault> faults)
    {
        int before = faults.Count;
        if (TomlFile.Read(path, faults) is not { } table)
        {
            return null;
        }

        ConfigScope scope = new(table, string.Empty, faults);
        string? title = scope.Text("title");
        DateOnly? first = scope.Date("first_day");
        DateOnly? last = scope.Date("last_day", required: false);
        double? gap = scope.Number("polar_gap_latitude", 60.0, 90.0, "degrees", required: false);
        double[]? range = scope.Numbers("range_k", 2, RangeScreen.Physical.LowestKelvins, RangeScreen.Physical.HighestKelvins, "K");
        Dictionary<Channel, double> frequencies = Frequencies(scope);
        Dictionary<Channel, double> footprints = Footprints(scope, frequencies);
        ChannelNoise noise = Noise(scope, frequencies);
        RetrievalScatter? scatter = Scatter(scope.Table("scatter"));
        HemisphereTuning? north = Tuning(scope.Table("north"));
        HemisphereTuning? south = Tuning(scope.Table("south"));
        scope.RefuseUnknown();
        if (range is not null && !(range[0] < range[1]))
        {
            Refuse(scope, "range_k", "a lower end that is not below the upper one", "two rising temperatures in K");
        }

        if (first is not null && last is not null && last < first)
        {
            Refuse(scope, "last_day", "a day before first_day", "a day not before first_day");
        }

        return faults.Count > before ? null : new Sensor
        {
            Name = Path.GetFileNameWithoutExtension(path),
            Title = title!,
            FrequenciesGigahertz = frequencies,
            FootprintsMeters = footprints,
            NoiseKelvins = noise,
            FirstDay = first!.Value,
            LastDay = last,
            Range = new(range![0], range[1]),
            PolarGapLatitudeDegrees = gap,
            Scatter = scatter!,
            North = north!,
            South = south!,
        };
    }

    private static void Refuse(ConfigScope scope, string key, string found, string allowed) =>
        scope.Faults.Add(new("IE1011", scope.Where(key, scope.PositionOf(key)), found, allowed, "Correct the value."));

    private static Dictionary<Channel, double> Frequencies(ConfigScope scope)
    {
        Dictionary<Channel, double> frequencies = [];
        if (scope.Table("frequencies_ghz") is { } table)
        {
            foreach (Channel channel in ChannelNames.All)
            {
                if (table.Number(ChannelNames.NameOf(channel), 1.0, 200.0, "GHz", required: false) is { } frequency)
                {
                    frequencies[channel] = frequency;
                }
            }

            table.RefuseUnknown();
        }

        return frequencies;
    }

    private static Dictionary<Channel, double> Footprints(ConfigScope scope, Dictionary<Channel, double> frequencies)
    {
        const double MetersPerKilometer = 1_000.0;
        Dictionary<Channel, double> footprints = [];
        if (scope.Table("footprints_km", required: false) is { } table)
        {
            foreach (Channel channel in ChannelNames.All.Where(channel => table.Has(ChannelNames.NameOf(channel))))
            {
                string name = ChannelNames.NameOf(channel);
                double[]? axes = table.Numbers(name, 2, 1.0, 300.0, "km");
                if (!frequencies.ContainsKey(channel))
                {
                    Refuse(table, name, "the footprint of a channel that frequencies_ghz does not have", "footprints of the sensor's own channels");
                }
                else if (axes is [var along, var across])
                {
                    footprints[channel] = Math.Sqrt(along * across) * MetersPerKilometer;
                }
            }

            table.RefuseUnknown();
        }

        return footprints;
    }

    private static ChannelNoise Noise(ConfigScope scope, Dictionary<Channel, double> frequencies)
    {
        Dictionary<Channel, double> noise = [];
        if (scope.Table("noise_k", required: false) is { } table)
        {
            foreach (Channel channel in ChannelNames.All)
            {
                string name = ChannelNames.NameOf(channel);
                if (table.Number(name, 0.0, 10.0, "K", required: false) is { } kelvins)
                {
                    noise[channel] = kelvins;
                }

                if (table.Has(name) && !frequencies.ContainsKey(channel))
                {
                    Refuse(table, name, "the noise of a channel that frequencies_ghz does not have", "noise of the sensor's own channels");
                }
            }

            table.RefuseUnknown();
        }

        return new(noise);
    }

    private static RetrievalScatter? Scatter(ConfigScope? scope)
    {
        double? water = scope?.Number("open_water", 0.001, 0.5, string.Empty);
        double? ice = scope?.Number("closed_ice", 0.001, 0.5, string.Empty);
        scope?.RefuseUnknown();
        return water is null || ice is null ? null : new(water.Value, ice.Value);
    }

    private static HemisphereTuning? Tuning(ConfigScope? scope)
    {
        if (scope is null)
        {
            return null;
        }

        TiePoints? points = Points(scope);
        WeatherScreens? screens = Screens(scope.Table("screens"));
        SurfacePoints? surfaces = Surfaces(scope);
        PolarizationPoints? polarization = Polarization(scope);
        scope.RefuseUnknown();
        return points is null || screens is null ? null : new(points, screens, surfaces, polarization);
    }

    private static TiePoints? Points(ConfigScope scope)
    {
        ConfigScope? table = scope.Table("tie_points_k");
        TiePoint? water = Point(table?.Table("open_water"));
        TiePoint? first = Point(table?.Table("first_year"));
        TiePoint? multi = Point(table?.Table("multiyear"));
        table?.RefuseUnknown();
        if (water is null || first is null || multi is null)
        {
            return null;
        }

        TiePoints points = new(water, first, multi);
        try
        {
            _ = NasaTeamCoefficients.From(points);
            return points;
        }
        catch (ArgumentException)
        {
            Refuse(scope, "tie_points_k", "three surfaces on one line", "surfaces that form a triangle in polarisation and gradient ratio");
            return null;
        }
    }

    private static SurfacePoints? Surfaces(ConfigScope scope)
    {
        ConfigScope? table = scope.Table("surface_points_k", required: false);
        ChannelKelvins? water = Kelvins(table?.Table("open_water"));
        ChannelKelvins? first = Kelvins(table?.Table("first_year"));
        ChannelKelvins? multi = Kelvins(table?.Table("multiyear"));
        table?.RefuseUnknown();
        if (water is null || first is null || multi is null)
        {
            return null;
        }

        SurfacePoints points = new(water, first, multi);
        try
        {
            _ = new Bootstrap(points, Grids.Hemisphere.North);
            _ = new Bristol(points);
            return points;
        }
        catch (ArgumentException)
        {
            Refuse(scope, "surface_points_k", "open water on the line of the two ice surfaces", "surfaces that form a triangle in 19v, 37v and 37h");
            return null;
        }
    }

    private static ChannelKelvins? Kelvins(ConfigScope? scope)
    {
        if (scope is null)
        {
            return null;
        }

        Dictionary<Channel, double> kelvins = [];
        foreach (Channel channel in SurfaceChannels)
        {
            if (scope.Number(ChannelNames.NameOf(channel), 50.0, 350.0, "K") is { } value)
            {
                kelvins.Add(channel, value);
            }
        }

        scope.RefuseUnknown();
        return kelvins.Count == SurfaceChannels.Length ? new(kelvins) : null;
    }

    private static PolarizationPoints? Polarization(ConfigScope scope)
    {
        ConfigScope? table = scope.Table("polarization_89_k", required: false);
        double? water = table?.Number("open_water", 1.0, 150.0, "K");
        double? ice = table?.Number("closed_ice", 0.1, 150.0, "K");
        table?.RefuseUnknown();
        if (water is null || ice is null)
        {
            return null;
        }

        if (water <= ice)
        {
            Refuse(scope, "polarization_89_k", "open water not above closed ice", "a larger difference over water than over ice");
            return null;
        }

        return new(water.Value, ice.Value);
    }

    private static TiePoint? Point(ConfigScope? scope)
    {
        if (scope is null)
        {
            return null;
        }

        double?[] kelvins = Array.ConvertAll(TiePointChannels, channel => scope.Number(ChannelNames.NameOf(channel), 50.0, 350.0, "K"));
        scope.RefuseUnknown();
        return kelvins is [{ } v19, { } h19, { } v37] ? new(v19, h19, v37) : null;
    }

    private static WeatherScreens? Screens(ConfigScope? scope)
    {
        double? gradient3719 = scope?.Number("gradient_37_19", -0.5, 0.5, string.Empty);
        double? gradient2219 = scope?.Number("gradient_22_19", -0.5, 0.5, string.Empty, required: false);
        scope?.RefuseUnknown();
        return gradient3719 is null ? null : new(gradient3719.Value, gradient2219);
    }
}
