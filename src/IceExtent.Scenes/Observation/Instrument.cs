using IceExtent.Retrieval;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;

namespace IceExtent.Scenes.Observation;

/// <summary>What the radiometer does to true brightness temperatures: footprint, noise, offset and drift.</summary>
internal sealed class Instrument
{
    private const double HalfPowerWidthsPerDeviation = 2.354_820_045; // 2 sqrt(2 ln 2), for a Gaussian.
    private const double DaysPerDecade = 3652.5;

    private readonly InstrumentParameters parameters;
    private readonly DateOnly firstDay;
    private readonly ulong key;
    private readonly SeparableBlur?[] footprints = new SeparableBlur?[ChannelNames.All.Count];

    public Instrument(InstrumentParameters parameters, DateOnly firstDay, double cellMeters, ulong key)
    {
        (this.parameters, this.firstDay, this.key) = (parameters, firstDay, key);
        foreach ((Channel channel, double kilometers) in parameters.FootprintKilometers)
        {
            footprints[(int)channel] = kilometers > 0.0
                ? new(kilometers * 1000.0 / HalfPowerWidthsPerDeviation / cellMeters)
                : null;
        }
    }

    /// <summary>Writes what the radiometer reports in one channel.</summary>
    /// <param name="day">The day.</param>
    /// <param name="channel">The channel.</param>
    /// <param name="trueKelvins">One value a cell, in K, none missing.</param>
    /// <param name="columns">The number of columns of the grid.</param>
    /// <param name="room">As long as the plane; overwritten.</param>
    /// <param name="observedKelvins">Receives one value a cell, in K.</param>
    public void Observe(
        DateOnly day, Channel channel, ReadOnlySpan<float> trueKelvins, int columns, Span<float> room, Span<float> observedKelvins)
    {
        if (footprints[(int)channel] is { } footprint)
        {
            footprint.Smear(trueKelvins, columns, room, observedKelvins);
        }
        else
        {
            trueKelvins.CopyTo(observedKelvins);
        }

        double decades = (day.DayNumber - firstDay.DayNumber) / DaysPerDecade;
        float offset = (float)(parameters.OffsetKelvins.GetValueOrDefault(channel)
            + (parameters.DriftKelvinsPerDecade.GetValueOrDefault(channel) * decades));
        float noise = (float)parameters.NoiseKelvins.GetValueOrDefault(channel);
        AddNoise(Draws.Key(Draws.Key(key, day.DayNumber), (long)channel), noise, offset, observedKelvins);
    }

    // Four cells a hash, sixteen bits each.
    private static void AddNoise(ulong planeKey, float noise, float offset, Span<float> kelvins)
    {
        for (int cell = 0; cell < kelvins.Length; cell += 4)
        {
            ulong bits = Draws.Key(planeKey, cell);
            int last = Math.Min(cell + 4, kelvins.Length);
            for (int at = cell; at < last; at++)
            {
                kelvins[at] += offset + (noise * NormalTable.Pick((ushort)bits));
                bits >>= 16;
            }
        }
    }
}
