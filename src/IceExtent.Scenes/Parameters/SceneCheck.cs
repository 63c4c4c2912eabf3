using System.Globalization;
using IceExtent.Retrieval;

namespace IceExtent.Scenes.Parameters;

/// <summary>Range checks on the parameters of a scene.</summary>
public sealed class SceneCheck
{
    private static readonly Channel[] MadeChannels = [Channel.V19, Channel.H19, Channel.V22, Channel.V37, Channel.H37];

    private readonly List<SceneProblem> problems = [];

    private SceneCheck()
    {
    }

    /// <summary>Lists everything that is wrong, all at once; empty when a scene can be made.</summary>
    public static IReadOnlyList<SceneProblem> FindProblems(SceneParameters parameters)
    {
        ArgumentNullException.ThrowIfNull(parameters);
        SceneCheck check = new();
        check.Season(parameters.Season);
        check.Ice(parameters.Ice);
        check.Weather(parameters.Weather);
        check.Storms(parameters.Weather.Storms);
        check.MeltSeason(parameters.MeltSeason);
        check.Surfaces(parameters.Surfaces);
        check.Instrument(parameters.Instrument);
        check.Coverage(parameters.Coverage);
        return check.problems;
    }

    private void Season(SeasonParameters season)
    {
        InRange("season.maximum_day_of_year", season.MaximumDayOfYear, 1, 365, "day");
        InRange("season.minimum_day_of_year", season.MinimumDayOfYear, 1, 365, "day");
        InRange("season.timing_spread_days", season.TimingSpreadDays, 0, 10, "days");
        int apart = Math.Abs(season.MaximumDayOfYear - season.MinimumDayOfYear);
        InRange("season.minimum_day_of_year - season.maximum_day_of_year", Math.Min(apart, 365 - apart), 90, 183, "days");
        InRange("season.winter_edge_latitude_degrees", season.WinterEdgeLatitudeDegrees, 30, 90, "degrees");
        InRange("season.summer_edge_latitude_degrees", season.SummerEdgeLatitudeDegrees, season.WinterEdgeLatitudeDegrees, 95, "degrees");
        InRange("season.winter_spread_degrees", season.WinterSpreadDegrees, 0, 5, "degrees");
        InRange("season.summer_spread_degrees", season.SummerSpreadDegrees, 0, 5, "degrees");
        InRange("season.winter_retreat_degrees_per_decade", season.WinterRetreatDegreesPerDecade, -5, 5, "degrees a decade");
        InRange("season.summer_retreat_degrees_per_decade", season.SummerRetreatDegreesPerDecade, -5, 5, "degrees a decade");
        InRange("season.reference_year", season.ReferenceYear, 1900, 2200, "year");
        InRange("season.melt_exponent", season.MeltExponent, 0.3, 3, "1");
        InRange("season.freeze_exponent", season.FreezeExponent, 0.3, 3, "1");
    }

    private void Ice(IceParameters ice)
    {
        InRange("ice.standing_spread_degrees", ice.StandingSpreadDegrees, 0, 15, "degrees");
        InRange("ice.standing_node_kilometers", ice.StandingNodeKilometers, 50, 10_000, "km");
        InRange("ice.yearly_spread_degrees", ice.YearlySpreadDegrees, 0, 15, "degrees");
        InRange("ice.yearly_node_kilometers", ice.YearlyNodeKilometers, 50, 10_000, "km");
        InRange("ice.wander_spread_degrees", ice.WanderSpreadDegrees, 0, 15, "degrees");
        InRange("ice.wander_node_kilometers", ice.WanderNodeKilometers, 50, 10_000, "km");
        InRange("ice.wander_life_days", ice.WanderLifeDays, 1, 365, "days");
        InRange("ice.winter_edge_width_degrees", ice.WinterEdgeWidthDegrees, 0.01, 15, "degrees");
        InRange("ice.summer_edge_width_degrees", ice.SummerEdgeWidthDegrees, 0.01, 15, "degrees");
        InRange("ice.coast_reach_kilometers", ice.CoastReachKilometers, 1, 500, "km");
        InRange("ice.coast_winter_degrees", ice.CoastWinterDegrees, -15, 15, "degrees");
        InRange("ice.coast_summer_degrees", ice.CoastSummerDegrees, -15, 15, "degrees");
        Share("ice.winter_lead_share", ice.WinterLeadShare);
        Share("ice.summer_lead_share", ice.SummerLeadShare);
        InRange("ice.lead_node_kilometers", ice.LeadNodeKilometers, 20, 5_000, "km");
        InRange("ice.lead_life_days", ice.LeadLifeDays, 0.5, 365, "days");
        Share("ice.highest_multiyear_share", ice.HighestMultiyearShare);
        InRange("ice.multiyear_width_degrees", ice.MultiyearWidthDegrees, 0.01, 30, "degrees");
        InRange("ice.multiyear_stir_degrees", ice.MultiyearStirDegrees, 0, 15, "degrees");
        foreach (WarmInflow inflow in ice.WarmInflows)
        {
            InRange("ice.warm_inflows.latitude_degrees", inflow.LatitudeDegrees, -90, 90, "degrees north");
            InRange("ice.warm_inflows.longitude_degrees", inflow.LongitudeDegrees, -360, 360, "degrees east");
            InRange("ice.warm_inflows.reach_kilometers", inflow.ReachKilometers, 1, 5_000, "km");
            InRange("ice.warm_inflows.strength_degrees", inflow.StrengthDegrees, -40, 40, "degrees");
        }
    }

