using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>Says in the program's own words why the operating system refused to write.</summary>
internal static class WriteFaults
{
    // Numbers of <errno.h> on Linux, which .NET hands on in HResult where it has no exception type of its own.
    private const int NoSpaceLeft = 28;
    private const int ReadOnlyFileSystem = 30;
    private const int QuotaExceeded = 122;

    // HRESULT_FROM_WIN32 of ERROR_HANDLE_DISK_FULL, ERROR_DISK_FULL and ERROR_WRITE_PROTECT.
    private const int WindowsHandleDiskFull = unchecked((int)0x80070027);
    private const int WindowsDiskFull = unchecked((int)0x80070070);
    private const int WindowsWriteProtect = unchecked((int)0x80070013);

    /// <summary>Whether an exception is a refusal of the operating system.</summary>
    public static bool Covers(Exception cause) =>
        cause is IOException or UnauthorizedAccessException or System.Security.SecurityException;

    /// <summary>Makes the error.</summary>
    /// <param name="path">The full path of what was to be written.</param>
    /// <param name="cause">What was thrown.</param>
    public static FaultException From(string path, Exception cause) => new(Describe(path, cause), cause);

    private static Fault Describe(string path, Exception cause)
    {
        if (BlockingFile(path) is { } blocker)
        {
            return new(
                "IE3104", path, $"the file {blocker} where a folder is needed", "a folder, or nothing",
                "Move that file away or choose another output folder.");
        }

        if (Directory.Exists(path) && cause is not DirectoryNotFoundException)
        {
            return new(
                "IE3105", path, "a folder where the file is to stand, or one that refuses", "a file, or nothing",
                "Move that folder away or choose another output folder.");
        }

        return (cause, cause.HResult) switch
        {
            (PathTooLongException, _) => new(
                "IE3103", path, $"a path of {path.Length} characters", "what the file system takes (mostly 255 bytes a name)",
                "Choose an output folder with a shorter path or shorter names in the run file."),
            (_, NoSpaceLeft or QuotaExceeded or WindowsDiskFull or WindowsHandleDiskFull) => new(
                "IE3102", path, "no room left on the disk or in the quota", "room for the whole file",
                "Make room, then start the run again."),
            (_, ReadOnlyFileSystem or WindowsWriteProtect) => new(
                "IE3106", path, "a file system that is mounted read-only", "one that can be written",
                "Mount it for writing or choose another output folder."),
            (UnauthorizedAccessException or System.Security.SecurityException, _) => new(
                "IE3101", path, "no permission to write", "a folder that the program's user may write to",
                "Give the user the right to write there or choose another output folder."),
            _ => new(
                "IE3107", path, $"a refusal by the operating system ({cause.Message.TrimEnd('.')})", "a write that succeeds",
                "Check the disk and the folder, then start the run again."),
        };
    }

    // The nearest thing above the path that exists, where it is a file.
    private static string? BlockingFile(string path)
    {
        for (string? above = Path.GetDirectoryName(path); above is not null; above = Path.GetDirectoryName(above))
        {
            if (Directory.Exists(above))
            {
                return null;
            }

            if (File.Exists(above))
            {
                return above;
            }
        }

        return null;
    }
}
