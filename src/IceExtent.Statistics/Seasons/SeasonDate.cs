namespace IceExtent.Statistics.Seasons;

/// <summary>One date of one ice year, or why there is none.</summary>
/// <remarks>
/// Unit: days from the first day of the ice year, which is day 0. A found date carries the first and the last day on which
/// it may have been in truth (95 % limits); a hidden one the first and the last day that its gap leaves open. Both ends
/// count. The default value is a date found on day 0 without doubt.
/// </remarks>
public readonly record struct SeasonDate
{
    private readonly short day; // Narrow: millions of these are held at a time.
    private readonly short earliest;
    private readonly short latest;
    private readonly byte stored;

    private SeasonDate(SeasonDateState state, int day, int earliest, int latest) =>
        (stored, this.day, this.earliest, this.latest) = ((byte)state, checked((short)day), checked((short)earliest), checked((short)latest));

    /// <summary>Whether there is a date.</summary>
    public SeasonDateState State => (SeasonDateState)stored;

    /// <summary>The day, or null where it is not <see cref="SeasonDateState.Found"/>.</summary>
    public int? Day => State == SeasonDateState.Found ? day : null;

    /// <summary>The first day it may have been, or null where it is neither found nor hidden.</summary>
    public int? Earliest => HasLimits ? earliest : null;

    /// <summary>The last day it may have been, or null where it is neither found nor hidden.</summary>
    public int? Latest => HasLimits ? latest : null;

    /// <summary>Half the days from the first to the last day it may have been, or null where it is neither found nor hidden.</summary>
    public double? SpreadDays => HasLimits ? 0.5 * (latest - earliest) : null;

    private bool HasLimits => State is SeasonDateState.Found or SeasonDateState.HiddenByGap;

    /// <summary>A known date.</summary>
    /// <param name="day">The day.</param>
    /// <param name="earliest">The first day it may have been, not after <paramref name="day"/>.</param>
    /// <param name="latest">The last day it may have been, not before <paramref name="day"/>.</param>
    /// <exception cref="ArgumentOutOfRangeException">The limits do not hold the day.</exception>
    public static SeasonDate Found(int day, int earliest, int latest)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(earliest, day);
        ArgumentOutOfRangeException.ThrowIfLessThan(latest, day);
        return new(SeasonDateState.Found, day, earliest, latest);
    }

    /// <summary>A known date without doubt.</summary>
    public static SeasonDate Found(int day) => Found(day, day, day);

    /// <summary>A date that a gap hides.</summary>
    /// <param name="earliest">The first day it may have been.</param>
    /// <param name="latest">The last day it may have been, not before the first.</param>
    /// <exception cref="ArgumentOutOfRangeException">The limits hold no day.</exception>
    public static SeasonDate Hidden(int earliest, int latest)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(latest, earliest);
        return new(SeasonDateState.HiddenByGap, 0, earliest, latest);
    }

    /// <summary>No date.</summary>
    /// <param name="state">Why not.</param>
    /// <exception cref="ArgumentOutOfRangeException">The state is one that has days.</exception>
    public static SeasonDate Without(SeasonDateState state) => state is SeasonDateState.Found or SeasonDateState.HiddenByGap
        ? throw new ArgumentOutOfRangeException(nameof(state), state, "A date that is found or hidden has days.")
        : new(state, 0, 0, 0);
}
