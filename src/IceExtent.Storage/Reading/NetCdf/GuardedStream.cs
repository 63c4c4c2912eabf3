using System.Runtime.CompilerServices;
using PureHDF;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>A file as a stream that a damaged structure cannot turn into an endless walk.</summary>
/// <remarks>
/// Every read past the end ends in <see cref="EndOfStreamException"/>; the number of reads is bounded by the
/// file's length, so pointers that lead in circles come to an end; deep nesting ends before the stack does; and
/// every block of the structure is checked by <see cref="StructureGuard"/> when its signature is read.
/// </remarks>
internal sealed class GuardedStream : Stream, IDatasetStream
{
    private const long ReadsOfAnyFile = 100_000;
    private const long BytesPerFurtherRead = 4;

    private readonly FilePages pages;
    private long position;
    private long readsLeft;

    /// <summary>Opens a file.</summary>
    public GuardedStream(string path)
    {
        pages = new(path);
        Guard = new(pages);
        readsLeft = ReadsOfAnyFile + (pages.Length / BytesPerFurtherRead);
    }

    /// <summary>Checks blocks of the structure.</summary>
    public StructureGuard Guard { get; }

    /// <inheritdoc/>
    public override bool CanRead => true;

    /// <inheritdoc/>
    public override bool CanSeek => true;

    /// <inheritdoc/>
    public override bool CanWrite => false;

    /// <inheritdoc/>
    public override long Length => pages.Length;

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
            _ => Length + offset,
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
        int count = position < Length ? pages.Read(position, buffer) : 0;
        Guard.Seen(position, buffer[..count]);
        position += count;
        return count;
    }

    /// <summary>Reads cells.</summary>
    public void ReadDataset(Span<byte> buffer)
    {
        Watch();
        if (buffer.Length > Length - position || pages.Read(position, buffer) != buffer.Length)
        {
            throw new EndOfStreamException("Cells lie past the end of the file.");
        }

        position += buffer.Length;
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
        if (disposing)
        {
            pages.Dispose();
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
}
