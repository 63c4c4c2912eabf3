using System.Security.Cryptography;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Seasons;

namespace IceExtent.Worker.Running;

/// <summary>What the person asked for beside the run file.</summary>
/// <param name="From">The first day wanted, or null.</param>
/// <param name="To">The last day wanted, or null.</param>
/// <param name="Workers">How many days are handled at a time.</param>
/// <param name="CommandLine">The command line as given, for the run record.</param>
internal sealed record RunOptions(DateOnly? From, DateOnly? To, int Workers, IReadOnlyList<string> CommandLine);

/// <summary>What a run came to.</summary>
/// <param name="ExitCode">One of <see cref="Worker.ExitCode"/>.</param>
/// <param name="Plan">What was planned.</param>
/// <param name="DaysDone">Days with numbers.</param>
/// <param name="DaysFilled">Days without usable input whose numbers are wholly from days before and after.</param>
/// <param name="Gaps">Everything that could not be used.</param>
/// <param name="DaysRemoved">Days taken out of the archive because their input can no longer be used.</param>
/// <param name="RecordPath">The run record.</param>
internal sealed record RunOutcome(int ExitCode, RunPlan Plan, int DaysDone, int DaysFilled, IReadOnlyList<Gap> Gaps, int DaysRemoved, string RecordPath);

/// <summary>One run over an archive: plan, process, publish, record.</summary>
internal sealed class ArchiveRun(RunSettings settings, RunOptions options, TimeProvider clock)
{
    private readonly ArchiveLayout layout = new(settings.Output);
    private readonly List<DayRecord> dayRecords = [];
    private readonly List<Gap> gaps = [];
    private readonly SortedSet<string> filesRead = new(StringComparer.Ordinal);
    private int polarGapFallbacks;
    private int tiePointFallbacks;
    private int emptiedDays;
    private IReadOnlyList<SeasonYearReport> seasons = [];

    /// <summary>Runs.</summary>
    /// <param name="observer">Watches.</param>
    /// <param name="cancellation">Stops after the days in hand.</param>
    /// <exception cref="FaultException">The archive cannot be used or written.</exception>
    /// <exception cref="OperationCanceledException">It was stopped; what is in the archive is whole.</exception>
    public async Task<RunOutcome> RunAsync(IRunObserver observer, CancellationToken cancellation)
    {
        DateTimeOffset started = clock.GetUtcNow();
        using ArchiveLock held = ArchiveLock.Take(settings.Output, started);
        PublishedFile.RemoveLeftovers(settings.Output);
        string digest = ConfigurationDigest.Of(settings);
        DailySeries<DailyRow> series = new(DailySeries.Regions(layout, settings.Grid.Hemisphere), settings.Methods, method => TableMetadata(method, digest));
        DailySeries<DailyPlaceRow> places = new(DailySeries.Places(layout, settings.Grid.Hemisphere), settings.Methods, method => TableMetadata(method, digest));
        TiePointArchive tiePoints = new(layout, settings.Grid.Hemisphere, TiePointMetadata(digest));
        Task<DayPreparation> preparing = Task.Run(() => new DayPreparation(settings), CancellationToken.None); // Needs no file, so it need not wait for them.
        RunPlan plan = RunPlanner.Plan(settings, options.From, options.To, cancellation);
        observer.Planned(plan);
        int[] years = [.. plan.Days.Select(day => day.Date).Concat(plan.DaysToFill).Concat(plan.Gaps.Select(gap => gap.Date).OfType<DateOnly>()).Select(day => day.Year).Distinct()];
        series.CheckSameConfiguration(years, digest);
        places.CheckSameConfiguration(years, digest);

        new CellArchive(settings, layout).Update();
        gaps.AddRange(plan.Gaps);
        DateOnly[] lost = [.. plan.Gaps.Select(gap => gap.Date).OfType<DateOnly>().Except(plan.Days.Select(day => day.Date)).Except(plan.DaysToFill)];
        series.Remove(lost);
        places.Remove(lost);
        tiePoints.Remove(lost);
        Array.ForEach(lost, day => RemoveGrids(day, settings.Methods));
        Array.ForEach(lost, RemoveSignals);
        DayPreparation preparation = await preparing;
        await ProcessAsync(plan, preparation, (series, places, tiePoints), GlobalAttributes(digest), observer, cancellation);
        if (settings.Season is { } season)
        {
            HashSet<DateOnly> touched = [.. lost, .. dayRecords.Select(day => day.Date)];
            seasons = new SeasonSpan(settings, season, preparation, digest, options.Workers).Update(touched, observer.SeasonDone, cancellation);
            gaps.AddRange(seasons.SelectMany(year => year.Unread).Distinct().Select(fault => new Gap(null, fault))); // Two ice years may meet the same day.
        }

        int done = dayRecords.Count(day => day.Outcome == DayOutcome.Done);
        int filled = dayRecords.Count(day => day.Outcome == DayOutcome.Filled);
        int exitCode = done + filled == 0 ? ExitCode.NoUsableInput : gaps.Count > 0 ? ExitCode.DoneWithGaps : ExitCode.Done;
        string recordPath = WriteRecord(plan, started, digest, done, exitCode);
        return new(exitCode, plan, done, filled, gaps, series.DaysRemoved, recordPath);
    }

