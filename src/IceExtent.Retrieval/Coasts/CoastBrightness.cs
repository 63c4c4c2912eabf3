using System.Buffers;
using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>What rules the correction of brightness temperatures near land.</summary>
/// <param name="LeastLandFraction">Cells are left alone where no channel's footprint holds this share of land.</param>
/// <param name="MostLandFraction">Cells are left alone where a channel's footprint holds more land than this share.</param>
/// <param name="ErrorFraction">What land leaves in a cell's concentration, per unit of land over sea in its footprint: a standard deviation.</param>
/// <param name="Land">How the temperature of land is found.</param>
public sealed record CoastBrightnessRules(double LeastLandFraction, double MostLandFraction, double ErrorFraction, LandTemperatureRules Land);

/// <summary>Takes the land out of brightness temperatures of coastal ocean cells.</summary>
/// <remarks>
/// T_sea = (T_obs − a·T_land)/(1 − a), where a is the share of land in the channel's footprint. Source: [Maass2010]; the
/// formula is from memory (high). Departures: the land share is that of the grid's own cells and not of a finer mask, T_land is
/// estimated by <see cref="LandTemperature"/>, and a cell is corrected in all its channels or in none, so that ratios of
/// channels stay those of one surface. What is left of land grows as a/(1 − a) and enters the standard error.
/// Immutable and safe to use from several threads; made once a sensor and grid.
/// </remarks>
public sealed class CoastBrightness
{
    private readonly Channel[] channels;
    private readonly KelvinRange range;
    private readonly int[] coastalCells;
    private readonly float[][] landShares; // One array a channel, one share a coastal cell.
    private readonly float[] errorVariances; // Of concentration, one a coastal cell.
    private readonly LandTemperature land;

    /// <summary>Finds the coastal cells and the cells that tell of the land beside them.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="land">How much of each cell is land.</param>
    /// <param name="ocean">Whether each cell is ocean that can have a concentration. Shape: one value a cell.</param>
    /// <param name="footprintsMeters">The 3 dB width of every channel to correct.</param>
    /// <param name="range">The temperatures that are believed: a cell that would leave them is left alone.</param>
    /// <param name="rules">The limits.</param>
    /// <exception cref="ArgumentException">A plane does not fit the grid, or there is no channel.</exception>
    public CoastBrightness(
        Grid grid,
        LandShare land,
        ReadOnlySpan<bool> ocean,
        IReadOnlyDictionary<Channel, double> footprintsMeters,
        KelvinRange range,
        CoastBrightnessRules rules)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(land);
        ArgumentNullException.ThrowIfNull(footprintsMeters);
        ArgumentNullException.ThrowIfNull(range);
        ArgumentNullException.ThrowIfNull(rules);
        if (ocean.Length != grid.CellCount || land.Fraction.Length != grid.CellCount || footprintsMeters.Count == 0)
        {
            throw new ArgumentException("The planes must have the grid's cells, and one channel at least must be there.", nameof(ocean));
        }

        this.range = range;
        channels = [.. footprintsMeters.Keys.Order()];
        Dictionary<double, float[]> sharesByWidth = footprintsMeters.Values.Distinct().ToDictionary(
            width => width, width => FootprintShare.Of(land.Fraction, grid.Columns, FootprintShare.Weights(width, grid.Frame.CellMeters)));
        float[][] shares = Array.ConvertAll(channels, channel => sharesByWidth[footprintsMeters[channel]]);
        (float[] least, float[] most) = Extremes([.. sharesByWidth.Values]);
        bool[] tells = new bool[ocean.Length];
        bool[] pure = new bool[ocean.Length];
        List<int> coast = [];
        for (int cell = 0; cell < ocean.Length; cell++)
        {
            pure[cell] = !ocean[cell] && least[cell] >= rules.Land.PureLandFraction;
            tells[cell] = ocean[cell] ? most[cell] >= rules.LeastLandFraction : land.Fraction[cell] > 0f; // The polar gap tells nothing.
            if (ocean[cell] && most[cell] >= rules.LeastLandFraction && most[cell] <= rules.MostLandFraction)
            {
                coast.Add(cell);
            }
        }

