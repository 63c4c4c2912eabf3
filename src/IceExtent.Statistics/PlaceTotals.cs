using IceExtent.Retrieval;

namespace IceExtent.Statistics;

/// <summary>The mean over the cells of one place on one day. Areas in m².</summary>
/// <param name="Whole">Area of all cells.</param>
/// <param name="Observed">Area of cells with a retrieved concentration.</param>
/// <param name="Filled">Area of cells whose concentration was filled in, in the polar gap too.</param>
/// <param name="IceArea">Concentration times area over observed and filled cells, however little ice they hold.</param>
public readonly record struct PlaceTotals(double Whole, double Observed, double Filled, double IceArea)
{
    private const CellConditions FilledAtAll =
        CellConditions.FilledFromNeighbours | CellConditions.FilledFromDays | CellConditions.FilledPolarGap;

    /// <summary>Area of the cells that have a concentration.</summary>
    public double Known => Observed + Filled;

    /// <summary>The mean concentration, weighted by area, or null where no cell has one. Range: 0 to 1.</summary>
    public double? MeanFraction => Known > 0.0 ? IceArea / Known : null;

    /// <summary>Sums one day, in double precision and in the order of the place's cells.</summary>
    /// <param name="place">The cells and their areas.</param>
    /// <param name="totalFraction">Clipped concentrations. Unit: 1. Missing: NaN. Shape: one value a cell of the grid.</param>
    /// <param name="conditions">Tells what was filled. Shape as above.</param>
    public static PlaceTotals Sum(TotalsRegion place, ReadOnlySpan<float> totalFraction, ReadOnlySpan<CellConditions> conditions)
    {
        ArgumentNullException.ThrowIfNull(place);
        double whole = 0.0, observed = 0.0, filled = 0.0, ice = 0.0;
        for (int index = 0; index < place.Cells.Length; index++)
        {
            int cell = place.Cells[index];
            double area = place.AreasSquareMeters[index];
            whole += area;
            if (float.IsNaN(totalFraction[cell]))
            {
                continue;
            }

            ice += totalFraction[cell] * area;
            bool isFilled = (conditions[cell] & FilledAtAll) != 0;
            observed += isFilled ? 0.0 : area;
            filled += isFilled ? area : 0.0;
        }

        return new(whole, observed, filled, ice);
    }
}