    private async Task ProcessAsync(
        RunPlan plan,
        DayPreparation preparation,
        (DailySeries<DailyRow> Daily, DailySeries<DailyPlaceRow> Places, TiePointArchive TiePoints) series,
        IReadOnlyList<KeyValuePair<string, string>> attributes,
        IRunObserver observer,
        CancellationToken cancellation)
    {
        if (plan.OutputCount == 0)
        {
            return;
        }

        filesRead.UnionWith(plan.Margin.SelectMany(day => day.Input.Files));
        SampleSeries? samples = SampleSeries.For(preparation, plan, (options.From, options.To), options.Workers, cancellation);
        GridArchive? grids = settings.WriteGrids ? new(settings, layout, attributes) : null;
        MeltSignalArchive? signals = settings.Melt.Signals ? new(settings, layout, attributes) : null;
        if (settings.DayFilling is { } rules)
        {
            DayWindow window = new(plan, rules, () => new(settings.Grid.CellCount, settings.Methods.Count));
            await RunPipeline.RunAsync(
                window, Math.Min(options.Workers, window.Steps.Count), () => new WindowWorker(preparation, samples, window, grids, signals), Receive, cancellation);
            gaps.AddRange(window.FaultsOf(plan.Margin).Select(fault => new Gap(null, fault)));
        }
        else
        {
            await RunPipeline.RunAsync(plan.Days, Math.Min(options.Workers, plan.Days.Count), () => new DayWorker(preparation, samples, grids, signals), Receive, cancellation);
        }

        series.Daily.Flush();
        series.Places.Flush();
        series.TiePoints.Flush();

        void Receive(DayResult result)
        {
            series.Daily.Add(result);
            series.Places.Add(result);
            series.TiePoints.Add(result);
            Remember(result, plan);
            observer.DayDone(result);
        }
    }

    private void Remember(DayResult result, RunPlan plan)
    {
        filesRead.UnionWith(result.Files);
        if (result.Fault is { } fault)
        {
            gaps.Add(new(result.Date, fault));
        }

        RemoveGrids(result.Date, settings.Methods.Except(result.Methods.Select(method => method.Method)));
        if (!result.Observed)
        {
            RemoveSignals(result.Date);
        }

        IReadOnlyList<Fault> faults = result.Fault is { } own ? [own]
            : result.Observed ? []
            : [.. plan.Gaps.Where(gap => gap.Date == result.Date).Select(gap => gap.Fault)];
        if (!result.Observed && result.Methods.Count == 0 && faults.Count == 0)
        {
            return; // A day without input that nothing could fill: a gap like others.
        }

        tiePointFallbacks += result is { Observed: true, Tuned: { } tuned } && tuned.State != TiePointState.Moving ? 1 : 0;
        polarGapFallbacks += result.Observed && result.Methods.Any(method => method.Filled.PolarGap == 0) ? 1 : 0;
        emptiedDays += result.Methods.Any(method => method.Emptied) ? 1 : 0;
        dayRecords.Add(new(
            result.Date,
            settings.Grid.Hemisphere,
            result.Observed ? DayOutcome.Done : result.Methods.Count > 0 ? DayOutcome.Filled : DayOutcome.Rejected,
            [.. result.Methods.Select(method => Counts(method, result.OutOfRange))],
            faults,
            TiePointStates.NameOf(result.Tuned?.State ?? TiePointState.Fixed)));
    }

    private static CellCounts Counts(MethodResult method, int outOfRange) => new(
        method.Method,
        outOfRange,
        method.Counts.ClippedBelow,
        method.Counts.ClippedAbove,
        method.Counts.Gradient3719,
        method.Counts.Gradient2219,
        method.Counts.NoSolution,
        method.Filled.FromNeighbours,
        method.Filled.PolarGap ?? 0,
        method.Counts.CoastCorrected,
        method.Counts.OutsideIceMask,
        method.Counts.WarmWater,
        method.Filled.FromDays);

    private void RemoveGrids(DateOnly day, IEnumerable<string> methods)
    {
        foreach (string method in methods)
        {
            PublishedFile.Delete(layout.GridFile(method, settings.Grid.Hemisphere, day));
        }
    }

    private void RemoveSignals(DateOnly day) => PublishedFile.Delete(layout.MeltSignalFile(settings.Grid.Hemisphere, day));

