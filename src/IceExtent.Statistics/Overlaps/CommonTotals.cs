namespace IceExtent.Statistics.Overlaps;

/// <summary>Totals of two sensors over the cells of one day that both observed. Unit: m².</summary>
/// <param name="Common">Area of those cells.</param>
/// <param name="FirstExtent">Area of cells at or above the ice limit by the first sensor.</param>
/// <param name="FirstIceArea">Concentration times area over the same cells.</param>
/// <param name="SecondExtent">The extent by the second sensor.</param>
/// <param name="SecondIceArea">Its ice area.</param>
public readonly record struct CommonTotals(
    double Common, double FirstExtent, double FirstIceArea, double SecondExtent, double SecondIceArea)
{
    /// <summary>Sums one day, in double precision and in the order of the region's cells.</summary>
    /// <param name="region">The cells and their areas.</param>
    /// <param name="first">Clipped concentrations of the first sensor. Unit: 1. Missing: NaN. Shape: one value a cell of the grid.</param>
    /// <param name="second">The same of the second sensor.</param>
    /// <param name="iceFraction">From here on a cell is ice. Unit: 1.</param>
    public static CommonTotals Sum(TotalsRegion region, ReadOnlySpan<float> first, ReadOnlySpan<float> second, double iceFraction)
    {
        ArgumentNullException.ThrowIfNull(region);
        float limit = (float)iceFraction;
        ReadOnlySpan<int> cells = region.Cells;
        ReadOnlySpan<double> areas = region.AreasSquareMeters;
        double common = 0, firstExtent = 0, firstArea = 0, secondExtent = 0, secondArea = 0;
        for (int index = 0; index < cells.Length; index++)
        {
            float one = first[cells[index]];
            float other = second[cells[index]];
            if (float.IsNaN(one) || float.IsNaN(other))
            {
                continue;
            }

            double area = areas[index];
            common += area;
            firstExtent += one >= limit ? area : 0.0;
            firstArea += one >= limit ? one * area : 0.0;
            secondExtent += other >= limit ? area : 0.0;
            secondArea += other >= limit ? other * area : 0.0;
        }

        return new(common, firstExtent, firstArea, secondExtent, secondArea);
    }
}