    private void Weather(WeatherParameters weather)
    {
        InRange("weather.freezing_kelvins", weather.FreezingKelvins, 270, 273.15, "K");
        InRange("weather.winter_sea_warming_kelvins_per_degree", weather.WinterSeaWarmingKelvinsPerDegree, 0, 5, "K per degree");
        InRange("weather.summer_sea_warming_kelvins_per_degree", weather.SummerSeaWarmingKelvinsPerDegree, 0, 5, "K per degree");
        InRange("weather.warmest_sea_kelvins", weather.WarmestSeaKelvins, 274, 308, "K");
        InRange("weather.pole_air_kelvins", weather.PoleAirKelvins, 220, 290, "K");
        InRange("weather.pole_air_swing_kelvins", weather.PoleAirSwingKelvins, 0, 40, "K");
        InRange("weather.sixty_air_kelvins", weather.SixtyAirKelvins, 240, 300, "K");
        InRange("weather.sixty_air_swing_kelvins", weather.SixtyAirSwingKelvins, 0, 40, "K");
        InRange("weather.coldest_day_of_year", weather.ColdestDayOfYear, 1, 365, "day");
        InRange("weather.air_spread_kelvins", weather.AirSpreadKelvins, 0, 15, "K");
        InRange("weather.spell_spread_kelvins", weather.SpellSpreadKelvins, 0, 10, "K");
        InRange("weather.warmest_air_over_ice_kelvins", weather.WarmestAirOverIceKelvins, 265, 280, "K");
        InRange("weather.node_kilometers", weather.NodeKilometers, 50, 5_000, "km");
        InRange("weather.life_days", weather.LifeDays, 0.25, 60, "days");
        InRange("weather.drift_kilometers_per_day", weather.DriftKilometersPerDay, 0, 5_000, "km a day");
        InRange("weather.vapor_millimeters_at_melting", weather.VaporMillimetersAtMelting, 0.2, 20, "mm");
        InRange("weather.vapor_growth_per_kelvin", weather.VaporGrowthPerKelvin, 0, 0.15, "1/K");
        InRange("weather.vapor_log_spread", weather.VaporLogSpread, 0, 1, "1");
        InRange("weather.winter_wind_meters_per_second", weather.WinterWindMetersPerSecond, 0, 25, "m/s");
        InRange("weather.summer_wind_meters_per_second", weather.SummerWindMetersPerSecond, 0, 25, "m/s");
        InRange("weather.wind_log_spread", weather.WindLogSpread, 0, 1, "1");
        InRange("weather.cloud_millimeters", weather.CloudMillimeters, 0, 1, "mm");
        InRange("weather.cloud_threshold", weather.CloudThreshold, -5, 10, "1");
    }

    private void Storms(StormParameters storms)
    {
        InRange("weather.storms.births_per_day", storms.BirthsPerDay, 0, 20, "storms a day");
        InRange("weather.storms.outer_latitude_degrees", storms.OuterLatitudeDegrees, 20, 90, "degrees");
        InRange("weather.storms.inner_latitude_degrees", storms.InnerLatitudeDegrees, storms.OuterLatitudeDegrees, 90, "degrees");
        InRange("weather.storms.longest_life_days", storms.LongestLifeDays, 0.5, 20, "days");
        InRange("weather.storms.travel_kilometers_per_day", storms.TravelKilometersPerDay, 0, 3_000, "km a day");
        InRange("weather.storms.radius_kilometers", storms.RadiusKilometers, 50, 2_000, "km");
        InRange("weather.storms.wind_meters_per_second", storms.WindMetersPerSecond, 0, 40, "m/s");
        InRange("weather.storms.vapor_log_gain", storms.VaporLogGain, 0, 3, "1");
        InRange("weather.storms.cloud_millimeters", storms.CloudMillimeters, 0, 3, "mm");
        InRange("weather.storms.warming_kelvins", storms.WarmingKelvins, 0, 30, "K");
    }

