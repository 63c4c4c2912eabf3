using IceExtent.Statistics.Seasons;

namespace IceExtent.Storage.Writing;

/// <summary>The season tables: one row an ice year and cell, region or place.</summary>
/// <remarks>Columns and metadata are documented in docs/DATA.md.</remarks>
public static class SeasonTables
{
    /// <summary>The state of a date that the run does not look for.</summary>
    public const string NotSought = "not_sought";

    private const string Days = "day";
    private const string SquareKilometers = "km2";

    /// <summary>The columns of <c>season_cells</c>.</summary>
    public static IReadOnlyList<TableColumn<CellSeasonRow>> CellColumns { get; } =
    [
        .. YearColumns<CellSeasonRow>(),
        TableColumn.Whole<CellSeasonRow>("row", TableColumn.NoUnit, row => row.GridRow),
        TableColumn.Whole<CellSeasonRow>("column", TableColumn.NoUnit, row => row.GridColumn),
        TableColumn.Number<CellSeasonRow>("latitude", "degrees_north", row => row.LatitudeDegrees),
        TableColumn.Number<CellSeasonRow>("longitude", "degrees_east", row => row.LongitudeDegrees),
        TableColumn.Number<CellSeasonRow>("cell_area_km2", SquareKilometers, row => row.AreaSquareKilometers),
        .. DateColumns<CellSeasonRow>(),
        .. ColumnsOf<CellSeasonRow>("horizontal_range_melt", row => row.Dates.Melt?.HorizontalRange),
        .. ColumnsOf<CellSeasonRow>("early_melt", row => row.Dates.Melt?.Indicators.EarlyMelt),
        .. ColumnsOf<CellSeasonRow>("continuous_melt", row => row.Dates.Melt?.Indicators.ContinuousMelt),
        .. ColumnsOf<CellSeasonRow>("early_freeze", row => row.Dates.Melt?.Indicators.EarlyFreeze),
    ];

    /// <summary>The columns of <c>season_regions</c>.</summary>
    public static IReadOnlyList<TableColumn<RegionSeasonRow>> RegionColumns { get; } =
    [
        .. YearColumns<RegionSeasonRow>(),
        TableColumn.Text<RegionSeasonRow>("region", row => row.Region),
        TableColumn.Number<RegionSeasonRow>("icy_area_km2", SquareKilometers, row => row.IcyAreaSquareKilometers),
        TableColumn.OptionalNumber<RegionSeasonRow>("area_level_km2", SquareKilometers, row => row.AreaLevelSquareKilometers),
        .. ColumnsOf<RegionSeasonRow>("area_fall", row => row.AreaFall),
        .. ColumnsOf<RegionSeasonRow>("area_rise", row => row.AreaRise),
        .. DateColumns<RegionSeasonRow>(),
    ];

    /// <summary>The columns of <c>season_places</c>.</summary>
    public static IReadOnlyList<TableColumn<PlaceSeasonRow>> PlaceColumns { get; } =
    [
        .. YearColumns<PlaceSeasonRow>(),
        TableColumn.Text<PlaceSeasonRow>("place", row => row.Place),
        .. DateColumns<PlaceSeasonRow>(),
    ];

    private static TableColumn<TRow>[] YearColumns<TRow>()
        where TRow : SeasonRow =>
    [
        TableColumn.Whole<TRow>("ice_year", TableColumn.NoUnit, row => row.Year.Year),
        TableColumn.Date<TRow>("first_day", row => row.Year.FirstDay),
        TableColumn.Text<TRow>("status", row => row.IsFinal ? "final" : "provisional"),
    ];

    private static TableColumn<TRow>[] DateColumns<TRow>()
        where TRow : SeasonRow =>
    [
        .. SeasonEvents.All.SelectMany(which => ColumnsOf<TRow>(SeasonEvents.NameOf(which), row => row.Dates.Of(which))),
        TableColumn.OptionalWhole<TRow>("loss_of_ice_days", Days, row => row.Dates.Ice.LossOfIceDays),
        TableColumn.OptionalWhole<TRow>("gain_of_ice_days", Days, row => row.Dates.Ice.GainOfIceDays),
        TableColumn.OptionalWhole<TRow>("inner_ice_free_days", Days, row => row.Dates.Ice.InnerIceFreeDays(row.Year, row.Begins)),
        TableColumn.OptionalNumber<TRow>("inner_ice_free_spread_days", Days, row => row.Dates.Ice.InnerIceFreeSpreadDays),
        TableColumn.OptionalWhole<TRow>("outer_ice_free_days", Days, row => row.Dates.Ice.OuterIceFreeDays(row.Year, row.Begins)),
        TableColumn.OptionalNumber<TRow>("outer_ice_free_spread_days", Days, row => row.Dates.Ice.OuterIceFreeSpreadDays),
        TableColumn.Number<TRow>("open_water_days", Days, row => row.OpenWaterDays),
        TableColumn.Number<TRow>("known_days", Days, row => row.KnownDays),
    ];

    // A date as its day, the reason where there is none, the first and the last day it may have been, and half of what lies between.
    private static TableColumn<TRow>[] ColumnsOf<TRow>(string name, Func<TRow, SeasonDate?> dateOf)
        where TRow : SeasonRow =>
    [
        TableColumn.OptionalDate<TRow>(name, row => DateOf(row, dateOf(row)?.Day)),
        TableColumn.Text<TRow>($"{name}_state", row => dateOf(row) is { } date ? SeasonDateStates.NameOf(date.State) : NotSought),
        TableColumn.OptionalDate<TRow>($"{name}_earliest", row => DateOf(row, dateOf(row)?.Earliest)),
        TableColumn.OptionalDate<TRow>($"{name}_latest", row => DateOf(row, dateOf(row)?.Latest)),
        TableColumn.OptionalNumber<TRow>($"{name}_spread_days", Days, row => dateOf(row)?.SpreadDays),
    ];

    private static DateOnly? DateOf(SeasonRow row, int? day) => day is { } known ? row.Year.DateOf(known) : null;
}
