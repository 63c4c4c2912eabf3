using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;

namespace IceExtent.Worker.Configuration;

/// <summary>Checks the [[source]] tables of a run file.</summary>
/// <param name="runFolder">What relative paths start from.</param>
/// <param name="config">The program's own files.</param>
/// <param name="methods">The methods of the run.</param>
/// <param name="needsFootprints">Whether the footprint of every channel must be known.</param>
/// <param name="needsSamples">Whether samples of pure surfaces are taken.</param>
/// <param name="needsSignals">Whether melt signals are written.</param>
internal sealed class SourceLoader(string runFolder, ConfigFolder config, IReadOnlyList<string> methods, bool needsFootprints, bool needsSamples, bool needsSignals)
{
    private static readonly Dictionary<string, RawNumber> Numbers = new(StringComparer.Ordinal)
    {
        ["int16"] = RawNumber.SignedTwoBytes,
        ["uint16"] = RawNumber.UnsignedTwoBytes,
        ["int32"] = RawNumber.SignedFourBytes,
        ["float32"] = RawNumber.RealFourBytes,
        ["float64"] = RawNumber.RealEightBytes,
    };

    /// <summary>Checks one table.</summary>
    /// <returns>The source, or null after adding faults.</returns>
    public RunSource? Load(ConfigScope scope, Grid? grid)
    {
        int before = scope.Faults.Count;
        string? sensorName = scope.Text("sensor");
        string? sensorPath = sensorName is null ? null : ConfigFolder.Resolve(scope, "sensor", sensorName, config.Sensors, runFolder);
        Sensor? sensor = sensorPath is null ? null : SensorLoader.Load(sensorPath, scope.Faults);
        IReadOnlyList<string> files = Files(scope);
        Dictionary<Channel, string> channels = Channels(scope);
        SourcePeriod period = SourceAdjustments.Period(scope, sensor);
        ChannelOffsets? offsets = SourceAdjustments.Offsets(scope, channels);
        string? status = scope.Name("status", ["final", "provisional"], required: false);
        RawLayout? raw = scope.Has("raw") && scope.Table("raw") is { } table ? Raw(table) : null;
        scope.RefuseUnknown();
        if (sensor is not null && scope.Has("channels") && grid is not null)
        {
            CheckChannels(scope, sensor, channels, grid);
        }

        return scope.Faults.Count > before || grid is null ? null : new(
            sensor!,
            sensorPath!,
            new(files, grid, channels, raw),
            status == "provisional" ? DayStatus.Provisional : DayStatus.Final)
        {
            Period = period,
            Offsets = offsets,
        };
    }

