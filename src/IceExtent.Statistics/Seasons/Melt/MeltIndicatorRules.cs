namespace IceExtent.Statistics.Seasons;

/// <summary>One indicator of melt in the sum of <see cref="IndicatorMelt"/>.</summary>
public readonly record struct MeltIndicator
{
    /// <summary>Sets the indicator.</summary>
    /// <param name="weight">What its z-score is multiplied by in the sum; 0 leaves it out.</param>
    /// <param name="leastScatter">Its scatter over a winter is never taken to be less, above 0; in the indicator's unit.</param>
    /// <exception cref="ArgumentOutOfRangeException">A number is out of its range.</exception>
    public MeltIndicator(double weight, double leastScatter)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(weight);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(leastScatter);
        (Weight, LeastScatter) = (weight, leastScatter);
    }

    /// <summary>What its z-score is multiplied by. Unit: 1.</summary>
    public double Weight { get; }

    /// <summary>Its scatter over a winter is never taken to be less. In the indicator's unit.</summary>
    public double LeastScatter { get; }
}

/// <summary>Rules of the indicator method, <see cref="IndicatorMelt"/>.</summary>
public sealed record MeltIndicatorRules
{
    /// <summary>The longest stretch that a jump is measured against, in days.</summary>
    public const int MostJumpDays = 16;

    /// <summary>Sets the rules.</summary>
    /// <param name="jump">37 GHz vertical above its mean over the days before; scatter in K.</param>
    /// <param name="gradient">Gradient ratio of 37 and 19 GHz vertical; scatter without unit.</param>
    /// <param name="level">19 GHz vertical and 0.8 times 37 GHz vertical; scatter in K.</param>
    /// <param name="horizontalRange">Horizontal range, counted downward; scatter in K.</param>
    /// <param name="jumpDays">The days before that a jump is measured against, 1 to 16.</param>
    /// <param name="meltScore">From this sum on a day looks like melt, above 0.</param>
    /// <param name="scoreError">The standard error of the sum on one day, 0 or more.</param>
    /// <param name="persistDays">A run of so many days is lasting, 1 or more.</param>
    /// <param name="interruptDays">A run of so many days ends a freeze-up that had come, 1 or more and no more than the last.</param>
    /// <param name="summerDays">The first days of the freeze window, which tell how the melting cell looks; 0 or more.</param>
    /// <param name="leastWinterDays">A winter tells how a cell looks with so many usable days, 3 or more.</param>
    /// <param name="spreadDays">What the limits of a date of melt are widened by on either side, 0 or more days.</param>
    /// <param name="freezeSpreadDays">The same of a date of freeze-up.</param>
    /// <exception cref="ArgumentOutOfRangeException">A number is out of its range.</exception>
    public MeltIndicatorRules(
        MeltIndicator jump, MeltIndicator gradient, MeltIndicator level, MeltIndicator horizontalRange,
        int jumpDays, double meltScore, double scoreError, int persistDays, int interruptDays, int summerDays, int leastWinterDays, int spreadDays, int freezeSpreadDays)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(jump.Weight + gradient.Weight + level.Weight + horizontalRange.Weight);
        ArgumentOutOfRangeException.ThrowIfLessThan(jumpDays, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(jumpDays, MostJumpDays);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(meltScore);
        ArgumentOutOfRangeException.ThrowIfNegative(scoreError);
        ArgumentOutOfRangeException.ThrowIfLessThan(persistDays, 1);
        ArgumentOutOfRangeException.ThrowIfLessThan(interruptDays, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(interruptDays, persistDays);
        ArgumentOutOfRangeException.ThrowIfNegative(summerDays);
        ArgumentOutOfRangeException.ThrowIfLessThan(leastWinterDays, 3);
        ArgumentOutOfRangeException.ThrowIfNegative(spreadDays);
        ArgumentOutOfRangeException.ThrowIfNegative(freezeSpreadDays);
        (Jump, Gradient, Level, HorizontalRange, JumpDays) = (jump, gradient, level, horizontalRange, jumpDays);
        (MeltScore, ScoreError, PersistDays, InterruptDays) = (meltScore, scoreError, persistDays, interruptDays);
        (SummerDays, LeastWinterDays, SpreadDays, FreezeSpreadDays) = (summerDays, leastWinterDays, spreadDays, freezeSpreadDays);
    }

    /// <summary>37 GHz vertical above its mean over the days before; scatter in K.</summary>
    public MeltIndicator Jump { get; }

    /// <summary>Gradient ratio of 37 and 19 GHz vertical; scatter without unit.</summary>
    public MeltIndicator Gradient { get; }

    /// <summary>19 GHz vertical and 0.8 times 37 GHz vertical; scatter in K.</summary>
    public MeltIndicator Level { get; }

    /// <summary>Horizontal range, counted downward; scatter in K.</summary>
    public MeltIndicator HorizontalRange { get; }

    /// <summary>The days before that a jump is measured against.</summary>
    public int JumpDays { get; }

    /// <summary>From this sum on a day looks like melt. Unit: 1.</summary>
    public double MeltScore { get; }

    /// <summary>The standard error of the sum on one day. Unit: 1.</summary>
    public double ScoreError { get; }

    /// <summary>A run of so many days is lasting.</summary>
    public int PersistDays { get; }

    /// <summary>A run of so many days ends a freeze-up that had come.</summary>
    public int InterruptDays { get; }

    /// <summary>The first days of the freeze window, which tell how the melting cell looks.</summary>
    public int SummerDays { get; }

    /// <summary>A winter tells how a cell looks with so many usable days.</summary>
    public int LeastWinterDays { get; }

    /// <summary>What the limits of a date of melt are widened by on either side. Unit: days.</summary>
    public int SpreadDays { get; }

    /// <summary>The same of a date of freeze-up. Unit: days.</summary>
    public int FreezeSpreadDays { get; }
}
