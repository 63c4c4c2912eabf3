namespace IceExtent.Retrieval;

/// <summary>Fills empty ocean cells of a day from the nearest days on which they were observed. Immutable and safe to share.</summary>
/// <remarks>
/// The value is linear in time between the last day before and the first day after, each within its limit; where one limit
/// is 0, the other side's value is carried. Only what was observed gives. Common practice, no one source. Land and the polar
/// gap of the day itself are left alone.
/// </remarks>
public sealed class DayFilling
{
    private const CellConditions Empty = CellConditions.NoObservation | CellConditions.NoSolution;

    private readonly DayFillingRules rules;

    /// <summary>Prepares the rules.</summary>
    public DayFilling(DayFillingRules rules)
    {
        ArgumentNullException.ThrowIfNull(rules);
        this.rules = rules;
    }

    /// <summary>Fills one day.</summary>
    /// <param name="planes">
    /// Screened and clipped, perhaps filled from neighbours. A filled cell gets total, ice types, a standard error
    /// (<see cref="StandardErrorFraction"/>) and <see cref="CellConditions.FilledFromDays"/>. Nothing else changes.
    /// </param>
    /// <param name="near">Days near it in the order of their dates; those beyond a limit give nothing. None of them is <paramref name="planes"/>.</param>
    /// <param name="sources">Cleared, then receives which days gave.</param>
    /// <returns>The number of cells filled.</returns>
    /// <exception cref="ArgumentException">A plane is of another grid, or the days are out of order.</exception>
    public int Fill(ConcentrationPlanes planes, ReadOnlySpan<NearDay> near, SourceDays sources)
    {
        ArgumentNullException.ThrowIfNull(planes);
        ArgumentNullException.ThrowIfNull(sources);
        ThrowIfUnfit(planes.CellCount, near, sources);
        sources.Clear();
        int later = 0;
        while (later < near.Length && near[later].OffsetDays < 0)
        {
            later++;
        }

        ReadOnlySpan<NearDay> before = near[..later], after = near[later..];
        Span<CellConditions> conditions = planes.Conditions;
        int filled = 0;
        for (int cell = 0; cell < conditions.Length; cell++)
        {
            if ((conditions[cell] & Empty) != CellConditions.None && float.IsNaN(planes.Total[cell]) && TryFill(planes, cell, before, after, sources))
            {
                conditions[cell] |= CellConditions.FilledFromDays;
                filled++;
            }
        }

        return filled;
    }

    /// <summary>The standard error of a value between two days. Unit: 1.</summary>
    /// <remarks>
    /// The root of the sum of (a) the squared mean of both standard errors with the weights of the values: errors of days near
    /// each other are alike, so they do not average out; (b) (difference)²·w·(1 − w), what a change that came at one moment
    /// between the two days rather than evenly would make; (c) ChangePerDay²·4C(1 − C)·m·n/(m + n), a random walk held at both
    /// ends, whose steps end where there is no ice or nothing but ice. Own choice; held against invented scenes in docs/METHODS.md.
    /// </remarks>
    /// <param name="earlier">The concentration of the earlier day. Unit: 1.</param>
    /// <param name="earlierError">Its standard error. Unit: 1.</param>
    /// <param name="daysBefore">Days back to it, 1 or more.</param>
    /// <param name="later">The concentration of the later day. Unit: 1.</param>
    /// <param name="laterError">Its standard error. Unit: 1.</param>
    /// <param name="daysAfter">Days ahead to it, 1 or more.</param>
    public double StandardErrorFraction(double earlier, double earlierError, int daysBefore, double later, double laterError, int daysAfter)
    {
        double span = daysBefore + daysAfter;
        (double weightEarlier, double weightLater) = (daysAfter / span, daysBefore / span);
        double error = (weightEarlier * earlierError) + (weightLater * laterError);
        double difference = later - earlier;
        double walk = VariancePerDay((weightEarlier * earlier) + (weightLater * later)) * daysBefore * daysAfter / span;
        return Math.Sqrt((error * error) + (difference * difference * weightEarlier * weightLater) + walk);
    }

