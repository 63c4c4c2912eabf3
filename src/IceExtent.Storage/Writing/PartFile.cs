using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>A file on its way: written beside its place, not yet published. Disposing an unpublished one deletes it.</summary>
internal sealed class PartFile : IDisposable
{
    // The callers hand over whole blocks; a buffer would only copy them once more.
    private const int NoBuffer = 0;

    private readonly string path;
    private readonly string partPath;
    private FileStream? stream;
    private bool published;

    private PartFile(string path)
    {
        this.path = path;
        partPath = PublishedFile.PartPathOf(path);
        stream = Open(partPath);
    }

    /// <summary>Makes the folder and opens the neighbour.</summary>
    /// <exception cref="FaultException">It cannot be opened.</exception>
    public static PartFile Create(string path)
    {
        string full = Path.GetFullPath(path);
        try
        {
            return new(full);
        }
        catch (Exception cause) when (WriteFaults.Covers(cause))
        {
            throw WriteFaults.From(full, cause);
        }
    }

    /// <summary>Adds bytes.</summary>
    /// <exception cref="FaultException">They cannot be written.</exception>
    public void Append(ReadOnlySpan<byte> content)
    {
        try
        {
            OpenStream.Write(content);
        }
        catch (Exception cause) when (WriteFaults.Covers(cause))
        {
            throw WriteFaults.From(path, cause);
        }
    }

    /// <summary>Lets a library write.</summary>
    /// <exception cref="FaultException">The disk refuses; what the library throws for its own reasons passes through.</exception>
    public void Append(Action<Stream> write)
    {
        try
        {
            write(OpenStream);
        }
        catch (Exception cause) when (WriteFaults.Covers(cause))
        {
            throw WriteFaults.From(path, cause);
        }
    }

    /// <summary>Flushes to the disk and renames.</summary>
    /// <exception cref="FaultException">The disk refuses.</exception>
    public void Publish()
    {
        try
        {
            OpenStream.Flush(flushToDisk: true);
            Close();
            File.Move(partPath, path, overwrite: true);
            published = true;
        }
        catch (Exception cause) when (WriteFaults.Covers(cause))
        {
            throw WriteFaults.From(path, cause);
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        if (published)
        {
            return;
        }

        // The fault that led here is on its way already: one more from a full disk must not hide it,
        // and what cannot be deleted is overwritten by the next run.
        Quietly(Close);
        Quietly(() => File.Delete(partPath));
    }

    private static void Quietly(Action step)
    {
        try
        {
            step();
        }
        catch (Exception cause) when (WriteFaults.Covers(cause))
        {
            return;
        }
    }

    private FileStream OpenStream => stream ?? throw new InvalidOperationException("The file is already published.");

    // Trying first and making the folder on refusal saves a look at the folder for every file but the first.
    private static FileStream Open(string part)
    {
        FileStreamOptions options = new()
        {
            Mode = FileMode.Create,
            Access = FileAccess.ReadWrite,
            Share = FileShare.None,
            BufferSize = NoBuffer,
        };
        try
        {
            return new(part, options);
        }
        catch (Exception missing) when (missing is DirectoryNotFoundException or FileNotFoundException)
        {
            // The second kind comes when another thread has made the folder between the refusal and this line.
            Directory.CreateDirectory(Path.GetDirectoryName(part)!);
            return new(part, options);
        }
    }

    private void Close()
    {
        stream?.Dispose();
        stream = null;
    }
}
