using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>What rules the correction of brightness temperatures near land.</summary>
/// <param name="LeastLandFraction">Cells are left alone where no channel's footprint holds this share of land.</param>
/// <param name="MostLandFraction">Cells are left alone where a channel's footprint holds more land than this share.</param>
/// <param name="PureLandFraction">Land cells whose footprints hold at least this share of land tell the temperature of land.</param>
/// <param name="LandSearchMeters">How far they may be away.</param>
/// <param name="LandCells">How many of them are averaged, the nearest first; all that are as near as the last one count too.</param>
public sealed record CoastBrightnessRules(
    double LeastLandFraction, double MostLandFraction, double PureLandFraction, double LandSearchMeters, int LandCells);

/// <summary>Takes the land out of brightness temperatures of coastal ocean cells.</summary>
/// <remarks>
/// T_sea = (T_obs − a·T_land)/(1 − a), where a is the share of land in the channel's footprint. Source: [Maass2010]; the
/// formula is from memory (high). Departures: the land share is that of the grid's own cells and not of a finer mask, and
/// a cell is corrected in all its channels or in none, so that ratios of channels stay those of one surface. Errors of the
/// temperatures grow by 1/(1 − a). Immutable and safe to use from several threads; made once a sensor and grid.
/// </remarks>
public sealed class CoastBrightness
{
    private readonly Channel[] channels;
    private readonly KelvinRange range;
    private readonly int[] coastalCells;
    private readonly float[][] landShares; // One array a channel, one share a coastal cell.
    private readonly int[] landEnds; // Where each coastal cell's part of landCells ends.
    private readonly int[] landCells;

    /// <summary>Finds the coastal cells and the land beside each.</summary>
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
        bool[] pureLand = new bool[ocean.Length];
        for (int cell = 0; cell < pureLand.Length; cell++)
        {
            pureLand[cell] = !ocean[cell] && least[cell] >= rules.PureLandFraction;
        }

        NearbyCells nearby = new(grid, rules.LandSearchMeters);
        List<int> coast = [];
        List<int> ends = [];
        List<int> lands = [];
        for (int cell = 0; cell < ocean.Length; cell++)
        {
            if (ocean[cell] && most[cell] >= rules.LeastLandFraction && most[cell] <= rules.MostLandFraction
                && nearby.Nearest(cell, pureLand, rules.LandCells, lands) > 0)
            {
                coast.Add(cell);
                ends.Add(lands.Count);
            }
        }

        (coastalCells, landEnds, landCells) = ([.. coast], [.. ends], [.. lands]);
        landShares = Array.ConvertAll(shares, share => Array.ConvertAll(coastalCells, cell => share[cell]));
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
        Span<float> sea = stackalloc float[channels.Length];
        int corrected = 0;
        int landStart = 0;
        for (int coast = 0; coast < coastalCells.Length; coast++)
        {
            ReadOnlySpan<int> lands = landCells.AsSpan(landStart..landEnds[coast]);
            landStart = landEnds[coast];
            int cell = coastalCells[coast];
            if (Solve(observed, coast, lands, sea))
            {
                for (int channel = 0; channel < channels.Length; channel++)
                {
                    observed.Kelvins(channels[channel])[cell] = sea[channel];
                }

                conditions[cell] |= CellConditions.CoastCorrected;
                corrected++;
            }
        }

        return corrected;
    }

    // False where no channel is there, or one that is there cannot be corrected. Only pure land is read beside the cell
    // itself, and pure land is never changed, so the order of the cells does not matter.
    private bool Solve(BrightnessPlanes observed, int coast, ReadOnlySpan<int> lands, Span<float> sea)
    {
        bool any = false;
        for (int channel = 0; channel < channels.Length; channel++)
        {
            ReadOnlySpan<float> kelvins = observed.Kelvins(channels[channel]);
            float value = kelvins[coastalCells[coast]];
            sea[channel] = value;
            if (float.IsNaN(value))
            {
                continue;
            }

            float corrected = SeaKelvins(value, MeanOf(kelvins, lands), landShares[channel][coast]);
            if (!(corrected >= range.LowestKelvins && corrected <= range.HighestKelvins))
            {
                return false; // Also where no land has a temperature: then it is NaN.
            }

            sea[channel] = corrected;
            any = true;
        }

        return any;
    }

    private static float MeanOf(ReadOnlySpan<float> kelvins, ReadOnlySpan<int> cells)
    {
        double sum = 0.0;
        int count = 0;
        foreach (int cell in cells)
        {
            float value = kelvins[cell];
            if (!float.IsNaN(value))
            {
                sum += value;
                count++;
            }
        }

        return (float)(sum / count);
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
