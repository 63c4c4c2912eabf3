namespace IceExtent.Retrieval;

/// <summary>The brightness temperatures of one day on one grid. Reused from day to day.</summary>
/// <remarks>Unit: K. Shape: one plane a channel, row-major, row 0 at the top. Missing: NaN.</remarks>
public sealed class BrightnessPlanes
{
    private readonly float[]?[] planes = new float[]?[ChannelNames.All.Count];

    /// <summary>Makes room for some channels; every cell starts as missing.</summary>
    /// <param name="cellCount">The number of cells of the grid, 1 or more.</param>
    /// <param name="channels">The channels that will be held.</param>
    public BrightnessPlanes(int cellCount, IEnumerable<Channel> channels)
    {
        ArgumentNullException.ThrowIfNull(channels);
        ArgumentOutOfRangeException.ThrowIfLessThan(cellCount, 1);
        CellCount = cellCount;
        foreach (Channel channel in channels)
        {
            planes[(int)channel] = new float[cellCount];
        }

        Clear();
    }

    /// <summary>The number of cells of every plane.</summary>
    public int CellCount { get; }

    /// <summary>The channels held, in the order of the enumeration.</summary>
    public IEnumerable<Channel> Channels => ChannelNames.All.Where(Has);

    /// <summary>Whether a channel is held.</summary>
    public bool Has(Channel channel) => planes[(int)channel] is not null;

    /// <summary>One channel's plane, in K; NaN is missing.</summary>
    /// <exception cref="ArgumentException">The channel is not held.</exception>
    public Span<float> Kelvins(Channel channel) =>
        planes[(int)channel] ?? throw new ArgumentException($"The channel {ChannelNames.NameOf(channel)} is not held.", nameof(channel));

    /// <summary>One channel's plane as memory, in K, for readers that fill memory.</summary>
    /// <exception cref="ArgumentException">The channel is not held.</exception>
    public Memory<float> KelvinMemory(Channel channel) =>
        planes[(int)channel] ?? throw new ArgumentException($"The channel {ChannelNames.NameOf(channel)} is not held.", nameof(channel));

    /// <summary>Makes every cell missing.</summary>
    public void Clear()
    {
        foreach (float[]? plane in planes)
        {
            plane.AsSpan().Fill(float.NaN);
        }
    }
}
