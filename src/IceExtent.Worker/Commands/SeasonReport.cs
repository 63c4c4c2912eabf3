using System.Globalization;
using IceExtent.Statistics.Seasons;
using IceExtent.Statistics.Trends;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Seasons;

namespace IceExtent.Worker.Commands;

/// <summary>Prints the seasons of one region or place.</summary>
internal static class SeasonReport
{
    private const double YearsPerDecade = 10.0;

    public static void Print(SeasonAnswer answer, string method, int years, bool json, string? notice, CommandConsole console)
    {
        if (json)
        {
            console.Print(JsonText.Of(AsJson(answer, method, years, notice)));
            return;
        }

        SeasonRow last = answer.Rows[^1];
        console.Print($"{answer.Name} ({answer.Kind}), {method}, dates by the scheme {Told(answer, SeasonMetadata.SchemeKey)}: {Told(answer, SeasonMetadata.SchemeSourceKey)}; days from {Told(answer, SeasonMetadata.RecordKey)}");
        console.Print(string.Empty);
        console.Print(string.Create(
            CultureInfo.InvariantCulture,
            $"Ice year {last.Year.Year}, {last.Year.FirstDay:d MMM yyyy} to {last.Year.LastDay:d MMM yyyy}, {(last.IsFinal ? "over" : "provisional: later days may change it")}"));
        foreach ((SeasonQuantity quantity, UsualDays? usual) in answer.Usual)
        {
            console.Print($"  {TitleOf(quantity),-24} {ThisYear(quantity, last, usual)}");
        }

        console.Print(string.Empty);
        console.Print($"{answer.KnownYears,2} years over and known   years  earliest   a quarter      median   a quarter    latest   days a decade (95 %)");
        console.Print("                                or least      before                   after   or most");
        foreach ((SeasonQuantity quantity, UsualDays usual) in answer.Usual.Where(pair => pair.Usual is not null).Select(pair => (pair.Quantity, pair.Usual!)))
        {
            string[] days = [.. new[] { usual.Least, usual.LowerQuartile, usual.Median, usual.UpperQuartile, usual.Most }.Select(day => TextOf(quantity, last.Year, day))];
            console.Print($"  {TitleOf(quantity),-24} {usual.Years,5} {days[0],9} {days[1],11} {days[2],11} {days[3],11} {days[4],9}   {TrendText(usual.Trend)}");
        }

        PrintYears(answer, years, console);
        if (notice is not null)
        {
            console.Print(notice);
        }

        console.Print(Cautions.Text);
    }

    private static void PrintYears(SeasonAnswer answer, int years, CommandConsole console)
    {
        SeasonQuantity[] dates = [.. answer.Usual.Select(pair => pair.Quantity).Where(quantity => quantity.DateOf is not null)];
        console.Print(string.Empty);
        console.Print("Ice year  " + string.Concat(dates.Select(quantity => $"{TitleOf(quantity),-20}")) + "ice-free days");
        foreach (SeasonRow row in answer.Rows.Skip(Math.Max(0, answer.Rows.Count - years)))
        {
            string free = row.Dates.Ice.InnerIceFreeDays(row.Year, row.Begins) is { } days
                ? string.Create(CultureInfo.InvariantCulture, $"{days} ± {row.Dates.Ice.InnerIceFreeSpreadDays:0.#}")
                : "-";
            console.Print(string.Create(CultureInfo.InvariantCulture, $"{row.Year.Year}{(row.IsFinal ? " " : "*")}     ")
                + string.Concat(dates.Select(quantity => $"{DateText(row.Year, quantity.DateOf!(row)),-20}")) + free);
        }

        console.Print("Opening and closing: ice falls from or reaches the level of closed ice (80 % in most schemes); retreat and advance: that of open water (15 %).");
        console.Print("Inner ice free days: retreat to advance, also the last column; outer: opening to closing. Open water days are counted, below the level of retreat.");
        console.Print("± is half of the days between the first and the last day that a date may have been (95 % limits); * is provisional.");
        if (answer.Kind == "place")
        {
            console.Print("Never: the mean of the cells in reach stayed on one side of the level. Land in the radiometer's view can hold it above 15 %.");
        }

        if (answer.Kind == "region")
        {
            console.Print("Area fall and rise: the region's ice area passes half way between its winter and its summer. The others are medians over the cells that the ice leaves;");
            console.Print("open water days are the mean over all cells that held ice, those that keep it all summer among them, so they are fewer than the ice-free period.");
        }
    }

    private static string ThisYear(SeasonQuantity quantity, SeasonRow row, UsualDays? usual)
    {
        if (quantity.DateOf is null)
        {
            return quantity.DaysOf(row) is not { } length ? "not known yet, or none"
                : quantity.Name == "open_water_days"
                    ? string.Create(CultureInfo.InvariantCulture, $"{length:F0} days{(row.IsFinal ? string.Empty : " so far")}, of {row.KnownDays:F0} known")
                    : string.Create(CultureInfo.InvariantCulture, $"{length:F0} days{AgainstUsual(length - usual?.Median, usual, "shorter", "longer")}");
        }

        SeasonDate? date = quantity.DateOf(row);
        return date switch
        {
            { State: SeasonDateState.Found } found => string.Create(
                CultureInfo.InvariantCulture,
                $"{row.Year.DateOf(found.Day!.Value):d MMM yyyy}, {row.Year.DateOf(found.Earliest!.Value):d MMM} to {row.Year.DateOf(found.Latest!.Value):d MMM} possible{AgainstUsual(found.Day - usual?.Median, usual, "before", "after")}"),
            { State: SeasonDateState.NotYetReached } when usual is not null =>
                $"not yet; it came in {Counted.Of(usual.Years, "year")} that {(usual.Years == 1 ? "is" : "are")} over, in half of them by {TextOf(quantity, row.Year, usual.Median)}",
            _ => DateText(row.Year, date),
        };
    }

