namespace IceExtent.Statistics.Scoring;

/// <summary>How retrieved concentrations of many cells stand to the truth. Immutable; tallies add up.</summary>
/// <param name="Cells">The number of cells.</param>
/// <param name="Sum">Σ of retrieved less true concentration. Unit: 1.</param>
/// <param name="Squares">Σ of its square.</param>
/// <param name="Within68">Cells whose 68 % limits hold the truth.</param>
/// <param name="Within95">Cells whose 95 % limits hold the truth.</param>
public readonly record struct CellScore(long Cells, double Sum, double Squares, long Within68, long Within95)
{
    // Two-sided limits of the normal distribution.
    private const double Limit68 = 0.994457883;
    /// <summary>Standard errors on either side that hold 95 % of a normal distribution.</summary>
    public const double Limit95 = 1.959963985;

    /// <summary>Mean of retrieved less true concentration; NaN without a cell. Unit: 1.</summary>
    public double Bias => Sum / Cells;

    /// <summary>Standard deviation about the bias; NaN with fewer than two cells. Unit: 1.</summary>
    public double Spread => Math.Sqrt((Squares - (Sum * Sum / Cells)) / (Cells - 1));

    /// <summary>Share of cells whose 68 % limits hold the truth; NaN without a cell.</summary>
    public double Share68 => (double)Within68 / Cells;

    /// <summary>Share of cells whose 95 % limits hold the truth; NaN without a cell.</summary>
    public double Share95 => (double)Within95 / Cells;

    /// <summary>Adds two tallies.</summary>
    public static CellScore operator +(CellScore left, CellScore right) => left.Add(right);

    /// <summary>Adds two tallies.</summary>
    public CellScore Add(CellScore other) => new(
        Cells + other.Cells, Sum + other.Sum, Squares + other.Squares, Within68 + other.Within68, Within95 + other.Within95);

    /// <summary>Adds one cell.</summary>
    /// <param name="retrieved">Its concentration. Unit: 1.</param>
    /// <param name="standardError">Its standard error. Unit: 1.</param>
    /// <param name="truth">The true concentration. Unit: 1.</param>
    public CellScore With(double retrieved, double standardError, double truth)
    {
        double difference = retrieved - truth;
        double size = Math.Abs(difference);
        return new(
            Cells + 1,
            Sum + difference,
            Squares + (difference * difference),
            Within68 + (size <= Limit68 * standardError ? 1 : 0),
            Within95 + (size <= Limit95 * standardError ? 1 : 0));
    }
}
