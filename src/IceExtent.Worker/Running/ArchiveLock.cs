using System.Globalization;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>Keeps a second run off an archive. The system frees it when the process ends, however it ends.</summary>
internal sealed class ArchiveLock : IDisposable
{
    private const string FileName = ".lock";

    private readonly FileStream held;

    private ArchiveLock(FileStream held) => this.held = held;

    /// <summary>Takes the archive.</summary>
    /// <param name="output">The archive's folder; made when it is missing.</param>
    /// <param name="now">Written into the lock for people.</param>
    /// <exception cref="FaultException">IE3002: another run holds it. IE3003: the folder cannot be written.</exception>
    public static ArchiveLock Take(string output, DateTimeOffset now)
    {
        string path = Path.Combine(output, FileName);
        try
        {
            Directory.CreateDirectory(output);
            FileStream stream = new(path, FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.None);
            stream.SetLength(0);
            stream.Write(System.Text.Encoding.UTF8.GetBytes(string.Create(CultureInfo.InvariantCulture, $"process {Environment.ProcessId} since {now:O}\n")));
            stream.Flush();
            return new(stream);
        }
        catch (IOException cause) when (File.Exists(path) && Directory.Exists(output) && IsHeld(cause))
        {
            throw new FaultException(
                new("IE3002", output, "an archive that another run holds", "one run at a time", "Wait for the other run, or choose another output folder."), cause);
        }
        catch (Exception cause) when (cause is IOException or UnauthorizedAccessException or NotSupportedException)
        {
            throw new FaultException(
                new("IE3003", output, $"an output folder that cannot be written ({cause.Message.TrimEnd('.')})", "a folder this user may make and write", "Correct output in the run file, or the folder's permissions."), cause);
        }
    }

    /// <summary>What stands in the way of an output folder, without making it; null where nothing is seen.</summary>
    public static Fault? Obstacle(string output)
    {
        string? nearest = output;
        while (nearest is not null && !Directory.Exists(nearest) && !File.Exists(nearest))
        {
            nearest = Path.GetDirectoryName(nearest);
        }

        return nearest is not null && File.Exists(nearest)
            ? new("IE3003", output, $"a file in the way ({nearest})", "a folder this user may make and write", "Correct output in the run file, or move the file.")
            : null;
    }

    /// <inheritdoc/>
    public void Dispose() => held.Dispose();

    // The lock of another process shows as a sharing violation: EWOULDBLOCK on Linux, 0x20 on Windows.
    private static bool IsHeld(IOException cause) =>
        cause is not (DirectoryNotFoundException or PathTooLongException or FileNotFoundException)
        && (cause.Message.Contains("being used by another process", StringComparison.Ordinal) || (cause.HResult & 0xFFFF) is 0x20 or 11);
}