    private void MeltSeason(MeltSeasonParameters season)
    {
        InRange("melt_season.onset_day_of_year", season.OnsetDayOfYear, 1, 365, "day");
        InRange("melt_season.onset_days_per_degree", season.OnsetDaysPerDegree, 0, 5, "days a degree");
        InRange("melt_season.freeze_day_of_year", season.FreezeDayOfYear, 1, 365, "day");
        InRange("melt_season.freeze_days_per_degree", season.FreezeDaysPerDegree, -5, 0, "days a degree");
        InRange("melt_season.spread_days", season.SpreadDays, 0, 20, "days");
        InRange("melt_season.node_kilometers", season.NodeKilometers, 50, 10_000, "km");
        InRange("melt_season.turn_days", season.TurnDays, 0.1, 20, "days");
        InRange("melt_season.early_melt_share", season.EarlyMeltShare, 0, 0.45, "1");
        InRange("melt_season.refreeze_share", season.RefreezeShare, 0, 0.45, "1");
        foreach (Channel channel in MadeChannels)
        {
            Emissivity("melt_season.wet_ice_emissivity", season.WetIceEmissivity, channel);
        }
    }

    private void Surfaces(SurfaceParameters surfaces)
    {
        InRange("surfaces.reference.sea_kelvins", surfaces.Reference.SeaKelvins, 271, 300, "K");
        InRange("surfaces.reference.ice_kelvins", surfaces.Reference.IceKelvins, 230, 273.15, "K");
        InRange("surfaces.reference.wind_meters_per_second", surfaces.Reference.WindMetersPerSecond, 0, 30, "m/s");
        InRange("surfaces.reference.vapor_millimeters", surfaces.Reference.VaporMillimeters, 0.2, 40, "mm");
        InRange("surfaces.reference.cloud_millimeters", surfaces.Reference.CloudMillimeters, 0, 1, "mm");
        InRange("surfaces.salinity_per_mille", surfaces.SalinityPerMille, 0, 42, "parts per thousand");
        Share("surfaces.air_share_in_ice", surfaces.AirShareInIce);
        InRange("surfaces.wet_from_kelvins", surfaces.WetFromKelvins, 250, 280, "K");
        InRange("surfaces.wet_to_kelvins", surfaces.WetToKelvins, surfaces.WetFromKelvins + 0.1, 290, "K");
        Share("surfaces.highest_pond_share", surfaces.HighestPondShare);
        foreach (Channel channel in MadeChannels)
        {
            Emissivity("surfaces.wet_ice_emissivity", surfaces.WetIceEmissivity, channel);
            Emissivity("surfaces.land_emissivity", surfaces.LandEmissivity, channel);
        }
    }

    private void Instrument(InstrumentParameters instrument)
    {
        InRange("instrument.incidence_degrees", instrument.IncidenceDegrees, 45, 60, "degrees");
        Each("instrument.noise_kelvins", instrument.NoiseKelvins, 0, 20, "K");
        Each("instrument.footprint_kilometers", instrument.FootprintKilometers, 0, 200, "km");
        Each("instrument.offset_kelvins", instrument.OffsetKelvins, -20, 20, "K");
        Each("instrument.drift_kelvins_per_decade", instrument.DriftKelvinsPerDecade, -20, 20, "K a decade");
    }

    private void Coverage(CoverageParameters coverage)
    {
        InRange("coverage.swath_kilometers", coverage.SwathKilometers, 0, 3_000, "km");
        InRange("coverage.orbits_per_day", coverage.OrbitsPerDay, 10, 17, "orbits");
        InRange("coverage.inclination_degrees", coverage.InclinationDegrees, 60, 120, "degrees");
        InRange("coverage.day_step", coverage.DayStep, 1, 10, "days");
        InRange("coverage.missing_day_share", coverage.MissingDayShare, 0, 0.5, "1");
        Share("coverage.lost_pass_day_share", coverage.LostPassDayShare);
        InRange("coverage.lost_pass_kilometers", coverage.LostPassKilometers, 0, 20_000, "km");
        InRange("coverage.lost_cell_share", coverage.LostCellShare, 0, 0.99, "1");
        foreach (Outage outage in coverage.Outages.Where(outage => outage.LastDay < outage.FirstDay))
        {
            problems.Add(new(
                "coverage.outages.last_day",
                outage.LastDay.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture),
                string.Create(CultureInfo.InvariantCulture, $"{outage.FirstDay:yyyy-MM-dd} (first_day) or later")));
        }
    }

    private void Share(string key, double value) => InRange(key, value, 0, 1, "1");

    private void Emissivity(string key, IReadOnlyDictionary<Channel, double> table, Channel channel) =>
        InRange($"{key}.{ChannelNames.NameOf(channel)}", table.GetValueOrDefault(channel, double.NaN), 0, 1, "1");

    private void Each(string key, IReadOnlyDictionary<Channel, double> table, double lowest, double highest, string unit)
    {
        foreach ((Channel channel, double value) in table.OrderBy(pair => pair.Key))
        {
            InRange($"{key}.{ChannelNames.NameOf(channel)}", value, lowest, highest, unit);
        }
    }

    private void InRange(string key, double value, double lowest, double highest, string unit)
    {
        if (!(value >= lowest && value <= highest))
        {
            problems.Add(new(
                key,
                double.IsNaN(value) ? "nothing" : value.ToString("R", CultureInfo.InvariantCulture),
                string.Create(CultureInfo.InvariantCulture, $"{lowest} to {highest}, unit {unit}")));
        }
    }
}
