using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>Brings retrieved concentrations to rows and grid files: fills what may be filled, sums, writes. Not shared between threads.</summary>
internal sealed class DayFinishing(DayPreparation preparation, GridArchive? grids)
{
    private readonly Dictionary<PolarGapSystem, PolarGapFilling> gapFillings = [];
    private readonly TotalsUncertainty uncertainty = new(preparation.Correlation);
    private readonly EdgeShift edge = new(preparation.Settings.Grid, preparation.Settings.ErrorLengths.FootprintMeters);
    private readonly SourceDays? sourceDays = preparation.Days is null ? null : new(preparation.Settings.Grid.CellCount);

    /// <summary>Fills one day of one method, and takes away what was filled where the month has no ice.</summary>
    /// <param name="day">The day.</param>
    /// <param name="source">The source whose mask the planes have.</param>
    /// <param name="planes">As retrieved; filled in place.</param>
    /// <param name="near">The same method on days near it, in date order; empty where the run fills nothing over days.</param>
    public FilledCells Fill(DateOnly day, int source, ConcentrationPlanes planes, ReadOnlySpan<NearDay> near)
    {
        int fromNeighbours = preparation.Neighbours?.Fill(planes) ?? 0;
        int fromDays = preparation.Days?.Fill(planes, near, sourceDays!) ?? 0;
        int? polarGap = FillPolarGap(source, planes);
        preparation.Settings.Weather.MaskOf(day)?.ClearFilled(planes);
        return new(fromNeighbours, fromDays, polarGap);
    }

    /// <summary>Writes the grid file of a day and sums it.</summary>
    /// <param name="day">What the outputs say of the day.</param>
    /// <param name="retrieval">What retrieved it; of a day made from others, what retrieved the nearest.</param>
    /// <param name="counts">What happened to the cells.</param>
    /// <param name="filled">How many were filled.</param>
    /// <param name="planes">The day.</param>
    /// <exception cref="FaultException">The grid file cannot be written: that stops the run.</exception>
    public MethodResult Publish(
        DayLabel day, DayRetrieval retrieval, RetrievalCounts counts, FilledCells filled, ConcentrationPlanes planes)
    {
        TiePointState tiePoints = preparation.Settings.TiePoints.Moves(retrieval.Method.Name) ? day.TiePoints : TiePointState.Fixed;
        grids?.Write(day, retrieval, tiePoints, planes, sourceDays);
        edge.Smear(planes.Total, planes.Unscreened, preparation.Settings.Rules.IceFraction);
        DailyRow[] rows = [.. preparation.Regions.Select(region => Row(day, tiePoints, region, retrieval.SurfaceScatter, planes))];
        return new(retrieval.Method.Name, counts, filled, rows, IsEmptied(rows, planes))
        {
            PlaceRows = [.. preparation.Places.Select(place => Row(day, place.Place, place.Cells, retrieval.SurfaceScatter, planes))],
        };
    }

    private int? FillPolarGap(int source, ConcentrationPlanes planes)
    {
        if (preparation.PolarGapOf(source) is not { } gap)
        {
            return null;
        }

        if (!gapFillings.TryGetValue(gap, out PolarGapFilling? filling))
        {
            filling = new(gap, preparation.Settings.LeastRimShare);
            gapFillings.Add(gap, filling);
        }

        return filling.Fill(planes);
    }

    // Whether what follows the retrieval took every cell that would count as ice: the totals are 0 km², and not missing.
    private bool IsEmptied(DailyRow[] rows, ConcentrationPlanes planes)
    {
        float ice = (float)preparation.Settings.Rules.IceFraction;
        return rows[0].AreaSquareKilometers == 0.0 && planes.Unscreened.ContainsAnyInRange(ice, 1f);
    }

    private DailyRow Row(DayLabel day, TiePointState tiePoints, TotalsRegion region, RetrievalScatter scatter, ConcentrationPlanes planes)
    {
        const double SquareMetersPerSquareKilometer = 1e6;
        TotalsRules rules = preparation.Settings.Rules;
        DailyTotals totals = DailyTotals.Sum(region, planes.Total, planes.Conditions, rules);
        bool known = totals.Observed > 0.0 || totals.Filled > 0.0;
        double shift = preparation.Settings.ErrorLengths.EdgeFactor * edge.ExtentSquareMeters(region);
        (double extentError, double areaError) = known
            ? uncertainty.StandardErrorsSquareMeters(region, planes.Total, planes.StandardError, rules.IceFraction, scatter, shift)
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
            Sensor = day.Sensor,
            Status = day.Status,
            TiePoints = tiePoints,
        };

        double? Known(double squareMeters) => known ? squareMeters / SquareMetersPerSquareKilometer : null;
    }

    private DailyPlaceRow Row(DayLabel day, GridPlace place, TotalsRegion cells, RetrievalScatter scatter, ConcentrationPlanes planes)
    {
        PlaceTotals totals = PlaceTotals.Sum(cells, planes.Total, planes.Conditions);
        double? error = totals.Known > 0.0
            ? uncertainty.AreaStandardErrorSquareMeters(cells, planes.Total, planes.StandardError, scatter) / totals.Known
            : null;
        return new()
        {
            Date = day.Date,
            Place = place.Name,
            ConcentrationFraction = totals.MeanFraction,
            ConcentrationStandardErrorFraction = error,
            ObservedShare = totals.Observed / totals.Whole,
            FilledShare = totals.Filled / totals.Whole,
            Cells = place.Cells.Count,
            NearestKilometers = place.NearestKilometers,
            FarthestKilometers = place.FarthestKilometers,
            Sensor = day.Sensor,
            Status = day.Status,
        };
    }
}
