using System.Text;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>Puts a file in its place whole or not at all: write beside, flush to the disk, rename.</summary>
/// <remarks>
/// The content goes to a hidden neighbour, <c>.name.part</c>, in the same folder, so that the rename never crosses
/// a file system. A reader sees the old file or the new one, never a mixture. The neighbour's name depends on
/// the file's name alone: what a killed run leaves behind is overwritten by the next one, or found by
/// <see cref="RemoveLeftovers"/>. Two writers of one path at one time are the caller's mistake.
/// </remarks>
public static class PublishedFile
{
    /// <summary>The end of the name of a file that is being written.</summary>
    public const string PartSuffix = ".part";

    /// <summary>Writes a file.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="content">Every byte of it.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: it cannot be written; the file that stood there still does.</exception>
    public static void Write(string path, ReadOnlySpan<byte> content)
    {
        using PartFile part = PartFile.Create(path);
        part.Append(content);
        part.Publish();
    }

    /// <summary>Writes a file through a stream.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="write">Writes the content; may read back and seek, must not close the stream or keep it.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: it cannot be written; the file that stood there still does.</exception>
    public static void Write(string path, Action<Stream> write)
    {
        ArgumentNullException.ThrowIfNull(write);
        using PartFile part = PartFile.Create(path);
        part.Append(write);
        part.Publish();
    }

    /// <summary>Writes text as UTF-8 without a byte-order mark.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="text">The text, with the line ends it is to have.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: it cannot be written; the file that stood there still does.</exception>
    public static void WriteText(string path, string text) => Write(path, Encoding.UTF8.GetBytes(text));

    /// <summary>The name under which a file is written before it is published.</summary>
    /// <param name="path">The file.</param>
    public static string PartPathOf(string path)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        string full = Path.GetFullPath(path);
        return Path.Join(Path.GetDirectoryName(full), $".{Path.GetFileName(full)}{PartSuffix}");
    }

    /// <summary>Deletes a published file; nothing happens where there is none.</summary>
    /// <param name="path">The file.</param>
    /// <exception cref="FaultException">IE3101 to IE3107: it cannot be deleted.</exception>
    public static void Delete(string path)
    {
        try
        {
            File.Delete(path);
        }
        catch (DirectoryNotFoundException)
        {
            return; // Nothing was ever published there.
        }
        catch (Exception cause) when (WriteFaults.Covers(cause))
        {
            throw WriteFaults.From(Path.GetFullPath(path), cause);
        }
    }

    /// <summary>Deletes what killed runs left behind in a folder and below it.</summary>
    /// <param name="folder">A folder that no run is writing to; nothing happens where there is none.</param>
    /// <returns>How many files were deleted.</returns>
    /// <exception cref="FaultException">IE3101 to IE3107: a file cannot be deleted.</exception>
    public static int RemoveLeftovers(string folder)
    {
        if (!Directory.Exists(folder))
        {
            return 0;
        }

        int removed = 0;
        try
        {
            foreach (string part in Directory.EnumerateFiles(folder, $".*{PartSuffix}", SearchOption.AllDirectories))
            {
                File.Delete(part);
                removed++;
            }
        }
        catch (Exception cause) when (WriteFaults.Covers(cause))
        {
            throw WriteFaults.From(Path.GetFullPath(Path.Join(folder, $"*{PartSuffix}")), cause);
        }

        return removed;
    }
}
