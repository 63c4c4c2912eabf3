using System.Runtime.CompilerServices;
using IceExtent.Retrieval;
using MathNet.Numerics.Distributions;

namespace IceExtent.Statistics;

/// <summary>The standard errors of one day's totals, from those of its cells. Reused from day to day; not shared between threads.</summary>
/// <remarks>
/// Cell errors are taken as Gaussian with a correlation that falls with distance (<see cref="ErrorCorrelation"/>).
/// Area: the variance of Σ a·C over cells counted as ice. Extent: the variance of Σ a·[C + error ≥ limit], by the
/// tetrachoric series of the two-by-two probabilities, with z = (C − limit)/σ:
/// Σₖ (1/k!) ΣᵢΣⱼ aᵢaⱼ He₍ₖ₋₁₎(zᵢ)φ(zᵢ) He₍ₖ₋₁₎(zⱼ)φ(zⱼ) ρᵢⱼᵏ. Five terms are kept.
/// Source of the series: [Kendall1941], value from memory. Where the scatter of the pure surfaces is given, the area takes that
/// part of a cell's error alone as alike over the correlation length, and the rest (noise, smearing, coasts, filling) as alike inside one
/// footprint (<see cref="LocalErrors"/>): what a footprint takes from one cell it gives to the next. Extent does not: along an edge
/// smearing has one sign, over hundreds of kilometres. But cells where no ice was retrieved, most of them screened, hide
/// ice of their own: alike inside squares (<see cref="LocalCounts"/>) and no farther. Our own. Empty cells and an unfilled polar gap add nothing here.
/// </remarks>
public sealed class TotalsUncertainty
{
    private const double FarFromLimit = 5.0; // In standard errors: beyond it a cell's side of the limit is certain.
    private static readonly double InverseRootTwoPi = 1.0 / Math.Sqrt(2.0 * Math.PI);
    private static readonly double[] InverseRootFactorials =
        [1.0, 1.0, 1.0 / Math.Sqrt(2.0), 1.0 / Math.Sqrt(6.0), 1.0 / Math.Sqrt(24.0), 1.0 / Math.Sqrt(120.0)];

    private readonly ErrorCorrelation correlation;
    private readonly double[] areaWeights;
    private readonly double[][] extentWeights;
    private readonly double[] scratch;
    private readonly double[] terms = new double[ErrorCorrelation.MostPowers];
    private readonly LocalErrors local;
    private readonly LocalCounts missed;
    private double shared = 1.0; // λ of the cell in hand.
    private bool anyNearLimit;
    private double countsWith; // The probability that it counts as ice, where none was retrieved.

    /// <summary>Makes the working memory.</summary>
    /// <param name="correlation">The correlation of cell errors on the grid.</param>
    public TotalsUncertainty(ErrorCorrelation correlation)
    {
        ArgumentNullException.ThrowIfNull(correlation);
        this.correlation = correlation;
        areaWeights = new double[correlation.BlockCount];
        extentWeights = new double[ErrorCorrelation.MostPowers][];
        for (int term = 0; term < extentWeights.Length; term++)
        {
            extentWeights[term] = new double[correlation.BlockCount];
        }

        scratch = new double[correlation.BlockCount];
        local = new(correlation.Footprints);
        missed = new(correlation.MissedIce);
    }

    /// <summary>Computes both standard errors.</summary>
    /// <param name="region">The cells and their areas.</param>
    /// <param name="totalFraction">Clipped concentrations. Unit: 1. Missing: NaN, brings nothing.</param>
    /// <param name="standardErrorFraction">Their standard errors. Unit: 1.</param>
    /// <param name="iceFraction">The limit from which a cell counts as ice. Unit: 1.</param>
    /// <param name="scatter">The part of the errors that is alike over the correlation length, or null where all of it is.</param>
    /// <param name="edgeShiftSquareMeters">The standard error of extent that all of the edge has in common, in m²: see <see cref="EdgeShift"/>.</param>
    /// <returns>In m².</returns>
    public (double Extent, double IceArea) StandardErrorsSquareMeters(
        TotalsRegion region,
        ReadOnlySpan<float> totalFraction,
        ReadOnlySpan<float> standardErrorFraction,
        double iceFraction,
        RetrievalScatter? scatter = null,
        double edgeShiftSquareMeters = 0.0)
    {
        ArgumentNullException.ThrowIfNull(region);
        Gather(region, totalFraction, standardErrorFraction, iceFraction, scatter);
        BlockWindow window = correlation.WindowOf(region);
        double areaVariance = local.TakeVariance() + correlation.PairSum(areaWeights, 1, scratch, window);
        double extentVariance = missed.TakeVariance() + (edgeShiftSquareMeters * edgeShiftSquareMeters);
        for (int term = 0; anyNearLimit && term < extentWeights.Length; term++)
        {
            extentVariance += correlation.PairSum(extentWeights[term], term + 1, scratch, window);
        }

        Forget(window);
        return (Math.Sqrt(extentVariance), Math.Sqrt(areaVariance));
    }

