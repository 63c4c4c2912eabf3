using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Runs every method of a run file on the same days and holds them against the first. Fills nothing: what is compared was observed.</summary>
internal sealed class MethodComparison(RunSettings settings, DayPreparation preparation, SampleSeries? samples, string folder)
{
    private static readonly KeyValuePair<string, string>[] Nothing = [];

    private readonly DayReader reader = new(preparation);
    private readonly ConcentrationPlanes[] planes = [.. settings.Methods.Select(_ => new ConcentrationPlanes(settings.Grid.CellCount))];
    private readonly float[] spread = new float[settings.Grid.CellCount];

    /// <summary>Compares one day and writes its map: each method's concentration, and the spread between the highest and the lowest.</summary>
    /// <exception cref="FaultException">The day cannot be read, or the map cannot be written.</exception>
    public IReadOnlyList<MethodComparisonRow> Compare(PlannedDay day)
    {
        ObservedDay observed = reader.Read(day);
        IReadOnlyList<DayRetrieval> retrievals = preparation.Of(day.Source).RetrievalsWith(samples?.Tune(day));
        for (int method = 0; method < planes.Length; method++)
        {
            retrievals[method].Retrieve(observed.Planes, observed.Conditions, planes[method], settings.Weather.MaskOf(day.Date));
        }

        WriteMap(day);
        return [.. preparation.Regions.SelectMany(region => Rows(day.Date, region))];
    }

    private IEnumerable<MethodComparisonRow> Rows(DateOnly date, TotalsRegion region)
    {
        const double SquareMetersPerSquareKilometer = 1e6;
        DailyTotals first = Totals(0);
        for (int method = 0; method < planes.Length; method++)
        {
            DailyTotals totals = Totals(method);
            bool observed = totals.Observed > 0.0 && first.Observed > 0.0;
            PlaneDifference difference = PlaneDifference.Of(planes[method].Total, planes[0].Total, settings.Rules.IceFraction, region.Cells);
            yield return new()
            {
                Date = date,
                Region = region.Name,
                Method = settings.Methods[method],
                ExtentSquareKilometers = Known(totals.Extent, observed),
                AreaSquareKilometers = Known(totals.IceArea, observed),
                ExtentDifferenceSquareKilometers = Known(totals.Extent - first.Extent, observed),
                AreaDifferenceSquareKilometers = Known(totals.IceArea - first.IceArea, observed),
                MeanDifferenceFraction = difference.Cells > 0 ? difference.MeanFraction : null,
                RootMeanSquareDifferenceFraction = difference.Cells > 0 ? difference.RootMeanSquareFraction : null,
            };
        }

        DailyTotals Totals(int method) => DailyTotals.Sum(region, planes[method].Total, planes[method].Conditions, settings.Rules);

        static double? Known(double squareMeters, bool observed) => observed ? squareMeters / SquareMetersPerSquareKilometer : null;
    }

    private void WriteMap(PlannedDay day)
    {
        for (int cell = 0; cell < spread.Length; cell++)
        {
            (float lowest, float highest) = (float.PositiveInfinity, float.NegativeInfinity);
            foreach (ConcentrationPlanes method in planes)
            {
                lowest = Math.Min(lowest, method.Total[cell]); // NaN stays: a spread needs every method.
                highest = Math.Max(highest, method.Total[cell]);
            }

            spread[cell] = highest - lowest;
        }

        List<GridVariable> variables =
        [
            new PackedVariable("spread", "highest less lowest concentration of all methods", null, Nothing, "1", spread, Packing.Fraction),
        ];
        variables.AddRange(settings.Methods.Select((method, index) => new PackedVariable(
            "concentration_" + method.Replace('-', '_'), $"sea-ice concentration by {method}", "sea_ice_area_fraction", Nothing, "1", planes[index].TotalMemory, Packing.Fraction)));
        GridFile.Write(
            Path.Combine(folder, FormattableString.Invariant($"{day.Date:yyyy-MM-dd}.nc")),
            settings.Grid,
            day.Date,
            variables,
            [
                new("title", $"Methods side by side on the grid {settings.Grid.Name}"),
                new("program", $"IceExtent {ProgramVersion.Text}"),
                new("sensor", day.Source.Settings.Sensor.Name),
                new("notice", settings.Notice ?? "none"),
                new("caution", Cautions.Text),
            ]);
    }
}
