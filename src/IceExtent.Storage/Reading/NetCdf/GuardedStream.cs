using System.Buffers;
using System.Runtime.CompilerServices;
using Microsoft.Win32.SafeHandles;
using PureHDF;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>A file as a stream that a damaged structure cannot turn into an endless walk.</summary>
/// <remarks>
/// Every read past the end ends in <see cref="EndOfStreamException"/>; the number of reads is bounded by the
/// file's length, so pointers that lead in circles come to an end; deep nesting ends before the stack does.
/// Small reads go through a few pages, because a file's structure is read in pieces of a few bytes.
/// </remarks>
internal sealed class GuardedStream : Stream, IDatasetStream
{
    private const int PageBytes = 16 * 1024;
    private const int PageCount = 16;
    private const long ReadsOfAnyFile = 100_000;
    private const long BytesPerFurtherRead = 4;

    private readonly SafeFileHandle handle;
    private readonly byte[] pages;
    private readonly long[] pageNumbers = new long[PageCount];
    private readonly long length;
    private long position;
    private long readsLeft;
    private bool closed;

    /// <summary>Opens a file.</summary>
    public GuardedStream(string path)
    {
        handle = File.OpenHandle(path);
        length = RandomAccess.GetLength(handle);
        readsLeft = ReadsOfAnyFile + (length / BytesPerFurtherRead);
        pages = ArrayPool<byte>.Shared.Rent(PageBytes * PageCount);
        Array.Fill(pageNumbers, -1);
    }

    /// <inheritdoc/>
    public override bool CanRead => true;

    /// <inheritdoc/>
    public override bool CanSeek => true;

    /// <inheritdoc/>
    public override bool CanWrite => false;

    /// <inheritdoc/>
    public override long Length => length;

    /// <inheritdoc/>
    public override long Position
    {
        get => position;
        set => Seek(value, SeekOrigin.Begin);
    }

    /// <inheritdoc/>
    public override long Seek(long offset, SeekOrigin origin)
    {
        long target = origin switch
        {
            SeekOrigin.Begin => offset,
            SeekOrigin.Current => position + offset,
            _ => length + offset,
        };
        position = target >= 0 ? target : throw new EndOfStreamException("A position lies before the start of the file.");
        return position;
    }

    /// <inheritdoc/>
    public override int Read(byte[] buffer, int offset, int count) => Read(buffer.AsSpan(offset, count));

    /// <inheritdoc/>
    public override int Read(Span<byte> buffer)
    {
        Watch();
        if (buffer.Length >= PageBytes)
        {
            int direct = RandomAccess.Read(handle, buffer, position);
            position += direct;
            return direct;
        }

        int done = 0;
        while (done < buffer.Length && position < length)
        {
            ReadOnlySpan<byte> rest = RestOfPage();
            int count = Math.Min(rest.Length, buffer.Length - done);
            rest[..count].CopyTo(buffer[done..]);
            done += count;
            position += count;
        }

        return done;
    }

    /// <summary>Reads cells; they stand outside the pages, as nothing reads them twice.</summary>
    public void ReadDataset(Span<byte> buffer)
    {
        if (buffer.Length > length - position)
        {
            throw new EndOfStreamException("Cells lie past the end of the file.");
        }

        ReadExactly(buffer);
    }

    /// <inheritdoc/>
    public override void Flush()
    {
        // Nothing is ever written.
    }

    /// <inheritdoc/>
    public override void SetLength(long value) => throw new NotSupportedException();

    /// <inheritdoc/>
    public override void Write(byte[] buffer, int offset, int count) => throw new NotSupportedException();

    /// <inheritdoc/>
    protected override void Dispose(bool disposing)
    {
        if (disposing && !closed)
        {
            closed = true;
            handle.Dispose();
            ArrayPool<byte>.Shared.Return(pages);
        }

        base.Dispose(disposing);
    }

    private void Watch()
    {
        RuntimeHelpers.EnsureSufficientExecutionStack();
        if (--readsLeft < 0)
        {
            throw new InvalidDataException("The structure of the file leads in circles.");
        }
    }

    private Span<byte> RestOfPage()
    {
        (long number, long within) = Math.DivRem(position, PageBytes);
        int slot = (int)(number % PageCount);
        Span<byte> page = pages.AsSpan(slot * PageBytes, (int)Math.Min(PageBytes, length - (number * PageBytes)));
        if (pageNumbers[slot] != number)
        {
            pageNumbers[slot] = -1;
            Fill(page, number * PageBytes);
            pageNumbers[slot] = number;
        }

        return page[(int)within..];
    }

    private void Fill(Span<byte> page, long start)
    {
        int done = 0;
        while (done < page.Length)
        {
            int count = RandomAccess.Read(handle, page[done..], start + done);
            done += count > 0 ? count : throw new EndOfStreamException("The file grew shorter while it was read.");
        }
    }
}