    /// <summary>The standard error of concentration times area over all cells of a region that have one, however little ice they hold.</summary>
    /// <inheritdoc cref="StandardErrorsSquareMeters" path="/param"/>
    /// <returns>In m². Over the area of these cells it is the standard error of their mean.</returns>
    public double AreaStandardErrorSquareMeters(
        TotalsRegion region, ReadOnlySpan<float> totalFraction, ReadOnlySpan<float> standardErrorFraction, RetrievalScatter? scatter = null)
    {
        const double AnyIce = double.NegativeInfinity; // Every cell counts, and none is near the limit.
        ArgumentNullException.ThrowIfNull(region);
        Gather(region, totalFraction, standardErrorFraction, AnyIce, scatter);
        BlockWindow window = correlation.WindowOf(region);
        double variance = local.TakeVariance() + correlation.PairSum(areaWeights, 1, scratch, window);
        Forget(window);
        return Math.Sqrt(variance);
    }

    // Between two calls all weights are zero.
    private void Forget(in BlockWindow window)
    {
        for (int row = window.FirstRow; row <= window.LastRow; row++)
        {
            int start = (row * correlation.BlockColumns) + window.FirstColumn;
            areaWeights.AsSpan(start, window.Columns).Clear();
            for (int term = 0; anyNearLimit && term < extentWeights.Length; term++)
            {
                extentWeights[term].AsSpan(start, window.Columns).Clear();
            }
        }

        anyNearLimit = false;
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private void Gather(
        TotalsRegion region, ReadOnlySpan<float> totalFraction, ReadOnlySpan<float> standardErrorFraction, double iceFraction, RetrievalScatter? scatter)
    {
        shared = 1.0;
        float limit = (float)iceFraction;
        // Neighbours in a block are often plain water or full ice alike: their areas are added up before they are spread.
        (float knownFraction, float knownError, bool nearLimit) = (float.NaN, float.NaN, false);
        (int runBlock, double runArea) = (0, 0.0);
        ReadOnlySpan<int> blocks = correlation.BlockOfCell;
        ReadOnlySpan<int> cells = region.Cells;
        ReadOnlySpan<double> areas = region.AreasSquareMeters;
        for (int index = 0; index < cells.Length; index++)
        {
            int cell = cells[index];
            float fraction = totalFraction[cell];
            float error = standardErrorFraction[cell];
            if (!(error > 0f))
            {
                continue; // Missing, or known exactly.
            }

            int block = blocks[cell];
            bool alike = fraction == knownFraction && error == knownError;
            if (!alike || block != runBlock)
            {
                Spread(runBlock, runArea, knownFraction >= limit ? knownError : 0.0, nearLimit && knownFraction > 0f);
                (runBlock, runArea) = (block, 0.0);
            }

            if (!alike)
            {
                (knownFraction, knownError) = (fraction, error);
                double fromLimit = (fraction - iceFraction) / error;
                nearLimit = ComputeTerms(fromLimit);
                countsWith = nearLimit && fraction <= 0f ? Normal.CDF(0.0, 1.0, fromLimit) : 0.0;
                shared = scatter is not null && fraction >= limit ? Math.Min(scatter.At(fraction) / error, 1.0) : 1.0;
            }

            runArea += areas[index];
            if (nearLimit && fraction <= 0f)
            {
                missed.Add(cell, areas[index], countsWith);
            }

            if (shared < 1.0)
            {
                local.Add(cell, areas[index] * error, shared);
            }
        }

        Spread(runBlock, runArea, knownFraction >= limit ? knownError : 0.0, nearLimit && knownFraction > 0f);
    }

    private void Spread(int block, double area, double iceError, bool nearLimit)
    {
        areaWeights[block] += area * iceError * shared;
        anyNearLimit |= nearLimit;
        for (int term = 0; nearLimit && term < terms.Length; term++)
        {
            extentWeights[term][block] += area * terms[term];
        }
    }

    // Fills terms for a cell that is z standard errors above the limit; false where it is too far from it to matter.
    private bool ComputeTerms(double z)
    {
        if (Math.Abs(z) >= FarFromLimit)
        {
            return false;
        }

        double density = InverseRootTwoPi * Math.Exp(-0.5 * z * z);
        double before = 0.0;
        double hermite = 1.0; // He0; then He(n+1) = z·He(n) − n·He(n−1).
        for (int term = 0; term < terms.Length; term++)
        {
            terms[term] = density * hermite * InverseRootFactorials[term + 1];
            (before, hermite) = (hermite, (z * hermite) - (term * before));
        }

        return true;
    }
}
