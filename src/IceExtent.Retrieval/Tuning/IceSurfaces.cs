namespace IceExtent.Retrieval;

/// <summary>All that a sensor's file says of each pure surface, in one place: the tie points of NASA Team and those of the linear methods.</summary>
/// <remarks>Where both know a channel, NASA Team's value stands: samples are chosen by that method.</remarks>
internal static class IceSurfaces
{
    public static ChannelKelvins OpenWater(HemisphereTuning tuning) => Join(tuning.TiePoints.OpenWater, tuning.Surfaces?.OpenWater);

    public static ChannelKelvins FirstYear(HemisphereTuning tuning) => Join(tuning.TiePoints.FirstYear, tuning.Surfaces?.FirstYear);

    public static ChannelKelvins Multiyear(HemisphereTuning tuning) => Join(tuning.TiePoints.Multiyear, tuning.Surfaces?.Multiyear);

    private static ChannelKelvins Join(TiePoint point, ChannelKelvins? others)
    {
        Dictionary<Channel, double> kelvins = ChannelNames.All
            .Where(channel => others?.Has(channel) == true)
            .ToDictionary(channel => channel, channel => others![channel]);
        kelvins[Channel.V19] = point.V19Kelvins;
        kelvins[Channel.H19] = point.H19Kelvins;
        kelvins[Channel.V37] = point.V37Kelvins;
        return new(kelvins);
    }
}
