namespace IceExtent.Statistics.Seasons;

/// <summary>Whether a date of a season is known, and why not where it is not.</summary>
public enum SeasonDateState
{
    /// <summary>The day is known.</summary>
    Found,

    /// <summary>It lies in a gap: the days on either side of the gap tell that it came between them.</summary>
    HiddenByGap,

    /// <summary>It did not come in this ice year.</summary>
    NeverReached,

    /// <summary>It had come before the record's first day.</summary>
    BeforeRecord,

    /// <summary>It had not come by the record's last day, and may still come in this ice year.</summary>
    NotYetReached,
}

/// <summary>The names of the states in tables and grids.</summary>
public static class SeasonDateStates
{
    /// <summary>The name of a state.</summary>
    public static string NameOf(SeasonDateState state) => state switch
    {
        SeasonDateState.Found => "found",
        SeasonDateState.HiddenByGap => "hidden_by_gap",
        SeasonDateState.NeverReached => "never_reached",
        SeasonDateState.BeforeRecord => "before_record",
        SeasonDateState.NotYetReached => "not_yet_reached",
        _ => throw new ArgumentOutOfRangeException(nameof(state), state, "There is no such state."),
    };

    /// <summary>The state of a name, or null where there is none.</summary>
    public static SeasonDateState? Parse(string name)
    {
        foreach (SeasonDateState state in Enum.GetValues<SeasonDateState>())
        {
            if (string.Equals(NameOf(state), name, StringComparison.Ordinal))
            {
                return state;
            }
        }

        return null;
    }
}
