using IceExtent.Retrieval;

namespace IceExtent.Worker.Configuration;

/// <summary>Checks what a [[source]] says of its place in a record of many sensors: its own period and its offsets from another sensor.</summary>
internal static class SourceAdjustments
{
    private const double LargestOffsetKelvins = 50.0;

    /// <summary>The source's own period.</summary>
    /// <param name="scope">The [[source]] table.</param>
    /// <param name="sensor">The sensor, or null where it could not be read.</param>
    public static SourcePeriod Period(ConfigScope scope, Sensor? sensor)
    {
        DateOnly? first = scope.Date("first_day", required: false);
        DateOnly? last = scope.Date("last_day", required: false);
        if (last < first)
        {
            Refuse(scope, "last_day", FormattableString.Invariant($"{last:yyyy-MM-dd}, before first_day = {first:yyyy-MM-dd}"), "a day not before first_day");
        }

        if (sensor is not null)
        {
            CheckService(scope, "first_day", first, sensor);
            CheckService(scope, "last_day", last, sensor);
        }

        return new(first, last);
    }

    /// <summary>The source's offsets.</summary>
    /// <param name="scope">The [[source]] table.</param>
    /// <param name="channels">The channels that the source maps.</param>
    /// <returns>The offsets; null where the table has none or faults were added.</returns>
    public static ChannelOffsets? Offsets(ConfigScope scope, IReadOnlyDictionary<Channel, string> channels)
    {
        int before = scope.Faults.Count;
        Dictionary<Channel, double> kelvins = Kelvins(scope.Table("offset_k", required: false), channels, -LargestOffsetKelvins);
        Dictionary<Channel, double> errors = Kelvins(scope.Table("offset_se_k", required: false), channels, 0.0);
        foreach (Channel channel in errors.Keys.Where(channel => !kelvins.ContainsKey(channel)))
        {
            Refuse(scope, "offset_se_k", $"a standard error of {ChannelNames.NameOf(channel)}, which has no offset", "standard errors of channels that offset_k has");
        }

        return scope.Faults.Count > before || kelvins.Count == 0 ? null : new(kelvins, errors);
    }

    private static Dictionary<Channel, double> Kelvins(ConfigScope? table, IReadOnlyDictionary<Channel, string> channels, double lowest)
    {
        Dictionary<Channel, double> kelvins = [];
        if (table is null)
        {
            return kelvins;
        }

        foreach (Channel channel in ChannelNames.All)
        {
            string name = ChannelNames.NameOf(channel);
            if (table.Number(name, lowest, LargestOffsetKelvins, "K", required: false) is not { } value)
            {
                continue;
            }

            kelvins[channel] = value;
            if (!channels.ContainsKey(channel))
            {
                Refuse(table, name, "a channel that the source does not map", "channels of the source");
            }
        }

        table.RefuseUnknown();
        return kelvins;
    }

    private static void CheckService(ConfigScope scope, string key, DateOnly? day, Sensor sensor)
    {
        if (day is { } own && !sensor.Serves(own))
        {
            Refuse(
                scope,
                key,
                FormattableString.Invariant($"{own:yyyy-MM-dd}, outside the service of {sensor.Name}"),
                FormattableString.Invariant($"{sensor.FirstDay:yyyy-MM-dd} to ") + (sensor.LastDay is { } end ? FormattableString.Invariant($"{end:yyyy-MM-dd}") : "today"));
        }
    }

    private static void Refuse(ConfigScope scope, string key, string found, string allowed) =>
        scope.Faults.Add(new("IE1011", scope.Where(key, scope.PositionOf(key)), found, allowed, "Correct one of the two."));
}
