namespace IceExtent.Statistics.Seasons;

/// <summary>Which method gives melt onset.</summary>
public enum MeltOnsetMethod
{
    /// <summary>The horizontal range: [Drobot2001].</summary>
    HorizontalRange,

    /// <summary>The indicators, continuous melt: own form of [Markus2009].</summary>
    Indicators,
}

/// <summary>What both methods of melt found in one cell and ice year.</summary>
/// <param name="HorizontalRange">Melt onset by the horizontal range.</param>
/// <param name="Indicators">The four dates of the indicators.</param>
public readonly record struct CellMelt(SeasonDate HorizontalRange, MeltDates Indicators)
{
    /// <summary>A cell without ice.</summary>
    public static CellMelt None
    {
        get
        {
            SeasonDate never = SeasonDate.Without(SeasonDateState.NeverReached);
            return new(never, new(never, never, never, never));
        }
    }

    /// <summary>Melt onset by one of the methods.</summary>
    public SeasonDate Onset(MeltOnsetMethod method) => method == MeltOnsetMethod.HorizontalRange ? HorizontalRange : Indicators.ContinuousMelt;
}
