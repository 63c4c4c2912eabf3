namespace IceExtent.Statistics.Seasons;

/// <summary>Limits of the horizontal-range method, <see cref="HorizontalRangeMelt"/>.</summary>
public sealed record HorizontalRangeRules
{
    /// <summary>Sets the limits.</summary>
    /// <param name="dryAboveKelvins">Above this range the snow is dry.</param>
    /// <param name="wetBelowKelvins">Below this range it is wet; below the first.</param>
    /// <param name="testDays">Between the two: the days before and the days from the day on whose spreads are compared, 2 to 32 each.</param>
    /// <param name="leastTestDays">How many of each must be usable, 2 or more.</param>
    /// <param name="leastChangeKelvins">How much the spread must grow.</param>
    /// <param name="leadDays">How many days before the day the later ones begin, 0 to 8; from 1 on a step is seen, and the date is put where the range drops and stays.</param>
    /// <param name="errorKelvins">The standard error of the range on one day, 0 or more.</param>
    /// <param name="spreadDays">What the limits of a date are widened by on either side, 0 or more days.</param>
    /// <exception cref="ArgumentOutOfRangeException">A number is out of its range.</exception>
    public HorizontalRangeRules(
        double dryAboveKelvins, double wetBelowKelvins, int testDays, int leastTestDays, double leastChangeKelvins, int leadDays, double errorKelvins, int spreadDays)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(wetBelowKelvins, dryAboveKelvins);
        ArgumentOutOfRangeException.ThrowIfLessThan(testDays, 2);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(testDays, MostTestDays);
        ArgumentOutOfRangeException.ThrowIfLessThan(leastTestDays, 2);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(leastTestDays, testDays);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(leastChangeKelvins);
        ArgumentOutOfRangeException.ThrowIfNegative(leadDays);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(leadDays, Math.Min(MostLeadDays, testDays - 1));
        ArgumentOutOfRangeException.ThrowIfNegative(errorKelvins);
        ArgumentOutOfRangeException.ThrowIfNegative(spreadDays);
        (DryAboveKelvins, WetBelowKelvins, TestDays, LeastTestDays) = (dryAboveKelvins, wetBelowKelvins, testDays, leastTestDays);
        (LeastChangeKelvins, LeadDays, ErrorKelvins, SpreadDays) = (leastChangeKelvins, leadDays, errorKelvins, spreadDays);
    }

    /// <summary>The longest test, in days on either side.</summary>
    public const int MostTestDays = 32;

    /// <summary>The earliest start of the later days, in days before the day.</summary>
    public const int MostLeadDays = 8;

    /// <summary>Above this range the snow is dry. Unit: K.</summary>
    public double DryAboveKelvins { get; }

    /// <summary>Below this range the snow is wet. Unit: K.</summary>
    public double WetBelowKelvins { get; }

    /// <summary>The days on either side whose spreads are compared.</summary>
    public int TestDays { get; }

    /// <summary>How many of each must be usable.</summary>
    public int LeastTestDays { get; }

    /// <summary>How much the spread must grow. Unit: K.</summary>
    public double LeastChangeKelvins { get; }

    /// <summary>How many days before the day the later ones begin, 0 to 8; from 1 on a step is seen, and the date is put where the range drops and stays.</summary>
    public int LeadDays { get; }

    /// <summary>The standard error of the range on one day. Unit: K.</summary>
    public double ErrorKelvins { get; }

    /// <summary>What the limits of a date are widened by on either side. Unit: days.</summary>
    public int SpreadDays { get; }
}
