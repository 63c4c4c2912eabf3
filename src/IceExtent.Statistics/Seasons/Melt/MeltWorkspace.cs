namespace IceExtent.Statistics.Seasons;

/// <summary>Room for finding melt dates. One for each thread.</summary>
public sealed class MeltWorkspace
{
    private const int Margin = 192; // Windows reach before the first day and beyond the last, and whole vectors beyond them.

    /// <summary>Makes room.</summary>
    /// <param name="mostDays">The longest series, 1 day or more.</param>
    public MeltWorkspace(int mostDays)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(mostDays, 1);
        MostDays = mostDays;
        int length = mostDays + Margin;
        (Usable, Score, Range, Count) = (new float[length], new float[length], new float[length], new float[length]);
        (Low, High, Lagged, Present) = (new float[length], new float[length], new float[length], new float[length]);
    }

    /// <summary>The longest series.</summary>
    public int MostDays { get; }

    internal float[] Usable { get; }

    internal float[] Score { get; }

    internal float[] Range { get; }

    internal float[] Count { get; }

    internal float[] Low { get; }

    internal float[] High { get; }

    internal float[] Lagged { get; }

    internal float[] Present { get; }

    internal void Check(int days)
    {
        if (days > MostDays)
        {
            throw new ArgumentException($"The series has {days} days; there is room for {MostDays}.", nameof(days));
        }
    }
}
