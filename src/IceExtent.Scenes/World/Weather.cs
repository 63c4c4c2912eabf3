using System.Numerics;
using IceExtent.Grids;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;
using static System.Numerics.Vector;

namespace IceExtent.Scenes.World;

/// <summary>Sea, air, wind, vapor and cloud of every cell on any day, given its ice.</summary>
internal sealed class Weather
{
    private const double KilometersToMeters = 1000.0;
    private const double SpellLifeDays = 20.0;
    private const float MeltingKelvins = 273.15f;
    private const float LeastVapor = 0.2f;  // In mm; the coldest polar air holds no less.
    private const float MostVapor = 40f;    // In mm; beyond, the model's polynomials run away.
    private const float MostWind = 32f;     // In m/s.
    private const float MostCloud = 1.2f;   // In mm; more would rain, which the model does not know.
    private const float AirBelowSea = 6f;   // Over open water the air is at most this much colder, in K.

    private readonly WeatherParameters weather;
    private readonly SurfaceParameters surfaces;
    private readonly SmoothField air;
    private readonly SmoothField spells;
    private readonly SmoothField vapor;
    private readonly SmoothField wind;
    private readonly SmoothField cloud;
    private readonly Storms storms;
    private readonly float[] poleness;

    public Weather(WeatherParameters weather, SurfaceParameters surfaces, Grid grid, ulong key)
    {
        (this.weather, this.surfaces) = (weather, surfaces);
        FieldShape shape = new(
            weather.NodeKilometers * KilometersToMeters, weather.LifeDays, 2, 0.5, weather.DriftKilometersPerDay * KilometersToMeters);
        air = new(shape, Draws.Key(key, 1), grid.Frame);
        vapor = new(shape, Draws.Key(key, 2), grid.Frame);
        wind = new(shape, Draws.Key(key, 3), grid.Frame);
        cloud = new(shape with { Octaves = 4, Roughness = 0.7 }, Draws.Key(key, 4), grid.Frame);
        storms = new(weather.Storms, grid, Draws.Key(key, 5));
        spells = new(
            new(2.0 * weather.NodeKilometers * KilometersToMeters, SpellLifeDays, 2, 0.5), Draws.Key(key, 6), grid.Frame);
        poleness = new float[PlaneMath.PaddedLength(grid.CellCount)];
        for (int cell = 0; cell < grid.CellCount; cell++)
        {
            poleness[cell] = (float)((Math.Abs(grid.LatitudesDegrees[cell]) - 60.0) / 30.0);
        }
    }

    /// <summary>Writes the weather and what it does to the ice's surface.</summary>
    /// <param name="time">In days, on the scale of <see cref="DateOnly.DayNumber"/>.</param>
    /// <param name="summerness">0 at the largest extent, 1 at the smallest.</param>
    /// <param name="scratch">Room of the same grid.</param>
    /// <param name="room">Two padded planes; overwritten.</param>
    /// <param name="stormRoom">Room for storms; overwritten.</param>
    /// <param name="cells">Depth and ice have been filled; receives the rest.</param>
    public void Fill(
        double time, double summerness, FieldScratch scratch, (float[] First, float[] Second) room, StormPlanes stormRoom, CellPlanes cells)
    {
        double warmth = Warmth(time);
        storms.Fill(time, 1.0 - (0.4 * warmth), scratch, stormRoom);
        stormRoom.Warming.CopyTo(room.First, 0);
        air.AddTo(time, weather.AirSpreadKelvins * (1.0 - (0.5 * warmth)), scratch, room.First);
        room.Second.AsSpan().Clear();
        spells.AddTo(time, weather.SpellSpreadKelvins, scratch, room.Second);
        stormRoom.VaporLog.CopyTo(cells.Vapor, 0);
        vapor.AddTo(time, weather.VaporLogSpread, scratch, cells.Vapor);
        cells.Wind.AsSpan().Clear();
        wind.AddTo(time, weather.WindLogSpread, scratch, cells.Wind);
        cells.Cloud.AsSpan().Clear();
        cloud.AddTo(time, 1.0, scratch, cells.Cloud);

        FillSeaAndAir(warmth, summerness, room, cells);
        FillWindAndCloud(warmth, stormRoom, cells);
    }

    // 0 on the coldest day, 1 half a year later.
    private double Warmth(double time)
    {
        int dayOfYear = DateOnly.FromDayNumber((int)time).DayOfYear;
        return 0.5 - (0.5 * Math.Cos(Math.Tau * (dayOfYear - weather.ColdestDayOfYear) / 365.25));
    }

