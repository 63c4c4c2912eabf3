using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>One day that will be read.</summary>
/// <param name="Order">Its place among the days that are read, from 0.</param>
/// <param name="Source">The source that rules it.</param>
/// <param name="Input">The day in that source.</param>
internal sealed record PlannedDay(int Order, OpenedSource Source, SourceDay Input)
{
    public DateOnly Date => Input.Date;
}

/// <summary>A source of the run with its reader.</summary>
internal sealed record OpenedSource(int Index, RunSource Settings, IBrightnessSource Reader);

/// <summary>The days that a source could give, whether or not its own period holds them.</summary>
/// <param name="Source">The source.</param>
/// <param name="Days">Days in its sensor's service with one input each, rising.</param>
internal sealed record SourceOffer(OpenedSource Source, IReadOnlyList<SourceDay> Days);

/// <summary>A day that has input which cannot be used, or a file that belongs to no day of the run.</summary>
/// <param name="Date">The day, or null where it cannot be told or lies outside the period that was asked for.</param>
/// <param name="Fault">Why.</param>
internal sealed record Gap(DateOnly? Date, Fault Fault);

/// <summary>What a run will do.</summary>
/// <param name="Days">Days with input, in date order; each date once.</param>
/// <param name="Gaps">What cannot be used, as far as it shows before a plane is read; in date order.</param>
/// <param name="Superseded">The number of days left to a source that stands earlier in the run file.</param>
internal sealed record RunPlan(IReadOnlyList<PlannedDay> Days, IReadOnlyList<Gap> Gaps, int Superseded)
{
    /// <summary>What every source could give, in the order of the run file.</summary>
    public IReadOnlyList<SourceOffer> Offers { get; init; } = [];

    /// <summary>Days outside the period that was asked for, read because days inside may be filled from them, and not written; in date order.</summary>
    public IReadOnlyList<PlannedDay> Margin { get; init; } = [];

    /// <summary>Every day that is read: those with input and the margin, in date order, numbered from 0.</summary>
    public IReadOnlyList<PlannedDay> Reads =>
        Margin.Count == 0 ? Days : [.. Margin.Concat(Days).OrderBy(day => day.Date).Select((day, order) => day with { Order = order })];

    /// <summary>Days without usable input that will be made from the days near them, where those hold anything; in date order.</summary>
    public IReadOnlyList<DateOnly> DaysToFill { get; init; } = [];

    /// <summary>The number of days that the run may write.</summary>
    public int OutputCount => Days.Count + DaysToFill.Count;

    /// <summary>The number of <see cref="DatesWithoutInput"/>.</summary>
    public int DaysWithoutInput => DatesWithoutInput.Count;

    /// <summary>Calendar days between the first and the last planned day without an input that a source may use.</summary>
    public IReadOnlyList<DateOnly> DatesWithoutInput
    {
        get
        {
            if (Days.Count == 0)
            {
                return [];
            }

            HashSet<DateOnly> known = [.. Days.Select(day => day.Date), .. Gaps.Select(gap => gap.Date).OfType<DateOnly>()];
            return [.. Enumerable.Range(Days[0].Date.DayNumber, Days[^1].Date.DayNumber - Days[0].Date.DayNumber + 1)
                .Select(DateOnly.FromDayNumber)
                .Where(day => !known.Contains(day))];
        }
    }
}
