using IceExtent.Retrieval;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Writes one CF NetCDF-4 file a day and method. Safe to share between workers.</summary>
internal sealed class GridArchive(RunSettings settings, ArchiveLayout layout, IReadOnlyList<KeyValuePair<string, string>> attributes)
{
    private static readonly (ushort Mask, string Meaning)[] Meanings =
    [
        ((ushort)CellConditions.Land, "land"),
        ((ushort)CellConditions.PolarGap, "polar_gap"),
        ((ushort)CellConditions.NoObservation, "no_observation"),
        ((ushort)CellConditions.OutOfRange, "brightness_temperature_out_of_range"),
        ((ushort)CellConditions.WeatherGradient3719, "weather_screened_by_gradient_37_19"),
        ((ushort)CellConditions.WeatherGradient2219, "weather_screened_by_gradient_22_19"),
        ((ushort)CellConditions.ClippedBelow, "clipped_from_below_0"),
        ((ushort)CellConditions.ClippedAbove, "clipped_from_above_1"),
        ((ushort)CellConditions.NoSolution, "no_solution"),
        ((ushort)CellConditions.CoastCorrected, "coast_corrected"),
        ((ushort)CellConditions.FilledFromNeighbours, "filled_from_neighbours"),
        ((ushort)CellConditions.FilledPolarGap, "filled_polar_gap"),
        ((ushort)CellConditions.FilledFromDays, "filled_from_days"),
        ((ushort)CellConditions.OutsideIceMask, "outside_ice_mask"),
        ((ushort)CellConditions.WarmWater, "warm_water"),
    ];

    private static readonly KeyValuePair<string, string>[] Nothing = [];
    private static readonly KeyValuePair<string, string>[] Ancillary = [new("ancillary_variables", "concentration_se conditions")];

    private static readonly KeyValuePair<string, string>[] AncillaryWithDays =
        [new("ancillary_variables", "concentration_se conditions fill_days_before fill_days_after")];

    private static readonly BytePacking WholeDays = new(1.0, 0.0, 1.0, DayFillingRules.MostDays);

    private readonly double[] limits = [settings.Rules.IceFraction, settings.Rules.PackFraction];

    /// <summary>Writes one day of one method.</summary>
    /// <param name="day">The day.</param>
    /// <param name="retrieval">What retrieved it.</param>
    /// <param name="tiePoints">Where the method's tie points come from.</param>
    /// <param name="planes">What is written.</param>
    /// <param name="sourceDays">How far away the days lie that cells were filled from, or null where the run fills nothing over days.</param>
    public void Write(DayLabel day, DayRetrieval retrieval, TiePointState tiePoints, ConcentrationPlanes planes, SourceDays? sourceDays)
    {
        IConcentrationMethod method = retrieval.Method;
        List<GridVariable> variables =
        [
            new PackedVariable(
                "concentration", "sea-ice concentration of all ice, screened for weather and clipped to 0-1", "sea_ice_area_fraction", sourceDays is null ? Ancillary : AncillaryWithDays, "1", planes.TotalMemory, Packing.Fraction)
            {
                Limits = limits, // So that totals can be recomputed from the grids.
            },
            new PackedVariable(
                "concentration_se", "standard error of the sea-ice concentration", "sea_ice_area_fraction standard_error", Nothing, "1", planes.StandardErrorMemory, Packing.Fraction),
            new PackedVariable(
                "concentration_unscreened", "sea-ice concentration as it would be without weather screens and masks, clipped to 0-1", null, Nothing, "1", planes.UnscreenedMemory, Packing.Fraction),
        ];
        if (method.SeparatesIceTypes)
        {
            (string first, string multi) = settings.Grid.Hemisphere == Grids.Hemisphere.North
                ? ("first-year ice", "multiyear ice")
                : ("type A ice (radiometrically like first-year ice)", "type B ice");
            variables.Add(new PackedVariable("first_year_concentration", $"concentration of {first}", null, Nothing, "1", planes.FirstYearMemory, Packing.Fraction));
            variables.Add(new PackedVariable("multiyear_concentration", $"concentration of {multi}", null, Nothing, "1", planes.MultiyearMemory, Packing.Fraction));
        }

        if (sourceDays is not null)
        {
            variables.Add(new BytePackedVariable("fill_days_before", "days back to the earlier day that the cell was filled from", null, Nothing, "1", sourceDays.Before, WholeDays));
            variables.Add(new BytePackedVariable("fill_days_after", "days ahead to the later day that the cell was filled from", null, Nothing, "1", sourceDays.After, WholeDays));
        }

        variables.Add(new MaskVariable(
            "conditions", "why a cell's concentration is what it is", "sea_ice_area_fraction status_flag", Nothing, planes.ConditionMemory, Meanings));
        GridFile.Write(
            layout.GridFile(method.Name, settings.Grid.Hemisphere, day.Date),
            settings.Grid,
            day.Date,
            variables,
            [
                .. attributes,
                new("method", method.Name),
                new("method_source", method.Source),
                new("sensor", day.Sensor),
                new("sensor_offsets_k", day.Offsets),
                new("tie_points", TiePointStates.NameOf(tiePoints)),
                new("gradient_limits", TextOf(retrieval.Screens)),
            ]);
    }

    private static string TextOf(WeatherScreens screens) => screens.Gradient2219Limit is { } second
        ? FormattableString.Invariant($"37/19: {screens.Gradient3719Limit:F4}; 22/19: {second:F4}")
        : FormattableString.Invariant($"37/19: {screens.Gradient3719Limit:F4}");
}
