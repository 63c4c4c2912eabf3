using IceExtent.Grids;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;

namespace IceExtent.Worker.Seasons;

/// <summary>The dates of cells that an archive has of a year that was not over, held against new ones.</summary>
internal sealed class RunningYear
{
    private readonly Dictionary<SeasonEvent, float[]> before = [];

    private RunningYear()
    {
    }

    /// <summary>Reads the maps of a year that was not over, or gives null where there are none or they cannot be used.</summary>
    public static RunningYear? Read(string path, Grid grid, bool wasRunning)
    {
        if (!wasRunning || !File.Exists(path))
        {
            return null;
        }

        RunningYear year = new();
        try
        {
            SeasonGridReader reader = new(path, grid);
            foreach (SeasonEvent which in SeasonEvents.All.Where(which => reader.Has(SeasonEvents.NameOf(which))))
            {
                float[] days = new float[grid.CellCount];
                reader.Read(SeasonEvents.NameOf(which), days);
                year.before.Add(which, days);
            }

            return year;
        }
        catch (FaultException)
        {
            return null; // They are about to be written anew.
        }
    }

    /// <summary>Counts what became of them.</summary>
    public IReadOnlyDictionary<SeasonEvent, DateChanges> ChangesTo(CellSeasons now)
    {
        Dictionary<SeasonEvent, DateChanges> changes = [];
        foreach ((SeasonEvent which, float[] days) in before)
        {
            DateChanges sum = default;
            for (int index = 0; index < now.Cells.Count; index++)
            {
                float day = days[now.Cells[index]];
                sum = sum.With(float.IsNaN(day) ? null : (int)day, now.Dates[index].Of(which)?.Day);
            }

            changes.Add(which, sum);
        }

        return changes;
    }
}
