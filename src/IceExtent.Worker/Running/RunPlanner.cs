using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Decides which days a run processes, and from which source.</summary>
internal static class RunPlanner
{
    /// <summary>Lists all sources and settles duplicates, service periods and the order of preference.</summary>
    /// <param name="settings">The run.</param>
    /// <param name="from">The first day wanted, or null.</param>
    /// <param name="to">The last day wanted, or null.</param>
    /// <param name="cancellation">Stops the listing.</param>
    public static RunPlan Plan(RunSettings settings, DateOnly? from, DateOnly? to, CancellationToken cancellation)
    {
        List<Gap> gaps = [];
        SortedDictionary<DateOnly, (OpenedSource Source, SourceDay Input)> chosen = [];
        List<SourceOffer> offers = [];
        int superseded = 0;
        for (int index = 0; index < settings.Sources.Count; index++)
        {
            RunSource source = settings.Sources[index];
            OpenedSource opened = new(index, source, BrightnessSources.Open(source.Description));
            SourceInventory inventory = opened.Reader.List(cancellation);
            gaps.AddRange(inventory.Faults.Select(fault => new Gap(null, fault)));
            List<SourceDay> usable = [];
            offers.Add(new(opened, usable));
            foreach (IGrouping<DateOnly, SourceDay> day in inventory.Days.Where(day => Near(day.Date)).GroupBy(day => day.Date))
            {
                bool ruling = source.Period.Holds(day.Key);
                if (Refusal(day, source) is { } fault)
                {
                    if (ruling || !source.Sensor.Serves(day.Key)) // Two files for a day that is not wanted do no harm.
                    {
                        gaps.Add(new(Wanted(day.Key) ? day.Key : null, fault));
                    }

                    continue;
                }

                if (Wanted(day.Key))
                {
                    usable.Add(day.First());
                }

                if (ruling && !chosen.TryAdd(day.Key, (opened, day.First())))
                {
                    superseded += Wanted(day.Key) ? 1 : 0;
                }
            }
        }

        PlannedDay[] days = Numbered(chosen.Values.Where(day => Wanted(day.Input.Date)));
        RunPlan plan = new(days, [.. gaps.OrderBy(gap => gap.Date ?? DateOnly.MinValue)], superseded) { Offers = offers };
        if (settings.DayFilling is not { } rules)
        {
            return plan;
        }

        DateOnly[] toFill = settings.FillMissingDays ? [.. DaysNear.ToFill(chosen.Keys, rules).Where(Wanted)] : [];
        DateOnly[] outputs = [.. days.Select(day => day.Date).Concat(toFill).Order()];
        return plan with
        {
            DaysToFill = toFill,
            Margin = Numbered(chosen.Values.Where(day => !Wanted(day.Input.Date) && DaysNear.Needed(outputs, day.Input.Date, rules))),
        };

        bool Wanted(DateOnly day) => Within(day, 0, 0);

        // A day that is wanted can be filled from days this far outside the period.
        bool Near(DateOnly day) => Within(day, settings.DayFilling?.DaysBefore ?? 0, settings.DayFilling?.DaysAfter ?? 0);

        bool Within(DateOnly day, int before, int after) =>
            (from is not { } first || day.DayNumber >= first.DayNumber - before) && (to is not { } last || day.DayNumber <= last.DayNumber + after);
    }

    private static PlannedDay[] Numbered(IEnumerable<(OpenedSource Source, SourceDay Input)> days) =>
        [.. days.Select((day, order) => new PlannedDay(order, day.Source, day.Input))];

    private static Fault? Refusal(IGrouping<DateOnly, SourceDay> day, RunSource source)
    {
        SourceDay first = day.First();
        string file = first.Files[0];
        if (!source.Sensor.Serves(day.Key))
        {
            string last = source.Sensor.LastDay is { } end ? $"{end:yyyy-MM-dd}" : "today";
            return new(
                "IE2302",
                file,
                $"a day of {day.Key:yyyy-MM-dd}",
                $"{source.Sensor.FirstDay:yyyy-MM-dd} to {last}, the service of {source.Sensor.Name}",
                "Name the sensor that measured the file, or correct the file's time.");
        }

        return day.Count() == 1 ? null : new(
            "IE2301",
            file,
            $"{day.Count()} files for {day.Key:yyyy-MM-dd} ({string.Join(", ", day.Select(input => Path.GetFileName(input.Files[0])))})",
            "one file a day and sensor",
            "Remove all but one, or give the better one a source of its own above this one.");
    }
}