    /// <summary>The standard error of a value that is carried from one day: its own, and a random walk from there. Unit: 1.</summary>
    /// <param name="fraction">That day's concentration. Unit: 1.</param>
    /// <param name="error">Its standard error. Unit: 1.</param>
    /// <param name="days">How many days away it lies, 1 or more.</param>
    public double CarriedErrorFraction(double fraction, double error, int days) => Math.Sqrt((error * error) + (VariancePerDay(fraction) * days));

    private double VariancePerDay(double fraction) => rules.ChangePerDay * rules.ChangePerDay * 4.0 * fraction * (1.0 - fraction);

    private bool TryFill(ConcentrationPlanes planes, int cell, ReadOnlySpan<NearDay> before, ReadOnlySpan<NearDay> after, SourceDays sources)
    {
        (NearDay? earlier, NearDay? later) = (null, null);
        for (int index = before.Length - 1; index >= 0 && -before[index].OffsetDays <= rules.DaysBefore && earlier is null; index--)
        {
            earlier = before[index].Planes.IsObserved(cell) ? before[index] : null;
        }

        for (int index = 0; index < after.Length && after[index].OffsetDays <= rules.DaysAfter && later is null; index++)
        {
            later = after[index].Planes.IsObserved(cell) ? after[index] : null;
        }

        switch (earlier, later)
        {
            case ({ } from, { } to):
                Interpolate(planes, cell, from, to);
                break;
            case ({ } from, null) when rules.DaysAfter == 0:
                Carry(planes, cell, from);
                break;
            case (null, { } to) when rules.DaysBefore == 0:
                Carry(planes, cell, to);
                break;
            default:
                return false;
        }

        sources.Put(cell, -earlier?.OffsetDays ?? 0, later?.OffsetDays ?? 0);
        return true;
    }

    private void Interpolate(ConcentrationPlanes planes, int cell, NearDay from, NearDay to)
    {
        (int daysBefore, int daysAfter) = (-from.OffsetDays, to.OffsetDays);
        double share = (double)daysBefore / (daysBefore + daysAfter);
        double earlier = from.Planes.Total[cell], later = to.Planes.Total[cell];
        double earlierMultiyear = from.Planes.Multiyear[cell], laterMultiyear = to.Planes.Multiyear[cell];
        planes.Put(
            cell,
            ((1.0 - share) * earlier) + (share * later),
            ((1.0 - share) * earlierMultiyear) + (share * laterMultiyear),
            StandardErrorFraction(earlier, from.Planes.StandardError[cell], daysBefore, later, to.Planes.StandardError[cell], daysAfter));
    }

    private void Carry(ConcentrationPlanes planes, int cell, NearDay day) =>
        planes.Put(cell, day.Planes.Total[cell], day.Planes.Multiyear[cell], CarriedErrorFraction(day.Planes.Total[cell], day.Planes.StandardError[cell], Math.Abs(day.OffsetDays)));

    private static void ThrowIfUnfit(int cellCount, ReadOnlySpan<NearDay> near, SourceDays sources)
    {
        if (sources.CellCount != cellCount)
        {
            throw new ArgumentException($"The source days have {sources.CellCount} cells; the day has {cellCount}.", nameof(sources));
        }

        int last = int.MinValue;
        foreach (NearDay day in near)
        {
            if (day.OffsetDays <= last || day.OffsetDays == 0 || day.Planes.CellCount != cellCount)
            {
                throw new ArgumentException(
                    $"The day at {day.OffsetDays} days has {day.Planes.CellCount} cells and follows {last}; wanted are rising days other than 0 with {cellCount} cells.", nameof(near));
            }

            last = day.OffsetDays;
        }
    }
}