    private IReadOnlyList<string> Files(ConfigScope scope)
    {
        List<string> files = [];
        foreach ((string pattern, ConfigPosition at) in scope.Texts("files") ?? [])
        {
            IReadOnlyList<string> found = FileGlob.Find(pattern, runFolder);
            if (found.Count == 0)
            {
                scope.Faults.Add(new("IE1008", scope.Where("files", at), $"no file for {pattern}", "a pattern that matches at least one file", $"Patterns start from {runFolder}; check the spelling."));
            }

            files.AddRange(found);
        }

        return [.. files.Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal)];
    }

    private static Dictionary<Channel, string> Channels(ConfigScope scope)
    {
        Dictionary<Channel, string> channels = [];
        if (scope.Table("channels") is not { } table)
        {
            return channels;
        }

        foreach (Channel channel in ChannelNames.All)
        {
            if (table.Text(ChannelNames.NameOf(channel), required: false) is { } name)
            {
                channels[channel] = name;
            }
        }

        table.RefuseUnknown();
        return channels;
    }

    private void CheckChannels(ConfigScope scope, Sensor sensor, Dictionary<Channel, string> channels, Grid grid)
    {
        foreach (Channel channel in channels.Keys.Where(channel => !sensor.FrequenciesGigahertz.ContainsKey(channel)))
        {
            scope.Faults.Add(new(
                "IE1009",
                scope.Where("channels", scope.PositionOf("channels")),
                $"the channel {ChannelNames.NameOf(channel)}, which {sensor.Name} does not have",
                string.Join(", ", sensor.FrequenciesGigahertz.Keys.Select(ChannelNames.NameOf)),
                "Remove the channel or choose another sensor."));
        }

        foreach (Channel channel in channels.Keys.Where(channel =>
            needsFootprints && sensor.FrequenciesGigahertz.ContainsKey(channel) && !sensor.FootprintsMeters.ContainsKey(channel)))
        {
            scope.Faults.Add(new(
                "IE1015",
                scope.Where("sensor", scope.PositionOf("sensor")),
                $"the sensor {sensor.Name}, whose file has no footprint of {ChannelNames.NameOf(channel)}",
                "a sensor with [footprints_km] for every channel of the source, as coast.correction = \"brightness\" needs them",
                "Add the footprint to a sensor file of your own with its source, or choose another correction."));
        }

        foreach (Channel channel in TiePointSettings.SampleChannels.Where(channel => needsSamples && !channels.ContainsKey(channel)))
        {
            scope.Faults.Add(new(
                "IE1009",
                scope.Where("channels", scope.PositionOf("channels")),
                $"no {ChannelNames.NameOf(channel)}, by which samples for moving tie points are chosen",
                string.Join(", ", TiePointSettings.SampleChannels.Select(ChannelNames.NameOf)),
                "Map the channel to its variable, or leave self-tuning and tie_points.moving out."));
        }

        CheckSignals(scope, sensor, channels);
        foreach (string name in methods)
        {
            if (ConcentrationMethods.TryCreate(name, sensor.In(grid.Hemisphere), grid.Hemisphere) is not { } method)
            {
                string table = $"[{(grid.Hemisphere == Hemisphere.North ? "north" : "south")}.{ConcentrationMethods.TableOf(name)}]";
                scope.Faults.Add(new(
                    "IE1013",
                    scope.Where("sensor", scope.PositionOf("sensor")),
                    $"the sensor {sensor.Name}, whose file has no {table}",
                    $"a sensor with the pure surfaces that {name} needs",
                    "Leave the method out, or add the table to a sensor file of your own with its source."));
                continue;
            }

            foreach (Channel channel in method.Channels.Where(channel => !channels.ContainsKey(channel)))
            {
                scope.Faults.Add(new(
                    "IE1009",
                    scope.Where("channels", scope.PositionOf("channels")),
                    $"no {ChannelNames.NameOf(channel)}, which the method {name} needs",
                    string.Join(", ", method.Channels.Select(ChannelNames.NameOf)),
                    "Map the channel to its variable, or leave the method out."));
            }
        }
    }

    private void CheckSignals(ConfigScope scope, Sensor sensor, Dictionary<Channel, string> channels)
    {
        foreach (Channel channel in MeltSettings.SignalChannels.Where(channel => needsSignals && !channels.ContainsKey(channel)))
        {
            scope.Faults.Add(new(
                "IE1009",
                scope.Where("channels", scope.PositionOf("channels")),
                sensor.FrequenciesGigahertz.ContainsKey(channel)
                    ? $"no {ChannelNames.NameOf(channel)} of {sensor.Name}, of which melt signals are made"
                    : $"the sensor {sensor.Name}, which has no {ChannelNames.NameOf(channel)}, of which melt signals are made",
                string.Join(", ", MeltSettings.SignalChannels.Select(ChannelNames.NameOf)),
                "Map the channel to its variable, or leave melt.signals out."));
        }
    }

    private static RawLayout? Raw(ConfigScope scope)
    {
        int before = scope.Faults.Count;
        string? pattern = scope.Text("name");
        string? number = scope.Name("number", Numbers.Keys);
        string? order = scope.Name("byte_order", ["little", "big"]);
        double? scale = scope.Number("scale_k", -1e6, 1e6, "K per stored unit");
        double? offset = scope.Number("offset_k", -1e6, 1e6, "K", required: false);
        double? missing = scope.Number("missing", double.MinValue, double.MaxValue, string.Empty, required: false);
        int? header = scope.WholeNumber("header_bytes", 0, 1 << 20, required: false);
        bool? topFirst = scope.Flag("top_row_first", required: false);
        scope.RefuseUnknown();
        if (scale == 0.0)
        {
            scope.Faults.Add(new("IE1006", scope.Where("scale_k", scope.PositionOf("scale_k")), "0", "a number that is not 0", "Write the K that one stored unit stands for."));
        }

        if (pattern is not null && !(pattern.Contains("{date:", StringComparison.Ordinal) && pattern.Contains("{channel}", StringComparison.Ordinal)))
        {
            scope.Faults.Add(new("IE1006", scope.Where("name", scope.PositionOf("name")), pattern, "a name with {date:yyyyMMdd} and {channel} in it", "Write the file's name with the date and the channel replaced."));
        }

        return scope.Faults.Count > before
            ? null
            : new(pattern!, Numbers[number!], order == "big", scale!.Value, offset ?? 0.0, missing, header ?? 0, topFirst ?? true);
    }
}