    private static string AgainstUsual(double? days, UsualDays? usual, string less, string more) => days is not { } apart || usual is null ? string.Empty
        : Math.Abs(apart) < 0.5 ? $"; as the median of {Counted.Of(usual.Years, "year")}"
        : string.Create(CultureInfo.InvariantCulture, $"; {Math.Abs(apart):0.#} days {(apart < 0 ? less : more)} {(less == "before" ? string.Empty : "than ")}the median of {Counted.Of(usual.Years, "year")}");

    private static string DateText(IceYear year, SeasonDate? date) => date switch
    {
        null => "not sought",
        { State: SeasonDateState.Found } => string.Create(CultureInfo.InvariantCulture, $"{year.DateOf(date.Value.Day!.Value):d MMM yyyy} ± {date.Value.SpreadDays:0.#}"),
        { State: SeasonDateState.HiddenByGap } => string.Create(
            CultureInfo.InvariantCulture, $"{year.DateOf(date.Value.Earliest!.Value):d MMM}-{year.DateOf(date.Value.Latest!.Value):d MMM} in a gap"),
        { State: SeasonDateState.NeverReached } => "never",
        { State: SeasonDateState.BeforeRecord } => "before the record",
        _ => "not yet",
    };

    private static string Told(SeasonAnswer answer, string key) => answer.Metadata.GetValueOrDefault(key, "unknown");

    private static string TitleOf(SeasonQuantity quantity) => quantity.Name.Replace('_', ' ');

    private static string TextOf(SeasonQuantity quantity, IceYear year, double days) => quantity.DateOf is null
        ? days.ToString("F0", CultureInfo.InvariantCulture)
        : year.DateOf((int)Math.Round(days)).ToString("d MMM", CultureInfo.InvariantCulture);

    private static string TrendText(LinearTrend trend) => trend switch
    {
        LinearTrend.Fitted line => string.Create(
            CultureInfo.InvariantCulture,
            $"{YearsPerDecade * line.SlopePerYear:+0.0;-0.0;0.0} ({YearsPerDecade * line.LowerPerYear:+0.0;-0.0;0.0} to {YearsPerDecade * line.UpperPerYear:+0.0;-0.0;0.0})"),
        LinearTrend.Untestable why => $"cannot be tested: {why.Reason}",
        _ => throw new InvalidOperationException("There is no other trend."),
    };

    private static object AsJson(SeasonAnswer answer, string method, int years, string? notice) => new
    {
        answer.Name,
        answer.Kind,
        Method = method,
        Scheme = Told(answer, SeasonMetadata.SchemeKey),
        SchemeSource = Told(answer, SeasonMetadata.SchemeSourceKey),
        Record = Told(answer, SeasonMetadata.RecordKey),
        Years = answer.Rows.Skip(Math.Max(0, answer.Rows.Count - years)).Select(row => new
        {
            IceYear = row.Year.Year,
            FirstDay = row.Year.FirstDay,
            Status = row.IsFinal ? "final" : "provisional",
            Dates = answer.Usual.Where(pair => pair.Quantity.DateOf is not null).ToDictionary(pair => pair.Quantity.Name, pair => JsonDate(row.Year, pair.Quantity.DateOf!(row))),
            InnerIceFreeDays = row.Dates.Ice.InnerIceFreeDays(row.Year, row.Begins),
            InnerIceFreeSpreadDays = row.Dates.Ice.InnerIceFreeSpreadDays,
            OuterIceFreeDays = row.Dates.Ice.OuterIceFreeDays(row.Year, row.Begins),
            OpenWaterDays = Math.Round(row.OpenWaterDays, 2),
            KnownDays = Math.Round(row.KnownDays, 2),
        }),
        Usual = answer.Usual.ToDictionary(pair => pair.Quantity.Name, pair => JsonUsual(pair.Quantity, answer.Rows[^1].Year, pair.Usual)),
        Notice = notice,
        Caution = Cautions.Text,
    };

    private static object JsonDate(IceYear year, SeasonDate? date) => new
    {
        State = date is { } known ? SeasonDateStates.NameOf(known.State) : SeasonTables.NotSought,
        Day = DateOf(year, date?.Day),
        Earliest = DateOf(year, date?.Earliest),
        Latest = DateOf(year, date?.Latest),
        date?.SpreadDays,
    };

    private static DateOnly? DateOf(IceYear year, double? day) => day is { } here ? year.DateOf((int)Math.Round(here)) : null;

    // Days count from the ice year's first day, so that a date after New Year does not come before one in December.
    private static object? JsonUsual(SeasonQuantity quantity, IceYear year, UsualDays? usual) => usual is null ? null : new
    {
        usual.Years,
        usual.Least,
        usual.LowerQuartile,
        usual.Median,
        usual.UpperQuartile,
        usual.Most,
        MedianDate = quantity.DateOf is null ? null : DateOf(year, usual.Median),
        TrendDaysPerDecade = (usual.Trend as LinearTrend.Fitted)?.SlopePerYear * YearsPerDecade,
        TrendStandardErrorDaysPerDecade = (usual.Trend as LinearTrend.Fitted)?.StandardErrorPerYear * YearsPerDecade,
        TrendLowerDaysPerDecade = (usual.Trend as LinearTrend.Fitted)?.LowerPerYear * YearsPerDecade,
        TrendUpperDaysPerDecade = (usual.Trend as LinearTrend.Fitted)?.UpperPerYear * YearsPerDecade,
        TrendCannotBeTested = (usual.Trend as LinearTrend.Untestable)?.Reason,
    };
}
