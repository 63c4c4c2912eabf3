using IceExtent.Retrieval;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Reads days from NetCDF-4 and HDF5 files whose variables are packed by [CF].</summary>
/// <remarks>
/// A file holds one day or many. Where a file has a time, the time rules, whatever date stands in its name. The
/// file's own coordinates are compared with the grid: an axis that runs the other way is turned, another grid is
/// refused. A file that gives no coordinates is taken to start with the top row.
/// </remarks>
internal sealed class NetCdfSource : IBrightnessSource
{
    private readonly SourceDescription description;
    private readonly KelvinRules rules = new();
    private readonly KnownStructures structures = new();

    /// <summary>Takes the description of a source; touches no file.</summary>
    public NetCdfSource(SourceDescription description) => this.description = description;

    /// <inheritdoc/>
    public SourceInventory List(CancellationToken cancellation)
    {
        // Files are independent; each result has its own place, so the order does not depend on the threads.
        (IReadOnlyList<SourceDay> Days, Fault? Fault)[] found =
            new (IReadOnlyList<SourceDay>, Fault?)[description.Files.Count];
        Parallel.For(
            0,
            found.Length,
            new ParallelOptions { CancellationToken = cancellation, MaxDegreeOfParallelism = Environment.ProcessorCount },
            file => found[file] = ListFile(description.Files[file]));

        return new(
            [.. found.SelectMany(file => file.Days)
                .OrderBy(day => day.Date)
                .ThenBy(day => day.Files[0], StringComparer.Ordinal)
                .ThenBy(day => day.Step)],
            [.. found.Select(file => file.Fault).OfType<Fault>()]);
    }

    /// <inheritdoc/>
    public void Read(SourceDay day, BrightnessPlanes into)
    {
        ArgumentNullException.ThrowIfNull(day);
        ArgumentNullException.ThrowIfNull(into);
        if (into.CellCount != description.Grid.CellCount)
        {
            throw new ArgumentException(
                $"The planes have {into.CellCount} cells; the grid {description.Grid.Name} has {description.Grid.CellCount}.", nameof(into));
        }

        Channel[] channels = [.. ChannelNames.All.Where(channel => into.Has(channel) && description.Channels.ContainsKey(channel))];
        foreach (Channel channel in into.Channels.Except(channels))
        {
            into.Kelvins(channel).Fill(float.NaN);
        }

        HdfFile.Read(day.Files[0], file =>
        {
            foreach (ChannelStructure structure in structures.Of(file, channels, opened => Find(opened, channels)))
            {
                CellReader.Read(file, structure, day.Step, description.Grid, into.Kelvins(structure.Channel));
            }

            return true;
        });
    }

    private (IReadOnlyList<SourceDay> Days, Fault? Fault) ListFile(string path)
    {
        try
        {
            return HdfFile.Read(path, file =>
            {
                FileVariable variable = file.Variable(description.Channels.First().Value);
                DayStamps stamps = DayStamps.Of(variable, GridAxes.Find(variable, description.Grid));
                SourceDay[] days = [.. stamps.Days.Select(stamp => new SourceDay(stamp.Day, [path], stamp.Step))];
                return ((IReadOnlyList<SourceDay>)days, stamps.Fault);
            });
        }
        catch (FaultException unreadable)
        {
            return ([], unreadable.Fault);
        }
    }

    private ChannelStructure[] Find(HdfFile file, Channel[] channels)
    {
        GridAgreement agreement = new(description.Grid);
        return Array.ConvertAll(channels, channel => ChannelStructure.Of(
            file, channel, description.Channels[channel], description.Grid, agreement, rules));
    }
}
