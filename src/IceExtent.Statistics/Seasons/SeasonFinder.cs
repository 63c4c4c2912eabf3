using System.Runtime.CompilerServices;

namespace IceExtent.Statistics.Seasons;

/// <summary>Finds the dates of one ice year in series of daily concentration. Not shared between threads: it keeps room for one series.</summary>
/// <remarks>
/// Sources: those of the scheme. The limits of a date are where the same rules find it in the series some standard errors lower and
/// higher, and never narrower than a gap, bridged or not, that the date lies in: own choice, scored in docs/METHODS.md.
/// </remarks>
public sealed class SeasonFinder
{
    private readonly SeasonScheme scheme;
    private readonly IceYearSpan span;
    private readonly SeasonWindow melting;
    private readonly SeasonWindow freezing;
    private readonly SeasonWindow? lowest;
    private readonly OwnLevels? own;
    private readonly float[] bridged;
    private readonly float[] smooth;
    private readonly float[] error;
    private readonly float[] lower;
    private readonly float[] upper;
    private readonly float[] pondless;

    /// <summary>Sets a finder up for one ice year.</summary>
    /// <param name="scheme">The rules.</param>
    /// <param name="span">The days that every series holds.</param>
    public SeasonFinder(SeasonScheme scheme, IceYearSpan span)
    {
        ArgumentNullException.ThrowIfNull(scheme);
        (this.scheme, this.span) = (scheme, span);
        melting = SeasonWindow.Of(scheme.MeltingHalf, span.Year);
        freezing = SeasonWindow.Of(scheme.FreezingHalf, span.Year);
        lowest = scheme.LowestIn is { } window ? SeasonWindow.Of(window, span.Year) : null;
        own = scheme.OwnLevels is { } rules ? new(rules, scheme, span) : null;
        (bridged, smooth, error) = (new float[span.Days], new float[span.Days], new float[span.Days]);
        (lower, upper, pondless) = (new float[span.Days], new float[span.Days], new float[span.Days]);
    }

    /// <summary>Finds the dates of one series.</summary>
    /// <param name="fraction">Concentration. Unit: 1. Missing: NaN. Shape: one value a day of the span.</param>
    /// <param name="standardError">Its standard error; NaN counts as none. Unit and shape as above.</param>
    /// <exception cref="ArgumentException">A series has another length.</exception>
    public IceDates Find(ReadOnlySpan<float> fraction, ReadOnlySpan<float> standardError)
    {
        if (fraction.Length != span.Days || standardError.Length != span.Days)
        {
            throw new ArgumentException($"The series have {fraction.Length} and {standardError.Length} days; the span has {span.Days}.", nameof(fraction));
        }

        Prepare(fraction, standardError);
        SeasonLevels levels = own?.Of(bridged)
            ?? new((float)scheme.Opening.Level, (float)scheme.Retreat.Level, (float)scheme.Advance.Level, (float)scheme.Closing.Level);
        (SearchedHalf melt, SearchedHalf freeze) = HalvesOf();
        DateSearch search = new(span, fraction, smooth, lower, upper, pondless);
        SeasonDateState? winterLacks = own?.WinterLacks, summerLacks = own?.SummerLacks;
        (int known, int open) = Count(levels.Retreat);
        return new(
            Lacking(winterLacks, melt) ?? search.Fall(scheme.Opening, levels.Opening, melt),
            Lacking(summerLacks, melt) ?? search.Fall(scheme.Retreat, levels.Retreat, melt),
            Lacking(summerLacks, freeze) ?? search.Rise(scheme.Advance.Persistence, levels.Advance, freeze),
            Lacking(winterLacks ?? summerLacks, freeze) ?? search.Rise(scheme.Closing.Persistence, levels.Closing, freeze),
            known,
            open);
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private void Prepare(ReadOnlySpan<float> fraction, ReadOnlySpan<float> standardError)
    {
        fraction.CopyTo(bridged);
        SeriesSmoothing.Bridge(bridged, scheme.BridgedDays);
        if (IsOpenThroughout())
        {
            bridged.CopyTo(smooth, 0); // Smoothing takes no series over a level that it never reaches, and limits belong to dates.
            bridged.CopyTo(lower, 0);
            bridged.CopyTo(upper, 0);
            bridged.CopyTo(pondless, 0);
            return;
        }

        Smooth(bridged, scheme.Smoothing, smooth);
        standardError.CopyTo(lower); // For the moment.
        SeriesSmoothing.Bridge(lower, scheme.BridgedDays);
        Smooth(lower, scheme.Smoothing == SeasonSmoothing.None ? SeasonSmoothing.None : SeasonSmoothing.Mean, error);
        float deviations = (float)scheme.LimitDeviations, seen = 1f - (float)scheme.HiddenByMelt;
        for (int day = 0; day < smooth.Length; day++)
        {
            float width = float.IsNaN(error[day]) ? 0f : deviations * error[day];
            (lower[day], upper[day]) = (smooth[day] - width, smooth[day] + width);
            pondless[day] = upper[day] / seen;
        }
    }

    // Half of the ocean of a hemisphere has no ice in a year.
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private bool IsOpenThroughout()
    {
        float least = (float)Math.Min(scheme.Retreat.Level, scheme.Advance.Level); // Own levels are never below.
        bool open = true;
        foreach (float value in bridged)
        {
            open &= !(value >= least);
        }

        return open;
    }

    private void Smooth(ReadOnlySpan<float> series, SeasonSmoothing how, Span<float> into)
    {
        int half = scheme.SmoothingDays / 2;
        switch (how)
        {
            case SeasonSmoothing.Mean:
                SeriesSmoothing.Mean(series, half, into);
                break;
            case SeasonSmoothing.Median:
                SeriesSmoothing.Median(series, half, into);
                break;
            default:
                series.CopyTo(into);
                break;
        }
    }

    // Where the lowest day parts the year, the melting half ends on it and the freezing half begins after it; where no day
    // is known in its window, the window's last day stands for it.
    private (SearchedHalf Melt, SearchedHalf Freeze) HalvesOf()
    {
        if (lowest is not { } window)
        {
            return (new(melting, melting.First, melting.Last), new(freezing, freezing.First, freezing.Last));
        }

        int at = Crossings.Lowest(smooth, span.Lead + window.First, span.Lead + window.Last);
        int turn = at == Crossings.None ? window.Last : at - span.Lead;
        return (new(new(melting.First, turn), melting.First, window.Last), new(new(turn + 1, freezing.Last), window.Last, freezing.Last));
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private (int Known, int Open) Count(float level)
    {
        int known = 0, open = 0;
        foreach (float value in smooth.AsSpan(span.Lead, span.Year.Length))
        {
            known += float.IsNaN(value) ? 0 : 1;
            open += value < level ? 1 : 0;
        }

        return (known, open);
    }

    private static SeasonDate? Lacking(SeasonDateState? why, SearchedHalf half) => why switch
    {
        null => null,
        SeasonDateState.HiddenByGap => SeasonDate.Hidden(half.Window.First, half.Window.Last),
        { } state => SeasonDate.Without(state),
    };
}
