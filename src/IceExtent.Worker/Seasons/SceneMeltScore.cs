using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes;
using IceExtent.Statistics.Scoring;
using IceExtent.Statistics.Seasons;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Seasons;

/// <summary>The dates of one kind held against the true ones.</summary>
/// <param name="Name">The date and how it was found.</param>
/// <param name="Cells">Cells that had ice round the true day, and were observed then.</param>
internal sealed record ScoredMelt(string Name, SeasonDateScore Cells);

/// <summary>Finds melt onset and freeze-up in an invented scene with a melt season of its own, without writing anything.</summary>
internal sealed class SceneMeltScore
{
    private const int DaysBefore = 10; // Ice must be there so long before melt onset, and after freeze-up,
    private const int DaysAfter = 5;   // and so long after melt onset.

    private static readonly (string Name, Func<CellDates, SeasonDate> Of, bool Melt)[] Kinds =
    [
        ("melt onset, horizontal range", dates => dates.HorizontalRange, true),
        ("melt onset, indicators", dates => dates.Indicators.ContinuousMelt, true),
        ("early melt, indicators", dates => dates.Indicators.EarlyMelt, true),
        ("early freeze, indicators", dates => dates.Indicators.EarlyFreeze, false),
        ("freeze-up, indicators", dates => dates.Indicators.ContinuousFreeze, false),
    ];

    private readonly Scene scene;
    private readonly SceneScore retrieval;
    private readonly MeltRules rules;
    private readonly IceYearStart yearStart;
    private readonly float iceFraction;
    private readonly int[] cells;

    /// <summary>Prepares.</summary>
    /// <param name="scene">A scene whose melt season is imposed.</param>
    /// <param name="land">The land of its grid.</param>
    /// <param name="method">The method that says where ice is.</param>
    /// <param name="defaults">Everything else.</param>
    /// <param name="cellStep">One row and column of so many is scored.</param>
    public SceneMeltScore(Scene scene, LandShare land, string method, SceneDefaults defaults, int cellStep)
    {
        (this.scene, rules, yearStart) = (scene, defaults.Melt.Rules, defaults.Season.Scheme.YearStart);
        retrieval = new(scene, land, [method], defaults);
        iceFraction = (float)defaults.Rules.IceFraction;
        int columns = scene.Grid.Columns;
        cells = [.. retrieval.Region.Cells.ToArray().Where(cell => cell / columns % cellStep == 0 && cell % columns % cellStep == 0)];
    }

    /// <summary>Scores ice years.</summary>
    /// <param name="years">The calendar years of their first days.</param>
    /// <param name="workers">How many days at a time; the result does not depend on it.</param>
    /// <param name="cancellation">Stops.</param>
    public IReadOnlyList<ScoredMelt> Run(IEnumerable<int> years, int workers, CancellationToken cancellation)
    {
        ScoredMelt[] scores = [.. Kinds.Select(kind => new ScoredMelt(kind.Name, new()))];
        foreach (int year in years)
        {
            IceYear iceYear = yearStart.Beginning(year);
            MeltWindows windows = rules.Calendar.In(iceYear);
            SeasonWindow needed = rules.Needed(windows);
            CellDays days = new(cells.Length, needed.Last - needed.First + 1);
            Fill(days, iceYear.DateOf(needed.First), workers, cancellation);
            Hold(days, iceYear, windows, needed.First, scores);
        }

        return scores;
    }

