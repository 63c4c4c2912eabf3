using System.Collections.Immutable;
using IceExtent.Retrieval;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Remembers what was found out of the files read last, for files that hold many days. Safe from several threads.</summary>
internal sealed class KnownStructures
{
    private const int MostKept = 8;

    private ImmutableList<Known> kept = [];

    /// <summary>The structure of a file's channels: the remembered one while the file stays as it was, else found out anew.</summary>
    /// <param name="file">The open file.</param>
    /// <param name="channels">The channels asked for.</param>
    /// <param name="find">Finds the structure out.</param>
    public ChannelStructure[] Of(HdfFile file, Channel[] channels, Func<HdfFile, ChannelStructure[]> find)
    {
        DateTime written = File.GetLastWriteTimeUtc(file.Path);
        foreach (Known known in kept)
        {
            if (known.Path == file.Path
                && known.Bytes == file.Stream.Length
                && known.Written == written
                && known.Channels.AsSpan().SequenceEqual(channels))
            {
                return known.Structure;
            }
        }

        Known found = new(file.Path, file.Stream.Length, written, channels, find(file));
        ImmutableInterlocked.Update(ref kept, (list, newest) => [newest, .. list.Take(MostKept - 1)], found);
        return found.Structure;
    }

    private sealed record Known(string Path, long Bytes, DateTime Written, Channel[] Channels, ChannelStructure[] Structure);
}
