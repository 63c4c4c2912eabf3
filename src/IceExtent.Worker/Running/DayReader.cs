using IceExtent.Retrieval;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>One day's brightness temperatures, ready to be retrieved from. Valid until its reader reads the next day.</summary>
/// <param name="Planes">After the range check, the source's offsets and the coast correction.</param>
/// <param name="Conditions">What both marked.</param>
/// <param name="OutOfRange">Temperatures made missing.</param>
internal readonly record struct ObservedDay(BrightnessPlanes Planes, CellConditions[] Conditions, int OutOfRange);

/// <summary>Reads days, one at a time, into memory of its own. Not shared between threads.</summary>
internal sealed class DayReader(DayPreparation preparation)
{
    private readonly Dictionary<string, BrightnessPlanes> planesByChannels = new(StringComparer.Ordinal);
    private readonly CellConditions[] conditions = new CellConditions[preparation.Settings.Grid.CellCount];

    /// <summary>Reads one day.</summary>
    /// <exception cref="FaultException">Its input cannot be used.</exception>
    public ObservedDay Read(PlannedDay day)
    {
        SourceRetrieval source = preparation.Of(day.Source);
        BrightnessPlanes planes = PlanesFor(source.Channels);
        day.Source.Reader.Read(day.Input, planes);
        int outOfRange = DayRetrieval.CheckRange(planes, day.Source.Settings.Sensor.Range, conditions);
        day.Source.Settings.Offsets?.Subtract(planes);
        source.Coast?.Correct(planes, conditions);
        return new(planes, conditions, outOfRange);
    }

    private BrightnessPlanes PlanesFor(IReadOnlyList<Channel> channels)
    {
        string key = string.Join(' ', channels);
        if (!planesByChannels.TryGetValue(key, out BrightnessPlanes? planes))
        {
            planes = new(preparation.Settings.Grid.CellCount, channels);
            planesByChannels.Add(key, planes);
        }

        return planes;
    }
}
