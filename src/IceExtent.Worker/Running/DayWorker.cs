using IceExtent.Retrieval;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>Carries days from their files to totals and grid files, where days need nothing of each other.</summary>
/// <remarks>A day stays with one worker from reading to writing, so its planes stay in one core's cache.</remarks>
internal sealed class DayWorker(DayPreparation preparation, SampleSeries? samples, GridArchive? grids, MeltSignalArchive? signals) : IDayWorker
{
    private readonly DayReader reader = new(preparation);
    private readonly DayFinishing finishing = new(preparation, grids);
    private readonly MeltSignalPlanes? melt = signals is null ? null : new(signals);
    private readonly ConcentrationPlanes concentration = new(preparation.Settings.Grid.CellCount);

    /// <inheritdoc/>
    public IEnumerable<DayResult> Handle(PlannedDay day)
    {
        ObservedDay observed;
        try
        {
            observed = reader.Read(day);
        }
        catch (FaultException unreadable)
        {
            return [new(day.Order, day.Date, day.Input.Files, Observed: false, unreadable.Fault, 0, [])];
        }

        TunedDay? tuned = samples?.Tune(day);
        DayLabel label = DayLabel.Of(day, tuned);
        IReadOnlyList<DayRetrieval> retrievals = preparation.Of(day.Source).RetrievalsWith(tuned);
        (MonthMask? month, CoastBrightness? coast) = (preparation.Settings.Weather.MaskOf(day.Date), preparation.Of(day.Source).Coast);
        MethodResult[] results = new MethodResult[retrievals.Count];
        for (int method = 0; method < results.Length; method++)
        {
            RetrievalCounts counts = observed.RetrieveWith(retrievals[method], month, coast, concentration);
            if (method == 0)
            {
                melt?.Write(label, observed, concentration, retrievals[method].Method.Name);
            }

            FilledCells filled = finishing.Fill(day.Date, day.Source.Index, concentration, []);
            results[method] = finishing.Publish(label, retrievals[method], counts, filled, concentration);
        }

        return [new(day.Order, day.Date, day.Input.Files, Observed: true, null, observed.OutOfRange, results) { Sensor = label.Sensor, Tuned = tuned }];
    }
}
