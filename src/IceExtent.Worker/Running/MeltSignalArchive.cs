using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Writes one CF NetCDF-4 file of melt signals a day. Safe to share between workers.</summary>
internal sealed class MeltSignalArchive(RunSettings settings, ArchiveLayout layout, IReadOnlyList<KeyValuePair<string, string>> attributes)
{
    /// <summary>The least concentration at which a cell has signals. Unit: 1.</summary>
    public float IceFraction => (float)settings.Rules.IceFraction;

    /// <summary>The number of cells of a plane.</summary>
    public int CellCount => settings.Grid.CellCount;

    /// <summary>Writes one day.</summary>
    /// <param name="day">The day.</param>
    /// <param name="iceOf">The method that said where ice is.</param>
    /// <param name="planes">The signals.</param>
    public void Write(DayLabel day, string iceOf, MeltSignalPlanes planes) => GridFile.Write(
        layout.MeltSignalFile(settings.Grid.Hemisphere, day.Date),
        settings.Grid,
        day.Date,
        MeltSignalVariables.Of(planes.HorizontalRange, planes.Vertical19, planes.Vertical37),
        [
            .. attributes,
            new("sensor", day.Sensor),
            new("sensor_offsets_k", day.Offsets),
            new("ice_of_method", iceOf),
            new("ice_fraction", FormattableString.Invariant($"{settings.Rules.IceFraction}")),
        ]);
}
