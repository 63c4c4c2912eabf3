using System.Runtime.InteropServices;

namespace IceExtent.Retrieval;

/// <summary>What one method says of one day on one grid. Reused from day to day.</summary>
/// <remarks>Shape: one value a cell, row-major, row 0 at the top. Missing: NaN; <see cref="Conditions"/> says why.</remarks>
public sealed class ConcentrationPlanes
{
    private readonly float[] total;
    private readonly float[] multiyear;
    private readonly float[] standardError;
    private readonly float[] firstYear;
    private readonly float[] unscreened;
    private readonly ushort[] conditions;

    /// <summary>Makes room for one grid.</summary>
    /// <param name="cellCount">The number of cells, 1 or more.</param>
    public ConcentrationPlanes(int cellCount)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(cellCount, 1);
        total = new float[cellCount];
        multiyear = new float[cellCount];
        standardError = new float[cellCount];
        firstYear = new float[cellCount];
        unscreened = new float[cellCount];
        conditions = new ushort[cellCount];
    }

    /// <summary>The number of cells.</summary>
    public int CellCount => total.Length;

    /// <summary>Sea-ice concentration of all ice. Unit: 1.</summary>
    public Span<float> Total => total;

    /// <summary>The total as it would be without weather screens, clipped to 0 to 1. Unit: 1.</summary>
    public Span<float> Unscreened => unscreened;

    /// <summary>Concentration of multiyear ice (type B in the south). Unit: 1. NaN everywhere for a method that cannot tell types apart.</summary>
    public Span<float> Multiyear => multiyear;

    /// <summary>Concentration of first-year ice (type A in the south): what is left of the total. Unit: 1.</summary>
    public Span<float> FirstYear => firstYear;

    /// <summary>Standard error of <see cref="Total"/>. Unit: 1.</summary>
    public Span<float> StandardError => standardError;

    /// <summary>Why each cell is what it is.</summary>
    public Span<CellConditions> Conditions => MemoryMarshal.Cast<ushort, CellConditions>(conditions.AsSpan());

    /// <summary>The total as memory, for writers.</summary>
    public ReadOnlyMemory<float> TotalMemory => total;

    /// <summary>Multiyear ice as memory, for writers.</summary>
    public ReadOnlyMemory<float> MultiyearMemory => multiyear;

    /// <summary>The unscreened total as memory, for writers.</summary>
    public ReadOnlyMemory<float> UnscreenedMemory => unscreened;

    /// <summary>First-year ice as memory, for writers.</summary>
    public ReadOnlyMemory<float> FirstYearMemory => firstYear;

    /// <summary>The standard error as memory, for writers.</summary>
    public ReadOnlyMemory<float> StandardErrorMemory => standardError;

    /// <summary>The conditions as bit masks, for writers.</summary>
    public ReadOnlyMemory<ushort> ConditionMemory => conditions;

    /// <summary>Whether a cell's concentration was retrieved: there, and not filled in.</summary>
    internal bool IsObserved(int cell) =>
        !float.IsNaN(total[cell])
            && (conditions[cell] & (ushort)(CellConditions.FilledFromNeighbours | CellConditions.FilledPolarGap | CellConditions.FilledFromDays)) == 0;

    /// <summary>Whether a cell has what was seen there, on the day itself or on days near it: what a polar gap may be filled from.</summary>
    internal bool IsSeenInPlace(int cell) =>
        !float.IsNaN(total[cell]) && (conditions[cell] & (ushort)(CellConditions.FilledFromNeighbours | CellConditions.FilledPolarGap)) == 0;

    /// <summary>Takes over every plane of another day of the same grid.</summary>
    /// <exception cref="ArgumentException">The other one is of another grid.</exception>
    public void CopyFrom(ConcentrationPlanes other)
    {
        ArgumentNullException.ThrowIfNull(other);
        if (other.CellCount != CellCount)
        {
            throw new ArgumentException($"The planes have {other.CellCount} cells, not {CellCount}.", nameof(other));
        }

        other.total.CopyTo(total, 0);
        other.multiyear.CopyTo(multiyear, 0);
        other.standardError.CopyTo(standardError, 0);
        other.firstYear.CopyTo(firstYear, 0);
        other.unscreened.CopyTo(unscreened, 0);
        other.conditions.CopyTo(conditions, 0);
    }

    /// <summary>Makes a day without an observation: every concentration missing, land and polar gap as the mask has them.</summary>
    /// <exception cref="ArgumentException">The mask is of another grid.</exception>
    public void MakeUnobserved(CellMask mask)
    {
        ArgumentNullException.ThrowIfNull(mask);
        if (mask.Conditions.Length != CellCount)
        {
            throw new ArgumentException($"The mask has {mask.Conditions.Length} cells, not {CellCount}.", nameof(mask));
        }

        foreach (float[] plane in (ReadOnlySpan<float[]>)[total, multiyear, standardError, firstYear, unscreened])
        {
            plane.AsSpan().Fill(float.NaN);
        }

        for (int cell = 0; cell < conditions.Length; cell++)
        {
            CellConditions masked = mask.Conditions[cell];
            conditions[cell] = (ushort)(masked == CellConditions.None ? CellConditions.NoObservation : masked);
        }
    }

    /// <summary>Fills a cell in. Multiyear ice may be NaN; first-year ice is the rest, never negative.</summary>
    internal void Put(int cell, double totalFraction, double multiyearFraction, double standardErrorFraction)
    {
        float all = (float)totalFraction;
        float multi = MathF.Min((float)multiyearFraction, all); // NaN stays NaN.
        total[cell] = all;
        multiyear[cell] = multi;
        firstYear[cell] = all - multi;
        standardError[cell] = (float)standardErrorFraction;
    }
}