        coastalCells = [.. coast];
        landShares = Array.ConvertAll(shares, share => Array.ConvertAll(coastalCells, cell => share[cell]));
        errorVariances = Array.ConvertAll(coastalCells, cell => (float)Math.Pow(rules.ErrorFraction * most[cell] / (1f - most[cell]), 2.0));
        this.land = new(grid, coastalCells, tells, pure, shares, rules.Land);
    }

    /// <summary>The cells that may be corrected, rising.</summary>
    public ReadOnlySpan<int> Cells => coastalCells;

    /// <summary>T_sea = (T_obs − a·T_land)/(1 − a).</summary>
    /// <param name="observedKelvins">What the antenna saw, in K.</param>
    /// <param name="landKelvins">The temperature of land, in K.</param>
    /// <param name="landFraction">The share of land in the footprint, 0 to below 1.</param>
    /// <returns>The temperature of the rest of the footprint, in K.</returns>
    public static float SeaKelvins(float observedKelvins, float landKelvins, float landFraction) =>
        (observedKelvins - (landFraction * landKelvins)) / (1f - landFraction);

    /// <summary>Corrects one day, after the range check and before any retrieval.</summary>
    /// <param name="observed">Holds every channel to correct, in K; changed in place. NaN stays NaN.</param>
    /// <param name="conditions">Receives <see cref="CellConditions.CoastCorrected"/> where a temperature was changed.</param>
    /// <returns>The number of cells changed.</returns>
    public int Correct(BrightnessPlanes observed, Span<CellConditions> conditions)
    {
        ArgumentNullException.ThrowIfNull(observed);
        float[] rented = ArrayPool<float>.Shared.Rent(channels.Length * land.Count);
        for (int channel = 0; channel < channels.Length; channel++)
        {
            land.Estimate(channel, observed.Kelvins(channels[channel]), rented.AsSpan(channel * land.Count, land.Count));
        }

        Span<float> sea = stackalloc float[channels.Length];
        int corrected = 0;
        for (int coast = 0; coast < coastalCells.Length; coast++)
        {
            int cell = coastalCells[coast];
            if (Solve(observed, coast, rented, sea))
            {
                for (int channel = 0; channel < channels.Length; channel++)
                {
                    observed.Kelvins(channels[channel])[cell] = sea[channel];
                }

                conditions[cell] |= CellConditions.CoastCorrected;
                corrected++;
            }
        }

        ArrayPool<float>.Shared.Return(rented);
        return corrected;
    }

    /// <summary>Widens the standard errors of corrected cells by what land may have left in them.</summary>
    /// <param name="planes">A day retrieved from temperatures that <see cref="Correct"/> changed; NaN stays NaN.</param>
    public void WidenErrors(ConcentrationPlanes planes)
    {
        ArgumentNullException.ThrowIfNull(planes);
        Span<float> errors = planes.StandardError;
        for (int coast = 0; coast < coastalCells.Length; coast++)
        {
            int cell = coastalCells[coast];
            if ((planes.Conditions[cell] & CellConditions.CoastCorrected) != 0)
            {
                errors[cell] = MathF.Sqrt((errors[cell] * errors[cell]) + errorVariances[coast]);
            }
        }
    }

    // False where no channel is there, or one that is there cannot be corrected.
    private bool Solve(BrightnessPlanes observed, int coast, ReadOnlySpan<float> landKelvins, Span<float> sea)
    {
        bool any = false;
        for (int channel = 0; channel < channels.Length; channel++)
        {
            float value = observed.Kelvins(channels[channel])[coastalCells[coast]];
            sea[channel] = value;
            if (float.IsNaN(value))
            {
                continue;
            }

            float landHere = landKelvins[(channel * land.Count) + land.TilesOfCoast[coast]];
            float corrected = SeaKelvins(value, landHere, landShares[channel][coast]);
            if (!(landHere >= range.LowestKelvins && landHere <= range.HighestKelvins && corrected >= range.LowestKelvins && corrected <= range.HighestKelvins))
            {
                return false; // Also where land is not known: then it is NaN.
            }

            sea[channel] = corrected;
            any = true;
        }

        return any;
    }

    private static (float[] Least, float[] Most) Extremes(float[][] planes)
    {
        float[] least = [.. planes[0]];
        float[] most = [.. planes[0]];
        foreach (float[] plane in planes)
        {
            for (int cell = 0; cell < plane.Length; cell++)
            {
                least[cell] = Math.Min(least[cell], plane[cell]);
                most[cell] = Math.Max(most[cell], plane[cell]);
            }
        }

        return (least, most);
    }
}
