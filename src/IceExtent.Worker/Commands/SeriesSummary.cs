using System.Globalization;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary>The last numbers of a run and how well its days were observed, in a few lines.</summary>
internal sealed class SeriesSummary
{
    private const double WellObservedShare = 0.98;

    private readonly Dictionary<string, DailyRow> lastByMethod = new(StringComparer.Ordinal);
    private readonly Dictionary<string, (long OutsideIceMask, long WarmWater)> masked = new(StringComparer.Ordinal);
    private int days;
    private int emptiedDays;
    private int poorDays;
    private int fixedDays;
    private double lowestShare = 1.0;

    /// <summary>Takes one day. Days come in date order.</summary>
    public void Add(DayResult result)
    {
        foreach (MethodResult method in result.Methods)
        {
            lastByMethod[method.Method] = method.Rows[0];
            (long outside, long warm) = masked.GetValueOrDefault(method.Method);
            masked[method.Method] = (outside + method.Counts.OutsideIceMask, warm + method.Counts.WarmWater);
        }

        if (result.Methods is [{ Rows: [var first, ..] }, ..])
        {
            days++;
            fixedDays += result is { Observed: true, Tuned: { } tuned } && tuned.State != TiePointState.Moving ? 1 : 0;
            emptiedDays += result.Methods.Any(method => method.Emptied) ? 1 : 0;
            double share = result.Observed ? first.ObservedShare : first.FilledShare; // A day made from others has nothing of its own.
            poorDays += share < WellObservedShare ? 1 : 0;
            lowestShare = Math.Min(lowestShare, share);
        }
    }

    /// <summary>Prints it; nothing where no day was done.</summary>
    public void Print(CommandConsole console)
    {
        foreach ((string method, DailyRow row) in lastByMethod)
        {
            console.Print(row.ExtentSquareKilometers is null
                ? string.Create(CultureInfo.InvariantCulture, $"{row.Date:yyyy-MM-dd} {method}: nothing observed")
                : string.Create(
                    CultureInfo.InvariantCulture,
                    $"{row.Date:yyyy-MM-dd} {method}: extent {row.ExtentSquareKilometers / 1e6:F3} ± {row.ExtentStandardErrorSquareKilometers / 1e6:F3}, area {row.AreaSquareKilometers / 1e6:F3} ± {row.AreaStandardErrorSquareKilometers / 1e6:F3} million km², {row.ObservedShare:P0} observed"));
        }

        foreach ((string method, (long outside, long warm)) in masked.Where(method => method.Value.OutsideIceMask + method.Value.WarmWater > 0))
        {
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{method}: ice taken away from {(double)outside / days:F0} cells a day outside the ice mask, from {(double)warm / days:F0} in warm water."));
        }

        if (fixedDays > 0)
        {
            console.Print($"{Counted.Days(fixedDays)} with the sensor's own tie points for a surface or both, though tie points move: too few samples in the window; the column tie_points says which.");
        }

        if (emptiedDays > 0)
        {
            console.Print($"{Counted.Days(emptiedDays)} with ice before screens, masks and coast correction and none after them: their area is 0.");
        }

        if (poorDays > 0)
        {
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{Counted.Days(poorDays)} observed to less than {WellObservedShare:P0} (lowest {lowestShare:P0}): sums hold only what was observed; read observed_share first."));
        }
    }
}
