namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Deflated data as a stream that notices whether more was asked for than there is.</summary>
/// <remarks>
/// The inflating stream of the framework takes an early end of its input for the end of the data, and then never
/// comes to the checksum. It stops asking once it has verified that.
/// </remarks>
internal sealed class DeflatedBytes(ReadOnlyMemory<byte> bytes) : Stream
{
    private int position;

    /// <summary>Whether the reader asked for bytes beyond the last one.</summary>
    public bool RanDry { get; private set; }

    /// <inheritdoc/>
    public override bool CanRead => true;

    /// <inheritdoc/>
    public override bool CanSeek => false;

    /// <inheritdoc/>
    public override bool CanWrite => false;

    /// <inheritdoc/>
    public override long Length => bytes.Length;

    /// <inheritdoc/>
    public override long Position
    {
        get => position;
        set => throw new NotSupportedException();
    }

    /// <inheritdoc/>
    public override int Read(byte[] buffer, int offset, int count) => Read(buffer.AsSpan(offset, count));

    /// <inheritdoc/>
    public override int Read(Span<byte> buffer)
    {
        int count = Math.Min(buffer.Length, bytes.Length - position);
        RanDry |= count == 0 && !buffer.IsEmpty;
        bytes.Span.Slice(position, count).CopyTo(buffer);
        position += count;
        return count;
    }

    /// <inheritdoc/>
    public override void Flush()
    {
        // Nothing is ever written.
    }

    /// <inheritdoc/>
    public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

    /// <inheritdoc/>
    public override void SetLength(long value) => throw new NotSupportedException();

    /// <inheritdoc/>
    public override void Write(byte[] buffer, int offset, int count) => throw new NotSupportedException();
}
