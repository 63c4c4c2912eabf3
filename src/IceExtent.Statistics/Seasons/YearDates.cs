namespace IceExtent.Statistics.Seasons;

/// <summary>The six dates of an ice year.</summary>
public enum SeasonEvent
{
    /// <summary>The snow on the ice becomes wet.</summary>
    MeltOnset,

    /// <summary>The end of closed ice.</summary>
    Opening,

    /// <summary>The end of ice.</summary>
    Retreat,

    /// <summary>The beginning of ice.</summary>
    Advance,

    /// <summary>The beginning of closed ice.</summary>
    Closing,

    /// <summary>The surface is frozen for good.</summary>
    FreezeUp,
}

/// <summary>Names of the six dates.</summary>
public static class SeasonEvents
{
    /// <summary>Every date, in the order of the tables.</summary>
    public static IReadOnlyList<SeasonEvent> All { get; } =
        [SeasonEvent.MeltOnset, SeasonEvent.Opening, SeasonEvent.Retreat, SeasonEvent.Advance, SeasonEvent.Closing, SeasonEvent.FreezeUp];

    /// <summary>The name in tables and grids.</summary>
    public static string NameOf(SeasonEvent which) => which switch
    {
        SeasonEvent.MeltOnset => "melt_onset",
        SeasonEvent.Opening => "opening",
        SeasonEvent.Retreat => "retreat",
        SeasonEvent.Advance => "advance",
        SeasonEvent.Closing => "closing",
        SeasonEvent.FreezeUp => "freeze_up",
        _ => throw new ArgumentOutOfRangeException(nameof(which), which, "There is no such date."),
    };
}

/// <summary>The six dates of one series, or null where a run does not look for one.</summary>
/// <param name="Ice">The four from concentration.</param>
/// <param name="MeltOnset">From brightness temperatures.</param>
/// <param name="FreezeUp">From brightness temperatures.</param>
public readonly record struct YearDates(IceDates Ice, SeasonDate? MeltOnset, SeasonDate? FreezeUp)
{
    /// <summary>What both methods of melt found in a cell; null for regions and places, and where melt is not sought.</summary>
    public CellMelt? Melt { get; init; }

    /// <summary>One of the six.</summary>
    public SeasonDate? Of(SeasonEvent which) => which switch
    {
        SeasonEvent.MeltOnset => MeltOnset,
        SeasonEvent.Opening => Ice.Opening,
        SeasonEvent.Retreat => Ice.Retreat,
        SeasonEvent.Advance => Ice.Advance,
        SeasonEvent.Closing => Ice.Closing,
        _ => FreezeUp,
    };
}
