using System.Buffers;
using Microsoft.Win32.SafeHandles;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>A file read through a few pages in memory, because its structure is read in pieces of a few bytes.</summary>
internal sealed class FilePages : IDisposable
{
    private const int PageBytes = 16 * 1024;
    private const int PageCount = 16;

    private readonly SafeFileHandle handle;
    private readonly byte[] pages;
    private readonly long[] pageNumbers = new long[PageCount];
    private bool closed;

    /// <summary>Opens a file.</summary>
    public FilePages(string path)
    {
        handle = File.OpenHandle(path);
        Length = RandomAccess.GetLength(handle);
        pages = ArrayPool<byte>.Shared.Rent(PageBytes * PageCount);
        Array.Fill(pageNumbers, -1);
    }

    /// <summary>The file's length in bytes.</summary>
    public long Length { get; }

    /// <summary>Reads from a place as many bytes as are asked for, fewer only at the end of the file.</summary>
    public int Read(long start, Span<byte> into)
    {
        if (into.Length >= PageBytes)
        {
            return ReadStraight(start, into);
        }

        int done = 0;
        while (done < into.Length && start + done < Length)
        {
            ReadOnlySpan<byte> rest = RestOfPage(start + done);
            int count = Math.Min(rest.Length, into.Length - done);
            rest[..count].CopyTo(into[done..]);
            done += count;
        }

        return done;
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        if (!closed)
        {
            closed = true;
            handle.Dispose();
            ArrayPool<byte>.Shared.Return(pages);
        }
    }

    // Large pieces are cells: nothing reads them twice.
    private int ReadStraight(long start, Span<byte> into)
    {
        int done = 0;
        while (done < into.Length && RandomAccess.Read(handle, into[done..], start + done) is > 0 and var count)
        {
            done += count;
        }

        return done;
    }

    private ReadOnlySpan<byte> RestOfPage(long start)
    {
        (long number, long within) = Math.DivRem(start, PageBytes);
        int slot = (int)(number % PageCount);
        Span<byte> page = pages.AsSpan(slot * PageBytes, (int)Math.Min(PageBytes, Length - (number * PageBytes)));
        if (pageNumbers[slot] != number)
        {
            pageNumbers[slot] = -1;
            if (ReadStraight(number * PageBytes, page) != page.Length)
            {
                throw new EndOfStreamException("The file grew shorter while it was read.");
            }

            pageNumbers[slot] = number;
        }

        return page[(int)within..];
    }
}
