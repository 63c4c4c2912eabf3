namespace IceExtent.Retrieval;

/// <summary>Where ice cannot be in one month: outside an ice mask, or in a sea that is too warm. Immutable and safe to use from several threads.</summary>
/// <remarks>Source of both masks: [Cavalieri1999], from memory (high for the warm sea).</remarks>
public sealed class MonthMask
{
    private const CellConditions Both = CellConditions.OutsideIceMask | CellConditions.WarmWater;

    private readonly CellConditions[] conditions;

    /// <summary>Joins the masks of a month.</summary>
    /// <param name="outsideIce">Whether the ice mask has no ice in a cell, or null where there is no such mask. Shape: one value a cell.</param>
    /// <param name="warmWater">Whether the sea is too warm, or null. Shape as above.</param>
    /// <exception cref="ArgumentException">There is neither, or they differ in length.</exception>
    public MonthMask(bool[]? outsideIce, bool[]? warmWater)
    {
        if ((outsideIce ?? warmWater) is not { } known || (outsideIce ?? known).Length != (warmWater ?? known).Length)
        {
            throw new ArgumentException("One of the masks is needed, and both must have the same number of cells.", nameof(outsideIce));
        }

        conditions = new CellConditions[known.Length];
        for (int cell = 0; cell < conditions.Length; cell++)
        {
            conditions[cell] = (outsideIce?[cell] == true ? CellConditions.OutsideIceMask : CellConditions.None)
                | (warmWater?[cell] == true ? CellConditions.WarmWater : CellConditions.None);
        }
    }

    /// <summary>What the month says of each cell: <see cref="CellConditions.OutsideIceMask"/>, <see cref="CellConditions.WarmWater"/>, both or none.</summary>
    public ReadOnlySpan<CellConditions> Conditions => conditions;

    /// <summary>Sets what was filled in outside the mask to open water. Call it after every filling: it has seen no mask.</summary>
    /// <param name="planes">Changed in place; the standard error is left as it is. NaN stays NaN.</param>
    /// <returns>The number of cells changed.</returns>
    /// <exception cref="ArgumentException">The planes have another number of cells.</exception>
    public int ClearFilled(ConcentrationPlanes planes)
    {
        ArgumentNullException.ThrowIfNull(planes);
        CheckLength(planes);
        int cleared = 0;
        for (int cell = 0; cell < conditions.Length; cell++)
        {
            if (conditions[cell] != CellConditions.None && planes.Total[cell] > 0f) // After Retrieve only a filled cell can be.
            {
                planes.Put(cell, 0.0, planes.Multiyear[cell], planes.StandardError[cell]);
                planes.Conditions[cell] |= conditions[cell];
                cleared++;
            }
        }

        return cleared;
    }

    /// <summary>Sets the masked cells of a run to open water; counts those that still had ice.</summary>
    internal (int OutsideIceMask, int WarmWater) Apply(CellRange cells, ConcentrationPlanes planes)
    {
        CheckLength(planes);
        ReadOnlySpan<CellConditions> masked = cells.Of(conditions);
        Span<float> total = cells.Of(planes.Total);
        Span<CellConditions> marks = cells.Of(planes.Conditions);
        (int outside, int warm) = (0, 0);
        for (int cell = 0; cell < masked.Length; cell++)
        {
            CellConditions why = masked[cell] & Both;
            if (why == CellConditions.None || float.IsNaN(total[cell]))
            {
                continue;
            }

            if (total[cell] > 0f) // Else a screen was there first, or there was no ice.
            {
                outside += (why & CellConditions.OutsideIceMask) != 0 ? 1 : 0;
                warm += (why & CellConditions.WarmWater) != 0 ? 1 : 0;
            }

            total[cell] = 0f;
            marks[cell] |= why;
        }

        return (outside, warm);
    }

    private void CheckLength(ConcentrationPlanes planes)
    {
        if (planes.CellCount != conditions.Length)
        {
            throw new ArgumentException($"The planes have {planes.CellCount} cells; the mask has {conditions.Length}.", nameof(planes));
        }
    }
}
