using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Keeps the cells of a run's regions and places in its archive.</summary>
internal sealed class CellArchive(RunSettings settings, ArchiveLayout layout)
{
    // Nothing of what does not decide the cells.
    private KeyValuePair<string, string>[] Metadata =>
    [
        new("grid", settings.Grid.Name),
        new("program_version", ProgramVersion.Text),
        new("notice", settings.Notice ?? "none"),
    ];

    /// <summary>Writes what the archive lacks and deletes what the run has not. For an archive whose days are known to be of the same configuration.</summary>
    /// <exception cref="FaultException">A table cannot be written.</exception>
    public void Update()
    {
        (RegionSettings regions, PlaceSettings places) = (settings.Regions, settings.Places);
        Keep(layout.RegionCellFile(settings.Grid.Hemisphere), regions.Regions.Count > 0, regions.Stored, path =>
            RegionCellTable.Write(path, settings.Grid, regions.Regions, regions.Digest, Metadata));
        Keep(layout.PlaceCellFile(settings.Grid.Hemisphere), places.Places.Count > 0, places.Stored, path =>
            PlaceCellTable.Write(path, settings.Grid, places.Places, places.Digest, Metadata));
    }

    private static void Keep(string path, bool wanted, bool stored, Action<string> write)
    {
        if (!wanted)
        {
            PublishedFile.Delete(path);
        }
        else if (!stored)
        {
            write(path);
        }
    }
}
