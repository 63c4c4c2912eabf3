using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>Carries days from their files to totals and grid files, one at a time, in memory of its own.</summary>
/// <remarks>A day stays with one worker from reading to writing, so its planes stay in one core's cache. Not shared between threads.</remarks>
internal sealed class DayWorker(DayPreparation preparation, GridArchive? grids)
{
    private readonly Dictionary<string, BrightnessPlanes> planesByChannels = new(StringComparer.Ordinal);
    private readonly ConcentrationPlanes concentration = new(preparation.Settings.Grid.CellCount);
    private readonly CellConditions[] rangeConditions = new CellConditions[preparation.Settings.Grid.CellCount];
    private readonly Dictionary<PolarGapSystem, PolarGapFilling> gapFillings = [];
    private readonly TotalsUncertainty uncertainty = new(preparation.Correlation);

    /// <summary>Handles one day. A bad file costs the day, not the run.</summary>
    /// <exception cref="FaultException">A grid file cannot be written: that stops the run.</exception>
    public DayResult Handle(PlannedDay day)
    {
        BrightnessPlanes observed = PlanesFor(day.Source);
        try
        {
            day.Source.Reader.Read(day.Input, observed);
        }
        catch (FaultException unreadable)
        {
            return new(day, unreadable.Fault, 0, []);
        }

        int outOfRange = DayRetrieval.CheckRange(observed, day.Source.Settings.Sensor.Range, rangeConditions);
        CoastBrightness? coast = preparation.CoastOf(day.Source.Index);
        int coastCorrected = coast?.Correct(observed, rangeConditions) ?? 0;
        IReadOnlyList<DayRetrieval> retrievals = preparation.RetrievalsOf(day.Source.Index);
        MethodResult[] results = new MethodResult[retrievals.Count];
        for (int index = 0; index < results.Length; index++)
        {
            RetrievalCounts counts = retrievals[index].Retrieve(observed, rangeConditions, concentration);
            counts = coast is null ? counts : counts with { CoastCorrected = coastCorrected };
            (int filled, int? gapFilled) = Fill(day.Source.Index);
            grids?.Write(day, retrievals[index].Method, concentration);
            results[index] = new(retrievals[index].Method.Name, counts, filled, gapFilled, [.. preparation.Regions.Select(region => Row(day, region))]);
        }

        return new(day, null, outOfRange, results);
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

    private BrightnessPlanes PlanesFor(OpenedSource source)
    {
        IReadOnlyList<Channel> channels = preparation.ChannelsOf(source.Index);
        string key = string.Join(' ', channels);
        if (!planesByChannels.TryGetValue(key, out BrightnessPlanes? planes))
        {
            planes = new(preparation.Settings.Grid.CellCount, channels);
            planesByChannels.Add(key, planes);
        }

        return planes;
    }

    private DailyRow Row(PlannedDay day, TotalsRegion region)
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
        };

        double? Known(double squareMeters) => observed ? squareMeters / SquareMetersPerSquareKilometer : null;
    }
}
