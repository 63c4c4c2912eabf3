using System.Globalization;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Statistics.Overlaps;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary><c>compare --sensors</c>: the sources of a run file side by side on the days that two of them have.</summary>
internal static class SensorReport
{
    /// <summary>Compares, writes both tables and prints them.</summary>
    /// <returns>The exit code.</returns>
    public static int Write(
        RunSettings settings, RunPlan plan, string folder, KeyValuePair<string, string>[] metadata, bool json, CommandConsole console, CancellationToken cancellation)
    {
        IReadOnlyList<OverlapDay> days = OverlapDay.Of(plan);
        if (days.Count == 0)
        {
            throw new ConfigurationException([new(
                "IE1014",
                settings.RunFile,
                $"no day with input from two sources ({string.Join(", ", plan.Offers.Select(offer => $"{offer.Source.Settings.Sensor.Name}: {Counted.Days(offer.Days.Count)}"))})",
                "two sources with a day in common, inside --from and --to",
                "Give the run file a second source whose files overlap the first; plan shows the overlaps.")]);
        }

        List<Fault> faults = [.. plan.Gaps.Select(gap => gap.Fault)];
        SensorSeries series = new();
        SensorComparison comparison = new(settings, days, cancellation);
        foreach (OverlapDay day in days)
        {
            cancellation.ThrowIfCancellationRequested();
            comparison.Compare(day, series, faults);
        }

        IReadOnlyList<SensorDifferenceRow> differences = series.Differences();
        IReadOnlyList<ChannelOffset> offsets = series.Offsets(settings.Overlap.LeastDays, (pair, channel) =>
            settings.Sources[pair.Earlier - 1].Offsets?.StandardErrorKelvins.GetValueOrDefault(channel) ?? 0.0);
        SensorPair[] pairs = [.. differences.Select(row => row.Pair).Distinct()];
        faults.AddRange(pairs.Where(pair => offsets.All(offset => offset.Pair != pair)).Select(pair => TooFewDays(settings, pair, series.MostDays(pair))));
        KeyValuePair<string, string>[] all = [.. metadata, new("overlap_rules", FormattableString.Invariant($"{settings.Overlap}"))];
        SensorTables.WriteDifferences(Path.Combine(folder, "sensor_differences.parquet"), differences, all);
        SensorTables.WriteOffsets(Path.Combine(folder, "offsets.parquet"), offsets, all);
        console.Tell(faults);
        if (json)
        {
            console.Print(Json(settings, pairs, differences, offsets, folder));
        }
        else
        {
            Print(settings, pairs, differences, offsets, folder, console);
        }

        return differences.Count == 0 ? ExitCode.NoUsableInput : faults.Count > 0 ? ExitCode.DoneWithGaps : ExitCode.Done;
    }

    private static Fault TooFewDays(RunSettings settings, SensorPair pair, int days) => new(
        "IE2401",
        settings.RunFile,
        FormattableString.Invariant($"{Counted.Days(days)} on which {pair.EarlierSensor} (source {pair.Earlier}) and {pair.LaterSensor} (source {pair.Later}) both see {settings.Overlap.LeastCells} cells of a pure surface"),
        $"{settings.Overlap.LeastDays} days or more for an offset",
        "Add files of the overlap, or set overlap.least_days or overlap.least_cells; the differences of totals are written all the same.");

    // The lines that a [[source]] takes: all channels or none, because taking some off turns the ratios and lines of the methods.
    private static string[] RunFileLines(IEnumerable<ChannelOffset> offsets)
    {
        ChannelOffset[] usable = [.. offsets.Where(offset => offset.Surface == ChannelOffset.BothSurfaces)];
        return usable.Length == 0 || usable.Any(offset => offset.StandardErrorKelvins is null) ? [] :
        [
            "offset_k = { " + string.Join(", ", usable.Select(offset => FormattableString.Invariant($"{offset.Channel} = {offset.OffsetKelvins:F4}"))) + " }",
            "offset_se_k = { " + string.Join(", ", usable.Select(offset => FormattableString.Invariant($"{offset.Channel} = {offset.StandardErrorKelvins:F4}"))) + " }",
        ];
    }

