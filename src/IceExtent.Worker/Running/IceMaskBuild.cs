using System.Globalization;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>One month of an ice mask.</summary>
/// <param name="Month">1 for January.</param>
/// <param name="Days">The days it was made of.</param>
/// <param name="Mask">One value a cell, as <see cref="IceMaskMonth"/> has them.</param>
/// <param name="Faults">Days that could not be read.</param>
internal sealed record BuiltMonth(int Month, int Days, byte[] Mask, IReadOnlyList<Fault> Faults);

/// <summary>Makes an ice mask of the concentration grids of an archive.</summary>
/// <param name="settings">The run of the archive.</param>
/// <param name="method">One of its methods.</param>
internal sealed class IceMaskBuild(RunSettings settings, string method)
{
    private const int Months = 12;

    /// <summary>Counts every day and makes the twelve masks; the result does not depend on the number of workers.</summary>
    /// <param name="from">The first day wanted, or null.</param>
    /// <param name="to">The last day wanted, or null.</param>
    /// <param name="workers">How many months are handled at a time.</param>
    /// <param name="cancellation">Stops at the next day.</param>
    /// <exception cref="FaultException">IE3140: the archive has too few days of some month that can be read.</exception>
    public IReadOnlyList<BuiltMonth> Build(DateOnly? from, DateOnly? to, int workers, CancellationToken cancellation)
    {
        ArchiveGrids grids = new(new ArchiveLayout(settings.Output), method, settings.Grid);
        ILookup<int, string> days = grids.List(from, to).ToLookup(file => file.Day.Month, file => file.Path);
        RefusePoor(month => days[month].Count());
        BuiltMonth[] built = new BuiltMonth[Months];
        Parallel.For(0, Months, new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = cancellation }, at =>
            built[at] = Month(at + 1, grids, days[at + 1], cancellation));
        RefusePoor(month => built[month - 1].Days);
        return built;
    }

    /// <summary>Writes the mask.</summary>
    /// <param name="path">The file.</param>
    /// <param name="months">All twelve.</param>
    /// <param name="period">The days wanted, in words.</param>
    /// <exception cref="FaultException">The file cannot be written.</exception>
    public void Write(string path, IReadOnlyList<BuiltMonth> months, string period)
    {
        IceMaskRules rules = settings.IceMask;
        List<KeyValuePair<string, string>> attributes =
        [
            new("title", $"Where ice can be in each month, on the grid {settings.Grid.Name}"),
            new("program", $"IceExtent {ProgramVersion.Text}"),
            new("method", method),
            new("period", period),
            new("days", string.Join(' ', months.Select(month => month.Days.ToString(CultureInfo.InvariantCulture)))),
            new("rules", FormattableString.Invariant(
                $"ice from {rules.IceFraction:R} on {rules.LeastDays} days and {rules.LeastShare:R} of the observed days, grown by {rules.MarginMeters / 1_000.0:R} km")),
            new(DailySeries.DigestKey, ConfigurationDigest.Of(settings)),
        ];
        if (settings.Notice is { } notice)
        {
            attributes.Insert(0, new("notice", notice));
        }

        GridFile.WriteMonths(
            path,
            settings.Grid,
            [new FlagVariable(
                IceMaskFile.VariableName,
                "whether ice can be in the cell in the month; missing where nothing was observed",
                null,
                [],
                months.SelectMany(month => month.Mask).ToArray(),
                [(IceMaskMonth.NoIce, "no_ice"), (IceMaskMonth.Ice, "ice_can_be")])],
            attributes);
    }

    private BuiltMonth Month(int month, ArchiveGrids grids, IEnumerable<string> days, CancellationToken cancellation)
    {
        IceMaskMonth counting = new(settings.Grid, settings.IceMask);
        float[] fraction = new float[settings.Grid.CellCount];
        List<Fault> faults = [];
        foreach (string path in days)
        {
            cancellation.ThrowIfCancellationRequested();
            try
            {
                grids.ReadConcentration(path, fraction);
                counting.Add(fraction);
            }
            catch (FaultException unreadable)
            {
                faults.Add(unreadable.Fault); // A bad file costs its day.
            }
        }

        return new(month, counting.Days, counting.Build(), faults);
    }

    // A month with fewer days than a cell needs would have no ice anywhere.
    private void RefusePoor(Func<int, int> daysOf)
    {
        int least = settings.IceMask.LeastDays;
        int[] poor = [.. Enumerable.Range(1, Months).Where(month => daysOf(month) < least)];
        if (poor.Length > 0)
        {
            throw new FaultException(new(
                "IE3140",
                settings.Output,
                FormattableString.Invariant($"too few concentration grids of {method} in the months {string.Join(", ", poor.Select(month => $"{month} ({daysOf(month)})"))}"),
                FormattableString.Invariant($"{least} days or more of every month of the year, ice_mask.least_days"),
                "Widen the period, or run the missing days with write_grids = true."));
        }
    }
}