    private void Fill(CellDays into, DateOnly firstDay, int workers, CancellationToken cancellation)
    {
        using ThreadLocal<(SceneWorkspace Workspace, SceneTruth Truth, BrightnessPlanes Planes)> rooms = new(() =>
            (scene.CreateWorkspace(), new(scene.Grid.CellCount), new(scene.Grid.CellCount, MeltSettings.SignalChannels)));
        Parallel.For(0, into.Days, new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = cancellation }, day =>
        {
            (SceneWorkspace workspace, SceneTruth truth, _) = rooms.Value;
            scene.Truth(firstDay.AddDays(day), workspace, truth); // Of missing days too.
            into.SetTruth(day, cells, truth.Concentration);
        });
        retrieval.Run(Enumerable.Range(0, into.Days).Select(firstDay.AddDays), workers, cancellation, (date, _, concentration) =>
        {
            BrightnessPlanes planes = rooms.Value.Planes;
            scene.Observe(date, rooms.Value.Workspace, planes);
            into.Set(date.DayNumber - firstDay.DayNumber, cells, planes, concentration.Total, iceFraction);
        });
    }

    private void Hold(CellDays days, IceYear year, MeltWindows windows, int firstDay, ScoredMelt[] scores)
    {
        (int[] wet, int[] dry) = Turns(year);
        MeltWorkspace room = new(days.Days);
        SeriesDays lie = new(-firstDay, 0, days.Days - 1);
        for (int cell = 0; cell < cells.Length; cell++)
        {
            MeltSeries series = days.Of(cell);
            CellDates dates = new(HorizontalRangeMelt.Onset(series, lie, windows, rules, room), IndicatorMelt.Dates(series, lie, windows, rules, room));
            int? melt = TrueMelt(days, cell, lie.IndexOf(year.DayOf(DateOnly.FromDayNumber(wet[cells[cell]]))));
            int? freeze = TrueFreeze(days, cell, lie.IndexOf(year.DayOf(DateOnly.FromDayNumber(dry[cells[cell]]))), lie.IndexOf(windows.Freeze.Last));
            for (int kind = 0; kind < Kinds.Length; kind++)
            {
                if ((Kinds[kind].Melt ? melt : freeze) is { } truth)
                {
                    scores[kind].Cells.Add(SeasonDate.Found(lie.DayOf(truth)), Kinds[kind].Of(dates));
                }
            }
        }
    }

    // The turns that fall into the ice year; where a season runs over its end, melt and freeze-up are of two seasons.
    private (int[] Wet, int[] Dry) Turns(IceYear year)
    {
        SceneWorkspace workspace = scene.CreateWorkspace();
        int count = scene.Grid.CellCount;
        int[] wet = new int[count], dry = new int[count];
        foreach (int season in (ReadOnlySpan<int>)[year.Year - 1, year.Year, year.Year + 1])
        {
            int[] wetThen = new int[count], dryThen = new int[count];
            scene.MeltTurns(season, workspace, wetThen, dryThen);
            for (int cell = 0; cell < count; cell++)
            {
                wet[cell] = Inside(wetThen[cell]) || wet[cell] == 0 ? wetThen[cell] : wet[cell];
                dry[cell] = Inside(dryThen[cell]) || dry[cell] == 0 ? dryThen[cell] : dry[cell];
            }
        }

        return (wet, dry);

        bool Inside(int dayNumber) => dayNumber >= year.FirstDay.DayNumber && dayNumber <= year.LastDay.DayNumber;
    }

    private int? TrueMelt(CellDays days, int cell, int turn) =>
        days.HasIce(cell, turn - DaysBefore, turn + DaysAfter, rules.LeastIceFraction) && days.IsObserved(cell, turn - DaysAfter, turn + DaysAfter) ? turn : null;

    // Dry again or, where the ice is back later, the first day from which it stays.
    private int? TrueFreeze(CellDays days, int cell, int turn, int last)
    {
        while (turn <= last && !days.HasIce(cell, turn, turn + DaysBefore, rules.LeastIceFraction))
        {
            turn++;
        }

        return turn <= last && days.IsObserved(cell, turn - DaysAfter, turn + DaysAfter) ? turn : null;
    }

    private readonly record struct CellDates(SeasonDate HorizontalRange, MeltDates Indicators);

    // Series of cells, the days of one cell side by side.
    private sealed class CellDays(int cellCount, int days)
    {
        private readonly float[] range = Missing(cellCount * days);
        private readonly float[] vertical19 = Missing(cellCount * days);
        private readonly float[] vertical37 = Missing(cellCount * days);
        private readonly float[] ice = Missing(cellCount * days);
        private readonly float[] truth = Missing(cellCount * days);

        public int Days => days;

        public void SetTruth(int day, int[] cells, ReadOnlySpan<float> concentration)
        {
            for (int index = 0; index < cells.Length; index++)
            {
                truth[(index * days) + day] = concentration[cells[index]];
            }
        }

        public void Set(int day, int[] cells, BrightnessPlanes planes, ReadOnlySpan<float> concentration, float leastIce)
        {
            ReadOnlySpan<float> h19 = planes.Kelvins(Channel.H19), h37 = planes.Kelvins(Channel.H37);
            ReadOnlySpan<float> v19 = planes.Kelvins(Channel.V19), v37 = planes.Kelvins(Channel.V37);
            for (int index = 0; index < cells.Length; index++)
            {
                int cell = cells[index], at = (index * days) + day;
                ice[at] = concentration[cell];
                if (concentration[cell] >= leastIce) // As in the archive.
                {
                    (range[at], vertical19[at], vertical37[at]) = (h19[cell] - h37[cell], v19[cell], v37[cell]);
                }
            }
        }

        public MeltSeries Of(int cell) => new(
            range.AsSpan(cell * days, days), vertical19.AsSpan(cell * days, days), vertical37.AsSpan(cell * days, days), ice.AsSpan(cell * days, days));

        public bool HasIce(int cell, int first, int last, double least) =>
            first >= 0 && last < days && !truth.AsSpan((cell * days) + first, last - first + 1).ContainsAnyExceptInRange((float)least, 1.5f);

        public bool IsObserved(int cell, int first, int last)
        {
            ReadOnlySpan<float> part = ice.AsSpan(cell * days, days)[Math.Max(first, 0)..Math.Min(last, days)];
            return part.ContainsAnyInRange(float.MinValue, float.MaxValue);
        }

        private static float[] Missing(int count)
        {
            float[] plane = new float[count];
            Array.Fill(plane, float.NaN);
            return plane;
        }
    }
}
