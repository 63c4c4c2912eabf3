using System.Runtime.InteropServices;
using IceExtent.Retrieval;
using IceExtent.Statistics.Overlaps;

namespace IceExtent.Worker.Running;

/// <summary>What totals are compared.</summary>
internal sealed record TotalsKey(SensorPair Pair, string Method, string Region);

/// <summary>What temperatures are compared.</summary>
internal sealed record TemperatureKey(SensorPair Pair, Channel Channel, ComparedSurface Surface);

/// <summary>Daily differences between sensors as they come in, in date order, and the tables that are made of them.</summary>
internal sealed class SensorSeries
{
    private const double SquareMetersPerSquareKilometer = 1e6;

    private static readonly string[] Quantities = ["extent", "area"];
    private static readonly string[] CellKinds = ["common", "own"];

    private readonly Dictionary<TotalsKey, Dictionary<(string Cells, string Quantity), DayValues>> totals = [];
    private readonly Dictionary<TemperatureKey, DayValues> temperatures = [];

    /// <summary>The surfaces over which temperatures are compared.</summary>
    public static IReadOnlyList<ComparedSurface> Surfaces { get; } = [ComparedSurface.OpenWater, ComparedSurface.ClosedIce];

    /// <summary>Takes one day's totals: extent and area, later less earlier, in m².</summary>
    public void AddTotals(TotalsKey key, DateOnly date, (double Extent, double Area) common, (double Extent, double Area) own)
    {
        Add("common", "extent", common.Extent);
        Add("common", "area", common.Area);
        Add("own", "extent", own.Extent);
        Add("own", "area", own.Area);

        void Add(string cells, string quantity, double squareMeters) => Slot(Slot(totals, key), (cells, quantity))
            .Add(date, squareMeters / SquareMetersPerSquareKilometer, 0);
    }

    /// <summary>Takes one day's difference of a channel over a surface, in K.</summary>
    public void AddTemperatures(TemperatureKey key, DateOnly date, double kelvins, int cells) => Slot(temperatures, key).Add(date, kelvins, cells);

    /// <summary>Differences of totals by month of the year, after them all days together.</summary>
    public IReadOnlyList<SensorDifferenceRow> Differences()
    {
        List<SensorDifferenceRow> rows = [];
        foreach ((TotalsKey key, Dictionary<(string Cells, string Quantity), DayValues> series) in totals
            .OrderBy(pair => pair.Key.Pair.Earlier).ThenBy(pair => pair.Key.Pair.Later))
        {
            foreach (string cells in CellKinds)
            {
                rows.AddRange(Quantities.SelectMany(quantity => Rows(key, cells, quantity, series[(cells, quantity)])));
            }
        }

        return rows;
    }

    /// <summary>Offsets of channels with enough days, by pair, channel and surface; both surfaces together come last.</summary>
    /// <param name="leastDays">A surface needs so many days.</param>
    /// <param name="earlierErrorKelvins">The standard error of the offset that the run file gives the earlier source of a pair, in K.</param>
    public IReadOnlyList<ChannelOffset> Offsets(int leastDays, Func<SensorPair, Channel, double> earlierErrorKelvins)
    {
        List<ChannelOffset> offsets = [];
        foreach (IGrouping<(SensorPair Pair, Channel Channel), KeyValuePair<TemperatureKey, DayValues>> channel in temperatures
            .Where(pair => pair.Value.Days.Count >= leastDays)
            .OrderBy(pair => pair.Key.Pair.Earlier).ThenBy(pair => pair.Key.Pair.Later).ThenBy(pair => pair.Key.Channel).ThenBy(pair => pair.Key.Surface)
            .GroupBy(pair => (pair.Key.Pair, pair.Key.Channel)))
        {
            ChannelOffset[] single = [.. channel.Select(pair => Offset(pair.Key, pair.Value))];
            double inherited = earlierErrorKelvins(channel.Key.Pair, channel.Key.Channel);
            offsets.AddRange(single
                .Append(ChannelOffset.Pooled(single[0], single.ElementAtOrDefault(1)))
                .Select(offset => offset with { StandardErrorKelvins = offset.StandardErrorKelvins is { } error ? Math.Sqrt((error * error) + (inherited * inherited)) : null }));
        }

        return offsets;
    }

    /// <summary>How many days the best known channel of a pair has over a surface.</summary>
    public int MostDays(SensorPair pair) =>
        temperatures.Where(one => one.Key.Pair == pair).Select(one => one.Value.Days.Count).DefaultIfEmpty(0).Max();

    private static IEnumerable<SensorDifferenceRow> Rows(TotalsKey key, string cells, string quantity, DayValues values)
    {
        IEnumerable<(int? Month, DayValues Values)> groups = Enumerable.Range(1, 12)
            .Select(month => ((int?)month, values.Where(day => day.Month == month)))
            .Where(group => group.Item2.Days.Count > 0)
            .Append((null, values));
        return groups.Select(group => new SensorDifferenceRow
        {
            Pair = key.Pair,
            Method = key.Method,
            Region = key.Region,
            Quantity = quantity,
            Cells = cells,
            Month = group.Month,
            FirstDay = group.Values.Days[0],
            LastDay = group.Values.Days[^1],
            Difference = group.Values.Mean(),
        });
    }

    private static ChannelOffset Offset(TemperatureKey key, DayValues values)
    {
        MeanOfDays mean = values.Mean();
        return new()
        {
            Pair = key.Pair,
            Channel = ChannelNames.NameOf(key.Channel),
            Surface = key.Surface == ComparedSurface.OpenWater ? "open-water" : "closed-ice",
            OffsetKelvins = mean.Mean,
            StandardErrorKelvins = mean.StandardError,
            Days = mean.Days,
            EffectiveDays = mean.EffectiveDays,
            CellsPerDay = values.Cells / mean.Days,
            Limits = mean.Limits,
        };
    }

    private static TValue Slot<TKey, TValue>(Dictionary<TKey, TValue> slots, TKey key)
        where TKey : notnull
        where TValue : new() => CollectionsMarshal.GetValueRefOrAddDefault(slots, key, out _) ??= new();

    // Days with a value each.
    private sealed class DayValues
    {
        public List<DateOnly> Days { get; } = [];

        public double Cells { get; private set; }

        private List<double> Values { get; } = [];

        public void Add(DateOnly day, double value, int cells)
        {
            Days.Add(day);
            Values.Add(value);
            Cells += cells;
        }

        public MeanOfDays Mean() => MeanOfDays.Of(CollectionsMarshal.AsSpan(Days), CollectionsMarshal.AsSpan(Values));

        public DayValues Where(Func<DateOnly, bool> wanted)
        {
            DayValues some = new();
            for (int day = 0; day < Days.Count; day++)
            {
                if (wanted(Days[day]))
                {
                    some.Add(Days[day], Values[day], 0);
                }
            }

            return some;
        }
    }
}
