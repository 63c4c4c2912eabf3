using IceExtent.Statistics.Seasons;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Seasons;

/// <summary>One of the dates or lengths that a region or place has in each ice year.</summary>
/// <param name="Name">As in the tables.</param>
/// <param name="DateOf">The date of a year, or null where it is not sought; lengths have none.</param>
/// <param name="DaysOf">The day of the year, or the length; null where there is none.</param>
internal sealed record SeasonQuantity(string Name, Func<SeasonRow, SeasonDate?>? DateOf, Func<SeasonRow, double?> DaysOf)
{
    /// <summary>Every quantity of a row, in the order they are told.</summary>
    /// <param name="row">A row of the region or place.</param>
    public static IReadOnlyList<SeasonQuantity> Of(SeasonRow row) =>
    [
        .. row is RegionSeasonRow
            ? [Date("area_fall", region => ((RegionSeasonRow)region).AreaFall), Date("area_rise", region => ((RegionSeasonRow)region).AreaRise)]
            : Array.Empty<SeasonQuantity>(),
        .. SeasonEvents.All.Where(which => row.Dates.Of(which) is not null).Select(which => Date(SeasonEvents.NameOf(which), year => year.Dates.Of(which))),
        new("inner_ice_free_days", null, year => year.Dates.Ice.InnerIceFreeDays(year.Year, year.Begins)),
        new("outer_ice_free_days", null, year => year.Dates.Ice.OuterIceFreeDays(year.Year, year.Begins)),
        new("open_water_days", null, year => year.OpenWaterDays),
    ];

    private static SeasonQuantity Date(string name, Func<SeasonRow, SeasonDate?> dateOf) => new(name, dateOf, row => dateOf(row)?.Day);
}

/// <summary>What is told of one region or place.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Kind"><c>region</c> or <c>place</c>.</param>
/// <param name="Rows">Its ice years, rising.</param>
/// <param name="Usual">What each quantity usually is, over years that are over and known; null where it never was.</param>
/// <param name="KnownYears">How many years are over and known.</param>
/// <param name="Metadata">That of the table.</param>
internal sealed record SeasonAnswer(
    string Name,
    string Kind,
    IReadOnlyList<SeasonRow> Rows,
    IReadOnlyList<(SeasonQuantity Quantity, UsualDays? Usual)> Usual,
    int KnownYears,
    IReadOnlyDictionary<string, string> Metadata)
{
    /// <summary>Puts the ice years of a region or place together.</summary>
    public static SeasonAnswer Of(string name, string kind, IEnumerable<SeasonRow> rows, SeasonSettings season, IReadOnlyDictionary<string, string> metadata)
    {
        SeasonRow[] ordered = [.. rows.OrderBy(row => row.Year.Year)];

        // A year that the record only touches would bring its late dates alone.
        SeasonRow[] whole = [.. ordered.Where(row => row.IsFinal && row.KnownDays >= season.LeastKnownShare * row.Year.Length)];
        return new(
            name,
            kind,
            ordered,
            [.. SeasonQuantity.Of(ordered[^1]).Select(quantity => (quantity, UsualDays.Of(
                [.. whole.Where(row => quantity.DaysOf(row) is not null).Select(row => (row.Year.Year, quantity.DaysOf(row)!.Value))], season.LeastTrendYears)))],
            whole.Length,
            metadata);
    }
}