    private static string Json(
        RunSettings settings, SensorPair[] pairs, IReadOnlyList<SensorDifferenceRow> differences, IReadOnlyList<ChannelOffset> offsets, string folder) => JsonText.Of(new
        {
            Folder = folder,
            Pairs = pairs.Select(pair => new
            {
                EarlierSource = pair.Earlier,
                pair.EarlierSensor,
                LaterSource = pair.Later,
                pair.LaterSensor,
                Differences = differences.Where(row => row.Pair == pair).Select(row => new
                {
                    row.Method,
                    row.Region,
                    row.Quantity,
                    row.Cells,
                    row.Month,
                    row.FirstDay,
                    row.LastDay,
                    row.Difference.Days,
                    MeanDifferenceKm2 = row.Difference.Mean,
                    StandardDeviationKm2 = row.Difference.StandardDeviation,
                    row.Difference.Lag1Correlation,
                    row.Difference.EffectiveDays,
                    MeanSeKm2 = row.Difference.StandardError,
                    Lower95Km2 = row.Difference.Lower95,
                    Upper95Km2 = row.Difference.Upper95,
                    Limits = SensorTables.NameOf(row.Difference.Limits),
                }),
                Offsets = offsets.Where(offset => offset.Pair == pair).Select(offset => new
                {
                    offset.Channel,
                    offset.Surface,
                    OffsetK = offset.OffsetKelvins,
                    OffsetSeK = offset.StandardErrorKelvins,
                    offset.Days,
                    offset.EffectiveDays,
                    offset.CellsPerDay,
                    Limits = SensorTables.NameOf(offset.Limits),
                }),
                RunFileLines = RunFileLines(offsets.Where(offset => offset.Pair == pair)),
            }),
            settings.Notice,
        });

    private static void Print(
        RunSettings settings, SensorPair[] pairs, IReadOnlyList<SensorDifferenceRow> differences, IReadOnlyList<ChannelOffset> offsets, string folder, CommandConsole console)
    {
        foreach (SensorPair pair in pairs)
        {
            Print(pair, [.. differences.Where(row => row.Pair == pair)], [.. offsets.Where(offset => offset.Pair == pair)], console);
        }

        console.Print($"Tables: {folder}");
        if (settings.Notice is { } notice)
        {
            console.Print(notice);
        }

        console.Print(Cautions.Text);
    }

    private static void Print(SensorPair pair, SensorDifferenceRow[] differences, ChannelOffset[] offsets, CommandConsole console)
    {
        console.Print($"{pair.LaterSensor} (source {pair.Later}) less {pair.EarlierSensor} (source {pair.Earlier}), km²; common: cells that both saw; own: as each sensor's daily rows");
        console.Print("method         quantity cells  month  days  effective       mean    st.dev.  95 % limits of the mean");
        foreach (SensorDifferenceRow row in differences.Where(row => row.Region == TotalsRegion.WholeHemisphere))
        {
            MeanOfDays mean = row.Difference;
            string limits = mean.Limits == MeanLimits.Given
                ? string.Create(CultureInfo.InvariantCulture, $"{mean.Lower95:F0} to {mean.Upper95:F0}")
                : SensorTables.NameOf(mean.Limits);
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{row.Method,-14} {row.Quantity,-8} {row.Cells,-6} {Month(row.Month),5} {mean.Days,5} {mean.EffectiveDays,10:F1} {mean.Mean,10:F0} {mean.StandardDeviation,10:F0}  {limits}"));
        }

        if (offsets.Length > 0)
        {
            console.Print("channel surface       offset, K  st.err., K  days  effective  cells a day");
        }

        foreach (ChannelOffset offset in offsets)
        {
            string error = offset.StandardErrorKelvins is { } kelvins ? kelvins.ToString("F3", CultureInfo.InvariantCulture) : "none";
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{offset.Channel,-7} {offset.Surface,-11} {offset.OffsetKelvins,11:F3} {error,11} {offset.Days,5} {offset.EffectiveDays,10:F1} {offset.CellsPerDay,12:F0}{(offset.Limits == MeanLimits.Given ? string.Empty : "  " + SensorTables.NameOf(offset.Limits))}"));
        }

        string[] lines = RunFileLines(offsets);
        if (lines.Length > 0)
        {
            console.Print($"For source {pair.Later} ({pair.LaterSensor}) in the run file, so that it reads as source {pair.Earlier} ({pair.EarlierSensor}) does:");
            Array.ForEach(lines, console.Print);
            console.Print("One number stands for both surfaces: where open water and closed ice differ by more than a standard error, it is wrong over either. Compare again with it.");
        }
        else if (offsets.Length > 0)
        {
            console.Print("No lines for the run file: the offset of some channel has no standard error, and offsets of some channels alone would make a new step.");
        }
    }

    private static string Month(int? month) => month is { } number ? number.ToString(CultureInfo.InvariantCulture) : "all";
}
