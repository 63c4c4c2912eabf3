namespace IceExtent.Retrieval;

/// <summary>The channels a method needs, over a run of cells.</summary>
/// <param name="observed">The planes.</param>
/// <param name="channels">The channels.</param>
/// <param name="cells">The run.</param>
public readonly ref struct ChannelSet(BrightnessPlanes observed, ReadOnlySpan<Channel> channels, CellRange cells)
{
    private readonly ReadOnlySpan<Channel> channels = channels;

    /// <summary>Whether every channel has a value at a cell, counted from the start of the run.</summary>
    public bool AllPresentAt(int cell)
    {
        foreach (Channel channel in channels)
        {
            if (float.IsNaN(observed.Kelvins(channel)[cells.Start + cell]))
            {
                return false;
            }
        }

        return true;
    }
}
