using IceExtent.Retrieval;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>One day's brightness temperatures, ready to be retrieved from. Valid until its reader reads the next day.</summary>
/// <param name="Planes">After the range check, the source's offsets and the coast correction.</param>
/// <param name="Conditions">What both marked.</param>
/// <param name="OutOfRange">Temperatures made missing.</param>
internal readonly record struct ObservedDay(BrightnessPlanes Planes, CellConditions[] Conditions, int OutOfRange)
{
    /// <summary>Retrieves the day by one method.</summary>
    /// <param name="retrieval">The method, tuned.</param>
    /// <param name="month">Where ice cannot be, or null.</param>
    /// <param name="coast">What corrected the temperatures, or null.</param>
    /// <param name="into">Receives every plane.</param>
    public RetrievalCounts RetrieveWith(DayRetrieval retrieval, MonthMask? month, CoastBrightness? coast, ConcentrationPlanes into)
    {
        RetrievalCounts counts = retrieval.Retrieve(Planes, Conditions, into, month);
        if (coast is null)
        {
            return counts;
        }

        coast.WidenErrors(into);
        return counts with { CoastCorrected = CoastCorrected(into) };
    }

    // A cell that was corrected both in its temperatures and in its concentration counts once.
    private static int CoastCorrected(ConcentrationPlanes planes)
    {
        int count = 0;
        foreach (CellConditions condition in planes.Conditions)
        {
            count += (condition & CellConditions.CoastCorrected) != 0 ? 1 : 0;
        }

        return count;
    }
}

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
        BrightnessPlanes planes = PlanesFor(source.ChannelsRead);
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
