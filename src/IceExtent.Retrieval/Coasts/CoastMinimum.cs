namespace IceExtent.Retrieval;

/// <summary>What the minimum method knows of one zone.</summary>
/// <param name="CapFraction">Land never makes more ice than this. Unit: 1.</param>
/// <param name="BoxCells">The side of the square that is searched for open water, an odd number of cells.</param>
public sealed record CoastZoneRules(double CapFraction, int BoxCells);

/// <summary>What rules the minimum method.</summary>
/// <param name="Shore">The cells that touch land.</param>
/// <param name="NearShore">The second cells.</param>
/// <param name="Offshore">The third cells.</param>
/// <param name="OpenWaterFraction">A cell below this concentration is open water. Unit: 1.</param>
/// <param name="OpenWaterCells">So many cells of open water must be in the square.</param>
public sealed record CoastMinimumRules(
    CoastZoneRules Shore, CoastZoneRules NearShore, CoastZoneRules Offshore, double OpenWaterFraction, int OpenWaterCells)
{
    /// <summary>The rules of one zone.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The zone has none.</exception>
    public CoastZoneRules Of(CoastZone zone) => zone switch
    {
        CoastZone.Shore => Shore,
        CoastZone.NearShore => NearShore,
        CoastZone.Offshore => Offshore,
        _ => throw new ArgumentOutOfRangeException(nameof(zone), zone, "Only the three coastal zones have rules."),
    };
}

/// <summary>The smallest monthly mean concentration of each coastal cell: what land alone makes there.</summary>
/// <remarks>Source: [Cavalieri1999], step 1; from memory (medium), the caps from memory (low).</remarks>
public static class CoastMinimum
{
    /// <summary>Builds the plane from a year of monthly means.</summary>
    /// <param name="monthlyFraction">One plane a month, in any order. Unit: 1. Missing: NaN. Shape: one value a cell.</param>
    /// <param name="zones">The distances from land.</param>
    /// <param name="rules">The caps.</param>
    /// <returns>The smallest mean, at most the zone's cap; 0 outside the zones and where every month is missing.</returns>
    /// <exception cref="ArgumentException">There is no month, or a plane does not fit the grid.</exception>
    public static float[] Build(IReadOnlyList<ReadOnlyMemory<float>> monthlyFraction, CoastZones zones, CoastMinimumRules rules)
    {
        ArgumentNullException.ThrowIfNull(monthlyFraction);
        ArgumentNullException.ThrowIfNull(zones);
        ArgumentNullException.ThrowIfNull(rules);
        if (monthlyFraction.Count == 0 || monthlyFraction.Any(month => month.Length != zones.Zones.Length))
        {
            throw new ArgumentException("One month at least is needed, and every month must have the grid's cells.", nameof(monthlyFraction));
        }

        float[] smallest = new float[zones.Zones.Length];
        Array.Fill(smallest, float.NaN);
        foreach (ReadOnlyMemory<float> month in monthlyFraction)
        {
            ReadOnlySpan<float> fraction = month.Span;
            for (int cell = 0; cell < smallest.Length; cell++)
            {
                smallest[cell] = float.MinNumber(smallest[cell], fraction[cell]);
            }
        }

        return Capped(smallest, zones, rules);
    }

    /// <summary>Cuts a plane of minima at the caps of the zones.</summary>
    /// <param name="fraction">The minima. Unit: 1. Missing: NaN. Shape: one value a cell.</param>
    /// <param name="zones">The distances from land.</param>
    /// <param name="rules">The caps.</param>
    /// <returns>0 outside the zones and where missing.</returns>
    /// <exception cref="ArgumentException">The plane does not fit the grid.</exception>
    public static float[] Capped(ReadOnlySpan<float> fraction, CoastZones zones, CoastMinimumRules rules)
    {
        ArgumentNullException.ThrowIfNull(zones);
        ArgumentNullException.ThrowIfNull(rules);
        if (fraction.Length != zones.Zones.Length)
        {
            throw new ArgumentException($"There are {fraction.Length} minima for {zones.Zones.Length} cells.", nameof(fraction));
        }

        float[] capped = new float[fraction.Length];
        for (int cell = 0; cell < capped.Length; cell++)
        {
            capped[cell] = zones.Zones[cell] is var zone and not CoastZone.None && fraction[cell] > 0f
                ? Math.Min(fraction[cell], (float)rules.Of(zone).CapFraction)
                : 0f;
        }

        return capped;
    }
}