    private void FillSeaAndAir(double warmth, double summerness, (float[] Weather, float[] Spells) anomaly, CellPlanes cells)
    {
        double swing = (2.0 * warmth) - 1.0;
        Vector<float> sixty = Of(weather.SixtyAirKelvins + (swing * weather.SixtyAirSwingKelvins));
        Vector<float> toPole = Of(weather.PoleAirKelvins + (swing * weather.PoleAirSwingKelvins)) - sixty;
        Vector<float> freezing = Of(weather.FreezingKelvins);
        Vector<float> warmingPerDegree = Of(weather.WinterSeaWarmingKelvinsPerDegree
            + (summerness * (weather.SummerSeaWarmingKelvinsPerDegree - weather.WinterSeaWarmingKelvinsPerDegree)));
        Vector<float> growth = Of(weather.VaporGrowthPerKelvin);
        Vector<float> airShare = Of(surfaces.AirShareInIce);

        for (int cell = 0; cell < cells.Length; cell += Vector<float>.Count)
        {
            Vector<float> usual = sixty + (toPole * new Vector<float>(poleness, cell)) + new Vector<float>(anomaly.Spells, cell);
            Vector<float> airKelvins = usual + new Vector<float>(anomaly.Weather, cell);
            Vector<float> overIce = Min(airKelvins, Of(weather.WarmestAirOverIceKelvins));
            Vector<float> outside = Max(-new Vector<float>(cells.DepthDegrees, cell), Vector<float>.Zero);
            Vector<float> sea = Min(freezing + (warmingPerDegree * outside), Of(weather.WarmestSeaKelvins));

            sea.CopyTo(cells.SeaKelvins, cell);
            airKelvins.CopyTo(cells.LandKelvins, cell);
            (freezing + (airShare * (Min(overIce, Of(MeltingKelvins)) - freezing))).CopyTo(cells.IceKelvins, cell);
            FillMelt(cells, cell, overIce, usual);

            Vector<float> ice = new Vector<float>(cells.FirstYear, cell) + new Vector<float>(cells.Multiyear, cell);
            Vector<float> overWater = Max(airKelvins, sea - Of(AirBelowSea));
            Vector<float> moistAir = overWater + (ice * (overIce - overWater));
            Vector<float> amount = Of(weather.VaporMillimetersAtMelting)
                * Exp((growth * (moistAir - Of(MeltingKelvins))) + new Vector<float>(cells.Vapor, cell));
            Min(Max(amount, Of(LeastVapor)), Of(MostVapor)).CopyTo(cells.Vapor, cell);
        }
    }

    // Snow is wet while the weather is mild; ponds stand where weeks, not days, are warm.
    private void FillMelt(CellPlanes cells, int cell, Vector<float> airOverIce, Vector<float> usualAir)
    {
        Vector<float> from = Of(surfaces.WetFromKelvins);
        Vector<float> inverse = Of(1.0 / (surfaces.WetToKelvins - surfaces.WetFromKelvins));
        PlaneMath.SmoothStep((airOverIce - from) * inverse).CopyTo(cells.Wetness, cell);
        (Of(surfaces.HighestPondShare) * PlaneMath.SmoothStep((usualAir - from) * inverse)).CopyTo(cells.PondShare, cell);
    }

    private void FillWindAndCloud(double warmth, StormPlanes storm, CellPlanes cells)
    {
        Vector<float> median = Of(weather.WinterWindMetersPerSecond
            + (warmth * (weather.SummerWindMetersPerSecond - weather.WinterWindMetersPerSecond)));
        Vector<float> threshold = Of(weather.CloudThreshold);
        Vector<float> liquid = Of(weather.CloudMillimeters);
        for (int cell = 0; cell < cells.Length; cell += Vector<float>.Count)
        {
            Vector<float> speed = (median * Exp(new Vector<float>(cells.Wind, cell))) + new Vector<float>(storm.Wind, cell);
            Min(speed, Of(MostWind)).CopyTo(cells.Wind, cell);

            Vector<float> field = new(cells.Cloud, cell);
            Vector<float> above = Max(field - threshold, Vector<float>.Zero);
            Vector<float> texture = Max(Vector<float>.One + (Of(0.5) * field), Vector<float>.Zero);
            Vector<float> ice = new Vector<float>(cells.FirstYear, cell) + new Vector<float>(cells.Multiyear, cell);
            Vector<float> sum = ((liquid * above * above) + (new Vector<float>(storm.Cloud, cell) * texture))
                * (Vector<float>.One - (Of(0.5) * ice));
            Min(sum, Of(MostCloud)).CopyTo(cells.Cloud, cell);
        }
    }

    private static Vector<float> Of(double value) => new((float)value);
}
