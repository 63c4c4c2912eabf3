using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>Carries days from their files to totals and grid files, one at a time, in memory of its own.</summary>
/// <remarks>A day stays with one worker from reading to writing, so its planes stay in one core's cache. Not shared between threads.</remarks>
internal sealed class DayWorker(DayPreparation preparation, SampleSeries? samples, GridArchive? grids)
{
    private readonly DayReader reader = new(preparation);
    private readonly ConcentrationPlanes concentration = new(preparation.Settings.Grid.CellCount);
    private readonly Dictionary<PolarGapSystem, PolarGapFilling> gapFillings = [];
    private readonly TotalsUncertainty uncertainty = new(preparation.Correlation);

    /// <summary>Handles one day. A bad file costs the day, not the run.</summary>
    /// <exception cref="FaultException">A grid file cannot be written: that stops the run.</exception>
    public DayResult Handle(PlannedDay day)
    {
        ObservedDay observed;
        try
        {
            observed = reader.Read(day);
        }
        catch (FaultException unreadable)
        {
            return new(day, unreadable.Fault, 0, []);
        }

        TunedDay? tuned = samples?.Tune(day);
        IReadOnlyList<DayRetrieval> retrievals = preparation.Of(day.Source).RetrievalsWith(tuned);
        MethodResult[] results = new MethodResult[retrievals.Count];
        for (int index = 0; index < results.Length; index++)
        {
            results[index] = Retrieve(day, observed, retrievals[index], tuned);
        }

        return new(day, null, observed.OutOfRange, results) { Tuned = tuned };
    }

    private MethodResult Retrieve(PlannedDay day, ObservedDay observed, DayRetrieval retrieval, TunedDay? tuned)
    {
        MonthMask? month = preparation.Settings.Weather.MaskOf(day.Date);
        RetrievalCounts counts = retrieval.Retrieve(observed.Planes, observed.Conditions, concentration, month);
        if (preparation.Of(day.Source).Coast is { } coast)
        {
            coast.WidenErrors(concentration);
            counts = counts with { CoastCorrected = CoastCorrected() };
        }

        (int filled, int? gapFilled) = Fill(day.Source.Index);
        month?.ClearFilled(concentration);
        string method = retrieval.Method.Name;
        TiePointState state = tuned is not null && preparation.Settings.TiePoints.Moves(method) ? tuned.State : TiePointState.Fixed;
        grids?.Write(day, retrieval.Method, state, concentration);
        DailyRow[] rows = [.. preparation.Regions.Select(region => Row(day, region, state))];
        return new(method, counts, filled, gapFilled, rows, IsEmptied(rows));
    }

    // Whether what follows the retrieval took every cell that would count as ice: the totals are 0 km², and not missing.
    private bool IsEmptied(DailyRow[] rows)
    {
        float ice = (float)preparation.Settings.Rules.IceFraction;
        return rows[0].AreaSquareKilometers == 0.0 && concentration.Unscreened.ContainsAnyInRange(ice, 1f);
    }

    // A cell that was corrected both in its temperatures and in its concentration counts once.
    private int CoastCorrected()
    {
        int count = 0;
        foreach (CellConditions condition in concentration.Conditions)
        {
            count += (condition & CellConditions.CoastCorrected) != 0 ? 1 : 0;
        }

        return count;
    }

    // Each from observed cells alone, so their order does not matter.
    private (int Cells, int? PolarGap) Fill(int source)
    {
        int cells = preparation.Neighbours?.Fill(concentration) ?? 0;
        if (preparation.PolarGapOf(source) is not { } gap)
        {
            return (cells, null);
        }

        if (!gapFillings.TryGetValue(gap, out PolarGapFilling? filling))
        {
            filling = new(gap, preparation.Settings.LeastRimShare);
            gapFillings.Add(gap, filling);
        }

        return (cells, filling.Fill(concentration));
    }

    private DailyRow Row(PlannedDay day, TotalsRegion region, TiePointState tiePoints)
    {
        const double SquareMetersPerSquareKilometer = 1e6;
        TotalsRules rules = preparation.Settings.Rules;
        DailyTotals totals = DailyTotals.Sum(region, concentration.Total, concentration.Conditions, rules);
        bool observed = totals.Observed > 0.0;
        (double extentError, double areaError) = observed
            ? uncertainty.StandardErrorsSquareMeters(region, concentration.Total, concentration.StandardError, rules.IceFraction)
            : default;
        return new()
        {
            Date = day.Date,
            Region = region.Name,
            ExtentSquareKilometers = Known(totals.Extent),
            ExtentStandardErrorSquareKilometers = Known(extentError),
            AreaSquareKilometers = Known(totals.IceArea),
            AreaStandardErrorSquareKilometers = Known(areaError),
            MarginalZoneSquareKilometers = Known(totals.MarginalZone),
            PackSquareKilometers = Known(totals.Pack),
            OceanSquareKilometers = totals.Ocean / SquareMetersPerSquareKilometer,
            ObservedShare = totals.ObservedShare,
            FilledShare = totals.FilledShare,
            PolarGapSquareKilometers = totals.PolarGap / SquareMetersPerSquareKilometer,
            Sensor = day.Source.Settings.Sensor.Name,
            Status = day.Source.Settings.Status,
            TiePoints = tiePoints,
        };

        double? Known(double squareMeters) => observed ? squareMeters / SquareMetersPerSquareKilometer : null;
    }
}
