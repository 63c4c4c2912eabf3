using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>Reads days into a window and finishes those whose neighbours in time are all there.</summary>
internal sealed class WindowWorker(DayPreparation preparation, SampleSeries? samples, DayWindow window, GridArchive? grids, MeltSignalArchive? signals) : IDayWorker
{
    private readonly DayReader reader = new(preparation);
    private readonly DayFinishing finishing = new(preparation, grids);
    private readonly MeltSignalPlanes? melt = signals is null ? null : new(signals);
    private readonly HashSet<int> written = [.. window.Outputs.Select(day => day.Step).OfType<int>()]; // Days round the period are only read.
    private readonly ConcentrationPlanes own = new(preparation.Settings.Grid.CellCount); // Others still read what was retrieved.

    /// <inheritdoc/>
    public IEnumerable<DayResult> Handle(PlannedDay day)
    {
        Read(day);
        while (window.TryTakeReady(out int output))
        {
            DayResult result = Finish(window.Outputs[output]);
            window.Release(output);
            yield return result;
        }
    }

    private void Read(PlannedDay day)
    {
        ObservedDay observed;
        try
        {
            observed = reader.Read(day);
        }
        catch (FaultException unreadable)
        {
            window.Complete(day.Order, null, unreadable.Fault);
            return;
        }

        TunedDay? tuned = samples?.Tune(day);
        IReadOnlyList<DayRetrieval> retrievals = preparation.Of(day.Source).RetrievalsWith(tuned);
        (MonthMask? month, CoastBrightness? coast) = (preparation.Settings.Weather.MaskOf(day.Date), preparation.Of(day.Source).Coast);
        RetrievedDay room = window.Rent();
        for (int method = 0; method < retrievals.Count; method++)
        {
            room.Counts[method] = observed.RetrieveWith(retrievals[method], month, coast, room.Planes[method]);
        }

        if (written.Contains(day.Order))
        {
            melt?.Write(DayLabel.Of(day, tuned), observed, room.Planes[0], retrievals[0].Method.Name);
        }

        (room.Retrievals, room.Tuned, room.OutOfRange) = (retrievals, tuned, observed.OutOfRange);
        window.Complete(day.Order, room, null);
    }

    private DayResult Finish(OutputDay day)
    {
        RetrievedDay? retrieved = day.Step is { } step ? window.At(step) : null;
        Fault? fault = day.Step is { } read ? window.FaultAt(read) : null;
        IReadOnlyList<string> files = day.Step is { } with ? window.Steps[with].Input.Files : [];
        (int Step, RetrievedDay Retrieved)[] near = [.. Enumerable.Range(day.First, day.Last - day.First + 1)
            .Where(other => other != day.Step)
            .Select(other => (other, window.At(other)!))
            .Where(other => other.Item2 is not null)];
        if (retrieved is null && (near.Length == 0 || !preparation.Settings.FillMissingDays))
        {
            return new(day.Order, day.Date, files, Observed: false, fault, 0, []);
        }

        (int like, RetrievedDay shown) = retrieved is not null ? (day.Step!.Value, retrieved) : Nearest(day.Date, near);
        PlannedDay masks = window.Steps[like];
        DayLabel label = DayLabel.Of(masks, shown.Tuned);
        label = retrieved is not null ? label : label with { Date = day.Date, Sensor = DayLabel.NoSensor, Status = StatusOf(near) };
        List<MethodResult> results = [];
        for (int method = 0; method < shown.Retrievals.Count; method++)
        {
            NearDay[] planes = [.. near.Select(other => new NearDay(window.Steps[other.Step].Date.DayNumber - day.Date.DayNumber, other.Retrieved.Planes[method]))];
            TakeOver(retrieved?.Planes[method], masks.Source.Index);
            FilledCells filled = finishing.Fill(day.Date, masks.Source.Index, own, planes);
            if (retrieved is not null || filled.FromDays > 0)
            {
                results.Add(finishing.Publish(label, shown.Retrievals[method], retrieved?.Counts[method] ?? default, filled, own));
            }
        }

        return new(day.Order, day.Date, files, Observed: retrieved is not null, fault, retrieved?.OutOfRange ?? 0, results) { Sensor = label.Sensor, Tuned = shown.Tuned };
    }

    private void TakeOver(ConcentrationPlanes? retrieved, int source)
    {
        if (retrieved is null)
        {
            own.MakeUnobserved(preparation.MaskOf(source));
        }
        else
        {
            own.CopyFrom(retrieved);
        }
    }

    // Lends its land, polar gap and tie points to a day without input; the earlier of two.
    private (int Step, RetrievedDay Retrieved) Nearest(DateOnly day, (int Step, RetrievedDay Retrieved)[] near) =>
        near.MinBy(other => Math.Abs(window.Steps[other.Step].Date.DayNumber - day.DayNumber));

    private DayStatus StatusOf((int Step, RetrievedDay Retrieved)[] near) =>
        near.Any(other => window.Steps[other.Step].Source.Settings.Status == DayStatus.Provisional) ? DayStatus.Provisional : DayStatus.Final;
}