    // What was filled and how the gap counts: in grids and tables alike.
    private KeyValuePair<string, string>[] FillingText =>
    [
        new("filling_neighbours", settings.LeastNeighbours.ToString(System.Globalization.CultureInfo.InvariantCulture)),
        new("filling_days_before", (settings.DayFilling?.DaysBefore ?? 0).ToString(System.Globalization.CultureInfo.InvariantCulture)),
        new("filling_days_after", (settings.DayFilling?.DaysAfter ?? 0).ToString(System.Globalization.CultureInfo.InvariantCulture)),
        new("filling_missing_days", settings.FillMissingDays ? "true" : "false"),
        new("polar_gap_rule", PolarGapRules.TextOf(settings.Rules.PolarGap)),
    ];

    private List<KeyValuePair<string, string>> GlobalAttributes(string digest)
    {
        List<KeyValuePair<string, string>> attributes =
        [
            new("title", $"Daily sea-ice concentration on the grid {settings.Grid.Name}"),
            new("program", $"IceExtent {ProgramVersion.Text}"),
            new(DailySeries.DigestKey, digest),
            .. FillingText,
            new("weather_rules", settings.Weather.Text),
            new("caution", Cautions.Text),
        ];
        if (settings.Notice is { } notice)
        {
            attributes.Insert(0, new("notice", notice));
        }

        return attributes;
    }

    private List<KeyValuePair<string, string>> TableMetadata(string method, string digest)
    {
        IConcentrationMethod tuned = ConcentrationMethods.Create(method, settings.Sources[0].Sensor.In(settings.Grid.Hemisphere), settings.Grid.Hemisphere);
        List<KeyValuePair<string, string>> metadata =
        [
            new("method", method),
            new("method_source", tuned.Source),
            new("grid", settings.Grid.Name),
            new("program_version", ProgramVersion.Text),
            new(DailySeries.DigestKey, digest),
            new("ice_fraction", settings.Rules.IceFraction.ToString("R", System.Globalization.CultureInfo.InvariantCulture)),
            new("pack_fraction", settings.Rules.PackFraction.ToString("R", System.Globalization.CultureInfo.InvariantCulture)),
            .. FillingText,
            new("weather_rules", settings.Weather.Text),
            new("sensor_offsets_k", SourceOffsetText.OfAll(settings.Sources)),
            new("caution", Cautions.Text),
        ];
        if (settings.Notice is { } notice)
        {
            metadata.Add(new("notice", notice));
        }

        return metadata;
    }

    private KeyValuePair<string, string>[] TiePointMetadata(string digest) =>
    [
        new("method_source", "[Tonboe2016], [Lavergne2019]"),
        new("grid", settings.Grid.Name),
        new("program_version", ProgramVersion.Text),
        new(DailySeries.DigestKey, digest),
        new("rules", settings.TiePoints.Rules.ToString()),
        new("notice", settings.Notice ?? "none"),
    ];

    private string WriteRecord(RunPlan plan, DateTimeOffset started, string digest, int done, int exitCode)
    {
        HashSet<DateOnly> told = [.. plan.Days.Select(day => day.Date), .. dayRecords.Select(day => day.Date)];
        IEnumerable<DayRecord> unread = plan.Gaps
            .Where(gap => gap.Date is not null)
            .GroupBy(gap => gap.Date!.Value)
            .Where(day => !told.Contains(day.Key))
            .Select(day => new DayRecord(day.Key, settings.Grid.Hemisphere, DayOutcome.Rejected, [], [.. day.Select(gap => gap.Fault)]));
        DayRecord[] days = [.. dayRecords.Concat(unread).OrderBy(day => day.Date)];
        int rejected = days.Count(day => day.Outcome == DayOutcome.Rejected);
        HashSet<DateOnly> filled = [.. days.Where(day => day.Outcome == DayOutcome.Filled).Select(day => day.Date)];
        string path = layout.RunFile(started.UtcDateTime.ToString("yyyy-MM-dd'T'HH-mm-ss.fff'Z'", System.Globalization.CultureInfo.InvariantCulture));
        RunRecordFile.Write(path, new()
        {
            ProgramVersion = ProgramVersion.Text,
            Started = started,
            Finished = clock.GetUtcNow(),
            RunFile = new(settings.RunFile, Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(settings.RunFile)))),
            ConfigurationDigest = digest,
            CommandLine = options.CommandLine,
            Counts = new(done, rejected + plan.DatesWithoutInput.Count(day => !filled.Contains(day)), rejected, polarGapFallbacks, tiePointFallbacks, emptiedDays, filled.Count),
            Days = days,
            Faults = [.. gaps.Where(gap => gap.Date is null).Select(gap => gap.Fault)],
            Seasons = [.. seasons.Select(year => year.ToRecord())],
            FilesRead = [.. filesRead],
            ExitCode = exitCode,
        });
        return path;
    }
}
