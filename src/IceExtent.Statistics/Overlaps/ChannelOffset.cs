namespace IceExtent.Statistics.Overlaps;

/// <summary>By how much a later sensor's channel reads above an earlier one's, over one surface or both. Unit: K.</summary>
/// <remarks>Columns of the <c>offsets</c> table, documented in docs/DATA.md.</remarks>
public sealed record ChannelOffset
{
    /// <summary>The surface name of <see cref="Pooled"/>.</summary>
    public const string BothSurfaces = "both";

    /// <summary>The sensors.</summary>
    public required SensorPair Pair { get; init; }

    /// <summary>The channel's name.</summary>
    public required string Channel { get; init; }

    /// <summary><c>open-water</c>, <c>closed-ice</c> or <c>both</c>.</summary>
    public required string Surface { get; init; }

    /// <summary>Later less earlier. Unit: K.</summary>
    public required double OffsetKelvins { get; init; }

    /// <summary>Its standard error; null where it cannot be told. Unit: K.</summary>
    public required double? StandardErrorKelvins { get; init; }

    /// <summary>The number of days; of two surfaces the smaller.</summary>
    public required int Days { get; init; }

    /// <summary>How many independent days they are worth; of two surfaces the smaller; null where it cannot be told.</summary>
    public required double? EffectiveDays { get; init; }

    /// <summary>The mean number of cells a day; of two surfaces the sum.</summary>
    public required double CellsPerDay { get; init; }

    /// <summary>Why there is no standard error.</summary>
    public required MeanLimits Limits { get; init; }

    /// <summary>One number for both surfaces: the plain mean of the two offsets.</summary>
    /// <remarks>
    /// Its standard error is at least half of what the two differ by: one offset for a channel whose slope differs too is off by
    /// that much over either surface. Own choice. Where one surface alone is known, its offset stands for both.
    /// </remarks>
    /// <param name="first">The offset over one surface.</param>
    /// <param name="second">The offset over the other, or null.</param>
    public static ChannelOffset Pooled(ChannelOffset first, ChannelOffset? second)
    {
        ArgumentNullException.ThrowIfNull(first);
        if (second is null)
        {
            return first with { Surface = BothSurfaces };
        }

        double? sampling = first.StandardErrorKelvins is { } one && second.StandardErrorKelvins is { } other
            ? 0.5 * Math.Sqrt((one * one) + (other * other))
            : null;
        double apart = 0.5 * Math.Abs(first.OffsetKelvins - second.OffsetKelvins);
        return first with
        {
            Surface = BothSurfaces,
            OffsetKelvins = 0.5 * (first.OffsetKelvins + second.OffsetKelvins),
            StandardErrorKelvins = sampling is { } error ? Math.Max(error, apart) : null,
            Days = Math.Min(first.Days, second.Days),
            EffectiveDays = first.EffectiveDays is { } days && second.EffectiveDays is { } others ? Math.Min(days, others) : null,
            CellsPerDay = first.CellsPerDay + second.CellsPerDay,
            Limits = first.Limits == MeanLimits.Given ? second.Limits : first.Limits,
        };
    }
}
