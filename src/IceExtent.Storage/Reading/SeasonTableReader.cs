using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Reading;

/// <summary>Reads season tables back.</summary>
public static class SeasonTableReader
{
    /// <summary>Reads <c>season_regions</c>.</summary>
    /// <param name="path">A file with <see cref="SeasonTables.RegionColumns"/>.</param>
    /// <exception cref="FaultException">IE3120: it cannot be read. IE3121: a column is missing or has another type. IE3122: a value has no meaning.</exception>
    public static (IReadOnlyList<RegionSeasonRow> Rows, IReadOnlyDictionary<string, string> Metadata) ReadRegions(string path)
    {
        StoredTable table = TableFile.Read(path);
        DateColumns columns = new(path, table);
        IReadOnlyList<string> region = table.Column<string>("region");
        IReadOnlyList<double> icy = table.Column<double>("icy_area_km2");
        IReadOnlyList<double?> level = table.Column<double?>("area_level_km2");
        RegionSeasonRow RowAt(int row) => new()
        {
            Year = columns.YearAt(row),
            Begins = columns.Begins,
            Dates = columns.DatesAt(row),
            KnownDays = columns.Known[row],
            OpenWaterDays = columns.Open[row],
            IsFinal = columns.IsFinalAt(row),
            Region = region[row],
            IcyAreaSquareKilometers = icy[row],
            AreaLevelSquareKilometers = level[row],
            AreaFall = columns.DateAt("area_fall", row),
            AreaRise = columns.DateAt("area_rise", row),
        };
        return ([.. Enumerable.Range(0, table.Rows).Select(RowAt)], table.Metadata);
    }

    /// <summary>Reads <c>season_places</c>.</summary>
    /// <param name="path">A file with <see cref="SeasonTables.PlaceColumns"/>.</param>
    /// <exception cref="FaultException">As <see cref="ReadRegions"/>.</exception>
    public static (IReadOnlyList<PlaceSeasonRow> Rows, IReadOnlyDictionary<string, string> Metadata) ReadPlaces(string path)
    {
        StoredTable table = TableFile.Read(path);
        DateColumns columns = new(path, table);
        IReadOnlyList<string> place = table.Column<string>("place");
        PlaceSeasonRow RowAt(int row) => new()
        {
            Year = columns.YearAt(row),
            Begins = columns.Begins,
            Dates = columns.DatesAt(row),
            KnownDays = columns.Known[row],
            OpenWaterDays = columns.Open[row],
            IsFinal = columns.IsFinalAt(row),
            Place = place[row],
        };
        return ([.. Enumerable.Range(0, table.Rows).Select(RowAt)], table.Metadata);
    }

    /// <summary>What all season tables share.</summary>
    private sealed class DateColumns
    {
        private readonly string path;
        private readonly IReadOnlyList<int> iceYear;
        private readonly IReadOnlyList<DateOnly> firstDay;
        private readonly IReadOnlyList<string> status;
        private readonly Dictionary<string, (IReadOnlyList<DateOnly?> Day, IReadOnlyList<string> State, IReadOnlyList<DateOnly?> Earliest, IReadOnlyList<DateOnly?> Latest)> dates = [];
        private readonly StoredTable table;

        public DateColumns(string path, StoredTable table)
        {
            (this.path, this.table) = (path, table);
            iceYear = table.Column<int>("ice_year");
            firstDay = table.Column<DateOnly>("first_day");
            status = table.Column<string>("status");
            Known = table.Column<double>("known_days");
            Open = table.Column<double>("open_water_days");
            Begins = table.Metadata.GetValueOrDefault(SeasonMetadata.BeginsKey) == SeasonMetadata.Water ? YearBeginning.Water : YearBeginning.Ice;
        }

        public YearBeginning Begins { get; }

        public IReadOnlyList<double> Known { get; }

        public IReadOnlyList<double> Open { get; }

        public bool IsFinalAt(int row) => status[row] == "final";

        public IceYear YearAt(int row) => new(iceYear[row], firstDay[row], firstDay[row].AddYears(1).DayNumber - firstDay[row].DayNumber);

        public YearDates DatesAt(int row)
        {
            SeasonDate Of(SeasonEvent which) => DateAt(SeasonEvents.NameOf(which), row)
                ?? throw Meaningless(SeasonTables.NotSought);
            return new(
                new(Of(SeasonEvent.Opening), Of(SeasonEvent.Retreat), Of(SeasonEvent.Advance), Of(SeasonEvent.Closing), (int)Known[row], (int)Open[row]),
                DateAt(SeasonEvents.NameOf(SeasonEvent.MeltOnset), row),
                DateAt(SeasonEvents.NameOf(SeasonEvent.FreezeUp), row));
        }

        public SeasonDate? DateAt(string name, int row)
        {
            if (!dates.TryGetValue(name, out (IReadOnlyList<DateOnly?> Day, IReadOnlyList<string> State, IReadOnlyList<DateOnly?> Earliest, IReadOnlyList<DateOnly?> Latest) columns))
            {
                columns = (table.Column<DateOnly?>(name), table.Column<string>($"{name}_state"), table.Column<DateOnly?>($"{name}_earliest"), table.Column<DateOnly?>($"{name}_latest"));
                dates.Add(name, columns);
            }

            string written = columns.State[row];
            if (written == SeasonTables.NotSought)
            {
                return null;
            }

            IceYear year = YearAt(row);
            return (SeasonDateStates.Parse(written), columns.Day[row], columns.Earliest[row], columns.Latest[row]) switch
            {
                (SeasonDateState.Found, { } day, { } earliest, { } latest) => SeasonDate.Found(year.DayOf(day), year.DayOf(earliest), year.DayOf(latest)),
                (SeasonDateState.HiddenByGap, _, { } earliest, { } latest) => SeasonDate.Hidden(year.DayOf(earliest), year.DayOf(latest)),
                (SeasonDateState.NeverReached or SeasonDateState.BeforeRecord or SeasonDateState.NotYetReached, _, _, _) => SeasonDate.Without(SeasonDateStates.Parse(written)!.Value),
                _ => throw Meaningless(written),
            };
        }

        private FaultException Meaningless(string written) => new(new(
            "IE3122", path, $"a date with the state {written}", string.Join(", ", Enum.GetValues<SeasonDateState>().Select(SeasonDateStates.NameOf)),
            "The file is from another program: move it away and run that year anew."));
    }
}
